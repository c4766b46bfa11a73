package ebbline.pricing;

/** A figure of a priced row, in the order in which results show them. */
public enum PriceFigure {
  /** Money at the as-of date for the row's face. */
  PRESENT_VALUE("present_value", Unit.MONEY),
  /** Per 100 face at settlement, accrued interest included. */
  DIRTY_PRICE("dirty_price", Unit.PRICE),
  /** Per 100 face at settlement, without accrued interest. */
  CLEAN_PRICE("clean_price", Unit.PRICE),
  /** Per 100 face at settlement; negative ex-dividend. */
  ACCRUED("accrued", Unit.PRICE),
  /** Of the row's kind of yield. */
  YIELD("yield", Unit.RATE),
  YIELD_TO_WORST("yield_to_worst", Unit.RATE),
  /** Years. */
  MACAULAY_DURATION("macaulay_duration", Unit.YEARS),
  /** −P′/P in the yield, years. */
  MODIFIED_DURATION("modified_duration", Unit.YEARS),
  /** P″/P in the yield, years². */
  CONVEXITY("convexity", Unit.YEARS),
  /** Price gained when the yield falls by one basis point, two-sided, per 100. */
  DV01("dv01", Unit.PRICE),
  /** Continuous spread over the curve's zero rates. */
  Z_SPREAD("z_spread", Unit.RATE),
  /** Par-par asset-swap spread over the curve. */
  ASSET_SWAP_SPREAD("asset_swap_spread", Unit.RATE),
  /** Fixed rate at which a swap is worth nothing. */
  PAR_RATE("par_rate", Unit.RATE),
  /** Spread over the model's curve at which the rights' value meets the market price. */
  OAS("oas", Unit.RATE),
  EFFECTIVE_DURATION("effective_duration", Unit.YEARS),
  EFFECTIVE_CONVEXITY("effective_convexity", Unit.YEARS),
  /** Money the rights inside the instrument are worth to the holder; negative against him. */
  OPTION_VALUE("option_value", Unit.MONEY),
  /** Change of the dirty price for one basis point more volatility, per 100. */
  VEGA("vega", Unit.PRICE),
  IMPLIED_VOL("implied_vol", Unit.RATE),
  /** Price for delivery at the horizon, clean, per 100. */
  FORWARD_PRICE("forward_price", Unit.PRICE),
  /** Coupon income less financing over the horizon, per 100. */
  CARRY("carry", Unit.PRICE),
  /** Price change over the horizon if the curve stays where it is, per 100. */
  ROLL_DOWN("roll_down", Unit.PRICE),
  /** The quoted clean price, or the one that the quoted yield means. */
  MARKET_CLEAN_PRICE("market_clean_price", Unit.PRICE),
  MARKET_YIELD("market_yield", Unit.RATE),
  /** Market minus model clean price, per 100. */
  RICHNESS("richness", Unit.PRICE),
  /** Bound of the numerical error of the present value, money. */
  ERROR_BOUND("error_bound", Unit.ERROR),
  /** Standard deviation of the present value from the fitted parameters' uncertainty, money. */
  PARAMETER_SD("parameter_sd", Unit.ERROR);

  /** What a figure is measured in. */
  public enum Unit {
    MONEY,
    PRICE,
    RATE,
    YEARS,
    ERROR
  }

  private final String label;
  private final Unit unit;

  PriceFigure(String label, Unit unit) {
    this.label = label;
    this.unit = unit;
  }

  public String label() {
    return label;
  }

  public Unit unit() {
    return unit;
  }
}
