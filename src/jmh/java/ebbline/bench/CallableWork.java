package ebbline.bench;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.VolatilitySteps;
import ebbline.pricing.BackwardInduction;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/**
 * Callable semi-annual bonds of call.txt: mean reversion, volatility, coupon per 100, periods,
 * first period of call, call price. The first line is the 30-year bond with 50 dates.
 */
final class CallableWork {
  private static final int REPEATS = 10;

  final double[] values;
  final double items;
  private final List<Claim> claims = new ArrayList<>();
  private final List<GaussianRates> rates = new ArrayList<>();

  CallableWork(Path file, DiscountCurve curve) {
    try {
      for (String line : Files.readAllLines(file)) {
        String[] words = line.strip().split("\\s+");
        double[] numbers = new double[words.length];
        for (int i = 0; i < words.length; i++) {
          numbers[i] = Double.parseDouble(words[i]);
        }
        rates.add(new HullWhite(numbers[0], VolatilitySteps.constant(numbers[1])).on(curve));
        claims.add(claim(numbers[2], (int) numbers[3], (int) numbers[4], numbers[5]));
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    values = new double[claims.size()];
    items = (double) REPEATS * values.length;
  }

  private static Claim claim(double coupon, int periods, int first, double price) {
    double[] times = new double[periods];
    double[] amounts = new double[periods];
    List<Right> rights = new ArrayList<>();
    for (int i = 1; i <= periods; i++) {
      double t = 0.5 * i;
      times[i - 1] = t;
      amounts[i - 1] = 0.5 * coupon + (i == periods ? 100 : 0);
      if (i >= first && i < periods) {
        rights.add(new Right(Right.Party.ISSUER, t, t, CashFlows.single(t, price)));
      }
    }
    return new Claim(CashFlows.of(times, amounts), rights, 0, 0);
  }

  /** Every bond ten times, each with its error bound. */
  double price() {
    for (int repeat = 0; repeat < REPEATS; repeat++) {
      for (int i = 0; i < values.length; i++) {
        values[i] = BackwardInduction.value(claims.get(i), rates.get(i)).presentValue();
      }
    }
    return Workload.sum(values);
  }
}
