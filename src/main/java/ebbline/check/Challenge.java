package ebbline.check;

import ebbline.instrument.BookRow;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Optionlet;
import ebbline.instrument.RateBasis;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.pricing.BackwardInduction;
import ebbline.pricing.ClosedForm;
import ebbline.pricing.Discounting;
import ebbline.pricing.IntegrationCheck;
import ebbline.pricing.Market;
import ebbline.pricing.Method;
import ebbline.pricing.Simulation;
import ebbline.pricing.TrinomialPricing;
import ebbline.pricing.Valuation;
import ebbline.pricing.simulation.Sampling;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.function.Supplier;

/**
 * Prices the rows of a book by every method that can, and asks of every difference whether the
 * methods' own error bounds explain it.
 *
 * @param market with a short-rate model
 * @param steps of the trinomial tree
 * @param sampling of the simulation
 */
public record Challenge(Market market, int steps, Sampling sampling) {
  /**
   * A simulation's bound is a standard error. From 32 batches, the error is beyond five of them
   * once in 47,000 rows.
   */
  public static final double STANDARD_ERRORS = 5;

  public Challenge {
    Objects.requireNonNull(market, "market");
    Objects.requireNonNull(sampling, "sampling");
    if (market.rates().isEmpty()) {
      throw new IllegalArgumentException("a challenge needs a model, found a curve alone");
    }
  }

  /** A way to a claim's value. */
  private record Road(String name, Supplier<Valuation> value) {}

  /** One figure a method, the reference first. */
  public List<ChallengeFigure> of(BookRow row) {
    Claim claim;
    try {
      claim = market.claim(row.instrument());
    } catch (IllegalArgumentException e) {
      return List.of(
          ChallengeFigure.failed(row.id(), Objects.requireNonNullElse(e.getMessage(), "")));
    }
    return of(row.id(), row.face(), claim);
  }

  /** The same of a claim. */
  List<ChallengeFigure> of(String id, double face, Claim claim) {
    List<ChallengeFigure> figures = new ArrayList<>();
    Optional<Valuation> reference = Optional.empty();
    for (Road road : roads(claim)) {
      ChallengeFigure figure = figure(id, face, road, reference);
      if (reference.isEmpty()) {
        reference = figure.value();
      }
      figures.add(figure);
    }
    if (reference.isEmpty()) {
      figures.add(ChallengeFigure.failed(id, "no method prices this row"));
    }
    return List.copyOf(figures);
  }

  private static ChallengeFigure figure(
      String id, double face, Road road, Optional<Valuation> reference) {
    long start = System.nanoTime();
    Valuation found;
    try {
      found = road.value().get();
    } catch (IllegalArgumentException e) {
      return new ChallengeFigure(
          id,
          road.name(),
          Optional.empty(),
          0,
          seconds(start),
          ChallengeVerdict.NOT_APPLICABLE,
          Objects.requireNonNullElse(e.getMessage(), ""));
    }
    double seconds = seconds(start);
    double scale = face / 100;
    Valuation money =
        new Valuation(
            found.presentValue() * scale, found.method(), found.errorBound() * Math.abs(scale));
    double difference = reference.map(r -> money.presentValue() - r.presentValue()).orElse(0.0);
    return new ChallengeFigure(
        id,
        road.name(),
        Optional.of(money),
        difference,
        seconds,
        reference.map(r -> verdict(money, r)).orElse(ChallengeVerdict.REFERENCE),
        "");
  }

  private static double seconds(long start) {
    return (System.nanoTime() - start) * 1e-9;
  }

  /** Whether two values differ by no more than their bounds allow. */
  static ChallengeVerdict verdict(Valuation value, Valuation reference) {
    double allowed = allowed(value) + allowed(reference);
    return Math.abs(value.presentValue() - reference.presentValue()) <= allowed
        ? ChallengeVerdict.EXPLAINED
        : ChallengeVerdict.UNEXPLAINED;
  }

  private static double allowed(Valuation value) {
    return value.method() == Method.SIMULATION
        ? STANDARD_ERRORS * value.errorBound()
        : value.errorBound();
  }

  /** The most accurate first. */
  private List<Road> roads(Claim claim) {
    GaussianRates rates = market.rates().orElseThrow();
    List<Road> roads = new ArrayList<>();
    if (claim.isCertain()) {
      roads.add(
          new Road(
              Method.DISCOUNTING.label(), () -> Discounting.value(claim.flows(), rates.curve())));
    } else if (claim.optionlets().isEmpty()) {
      if (ClosedForm.applies(claim)) {
        roads.add(new Road(Method.CLOSED_FORM.label(), () -> ClosedForm.value(claim, rates)));
        roads.add(new Road("integration", () -> IntegrationCheck.value(claim, rates)));
      }
      roads.add(
          new Road(Method.BACKWARD_INDUCTION.label(), () -> BackwardInduction.value(claim, rates)));
      roads.add(
          new Road(Method.TRINOMIAL.label(), () -> TrinomialPricing.value(claim, rates, steps)));
    } else {
      roads.add(new Road(Method.CLOSED_FORM.label(), () -> ClosedForm.value(claim, rates)));
      if (claim.rights().isEmpty()
          && claim.optionlets().stream().allMatch(o -> o.basis() == RateBasis.FORWARD)) {
        roads.add(new Road("integration", () -> optionletsByIntegration(claim, rates)));
      }
    }
    roads.add(new Road(Method.SIMULATION.label(), () -> Simulation.value(claim, rates, sampling)));
    return roads;
  }

  /** A rate fixed in advance is known at its start: an option on two bonds. */
  private static Valuation optionletsByIntegration(Claim claim, GaussianRates rates) {
    Valuation sum = Discounting.value(claim.flows(), rates.curve());
    for (Optionlet each : claim.optionlets()) {
      Right right = new Right(Right.Party.HOLDER, each.start(), each.start(), each.exchanged());
      Valuation one =
          IntegrationCheck.value(new Claim(CashFlows.NONE, List.of(right), 0, 0), rates);
      sum =
          new Valuation(
              sum.presentValue() + one.presentValue(),
              Method.CLOSED_FORM,
              sum.errorBound() + one.errorBound());
    }
    return sum;
  }
}
