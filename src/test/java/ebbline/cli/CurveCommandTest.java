package ebbline.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CurveCommandTest {
  private static final String SHEET = "curves/saltmere-quotes.csv";
  private static final String YEARS = "src/test/resources/golden/files/quotes-years.csv";

  @TempDir Path folder;
  private final ByteArrayOutputStream err = new ByteArrayOutputStream();

  private int run(ByteArrayOutputStream out, String... args) {
    err.reset();
    return Ebbline.run(
        args,
        new PrintStream(out, true, StandardCharsets.UTF_8),
        new PrintStream(err, true, StandardCharsets.UTF_8));
  }

  private String printed(int status, String... args) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    assertThat(run(out, args)).as(err.toString(StandardCharsets.UTF_8)).isEqualTo(status);
    return out.toString(StandardCharsets.UTF_8);
  }

  private List<String> files() throws IOException {
    try (Stream<Path> files = Files.list(folder)) {
      return files.map(f -> f.getFileName().toString()).sorted().toList();
    }
  }

  @Test
  void aSavedCurveIsShownAsTheBuiltOneWasByEveryInterpolation() {
    for (String how : List.of("log-linear", "linear-zero", "cubic", "monotone-convex")) {
      String saved = folder.resolve(how + ".csv").toString();
      String[] at = {"--at", "1D,1Y,2031-06-30,29.5,45", "--format", "csv"};
      String built =
          printed(0, with(at, "curve", "--quotes", SHEET, "--interpolation", how, "--save", saved));
      assertThat(printed(0, with(at, "curve", "--curve", saved))).isEqualTo(built);
    }
  }

  private static String[] with(String[] more, String... args) {
    String[] all = Arrays.copyOf(args, args.length + more.length);
    System.arraycopy(more, 0, all, args.length, more.length);
    return all;
  }

  @Test
  void kernelsAndFormulasAreShownAsTheyWereBuilt() {
    String[] at = {"--at", "0.1,1,10,60", "--format", "csv"};
    String saved = folder.resolve("saved.csv").toString();
    String kernels =
        printed(
            0,
            with(
                at,
                "curve",
                "--quotes",
                YEARS,
                "--interpolation",
                "smith-wilson",
                "--ultimate-forward",
                "3.45%",
                "--convergence",
                "60Y",
                "--save",
                saved));
    assertThat(printed(0, with(at, "curve", "--curve", saved))).isEqualTo(kernels);
    String formula =
        printed(
            0,
            with(
                at,
                "curve",
                "--curve",
                "curves/saltmere.csv",
                "--fit",
                "svensson",
                "--save",
                saved));
    assertThat(printed(0, with(at, "curve", "--curve", saved))).isEqualTo(formula);
  }

  @Test
  void aModelOnASmithWilsonCurveKeepsIt() {
    String saved = folder.resolve("kernels.csv").toString();
    String model = folder.resolve("model.json").toString();
    printed(
        0,
        "curve",
        "--quotes",
        YEARS,
        "--interpolation",
        "smith-wilson",
        "--ultimate-forward",
        "3.45%",
        "--convergence",
        "60Y",
        "--save",
        saved);
    printed(
        0,
        "calibrate",
        "--model",
        "hull-white",
        "--mean-reversion",
        "0.05",
        "--volatility",
        "1%",
        "--curve",
        saved,
        "--save",
        model);
    String[] row = {"--row", "instrument=bond maturity=30 coupon=4%", "--format", "csv"};
    assertThat(printed(0, with(row, "price", "--model", model)))
        .isEqualTo(
            printed(
                0,
                with(
                    row,
                    "price",
                    "--model",
                    "hull-white",
                    "--mean-reversion",
                    "0.05",
                    "--volatility",
                    "1%",
                    "--curve",
                    saved)));
  }

  @Test
  void aModelFileGivesTheConvexityOfFutures() {
    String model = folder.resolve("model.json").toString();
    printed(
        0,
        "calibrate",
        "--model",
        "hull-white",
        "--mean-reversion",
        "0.03",
        "--volatility",
        "1%",
        "--curve",
        "flat:4%",
        "--save",
        model);
    String[] at = {"--at", "0.75", "--format", "csv"};
    String given =
        printed(
            0,
            with(at, "curve", "--quotes", YEARS, "--mean-reversion", "0.03", "--volatility", "1%"));
    assertThat(printed(0, with(at, "curve", "--quotes", YEARS, "--model", model))).isEqualTo(given);
    assertThat(printed(0, with(at, "curve", "--quotes", YEARS))).isNotEqualTo(given);
    printed(2, "curve", "--quotes", YEARS, "--model", model, "--volatility", "1%");
  }

  @Test
  void badQuotesWriteNothing() throws IOException {
    Path bad = folder.resolve("bad.csv");
    Files.writeString(bad, "instrument,maturity,quote\nzero,1,4.25\n");
    printed(
        3,
        "curve",
        "--quotes",
        bad.toString(),
        "--save",
        folder.resolve("s.csv").toString(),
        "--svg",
        folder.resolve("s.svg").toString(),
        "--out",
        folder.resolve("o.txt").toString());
    assertThat(files()).containsExactly("bad.csv");
    printed(4, "curve", "--quotes", SHEET, "--save", folder.resolve("none/s.csv").toString());
    assertThat(files()).containsExactly("bad.csv");
  }

  @Test
  void thePictureIsWritten() throws IOException {
    printed(0, "curve", "--curve", "flat:3%", "--svg", folder.resolve("flat.svg").toString());
    assertThat(Files.readString(folder.resolve("flat.svg")))
        .startsWith("<svg")
        .endsWith("</svg>\n");
  }

  /** Rates, prices and dates that make no sense lead to words and a status, never to a fault. */
  @Test
  void nothingThatASheetSaysIsAFault() throws IOException {
    String[] lines = Files.readString(Path.of(YEARS)).split("\n", -1);
    String[] odd = {"", "-99%", "-0.5", "0", "1e-9", "99%", "40", "95", "1e300", "3M", "0.001"};
    Path file = folder.resolve("odd.csv");
    Random random = new Random(3);
    String[] forms = {"log-linear", "cubic", "monotone-convex", "smith-wilson", "svensson"};
    for (int i = 0; i < 300; i++) {
      String[] sheet = lines.clone();
      for (int k = 0; k < 2; k++) {
        int at = 2 + random.nextInt(lines.length - 3);
        String[] cells = sheet[at].split(",", -1);
        cells[3 + random.nextInt(3) % (cells.length - 3)] = odd[random.nextInt(odd.length)];
        sheet[at] = String.join(",", cells);
      }
      Files.writeString(file, String.join("\n", sheet));
      String form = forms[i % forms.length];
      String[] how =
          form.equals("svensson")
              ? new String[] {"--fit", "nelson-siegel"}
              : form.equals("smith-wilson")
                  ? new String[] {
                    "--interpolation", form, "--ultimate-forward", "3%", "--speed", "0.1"
                  }
                  : new String[] {"--interpolation", form};
      int status =
          run(new ByteArrayOutputStream(), with(how, "curve", "--quotes", file.toString()));
      assertThat(status)
          .as(form + "\n" + String.join("\n", sheet) + err.toString(StandardCharsets.UTF_8))
          .isIn(0, 1, 3);
    }
  }
}
