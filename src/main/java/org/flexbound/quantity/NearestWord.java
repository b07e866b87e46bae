package org.flexbound.quantity;

import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;

/** Finds what somebody may have meant by a word that is not known. */
public final class NearestWord {
  private NearestWord() {}

  /**
   * The known words nearest to one that is not known: at most a third of its letters differ, upper
   * and lower case alike (distance of Levenshtein, Soviet Physics Doklady 10, 1966, 707).
   *
   * @param word the word that was found
   * @param known the words that would have been understood
   * @return at most three, the nearest first
   */
  public static List<String> of(String word, Collection<String> known) {
    return known.stream()
        .filter(candidate -> isNear(candidate, word))
        .sorted(
            Comparator.<String>comparingInt(candidate -> distance(candidate, word))
                .thenComparing(Comparator.naturalOrder()))
        .limit(3)
        .toList();
  }

  /**
   * A question to end a message with.
   *
   * @param word the word that was found
   * @param known the words that would have been understood
   * @return {@code ". Did you mean 'x'?"}; empty where none is near
   */
  public static String question(String word, Collection<String> known) {
    List<String> near = of(word, known);
    return near.isEmpty() ? "" : ". Did you mean '" + near.get(0) + "'?";
  }

  private static boolean isNear(String candidate, String word) {
    int distance = distance(candidate, word);
    return distance <= Math.max(1, (word.length() + 1) / 3) && distance < candidate.length();
  }

  private static int distance(String left, String right) {
    String a = left.toLowerCase(Locale.ROOT);
    String b = right.toLowerCase(Locale.ROOT);
    int[] row = new int[b.length() + 1];
    for (int j = 0; j <= b.length(); j++) {
      row[j] = j;
    }
    for (int i = 1; i <= a.length(); i++) {
      int diagonal = row[0];
      row[0] = i;
      for (int j = 1; j <= b.length(); j++) {
        int above = row[j];
        int change = diagonal + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
        row[j] = Math.min(change, Math.min(above, row[j - 1]) + 1);
        diagonal = above;
      }
    }
    return row[b.length()];
  }
}
