package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.WRONG_RATIO;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.IntToDoubleFunction;
import java.util.stream.Stream;

/**
 * Powers against volts times amps, line by line: a ratio or unit that is wrong. Each day is judged
 * by its median, so that a strange row is no finding; what all lines share is one fault. Thresholds
 * are common practice, no source; the relations are P = V·I·power factor and S = V·I of a line
 * (IEEE 1459-2010, 3.1.2).
 */
final class PowerRatios {
  private static final double ALIKE = 0.03;

  /** Whole ratios that an instrument may be set to, as exact as that, are no load's own. */
  private static final double WHOLE = 0.04;

  private static final double STEADY = 0.08;
  private static final int MOST_WHOLE = 20;

  private final FlaggedDays flagged;

  PowerRatios(FlaggedDays flagged) {
    this.flagged = flagged;
  }

  /**
   * A ratio that is wrong.
   *
   * @param which power
   * @param median of the day
   * @param of what the power is so many times
   */
  private record Off(String line, LineRatio which, double median, String of) {}

  /** Whether a total proves the power of a line wrong; what is off is flagged. */
  boolean look(LogDay day) {
    List<Off> off = new ArrayList<>();
    for (String line : LineDay.LINES) {
      off(day, line).ifPresent(off::add);
    }
    if (off.size() == LineDay.LINES.length && isAlike(off)) {
      ofAllLines(day, off);
      return false;
    }
    off.forEach(o -> ofOne(day, o));
    return off.stream()
        .anyMatch(o -> new RatioOffers(day, o.which()).totalProves(o.line(), o.median()));
  }

  private static boolean isAlike(List<Off> off) {
    Off first = off.get(0);
    return off.stream()
        .allMatch(
            o -> o.which() == first.which() && Math.abs(o.median() / first.median() - 1) < ALIKE);
  }

  private static Optional<Off> off(LogDay day, String line) {
    double ofApparent = LineRatio.APPARENT.usual(day, line);
    if (ofApparent < 0.93 || ofApparent > 1.07) {
      return Optional.of(new Off(line, LineRatio.APPARENT, ofApparent, "volts times amps"));
    }
    double ofActive = LineRatio.ACTIVE.usual(day, line);
    return Double.isNaN(ofActive) ? Optional.empty() : active(day, line, ofActive);
  }

  private static Optional<Off> active(LogDay day, String line, double median) {
    if (day.find(line + ".power_factor").isPresent()) {
      return median < 0.9 || median > 1.1
          ? Optional.of(
              new Off(line, LineRatio.ACTIVE, median, "volts times amps times power factor"))
          : Optional.empty();
    }
    boolean apparentFits = day.find(LineRatio.APPARENT.of(line)).isPresent();
    if (median > 1.05 || median < 0.02) {
      return Optional.of(new Off(line, LineRatio.ACTIVE, median, "volts times amps"));
    }
    return Stream.of(LineRatio.ACTIVE, LineRatio.FUNDAMENTAL)
        .filter(which -> !apparentFits && isWholeAgainstOthers(day, line, which))
        .map(
            which ->
                new Off(
                    line,
                    which,
                    which.usual(day, line),
                    "volts times amps, that of the other lines far more"))
        .findFirst();
  }

  /**
   * Where nothing but volts, amps and watts is logged, a line whose watts are a whole fraction of
   * what they are on the other lines, row by row, has another ratio, not another load.
   */
  private static boolean isWholeAgainstOthers(LogDay day, String line, LineRatio which) {
    double[] amps = day.find(line + ".rms_a").orElseThrow();
    List<String> others = Arrays.stream(LineDay.LINES).filter(o -> !o.equals(line)).toList();
    double one = which.usual(day, others.get(0));
    double other = which.usual(day, others.get(1));
    boolean likely = Math.min(one, other) > 0.6 && Math.max(one, other) < 1.05;
    if (!likely || Math.abs(one / other - 1) > 0.12) {
      return false;
    }
    IntToDoubleFunction times =
        row ->
            (which.at(day, others.get(0), row) + which.at(day, others.get(1), row))
                / (2 * which.at(day, line, row));
    double factor = Rows.loaded(amps, times);
    double whole = Math.rint(factor);
    double apart = Rows.loaded(amps, row -> Math.abs(times.applyAsDouble(row) / factor - 1));
    return whole >= 2
        && whole <= MOST_WHOLE
        && Math.abs(factor / whole - 1) < WHOLE
        && apart < STEADY;
  }

  private void ofOne(LogDay day, Off off) {
    flagged.add(
        day,
        new FlaggedDays.Fault(
            WRONG_RATIO,
            off.line(),
            "Amps, volts or watts of this line are wrong by that factor.",
            String.format(
                Locale.ROOT,
                "%s power of %s is %.3g times %s (median of the day): a ratio, unit or factor is"
                    + " wrong.",
                off.which().word(),
                off.line(),
                off.median(),
                off.of()),
            new RatioOffers(day, off.which()).ofLine(off.line(), off.median()),
            RowTest.ofRatio((other, row) -> off.which().at(other, off.line(), row), off.median())));
  }

  private void ofAllLines(LogDay day, List<Off> off) {
    Off first = off.get(0);
    double ratio = off.stream().mapToDouble(Off::median).sum() / off.size();
    flagged.add(
        day,
        new FlaggedDays.Fault(
            WRONG_RATIO,
            "all lines",
            "Amps, volts or watts of all lines are wrong by that factor; where it is the amps,"
                + " those of N too unless it is above their sum; no power can show it.",
            String.format(
                Locale.ROOT,
                "%s power of L1, L2 and L3 is %.3g times %s on each (median of the day): one ratio"
                    + " or unit of the instrument is wrong%s.",
                first.which().word(),
                ratio,
                first.of(),
                beyond(ratio, new RatioOffers(day, first.which()).likely(ratio))),
            new RatioOffers(day, first.which()).ofAllLines(ratio),
            RowTest.ofRatio((other, row) -> first.which().at(other, first.line(), row), ratio)));
  }

  /** What a ratio leaves where a power factor is part of what was seen. */
  static String beyond(double seen, double ratio) {
    return seen == ratio
        ? ""
        : String.format(
            Locale.ROOT,
            "; whether of amps or of watts can't be told, by a factor of %s the power factor would"
                + " be %.2f",
            LikelyRatio.text(Math.max(ratio, 1 / ratio)),
            seen / ratio);
  }
}
