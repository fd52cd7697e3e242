package fourthwire.metering.capture.wave;

/**
 * The ends of a channel's range.
 *
 * @param lowest smallest sample; infinite where none was recorded
 * @param highest largest sample
 * @param atEnds samples that are exactly one of these
 * @param missing samples that were not recorded
 */
public record Extremes(double lowest, double highest, int atEnds, int missing) {
  static Extremes of(float[] x) {
    float lowest = Float.POSITIVE_INFINITY;
    float highest = Float.NEGATIVE_INFINITY;
    int atLowest = 0;
    int atHighest = 0;
    int missing = 0;
    for (float value : x) {
      if (value > lowest && value < highest) {
        continue;
      }
      if (value <= lowest) {
        atLowest = value < lowest ? 1 : atLowest + 1;
        lowest = value;
      }
      if (value >= highest) {
        atHighest = value > highest ? 1 : atHighest + 1;
        highest = value;
      }
      missing += Float.isNaN(value) ? 1 : 0;
    }
    return new Extremes(lowest, highest, atLowest + atHighest, missing);
  }

  /** Whether every sample is the same. */
  public boolean isFlat() {
    return lowest >= highest;
  }
}
