package ebbline.cli;

import ebbline.curve.DiscountCurve;
import ebbline.data.SourceFile;
import ebbline.report.ResultRow;
import ebbline.time.TimeAxis;
import java.util.List;

/**
 * A curve that was made from something, and what is to be said of it.
 *
 * @param shown times at which it is shown if nobody says otherwise
 * @param quotes what it was made from beside what it gives, a row each
 * @param fit how it was made and how well that went
 * @param warnings for the user
 * @param problem why it should not be taken as a success, in words; empty where it should
 * @param files that were read
 */
record BuiltCurve(
    DiscountCurve curve,
    TimeAxis axis,
    List<Double> shown,
    List<ResultRow> quotes,
    ResultRow fit,
    List<String> warnings,
    String problem,
    List<SourceFile> files) {}
