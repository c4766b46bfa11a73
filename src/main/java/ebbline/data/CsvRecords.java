package ebbline.data;

import com.opencsv.RFC4180Parser;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Cuts a CSV text into records, each with the line it starts on. A record that breaks the rules of
 * quotes costs its own line only: reading goes on with the next one.
 */
final class CsvRecords {
  /** A quoted cell that runs over more lines than this was not meant to. */
  private static final int MOST_LINES = 50;

  private static final int STRAY = -1;
  private static final int CLOSED = 0;
  private static final int STILL_OPEN = 1;
  private static final int OPENED_HERE = 2;

  private final String text;
  private final RFC4180Parser parser = new RFC4180Parser();
  private int at;
  private int line;

  /**
   * A record, or what is wrong with it.
   *
   * @param line the record's first, or the one the problem is on
   * @param cells none where there is a problem
   * @param problem in words; empty where there is none
   */
  record Cut(int line, List<String> cells, String problem) {
    Cut {
      cells = List.copyOf(cells);
    }
  }

  /**
   * @param at where the first record starts in the text
   * @param line its number
   */
  CsvRecords(String text, int at, int line) {
    this.text = text;
    this.at = at;
    this.line = line;
  }

  /** The next record that is not blank; empty at the end. */
  Optional<Cut> next() {
    while (at < text.length()) {
      int start = at;
      int first = line;
      String row = nextLine();
      if (row.isBlank()) {
        continue;
      }
      if (row.indexOf('"') >= 0) {
        return Optional.of(quoted(start, first, row));
      }
      return Optional.of(
          row.indexOf('\r') < 0
              ? new Cut(first, split(row), "")
              : wrong(first, "a carriage return stands alone; end lines with LF or CR LF"));
    }
    return Optional.empty();
  }

  private String nextLine() {
    int end = text.indexOf('\n', at);
    int stop = end < 0 ? text.length() : end;
    int last = stop > at && text.charAt(stop - 1) == '\r' ? stop - 1 : stop;
    String row = text.substring(at, last);
    at = end < 0 ? text.length() : end + 1;
    line++;
    return row;
  }

  private static Cut wrong(int line, String problem) {
    return new Cut(line, List.of(), problem);
  }

  private static List<String> split(String row) {
    List<String> cells = new ArrayList<>();
    int from = 0;
    for (int comma = row.indexOf(','); comma >= 0; comma = row.indexOf(',', from)) {
      cells.add(row.substring(from, comma));
      from = comma + 1;
    }
    cells.add(row.substring(from));
    return cells;
  }

  /** A record with quotes in it, perhaps over several lines. */
  private Cut quoted(int start, int first, String firstRow) {
    int openedLine = 0; // of the quote that is open; 0 where none is
    int afterOpened = 0; // where the text goes on below that line
    String row = firstRow;
    int end = start + row.length();
    for (int lines = 1; ; lines++) {
      int walked = walk(row, openedLine > 0);
      if (walked == STRAY && openedLine == 0) {
        return wrong(
            line - 1,
            "a quote stands inside a cell; put the whole cell in quotes and double those in it");
      } else if (walked == CLOSED) {
        return cells(first, text.substring(start, end));
      } else if (walked == OPENED_HERE || (walked == STILL_OPEN && openedLine == 0)) {
        openedLine = line - 1;
        afterOpened = at;
      }
      if (walked == STRAY || at >= text.length() || lines >= MOST_LINES) {
        at = afterOpened; // the lines below were not meant to belong to the open cell
        line = openedLine + 1;
        return wrong(openedLine, "a quote is opened and not closed");
      }
      int from = at;
      row = nextLine();
      end = from + row.length();
    }
  }

  /** What one line does to the quotes. */
  private static int walk(String row, boolean openBefore) {
    boolean open = openBefore;
    boolean openedHere = false;
    for (int i = 0; i < row.length(); i++) {
      if (row.charAt(i) != '"') {
        continue;
      }
      if (!open) {
        if (i > 0 && row.charAt(i - 1) != ',') {
          return STRAY;
        }
        open = true;
        openedHere = true;
      } else if (i + 1 < row.length() && row.charAt(i + 1) == '"') {
        i++;
      } else if (i + 1 == row.length() || row.charAt(i + 1) == ',') {
        open = false;
      } else {
        return STRAY;
      }
    }
    return open ? (openedHere ? OPENED_HERE : STILL_OPEN) : CLOSED;
  }

  private Cut cells(int first, String record) {
    try {
      return new Cut(first, List.of(parser.parseLine(record)), "");
    } catch (IOException e) {
      return wrong(first, "a quote is opened and not closed");
    }
  }

  /** Where the text goes on behind the last record. */
  int at() {
    return at;
  }

  /** The number of the line there. */
  int line() {
    return line;
  }
}
