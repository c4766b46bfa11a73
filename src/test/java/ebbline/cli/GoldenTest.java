package ebbline.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;

/**
 * Command lines and what they print. A case is two files: {@code NAME.args}, one argument a line,
 * and {@code NAME.txt}, exit status, standard output, standard error. Numbers are compared with a
 * tolerance, because the last bit of an exponential may differ between JVMs. To rewrite all cases
 * and then read the difference: {@code mvn test -Dtest=GoldenTest -Dgolden.write=true}.
 */
class GoldenTest {
  private static final Path CASES = Path.of("src", "test", "resources", "golden");
  private static final double RELATIVE = 2e-6;

  /** Below this, a figure is an error bound or rounding noise: only its smallness counts. */
  private static final double NOISE = 1e-8;

  @TestFactory
  Stream<DynamicTest> everyCasePrintsWhatItsFileSays() throws IOException {
    try (Stream<Path> files = Files.list(CASES)) {
      List<Path> cases = files.filter(f -> f.toString().endsWith(".args")).sorted().toList();
      assertThat(cases).hasSizeGreaterThan(30);
      return cases.stream()
          .map(c -> DynamicTest.dynamicTest(c.getFileName().toString(), () -> run(c)));
    }
  }

  @Test
  void noExpectationIsAnOrphan() throws IOException {
    try (Stream<Path> files = Files.list(CASES)) {
      assertThat(files.filter(f -> f.toString().endsWith(".txt")))
          .allMatch(f -> Files.exists(Path.of(f.toString().replaceAll("txt$", "args"))));
    }
  }

  private static void run(Path args) throws IOException {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    String[] words = Files.readAllLines(args).toArray(new String[0]);
    int status =
        Ebbline.run(
            words,
            new PrintStream(out, true, StandardCharsets.UTF_8),
            new PrintStream(err, true, StandardCharsets.UTF_8));
    String printed =
        masked(
            "exit "
                + status
                + "\n--- out\n"
                + out.toString(StandardCharsets.UTF_8)
                + "--- err\n"
                + err.toString(StandardCharsets.UTF_8));
    Path expected = Path.of(args.toString().replaceAll("args$", "txt"));
    if (Boolean.getBoolean("golden.write")) {
      Files.writeString(expected, printed);
    }
    assertSame(Files.readString(expected), printed);
  }

  /** How long a method took is not the case's business: the figures of columns headed so. */
  private static String masked(String printed) {
    StringBuilder text = new StringBuilder();
    int field = -1;
    int end = -1;
    for (String line : printed.replaceAll("(\"seconds\" ?: ?)[^,}\\s]+", "$1…").split("\n", -1)) {
      String shown = line;
      if (line.contains(",seconds,")) {
        field = line.substring(0, line.indexOf(",seconds,")).split(",", -1).length;
      } else if (line.contains(" seconds ")) {
        end = line.indexOf(" seconds ") + " seconds".length();
      } else if (line.startsWith("---")) {
        field = -1;
        end = -1;
      } else if (field >= 0 && line.split(",", -1).length > field) {
        String[] cells = line.split(",", -1);
        cells[field] = cells[field].isEmpty() ? "" : "…";
        shown = String.join(",", cells);
      } else if (end >= 0 && line.length() >= end && line.charAt(end - 1) != ' ') {
        int from = line.lastIndexOf(' ', end - 1);
        shown = line.substring(0, from + 1) + "…" + line.substring(end);
      }
      text.append(shown).append('\n');
    }
    return text.substring(0, text.length() - 1);
  }

  private static void assertSame(String expected, String printed) {
    List<String> wanted = expected.lines().toList();
    List<String> found = printed.lines().toList();
    for (int i = 0; i < Math.min(wanted.size(), found.size()); i++) {
      assertThat(sameLine(wanted.get(i), found.get(i)))
          .as("line %d:%nexpected: %s%nprinted:  %s", i + 1, wanted.get(i), found.get(i))
          .isTrue();
    }
    assertThat(found).as(printed).hasSameSizeAs(wanted);
  }

  private static boolean sameLine(String wanted, String found) {
    if (wanted.equals(found) || (isSteps(wanted) && isSteps(found))) {
      return true;
    }
    String[] a = wanted.split("[\\s,]+", -1);
    String[] b = found.split("[\\s,]+", -1);
    if (a.length != b.length) {
      return false;
    }
    for (int i = 0; i < a.length; i++) {
      if (!a[i].equals(b[i]) && !sameNumber(a[i], b[i])) {
        return false;
      }
    }
    return true;
  }

  /** How many steps a search takes hangs on last bits. */
  private static boolean isSteps(String line) {
    return line.matches("\\W*iterations\\W+\\d+,?");
  }

  private static boolean sameNumber(String a, String b) {
    String number = "[+-]?\\d+(\\.\\d+)?([eE][+-]?\\d+)?%?";
    if (!a.matches(number) || !b.matches(number)) {
      return false;
    }
    double x = Double.parseDouble(a.replace("%", ""));
    double y = Double.parseDouble(b.replace("%", ""));
    return Math.abs(x - y) <= Math.max(NOISE, RELATIVE * Math.abs(x));
  }
}
