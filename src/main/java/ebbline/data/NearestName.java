package ebbline.data;

import java.util.Collection;
import java.util.Locale;

/** The known name that a mistyped one is closest to. */
public final class NearestName {
  private static final int MOST_COMPARED = 64; // no name is near to half of that

  private NearestName() {}

  /**
   * The name with the fewest edits (insertions, deletions, changes, swaps of neighbours); the first
   * of several.
   *
   * @param known at least one
   */
  public static String of(String typed, Collection<String> known) {
    String compared =
        typed.substring(0, Math.min(typed.length(), MOST_COMPARED)).toLowerCase(Locale.ROOT);
    String best = "";
    int least = Integer.MAX_VALUE;
    for (String name : known) {
      int edits = edits(compared, name.toLowerCase(Locale.ROOT));
      if (edits < least) {
        least = edits;
        best = name;
      }
    }
    return best;
  }

  private static int edits(String a, String b) {
    int[][] d = new int[a.length() + 1][b.length() + 1];
    for (int i = 0; i <= a.length(); i++) {
      for (int j = 0; j <= b.length(); j++) {
        if (i == 0 || j == 0) {
          d[i][j] = i + j;
          continue;
        }
        int change = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
        d[i][j] = Math.min(d[i - 1][j - 1] + change, 1 + Math.min(d[i - 1][j], d[i][j - 1]));
        if (i > 1
            && j > 1
            && a.charAt(i - 1) == b.charAt(j - 2)
            && a.charAt(i - 2) == b.charAt(j - 1)) {
          d[i][j] = Math.min(d[i][j], d[i - 2][j - 2] + 1);
        }
      }
    }
    return d[a.length()][b.length()];
  }
}
