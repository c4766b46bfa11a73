package ebbline.bench;

import ebbline.curve.Interpolation;
import ebbline.fitting.quotes.CurveBuilder;
import ebbline.fitting.quotes.CurveFit;
import ebbline.fitting.quotes.MarketQuotes;
import ebbline.fitting.quotes.QuoteEquation;
import ebbline.fitting.quotes.SmithWilsonBuilder;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/**
 * A curve from 40 quotes, six deposits, four futures, and thirty half-yearly swaps up to 40 years,
 * with repricing, sensitivities and condition; {@code smith-wilson} at a given speed.
 */
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Fork(1)
@Warmup(iterations = 5, time = 2)
@Measurement(iterations = 5, time = 2)
@State(Scope.Benchmark)
public class CurveBenchmark {
  @Param({"log-linear", "linear-zero", "cubic", "monotone-convex", "smith-wilson"})
  public String interpolation;

  private List<QuoteEquation> quotes;

  @Setup
  public void quotes() {
    quotes = sheet();
  }

  @Benchmark
  public CurveFit build() {
    Interpolation named = Interpolation.of(interpolation);
    return named == Interpolation.SMITH_WILSON
        ? SmithWilsonBuilder.of(0.0345, 60).withSpeed(0.12).build(quotes)
        : CurveBuilder.of(named).build(quotes);
  }

  static List<QuoteEquation> sheet() {
    List<QuoteEquation> sheet = new ArrayList<>();
    double[] ends = {1 / 365.0, 7 / 365.0, 1 / 12.0, 2 / 12.0, 0.25, 0.5};
    for (double end : ends) {
      sheet.add(MarketQuotes.deposit("deposit " + end, 0, end, end, 0.04 - 0.002 * end));
    }
    for (int k = 0; k < 4; k++) {
      double start = 0.5 + 0.25 * k;
      sheet.add(
          MarketQuotes.future(
              "future " + k, start, start + 0.25, 0.25, 96.1 + 0.05 * k, 0.03, 0.009));
    }
    for (int k = 0; k < 30; k++) {
      int years = k < 28 ? k + 2 : k == 28 ? 35 : 40;
      double[] payments = new double[2 * years];
      double[] accruals = new double[payments.length];
      for (int i = 0; i < payments.length; i++) {
        payments[i] = 0.5 * (i + 1);
      }
      Arrays.fill(accruals, 0.5);
      double rate = 0.035 + 0.006 * (1 - Math.exp(-years / 8.0));
      sheet.add(MarketQuotes.swap("swap " + years, 0, years, payments, accruals, rate));
    }
    return sheet;
  }
}
