package ebbline.curve;

/**
 * The natural cubic spline in ln P with a knot of value 0 at time 0; beyond the last node its
 * tangent goes on.
 */
final class NaturalSpline implements Scheme {
  /*
   * The second derivatives Mᵢ at the knots t₀ = 0 … tₙ solve, with hᵢ = tᵢ₊₁ − tᵢ and M₀ = Mₙ = 0,
   *   hᵢ₋₁ Mᵢ₋₁ + 2(hᵢ₋₁ + hᵢ) Mᵢ + hᵢ Mᵢ₊₁ = 6 ((yᵢ₊₁ − yᵢ)/hᵢ − (yᵢ − yᵢ₋₁)/hᵢ₋₁).
   * The matrix is symmetric and diagonally dominant, so one elimination without pivoting serves both the curve
   * and, as its own transpose, the sensitivities.
   */
  private final double[] knots;
  private final double[] values;
  private final double[] pivot;
  private final double[] second;

  NaturalSpline(double[] times, double[] logs) {
    int n = times.length;
    knots = new double[n + 1];
    values = new double[n + 1];
    System.arraycopy(times, 0, knots, 1, n);
    System.arraycopy(logs, 0, values, 1, n);
    pivot = new double[n + 1];
    for (int i = 1; i < n; i++) {
      double carried = i == 1 ? 0 : width(i - 1) * width(i - 1) / pivot[i - 1];
      pivot[i] = 2 * (width(i - 1) + width(i)) - carried;
    }
    second = new double[n + 1];
    for (int i = 1; i < n; i++) {
      second[i] = 6 * (chord(i) - chord(i - 1));
    }
    solve(second);
  }

  private double width(int i) {
    return knots[i + 1] - knots[i];
  }

  private double chord(int i) {
    return (values[i + 1] - values[i]) / width(i);
  }

  /** Replaces the right-hand side by the solution; its ends stay 0. */
  private void solve(double[] side) {
    int n = knots.length - 1;
    for (int i = 2; i < n; i++) {
      side[i] -= width(i - 1) / pivot[i - 1] * side[i - 1];
    }
    for (int i = n - 1; i > 0; i--) {
      side[i] = (side[i] - width(i) * side[i + 1]) / pivot[i];
    }
  }

  @Override
  public Pieces pieces() {
    int n = knots.length - 1;
    Pieces pieces = new Pieces(n + 1);
    for (int i = 0; i < n; i++) {
      double h = width(i);
      double slope = chord(i) - h / 6 * (2 * second[i] + second[i + 1]);
      double bend = (second[i + 1] - second[i]) / (6 * h);
      pieces.add(knots[i], values[i], slope, 0.5 * second[i], bend);
    }
    double last = chord(n - 1) + width(n - 1) / 6 * second[n - 1];
    pieces.add(knots[n], values[n], last, 0, 0);
    return pieces;
  }

  @Override
  public void addGradient(double t, double weight, double[] gradient) {
    int n = knots.length - 1;
    double[] onSecond = new double[n + 1];
    int i = 0;
    while (i + 1 < n && knots[i + 1] <= t) {
      i++;
    }
    double h = width(i);
    double share = (t - knots[i]) / h;
    addValue(gradient, i, weight * (1 - share));
    addValue(gradient, i + 1, weight * share);
    if (t >= knots[n]) {
      onSecond[n - 1] = weight * h / 6 * (t - knots[n]);
    } else {
      // The cubic is the chord plus h²/6 ((b³ − b) Mᵢ + (a³ − a) Mᵢ₊₁), a the share, b = 1 − a.
      double rest = 1 - share;
      double scale = weight * h * h / 6;
      onSecond[i] = -scale * rest * share * (1 + rest);
      onSecond[i + 1] = -scale * share * rest * (1 + share);
    }
    onSecond[0] = 0;
    onSecond[n] = 0;
    solve(onSecond);
    for (int k = 1; k < n; k++) {
      double left = 6 * onSecond[k] / width(k - 1);
      double right = 6 * onSecond[k] / width(k);
      addValue(gradient, k - 1, left);
      addValue(gradient, k, -left - right);
      addValue(gradient, k + 1, right);
    }
  }

  private static void addValue(double[] gradient, int knot, double amount) {
    if (knot > 0) {
      gradient[knot - 1] += amount;
    }
  }

  @Override
  public boolean hasContinuousForward() {
    return true;
  }
}
