package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.fail;

import ebbline.curve.DiscountCurve;
import ebbline.time.CalendarRegistry;
import ebbline.time.InputProblems;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.function.Consumer;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Files that are well formed and mean nothing sensible: extreme figures in every place. */
class HostileInputTest {
  private static final int FILES = Integer.getInteger("mutations", 2_000);
  private static final String[] FIGURES = {
    "0",
    "-0",
    "1",
    "-1",
    "0.5",
    "1e-300",
    "-1e-300",
    "4.9e-324",
    "1e-9",
    "1e9",
    "1e300",
    "-1e300",
    "1.7976931348623157e308",
    "1e999",
    "1e-999",
    "NaN",
    "Infinity",
    "-inf",
    "1e",
    "0x10",
    "1d",
    "1f",
    "100%",
    "-100%",
    "99999999%",
    "1e300%",
    "1e-300bp",
    "4.25",
    "1,5",
    "1M",
    "0D",
    "999Y",
    "9999M",
    "9999-12-31",
    "0000-01-01",
    "2026-02-30",
    "2026-11-30",
    "2027-11-30",
    "+1",
    ".",
    "",
    " ",
    "\"",
    "१",
    "1\u00a0",
    "\u0000",
    "\u001b[31m",
    "=1+1",
    "null",
    "true",
    "x".repeat(5000)
  };
  private static final String[] SETTINGS = {
    "# interpolation: log-linear",
    "# interpolation: linear-zero",
    "# interpolation: cubic",
    "# interpolation: monotone-convex",
    "# interpolation: smith-wilson",
    "# compounding: simple",
    "# compounding: annual",
    "# compounding: monthly",
    "# day-count: act/360",
    "# day-count: act/365.25",
    "# as-of: 2026-11-30",
    "# as-of: 9999-12-31",
    "# as-of: 0000-01-01",
    "# form: svensson",
    "# form: nelson-siegel"
  };

  @TempDir private Path folder;

  private static String figure(Random random) {
    return random.nextInt(3) == 0
        ? Integer.toString(1 + random.nextInt(40))
        : FIGURES[random.nextInt(FIGURES.length)];
  }

  private void check(
      long seed, java.util.function.Function<Random, String> maker, Consumer<String> reader)
      throws IOException {
    Path file = folder.resolve("input");
    Random random = new Random(seed);
    for (int i = 0; i < FILES; i++) {
      String text = maker.apply(random);
      Files.writeString(file, text);
      try {
        reader.accept(file.toString());
      } catch (InputProblems expected) {
        for (var problem : expected.problems()) {
          assertThat(problem.message()).hasSizeLessThan(600).doesNotContain("\n", "\u001b");
        }
      } catch (RuntimeException e) {
        fail("seed " + seed + ", file " + i + ": " + text, e);
      }
    }
  }

  private static String nodes(Random random) {
    StringBuilder text = new StringBuilder();
    for (int i = random.nextInt(3); i > 0; i--) {
      text.append(SETTINGS[random.nextInt(SETTINGS.length - 2)]).append('\n');
    }
    boolean discounts = random.nextBoolean();
    text.append(discounts ? "maturity,discount\n" : "maturity,zero\n");
    double t = 0;
    for (int i = 1 + random.nextInt(5); i > 0; i--) {
      boolean tame = random.nextInt(3) > 0;
      t += random.nextInt(4) == 0 ? Math.pow(10, random.nextInt(300) - 290) : 1;
      text.append(tame ? Double.toString(t) : figure(random)).append(',');
      double size = Math.pow(10, random.nextInt(20) - 10);
      text.append(tame && discounts ? Double.toString(size) : tame ? size + "bp" : figure(random))
          .append('\n');
    }
    return text.toString();
  }

  private static String formula(Random random) {
    StringBuilder text = new StringBuilder(SETTINGS[SETTINGS.length - 1 - random.nextInt(2)]);
    text.append("\nparameter,value\n");
    for (String name : List.of("beta0", "beta1", "beta2", "beta3", "tau1", "tau2")) {
      if (!text.toString().contains("siegel") || !name.matches("beta3|tau2")) {
        text.append(name).append(',').append(figure(random)).append('\n');
      }
    }
    return text.toString();
  }

  private static void requireFinite(String path) {
    DiscountCurve curve = CurveFile.read(path, Optional.empty(), Optional.empty()).curve();
    for (double t : curve.nodes()) {
      assertThat(Math.exp(curve.logDiscount(t))).isFinite().isPositive();
      assertThat(curve.zero(t)).isFinite();
      assertThat(curve.forward(t)).isFinite();
    }
  }

  @Test
  void curvesOfExtremeNodesAreRefusedOrFinite() throws IOException {
    check(21, HostileInputTest::nodes, HostileInputTest::requireFinite);
  }

  @Test
  void formulaeOfExtremeParametersAreRefusedOrRead() throws IOException {
    check(22, HostileInputTest::formula, HostileInputTest::requireFinite);
  }

  @Test
  void booksOfExtremeCellsGiveAnEntryForEveryRow() throws IOException {
    String[] kinds = {"bond", "zero-bond", "zero-option", "bond-option", "callable-bond", "bnd"};
    check(
        23,
        random -> {
          StringBuilder text =
              new StringBuilder(
                  "id,instrument,face,maturity,coupon,frequency,expiry,kind,strike,settle_days\n");
          for (int i = 0; i < 4; i++) {
            text.append("r").append(i).append(',').append(kinds[random.nextInt(kinds.length)]);
            for (int c = 0; c < 8; c++) {
              String cell = c == 5 && random.nextBoolean() ? "call" : figure(random);
              text.append(',')
                  .append(random.nextInt(4) == 0 ? "" : cell.replace(',', ';').replace('"', '?'));
            }
            text.append('\n');
          }
          return text.toString();
        },
        path -> {
          int[] rows = {0};
          BookFile.open(path, CalendarRegistry.standard()).forEach(entry -> rows[0]++);
          assertThat(rows[0]).isEqualTo(4);
        });
  }

  private static String model(Random random) {
    boolean vasicek = random.nextBoolean();
    String steps = "[{'until':" + member(random) + ",'value':0.01},{'value':0.01}]";
    return ("{'format':'ebbline-model/1','model':'"
            + (vasicek ? "vasicek" : "hull-white")
            + "','measure':'risk-neutral','as_of':"
            + (random.nextBoolean() ? "null" : "'2026-11-30'")
            + ",'mean_reversion':"
            + member(random)
            + ",'volatility':"
            + (random.nextBoolean() ? member(random) : steps)
            + (vasicek ? ",'short_rate':" + member(random) : "")
            + (vasicek ? ",'long_run_mean':" + member(random) : "")
            + ",'curve':{'interpolation':'cubic','nodes':[{'time':"
            + member(random)
            + ",'discount':"
            + member(random)
            + "},{'time':2,'discount':"
            + member(random)
            + "}]}}")
        .replace('\'', '"');
  }

  @Test
  void modelsOfExtremeMembersAreRefusedOrRead() throws IOException {
    check(24, HostileInputTest::model, path -> ModelFile.read(path).axis());
  }

  private static String member(Random random) {
    return random.nextInt(3) > 0 ? "0.5" : figure(random).replace("\u0000", "");
  }

  @Test
  void endlessFilesAreNotRead() {
    Path zeros = Path.of("/dev/zero");
    if (Files.exists(zeros)) {
      assertThatThrownBy(() -> SourceFile.read(zeros.toString()))
          .hasMessage("/dev/zero:1: the file is binary; a text file was expected");
    }
  }

  @Test
  void aFileThatIsTooLargeIsNamedAsSuch() throws IOException {
    Path file = folder.resolve("large.csv");
    byte[] chunk = "1234567\n".repeat(1 << 17).getBytes(java.nio.charset.StandardCharsets.UTF_8);
    try (var out = Files.newOutputStream(file)) {
      for (int i = 0; i < 65; i++) {
        out.write(chunk);
      }
    }
    assertThatThrownBy(() -> SourceFile.read(file.toString()))
        .hasMessage(
            file
                + ": the file is larger than 64 MiB; curves, quotes, histories and models are smaller");
  }

  @Test
  void messagesStayOnOneShortLine() throws IOException {
    Path file = folder.resolve("book.csv");
    Files.writeString(file, "maturity,coupon\n\"\u001b[2J\n" + "y".repeat(300) + "\",4%\n");
    BookFile.open(file.toString(), CalendarRegistry.standard())
        .forEach(
            entry ->
                assertThat(((BookEntry.Bad) entry).message())
                    .contains("found '·[2J·" + "y".repeat(55) + "…'")
                    .hasSizeLessThan(400));
  }
}
