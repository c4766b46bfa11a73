package ebbline.data;

import ebbline.time.CalendarRegistry;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.function.Consumer;

/** Books: one instrument a row. A row that cannot be read does not stop the others. */
public final class BookFile {
  private final CsvTable table;

  private final CalendarRegistry calendars;

  private BookFile(CsvTable table, CalendarRegistry calendars) {
    this.table = table;
    this.calendars = calendars;
  }

  /**
   * Reads a book's settings and header.
   *
   * @param calendars that the rows may name
   * @throws InputProblems if the file or its header cannot be used
   */
  public static BookFile open(String path, CalendarRegistry calendars) {
    CsvTable table = CsvTable.open(SourceFile.readBook(path), BookColumns.LAYOUT);
    if (!table.hasColumn("maturity") && !table.hasColumn("tenor")) {
      throw InputProblems.of(
          table.headerProblem(
              "maturity", "the column is missing; all instruments but swaptions need it"));
    }
    return new BookFile(table, calendars);
  }

  public SourceFile file() {
    return table.file();
  }

  /** Headings of the columns {@code x-…}. */
  public List<String> carried() {
    return table.columns().stream().filter(Column::carried).map(Column::heading).toList();
  }

  /**
   * Hands over every row in the order of the file.
   *
   * @throws InputProblems if the file has no row, or breaks off in an unbalanced quote
   */
  public void forEach(Consumer<BookEntry> reader) {
    List<InputProblem> broken = new ArrayList<>();
    Set<String> ids = new HashSet<>();
    int[] count = {0};
    int[] reported = {0};
    table.forEachRow(
        broken,
        row -> {
          for (; reported[0] < broken.size(); reported[0]++) {
            reader.accept(brokenRow(++count[0], broken.get(reported[0])));
          }
          count[0]++;
          reader.accept(unique(BookRows.entry(row, count[0], calendars), row, ids));
        });
    for (; reported[0] < broken.size(); reported[0]++) {
      reader.accept(brokenRow(++count[0], broken.get(reported[0])));
    }
    if (count[0] == 0) {
      throw InputProblems.of(
          new InputProblem(table.file().path(), 0, "", "", "there are no rows below the header"));
    }
  }

  private static BookEntry brokenRow(int number, InputProblem problem) {
    return BookRows.bad(Integer.toString(number), "", List.of(problem), java.util.Map.of());
  }

  private static BookEntry unique(BookEntry entry, CsvRow row, Set<String> ids) {
    String id =
        entry instanceof BookEntry.Good good ? good.row().id() : ((BookEntry.Bad) entry).id();
    if (ids.add(id) || entry instanceof BookEntry.Bad) {
      return entry;
    }
    BookEntry.Good good = (BookEntry.Good) entry;
    List<InputProblem> problems = new ArrayList<>();
    row.collecting(problems).problem("id", id, "the label stands twice; ids are unique");
    return BookRows.bad(id, good.row().instrument().kind(), problems, good.row().carried());
  }
}
