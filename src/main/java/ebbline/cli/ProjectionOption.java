package ebbline.cli;

import ebbline.data.CurveInput;
import ebbline.time.TimeAxis;
import java.util.Optional;
import picocli.CommandLine.Option;

/** A curve for floating rates, in markets that have two. */
final class ProjectionOption {
  @Option(
      names = "--projection",
      paramLabel = "FILE|flat:RATE",
      description = "curve of floating rates, where it is not the one that discounts")
  private String projection;

  boolean isGiven() {
    return projection != null;
  }

  /**
   * The curve; empty where the one that discounts projects too.
   *
   * @param discounting the axis of the curve that discounts
   */
  Optional<CurveInput> curve(MarketOptions market, TimeAxis discounting) {
    if (projection == null) {
      return Optional.empty();
    }
    CurveInput read = market.read("--projection", projection, Optional.empty());
    if (read.axis().asOf().isPresent() && !read.axis().asOf().equals(discounting.asOf())) {
      throw UsageProblem.of(
          "--projection",
          projection,
          "its date "
              + read.axis().asOf().get()
              + " is not that of the discount curve, "
              + discounting.asOf().map(Object::toString).orElse("which has none"));
    }
    return Optional.of(read);
  }
}
