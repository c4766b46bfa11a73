package ebbline.data;

import ebbline.curve.DiscountCurve;
import ebbline.time.TimeAxis;
import java.util.List;
import java.util.Optional;

/**
 * A discount curve with what is needed to speak of it.
 *
 * @param curve the curve
 * @param axis its as-of date, if it has one, and how years are counted on it
 * @param labels the maturities of its nodes as the file writes them; empty for a formula
 * @param file where it came from; empty for {@code flat:RATE}
 */
public record CurveInput(
    DiscountCurve curve, TimeAxis axis, List<String> labels, Optional<SourceFile> file) {

  public CurveInput {
    labels = List.copyOf(labels);
  }
}
