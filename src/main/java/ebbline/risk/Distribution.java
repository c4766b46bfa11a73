package ebbline.risk;

/**
 * A distribution in eight figures.
 *
 * @param mean expectation
 * @param sd standard deviation
 * @param p01 the value that 1 in 100 lie below
 * @param p05 5 in 100
 * @param p50 the median
 * @param p95 95 in 100
 * @param p99 99 in 100
 * @param probabilityBelowZero share of negative values
 */
public record Distribution(
    double mean,
    double sd,
    double p01,
    double p05,
    double p50,
    double p95,
    double p99,
    double probabilityBelowZero) {}
