package fourthwire.intake.reading.heading;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Pattern;

/**
 * Conductors as headings of one file write them: by number, or by the letters A B C, R S T or R Y
 * B. Which letters those are shows in the file as a whole.
 */
final class LogPlace {
  static final String TOTAL = "total";

  /** Letters beside the one that names a conductor. */
  private static final Pattern BESIDE = Pattern.compile("l(?=[123])|-|eut(ral)?");

  private final boolean rst;
  private final boolean ryb;

  /**
   * @param written every place that a heading of the file writes
   */
  LogPlace(Set<String> written) {
    this.ryb = written.stream().anyMatch(p -> p.matches("y[bn]?|ry"));
    boolean third = written.contains("r") && written.contains("t");
    this.rst = !ryb && (third || written.stream().anyMatch(p -> p.matches("s[tn]?|rs")));
  }

  /** The line, pair, N or total; empty for none. */
  Optional<String> of(List<String> places) {
    List<String> conductors = new ArrayList<>();
    boolean total = false;
    for (String place : places) {
      total = total || place.equals("total") || place.equals("t") && !rst;
      for (String c : BESIDE.matcher(place.equals("total") ? "" : place).replaceAll("").split("")) {
        conductor(c).filter(found -> !conductors.contains(found)).ifPresent(conductors::add);
      }
    }
    if (places.contains("total") && conductors.size() <= 1) {
      return Optional.of(conductors.isEmpty() ? TOTAL : conductors.get(0));
    }
    if (conductors.isEmpty()) {
      return total ? Optional.of(TOTAL) : Optional.empty();
    }
    return conductors.size() > 2 ? Optional.empty() : Optional.of(pair(conductors));
  }

  private Optional<String> conductor(String letter) {
    return switch (letter) {
      case "1", "a" -> Optional.of("L1");
      case "2" -> Optional.of("L2");
      case "3", "c" -> Optional.of("L3");
      case "4", "n" -> Optional.of("N");
      case "b" -> Optional.of(ryb ? "L3" : "L2");
      case "r" -> rst || ryb ? Optional.of("L1") : Optional.empty();
      case "y" -> ryb ? Optional.of("L2") : Optional.empty();
      case "s" -> rst ? Optional.of("L2") : Optional.empty();
      case "t" -> rst ? Optional.of("L3") : Optional.empty();
      default -> Optional.empty();
    };
  }

  /** To the neutral is the line itself; pairs stand in the contract's order. */
  private static String pair(List<String> conductors) {
    String a = conductors.get(0);
    if (conductors.size() == 1) {
      return a;
    }
    String b = conductors.get(1);
    if (a.equals("N") || b.equals("N")) {
      return a.equals("N") ? b : a;
    }
    boolean backwards = List.of("L2-L1", "L3-L2", "L1-L3").contains(a + "-" + b);
    return backwards ? b + "-" + a : a + "-" + b;
  }
}
