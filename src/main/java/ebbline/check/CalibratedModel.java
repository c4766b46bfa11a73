package ebbline.check;

import ebbline.curve.DiscountCurve;
import ebbline.fitting.options.CalibrationTerms;
import ebbline.fitting.options.HullWhiteCalibration;
import ebbline.fitting.options.Objective;
import ebbline.fitting.options.OptionFit;
import ebbline.fitting.options.OptionQuote;
import ebbline.fitting.options.QuoteUnit;
import ebbline.instrument.Claim;
import ebbline.instrument.OptionKind;
import ebbline.instrument.ZeroBond;
import ebbline.instrument.ZeroOption;
import ebbline.model.GaussianRates;
import ebbline.pricing.ClosedForm;
import ebbline.pricing.Market;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/**
 * A source's Hull–White model by the road a user takes: options priced under it are quoted, the
 * model is calibrated to the quotes, and what follows is priced under the model found.
 */
final class CalibratedModel {
  private static final double[][] EXPIRY_AND_LENGTH = {
    {0.5, 0.5}, {0.5, 2}, {1, 1}, {1, 3}, {2, 0.5}, {2, 2}
  };

  private CalibratedModel() {}

  /** The model found from quotes of six options on zero bonds that the stated one prices. */
  static GaussianRates of(GaussianRates stated) {
    DiscountCurve curve = stated.curve();
    Market market = Market.of(TimeAxis.undated(), curve);
    List<OptionQuote> quotes = new ArrayList<>();
    for (double[] each : EXPIRY_AND_LENGTH) {
      ZeroOption option =
          new ZeroOption(
              OptionKind.CALL,
              Moment.ofYears(each[0]),
              ZeroBond.of(Moment.ofYears(each[0] + each[1]), 100),
              OptionalDouble.empty());
      Claim claim = market.claim(option);
      double premium = ClosedForm.value(claim, stated).presentValue();
      quotes.add(
          OptionQuote.of(each[0] + "x" + each[1], claim, curve, QuoteUnit.PREMIUM, premium, 0, 1));
    }
    CalibrationTerms terms = CalibrationTerms.standard(Objective.PREMIUM);
    OptionFit fit = HullWhiteCalibration.of(quotes, curve, terms).fit();
    return HullWhiteCalibration.model(fit, terms).on(curve);
  }
}
