package ebbline.fitting.options;

import ebbline.curve.DiscountCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.instrument.Claim;
import ebbline.instrument.SwapSide;
import ebbline.instrument.Swaption;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.pricing.ClosedForm;
import ebbline.pricing.Market;
import ebbline.pricing.VolatilityLaw;
import ebbline.pricing.VolatilityTerms;
import ebbline.time.Moment;
import ebbline.time.Tenor;
import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.SplittableRandom;

/** Sheets of swaption quotes that a model made. */
final class Sheets {
  static final DiscountCurve CURVE =
      InterpolatedCurve.ofDiscounts(
          Interpolation.LOG_LINEAR,
          new double[] {0.5, 1, 2, 5, 10, 20, 30},
          new double[] {0.985, 0.968, 0.934, 0.83, 0.672, 0.43, 0.29});

  private Sheets() {}

  static Swaption swaption(int expiry, int tenor, OptionalDouble strike) {
    return Swaption.of(SwapSide.PAYER, Moment.ofYears(expiry), Tenor.parse(tenor + "Y"), 2, strike);
  }

  static Claim claim(Swaption swaption) {
    return Market.of(TimeAxis.undated(), CURVE).claim(swaption);
  }

  /** Swaptions of 1 to 10 on 1 to 10 years at the money, as normal volatilities. */
  static List<OptionQuote> swaptions(HullWhite model) {
    List<OptionQuote> quotes = new ArrayList<>();
    GaussianRates rates = model.on(CURVE);
    for (int expiry = 1; expiry <= 10; expiry++) {
      for (int tenor = 1; tenor <= 10; tenor++) {
        Claim claim = claim(swaption(expiry, tenor, OptionalDouble.empty()));
        double premium = ClosedForm.value(claim, rates).presentValue();
        double vol = VolatilityTerms.of(claim, CURVE).implied(VolatilityLaw.NORMAL, premium, 0);
        quotes.add(
            OptionQuote.of(
                expiry + "Yx" + tenor + "Y", claim, CURVE, QuoteUnit.NORMAL_VOL, vol, 0, 1));
      }
    }
    return quotes;
  }

  /** The same with Gaussian noise on the volatilities. */
  static List<OptionQuote> noisy(List<OptionQuote> quotes, double sd, SplittableRandom random) {
    return quotes.stream()
        .map(
            q ->
                new OptionQuote(
                    q.id(),
                    q.claim(),
                    q.terms(),
                    q.unit(),
                    q.quoted() + sd * random.nextGaussian(),
                    q.shift(),
                    q.weight()))
        .toList();
  }
}
