package ebbline.pricing;

import ebbline.instrument.Swap;
import java.util.OptionalDouble;

/** The fixed rate at which a swap is worth nothing. */
final class ParRate {
  private ParRate() {}

  /** A swap's value is linear in its fixed rate, so two values give the rate. */
  static double of(Swap swap, Market market) {
    double atNothing = value(swap, 0, swap.fixing(), market);
    double atOne = value(swap, 1, swap.fixing(), market);
    return atNothing / (atNothing - atOne);
  }

  private static double value(Swap swap, double rate, OptionalDouble fixing, Market market) {
    Swap other = new Swap(swap.side(), swap.terms(), rate, fixing);
    return Discounting.value(market.claim(other), market.curve()).presentValue();
  }
}
