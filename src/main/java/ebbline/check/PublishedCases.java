package ebbline.check;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;

/** Reads the published cases that the program ships, RFC 4180 text with a header. */
final class PublishedCases {
  private PublishedCases() {}

  /**
   * @param name file of {@code ebbline/published/} without its ending
   */
  static List<PublishedCase> read(String name) {
    List<List<String>> rows = rows(text("/ebbline/published/" + name + ".csv"));
    List<String> header = rows.get(0);
    List<PublishedCase> cases = new ArrayList<>();
    for (List<String> row : rows.subList(1, rows.size())) {
      cases.add(
          new PublishedCase(
              cell(header, row, "id"),
              cell(header, row, "topic"),
              cell(header, row, "inputs"),
              cell(header, row, "published"),
              cell(header, row, "recomputed"),
              cell(header, row, "provenance"),
              cell(header, row, "source")));
    }
    return List.copyOf(cases);
  }

  private static String cell(List<String> header, List<String> row, String column) {
    return row.get(header.indexOf(column));
  }

  static String text(String resource) {
    try (InputStream in = PublishedCases.class.getResourceAsStream(resource)) {
      if (in == null) {
        throw new IllegalStateException("the program lacks its resource " + resource);
      }
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static List<List<String>> rows(String text) {
    List<List<String>> rows = new ArrayList<>();
    List<String> row = new ArrayList<>();
    StringBuilder cell = new StringBuilder();
    boolean quoted = false;
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      if (quoted) {
        if (c != '"') {
          cell.append(c);
        } else if (i + 1 < text.length() && text.charAt(i + 1) == '"') {
          cell.append('"');
          i++;
        } else {
          quoted = false;
        }
      } else if (c == '"') {
        quoted = true;
      } else if (c == ',' || c == '\n') {
        row.add(cell.toString());
        cell.setLength(0);
        if (c == '\n') {
          rows.add(row);
          row = new ArrayList<>();
        }
      } else if (c != '\r') {
        cell.append(c);
      }
    }
    return rows;
  }
}
