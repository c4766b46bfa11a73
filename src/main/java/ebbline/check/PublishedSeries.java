package ebbline.check;

import java.util.Arrays;

/** The histories that published estimates were made from, shipped with the program. */
final class PublishedSeries {
  private PublishedSeries() {}

  /**
   * The 8,664 daily three-month Treasury rates of 1982 to 2016, decimals. Board of Governors of the
   * Federal Reserve System, release H.15; public domain.
   */
  static double[] dailyBills() {
    return PublishedCases.text("/ebbline/published/bills-daily.txt")
        .lines()
        .filter(line -> !line.startsWith("#"))
        .flatMap(line -> Arrays.stream(line.split(" ", -1)))
        .mapToDouble(basisPoints -> Integer.parseInt(basisPoints) / 1e4)
        .toArray();
  }
}
