package ebbline.bond;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.CashFlows;
import java.util.Arrays;

/** The spread that a par-par asset swap of a bond pays over the floating rate. */
public final class AssetSwap {
  private AssetSwap() {}

  /** The spread on a face of 100 throughout. */
  public static double spread(
      CashFlows flows, DiscountCurve curve, double settlement, double[] times, double dirty) {
    double[] face = new double[times.length];
    Arrays.fill(face, 100);
    return spread(flows, curve, settlement, times, face, dirty);
  }

  /**
   * (value of the flows on the curve − dirty price)/Σ N δ P(t)/P(s), a decimal.
   *
   * @param flows after settlement, per 100
   * @param settlement s, years from today
   * @param times of the floating payments, ascending, after settlement, years; δ is from one to the
   *     next
   * @param face N on which each is paid, per 100 of the first face
   * @param dirty price at settlement, per 100
   */
  public static double spread(
      CashFlows flows,
      DiscountCurve curve,
      double settlement,
      double[] times,
      double[] face,
      double dirty) {
    if (times.length == 0 || !(dirty > 0 && Double.isFinite(dirty))) {
      throw new IllegalArgumentException(
          "an asset swap must have payments and a dirty price above 0, found "
              + times.length
              + " and "
              + dirty);
    }
    double value = 0;
    for (int i = 0; i < flows.size(); i++) {
      value += flows.amount(i) * curve.discount(flows.time(i));
    }
    double annuity = 0;
    double before = settlement;
    for (int i = 0; i < times.length; i++) {
      double time = times[i];
      if (!(time > before)) {
        throw new IllegalArgumentException("payments must ascend, found " + time);
      }
      annuity += face[i] * (time - before) * curve.discount(time);
      before = time;
    }
    double start = curve.discount(settlement);
    return (value / start - dirty) / (annuity / start);
  }
}
