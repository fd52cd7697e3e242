package fourthwire.metering.log;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.OptionalLong;

/** Counts the steps from row to row. */
public final class LogSteps {
  private static final int MOST_KINDS = 10_000;

  private final Map<Long, Integer> counts = new LinkedHashMap<>();
  private long before = Long.MIN_VALUE;
  private long usual;
  private int usualCount;

  /** The next row's time, milliseconds. */
  public void take(long millis) {
    long step = millis - before;
    if (before > Long.MIN_VALUE && step > 0) {
      if (step == usual) {
        usualCount++;
      } else {
        count(step);
      }
    }
    before = millis;
  }

  /** The usual step is counted beside the map, which most rows then need not touch. */
  private void count(long step) {
    int count = counts.getOrDefault(step, 0) + 1;
    if (count > usualCount) {
      counts.put(usual, usualCount);
      counts.remove(step);
      usual = step;
      usualCount = count;
    } else if (counts.size() < MOST_KINDS) {
      counts.put(step, count);
    }
  }

  /** The most frequent step, milliseconds; empty below two rows. */
  public OptionalLong usualMillis() {
    return usualCount == 0 ? OptionalLong.empty() : OptionalLong.of(usual);
  }
}
