package ebbline.fitting.options;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.instrument.Claim;
import ebbline.model.HullWhite;
import ebbline.model.VolatilitySteps;
import java.util.List;
import java.util.OptionalDouble;
import java.util.SplittableRandom;
import org.apache.commons.math3.distribution.TDistribution;
import org.junit.jupiter.api.Test;

class HullWhiteCalibrationTest {
  private static final CalibrationTerms TERMS = CalibrationTerms.standard(Objective.NORMAL);
  private static final HullWhite TRUTH = new HullWhite(0.045, VolatilitySteps.constant(0.0085));

  private static OptionFit fit(List<OptionQuote> quotes, CalibrationTerms terms) {
    return HullWhiteCalibration.of(quotes, Sheets.CURVE, terms).fit();
  }

  @Test
  void aHundredSwaptionsGiveTheirModelBack() {
    List<OptionQuote> quotes = Sheets.swaptions(TRUTH);
    for (Objective objective : Objective.values()) {
      OptionFit fit = fit(quotes, CalibrationTerms.standard(objective));
      assertThat(fit.isConverged()).isTrue();
      assertThat(fit.value("mean_reversion")).isCloseTo(0.045, within(1e-9));
      assertThat(fit.value("volatility")).isCloseTo(0.0085, within(1e-9 * 0.0085));
      assertThat(fit.largestError().orElseThrow()).isLessThan(1e-12);
    }
  }

  @Test
  void farStartsEndAtTheSamePoint() {
    HullWhiteCalibration calibration =
        HullWhiteCalibration.of(Sheets.swaptions(TRUTH), Sheets.CURVE, TERMS);
    for (double[] start : new double[][] {{0.5, 0.05}, {-0.1, 0.001}, {2, 0.02}, {0.1, 0.015}}) {
      HullWhite found = calibration.search(start[0], start[1]);
      assertThat(found.meanReversion()).isCloseTo(0.045, within(1e-9));
      assertThat(found.volatility().value(0)).isCloseTo(0.0085, within(1e-9 * 0.0085));
    }
  }

  @Test
  void volatilityStepsComeBackTogetherAndOneAfterTheOther() {
    double[] ends = {1, 2, 5};
    double[] sigma = {0.007, 0.011, 0.0085, 0.0095};
    List<OptionQuote> quotes =
        Sheets.swaptions(new HullWhite(0.045, VolatilitySteps.of(ends, sigma)));
    CalibrationTerms joint = TERMS.withSteps(ends, false);
    CalibrationTerms held = TERMS.holding(0.045);
    for (CalibrationTerms terms :
        List.of(joint, held.withSteps(ends, false), held.withSteps(ends, true))) {
      OptionFit fit = fit(quotes, terms);
      assertThat(fit.value("mean_reversion")).isCloseTo(0.045, within(1e-9));
      for (int k = 0; k < 4; k++) {
        assertThat(fit.value("volatility_" + (k + 1))).isCloseTo(sigma[k], within(1e-9 * sigma[k]));
      }
      assertThat(HullWhiteCalibration.model(fit, terms).volatility().count()).isEqualTo(4);
    }
  }

  @Test
  void withMeanReversionHeldVolatilityIsFittedAlone() {
    OptionFit fit = fit(Sheets.swaptions(TRUTH), TERMS.holding(0.03));
    assertThat(fit.value("mean_reversion")).isEqualTo(0.03);
    assertThat(fit.free()).containsExactly("volatility");
    assertThat(fit.profile()).isEmpty();
    assertThat(fit.standardError("volatility").orElseThrow()).isPositive();
    assertThat(fit.standardError("mean_reversion")).isEmpty();
  }

  /** The slopes that the search uses against central differences of the errors. */
  @Test
  void theJacobianIsTheSlopeOfTheErrors() {
    List<OptionQuote> quotes = Sheets.noisy(Sheets.swaptions(TRUTH), 5e-5, new SplittableRandom(3));
    double[] ends = {3};
    for (Objective objective : Objective.values()) {
      CalibrationTerms terms = CalibrationTerms.standard(objective).withSteps(ends, false);
      HullWhiteProblem problem =
          new HullWhiteProblem(
              ebbline.pricing.OptionSheet.of(
                  quotes.stream().map(OptionQuote::claim).toList(), Sheets.CURVE),
              new QuoteTargets(quotes, objective),
              terms,
              0,
              true,
              new double[] {0.01, 0.01},
              0,
              2);
      for (boolean exact : new boolean[] {false, true}) {
        problem.setExact(exact);
        double[] point = problem.coordinates(0.07, new double[] {0.009, 0.0105});
        int n = problem.residuals();
        double[] residual = new double[n];
        double[][] slopes = new double[3][n];
        problem.at(point, residual, slopes);
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
  }

  /** 500 sheets with half a basis point of noise: how often 95 % intervals hold the truth. */
  @Test
  void intervalsOf95PerCentHoldTheTruthAsOftenAsTheySay() {
    List<OptionQuote> exact = Sheets.swaptions(TRUTH);
    double t = new TDistribution(98).inverseCumulativeProbability(0.975);
    int reversion = 0;
    int volatility = 0;
    int trials = 500;
    SplittableRandom random = new SplittableRandom(77);
    for (int i = 0; i < trials; i++) {
      OptionFit fit = fit(Sheets.noisy(exact, 0.5e-4, random), TERMS);
      reversion += holds(fit, "mean_reversion", 0.045, t);
      volatility += holds(fit, "volatility", 0.0085, t);
    }
    assertThat(reversion / (double) trials).isBetween(0.93, 0.97);
    assertThat(volatility / (double) trials).isBetween(0.93, 0.97);
  }

  private static int holds(OptionFit fit, String name, double truth, double t) {
    return Math.abs(fit.value(name) - truth) <= t * fit.standardError(name).orElseThrow() ? 1 : 0;
  }

  @Test
  void theProfileIsLowestAtTheFit() {
    OptionFit fit =
        fit(Sheets.noisy(Sheets.swaptions(TRUTH), 0.5e-4, new SplittableRandom(8)), TERMS);
    List<OptionFit.ProfilePoint> profile = fit.profile();
    assertThat(profile).hasSize(21);
    for (OptionFit.ProfilePoint point : profile) {
      assertThat(point.rmse()).isGreaterThanOrEqualTo(profile.get(10).rmse() * (1 - 1e-6));
    }
    assertThat(profile.get(0).rmse()).isGreaterThan(profile.get(5).rmse());
    assertThat(profile.get(20).rmse()).isGreaterThan(profile.get(15).rmse());
    assertThat(profile.get(10).rmse()).isCloseTo(fit.rmse(), within(1e-3 * fit.rmse()));
  }

  @Test
  void aNegativeMeanReversionIsFoundAndSaid() {
    HullWhite truth = new HullWhite(-0.04, VolatilitySteps.constant(0.006));
    OptionFit fit = fit(Sheets.swaptions(truth), TERMS);
    assertThat(fit.value("mean_reversion")).isCloseTo(-0.04, within(1e-9));
    assertThat(fit.warnings()).anyMatch(w -> w.startsWith("mean reversion is negative"));
  }

  @Test
  void twoQuotesOfAlmostOneKindDoNotIdentifyMeanReversion() {
    List<OptionQuote> all = Sheets.noisy(Sheets.swaptions(TRUTH), 2e-4, new SplittableRandom(5));
    OptionFit fit = fit(List.of(all.get(0), all.get(1), all.get(10)), TERMS);
    assertThat(fit.warnings()).anyMatch(w -> w.startsWith("mean reversion is not identified"));
  }

  @Test
  void aQuoteWithoutWeightIsShownAndNotFitted() {
    List<OptionQuote> all = new java.util.ArrayList<>(Sheets.swaptions(TRUTH));
    OptionQuote first = all.get(0);
    all.set(
        0,
        new OptionQuote(
            first.id(), first.claim(), first.terms(), first.unit(), 2 * first.quoted(), 0, 0));
    OptionFit fit = fit(all, TERMS);
    assertThat(fit.value("mean_reversion")).isCloseTo(0.045, within(1e-9));
    assertThat(fit.quotes().get(0).error().orElseThrow()).isCloseTo(-first.quoted(), within(1e-10));
    assertThat(fit.rmse()).isLessThan(1e-12);
  }

  @Test
  void aSearchThatIsCutShortSaysSoAndKeepsItsBestPoint() {
    CalibrationTerms hasty =
        new CalibrationTerms(
            Objective.NORMAL, OptionalDouble.empty(), new double[0], false, -0.5, 5, 2);
    OptionFit fit =
        fit(Sheets.noisy(Sheets.swaptions(TRUTH), 1e-4, new SplittableRandom(2)), hasty);
    assertThat(fit.isConverged()).isFalse();
    assertThat(fit.stopped()).contains("after 2 iterations");
    assertThat(fit.value("mean_reversion")).isFinite();
  }

  @Test
  void quotesThatCannotCarryTheFitAreRefusedInWords() {
    List<OptionQuote> all = Sheets.swaptions(TRUTH);
    assertThatThrownBy(() -> fit(all.subList(0, 10), TERMS))
        .hasMessageContaining("all expire in 1 years");
    assertThat(fit(all.subList(0, 10), TERMS.holding(0.045)).value("volatility"))
        .isCloseTo(0.0085, within(1e-11));
    List<OptionQuote> weightless =
        all.stream()
            .map(q -> new OptionQuote(q.id(), q.claim(), q.terms(), q.unit(), q.quoted(), 0, 0))
            .toList();
    assertThatThrownBy(() -> fit(weightless, TERMS)).hasMessageContaining("all weights 0");
    assertThatThrownBy(() -> fit(all.subList(0, 1), TERMS)).hasMessageContaining("2 parameters");
    assertThatThrownBy(() -> fit(all, TERMS.withSteps(new double[] {12}, false)))
        .hasMessageContaining("no quote expires in the volatility step that starts in 12 years");
    assertThatThrownBy(() -> TERMS.withSteps(new double[] {1}, true))
        .hasMessageContaining("only where mean reversion is held");
    assertThatThrownBy(() -> fit(List.of(), TERMS)).hasMessageContaining("found none");
    Claim claim = all.get(0).claim();
    assertThatThrownBy(
            () -> OptionQuote.of("x", claim, Sheets.CURVE, QuoteUnit.NORMAL_VOL, -0.01, 0, 1))
        .hasMessageContaining("above 0, found -0.01");
    assertThatThrownBy(
            () -> OptionQuote.of("x", claim, Sheets.CURVE, QuoteUnit.PREMIUM, -0.01, 0, 1))
        .hasMessageContaining("at least 0, found -0.01");
  }
}
