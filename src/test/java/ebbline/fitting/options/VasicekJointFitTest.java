package ebbline.fitting.options;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.DiscountCurve;
import ebbline.fitting.Parameter;
import ebbline.instrument.Claim;
import ebbline.model.GaussianRates;
import ebbline.model.Vasicek;
import ebbline.pricing.ClosedForm;
import ebbline.pricing.Market;
import ebbline.pricing.VolatilityLaw;
import ebbline.pricing.VolatilityTerms;
import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class VasicekJointFitTest {
  private static final Vasicek TRUTH = new Vasicek(0.021, 0.047, 0.18, 0.0115);
  private static final double[] TIMES = {0.5, 1, 2, 3, 5, 7, 10, 15, 20, 30};
  private static final List<String> LABELS =
      Arrays.stream(TIMES).mapToObj(Double::toString).toList();

  private static double[] zeros(Vasicek model) {
    DiscountCurve curve = model.rates().curve();
    return Arrays.stream(TIMES).map(curve::zero).toArray();
  }

  private static List<OptionQuote> quotes(Vasicek model) {
    GaussianRates rates = model.rates();
    List<OptionQuote> quotes = new ArrayList<>();
    for (int expiry : new int[] {1, 3, 5, 10}) {
      for (int tenor : new int[] {2, 5, 10}) {
        Claim claim =
            Market.of(TimeAxis.undated(), rates.curve())
                .claim(Sheets.swaption(expiry, tenor, OptionalDouble.empty()));
        double vol =
            VolatilityTerms.of(claim, rates.curve())
                .implied(VolatilityLaw.NORMAL, ClosedForm.value(claim, rates).presentValue(), 0);
        quotes.add(
            OptionQuote.of(
                expiry + "x" + tenor, claim, rates.curve(), QuoteUnit.NORMAL_VOL, vol, 0, 1));
      }
    }
    return quotes;
  }

  private static OptionFit fit(Vasicek truth, Map<Parameter, Double> held) {
    return VasicekJointFit.fit(
        TIMES, zeros(truth), LABELS, quotes(truth), held, Objective.NORMAL, 200);
  }

  @Test
  void curveAndOptionsTogetherGiveAllFourParametersBack() {
    OptionFit fit = fit(TRUTH, Map.of());
    Vasicek found = VasicekJointFit.model(fit);
    assertThat(fit.isConverged()).isTrue();
    assertThat(found.meanReversion()).isCloseTo(0.18, within(1e-9));
    assertThat(found.longRunMean()).isCloseTo(0.047, within(1e-10));
    assertThat(found.volatility()).isCloseTo(0.0115, within(1e-11));
    assertThat(found.shortRate()).isCloseTo(0.021, within(1e-11));
    assertThat(fit.quotes()).hasSize(22);
    assertThat(fit.largestError().orElseThrow()).isLessThan(1e-10);
  }

  @Test
  void aNegativeMeanReversionIsFoundAndSaid() {
    Vasicek truth = new Vasicek(0.02, 0.01, -0.03, 0.007);
    OptionFit fit = fit(truth, Map.of());
    assertThat(fit.value("mean_reversion")).isCloseTo(-0.03, within(1e-8));
    assertThat(fit.warnings()).anyMatch(w -> w.startsWith("mean reversion is negative"));
  }

  @Test
  void aHeldParameterStaysWhereItIs() {
    for (Parameter parameter : Parameter.values()) {
      Map<Parameter, Double> held = new EnumMap<>(Parameter.class);
      double value =
          switch (parameter) {
            case MEAN_REVERSION -> 0.18;
            case LONG_RUN_MEAN -> 0.047;
            case VOLATILITY -> 0.0115;
            case SHORT_RATE -> 0.021;
          };
      held.put(parameter, value);
      OptionFit fit = fit(TRUTH, held);
      assertThat(fit.value(parameter.label())).isEqualTo(value);
      assertThat(fit.free()).hasSize(3).doesNotContain(parameter.label());
      assertThat(fit.value("mean_reversion")).isCloseTo(0.18, within(1e-8));
      assertThat(fit.value("volatility")).isCloseTo(0.0115, within(1e-10));
    }
  }

  @Test
  void theJacobianIsTheSlopeOfTheErrors() {
    VasicekJointProblem problem =
        new VasicekJointProblem(
            TIMES,
            zeros(TRUTH),
            quotes(TRUTH),
            new EnumMap<>(Map.of(Parameter.LONG_RUN_MEAN, 0.05)),
            Objective.NORMAL);
    for (boolean exact : new boolean[] {false, true}) {
      problem.setExact(exact);
      double[] point = problem.coordinates(new Vasicek(0.022, 0.05, 0.2, 0.01));
      int n = problem.residuals();
      double[][] slopes = new double[3][n];
      problem.at(point, new double[n], slopes);
      for (int j = 0; j < 3; j++) {
        double[][] moved = new double[4][n];
        double h = 1e-4;
        for (int m = 0; m < 4; m++) {
          double[] at = point.clone();
          at[j] += h * (m < 2 ? m - 2 : m - 1);
          problem.at(at, moved[m], new double[3][n]);
        }
        double size = Math.sqrt(MarquardtSearch.squares(slopes[j]) / n);
        for (int i = 0; i < n; i++) {
          double wide = (moved[3][i] - moved[0][i]) / (4 * h);
          double narrow = (moved[2][i] - moved[1][i]) / (2 * h);
          assertThat(slopes[j][i]).isCloseTo((4 * narrow - wide) / 3, within(1e-7 * size));
        }
      }
    }
  }

  @Test
  void whatCannotBeFittedIsRefusedInWords() {
    assertThatThrownBy(
            () ->
                VasicekJointFit.fit(
                    TIMES, zeros(TRUTH), LABELS, quotes(TRUTH), Map.of(), Objective.PREMIUM, 100))
        .hasMessageContaining("no unit in common");
    assertThatThrownBy(
            () ->
                VasicekJointFit.fit(
                    TIMES, zeros(TRUTH), LABELS, List.of(), Map.of(), Objective.NORMAL, 100))
        .hasMessageContaining("weight must be above 0");
  }
}
