package ebbline.instrument;

import java.util.OptionalDouble;

/**
 * What a yield has to know of paper with fixed payments: how much is still to come, and how far
 * away each payment lies by every way of counting. Per 100 face, seen from settlement. Immutable.
 */
public final class YieldTerms {
  private final int frequency;
  private final double[] amounts;
  private final double[] periods;
  private final double[] paidPeriods;
  private final double[] years;
  private final int periodsLeft;
  private final double accrued;
  private final double annualCoupon;
  private final double life;
  private final double countedLife;
  private final OptionalDouble redemption;

  private YieldTerms(Builder from) {
    this.frequency = from.frequency;
    this.amounts = from.amounts.clone();
    this.periods = from.periods.clone();
    this.paidPeriods = from.paidPeriods.clone();
    this.years = from.years.clone();
    this.periodsLeft = from.periodsLeft;
    this.accrued = from.accrued;
    this.annualCoupon = from.annualCoupon;
    this.life = from.life;
    this.countedLife = from.countedLife;
    this.redemption = from.redemption;
  }

  /** Coupon periods a year. */
  public int frequency() {
    return frequency;
  }

  /** How many payments are left. */
  public int size() {
    return amounts.length;
  }

  /** Payments, coupons and redemption together. A fresh array. */
  public double[] amounts() {
    return amounts.clone();
  }

  /**
   * Coupon periods from settlement to the coupon date of each payment, odd periods as the regular
   * ones they are made of. A fresh array.
   */
  public double[] periods() {
    return periods.clone();
  }

  /** As {@link #periods()}, to the day on which the payment is made. A fresh array. */
  public double[] paidPeriods() {
    return paidPeriods.clone();
  }

  /** Years to each payment: periods over the frequency, or business days over 252. Fresh. */
  public double[] years() {
    return years.clone();
  }

  /** Coupon periods that end after settlement, whether their coupon is owed or not. */
  public int periodsLeft() {
    return periodsLeft;
  }

  /** Accrued interest; negative ex-dividend. */
  public double accrued() {
    return accrued;
  }

  /** What the coupon of today pays a year. */
  public double annualCoupon() {
    return annualCoupon;
  }

  /** Years from settlement to the last payment, actual days over 365. */
  public double life() {
    return life;
  }

  /** Years from settlement to the last payment by the paper's own day count. */
  public double countedLife() {
    return countedLife;
  }

  /** What maturity repays besides its coupon; empty where parts are repaid before. */
  public OptionalDouble redemption() {
    return redemption;
  }

  static Builder builder(int frequency, double[] amounts) {
    return new Builder(frequency, amounts);
  }

  /** Collects the members; arrays are one entry a payment. */
  static final class Builder {
    private final int frequency;
    private final double[] amounts;
    private double[] periods = {};
    private double[] paidPeriods = {};
    private double[] years = {};
    private int periodsLeft;
    private double accrued;
    private double annualCoupon;
    private double life;
    private double countedLife;
    private OptionalDouble redemption = OptionalDouble.empty();

    private Builder(int frequency, double[] amounts) {
      this.frequency = frequency;
      this.amounts = amounts;
    }

    Builder at(double[] inPeriods, double[] paidInPeriods, double[] inYears) {
      this.periods = inPeriods;
      this.paidPeriods = paidInPeriods;
      this.years = inYears;
      return this;
    }

    Builder periodsLeft(int count) {
      this.periodsLeft = count;
      return this;
    }

    Builder interest(double soFar, double perYear) {
      this.accrued = soFar;
      this.annualCoupon = perYear;
      return this;
    }

    Builder life(double actual, double counted) {
      this.life = actual;
      this.countedLife = counted;
      return this;
    }

    Builder redemption(OptionalDouble atMaturity) {
      this.redemption = atMaturity;
      return this;
    }

    YieldTerms build() {
      return new YieldTerms(this);
    }
  }
}
