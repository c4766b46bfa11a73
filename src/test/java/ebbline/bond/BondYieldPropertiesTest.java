package ebbline.bond;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import ebbline.instrument.BondTerms;
import ebbline.instrument.Conventions;
import ebbline.instrument.FixedLeg;
import ebbline.instrument.LastPeriodRule;
import ebbline.instrument.PlacedLeg;
import ebbline.instrument.PriceRounding;
import ebbline.instrument.QuoteTerms;
import ebbline.instrument.YieldKind;
import ebbline.time.BusinessCalendar;
import ebbline.time.CalendarRegistry;
import ebbline.time.DayCount;
import ebbline.time.ExDividend;
import ebbline.time.Moment;
import ebbline.time.Roll;
import ebbline.time.ScheduleTerms.AccrualDates;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** What holds for every bond, on 10,000 seeded ones of all day counts, rolls and kinds of yield. */
class BondYieldPropertiesTest {
  private static final long SEED = 20_261_130;
  private static final int COUNT = 10_000;
  private static final TimeAxis TODAY = TimeAxis.from(LocalDate.of(2026, 11, 30));
  private static final BusinessCalendar TARGET = CalendarRegistry.standard().find("target");
  private static final List<DayCount> DAY_COUNTS = List.of(DayCount.values());
  private static final List<Roll> ROLLS = List.of(Roll.values());
  private static final List<LastPeriodRule> RULES = List.of(LastPeriodRule.values());
  private static final List<YieldKind> KINDS =
      List.of(
          YieldKind.STREET,
          YieldKind.TREASURY,
          YieldKind.TRUE,
          YieldKind.SIMPLE,
          YieldKind.ANNUAL,
          YieldKind.CONTINUOUS);

  private record Case(BondYield bond, double yield) {}

  private static List<Case> cases() {
    Random random = new Random(SEED);
    List<Case> cases = new ArrayList<>();
    while (cases.size() < COUNT) {
      QuoteTerms quote =
          new QuoteTerms(
              KINDS.get(random.nextInt(KINDS.size())),
              RULES.get(random.nextInt(RULES.size())),
              PriceRounding.NONE);
      PlacedLeg leg = leg(random);
      cases.add(
          new Case(BondYield.of(leg.yieldTerms(), quote), -0.02 + 0.17 * random.nextDouble()));
    }
    return cases;
  }

  private static PlacedLeg leg(Random random) {
    DayCount dayCount = DAY_COUNTS.get(random.nextInt(DAY_COUNTS.size()));
    LocalDate maturity = LocalDate.of(2026, 12, 20).plusDays(random.nextInt(15_000));
    BondTerms terms =
        BondTerms.of(Moment.of(maturity), new int[] {1, 2, 4, 12}[random.nextInt(4)], dayCount)
            .withConventions(
                new Conventions(
                    dayCount,
                    TARGET,
                    ROLLS.get(random.nextInt(ROLLS.size())),
                    random.nextBoolean(),
                    AccrualDates.UNADJUSTED))
            .withSettlement(random.nextInt(3), ExDividend.businessDays(random.nextInt(8), TARGET))
            .withRedemption(95 + 10 * random.nextDouble());
    return FixedLeg.of(terms, 0.1 * random.nextDouble()).on(TODAY);
  }

  @Test
  void priceFallsWithYieldAndComesBack() {
    double worst = 0;
    for (Case each : cases()) {
      double price = each.bond().price(each.yield());
      assertThat(each.bond().price(each.yield() + 1e-6)).isLessThan(price);
      double yield = each.bond().yieldOf(price);
      assertThat(each.bond().price(yield)).isCloseTo(price, within(1e-12 * price));
      // A yield is known as well as the price's rounding over its slope lets it be.
      double known = Math.ulp(price) / (price * each.bond().modifiedDuration(each.yield()));
      worst = Math.max(worst, Math.abs(yield - each.yield()) / (1e-14 + 4 * known));
    }
    assertThat(worst).as("seed %s", SEED).isLessThan(4);
  }

  @Test
  void durationsAgreeWithFiniteDifferences() {
    for (Case each : cases()) {
      double y = each.yield();
      double price = each.bond().price(y);
      double duration = each.bond().modifiedDuration(y);
      // Fourth order in h D = 0.004: the difference is good to 1e-9 of the duration.
      double h = 0.004 / Math.max(1, duration);
      double up = each.bond().price(y + h);
      double down = each.bond().price(y - h);
      double slope =
          (8 * (up - down) - (each.bond().price(y + 2 * h) - each.bond().price(y - 2 * h)))
              / (12 * h);
      assertThat(duration)
          .as("seed %s", SEED)
          .isCloseTo(-slope / price, within(1e-8 * Math.max(1, duration)));
      double bend = (up - 2 * price + down) / (h * h * price);
      assertThat(each.bond().convexity(y))
          .as("seed %s", SEED)
          .isCloseTo(bend, within(1e-4 * Math.max(1, duration * duration)));
    }
  }

  @Test
  void macaulayIsTheDurationInTheContinuousYield() {
    Random random = new Random(SEED);
    for (int i = 0; i < 1000; i++) {
      BondYield bond =
          BondYield.of(
              leg(random).yieldTerms(),
              new QuoteTerms(YieldKind.CONTINUOUS, LastPeriodRule.SIMPLE, PriceRounding.NONE));
      assertThat(bond.macaulayDuration(0.04)).isCloseTo(bond.modifiedDuration(0.04), within(1e-12));
    }
  }
}
