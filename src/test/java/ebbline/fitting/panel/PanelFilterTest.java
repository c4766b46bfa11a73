package ebbline.fitting.panel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import ebbline.fitting.ReferenceCsv;
import org.junit.jupiter.api.Test;

class PanelFilterTest {

  @Test
  void theLikelihoodAtAFixedPointMatchesTheReference() {
    String set = "loglik_at_fixed_point_1990_1999";
    PanelFilter filter = new PanelFilter(Panels.of(set));
    double[] u = PanelFilter.coordinates(new PanelParameters(0.2, 0.05, 0.012, -0.3, 0.004));
    filter.evaluate(u);
    assertThat(filter.logLikelihood).isCloseTo(Panels.reference(set, "loglik"), within(1e-9));
    FilteredRates rates = filter.filtered(u);
    assertThat(rates.rate(119)).isCloseTo(Panels.reference(set, "filtered_r_last"), within(1e-14));
    assertThat(rates.sd(119) * rates.sd(119) / Panels.reference(set, "filtered_var_last"))
        .isCloseTo(1, within(1e-12));
  }

  @Test
  void theGradientAgreesWithDifferences() {
    PanelFilter filter = new PanelFilter(Panels.of("loglik_at_fixed_point_1990_1999"));
    for (double kappa : new double[] {1e-3, 0.2, 1.5}) {
      double[] u = PanelFilter.coordinates(new PanelParameters(kappa, 0.05, 0.012, -0.3, 0.004));
      filter.evaluate(u);
      double[] gradient = filter.gradient.clone();
      for (int k = 0; k < 5; k++) {
        double step = 1e-5 * Math.abs(u[k]);
        double[] moved = u.clone();
        moved[k] = u[k] + step;
        filter.evaluate(moved);
        double up = filter.logLikelihood;
        moved[k] = u[k] - step;
        filter.evaluate(moved);
        double slope = (up - filter.logLikelihood) / (2 * step);
        assertThat(gradient[k] / slope).as("coordinate " + k).isCloseTo(1, within(2e-6));
      }
    }
  }

  @Test
  void theLikelihoodHoldsDownToVanishingReversion() {
    ReferenceCsv cells = ReferenceCsv.read("panel/panel-small.csv");
    ReferenceCsv table = ReferenceCsv.read("panel/panel-likelihood.csv");
    double[] times = cells.column("twelfths");
    double[][] yields = new double[times.length][];
    for (int i = 0; i < times.length; i++) {
      times[i] /= 12;
      yields[i] = new double[3];
    }
    String[] maturities = {"0.25", "2", "10"};
    for (int j = 0; j < 3; j++) {
      double[] column = cells.column(maturities[j]);
      for (int i = 0; i < times.length; i++) {
        yields[i][j] = column[i];
      }
    }
    PanelFilter filter = new PanelFilter(YieldPanel.of(times, new double[] {0.25, 2, 10}, yields));
    double worst = 0;
    for (int i = 0; i < table.size(); i++) {
      filter.evaluate(
          PanelFilter.coordinates(
              new PanelParameters(
                  table.number(i, "mean_reversion"),
                  table.number(i, "long_run_mean"),
                  table.number(i, "volatility"),
                  table.number(i, "market_price_of_risk"),
                  table.number(i, "measurement_sd"))));
      double error = Math.abs(filter.logLikelihood - table.number(i, "log_likelihood"));
      worst = Math.max(worst, error);
    }
    assertThat(worst).isLessThanOrEqualTo(table.tolerance("absolute"));
    assertThat(worst).as("tolerance is tight").isGreaterThan(table.tolerance("absolute") / 20);
  }
}
