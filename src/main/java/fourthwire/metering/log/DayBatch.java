package fourthwire.metering.log;

import java.util.ArrayList;
import java.util.List;

/**
 * Gathers days until they are worth sharing out: each check then goes through all of them, in their
 * order, beside the others.
 */
final class DayBatch {
  private static final int ROWS = 8192;

  private final List<DayCheck> checks;
  private final List<LogDay> days = new ArrayList<>();
  private int rows;

  DayBatch(List<DayCheck> checks) {
    this.checks = checks;
  }

  void take(LogDay day) {
    days.add(day);
    rows += day.rows();
    if (rows >= ROWS) {
      pass();
    }
  }

  /** Passes on what was gathered. */
  void pass() {
    checks.parallelStream().forEach(check -> days.forEach(check::take));
    days.clear();
    rows = 0;
  }
}
