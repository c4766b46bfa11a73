package ebbline.data;

import ebbline.time.CalendarRegistry;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** One row of a book typed on the command line, {@code key=value key="two words"}. */
public final class RowText {
  private RowText() {}

  /**
   * Reads a row.
   *
   * @param option how the message calls the place, {@code --row}
   * @param number of the row, its label where it has none
   * @param calendars that the row may name
   * @throws IllegalArgumentException in words if the text is no list of pairs, or a key is unknown
   *     or repeated; a value that is wrong makes a bad entry instead
   */
  public static BookEntry parse(
      String text, String option, int number, CalendarRegistry calendars) {
    Map<String, String> pairs = pairs(text);
    List<Column> columns = new ArrayList<>();
    Map<String, String> seen = new LinkedHashMap<>();
    for (String key : pairs.keySet()) {
      Column column = Column.of(key, BookColumns.LAYOUT);
      if (!column.isKnown(BookColumns.LAYOUT)) {
        throw new IllegalArgumentException(
            "a row has no key '"
                + key
                + "'; did you mean '"
                + NearestName.of(column.name(), BookColumns.LAYOUT.known())
                + "'?");
      }
      if (seen.put(column.name(), key) != null) {
        throw new IllegalArgumentException("the key '" + column.name() + "' is given twice");
      }
      columns.add(column);
    }
    String[] cells = pairs.values().toArray(new String[0]);
    return BookRows.entry(
        new CsvRow(option, 0, columns, cells, new ArrayList<>()), number, calendars);
  }

  private static Map<String, String> pairs(String text) {
    Map<String, String> pairs = new LinkedHashMap<>();
    int at = 0;
    while (true) {
      while (at < text.length() && Character.isWhitespace(text.charAt(at))) {
        at++;
      }
      if (at == text.length()) {
        break;
      }
      int equals = text.indexOf('=', at);
      if (equals < 0 || text.substring(at, equals).matches(".*\\s.*")) {
        throw new IllegalArgumentException(
            "expected key=value pairs, found '" + word(text, at) + "'");
      }
      String key = text.substring(at, equals);
      StringBuilder value = new StringBuilder();
      at = value(text, equals + 1, key, value);
      if (key.isEmpty()) {
        throw new IllegalArgumentException("a value without a key: '=" + value + "'");
      }
      if (pairs.put(key, value.toString()) != null) {
        throw new IllegalArgumentException("the key '" + key + "' is given twice");
      }
    }
    if (pairs.isEmpty()) {
      throw new IllegalArgumentException("expected key=value pairs, found nothing");
    }
    return pairs;
  }

  private static int value(String text, int from, String key, StringBuilder value) {
    int at = from;
    if (at < text.length() && text.charAt(at) == '"') {
      int end = text.indexOf('"', at + 1);
      if (end < 0) {
        throw new IllegalArgumentException("the quote of '" + key + "' is not closed");
      }
      value.append(text, at + 1, end);
      return end + 1;
    }
    while (at < text.length() && !Character.isWhitespace(text.charAt(at))) {
      value.append(text.charAt(at++));
    }
    return at;
  }

  private static String word(String text, int from) {
    int end = from;
    while (end < text.length() && !Character.isWhitespace(text.charAt(end))) {
      end++;
    }
    return text.substring(from, end);
  }
}
