package ebbline.data;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonLocation;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.JsonToken;
import com.fasterxml.jackson.core.StreamReadConstraints;
import com.fasterxml.jackson.core.StreamReadFeature;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.io.IOException;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * A value of a JSON text that knows where it stands, so that whatever is wrong with it can be said
 * with line and column. Numbers keep all their digits.
 *
 * @param source file
 * @param path members on the way to it, {@code curve.nodes[3].time}
 * @param line from 1
 * @param column from 1
 * @param value a Map, a List, a BigDecimal, a String, a Boolean or null
 */
record JsonValue(String source, String path, int line, int column, Object value) {
  private static final int DEEPEST = 20;
  private static final int MOST_SHOWN = 80;
  private static final JsonFactory FACTORY =
      JsonFactory.builder()
          .enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION)
          .streamReadConstraints(
              StreamReadConstraints.builder().maxNumberLength(100).maxNestingDepth(DEEPEST).build())
          .build();

  /**
   * @throws InputProblems if the text is no JSON, is cut off, or repeats a member
   */
  static JsonValue parse(SourceFile file) {
    try (JsonParser parser = FACTORY.createParser(file.text())) {
      parser.nextToken();
      JsonValue value = value(file, parser, "");
      if (parser.nextToken() != null) {
        throw problem(
            file.path(), parser.currentTokenLocation(), "", "text after the end of the model");
      }
      return value;
    } catch (JsonProcessingException e) {
      String said = e.getOriginalMessage().lines().findFirst().orElse("");
      String what =
          said.contains("end-of-input")
              ? "the file ends in the middle of a value; it was cut off"
              : "this is no valid JSON: " + said;
      throw problem(file.path(), e.getLocation(), "", what);
    } catch (IOException e) {
      throw new java.io.UncheckedIOException(e);
    }
  }

  private static InputProblems problem(
      String source, JsonLocation at, String value, String expected) {
    int line = at == null ? 0 : at.getLineNr();
    String place = at == null ? "" : Integer.toString(at.getColumnNr());
    return InputProblems.of(new InputProblem(source, line, place, value, expected));
  }

  private static JsonValue value(SourceFile file, JsonParser parser, String path)
      throws IOException {
    JsonLocation at = parser.currentTokenLocation();
    JsonToken token = parser.currentToken();
    Object value;
    if (token == JsonToken.START_OBJECT) {
      Map<String, JsonValue> members = new LinkedHashMap<>();
      while (parser.nextToken() != JsonToken.END_OBJECT) {
        String name = parser.currentName();
        parser.nextToken();
        members.put(name, value(file, parser, path.isEmpty() ? name : path + "." + name));
      }
      value = members;
    } else if (token == JsonToken.START_ARRAY) {
      List<JsonValue> items = new ArrayList<>();
      while (parser.nextToken() != JsonToken.END_ARRAY) {
        items.add(value(file, parser, path + "[" + items.size() + "]"));
      }
      value = items;
    } else if (token == null) {
      throw problem(file.path(), at, "", "the file holds no JSON value");
    } else if (token.isNumeric()) {
      value = parser.getDecimalValue();
    } else if (token == JsonToken.VALUE_STRING) {
      value = parser.getText();
    } else if (token == JsonToken.VALUE_NULL) {
      value = null;
    } else {
      value = token == JsonToken.VALUE_TRUE;
    }
    return new JsonValue(file.path(), path, at.getLineNr(), at.getColumnNr(), value);
  }

  InputProblems wrong(String expected) {
    String found =
        value instanceof Map || value instanceof List || value == null ? "" : value.toString();
    return InputProblems.of(
        new InputProblem(
            source,
            line,
            Integer.toString(column),
            found,
            (path.isEmpty() ? "" : "member '" + end(path) + "': ") + expected));
  }

  private static String end(String path) {
    return path.length() <= MOST_SHOWN ? path : "…" + path.substring(path.length() - MOST_SHOWN);
  }

  /** Refuses members that are not known. */
  JsonValue knowing(Set<String> known) {
    members()
        .forEach(
            (name, member) -> {
              if (!known.contains(name)) {
                throw member.wrong(
                    "there is no such member; did you mean '"
                        + NearestName.of(name, known.stream().sorted().toList())
                        + "'?");
              }
            });
    return this;
  }

  Map<String, JsonValue> members() {
    if (value instanceof Map<?, ?> map) {
      Map<String, JsonValue> members = new LinkedHashMap<>();
      map.forEach((name, member) -> members.put((String) name, (JsonValue) member));
      return members;
    }
    throw wrong("expected an object");
  }

  boolean has(String name) {
    JsonValue member = members().get(name);
    return member != null && member.value() != null;
  }

  JsonValue member(String name) {
    JsonValue member = members().get(name);
    if (member == null) {
      throw wrong("the member '" + name + "' is missing");
    }
    return member;
  }

  List<JsonValue> items() {
    if (value instanceof List<?> list) {
      List<JsonValue> items = new ArrayList<>();
      list.forEach(item -> items.add((JsonValue) item));
      return items;
    }
    throw wrong("expected a list");
  }

  boolean isList() {
    return value instanceof List;
  }

  BigDecimal decimal() {
    if (value instanceof BigDecimal number) {
      return number;
    }
    throw wrong("expected a number");
  }

  double number() {
    double number = decimal().doubleValue();
    if (Double.isFinite(number)) {
      return number;
    }
    throw wrong("expected a finite number");
  }

  int integer() {
    double number = number();
    if (number == Math.rint(number) && Math.abs(number) < 1e9) {
      return (int) number;
    }
    throw wrong("expected a whole number");
  }

  String text() {
    if (value instanceof String text) {
      return text;
    }
    throw wrong("expected a text");
  }

  boolean flag() {
    if (value instanceof Boolean flag) {
      return flag;
    }
    throw wrong("expected true or false");
  }
}
