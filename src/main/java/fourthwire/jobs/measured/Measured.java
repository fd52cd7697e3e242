package fourthwire.jobs.measured;

import fourthwire.audit.DesignState.LineCurrent;
import fourthwire.audit.DesignState.LineVoltage;
import fourthwire.audit.DesignState.NeutralCurrent;
import fourthwire.metering.Period;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.site.Survey;
import java.time.DateTimeException;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.Collection;
import java.util.Optional;
import java.util.OptionalDouble;

/** Figures as an audit shows them, of what was measured; what was not says so. */
final class Measured {
  private static final Figure NOT_MEASURED = Figure.unknown("not measured");
  private static final Figure AGAINST_DEMAND =
      Figure.unknown("readings are not held against a demand current");
  private static final Figure AGAINST_AMPACITY =
      Figure.unknown("readings are not held against an ampacity");
  private static final DateTimeFormatter MINUTE = DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm");

  private Measured() {}

  static Figure figure(OptionalDouble value) {
    return value.isPresent() ? Figure.of(value.getAsDouble()) : NOT_MEASURED;
  }

  static Figure figure(Optional<Double> value) {
    return value.map(Figure::of).orElse(NOT_MEASURED);
  }

  static LineCurrent line(Figure rmsA, Figure fundamentalA, Figure thdPercent) {
    return new LineCurrent(
        rmsA, fundamentalA, thdPercent, AGAINST_DEMAND, AGAINST_AMPACITY, AGAINST_AMPACITY, "");
  }

  static LineVoltage voltage(Figure rmsV, Figure fundamentalV, Figure thdPercent) {
    return new LineVoltage(rmsV, fundamentalV, thdPercent, NOT_MEASURED);
  }

  static NeutralCurrent neutral(Figure rmsA, Figure percentOfMeanLine) {
    return new NeutralCurrent(rmsA, percentOfMeanLine, AGAINST_AMPACITY, AGAINST_AMPACITY, "");
  }

  /** The neutral against the mean of the lines that are known. */
  static NeutralCurrent neutral(Figure rmsA, Collection<LineCurrent> lines) {
    OptionalDouble mean = lines.stream().flatMapToDouble(l -> l.rmsA().value().stream()).average();
    return neutral(
        rmsA,
        mean.isPresent() && mean.getAsDouble() > 0
            ? rmsA.map(n -> 100 * n / mean.getAsDouble())
            : Figure.unknown("no line current was measured"));
  }

  /** Text of a period in the site's time, in UTC where the site has none. */
  static String text(Optional<Period> period, Survey survey) {
    ZoneId zone = zone(survey);
    return period
        .map(
            p ->
                MINUTE.format(p.from().atZone(zone))
                    + " to "
                    + MINUTE.format(p.to().atZone(zone))
                    + (zone.equals(ZoneOffset.UTC) ? " UTC" : ""))
        .orElse("no clock time in the file");
  }

  private static ZoneId zone(Survey survey) {
    try {
      return survey.settings().timezone().map(ZoneId::of).orElse(ZoneOffset.UTC);
    } catch (DateTimeException e) {
      return ZoneOffset.UTC;
    }
  }

  /** The line conductors. */
  static java.util.List<Conductor> lineConductors() {
    return java.util.List.of(Conductor.L1, Conductor.L2, Conductor.L3);
  }
}
