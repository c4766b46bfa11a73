package ebbline.check;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The published cases of short-rate models, Black's formula, convexity and curves. */
final class ShortRateCases implements CaseFamily {

  /** Computes one case, or leaves it to another. */
  interface Computation {
    Optional<CaseResult> run(PublishedCase c, CaseInputs in);
  }

  private static final List<Computation> COMPUTATIONS =
      List.of(
          new VasicekCases(),
          new HullWhiteCases(),
          new TreeCases(),
          new CallableCases(),
          new BlackCases(),
          new CurveCases(),
          new QuotedCurveCases(),
          new EstimationCases(),
          new NormalCases());

  @Override
  public List<CaseResult> run(List<PublishedCase> cases) {
    List<CaseResult> results = new ArrayList<>();
    for (PublishedCase c : cases) {
      results.add(run(c));
    }
    return List.copyOf(results);
  }

  private static CaseResult run(PublishedCase c) {
    CaseInputs in = CaseInputs.parse(c.inputs());
    for (Computation computation : COMPUTATIONS) {
      Optional<CaseResult> result = computation.run(c, in);
      if (result.isPresent()) {
        return result.get();
      }
    }
    return CaseResult.notComputed(c, "no method of this version gives it");
  }
}
