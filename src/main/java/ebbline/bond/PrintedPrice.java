package ebbline.bond;

import ebbline.instrument.PriceRounding;
import java.math.BigDecimal;
import java.math.RoundingMode;

/** Prices and accrued interest as a standard prints them. */
public final class PrintedPrice {
  private static final int TREASURY_DECIMALS = 6;

  private PrintedPrice() {}

  /**
   * A figure per 100, rounded where the row asks for it: to six decimals, half up [31 CFR 356,
   * Appendix B].
   */
  public static double of(double figure, PriceRounding rounding) {
    return rounding == PriceRounding.NONE
        ? figure
        : BigDecimal.valueOf(figure)
            .setScale(TREASURY_DECIMALS, RoundingMode.HALF_UP)
            .doubleValue();
  }
}
