package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.DiscountCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.curve.SpreadCurve;
import ebbline.instrument.Bond;
import ebbline.instrument.BondOption;
import ebbline.instrument.BondTerms;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.FixedLeg;
import ebbline.instrument.Instrument;
import ebbline.instrument.OptionKind;
import ebbline.instrument.RateBasis;
import ebbline.instrument.RateOptionStrip;
import ebbline.instrument.SwapSide;
import ebbline.instrument.Swaption;
import ebbline.instrument.ZeroBond;
import ebbline.instrument.ZeroOption;
import ebbline.model.GaussianRates;
import ebbline.model.VolatilitySteps;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import ebbline.time.Tenor;
import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class OptionSheetTest {
  private static final DiscountCurve CURVE =
      InterpolatedCurve.ofDiscounts(
          Interpolation.LOG_LINEAR,
          new double[] {0.5, 1, 2, 5, 10, 20, 30},
          new double[] {0.985, 0.968, 0.934, 0.83, 0.672, 0.43, 0.29});
  private static final BondTerms QUARTERS =
      BondTerms.of(Moment.ofYears(6), 4, DayCount.ACT_ACT_ICMA);

  private static List<Claim> claims() {
    Market single = Market.of(TimeAxis.undated(), CURVE);
    Market two = single.withProjection(new SpreadCurve(CURVE, 0.003));
    List<Claim> claims = new ArrayList<>();
    for (double strike : new double[] {-0.01, 0.02, 0.04, 0.08}) {
      OptionalDouble k = OptionalDouble.of(strike);
      for (SwapSide side : SwapSide.values()) {
        Swaption swaption = Swaption.of(side, Moment.ofYears(4), Tenor.parse("7Y"), 2, k);
        claims.add(single.claim(swaption));
        claims.add(two.claim(swaption));
      }
      for (OptionKind option : OptionKind.values()) {
        for (RateBasis basis : RateBasis.values()) {
          claims.add(single.claim(new RateOptionStrip(option, QUARTERS, k, basis)));
          claims.add(two.claim(new RateOptionStrip(option, QUARTERS, k, basis)));
        }
        claims.add(
            single.claim(
                new ZeroOption(
                    option,
                    Moment.ofYears(2),
                    ZeroBond.of(Moment.ofYears(9), 100),
                    70 + 200 * strike)));
        claims.add(single.claim(bondOption(option, 95 + 100 * strike)));
      }
    }
    return claims;
  }

  private static Instrument bondOption(OptionKind option, double strike) {
    return new BondOption(
        option,
        Moment.ofYears(1.3),
        new Bond(FixedLeg.of(QUARTERS, 0.04)),
        strike,
        BondOption.StrikeKind.CLEAN);
  }

  @Test
  void pricesAndSlopesAreThoseOfTheGeneralWayWhateverWentBefore() {
    List<Claim> claims = claims();
    OptionSheet sheet = OptionSheet.of(claims, CURVE);
    int n = claims.size();
    double[] values = new double[n];
    double[] byReversion = new double[n];
    double[][] byVolatility = new double[2][n];
    double[][] models = {
      {0.05, 0.01, 0.008}, {1.5, 0.04, 0.05}, {0, 0.007, 0.007}, {-0.05, 0.001, 0.02}
    };
    for (double[] m : models) {
      VolatilitySteps steps = VolatilitySteps.of(new double[] {3}, new double[] {m[1], m[2]});
      GaussianRates rates = new GaussianRates(CURVE, m[0], steps);
      sheet.evaluate(m[0], steps, values, byReversion, byVolatility);
      for (int i = 0; i < n; i++) {
        PriceGradient exact = PriceGradient.of(claims.get(i), rates);
        assertThat(values[i])
            .isCloseTo(ClosedForm.value(claims.get(i), rates).presentValue(), within(2e-12));
        assertThat(byReversion[i])
            .isCloseTo(
                exact.byMeanReversion(), within(1e-7 * (1 + Math.abs(exact.byMeanReversion()))));
        for (int k = 0; k < 2; k++) {
          double slope = exact.byVolatility()[k];
          assertThat(byVolatility[k][i]).isCloseTo(slope, within(1e-7 * (1 + Math.abs(slope))));
        }
      }
    }
  }

  @Test
  void withoutVolatilityOptionsAreWorthTheirIntrinsicValue() {
    List<Claim> claims = claims();
    OptionSheet sheet = OptionSheet.of(claims, CURVE);
    double[] values = new double[claims.size()];
    VolatilitySteps none = VolatilitySteps.constant(0);
    sheet.evaluate(0.05, none, values, new double[values.length], new double[1][values.length]);
    for (int i = 0; i < values.length; i++) {
      double intrinsic = VolatilityTerms.of(claims.get(i), CURVE).intrinsic();
      assertThat(values[i]).isCloseTo(intrinsic, within(1e-11));
    }
  }

  @Test
  void aVolatilityOfACapComesBackFromItsPremium() {
    Claim cap =
        Market.of(TimeAxis.undated(), CURVE)
            .claim(
                new RateOptionStrip(
                    OptionKind.CALL, QUARTERS, OptionalDouble.of(0.04), RateBasis.FORWARD));
    VolatilityTerms terms = VolatilityTerms.of(cap, CURVE);
    for (VolatilityLaw law : VolatilityLaw.values()) {
      for (double vol : new double[] {1e-3, 0.01, 0.3}) {
        double premium = terms.premium(law, vol, 0.02);
        assertThat(terms.implied(law, premium, 0.02)).isCloseTo(vol, within(1e-11 * vol));
        double h = 1e-5 * vol;
        double slope =
            (terms.premium(law, vol + h, 0.02) - terms.premium(law, vol - h, 0.02)) / (2 * h);
        assertThat(terms.vega(law, vol, 0.02)).isCloseTo(slope, within(1e-6 * slope));
      }
    }
    assertThat(terms.isOnRates()).isTrue();
    assertThat(terms.expiry()).isEqualTo(0.25);
    assertThat(terms.lastExpiry()).isEqualTo(5.75);
    assertThatThrownBy(() -> terms.implied(VolatilityLaw.NORMAL, -1, 0))
        .hasMessageContaining("below the intrinsic value");
    assertThatThrownBy(() -> terms.implied(VolatilityLaw.BLACK, terms.most() * 40, 0))
        .hasMessageContaining("too high");
    assertThatThrownBy(() -> terms.premium(VolatilityLaw.BLACK, -0.1, 0))
        .hasMessageContaining("at least 0");
    assertThatThrownBy(() -> VolatilityTerms.of(Claim.of(CashFlows.single(1, 1)), CURVE))
        .hasMessageContaining("an option by itself");
  }
}
