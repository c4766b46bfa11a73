package ebbline.curve;

/** One continuously compounded rate for all maturities. */
public final class FlatCurve implements FormulaCurve {
  private final double rate;

  private FlatCurve(double rate) {
    this.rate = rate;
  }

  /**
   * @param rate continuously compounded, decimal per year; finite
   */
  public static FlatCurve of(double rate) {
    if (!Double.isFinite(rate)) {
      throw new IllegalArgumentException("a rate must be finite, found " + rate);
    }
    return new FlatCurve(rate);
  }

  public double rate() {
    return rate;
  }

  @Override
  public double logDiscount(double t) {
    return -rate * t;
  }

  @Override
  public double forward(double t) {
    return rate;
  }

  @Override
  public double forwardSlope(double t) {
    return 0;
  }

  @Override
  public double zero(double t) {
    return rate;
  }
}
