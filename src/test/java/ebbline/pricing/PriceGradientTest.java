package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.DiscountCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.instrument.Bond;
import ebbline.instrument.BondOption;
import ebbline.instrument.BondTerms;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Instrument;
import ebbline.instrument.OptionKind;
import ebbline.instrument.RateBasis;
import ebbline.instrument.RateOptionStrip;
import ebbline.instrument.Right;
import ebbline.instrument.SwapSide;
import ebbline.instrument.Swaption;
import ebbline.instrument.ZeroBond;
import ebbline.instrument.ZeroOption;
import ebbline.model.GaussianRates;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import ebbline.time.Tenor;
import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;

class PriceGradientTest {
  private static final double[] NODES = {0.5, 1, 2, 3, 5, 7, 10, 15, 20};
  private static final double[] ENDS = {1, 2.5};
  private static final double[] SIGMAS = {0.006, 0.012, 0.009};

  private static double[] logs() {
    double[] logs = new double[NODES.length];
    for (int i = 0; i < logs.length; i++) {
      logs[i] = -NODES[i] * (0.025 + 0.001 * NODES[i]);
    }
    return logs;
  }

  private static GaussianRates rates(double a, double[] sigmas, double[] logs) {
    DiscountCurve curve = InterpolatedCurve.of(Interpolation.CUBIC, NODES, logs);
    return new GaussianRates(curve, a, VolatilitySteps.of(ENDS, sigmas));
  }

  private static List<Instrument> instruments(double shift) {
    BondTerms bond = BondTerms.of(Moment.ofYears(9.3), 2, DayCount.ACT_ACT_ICMA);
    List<Instrument> all = new ArrayList<>();
    for (OptionKind option : OptionKind.values()) {
      OptionalDouble rate = OptionalDouble.of(0.038 + shift);
      all.add(
          new ZeroOption(
              option, Moment.ofYears(3.1), ZeroBond.of(Moment.ofYears(8), 100), 83 + shift));
      all.add(
          new BondOption(
              option,
              Moment.ofYears(2.2),
              new Bond(ebbline.instrument.FixedLeg.of(bond, 0.045)),
              103 + shift,
              BondOption.StrikeKind.CLEAN));
      for (RateBasis basis : RateBasis.values()) {
        all.add(
            new RateOptionStrip(
                option, BondTerms.of(Moment.ofYears(6), 4, DayCount.ACT_ACT_ICMA), rate, basis));
      }
    }
    for (SwapSide side : SwapSide.values()) {
      all.add(
          Swaption.of(
              side, Moment.ofYears(4), Tenor.parse("10Y"), 2, OptionalDouble.of(0.04 + shift)));
    }
    return all;
  }

  /** Central differences of two steps, the error of the fourth order taken out. */
  private static double slope(DoubleUnaryOperator f, double step) {
    double narrow = (f.applyAsDouble(step) - f.applyAsDouble(-step)) / (2 * step);
    double wide = (f.applyAsDouble(2 * step) - f.applyAsDouble(-2 * step)) / (4 * step);
    return (4 * narrow - wide) / 3;
  }

  private static double price(Instrument instrument, GaussianRates rates) {
    return ClosedForm.value(Market.of(TimeAxis.undated(), rates).claim(instrument), rates)
        .presentValue();
  }

  private static void close(double found, double expected) {
    assertThat(found).isCloseTo(expected, within(1e-7 * Math.max(1, Math.abs(expected))));
  }

  @Test
  void everyDerivativeIsTheSlopeOfTheValue() {
    for (double a : new double[] {0.07, 0, -0.03, 1.3}) {
      GaussianRates rates = rates(a, SIGMAS, logs());
      List<Instrument> all = instruments(0);
      for (int n = 0; n < all.size(); n++) {
        int which = n;
        Instrument instrument = all.get(n);
        Claim claim = Market.of(TimeAxis.undated(), rates).claim(instrument);
        PriceGradient gradient = PriceGradient.of(claim, rates);
        assertThat(gradient.value())
            .isCloseTo(ClosedForm.value(claim, rates).presentValue(), within(1e-12));
        close(
            gradient.byMeanReversion(),
            slope(h -> price(instrument, rates(a + h, SIGMAS, logs())), 1e-3));
        for (int k = 0; k < SIGMAS.length; k++) {
          int step = k;
          DoubleUnaryOperator f =
              h -> {
                double[] moved = SIGMAS.clone();
                moved[step] += h;
                return price(instrument, rates(a, moved, logs()));
              };
          close(gradient.byVolatility()[k], slope(f, 1e-5));
        }
        double[] byNode = gradient.byNode(rates.curve());
        for (int k = 0; k < NODES.length; k++) {
          int node = k;
          DoubleUnaryOperator f =
              h -> {
                double[] moved = logs();
                moved[node] += h;
                return price(instrument, rates(a, SIGMAS, moved));
              };
          close(byNode[k], slope(f, 2e-5));
        }
        double unit =
            instrument instanceof ZeroOption || instrument instanceof BondOption ? 1e-2 : 1e-5;
        close(gradient.byStrike(), slope(h -> price(instruments(h).get(which), rates), unit));
      }
    }
  }

  @Test
  void aCallableBondIsStraightBondLessWhatTheIssuerHolds() {
    GaussianRates rates = rates(0.05, SIGMAS, logs());
    CashFlows flows = CashFlows.of(new double[] {1, 2, 3, 4}, new double[] {4, 4, 4, 104});
    Claim callable =
        new Claim(
            flows, List.of(new Right(Right.Party.ISSUER, 2, 2, CashFlows.single(2, 100))), 0, 0);
    PriceGradient gradient = PriceGradient.of(callable, rates);
    DoubleUnaryOperator f =
        h ->
            ClosedForm.value(
                    callable,
                    rates(0.05, new double[] {SIGMAS[0], SIGMAS[1] + h, SIGMAS[2]}, logs()))
                .presentValue();
    close(gradient.byVolatility()[1], slope(f, 1e-5));
    assertThat(gradient.byVolatility()[1]).isNegative();
    assertThat(gradient.byVolatility()[2]).isZero();
    assertThat(gradient.byStrike()).isZero();
  }

  @Test
  void withoutVarianceTheExerciseIsCertain() {
    GaussianRates rates = rates(0.05, new double[3], logs());
    for (Instrument instrument : instruments(0.02)) {
      Claim claim = Market.of(TimeAxis.undated(), rates).claim(instrument);
      PriceGradient gradient = PriceGradient.of(claim, rates);
      assertThat(gradient.byVolatility()).containsOnly(0);
      assertThat(gradient.byMeanReversion()).isZero();
      assertThat(gradient.byStrike()).isFinite();
    }
  }

  @Test
  void twoRightsHaveNoClosedForm() {
    Right right = new Right(Right.Party.HOLDER, 1, 1, CashFlows.NONE);
    Claim two = new Claim(CashFlows.NONE, List.of(right, right), 0, 0);
    assertThatThrownBy(() -> PriceGradient.of(two, rates(0.05, SIGMAS, logs())))
        .hasMessageContaining("found 2");
  }

  @Test
  void vasiceksDiscountsMoveWithItsFourParameters() {
    double[] p = {0.03, 0.045, 0.2, 0.011};
    for (double kappa : new double[] {0.2, 0, -0.05, 1e-9, 2}) {
      for (double t : new double[] {0.5, 3, 30}) {
        double[] gradient = new double[4];
        new Vasicek(p[0], p[1], kappa, p[3]).addLogDiscountGradient(t, 1, gradient);
        DoubleUnaryOperator[] moves = {
          h -> log(p[0] + h, p[1], kappa, p[3], t),
          h -> log(p[0], p[1] + h, kappa, p[3], t),
          h -> log(p[0], p[1], kappa + h, p[3], t),
          h -> log(p[0], p[1], kappa, p[3] + h, t)
        };
        for (int i = 0; i < 4; i++) {
          double scale = i == 2 ? 1e-3 : 1e-4;
          close(gradient[i], slope(moves[i], scale));
        }
      }
    }
  }

  private static double log(double r, double theta, double kappa, double sigma, double t) {
    return new Vasicek(r, theta, kappa, sigma).rates().curve().logDiscount(t);
  }
}
