package fourthwire.intake.reading.table;

import java.time.Duration;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Settles the order of day and month from every date of a file: an order in which one of them is no
 * date is out; of the rest the one whose rows follow each other more evenly, over less time and
 * without running back, is taken, if there is one.
 */
final class OrderSearch {
  private final List<Candidate> candidates = new ArrayList<>();
  private boolean plain = true;

  private static final class Candidate {
    final DateOrder order;
    final Map<Duration, Integer> steps = new HashMap<>();
    Optional<LocalDateTime> first = Optional.empty();
    Optional<LocalDateTime> before = Optional.empty();
    boolean possible = true;

    Candidate(DateOrder order) {
      this.order = order;
    }

    void take(CellTime time) {
      // Two-digit years stand first only between hyphens.
      boolean strange =
          order == DateOrder.YEAR_MONTH_DAY && !time.plain() && !time.date().hyphened();
      Optional<LocalDateTime> at = strange ? Optional.empty() : time.local(order);
      possible = possible && at.isPresent();
      if (at.isPresent() && before.isPresent() && steps.size() < 10_000) {
        steps.merge(Duration.between(before.get(), at.get()), 1, Integer::sum);
      }
      first = first.or(() -> at);
      before = at;
    }

    /** Steps other than the usual one. */
    int uneven() {
      int all = steps.values().stream().mapToInt(Integer::intValue).sum();
      return all - steps.values().stream().mapToInt(Integer::intValue).max().orElse(0);
    }

    Duration span() {
      return first.isEmpty() || before.isEmpty()
          ? Duration.ZERO
          : Duration.between(first.get(), before.get()).abs();
    }

    boolean betterThan(Candidate other) {
      return uneven() < other.uneven() && span().compareTo(other.span()) <= 0;
    }

    boolean begins(Collection<LocalDate> days) {
      return first.isPresent() && days.contains(first.get().toLocalDate());
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

  private List<Candidate> possible() {
    return candidates.stream().filter(c -> c.possible).toList();
  }

  /** Whether only one order fits what was seen so far. */
  boolean single() {
    return !plain && possible().size() <= 1;
  }

  /**
   * The order and the sentence why; empty where the file does not settle it.
   *
   * @param named days that lines above the table name plainly
   */
  Optional<Settled> settled(Collection<LocalDate> named) {
    if (plain) {
      return Optional.of(new Settled(DateOrder.YEAR_MONTH_DAY, ""));
    }
    List<Candidate> possible = possible();
    if (possible.size() == 1) {
      return settled(possible.get(0), "no other order fits every row.");
    }
    List<Candidate> even =
        possible.stream()
            .filter(c -> possible.stream().allMatch(o -> o == c || c.betterThan(o)))
            .toList();
    if (even.size() == 1) {
      return settled(even.get(0), "only so do the rows follow each other evenly.");
    }
    List<Candidate> begun = possible.stream().filter(c -> c.begins(named)).toList();
    return begun.size() == 1
        ? settled(begun.get(0), "so they begin on the day that stands above the table.")
        : Optional.empty();
  }

  private static Optional<Settled> settled(Candidate found, String why) {
    return Optional.of(new Settled(found.order, "Dates are " + words(found.order) + ": " + why));
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
