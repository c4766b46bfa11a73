package ebbline.check;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * The inputs of one published case: a JSON object of numbers, texts, lists and objects.
 *
 * <p>The case files are the program's own resources, so a fault in one is a fault of ours and is
 * thrown as {@link IllegalArgumentException}.
 */
final class CaseInputs {
  private final Map<String, Object> members;

  private CaseInputs(Map<String, Object> members) {
    this.members = members;
  }

  static CaseInputs parse(String json) {
    Parser parser = new Parser(json);
    Object value = parser.value();
    parser.end();
    return of(value);
  }

  private static CaseInputs of(Object value) {
    if (!(value instanceof Map<?, ?> map)) {
      throw new IllegalArgumentException("expected an object, found " + value);
    }
    Map<String, Object> members = new LinkedHashMap<>();
    map.forEach((key, member) -> members.put((String) key, member));
    return new CaseInputs(Collections.unmodifiableMap(members));
  }

  boolean has(String name) {
    return members.get(name) != null;
  }

  List<String> names() {
    return List.copyOf(members.keySet());
  }

  /** A number, or a text that holds one. */
  double number(String name) {
    return asNumber(member(name));
  }

  /** A number that may be left out. */
  double number(String name, double otherwise) {
    return has(name) ? number(name) : otherwise;
  }

  int integer(String name) {
    double value = number(name);
    if (value != Math.rint(value)) {
      throw new IllegalArgumentException(name + " must be whole, found " + value);
    }
    return (int) value;
  }

  /** A text as it stands; a number as it is written. */
  String text(String name) {
    return String.valueOf(member(name));
  }

  boolean flag(String name) {
    return member(name).equals(true);
  }

  double[] numbers(String name) {
    List<?> list = list(name);
    return list.stream().mapToDouble(CaseInputs::asNumber).toArray();
  }

  List<?> list(String name) {
    if (member(name) instanceof List<?> list) {
      return list;
    }
    throw new IllegalArgumentException(name + " must be a list, found " + member(name));
  }

  CaseInputs object(String name) {
    return of(member(name));
  }

  static double asNumber(Object value) {
    if (value instanceof Number number) {
      return number.doubleValue();
    }
    return Double.parseDouble(String.valueOf(value));
  }

  private Object member(String name) {
    Object value = members.get(name);
    if (value == null) {
      throw new IllegalArgumentException("no input '" + name + "' among " + members.keySet());
    }
    return value;
  }

  /** Recursive descent over the text. */
  private static final class Parser {
    private final String text;
    private int at;

    Parser(String text) {
      this.text = text;
    }

    void end() {
      blanks();
      if (at < text.length()) {
        throw fault("end of text");
      }
    }

    Object value() {
      blanks();
      char c = at < text.length() ? text.charAt(at) : ' ';
      if (c == '{') {
        return object();
      } else if (c == '[') {
        return array();
      } else if (c == '"') {
        return string();
      }
      return literal();
    }

    private Map<String, Object> object() {
      Map<String, Object> map = new LinkedHashMap<>();
      at++;
      while (!taken('}')) {
        if (!map.isEmpty()) {
          need(',');
        }
        blanks();
        String key = string();
        need(':');
        map.put(key, value());
      }
      return map;
    }

    private List<Object> array() {
      List<Object> list = new ArrayList<>();
      at++;
      while (!taken(']')) {
        if (!list.isEmpty()) {
          need(',');
        }
        list.add(value());
      }
      return list;
    }

    private String string() {
      need('"');
      int from = at;
      while (at < text.length() && text.charAt(at) != '"') {
        if (text.charAt(at) == '\\') {
          throw fault("a text without escapes");
        }
        at++;
      }
      need('"');
      return text.substring(from, at - 1);
    }

    private Object literal() {
      int from = at;
      while (at < text.length() && ",]} \n".indexOf(text.charAt(at)) < 0) {
        at++;
      }
      String word = text.substring(from, at);
      if (word.equals("true") || word.equals("false")) {
        return Boolean.valueOf(word);
      }
      if (word.equals("null")) {
        return null;
      }
      try {
        return word.matches("-?\\d{1,9}") ? Integer.valueOf(word) : (Object) Double.valueOf(word);
      } catch (NumberFormatException e) {
        throw fault("a value");
      }
    }

    private boolean taken(char c) {
      blanks();
      if (at < text.length() && text.charAt(at) == c) {
        at++;
        return true;
      }
      return false;
    }

    private void need(char c) {
      if (!taken(c)) {
        throw fault("'" + c + "'");
      }
    }

    private void blanks() {
      while (at < text.length() && Character.isWhitespace(text.charAt(at))) {
        at++;
      }
    }

    private IllegalArgumentException fault(String expected) {
      return new IllegalArgumentException(
          "expected " + expected + " at character " + at + " of " + text);
    }
  }
}
