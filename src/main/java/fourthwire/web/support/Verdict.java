package fourthwire.web.support;

import fourthwire.limits.Finding;
import fourthwire.limits.Severity;
import java.util.List;
import java.util.Optional;

/** What findings come to: the worst of their severities, as a shape and a word. */
public enum Verdict {
  ACT,
  WATCH,
  NOTE,
  NONE;

  /** The verdict of this severity. */
  public static Verdict of(Severity severity) {
    return switch (severity) {
      case ACT -> ACT;
      case WATCH -> WATCH;
      case NOTE -> NOTE;
    };
  }

  /** The worst of these findings; {@link #NONE} without any. */
  public static Verdict of(List<Finding> findings) {
    return worst(findings).map(f -> of(f.severity())).orElse(NONE);
  }

  /** The worst finding, the first of its severity. */
  public static Optional<Finding> worst(List<Finding> findings) {
    return findings.stream().min(java.util.Comparator.comparing(Finding::severity));
  }

  /** The word used in keys, class names and the symbol's id. */
  public String word() {
    return name().toLowerCase(java.util.Locale.ROOT);
  }

  /** The key of the word the page shows. */
  public String key() {
    return "verdict." + word();
  }
}
