package ebbline.check;

import ebbline.bond.FirstFraction;
import ebbline.bond.PeriodYield;
import ebbline.instrument.PeriodFlows;
import java.util.Arrays;
import java.util.Map;
import java.util.Optional;

/** Discount factors and zero rates taken from par yields and from bonds, one after another. */
final class BootstrapCases implements BondCases.Computation {
  private static final String PAR_YIELDS = "FABZ-20";

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in, Map<String, CaseInputs> all) {
    if (c.id().startsWith("FABZ-")) {
      int n = Integer.parseInt(BondCases.part(c));
      double[] rates = zeroRates(all.get(PAR_YIELDS).numbers("par_yields_pct"));
      return Optional.of(
          CaseResult.of(c, "zero rate of " + n + " half-years, per cent", 100 * rates[n - 1]));
    } else if (c.id().startsWith("FABZS-")) {
      double[] rates = zeroRates(all.get(PAR_YIELDS).numbers("par_yields_pct"));
      return Optional.of(CaseResult.of(c, "price at a spread over zero rates", spread(in, rates)));
    } else if (c.id().startsWith("TUCK2-d")) {
      return Optional.of(CaseResult.of(c, "discount factor", fromBonds(c, all)));
    } else if (c.id().startsWith("TUCK3-d")) {
      return fromDecimals(c, all).map(d -> CaseResult.of(c, "discount factor", d));
    }
    return Optional.empty();
  }

  /** Semi-annual zero rates; the first two yields are bills'. */
  private static double[] zeroRates(double[] parPercent) {
    double[] rates = new double[parPercent.length];
    double annuity = 0;
    for (int k = 1; k <= rates.length; k++) {
      double half = parPercent[k - 1] / 200;
      double discount = k <= 2 ? Math.pow(1 + half, -k) : (1 - half * annuity) / (1 + half);
      annuity += discount;
      double[] amounts = new double[k];
      amounts[k - 1] = 1;
      rates[k - 1] =
          new PeriodYield(new PeriodFlows(2, 1, amounts), FirstFraction.COMPOUND).yieldOf(discount);
    }
    return rates;
  }

  private static double spread(CaseInputs in, double[] rates) {
    double price = 0;
    int n = 2 * in.integer("years");
    for (int k = 1; k <= n; k++) {
      double amount = in.number("coupon") / 2 + (k == n ? 100 : 0);
      price += amount * Math.pow(1 + (rates[k - 1] + in.number("z")) / 2, -k);
    }
    return price;
  }

  /** Factor k from the prices of k bonds that end one half-year after another. */
  private static double last(double[] coupons, double[] prices) {
    double[] factors = new double[prices.length];
    for (int k = 0; k < factors.length; k++) {
      double half = coupons[k] / 2;
      factors[k] = (prices[k] - half * Arrays.stream(factors, 0, k).sum()) / (100 + half);
    }
    return factors[factors.length - 1];
  }

  private static double fromBonds(PublishedCase c, Map<String, CaseInputs> all) {
    int n = Integer.parseInt(c.id().substring("TUCK2-d".length()));
    double[] coupons = new double[n];
    double[] prices = new double[n];
    for (int k = 0; k < n; k++) {
      String[] words = all.get("TUCK2-d" + (k + 1)).text("bond").split(" ", 3);
      coupons[k] = Double.parseDouble(words[0].replace("s", ""));
      prices[k] = thirtySeconds(words[2]);
    }
    return last(coupons, prices);
  }

  /** Reads {@code 101-12 3/4}, {@code 108-31+} or {@code 102-5}: whole, 32nds, eighths of them. */
  private static double thirtySeconds(String text) {
    String[] parts = text.split("[- /+]", -1);
    double ticks = Double.parseDouble(parts[1]);
    if (text.endsWith("+")) {
      ticks += 0.5;
    } else if (parts.length == 4) {
      ticks += Double.parseDouble(parts[2]) / Double.parseDouble(parts[3]);
    }
    return Double.parseDouble(parts[0]) + ticks / 32;
  }

  private static Optional<Double> fromDecimals(PublishedCase c, Map<String, CaseInputs> all) {
    int n = Integer.parseInt(c.id().substring("TUCK3-d".length()));
    double[] coupons = new double[n];
    double[] prices = new double[n];
    for (int k = 0; k < n; k++) {
      CaseInputs bond = all.get("TUCK3-d" + (k + 1));
      if (bond == null) {
        return Optional.empty();
      }
      coupons[k] = bond.number("coupon");
      prices[k] = bond.number("price");
    }
    return Optional.of(last(coupons, prices));
  }
}
