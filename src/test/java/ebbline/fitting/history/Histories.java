package ebbline.fitting.history;

import ebbline.fitting.ReferenceCsv;
import ebbline.model.NormalLaw;
import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import java.util.Objects;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/** Histories and reference figures of the tests. */
final class Histories {
  private static final ReferenceCsv REFERENCE =
      ReferenceCsv.read("history/estimation-reference.csv");
  private static final Map<String, String> FIGURES = new HashMap<>();

  static {
    for (int i = 0; i < REFERENCE.size(); i++) {
      FIGURES.put(
          REFERENCE.text(i, "set") + "." + REFERENCE.text(i, "quantity"),
          REFERENCE.text(i, "value"));
    }
  }

  private Histories() {}

  static double reference(String set, String quantity) {
    return Double.parseDouble(text(set, quantity));
  }

  private static String text(String set, String quantity) {
    String key = set + "." + quantity;
    return Objects.requireNonNull(FIGURES.get(key), "no reference figure " + key);
  }

  /** The monthly history of a reference set, in decimals. */
  static RateHistory of(String set) {
    String file = file(set);
    String[] parts = file.split(":", -1);
    double[] rates = rates(parts[0], parts[1], text(set, "start"), text(set, "end"));
    return RateHistory.ofStep(1.0 / 12, rates);
  }

  private static String file(String set) {
    if (set.startsWith("tb3")) {
      return "tbill3m-monthly.csv:tbill_3m";
    }
    return set.startsWith("tips") ? "real5y-monthly.csv:real_5y" : "cmt10y-monthly.csv:10y";
  }

  /** Rates in decimals from one date to another, both included. */
  static double[] rates(String file, String column, String start, String end) {
    ReferenceCsv table = ReferenceCsv.read("history/" + file);
    double[] all = table.column(column);
    double[] rates = new double[all.length];
    int n = 0;
    for (int i = 0; i < all.length; i++) {
      String date = table.text(i, "date");
      if (date.compareTo(start) >= 0 && date.compareTo(end) <= 0) {
        rates[n++] = all[i] / 100;
      }
    }
    return Arrays.copyOf(rates, n);
  }

  /** An exact draw of the process at the given times, started in its stationary law. */
  static double[] draw(RateLaw law, double[] times, long seed) {
    UniformRandomProvider random = RandomSource.XO_SHI_RO_256_PP.create(seed);
    ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
    double[] rates = new double[times.length];
    NormalLaw here = law.stationary();
    for (int i = 0; i < times.length; i++) {
      if (i > 0) {
        here = law.conditional(rates[i - 1], times[i] - times[i - 1]);
      }
      rates[i] = here.mean() + here.standardDeviation() * normal.sample();
    }
    return rates;
  }

  static double[] evenTimes(int count, double step) {
    double[] times = new double[count];
    for (int i = 0; i < count; i++) {
      times[i] = i * step;
    }
    return times;
  }
}
