package ebbline.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.TestFactory;

/** Every help text ends with two examples that run as printed from the project's root. */
class HelpExamplesTest {
  private static final String PROGRAM = "java -jar target/ebbline.jar ";
  private static final Pattern WORD = Pattern.compile("'([^']*)'|(\\S+)");

  private static String run(int status, String... args) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    int ended =
        Ebbline.run(
            args,
            new PrintStream(out, true, StandardCharsets.UTF_8),
            new PrintStream(err, true, StandardCharsets.UTF_8));
    assertThat(ended).as(err.toString(StandardCharsets.UTF_8)).isEqualTo(status);
    return out.toString(StandardCharsets.UTF_8);
  }

  @TestFactory
  Stream<DynamicTest> theExamplesOfEveryHelpTextRun() {
    List<String[]> helps = new ArrayList<>();
    helps.add(new String[] {"--help"});
    Matcher commands =
        Pattern.compile("^  ([a-z]+)  +\\S", Pattern.MULTILINE).matcher(run(0, "--help"));
    while (commands.find()) {
      helps.add(new String[] {commands.group(1), "--help"});
    }
    assertThat(helps).hasSizeGreaterThanOrEqualTo(5);
    return helps.stream()
        .map(help -> DynamicTest.dynamicTest(String.join(" ", help), () -> check(help)));
  }

  private static void check(String[] help) {
    String text = run(0, help);
    assertThat(text).contains("A calculation aid, not advice");
    assertThat(text.lines()).allMatch(line -> line.length() <= 80);
    String footer = text.substring(text.indexOf("Examples (from the project's root):"));
    List<String> examples =
        footer.replace("\\\n", " ").lines().skip(1).filter(line -> !line.isBlank()).toList();
    assertThat(examples).hasSize(2);
    for (String example : examples) {
      assertThat(example.strip()).startsWith(PROGRAM);
      List<String> words = new ArrayList<>();
      Matcher word = WORD.matcher(example.strip().substring(PROGRAM.length()));
      while (word.find()) {
        words.add(word.group(1) == null ? word.group(2) : word.group(1));
      }
      assertThat(run(0, words.toArray(new String[0]))).isNotBlank();
    }
  }
}
