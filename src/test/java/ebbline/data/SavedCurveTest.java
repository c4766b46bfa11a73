package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import ebbline.curve.DiscountCurve;
import ebbline.curve.FlatCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.curve.SmithWilsonCurve;
import ebbline.curve.SvenssonCurve;
import ebbline.fitting.quotes.CurveBuilder;
import ebbline.fitting.quotes.QuoteEquation;
import ebbline.fitting.quotes.SheetQuote;
import ebbline.fitting.quotes.SmithWilsonBuilder;
import ebbline.time.InputProblems;
import ebbline.time.TimeAxis;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class SavedCurveTest {
  private static final TimeAxis DATED = TimeAxis.from(LocalDate.of(2026, 11, 30));

  @TempDir Path folder;

  private DiscountCurve saved(DiscountCurve curve, TimeAxis axis) {
    Path file = folder.resolve("curve.csv");
    CurveWriter.write(file, curve, axis);
    CurveInput read = CurveFile.read(file.toString(), Optional.empty(), Optional.empty());
    assertThat(read.axis().asOf()).isEqualTo(axis.asOf());
    assertThat(read.axis().basis()).isEqualTo(axis.basis());
    return read.curve();
  }

  private static void assertSameBits(DiscountCurve curve, DiscountCurve read) {
    assertThat(read.nodes()).isEqualTo(curve.nodes());
    for (int i = 0; i <= 4000; i++) {
      double t = i / 100.0;
      assertThat(read.logDiscount(t)).as("at %s", t).isEqualTo(curve.logDiscount(t));
      assertThat(read.forward(t)).as("at %s", t).isEqualTo(curve.forward(t));
    }
  }

  private static List<QuoteEquation> sheet() {
    return QuotesFile.read("curves/saltmere-quotes.csv", QuoteOverrides.none()).quotes().stream()
        .map(SheetQuote::equation)
        .toList();
  }

  @ParameterizedTest
  @EnumSource(mode = EnumSource.Mode.EXCLUDE, names = "SMITH_WILSON")
  void aBuiltCurveReadsBackToTheSameBits(Interpolation interpolation) {
    DiscountCurve built = CurveBuilder.of(interpolation).build(sheet()).curve();
    assertSameBits(built, saved(built, DATED));
    assertSameBits(
        built, saved(built, TimeAxis.from(LocalDate.of(2026, 11, 30), TimeAxis.TimeBasis.ACT_360)));
    assertSameBits(built, saved(built, TimeAxis.undated()));
  }

  @Test
  void nodesOfAnySizeReadBack() {
    Random random = new Random(5);
    double[] times = new double[300];
    double[] logs = new double[300];
    double at = 0;
    for (int i = 0; i < times.length; i++) {
      at += 0.001 + 0.2 * random.nextDouble();
      times[i] = at;
      logs[i] = (random.nextBoolean() ? 1 : -1) * Math.pow(10, -9 * random.nextDouble());
    }
    logs[17] = 0;
    DiscountCurve curve = InterpolatedCurve.of(Interpolation.LOG_LINEAR, times, logs);
    assertSameBits(curve, saved(curve, TimeAxis.undated()));
  }

  @Test
  void kernelsReadBackToTheSameBits() {
    List<QuoteEquation> zeros = sheet().stream().filter(QuoteEquation::isLinear).toList();
    DiscountCurve built = SmithWilsonBuilder.of(0.0345, 60).build(zeros).curve();
    assertSameBits(built, saved(built, DATED));
  }

  @Test
  void formulasReadBackToTheSameBitsEvenWithHugeBetas() {
    assertSameBits(
        SvenssonCurve.of(1.0 / 32.1, -1.1e-7, 37 / 3.1, -12.1, 1.3, 7.1),
        saved(SvenssonCurve.of(1.0 / 32.1, -1.1e-7, 37 / 3.1, -12.1, 1.3, 7.1), DATED));
    assertSameBits(
        SvenssonCurve.nelsonSiegel(0.03, -0.01, 1.0 / 3, 2.0 / 3),
        saved(SvenssonCurve.nelsonSiegel(0.03, -0.01, 1.0 / 3, 2.0 / 3), TimeAxis.undated()));
    assertThatThrownBy(() -> saved(SvenssonCurve.of(101, 0, 0, 1, 1, 2), DATED))
        .hasMessageContaining("the fit is degenerate");
    assertThatThrownBy(() -> saved(FlatCurve.of(0.03), DATED))
        .hasMessage("a flat curve needs no file: --curve flat:0.03");
  }

  @Test
  void kernelsGoThroughNodesWhereNoWeightsStand() throws IOException {
    Path file = folder.resolve("nodes.csv");
    String nodes = "maturity,zero\n1,2%\n5,2.5%\n20,3%\n";
    Files.writeString(
        file, "# interpolation: smith-wilson\n# ultimate-forward: 3.45%\n# speed: 0.13\n" + nodes);
    DiscountCurve given =
        CurveFile.read(file.toString(), Optional.empty(), Optional.empty()).curve();
    assertThat(given.zero(5)).isCloseTo(0.025, org.assertj.core.api.Assertions.within(1e-14));
    assertThat(((SmithWilsonCurve) given).speed()).isEqualTo(0.13);
    Files.writeString(
        file,
        "# interpolation: smith-wilson\n# ultimate-forward: 3.45%\n# convergence: 60Y\n" + nodes);
    SmithWilsonCurve searched =
        (SmithWilsonCurve)
            CurveFile.read(file.toString(), Optional.empty(), Optional.empty()).curve();
    assertThat(searched.zero(5)).isCloseTo(0.025, org.assertj.core.api.Assertions.within(1e-14));
    assertThat(searched.gap(60)).isLessThanOrEqualTo(1e-4);
    assertThat(searched.speed()).isBetween(0.05, 0.2);
  }

  @Test
  void kernelWeightsMustGiveTheDiscountFactorsBesideThem() throws IOException {
    Path file = folder.resolve("wrong.csv");
    Files.writeString(
        file,
        "# interpolation: smith-wilson\n# ultimate-forward: 3.45%\n# speed: 0.13\n"
            + "maturity,discount,kernel\n1,0.98,1.5\n");
    assertThatThrownBy(() -> CurveFile.read(file.toString(), Optional.empty(), Optional.empty()))
        .isInstanceOf(InputProblems.class)
        .hasMessageContaining("the kernel weights give another discount factor at 1.0 years");
    Files.writeString(file, "# speed: 0.13\nmaturity,discount,kernel\n1,0.98,1.5\n");
    assertThatThrownBy(() -> CurveFile.read(file.toString(), Optional.empty(), Optional.empty()))
        .hasMessageContaining("this column belongs to '# interpolation: smith-wilson'");
  }
}
