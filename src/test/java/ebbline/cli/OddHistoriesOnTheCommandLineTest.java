package ebbline.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Whatever the history, the answer is a finite figure or a sentence, and never a fault. */
class OddHistoriesOnTheCommandLineTest {
  private static final int HISTORIES = Integer.getInteger("odd.histories", 60);
  private static final String[] METHODS = {"ols", "exact", "stationary", "yule-walker"};

  @TempDir private Path folder;

  private static String history(Random random) {
    int n = 1 + random.nextInt(18);
    double scale = Math.pow(10, -1 - random.nextInt(9));
    double slope = 2.4 * random.nextDouble() - 0.7;
    double rate = 0.03;
    StringBuilder text = new StringBuilder("rate\n");
    for (int i = 0; i < n; i++) {
      switch (random.nextInt(12)) {
        case 0 -> text.append("\"\"\n");
        case 1 -> text.append("0.03\n");
        default -> text.append(Math.max(-0.9, Math.min(0.9, rate))).append('\n');
      }
      rate = 0.02 + slope * (rate - 0.02) + scale * random.nextGaussian();
    }
    return text.toString();
  }

  @Test
  void noAnswerIsAFaultOrNotANumber() throws IOException {
    Random random = new Random(20);
    Path file = folder.resolve("history.csv");
    for (int i = 0; i < HISTORIES; i++) {
      String history = history(random);
      Files.writeString(file, history);
      ByteArrayOutputStream out = new ByteArrayOutputStream();
      ByteArrayOutputStream err = new ByteArrayOutputStream();
      int status =
          Ebbline.run(
              new String[] {
                "estimate",
                "--history=" + file,
                "--step=" + (random.nextBoolean() ? "1M" : "1/250"),
                "--method=" + METHODS[i % METHODS.length],
                "--bias=" + (random.nextBoolean() ? "jackknife" : "bootstrap"),
                "--replications=99",
                "--curve=flat:3%",
                "--horizons=1M,30",
                "--save=" + folder.resolve("model.json"),
                "--format=json"
              },
              new PrintStream(out, true, StandardCharsets.UTF_8),
              new PrintStream(err, true, StandardCharsets.UTF_8));
      String said = out.toString(StandardCharsets.UTF_8) + err.toString(StandardCharsets.UTF_8);
      assertThat(status).as(history + said).isIn(0, 1, 2);
      assertThat(said).as(history).doesNotContain("NaN").doesNotContain("Infinity");
      if (status == 2) {
        assertThat(said).contains("yule-walker needs evenly spaced");
      }
    }
  }

  @Test
  void aPanelThatNeverMovesShowsNoPriceOfRisk() throws IOException {
    StringBuilder panel = new StringBuilder("1Y,5Y,10Y\n");
    for (int i = 0; i < 20; i++) {
      panel.append("0.03,0.04,0.05\n");
    }
    Path file = folder.resolve("panel.csv");
    Files.writeString(file, panel);
    Path model = folder.resolve("model.json");
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    int status =
        Ebbline.run(
            new String[] {
              "estimate", file.toString(), "--method=panel", "--step=1M", "--save=" + model
            },
            new PrintStream(out, true, StandardCharsets.UTF_8),
            new PrintStream(new ByteArrayOutputStream(), true, StandardCharsets.UTF_8));
    assertThat(status).isEqualTo(1);
    assertThat(out.toString(StandardCharsets.UTF_8))
        .contains("are not identified")
        .doesNotContain("market_price_of_risk")
        .doesNotContain("long_run_mean");
    assertThat(model).doesNotExist();
  }
}
