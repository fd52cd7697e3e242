package fourthwire.intake.reading.table;

import java.time.Duration;
import java.time.LocalDateTime;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Settles the order of day and month from every date of a file: an order in which one of them is no
 * date is out; of the rest the one whose rows follow each other more evenly is taken, if there is
 * one.
 */
final class OrderSearch {
  private final List<Candidate> candidates = new ArrayList<>();
  private boolean plain = true;

  private static final class Candidate {
    final DateOrder order;
    final Map<Duration, Integer> steps = new HashMap<>();
    Optional<LocalDateTime> before = Optional.empty();
    boolean possible = true;

    Candidate(DateOrder order) {
      this.order = order;
    }

    void take(CellTime time) {
      Optional<LocalDateTime> at = time.local(order);
      possible = possible && at.isPresent();
      if (at.isPresent() && before.isPresent() && steps.size() < 10_000) {
        steps.merge(Duration.between(before.get(), at.get()), 1, Integer::sum);
      }
      before = at;
    }

    /** Steps other than the usual one. */
    int uneven() {
      int all = steps.values().stream().mapToInt(Integer::intValue).sum();
      return all - steps.values().stream().mapToInt(Integer::intValue).max().orElse(0);
    }
  }

  OrderSearch() {
    for (DateOrder order : DateOrder.values()) {
      candidates.add(new Candidate(order));
    }
  }

  void take(CellTime time) {
    plain = plain && time.plain();
    if (!plain) {
      candidates.forEach(c -> c.take(time));
    }
  }

  /** Whether every date so far names its own order. */
  boolean plain() {
    return plain;
  }

  /** The order and the sentence why; empty where the file does not settle it. */
  Optional<Settled> settled() {
    if (plain) {
      return Optional.of(new Settled(DateOrder.YEAR_MONTH_DAY, ""));
    }
    // Two-digit years first are a custom of files that write them so throughout, never beside 4.
    List<Candidate> possible = candidates.stream().filter(c -> c.possible).toList();
    if (possible.size() == 1) {
      return Optional.of(
          new Settled(
              possible.get(0).order,
              "Dates are " + words(possible.get(0).order) + ": no other order fits every row."));
    }
    int least = possible.stream().mapToInt(Candidate::uneven).min().orElse(0);
    List<Candidate> best = possible.stream().filter(c -> c.uneven() == least).toList();
    return best.size() == 1
        ? Optional.of(
            new Settled(
                best.get(0).order,
                "Dates are "
                    + words(best.get(0).order)
                    + ": only so do the rows follow each other evenly."))
        : Optional.empty();
  }

  private static String words(DateOrder order) {
    return switch (order) {
      case YEAR_MONTH_DAY -> "year first";
      case DAY_MONTH_YEAR -> "day first";
      case MONTH_DAY_YEAR -> "month first";
    };
  }

  /** An order and why. */
  record Settled(DateOrder order, String reason) {}
}
