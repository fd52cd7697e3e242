package fourthwire.audit.measured;

import fourthwire.limits.FindingCode;
import fourthwire.limits.distortion.CurrentDistortion519;
import fourthwire.limits.distortion.Edition519;
import fourthwire.limits.distortion.MeasuredBand;
import fourthwire.limits.distortion.MeasuredBand.Values;
import fourthwire.limits.distortion.MeasuredBands;
import fourthwire.limits.distortion.VoltageDistortion;
import fourthwire.metering.assess.PeriodFigures;
import fourthwire.metering.assess.PeriodFigures.Outcome;
import fourthwire.metering.assess.PeriodFigures.Span;
import fourthwire.metering.series.Series;
import fourthwire.site.Practice;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.TreeMap;

/**
 * Holds a log against the limits of measured values: voltage distortion, rms and unbalance, and
 * where the node's demand and short-circuit currents are known the current's distortion. A period
 * is within or over its limit only where the values that are missing could not turn it.
 */
public final class LogVerdicts {
  private static final int PLANT_CLASS = 2;

  private final Request request;
  private final LogColumnsHeld columns;
  private final Map<String, Found> found = new LinkedHashMap<>();

  private LogVerdicts(Request request) {
    this.request = request;
    this.columns = new LogColumnsHeld(request.log());
  }

  /**
   * What is asked.
   *
   * @param log as read, or as corrected
   * @param interval length of a row
   * @param nominalLineV of the node, between lines
   * @param nominalPhaseV to the neutral
   * @param nominalHz of the supply
   * @param demandA I_L, where it is known
   * @param shortCircuitA at the node, where it is known
   */
  public record Request(
      Series log,
      Duration interval,
      double nominalLineV,
      double nominalPhaseV,
      double nominalHz,
      Practice practice,
      OptionalDouble demandA,
      OptionalDouble shortCircuitA) {}

  /** A limit that a quantity is held against, period by period the worst of its places. */
  private record Found(
      String code, MeasuredBand band, String unit, Map<Instant, LogVerdict.Period> periods) {}

  /** The verdicts; none where the log's rows make none of the values that are counted. */
  public static List<LogVerdict> of(Request request) {
    LogVerdicts all = new LogVerdicts(request);
    all.voltages();
    all.columns
        .find("frequency_hz")
        .ifPresent(
            column ->
                all.hold(
                    LogVerdict.FREQUENCY,
                    "",
                    0,
                    MeasuredBands.frequency(request.nominalHz()),
                    column));
    all.currents();
    return all.found.values().stream()
        .map(f -> new LogVerdict(f.code(), f.band(), f.unit(), List.copyOf(f.periods().values())))
        .toList();
  }

  private void voltages() {
    VoltageDistortion ieee =
        VoltageDistortion.ieee519(Edition519.IEEE_519_2022, request.nominalLineV());
    List<VoltageDistortion> weekly = new ArrayList<>();
    weekly.add(VoltageDistortion.en50160(request.nominalLineV()));
    if (request.practice() == Practice.IEC) {
      weekly.add(VoltageDistortion.iec61000x2x4(PLANT_CLASS));
    }
    columns
        .voltageDistortions()
        .forEach(
            (place, column) -> {
              List<MeasuredBand> bands =
                  new ArrayList<>(MeasuredBands.voltage519(ieee.thdLimitPercent(), ieee.basis()));
              weekly.forEach(
                  d -> bands.addAll(MeasuredBands.weekly95(d.thdLimitPercent(), d.basis())));
              hold(FindingCode.VOLTAGE_THD.word(), place, 0, bands, column);
            });
    columns.voltageOrders(
        (place, order, column) -> voltageOrder(ieee, weekly, place, order, column));
    rms();
  }

  private void voltageOrder(
      VoltageDistortion ieee,
      List<VoltageDistortion> weekly,
      String place,
      int order,
      PeriodFigures.Column column) {
    List<MeasuredBand> bands = new ArrayList<>();
    ieee.orderLimitPercent(order)
        .ifPresent(limit -> bands.addAll(MeasuredBands.voltage519(limit, ieee.basis())));
    weekly.forEach(
        d ->
            d.orderLimitPercent(order)
                .ifPresent(limit -> bands.addAll(MeasuredBands.weekly95(limit, d.basis()))));
    hold(FindingCode.VOLTAGE_ORDER.word(), place, order, bands, column);
  }

  private void rms() {
    columns
        .voltages()
        .forEach(
            (place, column) -> {
              double nominal =
                  place.contains("-") ? request.nominalLineV() : request.nominalPhaseV();
              List<MeasuredBand> bands = new ArrayList<>(MeasuredBands.supplyVoltage(nominal));
              if (request.practice() == Practice.IEC) {
                bands.addAll(MeasuredBands.plantVoltage(nominal));
              }
              hold(LogVerdict.RMS_VOLTAGE, place, 0, bands, column);
            });
    columns
        .find("voltage_unbalance_percent")
        .ifPresent(
            column ->
                hold(
                    FindingCode.VOLTAGE_UNBALANCE.word(),
                    "",
                    0,
                    MeasuredBands.unbalance(),
                    column));
  }

  private void currents() {
    if (request.demandA().isEmpty()
        || request.shortCircuitA().isEmpty()
        || !(request.demandA().getAsDouble() > 0)) {
      return;
    }
    double demandA = request.demandA().getAsDouble();
    CurrentDistortion519 limits =
        CurrentDistortion519.of(
            Edition519.IEEE_519_2022,
            request.nominalLineV(),
            request.shortCircuitA().getAsDouble(),
            demandA);
    columns.currentOrders(
        demandA,
        (place, order, column) ->
            hold(
                FindingCode.CURRENT_ORDER.word(),
                place,
                order,
                MeasuredBands.current519(limits.orderLimitPercent(order), limits.basis()),
                column));
    columns
        .demandDistortions(demandA)
        .forEach(
            (place, column) ->
                hold(
                    FindingCode.CURRENT_TDD.word(),
                    place,
                    0,
                    MeasuredBands.current519(limits.tddLimitPercent(), limits.basis()),
                    column));
  }

  private void hold(
      String code, String place, int order, List<MeasuredBand> bands, PeriodFigures.Column column) {
    if (bands.isEmpty()) {
      return;
    }
    Map<Values, List<PeriodFigures>> formed = new EnumMap<>(Values.class);
    for (MeasuredBand band : bands) {
      for (PeriodFigures f :
          formed.computeIfAbsent(band.values(), values -> figures(column, span(values)))) {
        note(code, band, period(band, place, order, f));
      }
    }
  }

  private static Span span(Values values) {
    return switch (values) {
      case OF_A_DAY -> Span.DAY;
      case OF_A_WEEK -> Span.WEEK;
      case OF_A_YEAR -> Span.YEAR;
    };
  }

  private List<PeriodFigures> figures(PeriodFigures.Column column, Span span) {
    return PeriodFigures.of(request.log(), column, request.interval(), span);
  }

  private static LogVerdict.Period period(
      MeasuredBand band, String place, int order, PeriodFigures f) {
    Outcome outcome = f.judge(band.low(), band.high(), band.percent());
    boolean both = band.isTwoSided();
    double outside = f.there() == 0 ? 0 : 100.0 * f.outside(band.low(), band.high()) / f.there();
    return new LogVerdict.Period(
        f.from(),
        place,
        order,
        both ? outside : f.there() == 0 ? 0 : f.percentile(band.percent()),
        both ? 100 - band.percent() : band.high(),
        f.sharePercent(),
        outcome);
  }

  /**
   * Bands of one document, percentile and quantity are one limit; their orders differ in height.
   */
  private void note(String code, MeasuredBand band, LogVerdict.Period period) {
    boolean pair = band.isTwoSided() && period.place().contains("-");
    String key = code + band.values() + band.percent() + band.basis() + pair;
    Found into =
        found.computeIfAbsent(
            key,
            k -> new Found(code, band, band.isTwoSided() ? "% of values" : "%", new TreeMap<>()));
    into.periods().merge(period.from(), period, LogVerdicts::worse);
  }

  private static LogVerdict.Period worse(LogVerdict.Period a, LogVerdict.Period b) {
    if (a.outcome() != b.outcome()) {
      return rank(a.outcome()) > rank(b.outcome()) ? a : b;
    }
    return a.ofLimit() >= b.ofLimit() ? a : b;
  }

  /** A period is over where one place is, and within only where all are. */
  private static int rank(Outcome outcome) {
    return switch (outcome) {
      case OVER -> 2;
      case OPEN -> 1;
      case WITHIN -> 0;
    };
  }
}
