package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.ReferenceTable;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class ClosedFormTest {
  private static final GaussianRates RATES =
      new HullWhite(0.05, VolatilitySteps.constant(0.012))
          .on(new Vasicek(0.02, 0.05, 0.3, 0).rates().curve());

  private static Claim option(double decision, CashFlows received) {
    return new Claim(
        CashFlows.NONE, List.of(new Right(Right.Party.HOLDER, decision, decision, received)), 0, 0);
  }

  private static double value(Claim claim) {
    return ClosedForm.value(claim, RATES).presentValue();
  }

  @Test
  void valuesMatchTheQuadratureTableWithinTheirOwnErrorBounds() {
    ReferenceTable table = ReferenceTable.read(ClosedFormTest.class, "exercise-value");
    double worst = 0;
    int slack = 0;
    for (int i = 0; i < table.size(); i++) {
      GaussianRates rates =
          new HullWhite(
                  table.number(i, "mean_reversion"),
                  VolatilitySteps.constant(table.number(i, "volatility")))
              .on(
                  new Vasicek(
                          table.number(i, "short_rate"),
                          table.number(i, "long_run_mean"),
                          table.number(i, "curve_reversion"),
                          table.number(i, "curve_volatility"))
                      .rates()
                      .curve());
      CashFlows flows = CashFlows.of(list(table, i, "times"), list(table, i, "amounts"));
      Valuation found = ClosedForm.value(option(table.number(i, "decision"), flows), rates);
      double face = 0;
      for (double amount : flows.amounts()) {
        face = Math.max(face, Math.abs(amount));
      }
      double error = table.error(i, "value", found.presentValue());
      worst = Math.max(worst, error / face);
      assertThat(error).as("row %s", i).isLessThanOrEqualTo(found.errorBound());
      slack += found.errorBound() > 100 * Math.max(error, Math.ulp(face)) ? 1 : 0;
    }
    assertThat(worst).isLessThanOrEqualTo(table.tolerance()).isGreaterThan(table.tolerance() / 20);
    assertThat(slack).as("bounds that are far too wide").isLessThan(table.size() / 10);
  }

  private static double[] list(ReferenceTable table, int row, String column) {
    String[] parts = table.text(row, column).split(";", -1);
    double[] numbers = new double[parts.length];
    for (int i = 0; i < numbers.length; i++) {
      numbers[i] = Double.parseDouble(parts[i]);
    }
    return numbers;
  }

  @Test
  void aThousandOptionsOnZeroAndCouponBondsAgreeWithDirectIntegration() {
    SplittableRandom random = new SplittableRandom(20260101);
    for (int i = 0; i < 1000; i++) {
      RandomOption option = RandomOption.draw(random, i % 2 == 0);
      String which = "seed 20260101, case " + i + ": " + option;
      double[] values = new double[2];
      for (int k = 0; k < 2; k++) {
        Claim claim = option.claim(1 - 2 * k);
        values[k] = ClosedForm.value(claim, option.rates()).presentValue();
        double direct = IntegrationCheck.value(claim, option.rates()).presentValue();
        double room = Math.max(1e-12 * option.face(), 1e-10 * Math.abs(direct));
        assertThat(values[k]).as(which).isCloseTo(direct, within(room));
      }
      double forward = Discounting.value(option.received(), option.rates().curve()).presentValue();
      double largest = Math.max(option.face(), Math.max(values[0], values[1]));
      assertThat(values[0] - values[1]).as(which).isCloseTo(forward, within(1e-12 * largest));
    }
  }

  @Test
  void flowsOfMixedSignAgreeWithDirectIntegration() {
    SplittableRandom random = new SplittableRandom(77);
    int many = 0;
    for (int i = 0; i < 300; i++) {
      int n = 3 + random.nextInt(6);
      double[] times = new double[n];
      double[] amounts = new double[n];
      for (int k = 0; k < n; k++) {
        times[k] = 2 + 3.0 * k * (0.5 + random.nextDouble());
        times[k] = k == 0 ? 2 : Math.max(times[k], times[k - 1]);
        amounts[k] = random.nextDouble(-100, 100);
      }
      GaussianRates rates = new HullWhite(0.02, VolatilitySteps.constant(0.03)).on(RATES.curve());
      Claim claim = option(2, CashFlows.of(times, amounts));
      Valuation found = ClosedForm.value(claim, rates);
      Valuation direct = IntegrationCheck.value(claim, rates);
      double room = Math.max(1e-10, 1e-12 * Math.abs(found.presentValue()));
      assertThat(found.presentValue())
          .as("seed 77, case %s: %s", i, claim)
          .isCloseTo(direct.presentValue(), within(room));
      many += found.presentValue() > 0 ? 1 : 0;
    }
    assertThat(many).isGreaterThan(250);
  }

  @Test
  void allRootsOfAPolynomialAreFound() {
    // (u − 1)(u − 2)(u − 3)(u − 4)(u − 5) with u = e^(−z).
    double[] coefficients = {-120, 274, -225, 85, -15, 1};
    double[] exponents = {0, 1, 2, 3, 4, 5};
    ExponentialSum sum = ExponentialSum.of(coefficients, new double[6], exponents);
    assertThat(sum.signChanges()).isEqualTo(5);
    double[] roots = sum.roots(-40, 40);
    assertThat(roots).hasSize(5);
    for (int i = 0; i < 5; i++) {
      assertThat(roots[i]).isCloseTo(-Math.log(5 - i), within(1e-12));
    }
    assertThat(sum.roots(-1, 40)).hasSize(2);
    assertThat(sum.roots(1, 40)).isEmpty();
  }

  @Test
  void anOptionOnAZeroBondIsBlacksFormulaOnItsForward() {
    double s = 3;
    double maturity = 8;
    double v = Math.sqrt(RATES.variance(s)) * RATES.g(maturity - s);
    double forward = 100 * RATES.curve().discount(maturity);
    double strike = 80 * RATES.curve().discount(s);
    CashFlows flows = CashFlows.of(new double[] {s, maturity}, new double[] {-80, 100});
    assertThat(value(option(s, flows)))
        .isCloseTo(BlackFormula.call(forward, strike, v), within(2e-14));
    assertThat(value(option(s, flows.times(-1))))
        .isCloseTo(BlackFormula.put(forward, strike, v), within(2e-14));
  }

  @Test
  void anIssuersRightTakesFromTheHolderWhatItWouldGiveHim() {
    CashFlows bond = CashFlows.of(new double[] {1, 2, 3, 4}, new double[] {5, 5, 5, 105});
    Right call = new Right(Right.Party.ISSUER, 2, 2, CashFlows.single(2, 100));
    Valuation callable = ClosedForm.value(new Claim(bond, List.of(call), 0, 0), RATES);
    double straight = Discounting.value(bond, RATES.curve()).presentValue();
    double option = value(option(2, bond.after(2).plus(CashFlows.single(2, -100))));
    assertThat(callable.presentValue()).isCloseTo(straight - option, within(3e-14));
    Right put = new Right(Right.Party.HOLDER, 2, 2, CashFlows.single(2, 100));
    Claim putable = new Claim(bond, List.of(put), 0, 0);
    double floor = value(option(2, bond.after(2).times(-1).plus(CashFlows.single(2, 100))));
    assertThat(value(putable)).isCloseTo(straight + floor, within(3e-14));
    assertThat(ClosedForm.rightValue(putable, RATES).presentValue()).isCloseTo(floor, within(0.0));
    assertThat(ClosedForm.rightValue(new Claim(bond, List.of(call), 0, 0), RATES).presentValue())
        .isCloseTo(-option, within(1e-14));
  }

  @Test
  void aNoticePeriodKeepsTheFlowsInBetween() {
    CashFlows bond = CashFlows.of(new double[] {1, 2, 3, 4}, new double[] {5, 5, 5, 105});
    Right call = new Right(Right.Party.ISSUER, 1.5, 2, CashFlows.single(2, 100));
    Claim claim = new Claim(bond, List.of(call), 0, 0);
    double direct = IntegrationCheck.value(claim, RATES).presentValue();
    assertThat(value(claim)).isCloseTo(direct, within(1e-11));
    double straight = Discounting.value(bond, RATES.curve()).presentValue();
    assertThat(direct).isLessThan(straight);
  }

  @Test
  void withoutUncertaintyAnOptionIsWorthItsIntrinsicValue() {
    CashFlows flows = CashFlows.of(new double[] {2, 7}, new double[] {-70, 100});
    GaussianRates still = new HullWhite(0.05, VolatilitySteps.constant(0)).on(RATES.curve());
    double intrinsic = Discounting.value(flows, RATES.curve()).presentValue();
    assertThat(intrinsic).isPositive();
    assertThat(ClosedForm.value(option(2, flows), still).presentValue()).isEqualTo(intrinsic);
    assertThat(ClosedForm.value(option(2, flows.times(-1)), still).presentValue()).isZero();
    CashFlows now = CashFlows.of(new double[] {0, 7}, new double[] {-70, 100});
    double today = Discounting.value(now, RATES.curve()).presentValue();
    assertThat(value(option(0, now))).isCloseTo(Math.max(0, today), within(1e-14));
    assertThat(value(option(0, now.times(-1)))).isCloseTo(Math.max(0, -today), within(1e-14));
    for (double sigma : new double[] {1e-300, 1e-20, 1e-9, 1e-7}) {
      GaussianRates calm = new HullWhite(0.05, VolatilitySteps.constant(sigma)).on(RATES.curve());
      assertThat(ClosedForm.value(option(2, flows), calm).presentValue())
          .isCloseTo(intrinsic, within(1e-13));
    }
  }

  @Test
  void strikesOfZeroAndBelowMakeTheCallCertain() {
    CashFlows bond = CashFlows.of(new double[] {3, 4}, new double[] {5, 105});
    double worth = Discounting.value(bond, RATES.curve()).presentValue();
    assertThat(value(option(2, bond))).isEqualTo(worth);
    CashFlows negative = CashFlows.single(2, 10).plus(bond);
    assertThat(value(option(2, negative)))
        .isCloseTo(worth + 10 * RATES.curve().discount(2), within(3e-14));
    assertThat(value(option(2, negative.times(-1)))).isZero();
    assertThat(value(option(2, CashFlows.NONE))).isZero();
  }

  @Test
  void whatIsGivenAndTakenAtOnceIsWorthNothing() {
    CashFlows same = CashFlows.of(new double[] {2, 3, 3}, new double[] {0, 50, -50});
    assertThat(value(option(2, same))).isZero();
    assertThat(ClosedForm.value(Claim.of(CashFlows.NONE), RATES))
        .isEqualTo(new Valuation(0, Method.CLOSED_FORM, 0));
  }

  @Test
  void moreThanOneRightIsRefused() {
    Right right = new Right(Right.Party.HOLDER, 1, 1, CashFlows.NONE);
    Claim two = new Claim(CashFlows.NONE, List.of(right, right), 0, 0);
    assertThat(ClosedForm.applies(two)).isFalse();
    assertThatThrownBy(() -> ClosedForm.value(two, RATES)).hasMessageContaining("found 2");
    assertThatThrownBy(() -> ClosedForm.rightValue(two, RATES)).hasMessageContaining("found 2");
    assertThatThrownBy(() -> IntegrationCheck.value(two, RATES)).hasMessageContaining("found 2");
    assertThatThrownBy(() -> Discounting.value(two, RATES.curve())).hasMessageContaining("found 2");
  }
}
