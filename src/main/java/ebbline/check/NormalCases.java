package ebbline.check;

import ebbline.model.StandardNormal;
import java.util.Optional;

/** The normal distribution function against the printed table. */
final class NormalCases implements ShortRateCases.Computation {

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in) {
    return c.id().startsWith("NCDF-")
        ? Optional.of(
            CaseResult.of(c, "normal distribution function", StandardNormal.cdf(in.number("x"))))
        : Optional.empty();
  }
}
