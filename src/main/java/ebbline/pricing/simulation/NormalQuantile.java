package ebbline.pricing.simulation;

/**
 * The inverse of the standard normal distribution function: algorithm AS 241, routine of 16
 * figures.
 *
 * <p>M. J. Wichura 1988, Applied Statistics 37(3), 477–484. Coefficients from memory; a test holds
 * them against the distribution function.
 */
final class NormalQuantile {
  private static final double CENTRE = 0.425;
  private static final double TAIL = 5;

  private NormalQuantile() {}

  /**
   * Relative error below 2e-15.
   *
   * @param q probabilities less ½, strictly between −½ and ½
   * @param out as long
   */
  static void at(double[] q, double[] out, int n) {
    central(q, out, n);
    for (int i = 0; i < n; i++) {
      if (Math.abs(q[i]) > CENTRE) {
        double r = Math.sqrt(-Math.log(0.5 - Math.abs(q[i])));
        double x = r <= TAIL ? middle(r - 1.6) : far(r - TAIL);
        out[i] = q[i] < 0 ? -x : x;
      }
    }
  }

  /** For all, though it holds in the centre only: without a branch this is several times faster. */
  private static void central(double[] q, double[] out, int n) {
    for (int i = 0; i < n; i++) {
      double r = CENTRE * CENTRE - q[i] * q[i];
      double top = 2509.0809287301227;
      top = Math.fma(top, r, 33430.57558358813);
      top = Math.fma(top, r, 67265.7709270087);
      top = Math.fma(top, r, 45921.95393154987);
      top = Math.fma(top, r, 13731.69376550946);
      top = Math.fma(top, r, 1971.5909503065513);
      top = Math.fma(top, r, 133.14166789178438);
      top = Math.fma(top, r, 3.3871328727963665);
      double bottom = 5226.495278852854;
      bottom = Math.fma(bottom, r, 28729.085735721943);
      bottom = Math.fma(bottom, r, 39307.89580009271);
      bottom = Math.fma(bottom, r, 21213.794301586597);
      bottom = Math.fma(bottom, r, 5394.196021424751);
      bottom = Math.fma(bottom, r, 687.1870074920579);
      bottom = Math.fma(bottom, r, 42.31333070160091);
      bottom = Math.fma(bottom, r, 1);
      out[i] = q[i] * top / bottom;
    }
  }

  private static double middle(double r) {
    double top = 0.0007745450142783414;
    top = Math.fma(top, r, 0.022723844989269184);
    top = Math.fma(top, r, 0.2417807251774506);
    top = Math.fma(top, r, 1.2704582524523684);
    top = Math.fma(top, r, 3.6478483247632045);
    top = Math.fma(top, r, 5.769497221460691);
    top = Math.fma(top, r, 4.630337846156546);
    top = Math.fma(top, r, 1.4234371107496835);
    double bottom = 1.0507500716444169E-9;
    bottom = Math.fma(bottom, r, 0.0005475938084995345);
    bottom = Math.fma(bottom, r, 0.015198666563616457);
    bottom = Math.fma(bottom, r, 0.14810397642748008);
    bottom = Math.fma(bottom, r, 0.6897673349851);
    bottom = Math.fma(bottom, r, 1.6763848301838038);
    bottom = Math.fma(bottom, r, 2.053191626637759);
    bottom = Math.fma(bottom, r, 1);
    return top / bottom;
  }

  private static double far(double r) {
    double top = 2.0103343992922881E-7;
    top = Math.fma(top, r, 2.7115555687434876E-5);
    top = Math.fma(top, r, 0.0012426609473880784);
    top = Math.fma(top, r, 0.026532189526576124);
    top = Math.fma(top, r, 0.29656057182850487);
    top = Math.fma(top, r, 1.7848265399172913);
    top = Math.fma(top, r, 5.463784911164114);
    top = Math.fma(top, r, 6.657904643501103);
    double bottom = 2.0442631033899397E-15;
    bottom = Math.fma(bottom, r, 1.421511758316446E-7);
    bottom = Math.fma(bottom, r, 1.8463183175100548E-5);
    bottom = Math.fma(bottom, r, 0.0007868691311456133);
    bottom = Math.fma(bottom, r, 0.014875361290850615);
    bottom = Math.fma(bottom, r, 0.1369298809227358);
    bottom = Math.fma(bottom, r, 0.599832206555888);
    bottom = Math.fma(bottom, r, 1);
    return top / bottom;
  }
}
