package ebbline.fitting.quotes;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.DiscountCurve;
import ebbline.curve.SmithWilsonCurve;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The EUR curve of 30 June 2022 without volatility adjustment, as EIOPA released it. */
class SmithWilsonTest {
  private static final double[][] PAR = {
    {1, 0.736}, {2, 1.263}, {3, 1.444}, {4, 1.602}, {5, 1.678}, {6, 1.769}, {7, 1.847},
    {8, 1.922}, {9, 1.993}, {10, 2.06}, {11, 2.141}, {12, 2.169}, {15, 2.242}, {20, 2.156}
  };
  private static final SmithWilsonBuilder RELEASED = SmithWilsonBuilder.of(0.0345, 60);

  private static List<QuoteEquation> swaps(int moved, double by) {
    List<QuoteEquation> quotes = new ArrayList<>();
    for (int i = 0; i < PAR.length; i++) {
      int years = (int) PAR[i][0];
      quotes.add(
          MarketQuotes.swap(
              years + "Y",
              0,
              years,
              QuoteSheets.every(0, 1, years),
              QuoteSheets.same(1, years),
              PAR[i][1] / 100 + (i == moved ? by : 0)));
    }
    return quotes;
  }

  @Test
  void theReleasedWeightsAreMet() {
    CurveFit fit = RELEASED.withSpeed(0.122841).build(swaps(-1, 0));
    double[] weights = ((SmithWilsonCurve) fit.curve()).weights();
    double[][] released = {
      {1, 21.6663371217895}, {2, -19.3338695556769}, {10, 16.58228181427},
      {11, -20.302361961736}, {15, -2.59126974023617}, {20, 0.946306275739273}
    };
    for (double[] row : released) {
      assertThat(weights[(int) row[0] - 1]).isCloseTo(row[1], within(1e-9));
    }
    assertThat(fit.problem()).isEmpty();
  }

  @Test
  void spotRatesMeetTheHighPrecisionRecomputation() {
    // Annual rates in percent; beyond the released one-year rate from a 40-digit recomputation, not
    // published figures.
    double[][] spot = {
      {1, 0.736},
      {10, 2.08926717},
      {20, 2.16979255},
      {30, 2.30653800},
      {60, 2.82158825},
      {100, 3.07166103},
      {150, 3.19761593}
    };
    DiscountCurve curve = RELEASED.withSpeed(0.122841).build(swaps(-1, 0)).curve();
    for (double[] row : spot) {
      double rate = 100 * Math.expm1(curve.zero(row[0]));
      assertThat(rate).isCloseTo(row[1], within(5e-9));
    }
  }

  @Test
  void theSpeedIsSearchedAsTheRegulatorRoundsIt() {
    CurveFit fit = RELEASED.build(swaps(-1, 0));
    SmithWilsonCurve curve = (SmithWilsonCurve) fit.curve();
    assertThat(curve.speed()).isEqualTo(0.122841);
    assertThat(curve.gap(60)).isLessThanOrEqualTo(1e-4);
    assertThat(fit.unmet()).isEmpty();
    CurveFit slower = RELEASED.withSpeed(0.122840).build(swaps(-1, 0));
    assertThat(slower.warnings()).anyMatch(text -> text.contains("convergence point"));
  }

  @Test
  void sensitivitiesToQuotesAgreeWithFiniteDifferences() {
    SmithWilsonBuilder builder = RELEASED.withSpeed(0.122841);
    CurveFit fit = builder.build(swaps(-1, 0));
    double worst = 0;
    for (int i = 0; i < PAR.length; i++) {
      DiscountCurve up = builder.build(swaps(i, 1e-6)).curve();
      DiscountCurve down = builder.build(swaps(i, -1e-6)).curve();
      for (double t : new double[] {0.5, 1, 3.7, 13, 20, 45, 90}) {
        double difference = (up.discount(t) - down.discount(t)) / 2e-6;
        worst = Math.max(worst, Math.abs(fit.discountByQuote(t)[i] - difference));
      }
    }
    assertThat(worst).isLessThan(1e-7);
  }

  @Test
  void aMixedSheetWithALagIsRefusedAndWithoutItRepriced() {
    List<QuoteEquation> quotes = QuoteSheets.mixed();
    assertThatThrownBy(() -> RELEASED.build(quotes)).hasMessageContaining("found ois-2");
    quotes.removeIf(quote -> !quote.isLinear());
    CurveFit fit = RELEASED.build(quotes);
    assertThat(fit.problem()).isEmpty();
    assertThat(fit.isConverged()).isTrue();
  }

  @Test
  void settingsThatLeadNowhereAreRefused() {
    assertThatThrownBy(() -> SmithWilsonBuilder.of(-1, 60)).hasMessageContaining("above -1");
    assertThatThrownBy(() -> SmithWilsonBuilder.of(0.03, 0)).hasMessageContaining("found 0.0");
    assertThatThrownBy(() -> RELEASED.withSpeed(0)).hasMessageContaining("found 0.0");
    assertThatThrownBy(() -> RELEASED.withTolerance(0)).hasMessageContaining("found 0.0");
    assertThatThrownBy(() -> RELEASED.build(List.of())).hasMessageContaining("found none");
    assertThatThrownBy(
            () -> SmithWilsonBuilder.of(0.0345, 21).withTolerance(1e-9).build(swaps(-1, 0)))
        .hasMessageContaining("no speed");
  }

  @Test
  void momentsThatDifferByRoundingAreOne() {
    List<QuoteEquation> quotes = new ArrayList<>();
    quotes.add(MarketQuotes.swap("a", 0, 0.3, new double[] {0.3}, new double[] {0.3}, 0.02));
    double other = 0.1 + 0.2; // not 0.3
    quotes.add(
        MarketQuotes.swap("b", 0, 2, new double[] {other, 2}, new double[] {0.3, 1.7}, 0.021));
    CurveFit fit = RELEASED.withSpeed(0.1).build(quotes);
    assertThat(fit.curve().nodes()).hasSize(2);
    assertThat(fit.problem()).isEmpty();
    double[] gradient = new double[2];
    fit.curve().addLogDiscountGradient(2, 1, gradient);
    assertThat(gradient).containsExactly(new double[] {0, 1}, within(1e-12));
  }
}
