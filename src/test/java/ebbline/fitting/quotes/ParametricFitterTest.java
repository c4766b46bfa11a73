package ebbline.fitting.quotes;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.SvenssonCurve;
import ebbline.model.ReferenceTable;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;

class ParametricFitterTest {
  private static double[] numbers(String text) {
    return Arrays.stream(text.split(" ")).mapToDouble(Double::parseDouble).toArray();
  }

  private static double[] decimals(double[] percent) {
    return Arrays.stream(percent).map(p -> p / 100).toArray();
  }

  @Test
  void theReferenceFitsAreFound() {
    ReferenceTable table = ReferenceTable.read(ParametricFitterTest.class, "parametric-fits");
    double worst = 0;
    for (int row = 0; row < table.size(); row++) {
      ParametricForm form = ParametricForm.of(table.text(row, "form"));
      double[] times = numbers(table.text(row, "times"));
      double[] zeros = decimals(numbers(table.text(row, "yields")));
      String label = table.text(row, "date") + " " + form.label();
      ParametricFit fit =
          ParametricFitter.of(form).fitZeros(times, zeros, QuoteSheets.same(1, times.length));
      worst = Math.max(worst, table.relativeError(row, "squares", 1e4 * fit.squares()));
      double[] found = fit.curve().betas();
      double[] taus = fit.curve().taus();
      for (int k = 0; k < 4; k++) {
        double exact = table.number(row, "beta" + k);
        assertThat(100 * found[k])
            .as(label)
            .isCloseTo(exact, within(1e-6 * Math.max(1, Math.abs(exact))));
      }
      for (int k = 0; k < 2; k++) {
        double exact = table.number(row, "tau" + (k + 1));
        assertThat(taus[k]).as(label).isCloseTo(exact, within(1e-6 * exact));
      }
      assertThat(fit.isSound()).as(label).isEqualTo("yes".equals(table.text(row, "sound")));
      if (!fit.isSound()) {
        assertThat(fit.problem())
            .startsWith("no best pair of taus exists: the squares fall to 1.482");
        assertThat(fit.problem()).contains("tend to 1.010 years");
      }
    }
    assertThat(worst).isLessThan(table.tolerance());
  }

  @Test
  void aCurveOfTheFormIsFoundAgain() {
    double[] times = {0.25, 0.5, 1, 2, 3, 5, 7, 10, 20, 30};
    SvenssonCurve truth = SvenssonCurve.of(0.04, -0.02, -0.03, 0.02, 1.3, 7);
    double[] zeros = Arrays.stream(times).map(truth::zero).toArray();
    ParametricFit fit =
        ParametricFitter.of(ParametricForm.SVENSSON)
            .fitZeros(times, zeros, QuoteSheets.same(1, times.length));
    assertThat(fit.isSound()).isTrue();
    assertThat(fit.curve().taus()).containsExactly(new double[] {1.3, 7}, within(1e-6));
    assertThat(fit.rootMeanSquare()).isLessThan(1e-12);
  }

  @Test
  void aFlatCurveAndASuperfluousHumpAreReported() {
    double[] times = {0.25, 0.5, 1, 2, 3, 5, 7, 10, 20, 30};
    double[] ones = QuoteSheets.same(1, times.length);
    ParametricFit flat =
        ParametricFitter.of(ParametricForm.NELSON_SIEGEL)
            .fitZeros(times, QuoteSheets.same(0.03, times.length), ones);
    assertThat(flat.problem()).startsWith("the curve is flat");
    SvenssonCurve truth = SvenssonCurve.nelsonSiegel(0.04, -0.02, -0.03, 1.3);
    double[] zeros = Arrays.stream(times).map(truth::zero).toArray();
    ParametricFit fit = ParametricFitter.of(ParametricForm.SVENSSON).fitZeros(times, zeros, ones);
    assertThat(fit.problem()).startsWith("the second hump has no effect");
  }

  @Test
  void aTauAtTheEdgeOfItsRangeIsReported() {
    double[] times = {0.25, 0.5, 1, 2, 3, 5, 7, 10, 20, 30};
    SvenssonCurve truth = SvenssonCurve.nelsonSiegel(0.04, -0.02, -0.03, 1.3);
    double[] zeros = Arrays.stream(times).map(truth::zero).toArray();
    ParametricFit fit =
        ParametricFitter.of(ParametricForm.NELSON_SIEGEL)
            .withTaus(2, 30)
            .fitZeros(times, zeros, QuoteSheets.same(1, times.length));
    assertThat(fit.problem()).isEqualTo("tau1 is at the edge of its range, 2.000 years");
  }

  @Test
  void bondPricesWeightedByDurationFindTheCurveBehindThem() {
    SvenssonCurve truth = SvenssonCurve.of(0.04, -0.02, -0.03, 0.02, 1.3, 7);
    List<QuoteEquation> bonds = new ArrayList<>();
    for (QuoteEquation bond : QuoteSheets.noisyBonds(truth, 14, 0, 3)) {
      double money = bond.quote() * Math.min(bond.lastTime(), 15); // about duration × price
      bonds.add(bond.withWeight(1 / (money * money)));
    }
    ParametricFit fit = ParametricFitter.of(ParametricForm.SVENSSON).fitQuotes(bonds);
    assertThat(fit.isSound()).isTrue();
    assertThat(fit.curve().taus()).containsExactly(new double[] {1.3, 7}, within(1e-4));
    for (double t : new double[] {0.5, 3, 10, 13}) {
      assertThat(fit.curve().zero(t)).isCloseTo(truth.zero(t), within(1e-9));
    }
  }

  @Test
  void quotesAndZerosGiveTheSameFit() {
    double[] times = {0.25, 0.5, 1, 2, 3, 5, 7, 10, 30};
    double[] zeros = decimals(new double[] {7.99, 8.05, 8.1, 8.35, 8.4, 8.43, 8.52, 8.48, 8.46});
    List<QuoteEquation> quotes = new ArrayList<>();
    for (int i = 0; i < times.length; i++) {
      quotes.add(
          MarketQuotes.zero("z" + i, times[i], ebbline.curve.Compounding.CONTINUOUS, zeros[i]));
    }
    ParametricFitter fitter = ParametricFitter.of(ParametricForm.NELSON_SIEGEL);
    ParametricFit one = fitter.fitZeros(times, zeros, QuoteSheets.same(1, times.length));
    ParametricFit other = fitter.fitQuotes(quotes);
    assertThat(other.squares()).isCloseTo(one.squares(), within(1e-12 * one.squares()));
    assertThat(other.curve().taus()[0]).isCloseTo(one.curve().taus()[0], within(1e-6));
  }

  @Test
  void pointsThatCannotMakeAFitAreRefused() {
    ParametricFitter fitter = ParametricFitter.of(ParametricForm.NELSON_SIEGEL);
    assertThatThrownBy(
            () -> fitter.fitZeros(new double[] {1, 2, 3}, new double[3], new double[] {1, 1, 1}))
        .hasMessage("nelson-siegel needs 4 maturities at least, found 3");
    assertThatThrownBy(
            () ->
                fitter.fitZeros(
                    new double[] {1, 2, 3, 0}, new double[4], new double[] {1, 1, 1, 1}))
        .hasMessageContaining("found 0.0 at 0.0");
    assertThatThrownBy(
            () ->
                fitter.fitZeros(
                    new double[] {1, 2, 3, 4}, new double[4], new double[] {1, 1, 1, 0}))
        .hasMessageContaining("weights must be positive");
    assertThatThrownBy(() -> fitter.fitZeros(new double[1], new double[2], new double[1]))
        .hasMessageContaining("found 1, 2 and 1");
    assertThatThrownBy(() -> fitter.withTaus(2, 1)).hasMessageContaining("found 2.0 and 1.0");
    assertThatThrownBy(() -> ParametricForm.of("cubic")).hasMessageContaining("svensson");
  }
}
