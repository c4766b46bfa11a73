package ebbline.curve;

/** A curve without nodes: a formula whose forward rate is analytic from today on. */
public interface FormulaCurve extends DiscountCurve {

  @Override
  default double[] nodes() {
    return new double[0];
  }

  @Override
  default void addLogDiscountGradient(double t, double weight, double[] gradient) {
    // No nodes, nothing to add.
  }

  @Override
  default double[] breaks() {
    return new double[] {0};
  }

  @Override
  default boolean hasContinuousForward() {
    return true;
  }
}
