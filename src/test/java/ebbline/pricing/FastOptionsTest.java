package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.StandardNormal;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import java.util.List;
import java.util.SplittableRandom;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;

/** Every fast kernel against its slow twin. */
class FastOptionsTest {
  private static final VolatilitySteps CONSTANT = VolatilitySteps.constant(0.012);
  private static final VolatilitySteps STEPS =
      VolatilitySteps.of(new double[] {1, 4}, new double[] {0.01, 0.02, 0.005});

  private static GaussianRates rates(double reversion, VolatilitySteps volatility) {
    return new HullWhite(reversion, volatility)
        .on(new Vasicek(0.02, 0.05, 0.3, 0.01).rates().curve());
  }

  private static double slow(GaussianRates rates, double decision, CashFlows received) {
    Right right = new Right(Right.Party.HOLDER, decision, decision, received);
    Claim claim = new Claim(CashFlows.NONE, List.of(right), 0, 0);
    return ClosedForm.value(claim, rates).presentValue();
  }

  @Test
  void zeroOptionsAgreeWithTheClosedFormAloneAndInBlocks() {
    SplittableRandom random = new SplittableRandom(5);
    int n = ZeroOptions.BLOCK + 77;
    double[] expiry = new double[n];
    double[] maturity = new double[n];
    double[] strike = new double[n];
    double[] values = new double[n];
    for (double a : new double[] {-0.05, 0, 1e-300, 1e-9, 0.05, 2}) {
      for (VolatilitySteps volatility :
          List.of(CONSTANT, STEPS, VolatilitySteps.constant(0), VolatilitySteps.constant(0.05))) {
        GaussianRates rates = rates(a, volatility);
        ZeroOptions options = ZeroOptions.under(rates);
        for (int i = 0; i < n; i++) {
          expiry[i] = i % 11 == 0 ? 0 : random.nextDouble(0, 20);
          maturity[i] = expiry[i] + random.nextDouble(0, 30);
          strike[i] =
              switch (i % 13) {
                case 0 -> 0;
                case 1 -> -0.5;
                case 2 -> 3;
                default ->
                    Math.exp(
                        rates.logBond(
                            expiry[i],
                            maturity[i],
                            random.nextDouble(-5, 5) * Math.sqrt(rates.variance(expiry[i]))));
              };
        }
        options.calls(expiry, maturity, strike, values);
        for (int i = 0; i < n; i++) {
          CashFlows flows =
              CashFlows.of(new double[] {expiry[i], maturity[i]}, new double[] {-strike[i], 1});
          double call = slow(rates, expiry[i], flows);
          double put = slow(rates, expiry[i], flows.times(-1));
          double room = 1e-13 * Math.max(1, Math.abs(strike[i]));
          String which = "a = %s, case %s of %s".formatted(a, i, volatility);
          assertThat(values[i]).as(which).isCloseTo(call, within(room));
          assertThat(options.call(expiry[i], maturity[i], strike[i]))
              .as(which)
              .isCloseTo(call, within(room));
          assertThat(options.put(expiry[i], maturity[i], strike[i]))
              .as(which)
              .isCloseTo(put, within(room));
        }
      }
    }
  }

  @Test
  void couponOptionsAgreeWithTheClosedFormAloneAndInBlocks() {
    SplittableRandom random = new SplittableRandom(6);
    int n = CouponOptions.BLOCK + 9;
    int flows = 7;
    double[] expiry = new double[n];
    double[] strike = new double[n];
    double[][] times = new double[flows][n];
    double[][] amounts = new double[flows][n];
    double[] values = new double[n];
    CouponOptions.Work work = new CouponOptions.Work(flows);
    double[] t = new double[flows];
    double[] c = new double[flows];
    for (double a : new double[] {-0.05, 0, 1e-9, 0.05, 2}) {
      for (VolatilitySteps volatility :
          List.of(CONSTANT, STEPS, VolatilitySteps.constant(0), VolatilitySteps.constant(0.04))) {
        GaussianRates rates = rates(a, volatility);
        CouponOptions options = CouponOptions.under(rates);
        for (int i = 0; i < n; i++) {
          expiry[i] = i % 11 == 0 ? 0 : random.nextDouble(0, 15);
          double x = random.nextDouble(-5, 5) * Math.sqrt(rates.variance(expiry[i]));
          strike[i] = 0;
          for (int j = 0; j < flows; j++) {
            times[j][i] = expiry[i] + j + random.nextDouble(0.9, 1.1);
            amounts[j][i] = random.nextDouble(1, 6) + (j == flows - 1 ? 100 : 0);
            strike[i] += amounts[j][i] * Math.exp(rates.logBond(expiry[i], times[j][i], x));
          }
          strike[i] = i % 17 == 3 ? -1 : strike[i];
        }
        options.calls(expiry, strike, times, amounts, values);
        for (int i = 0; i < n; i++) {
          for (int j = 0; j < flows; j++) {
            t[j] = times[j][i];
            c[j] = amounts[j][i];
          }
          CashFlows exchanged = CashFlows.single(expiry[i], -strike[i]).plus(CashFlows.of(t, c));
          double call = slow(rates, expiry[i], exchanged);
          double put = slow(rates, expiry[i], exchanged.times(-1));
          double room = 1e-13 * Math.max(100, strike[i]);
          String which = "a = %s, case %s of %s".formatted(a, i, volatility);
          assertThat(values[i]).as(which).isCloseTo(call, within(room));
          assertThat(options.call(expiry[i], strike[i], t, c, flows, work))
              .as(which)
              .isCloseTo(call, within(room));
          assertThat(options.put(expiry[i], strike[i], t, c, flows, work))
              .as(which)
              .isCloseTo(put, within(room));
        }
      }
    }
  }

  @Test
  void theTwoFactorsOfTheNormalTailMakeTheNormalTail() {
    int n = 801;
    double[] x = new double[n];
    for (int i = 0; i < n; i++) {
      x[i] = (i - 400) * 0.1;
    }
    double[] ratio = new double[n];
    double[] density = new double[n];
    double[] sum = new double[n];
    double[] ones = new double[n];
    FastNormal.ratio(x, ratio, n);
    FastNormal.halfSquareExp(x, density, n);
    double[] tail = new double[n];
    for (int i = 0; i < n; i++) {
      ones[i] = 1;
      tail[i] = ratio[i] * density[i];
      double exact = StandardNormal.cdf(-Math.abs(x[i]));
      if (Math.abs(x[i]) <= 37.5) {
        double relative = 1e-15 * (3 + x[i] * x[i]);
        assertThat(tail[i]).isCloseTo(exact, within(relative * exact));
        assertThat(FastNormal.ratio(x[i])).isCloseTo(ratio[i], within(9e-16 * ratio[i]));
      } else {
        assertThat(tail[i]).isCloseTo(exact, within(1e-300));
      }
    }
    FastNormal.addSided(1, x, ones, tail, sum, n);
    for (int i = 0; i < n; i++) {
      assertThat(sum[i]).isCloseTo(StandardNormal.cdf(x[i]), within(2e-15));
      assertThat(ZeroOptions.sided(x[i], 1, tail[i])).isCloseTo(sum[i], within(2e-16));
    }
    assertThat(FastNormal.ratio(Double.POSITIVE_INFINITY)).isZero();
  }

  @Test
  void exponentialsAndLogarithmsHoldInsideAndOutsideTheirReach() {
    for (double top : new double[] {0.1, 1, FastExp.REACH, FastExp.REACH * 1.01, 300}) {
      compare(top, -top, Math::exp, FastExp::exp, 2e-15);
      compare(top, -top, Math::expm1, FastExp::expm1, 2e-15);
      compare(top, -top, Math::expm1, FastOptionsTest::scalar, 2e-15);
      compare(top, -top, Math::exp, FastOptionsTest::scalarExp, 1e-15);
    }
    compare(2, 0.5, Math::log, FastLog::log, 3e-16);
    compare(50, 1e-3, Math::log, FastLog::log, 3e-16);
    assertThat(FastExp.expm1(1e-300)).isEqualTo(1e-300);
    assertThat(FastExp.expm1(1e-12)).isCloseTo(Math.expm1(1e-12), within(1e-27));
  }

  private interface Block {
    void apply(double[] x, double[] out, int n);
  }

  private static void scalar(double[] x, double[] out, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = FastExp.expm1(x[i]);
    }
  }

  private static void scalarExp(double[] x, double[] out, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = FastExp.exp(x[i]);
    }
  }

  private static void compare(
      double high, double low, DoubleUnaryOperator slow, Block fast, double tolerance) {
    int n = 257;
    double[] x = new double[n];
    double[] out = new double[n];
    for (int i = 0; i < n; i++) {
      x[i] = low + (high - low) * i / (n - 1);
    }
    fast.apply(x, out, n);
    for (int i = 0; i < n; i++) {
      double exact = slow.applyAsDouble(x[i]);
      double room = tolerance * Math.max(1, Math.abs(exact)) * Math.max(1, Math.abs(x[i]));
      assertThat(out[i]).as("at %s", x[i]).isCloseTo(exact, within(room));
    }
  }
}
