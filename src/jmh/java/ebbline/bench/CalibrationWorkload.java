package ebbline.bench;

import ebbline.curve.DiscountCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.fitting.options.CalibrationTerms;
import ebbline.fitting.options.HullWhiteCalibration;
import ebbline.fitting.options.Objective;
import ebbline.fitting.options.OptionQuote;
import ebbline.fitting.options.QuoteUnit;
import ebbline.instrument.Claim;
import ebbline.instrument.SwapSide;
import ebbline.instrument.Swaption;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.pricing.ClosedForm;
import ebbline.pricing.Market;
import ebbline.pricing.PriceGradient;
import ebbline.time.Moment;
import ebbline.time.Tenor;
import ebbline.time.TimeAxis;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/**
 * Mean reversion and volatility from 100 swaptions at the money, from a = 0.1, σ = 1.5 %; and one
 * swaption's price beside its full gradient.
 *
 * <p>Data: a folder with curve.txt (time, discount) and swo.txt (expiry, tenor, normal volatility
 * in basis points).
 */
final class CalibrationWorkload {
  static final int REPEATED = 20;
  private static final int PRICES = 2000;

  final double[] found = new double[1];
  final double[] price = new double[1];
  private final HullWhiteCalibration calibration;
  private final Claim swaption;
  private final GaussianRates rates;

  CalibrationWorkload(Path folder) {
    List<double[]> nodes = rows(folder.resolve("curve.txt"));
    DiscountCurve curve =
        InterpolatedCurve.ofDiscounts(
            Interpolation.LOG_LINEAR,
            nodes.stream().mapToDouble(r -> r[0]).toArray(),
            nodes.stream().mapToDouble(r -> r[1]).toArray());
    Market market = Market.of(TimeAxis.undated(), curve);
    List<OptionQuote> quotes = new ArrayList<>();
    for (double[] row : rows(folder.resolve("swo.txt"))) {
      Claim claim = market.claim(swaption(row[0], (int) row[1]));
      quotes.add(
          OptionQuote.of(
              row[0] + "x" + row[1], claim, curve, QuoteUnit.NORMAL_VOL, row[2] * 1e-4, 0, 1));
    }
    calibration =
        HullWhiteCalibration.of(quotes, curve, CalibrationTerms.standard(Objective.NORMAL));
    swaption = market.claim(swaption(10, 10));
    rates = calibration.search(0.1, 0.015).on(curve);
  }

  private static Swaption swaption(double expiry, int tenor) {
    return Swaption.of(
        SwapSide.PAYER,
        Moment.ofYears(expiry),
        Tenor.parse(tenor + "Y"),
        2,
        OptionalDouble.empty());
  }

  double calibrations() {
    double sum = 0;
    for (int i = 0; i < REPEATED; i++) {
      HullWhite model = calibration.search(0.1, 0.015);
      found[0] = model.meanReversion();
      sum += model.meanReversion() * 1e3 + model.volatility().value(0);
    }
    return sum;
  }

  double prices() {
    double sum = 0;
    for (int i = 0; i < PRICES; i++) {
      sum += ClosedForm.value(swaption, rates).presentValue();
    }
    price[0] = sum / PRICES;
    return sum;
  }

  double gradients() {
    double sum = 0;
    for (int i = 0; i < PRICES; i++) {
      PriceGradient gradient = PriceGradient.of(swaption, rates);
      sum += gradient.value() + gradient.byNode(rates.curve())[0];
    }
    return sum;
  }

  double priceCount() {
    return PRICES;
  }

  private static List<double[]> rows(Path file) {
    try {
      List<double[]> rows = new ArrayList<>();
      for (String line : Files.readAllLines(file)) {
        String[] parts = line.strip().split("\\s+");
        double[] row = new double[parts.length];
        for (int i = 0; i < row.length; i++) {
          row[i] = Double.parseDouble(parts[i]);
        }
        rows.add(row);
      }
      return rows;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
