package ebbline.bond;

/**
 * A price at a yield.
 *
 * @param price dirty, per 100
 * @param slope its first derivative in the yield
 * @param bend its second derivative
 * @param meanTime mean time of the payments weighted by their present values, years
 */
record YieldPoint(double price, double slope, double bend, double meanTime) {}
