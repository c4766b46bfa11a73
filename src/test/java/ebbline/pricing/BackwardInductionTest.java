package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.DiscountCurve;
import ebbline.curve.FlatCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.instrument.Right.Party;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.ReferenceTable;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class BackwardInductionTest {
  private static final GaussianRates RATES =
      new HullWhite(0.1, VolatilitySteps.constant(0.01)).on(FlatCurve.of(0.05));

  /** Coupons on whole periods; rights at par-like prices on coupon dates {@code from..to}. */
  static Claim bond(
      int periods, int frequency, double coupon, Party party, int from, int to, double price) {
    double[] times = new double[periods];
    double[] amounts = new double[periods];
    List<Right> rights = new ArrayList<>();
    for (int i = 1; i <= periods; i++) {
      double t = (double) i / frequency;
      times[i - 1] = t;
      amounts[i - 1] = coupon / frequency + (i == periods ? 100 : 0);
      if (i >= from && i <= to) {
        rights.add(new Right(party, t, t, CashFlows.single(t, price)));
      }
    }
    return new Claim(CashFlows.of(times, amounts), rights, 0, 0);
  }

  private static double value(Claim claim, GaussianRates rates) {
    return BackwardInduction.value(claim, rates).presentValue();
  }

  @Test
  void theThirtyYearBondCallableOnFiftyDatesMatchesItsReference() {
    Claim claim = bond(60, 2, 5, Party.ISSUER, 10, 59, 100);
    Valuation found = BackwardInduction.value(claim, RATES);
    assertThat(found.presentValue()).isCloseTo(93.3288934768, within(2e-9));
    assertThat(found.errorBound()).isBetween(1e-11, 5e-8);
    assertThat(found.method()).isEqualTo(Method.BACKWARD_INDUCTION);
  }

  @Test
  void thirtyTwoCallableBondsMatchTheReference() {
    ReferenceTable nodes = ReferenceTable.read(BackwardInductionTest.class, "callable-curve");
    double[] times = new double[nodes.size()];
    double[] discounts = new double[nodes.size()];
    for (int i = 0; i < times.length; i++) {
      times[i] = nodes.number(i, "time");
      discounts[i] = nodes.number(i, "discount");
    }
    DiscountCurve curve = InterpolatedCurve.ofDiscounts(Interpolation.LOG_LINEAR, times, discounts);
    ReferenceTable table = ReferenceTable.read(BackwardInductionTest.class, "callable-bonds");
    double worst = 0;
    for (int i = 0; i < table.size(); i++) {
      GaussianRates rates =
          new HullWhite(
                  table.number(i, "mean_reversion"),
                  VolatilitySteps.constant(table.number(i, "volatility")))
              .on(curve);
      int periods = (int) table.number(i, "periods");
      Claim claim =
          bond(
              periods,
              2,
              table.number(i, "coupon"),
              Party.ISSUER,
              (int) table.number(i, "first_call"),
              periods - 1,
              table.number(i, "call_price"));
      Valuation found = BackwardInduction.value(claim, rates);
      double error = table.error(i, "price", found.presentValue());
      assertThat(error).as("bond %s", i).isLessThanOrEqualTo(found.errorBound());
      worst = Math.max(worst, error);
    }
    assertThat(worst).isLessThanOrEqualTo(table.tolerance()).isGreaterThan(table.tolerance() / 20);
  }

  private static Claim swiss(double notice) {
    double[] times = new double[21];
    double[] amounts = new double[21];
    for (int i = 0; i < 21; i++) {
      times[i] = 0.172 + i;
      amounts[i] = 0.0425 + (i == 20 ? 1 : 0);
    }
    double[] prices = {1.025, 1.02, 1.015, 1.01, 1.005, 1, 1, 1, 1, 1};
    List<Right> rights = new ArrayList<>();
    for (int i = 0; i < 10; i++) {
      double t = times[10 + i];
      rights.add(new Right(Party.ISSUER, t - notice, t, CashFlows.single(t, prices[i])));
    }
    return new Claim(CashFlows.of(times, amounts), rights, 0, 0);
  }

  private static GaussianRates swissRates(double shortRate) {
    return new Vasicek(shortRate, 0.098397028, 0.44178462, 0.13264223).rates();
  }

  @Test
  void thePublishedCallableBondUnderVasicekComesOut() {
    ReferenceTable table = ReferenceTable.read(BackwardInductionTest.class, "callable-vasicek");
    Claim claim = swiss(0.1666);
    for (int i = 0; i < table.size(); i++) {
      GaussianRates rates = swissRates(table.number(i, "short_rate"));
      Valuation found = BackwardInduction.value(claim, rates);
      double straight = Discounting.value(claim.flows(), rates.curve()).presentValue();
      assertThat(table.error(i, "callable", found.presentValue()))
          .as("row %s", i)
          .isLessThanOrEqualTo(table.tolerance() * 1.2);
      assertThat(table.error(i, "straight", straight)).isLessThanOrEqualTo(table.tolerance() * 1.2);
      assertThat(found.presentValue())
          .isCloseTo(DenseGrid.value(claim, rates), within(found.errorBound()));
    }
    // Printed with five figures: 0.77871; the two readings of the notice straddle it by rounding.
    assertThat(value(swiss(1.0 / 6), swissRates(0.05))).isCloseTo(0.778705, within(5e-7));
    assertThat(value(claim, swissRates(0.05))).isCloseTo(0.778702, within(5e-7));
  }

  @Test
  void seededClaimsAgreeWithADenseGridWithinTheirErrorBounds() {
    SplittableRandom random = new SplittableRandom(4711);
    int priced = 0;
    for (int i = 0; priced < 40; i++) {
      RandomRights drawn = RandomRights.draw(random, i % 3, 12);
      if (drawn.rates().volatility().value(Math.min(1, drawn.rates().volatility().count() - 1)) == 0
          || drawn.claim().rights().isEmpty()
          || drawn.claim().rights().get(0).decision() < 0.02) {
        continue;
      }
      priced++;
      Valuation found = BackwardInduction.value(drawn.claim(), drawn.rates());
      double dense = DenseGrid.value(drawn.claim(), drawn.rates());
      assertThat(found.presentValue())
          .as("seed 4711, case %s", i)
          .isCloseTo(dense, within(found.errorBound() + 1e-11));
      assertThat(found.errorBound()).as("case %s", i).isLessThan(1e-7);
    }
  }

  @Test
  void theErrorBoundHoldsAgainstAFarFinerRun() {
    // The whole set takes a few seconds; -Drights.cases=N for another number.
    SplittableRandom random = new SplittableRandom(99);
    double worst = 0;
    int cases = Integer.getInteger("rights.cases", 10_500);
    for (int i = 0; i < cases; i++) {
      RandomRights drawn = RandomRights.draw(random);
      if (drawn.claim().rights().isEmpty()) {
        continue;
      }
      Valuation found = BackwardInduction.rightsValue(drawn.claim(), drawn.rates());
      double fine = BackwardInduction.rightsValue(drawn.claim(), drawn.rates(), 0.2, 9);
      double error = Math.abs(found.presentValue() - fine);
      assertThat(error).as("seed 99, case %s", i).isLessThanOrEqualTo(found.errorBound());
      worst = Math.max(worst, error);
    }
    assertThat(worst).isBetween(1e-12, 1e-8);
  }

  @Test
  void wildClaimsWhoseTangentsLeadAstrayFallBackToTheScan() {
    // Cases of the set above in which bonds vary by e to the 5 and more a deviation.
    SplittableRandom random = new SplittableRandom(99);
    Set<Integer> wild = Set.of(620, 1301, 2687, 3506, 3671, 8461);
    for (int i = 0; i <= 8461; i++) {
      RandomRights drawn = RandomRights.draw(random);
      if (wild.contains(i)) {
        Valuation found = BackwardInduction.rightsValue(drawn.claim(), drawn.rates());
        double fine = BackwardInduction.rightsValue(drawn.claim(), drawn.rates(), 0.2, 9);
        assertThat(found.presentValue())
            .as("seed 99, case %s", i)
            .isCloseTo(fine, within(Math.min(1e-7, found.errorBound())));
      }
    }
  }

  @Test
  void oneExerciseDateIsTheClosedForm() {
    SplittableRandom random = new SplittableRandom(5);
    for (int i = 0; i < 200; i++) {
      RandomOption option = RandomOption.draw(random, i % 2 == 0);
      double volatility = Math.sqrt(option.rates().variance(option.expiry()));
      double longest = option.received().time(option.received().size() - 1) - option.expiry();
      if (volatility * option.rates().g(longest) > 2) {
        continue;
      }
      for (int side = -1; side <= 1; side += 2) {
        Claim claim = option.claim(side);
        double closed = ClosedForm.value(claim, option.rates()).presentValue();
        Valuation found = BackwardInduction.value(claim, option.rates());
        assertThat(found.presentValue())
            .as("seed 5, case %s", i)
            .isCloseTo(closed, within(1e-12 * option.face()));
        assertThat(Math.abs(found.presentValue() - closed)).isLessThanOrEqualTo(found.errorBound());
      }
    }
  }

  @Test
  void callableIsBelowStraightAndStraightBelowPutable() {
    for (double coupon : new double[] {0, 3, 5, 9}) {
      Claim callable = bond(20, 2, coupon, Party.ISSUER, 4, 19, 100);
      Claim putable = bond(20, 2, coupon, Party.HOLDER, 4, 19, 98);
      double straight = Discounting.value(callable.flows(), RATES.curve()).presentValue();
      assertThat(value(callable, RATES)).isLessThanOrEqualTo(straight);
      assertThat(value(putable, RATES)).isGreaterThanOrEqualTo(straight);
    }
  }

  @Test
  void moreDatesNeverRaiseACallableAndABermudanBeatsEachEuropean() {
    double before = Double.POSITIVE_INFINITY;
    Claim all = bond(20, 2, 5, Party.ISSUER, 1, 19, 100);
    double least = Double.POSITIVE_INFINITY;
    for (int first = 19; first >= 1; first--) {
      double some = value(bond(20, 2, 5, Party.ISSUER, first, 19, 100), RATES);
      assertThat(some).isLessThan(before);
      before = some;
      Claim one = new Claim(all.flows(), List.of(all.rights().get(first - 1)), 0, 0);
      least = Math.min(least, ClosedForm.value(one, RATES).presentValue());
    }
    assertThat(before).isLessThan(least);
  }

  @Test
  void aCallAndAPutOnOneDateHaveTwoBoundaries() {
    // The put at 95 and the call at 105 never both pay, so together they are worth their sum.
    double t = 4;
    CashFlows flows = bond(20, 2, 5, Party.ISSUER, 21, 0, 0).flows();
    Right call = new Right(Party.ISSUER, t, t, CashFlows.single(t, 105));
    Right put = new Right(Party.HOLDER, t, t, CashFlows.single(t, 95));
    double sum =
        ClosedForm.rightValue(new Claim(flows, List.of(call), 0, 0), RATES).presentValue()
            + ClosedForm.rightValue(new Claim(flows, List.of(put), 0, 0), RATES).presentValue();
    for (List<Right> order : List.of(List.of(call, put), List.of(put, call))) {
      Valuation both = BackwardInduction.rightsValue(new Claim(flows, order, 0, 0), RATES);
      assertThat(both.presentValue()).isCloseTo(sum, within(1e-10));
    }
  }

  @Test
  void whereBothPartiesWantToActTheFirstListedHasTheLastWord() {
    CashFlows flows = bond(20, 2, 5, Party.ISSUER, 21, 0, 0).flows();
    Right call = new Right(Party.ISSUER, 4, 4, CashFlows.single(4, 1));
    Right put = new Right(Party.HOLDER, 4, 4, CashFlows.single(4, 1000));
    double kept = Discounting.value(flows, RATES.curve()).presentValue();
    double rest = Discounting.value(flows.after(4), RATES.curve()).presentValue();
    double discount = RATES.curve().discount(4);
    assertThat(value(new Claim(flows, List.of(call, put), 0, 0), RATES))
        .isCloseTo(kept - rest + discount, within(1e-11));
    assertThat(value(new Claim(flows, List.of(put, call), 0, 0), RATES))
        .isCloseTo(kept - rest + 1000 * discount, within(1e-10));
  }

  @Test
  void severalBoundariesOnOneDateAreAllFound() {
    // Flows of changing sign: the exchange is worth taking in the middle only.
    CashFlows mixed = CashFlows.of(new double[] {2, 6, 12}, new double[] {-84, 200, -116.05});
    GaussianRates rates = new HullWhite(0.02, VolatilitySteps.constant(0.02)).on(RATES.curve());
    for (double scale : new double[] {0.98, 1, 1.004, 1.01, 1.05}) {
      CashFlows flows = CashFlows.of(mixed.times(), new double[] {-84, 200 * scale, -116.05});
      Claim claim = new Claim(CashFlows.NONE, List.of(new Right(Party.HOLDER, 2, 2, flows)), 0, 0);
      assertThat(value(claim, rates))
          .isCloseTo(ClosedForm.value(claim, rates).presentValue(), within(1e-10));
    }
  }

  @Test
  void withoutVolatilityTheBestDateIsTaken() {
    GaussianRates still = new HullWhite(0.1, VolatilitySteps.constant(0)).on(FlatCurve.of(0.03));
    Claim claim = bond(20, 2, 5, Party.ISSUER, 4, 19, 101);
    double least = Discounting.value(claim.flows(), still.curve()).presentValue();
    for (Right right : claim.rights()) {
      Claim one = new Claim(claim.flows(), List.of(right), 0, 0);
      least = Math.min(least, ClosedForm.value(one, still).presentValue());
    }
    assertThat(value(claim, still)).isCloseTo(least, within(1e-12));
    for (double sigma : new double[] {1e-300, 1e-12, 1e-8, 1e-6}) {
      GaussianRates calm =
          new HullWhite(0.1, VolatilitySteps.constant(sigma)).on(FlatCurve.of(0.03));
      assertThat(value(claim, calm)).isCloseTo(least, within(1e-9 + 10 * sigma));
    }
  }

  @Test
  void reversionThroughZeroIsContinuous() {
    Claim claim = bond(20, 2, 5, Party.ISSUER, 4, 19, 100);
    double none = at(claim, 0);
    assertThat(at(claim, 1e-14)).isCloseTo(none, within(1e-9));
    assertThat(at(claim, -1e-14)).isCloseTo(none, within(1e-9));
    assertThat(at(claim, -0.05)).isLessThan(none);
    assertThat(at(claim, 0.05)).isGreaterThan(none);
  }

  private static double at(Claim claim, double reversion) {
    return value(claim, new HullWhite(reversion, VolatilitySteps.constant(0.01)).on(RATES.curve()));
  }

  @Test
  void aRightNeverOrAlwaysUsedAddsNothingOrItself() {
    Claim never = bond(20, 2, 5, Party.ISSUER, 4, 19, 1000);
    assertThat(BackwardInduction.rightsValue(never, RATES).presentValue()).isZero();
    Claim always = bond(20, 2, 5, Party.ISSUER, 4, 19, 1);
    Claim once = new Claim(always.flows(), List.of(always.rights().get(0)), 0, 0);
    double sure = ClosedForm.value(once, RATES).presentValue();
    assertThat(value(always, RATES)).isCloseTo(sure, within(1e-10));
    CashFlows flows = always.flows();
    Right now = new Right(Party.HOLDER, 0, 0, CashFlows.single(0, 150));
    assertThat(value(new Claim(flows, List.of(now), 0, 0), RATES)).isCloseTo(150, within(1e-11));
  }

  @Test
  void hundredsOfDatesAndDaysApartArePriced() {
    double[] times = {10};
    CashFlows flows = CashFlows.of(times, new double[] {100});
    List<Right> rights = new ArrayList<>();
    for (int i = 0; i < 300; i++) {
      double t = 5 + i / 365.0;
      double price = 100 * Math.exp(-0.05 * (10 - t));
      rights.add(new Right(Party.ISSUER, t, t, CashFlows.single(t, price)));
    }
    Claim claim = new Claim(flows, rights, 0, 0);
    Valuation found = BackwardInduction.rightsValue(claim, RATES);
    assertThat(found.errorBound()).isLessThan(1e-7);
    Claim sparse = new Claim(flows, rights.subList(298, 300), 0, 0);
    assertThat(found.presentValue())
        .isLessThan(BackwardInduction.rightsValue(sparse, RATES).presentValue());
  }

  @Test
  void aModelThatIsTooWildIsRefusedInWords() {
    Claim claim = bond(200, 2, 5, Party.ISSUER, 4, 199, 100);
    GaussianRates wild = new HullWhite(-0.2, VolatilitySteps.constant(0.2)).on(RATES.curve());
    assertThatThrownBy(() -> BackwardInduction.value(claim, wild))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("lower the volatility")
        .hasMessageContaining("found e^");
  }

  @Test
  void withoutRightsTheFlowsAreDiscounted() {
    Claim claim = bond(20, 2, 5, Party.ISSUER, 21, 0, 0);
    assertThat(BackwardInduction.value(claim, RATES))
        .isEqualTo(Discounting.value(claim.flows(), RATES.curve()));
    assertThat(BackwardInduction.rightsValue(claim, RATES).presentValue()).isZero();
  }
}
