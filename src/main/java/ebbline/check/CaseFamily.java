package ebbline.check;

import java.util.List;

/** Computes the published cases of one file. */
public interface CaseFamily {

  /** One result a case, in the same order; a case that cannot be computed says why. */
  List<CaseResult> run(List<PublishedCase> cases);
}
