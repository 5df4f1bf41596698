package org.edgefield.cli.casefile;

import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Finds what a mistyped word most likely meant. */
public final class Nearest {
  private Nearest() {}

  /** Nearest known word, if one is near enough: up to a third of its letters may differ. */
  public static Optional<String> to(String word, Collection<String> known) {
    return known.stream()
        .filter(k -> distance(word, k) <= Math.max(1, Math.max(k.length(), word.length()) / 3))
        .min(Comparator.comparingInt(k -> distance(word, k)));
  }

  /** The nearest few, however far, nearest first. */
  public static List<String> few(String word, Collection<String> known, int count) {
    return known.stream()
        .distinct()
        .sorted(Comparator.comparingInt(k -> distance(word, k)))
        .limit(count)
        .toList();
  }

  // Levenshtein's edit distance; letter case counts a little less than a wrong letter would, since
  // comparison is on lower case and equal words in another case are at distance 0.
  private static int distance(String a, String b) {
    String s = a.toLowerCase(Locale.ROOT);
    String t = b.toLowerCase(Locale.ROOT);
    int[] row = new int[t.length() + 1];
    for (int j = 0; j <= t.length(); j++) {
      row[j] = j;
    }
    for (int i = 1; i <= s.length(); i++) {
      int diagonal = row[0];
      row[0] = i;
      for (int j = 1; j <= t.length(); j++) {
        int substitute = diagonal + (s.charAt(i - 1) == t.charAt(j - 1) ? 0 : 1);
        diagonal = row[j];
        row[j] = Math.min(substitute, Math.min(row[j], row[j - 1]) + 1);
      }
    }
    return row[t.length()];
  }
}
