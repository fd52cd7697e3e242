package fourthwire.web;

import fourthwire.audit.BankStep;
import fourthwire.audit.DesignState;
import fourthwire.audit.HeadlineFigure;
import fourthwire.audit.HourSeries;
import fourthwire.audit.ImpedanceCurve;
import fourthwire.audit.NodeDoubt;
import fourthwire.audit.NodeDoubt.ClampPoint;
import fourthwire.audit.NodeDoubt.InputShare;
import fourthwire.audit.NodeDoubt.Range;
import fourthwire.audit.WeekState;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;

/** Invented states beside the invented design states of {@link SampleSite}. */
final class SampleStates {
  private static final int SATURDAY = 5;

  private SampleStates() {}

  /** An office's week: busy on weekdays from eight to six. */
  static WeekState week() {
    Map<HeadlineFigure, HourSeries> series = new EnumMap<>(HeadlineFigure.class);
    series.put(HeadlineFigure.NEUTRAL_RMS, hours(12, 106));
    series.put(HeadlineFigure.NEUTRAL_LOADING, hours(12, 105));
    series.put(HeadlineFigure.L3_RMS, hours(9, 71));
    series.put(HeadlineFigure.ACTIVE, hours(3000, 26000));
    return new WeekState(
        5,
        "Each load at its schedule's share of its demand; 5 different hours solved.",
        Map.of("neutral-ampacity", 38, "line-ampacity", 0),
        series,
        new WeekState.Energy(1710, 22.4, 9.1, 0, 0, Figure.of(0.24), "EUR"));
  }

  private static HourSeries hours(double idle, double busy) {
    double[] byHour = new double[HourSeries.HOURS];
    Arrays.setAll(
        byHour,
        h -> {
          int hour = h % HourSeries.HOURS_A_DAY;
          boolean open = h / HourSeries.HOURS_A_DAY < SATURDAY && hour >= 8 && hour < 18;
          boolean lunch = hour == 12 || hour == 17;
          return open ? (lunch ? 0.7 * busy : busy) : idle;
        });
    return HourSeries.of(byHour);
  }

  /** Ranges about the design state's figures. */
  static NodeDoubt doubt(DesignState design) {
    Map<HeadlineFigure, Range> ranges = new EnumMap<>(HeadlineFigure.class);
    put(ranges, HeadlineFigure.NEUTRAL_RMS, design.neutral().rmsA());
    put(ranges, HeadlineFigure.L1_RMS, design.lines().get(Conductor.L1).rmsA());
    put(ranges, HeadlineFigure.L3_RMS, design.lines().get(Conductor.L3).rmsA());
    put(ranges, HeadlineFigure.ACTIVE, design.power().activeW());
    return new NodeDoubt(
        200,
        1,
        ranges,
        HeadlineFigure.NEUTRAL_RMS,
        List.of(
            new InputShare("Power of every capacitor-input load on the site", 0.46),
            new InputShare("Power of each capacitor-input load on LP-2 East offices", 0.31),
            new InputShare("Own resistance of capacitor-input equipment", 0.12)),
        List.of(new ClampPoint("LP-2 East offices", 0.64), new ClampPoint("MSB", 0.41)));
  }

  private static void put(Map<HeadlineFigure, Range> into, HeadlineFigure figure, Figure about) {
    about.value().ifPresent(x -> into.put(figure, new Range(0.84 * x, 0.99 * x, 1.19 * x)));
  }

  /** A peak at the order 7. */
  static ImpedanceCurve curve() {
    double[] ohm = new double[ImpedanceCurve.POINTS];
    Arrays.setAll(
        ohm,
        k -> {
          double order = ImpedanceCurve.order(k);
          double near = 1 - order * order / 49;
          return 0.02 * order / Math.hypot(near, 0.06) / (1 + order / 100);
        });
    return ImpedanceCurve.of(ohm);
  }

  static List<BankStep> steps() {
    return List.of(
        new BankStep("PFC-1", 1, 2, 25, 9.9, 1.4), new BankStep("PFC-1", 2, 2, 50, 7, 2.3));
  }
}
