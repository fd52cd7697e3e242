package fourthwire.site.check;

import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;

/** Words close to a mistyped one, by the number of letters to change (edit distance). */
public final class Closest {
  private static final int MOST = 3;

  private Closest() {}

  /** Up to three of the words that a slip of the pen could turn into this one, nearest first. */
  public static List<String> to(String word, Collection<String> words) {
    String typed = word.toLowerCase(Locale.ROOT);
    int reach = Math.max(1, typed.length() / 3);
    return words.stream()
        .filter(w -> Math.abs(w.length() - typed.length()) <= reach)
        .map(w -> new Candidate(w, distance(typed, w.toLowerCase(Locale.ROOT))))
        .filter(c -> c.distance <= reach)
        .sorted(Comparator.comparingInt(Candidate::distance).thenComparing(Candidate::word))
        .limit(MOST)
        .map(Candidate::word)
        .toList();
  }

  /** A sentence that offers the close words, starting with a blank; empty where none is close. */
  public static String hint(String word, Collection<String> words) {
    List<String> close = to(word, words);
    return close.isEmpty()
        ? ""
        : close.stream()
            .map(w -> "\"" + w + "\"")
            .collect(Collectors.joining(" or ", " Is ", " meant?"));
  }

  private record Candidate(String word, int distance) {}

  private static int distance(String a, String b) {
    int[] last = new int[b.length() + 1];
    for (int j = 0; j <= b.length(); j++) {
      last[j] = j;
    }
    for (int i = 1; i <= a.length(); i++) {
      int[] row = new int[b.length() + 1];
      row[0] = i;
      for (int j = 1; j <= b.length(); j++) {
        int change = last[j - 1] + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
        row[j] = Math.min(change, 1 + Math.min(last[j], row[j - 1]));
      }
      last = row;
    }
    return last[b.length()];
  }
}
