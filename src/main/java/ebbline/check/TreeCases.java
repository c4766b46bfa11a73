package ebbline.check;

import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.pricing.TrinomialPricing;
import ebbline.pricing.TrinomialTree;
import java.util.List;
import java.util.Optional;

/** The trinomial tree: the three-step example and the columns of the put on a nine-year zero. */
final class TreeCases implements ShortRateCases.Computation {
  private static final String THREE_STEPS = "HW-3step-";
  private static final double DAYS_PER_YEAR = 365;

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in) {
    if (c.id().startsWith("HW-HULL-oldtree-")) {
      return Optional.of(put(c, in));
    } else if (c.id().startsWith("HW-HULL32.3-newtree-")) {
      return Optional.of(
          CaseResult.notComputed(
              c, "the source does not say how this column is made; its older column is computed"));
    } else if (c.id().startsWith(THREE_STEPS)) {
      return Optional.of(threeSteps(c, in, c.id().substring(THREE_STEPS.length())));
    }
    return Optional.empty();
  }

  private static CaseResult put(PublishedCase c, CaseInputs in) {
    double expiry = in.number("T_days") / DAYS_PER_YEAR;
    double maturity = in.number("S_days") / DAYS_PER_YEAR;
    CashFlows exchanged =
        CashFlows.of(
            new double[] {expiry, maturity}, new double[] {in.number("K"), -in.number("L")});
    Right right = new Right(Right.Party.HOLDER, expiry, expiry, exchanged);
    GaussianRates rates = HullWhiteCases.rates(in, HullWhiteCases.listedCurve(in));
    int steps = in.integer("steps");
    double value =
        TrinomialPricing.value(new Claim(CashFlows.NONE, List.of(right), 0, 0), rates, steps)
            .presentValue();
    return CaseResult.of(c, "put on a zero bond, tree of " + steps + " steps", value);
  }

  private static CaseResult threeSteps(PublishedCase c, CaseInputs in, String what) {
    CaseInputs zeros = in.object("zero_cc");
    double[] times = zeros.names().stream().mapToDouble(Double::parseDouble).toArray();
    double[] logs = zeros.names().stream().mapToDouble(zeros::number).toArray();
    for (int i = 0; i < times.length; i++) {
      logs[i] *= -times[i];
    }
    GaussianRates rates =
        HullWhiteCases.rates(in, InterpolatedCurve.of(Interpolation.LOG_LINEAR, times, logs));
    double length = in.number("dt");
    TrinomialTree tree = TrinomialTree.of(rates, times.length * length, times.length);
    if (what.startsWith("alpha")) {
      int step = Integer.parseInt(what.substring("alpha".length()));
      return CaseResult.of(c, "shift of step " + step, tree.alpha(step));
    } else if (what.startsWith("Q")) {
      int comma = what.indexOf(',');
      int step = Integer.parseInt(what.substring(1, comma));
      int j = Integer.parseInt(what.substring(comma + 1));
      return CaseResult.of(
          c, "Arrow-Debreu price of node (" + step + "," + j + ")", tree.arrowDebreu(step, j));
    } else if (what.equals("rateB")) {
      return CaseResult.of(c, "rate at the upper node of step 1", tree.rate(1, 1));
    }
    return CaseResult.of(c, "probability of its middle branch", tree.middle(1));
  }
}
