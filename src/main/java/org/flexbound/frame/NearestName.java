package org.flexbound.frame;

import java.util.Collection;
import java.util.Locale;
import java.util.Optional;

/** The name that someone may have meant. */
public final class NearestName {
  private NearestName() {}

  /**
   * The nearest of some names by the number of letters changed, left out, added or exchanged with
   * their neighbour (Damerau 1964, adjacent exchanges only), upper and lower case alike.
   *
   * @param word what was found
   * @param names what there is
   * @return the nearest, the first of several; empty where none is near
   */
  public static Optional<String> to(String word, Collection<String> names) {
    String wanted = word.strip().toLowerCase(Locale.ROOT);
    int limit = Math.max(1, wanted.length() / 3);
    String best = "";
    int least = limit + 1;
    for (String name : names) {
      int distance = distance(wanted, name.toLowerCase(Locale.ROOT));
      if (distance < least) {
        least = distance;
        best = name;
      }
    }
    return best.isEmpty() ? Optional.empty() : Optional.of(best);
  }

  /**
   * A hint for a message.
   *
   * @param word what was found
   * @param names what there is
   * @return {@code ; did you mean 'knee'?}, or the names there are where few, or nothing
   */
  public static String hint(String word, Collection<String> names) {
    Optional<String> near = to(word, names);
    if (near.isPresent()) {
      return "; did you mean '" + near.get() + "'?";
    }
    if (names.isEmpty()) {
      return "; there are none";
    }
    return names.size() > 12 ? "" : "; there are " + String.join(", ", names);
  }

  private static int distance(String a, String b) {
    int[][] d = new int[a.length() + 1][b.length() + 1];
    for (int i = 0; i <= a.length(); i++) {
      for (int j = 0; j <= b.length(); j++) {
        if (i == 0 || j == 0) {
          d[i][j] = i + j;
          continue;
        }
        int change = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
        d[i][j] =
            Math.min(Math.min(d[i - 1][j], d[i][j - 1]) + 1, d[i - 1][j - 1] + change);
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
