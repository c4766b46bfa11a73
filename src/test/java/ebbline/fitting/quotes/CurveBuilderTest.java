package ebbline.fitting.quotes;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.Compounding;
import ebbline.curve.DiscountCurve;
import ebbline.curve.FlatCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.curve.SvenssonCurve;
import ebbline.fitting.FittedQuote;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class CurveBuilderTest {
  private static final double[] LOOKS = {0.001, 0.1, 0.4, 0.8, 1.5, 3.3, 5, 8, 12, 22, 30, 40};

  @ParameterizedTest
  @EnumSource(value = Interpolation.class, names = "SMITH_WILSON", mode = EnumSource.Mode.EXCLUDE)
  void everyKindOfQuoteIsRepriced(Interpolation interpolation) {
    CurveFit fit = CurveBuilder.of(interpolation).build(QuoteSheets.mixed());
    double worst = 0;
    for (FittedQuote quote : fit.quotes()) {
      double error = Math.abs(quote.error()) / Math.max(1, Math.abs(quote.quote()));
      worst = Math.max(worst, error);
      assertThat(error).as(quote.id()).isLessThan(1e-12);
    }
    assertThat(fit.problem()).isEmpty();
    assertThat(fit.isConverged()).isTrue();
    assertThat(fit.unmet()).isEmpty();
    assertThat(fit.steps()).isLessThan(15);
    assertThat(fit.condition()).isBetween(1.0, 1e5);
  }

  @ParameterizedTest
  @EnumSource(value = Interpolation.class, names = "SMITH_WILSON", mode = EnumSource.Mode.EXCLUDE)
  void sensitivitiesToQuotesAgreeWithFiniteDifferences(Interpolation interpolation) {
    List<QuoteEquation> quotes = QuoteSheets.mixed();
    CurveFit fit = CurveBuilder.of(interpolation).build(quotes);
    double worst = 0;
    for (int k = 0; k < quotes.size(); k++) {
      double h = Math.max(1, quotes.get(k).quote()) * 3e-7;
      DiscountCurve up = moved(interpolation, quotes, k, h);
      DiscountCurve down = moved(interpolation, quotes, k, -h);
      for (double t : LOOKS) {
        double difference = (up.discount(t) - down.discount(t)) / (2 * h);
        double found = fit.discountByQuote(t)[k];
        double error = Math.abs(found - difference) / Math.max(1, Math.abs(found));
        worst = Math.max(worst, error);
      }
    }
    assertThat(worst).isLessThan(1e-7);
  }

  private static DiscountCurve moved(
      Interpolation interpolation, List<QuoteEquation> quotes, int k, double by) {
    List<QuoteEquation> moved = new ArrayList<>(quotes);
    moved.set(k, quotes.get(k).withQuote(quotes.get(k).quote() + by));
    return CurveBuilder.of(interpolation).build(moved).curve();
  }

  @Test
  void theOrderOfTheQuotesDoesNotMatter() {
    List<QuoteEquation> quotes = QuoteSheets.mixed();
    DiscountCurve curve = CurveBuilder.of(Interpolation.CUBIC).build(quotes).curve();
    Collections.shuffle(quotes, new Random(9));
    DiscountCurve shuffled = CurveBuilder.of(Interpolation.CUBIC).build(quotes).curve();
    for (double t : LOOKS) {
      assertThat(shuffled.logDiscount(t)).isCloseTo(curve.logDiscount(t), within(1e-13));
    }
  }

  @Test
  void theTextbookBootstrapIsMet() {
    // Hull, Options, Futures, and Other Derivatives, 11th ed., tables 4.3 and 4.4: zero rates to
    // the printed digits.
    double[][] bonds = {{0.25, 0, 99.6}, {0.5, 0, 99}, {1, 0, 97.8}, {1.5, 4, 102.5}, {2, 5, 105}};
    double[] printed = {0.01603, 0.02010, 0.02225, 0.02284, 0.02416};
    List<QuoteEquation> quotes = new ArrayList<>();
    for (double[] bond : bonds) {
      int flows = bond[1] == 0 ? 1 : (int) Math.round(2 * bond[0]);
      double[] times = new double[flows];
      for (int i = 0; i < flows; i++) {
        times[i] = bond[0] - 0.5 * (flows - 1 - i);
      }
      quotes.add(
          MarketQuotes.bondPrice(
              "bond " + bond[0], times, QuoteSheets.bond(bond[1] / 2, flows), 0, 0, bond[2]));
    }
    for (Interpolation interpolation :
        new Interpolation[] {Interpolation.LOG_LINEAR, Interpolation.MONOTONE_CONVEX}) {
      DiscountCurve curve = CurveBuilder.of(interpolation).build(quotes).curve();
      for (int i = 0; i < printed.length; i++) {
        assertThat(curve.zero(bonds[i][0])).isCloseTo(printed[i], within(5e-6));
      }
      assertThat(curve.discount(1.5)).isCloseTo(0.96631, within(5e-6));
    }
  }

  @Test
  void aCurveIsFoundAgainFromItsOwnQuotes() {
    DiscountCurve curve = FlatCurve.of(-0.004);
    List<QuoteEquation> quotes = new ArrayList<>();
    for (int years = 1; years <= 40; years++) {
      double annuity = 0;
      for (int k = 1; k <= years; k++) {
        annuity += curve.discount(k);
      }
      quotes.add(
          MarketQuotes.swap(
              years + "Y",
              0,
              years,
              QuoteSheets.every(0, 1, years),
              QuoteSheets.same(1, years),
              (1 - curve.discount(years)) / annuity));
    }
    for (Interpolation interpolation : Interpolation.values()) {
      if (interpolation != Interpolation.SMITH_WILSON) {
        CurveFit fit = CurveBuilder.of(interpolation).build(quotes);
        assertThat(fit.unmet()).isEmpty();
        assertThat(fit.curve().zero(33.3)).isCloseTo(-0.004, within(1e-13));
      }
    }
  }

  @Test
  void moreQuotesThanNodesAreFittedByWeightedLeastSquares() {
    DiscountCurve truth = SvenssonCurve.of(0.04, -0.02, -0.01, 0.01, 2, 8);
    List<QuoteEquation> quotes = QuoteSheets.noisyBonds(truth, 90, 0.05, 4);
    double[] nodes = {1, 2, 3, 5, 7, 10, 15, 20, 30};
    CurveFit fit = CurveBuilder.of(Interpolation.CUBIC).withNodes(nodes).build(quotes);
    assertThat(fit.isConverged()).isTrue();
    double[] normal = new double[nodes.length];
    for (int i = 0; i < quotes.size(); i++) {
      QuoteEquation quote = quotes.get(i);
      double error = fit.quotes().get(i).error();
      quote.new Reading(fit.curve()).addNodeGradient(error, normal);
    }
    for (double part :
        normal) { // at the least squares the errors are orthogonal to every node's effect
      assertThat(part).isCloseTo(0, within(1e-6));
    }
    assertThat(fit.curve().zero(10)).isCloseTo(truth.zero(10), within(2e-4));
    List<QuoteEquation> pinned = new ArrayList<>(quotes);
    pinned.set(9, quotes.get(9).withWeight(1e10));
    CurveFit closer = CurveBuilder.of(Interpolation.CUBIC).withNodes(nodes).build(pinned);
    assertThat(Math.abs(closer.quotes().get(9).error())).isLessThan(1e-8);
  }

  @Test
  void anOutlierIsNamedAndRobustWeightsTakeItOut() {
    DiscountCurve truth = SvenssonCurve.of(0.04, -0.02, -0.01, 0.01, 2, 8);
    List<QuoteEquation> quotes = QuoteSheets.noisyBonds(truth, 90, 0.01, 4);
    quotes.set(40, quotes.get(40).withQuote(quotes.get(40).quote() - 5));
    double[] nodes = {1, 2, 3, 5, 7, 10, 15, 20, 30};
    CurveBuilder plain = CurveBuilder.of(Interpolation.CUBIC).withNodes(nodes);
    CurveFit bent = plain.build(quotes);
    CurveFit robust = plain.withRobustWeights().build(quotes);
    assertThat(bent.outliers()).contains("bond-40");
    assertThat(robust.outliers()).contains("bond-40");
    double error = Math.abs(robust.curve().zero(11) - truth.zero(11));
    assertThat(error).isLessThan(0.1 * Math.abs(bent.curve().zero(11) - truth.zero(11)));
    List<QuoteEquation> without = new ArrayList<>(quotes);
    without.remove(40);
    assertThat(plain.withRobustWeights().build(without).curve().zero(11))
        .isCloseTo(robust.curve().zero(11), within(1e-5));
  }

  @Test
  void quotesThatCannotMakeACurveAreRefused() {
    CurveBuilder builder = CurveBuilder.of(Interpolation.LOG_LINEAR);
    QuoteEquation one = MarketQuotes.zero("a", 2, Compounding.CONTINUOUS, 0.03);
    QuoteEquation other = MarketQuotes.zero("b", 2, Compounding.CONTINUOUS, 0.04);
    assertThatThrownBy(() -> builder.build(List.of())).hasMessageContaining("found none");
    assertThatThrownBy(() -> builder.build(List.of(one, other)))
        .hasMessageContaining("found a and b at 2.0 years");
    assertThatThrownBy(() -> builder.withNodes(1, 2).build(List.of(one)))
        .hasMessageContaining("found 1 quotes and 2 nodes");
    assertThatThrownBy(() -> CurveBuilder.of(Interpolation.SMITH_WILSON))
        .hasMessageContaining("convergence point");
    assertThatThrownBy(() -> MarketQuotes.zero("c", 1, Compounding.ANNUAL, -1.5))
        .hasMessageContaining("annual");
    assertThatThrownBy(() -> MarketQuotes.deposit("d", 1, 1, 0.25, 0.03))
        .hasMessageContaining("found 1.0 to 1.0");
    assertThatThrownBy(
            () -> MarketQuotes.bondPrice("e", new double[] {1}, new double[] {100}, 0, 0, -3))
        .hasMessageContaining("found -3.0 for e");
    assertThatThrownBy(() -> MarketQuotes.deposit("f", 0, 1, 1, Double.NaN))
        .hasMessageContaining("NaN for f");
    assertThatThrownBy(() -> one.withWeight(0)).hasMessageContaining("found 0.0 for a");
  }

  @Test
  void quotesThatNoDiscountFactorMeetsAreNamedAndNotAnException() {
    List<QuoteEquation> quotes = new ArrayList<>();
    quotes.add(MarketQuotes.zero("sound", 1, Compounding.CONTINUOUS, 0.03));
    quotes.add(
        MarketQuotes.bondPrice(
            "cheap",
            new double[] {1, 2},
            new double[] {50, 100},
            0,
            0,
            40)); // first coupon is worth more
    CurveFit fit = CurveBuilder.of(Interpolation.LOG_LINEAR).build(quotes);
    assertThat(fit.isConverged()).isFalse();
    assertThat(fit.unmet()).contains("cheap");
    assertThat(fit.problem()).contains("not repriced").contains("cheap");
  }

  @Test
  void nodesThatNoQuoteReachesAreNamedAsUndetermined() {
    List<QuoteEquation> quotes =
        List.of(
            MarketQuotes.zero("a", 1, Compounding.CONTINUOUS, 0.03),
            MarketQuotes.zero("b", 2, Compounding.CONTINUOUS, 0.03),
            MarketQuotes.zero("c", 2.5, Compounding.CONTINUOUS, 0.03));
    CurveFit fit = CurveBuilder.of(Interpolation.LOG_LINEAR).withNodes(1, 5, 9).build(quotes);
    assertThat(fit.isConverged()).isFalse();
    assertThat(fit.problem()).contains("do not determine every node");
  }

  @Test
  void strangeForwardsAreWarnedOf() {
    List<QuoteEquation> quotes =
        List.of(
            MarketQuotes.zero("a", 1, Compounding.CONTINUOUS, 0.06),
            MarketQuotes.zero("b", 2, Compounding.CONTINUOUS, 0.025),
            MarketQuotes.zero("c", 3, Compounding.CONTINUOUS, 0.02));
    List<String> low = CurveBuilder.of(Interpolation.LOG_LINEAR).build(quotes).warnings();
    assertThat(low).anyMatch(text -> text.startsWith("discount factors rise at"));
    assertThat(low).anyMatch(text -> text.startsWith("the forward jumps by 7.0000 %"));
  }

  @Test
  void theConvexityOfAFutureIsTheTextbooks() {
    // Hull, Options, Futures, and Other Derivatives, 11th ed., example 6.4 and its table: bp to the
    // printed digit.
    double[][] printed = {{2, 3.2}, {4, 12.2}, {6, 27.0}, {8, 47.5}, {10, 73.8}};
    for (double[] row : printed) {
      double convexity = MarketQuotes.futureConvexity(row[0], row[0] + 0.25, 0, 0.012);
      assertThat(1e4 * convexity).isCloseTo(row[1], within(0.0501));
    }
    // Its forward of 5.563 % comes from 6 % simple over a quarter by act/360: the quote is 94 to
    // the printed digits.
    double end = 8 + 0.25 * 360 / 365;
    QuoteEquation future = MarketQuotes.future("future", 8, end, 0.25, 94, 0, 0.012);
    assertThat(future.fittedQuote(FlatCurve.of(0.05563))).isCloseTo(94, within(1.5e-3));
    assertThat(MarketQuotes.futureConvexity(8, 8.25, 1e-9, 0.012))
        .isCloseTo(MarketQuotes.futureConvexity(8, 8.25, 0, 0.012), within(1e-10));
    // Kirikos and Novak's closed form as printed, away from 0
    double a = 0.07;
    double over = (1 - Math.exp(-a * 0.25)) / a;
    double before = (1 - Math.exp(-a * 8)) / a;
    double formula =
        over
            / 0.25
            * (over * (1 - Math.exp(-2 * a * 8)) + 2 * a * before * before)
            * 0.012
            * 0.012
            / (4 * a);
    assertThat(MarketQuotes.futureConvexity(8, 8.25, a, 0.012)).isCloseTo(formula, within(1e-16));
  }

  @Test
  void aPaymentLagChangesAnOvernightSwapOnlySlightly() {
    DiscountCurve curve = FlatCurve.of(0.04);
    double[] ends = {1, 2, 3};
    double[] later = {1.01, 2.01, 3.01};
    double[] accruals = {1, 1, 1};
    double plain = MarketQuotes.overnightSwap("a", 0, ends, ends, accruals, 0).fittedQuote(curve);
    double lagged = MarketQuotes.overnightSwap("b", 0, ends, later, accruals, 0).fittedQuote(curve);
    // On a flat curve every period pays the same either way.
    assertThat(plain).isCloseTo(Math.expm1(0.04), within(1e-15));
    assertThat(lagged).isCloseTo(Math.expm1(0.04), within(1e-15));
    DiscountCurve steep = SvenssonCurve.of(0.06, -0.05, 0, 0, 3, 3);
    double difference =
        MarketQuotes.overnightSwap("a", 0, ends, ends, accruals, 0).fittedQuote(steep)
            - MarketQuotes.overnightSwap("b", 0, ends, later, accruals, 0).fittedQuote(steep);
    assertThat(Math.abs(difference)).isBetween(1e-8, 1e-5);
  }

  @Test
  void randomSheetsAreRepricedByEveryInterpolation() {
    Random random = new Random(17);
    for (int sheet = 0; sheet < 60; sheet++) {
      int n = 3 + random.nextInt(25);
      double[] times = new double[n];
      double[] logs = new double[n];
      double t = 0;
      double log = 0;
      for (int i = 0; i < n; i++) {
        double step = 0.1 + 1.5 * random.nextDouble();
        log -= step * (0.06 * random.nextDouble() - 0.01);
        t += step;
        times[i] = t;
        logs[i] = log;
      }
      for (Interpolation interpolation : Interpolation.values()) {
        if (interpolation == Interpolation.SMITH_WILSON) {
          continue;
        }
        DiscountCurve truth = InterpolatedCurve.of(interpolation, times, logs);
        List<QuoteEquation> quotes = new ArrayList<>();
        for (int i = 0; i < n; i++) {
          double[] payments = Arrays.copyOf(times, i + 1);
          double[] accruals = new double[i + 1];
          for (int k = 0; k <= i; k++) {
            accruals[k] = times[k] - (k == 0 ? 0 : times[k - 1]);
          }
          QuoteEquation quote = MarketQuotes.swap("q" + i, 0, times[i], payments, accruals, 0.03);
          quotes.add(quote.withQuote(quote.fittedQuote(truth)));
        }
        CurveFit fit = CurveBuilder.of(interpolation).build(quotes);
        assertThat(fit.problem()).as("sheet %s, %s", sheet, interpolation).isEmpty();
        assertThat(fit.curve().logDiscount(t)).isCloseTo(log, within(1e-12));
      }
    }
  }

  @Test
  void bootstrapsSurviveVeryHighAndVeryLowRates() {
    for (double rate : new double[] {-0.05, 0, 0.3, 1.0}) {
      List<QuoteEquation> quotes = new ArrayList<>();
      for (int years = 1; years <= 20; years++) {
        quotes.add(
            MarketQuotes.swap(
                years + "Y",
                0,
                years,
                QuoteSheets.every(0, 1, years),
                QuoteSheets.same(1, years),
                rate));
      }
      for (Interpolation interpolation : Interpolation.values()) {
        if (interpolation != Interpolation.SMITH_WILSON) {
          CurveFit fit = CurveBuilder.of(interpolation).build(quotes);
          assertThat(fit.problem()).as("%s at %s", interpolation, rate).isEmpty();
          assertThat(fit.curve().zero(20)).isCloseTo(Math.log1p(rate), within(1e-11));
        }
      }
    }
  }
}
