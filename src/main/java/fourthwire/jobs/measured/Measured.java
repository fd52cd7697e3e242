package fourthwire.jobs.measured;

import fourthwire.audit.DesignState.LineCurrent;
import fourthwire.audit.DesignState.LineVoltage;
import fourthwire.audit.DesignState.NeutralCurrent;
import fourthwire.audit.MeasuredState.Span;
import fourthwire.metering.Period;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.site.Survey;
import java.time.LocalDateTime;
import java.time.ZoneId;
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

  /** A period in the site's time, in UTC where the site has none. */
  static Optional<Span> span(Optional<Period> period, Survey survey) {
    ZoneId zone = SiteZone.of(survey);
    return period.map(
        p ->
            new Span(
                p.from().atZone(zone).toOffsetDateTime(), p.to().atZone(zone).toOffsetDateTime()));
  }

  /** A moment by the site's clock. */
  static Optional<Span> span(Optional<LocalDateTime> moment, ZoneId zone) {
    return moment.map(m -> m.atZone(zone).toOffsetDateTime()).map(m -> new Span(m, m));
  }

  /** The line conductors. */
  static java.util.List<Conductor> lineConductors() {
    return java.util.List.of(Conductor.L1, Conductor.L2, Conductor.L3);
  }
}
