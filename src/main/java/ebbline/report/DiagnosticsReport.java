package ebbline.report;

import ebbline.fitting.history.Diagnostics;
import ebbline.fitting.history.DickeyFuller;
import ebbline.fitting.history.NoReversionTest;
import ebbline.fitting.history.OutOfSample;
import ebbline.fitting.history.ResidualTest;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The tests of an estimate on its history as one group. */
public final class DiagnosticsReport {
  private DiagnosticsReport() {}

  /** A test that could not be made is absent; the notes say why. */
  public static ResultRow of(Diagnostics tests) {
    ResultRow.Builder row = ResultRow.builder();
    for (DickeyFuller root : tests.dickeyFuller()) {
      if (root.lags() == 0) {
        row.number("dickey_fuller_statistic", root.statistic(), 6);
        row.number("dickey_fuller_p_value", root.pValue(), 6);
      }
    }
    add(row, "ljung_box", tests.ljungBox());
    add(row, "jarque_bera", tests.jarqueBera());
    add(row, "arch_lm", tests.arch());
    if (tests.noReversion().isPresent()) {
      NoReversionTest test = tests.noReversion().get();
      row.number("no_reversion_statistic", test.statistic(), 6);
      row.number("no_reversion_p_value", test.pValue(), 6);
      row.count("no_reversion_replications", test.replications());
    }
    if (tests.outOfSample().isPresent()) {
      OutOfSample test = tests.outOfSample().get();
      row.number("forecast_confidence", test.oneStep().confidence(), 4);
      coverage(row, "forecast_1_step", test.oneStep());
      coverage(row, "forecast_" + test.stepsAhead() + "_step", test.farther());
      row.number("uniformity_distance", test.uniformityDistance(), 6);
      row.number("uniformity_p_value", test.uniformityPValue(), 6);
    }
    if (!tests.notes().isEmpty()) {
      row.text("not_made", String.join("; ", tests.notes()));
    }
    List<ResultRow> roots = new ArrayList<>();
    for (DickeyFuller root : tests.dickeyFuller()) {
      roots.add(
          ResultRow.builder()
              .count("lags", root.lags())
              .number("statistic", root.statistic(), 6)
              .number("p_value", root.pValue(), 6)
              .number("critical_1", root.criticalValue(1), 4)
              .number("critical_5", root.criticalValue(5), 4)
              .number("critical_10", root.criticalValue(10), 4)
              .count("observations", root.observations())
              .build());
    }
    if (!roots.isEmpty()) {
      row.rows("dickey_fuller", roots);
    }
    return row.build();
  }

  private static void add(ResultRow.Builder row, String name, Optional<ResidualTest> test) {
    test.ifPresent(
        made ->
            row.number(name + "_statistic", made.statistic(), 6)
                .count(name + "_degrees", made.degrees())
                .number(name + "_p_value", made.pValue(), 6));
  }

  private static void coverage(ResultRow.Builder row, String name, OutOfSample.Coverage made) {
    if (made.forecasts() > 0) {
      row.number(name + "_coverage", made.share(), 4).count(name + "_forecasts", made.forecasts());
    }
  }
}
