package ebbline.data;

/**
 * A column of a file.
 *
 * @param heading as the file has it
 * @param name what it holds; the heading itself for a column that is carried through
 * @param unit of bare numbers in it
 * @param carried whether it is one of the user's own, {@code x-…}
 */
record Column(String heading, String name, RateText.Unit unit, boolean carried) {

  static Column of(String heading, Layout layout) {
    if (heading.startsWith("x-")) {
      return new Column(heading, heading, RateText.Unit.WRITTEN, true);
    }
    if (heading.endsWith("_pct") && layout.isRate(stem(heading, 4))) {
      return new Column(heading, stem(heading, 4), RateText.Unit.PER_CENT, false);
    }
    if (heading.endsWith("_bp") && layout.isRate(stem(heading, 3))) {
      return new Column(heading, stem(heading, 3), RateText.Unit.BASIS_POINTS, false);
    }
    return new Column(heading, heading, RateText.Unit.WRITTEN, false);
  }

  private static String stem(String heading, int ending) {
    return heading.substring(0, heading.length() - ending);
  }

  boolean isKnown(Layout layout) {
    return carried || layout.columns().contains(name) || layout.isRate(name);
  }
}
