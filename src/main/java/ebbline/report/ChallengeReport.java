package ebbline.report;

import ebbline.check.ChallengeFigure;
import ebbline.check.ChallengeVerdict;
import java.util.List;

/** A challenged book as results, one a row and method. */
public final class ChallengeReport {
  private ChallengeReport() {}

  public static List<String> columns() {
    return List.of(
        "id",
        "method",
        "present_value",
        "error_bound",
        "difference",
        "seconds",
        "verdict",
        "message");
  }

  public static ResultRow result(ChallengeFigure figure) {
    ResultRow.Builder row = ResultRow.builder().text("id", figure.id());
    if (!figure.method().isEmpty()) {
      row.text("method", figure.method());
    }
    figure
        .value()
        .ifPresent(
            value -> {
              double money = value.presentValue();
              row.put("present_value", new Cell.Amount(money, Math.abs(money) < 1000 ? 6 : 2));
              row.magnitude("error_bound", value.errorBound());
              if (figure.verdict() != ChallengeVerdict.REFERENCE) {
                row.magnitude("difference", figure.difference());
              }
              row.magnitude("seconds", figure.seconds());
            });
    row.text("verdict", figure.verdict().label());
    if (!figure.message().isEmpty()) {
      row.text("message", figure.message());
    }
    return row.build();
  }
}
