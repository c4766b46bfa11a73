package ebbline.fitting;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

class VasicekZeroTest {
  private static final ReferenceCsv TABLE = ReferenceCsv.read("vasicek-zero.csv");

  @Test
  void ratesMatchTheQuadratureTable() {
    double worst = 0;
    for (int i = 0; i < TABLE.size(); i++) {
      double tau = TABLE.number(i, "time");
      VasicekZero zero = VasicekZero.at(TABLE.number(i, "mean_reversion") * tau);
      double rate =
          zero.rate(
              tau,
              TABLE.number(i, "drift"),
              TABLE.number(i, "volatility"),
              TABLE.number(i, "short_rate"));
      double parts =
          Math.abs(TABLE.number(i, "short_rate"))
              + Math.abs(TABLE.number(i, "drift") * TABLE.number(i, "by_drift"))
              + Math.abs(TABLE.number(i, "volatility") * TABLE.number(i, "by_volatility"));
      worst = Math.max(worst, Math.abs(rate - TABLE.number(i, "zero")) / parts);
    }
    assertTight(worst, TABLE.tolerance("rate"));
  }

  @Test
  void slopesMatchTheQuadratureTable() {
    double worst = 0;
    for (int i = 0; i < TABLE.size(); i++) {
      double tau = TABLE.number(i, "time");
      double drift = TABLE.number(i, "drift");
      double sigma = TABLE.number(i, "volatility");
      VasicekZero zero = VasicekZero.at(TABLE.number(i, "mean_reversion") * tau);
      // The two parts of ∂z/∂κ may cancel, so its error is measured against their sizes.
      double parts =
          Math.abs(zero.byMeanReversion(tau, drift, 0))
              + Math.abs(zero.byMeanReversion(tau, 0, sigma));
      worst =
          Math.max(
              worst,
              Math.abs(
                      zero.byMeanReversion(tau, drift, sigma)
                          - TABLE.number(i, "by_mean_reversion"))
                  / parts);
      worst = Math.max(worst, Math.abs(zero.byDrift(tau) / TABLE.number(i, "by_drift") - 1));
      worst =
          Math.max(
              worst,
              Math.abs(zero.byVolatility(tau, sigma) / TABLE.number(i, "by_volatility") - 1));
    }
    assertTight(worst, TABLE.tolerance("slope"));
  }

  private static void assertTight(double worst, double tolerance) {
    assertThat(worst).isLessThanOrEqualTo(tolerance);
    assertThat(worst).as("tolerance is tight").isGreaterThan(tolerance / 20);
  }
}
