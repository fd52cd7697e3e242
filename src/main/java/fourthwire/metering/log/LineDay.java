package fourthwire.metering.log;

import java.util.Arrays;
import java.util.Optional;

/** What a day holds of the three lines: the columns of one measure, or none of them. */
final class LineDay {
  static final String[] LINES = {"L1", "L2", "L3"};

  private final LogDay day;

  LineDay(LogDay day) {
    this.day = day;
  }

  /** A measure of all three lines; empty where one of them is not logged. */
  Optional<double[][]> all(String measure) {
    double[][] columns = new double[LINES.length][];
    for (int k = 0; k < LINES.length; k++) {
      Optional<double[]> column = day.find(LINES[k] + "." + measure);
      if (column.isEmpty()) {
        return Optional.empty();
      }
      columns[k] = column.get();
    }
    return Optional.of(columns);
  }

  /** Volts of a line to the neutral, from line to line where there is nothing else. */
  Optional<double[]> volts(String line) {
    return day.find(line + ".rms_v")
        .or(
            () ->
                day.find("L1-L2.rms_v")
                    .map(v -> Arrays.stream(v).map(x -> x / Math.sqrt(3)).toArray()));
  }
}
