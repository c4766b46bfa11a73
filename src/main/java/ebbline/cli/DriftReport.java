package ebbline.cli;

import ebbline.data.CurveInput;
import ebbline.fitting.FittedQuote;
import ebbline.model.DriftCheck;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.report.Cell;
import ebbline.report.FitReport;
import ebbline.report.ResultRow;
import java.util.ArrayList;
import java.util.List;

/** A Hull–White model's drift: how well it reprices the curve, and θ where it exists. */
final class DriftReport {
  /** |P_model/P_curve − 1| allowed at a node. */
  static final double LIMIT = 1e-13;

  private final GaussianRates rates;
  private final FitGrid grid;
  private final DriftCheck check;

  private DriftReport(GaussianRates rates, FitGrid grid) {
    this.rates = rates;
    this.grid = grid;
    this.check = DriftCheck.at(rates, grid.times());
  }

  static DriftReport of(GaussianRates rates, CurveInput input) {
    return new DriftReport(rates, FitGrid.of(input));
  }

  boolean isMet() {
    return check.worst() <= LIMIT;
  }

  ResultRow result(HullWhite parameters) {
    List<ResultRow> quotes = new ArrayList<>();
    List<ResultRow> drift = new ArrayList<>();
    double squares = 0;
    double[] logs = DriftCheck.logDiscounts(rates, grid.times());
    for (int i = 0; i < grid.times().length; i++) {
      double t = grid.times()[i];
      double quote = grid.zeros()[i];
      double fitted = -logs[i] / t;
      squares += (fitted - quote) * (fitted - quote);
      quotes.add(FitReport.quote(new FittedQuote(grid.labels().get(i), quote, fitted)));
      if (rates.curve().hasContinuousForward()) {
        drift.add(
            ResultRow.builder()
                .text("maturity", grid.labels().get(i))
                .number("time", t, 6)
                .number("theta", rates.drift(t), 8)
                .build());
      }
    }
    ResultRow.Builder row = ResultRow.builder().text("model", "hull-white");
    row.number("mean_reversion", parameters.meanReversion(), 6);
    row.rate("volatility", parameters.volatility().value(0));
    row.put("rmse", new Cell.Magnitude(Math.sqrt(squares / grid.times().length)));
    row.put("largest_drift_error", new Cell.Magnitude(check.worst()));
    row.count("iterations", 0);
    row.flag("converged", isMet());
    if (!rates.curve().hasContinuousForward()) {
      row.text("theta", "not a plain function here: the curve's forwards jump at its nodes");
    }
    row.rows("quotes", quotes);
    if (!drift.isEmpty()) {
      row.rows("drift", drift);
    }
    return row.build();
  }
}
