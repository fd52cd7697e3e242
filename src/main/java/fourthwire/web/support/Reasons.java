package fourthwire.web.support;

import fourthwire.quantity.Figure;
import java.util.ArrayList;
import java.util.List;

/** Collects why figures of a table are unknown, so that each reason stands once below it. */
public final class Reasons {
  private final List<String> reasons = new ArrayList<>();

  /** A reason and the mark that points to it. */
  public record Reason(String mark, String text) {}

  /** The mark under which this unknown figure's reason stands: a, b, … */
  String markOf(Figure unknown) {
    int at = reasons.indexOf(unknown.reason());
    if (at < 0) {
      reasons.add(unknown.reason());
      at = reasons.size() - 1;
    }
    return mark(at);
  }

  /** What was collected, in order. */
  public List<Reason> list() {
    List<Reason> list = new ArrayList<>();
    for (int i = 0; i < reasons.size(); i++) {
      list.add(new Reason(mark(i), reasons.get(i)));
    }
    return list;
  }

  private static String mark(int at) {
    int letters = 'z' - 'a' + 1;
    String last = String.valueOf((char) ('a' + at % letters));
    return at < letters ? last : mark(at / letters - 1) + last;
  }
}
