package ebbline.instrument;

import java.util.List;
import java.util.Objects;

/**
 * An instrument in the plain terms a pricer understands, in years from today and per 100 face:
 * flows, and rights over them.
 *
 * @param flows what is paid to the holder if nobody exercises; after settlement only
 * @param rights in the order of their decisions; at most one party's each date
 * @param floating interest that is not fixed yet, in the order of payment
 * @param optionlets options on floating rates, each by itself
 * @param settlement when the buyer pays, years from today; 0 where it settles today
 * @param accrued accrued interest at settlement, per 100 face; negative ex-dividend
 */
public record Claim(
    CashFlows flows,
    List<Right> rights,
    List<FloatingCoupon> floating,
    List<Optionlet> optionlets,
    double settlement,
    double accrued) {

  public Claim {
    Objects.requireNonNull(flows, "flows");
    rights = List.copyOf(rights);
    floating = List.copyOf(floating);
    optionlets = List.copyOf(optionlets);
    if (!(settlement >= 0 && Double.isFinite(settlement) && Double.isFinite(accrued))) {
      throw new IllegalArgumentException(
          "settlement must not be before today, found " + settlement + ", accrued " + accrued);
    }
    for (int i = 1; i < rights.size(); i++) {
      if (!(rights.get(i).decision() >= rights.get(i - 1).decision())) {
        throw new IllegalArgumentException("rights must be in the order of their decisions");
      }
    }
  }

  /** Without options on rates. */
  public Claim(
      CashFlows flows,
      List<Right> rights,
      List<FloatingCoupon> floating,
      double settlement,
      double accrued) {
    this(flows, rights, floating, List.of(), settlement, accrued);
  }

  /** Fixed flows and rights alone. */
  public Claim(CashFlows flows, List<Right> rights, double settlement, double accrued) {
    this(flows, rights, List.of(), settlement, accrued);
  }

  /** The same terms with accrued interest as a standard rounds it. */
  public Claim withAccrued(double rounded) {
    return new Claim(flows, rights, floating, optionlets, settlement, rounded);
  }

  /** Options on rates alone. */
  public static Claim of(List<Optionlet> optionlets) {
    return new Claim(CashFlows.NONE, List.of(), List.of(), optionlets, 0, 0);
  }

  /** Whether nobody chooses: the flows are all there is, and a curve alone prices them. */
  public boolean isCertain() {
    return rights.isEmpty() && optionlets.isEmpty();
  }

  /** Flows without rights, settled today without accrued interest. */
  public static Claim of(CashFlows flows) {
    return new Claim(flows, List.of(), 0, 0);
  }
}
