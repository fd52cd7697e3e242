package fourthwire.metering.capture;

import fourthwire.metering.CaptureWindows;
import fourthwire.metering.CaptureWindows.HarmonicGroups;
import fourthwire.metering.capture.window.Groups;
import fourthwire.metering.capture.window.Interval;
import fourthwire.metering.capture.window.WindowAnalysis;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.SymmetricalComponents;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.function.IntToDoubleFunction;
import java.util.stream.IntStream;

/** Takes from the windows what a reading keeps. */
final class WindowFigures {
  /** An hour of them. */
  private static final int MOST_SHORTEST = 1200;

  private final WindowAnalysis windows;
  private final Extent extent;
  private final List<String> quantities;

  WindowFigures(WindowAnalysis windows, Extent extent, Capture capture) {
    this.windows = windows;
    this.extent = extent;
    this.quantities = capture.channels().stream().map(Capture.Channel::quantity).toList();
  }

  CaptureWindows of() {
    Map<String, HarmonicGroups> groups = new LinkedHashMap<>();
    quantities.forEach(q -> groups.put(q, groups(windows.groups(q))));
    return new CaptureWindows(
        windows.windows(),
        extent.standardCycles(),
        groups,
        kept(windows.intervals()).stream().map(this::interval).toList());
  }

  /** A record of hours has its 3 s intervals left out: ten minutes say enough of it. */
  private static List<Interval> kept(List<Interval> intervals) {
    long shortest = intervals.stream().filter(WindowFigures::isShortest).count();
    return shortest <= MOST_SHORTEST
        ? intervals
        : intervals.stream().filter(i -> !isShortest(i)).toList();
  }

  private static boolean isShortest(Interval i) {
    return i.length() == Interval.Length.VERY_SHORT;
  }

  private static HarmonicGroups groups(Groups g) {
    return new HarmonicGroups(
        list(1, g.orders(), g::group),
        list(1, g.orders(), g::subgroup),
        list(0, g.orders() - 1, g::interharmonicGroup),
        list(0, g.orders() - 1, g::interharmonicSubgroup));
  }

  private static List<Double> list(int from, int to, IntToDoubleFunction of) {
    return IntStream.rangeClosed(from, to).mapToObj(of::applyAsDouble).toList();
  }

  private CaptureWindows.Interval interval(Interval i) {
    Map<String, Double> rms = new LinkedHashMap<>();
    Map<String, Double> thd = new LinkedHashMap<>();
    for (int s = 0; s < quantities.size(); s++) {
      rms.put(quantities.get(s), i.rms(s));
      double fundamental = i.order(s, 1).magnitude();
      if (fundamental > 0) {
        thd.put(quantities.get(s), 100 * spectrum(i, s).distortionRms() / fundamental);
      }
    }
    return new CaptureWindows.Interval(
        word(i.length()), i.fromS(), i.toS(), i.frequencyHz(), rms, thd, unbalance(i));
  }

  private static Spectrum spectrum(Interval i, int signal) {
    return Spectrum.of(h -> i.order(signal, h));
  }

  private static String word(Interval.Length length) {
    return switch (length) {
      case VERY_SHORT -> "3s";
      case TEN_MINUTES -> "10min";
      case TWO_HOURS -> "2h";
    };
  }

  private OptionalDouble unbalance(Interval i) {
    List<Integer> lines = Channels.LINES.stream().map(l -> quantities.indexOf(l + ".v")).toList();
    return lines.contains(-1)
        ? OptionalDouble.empty()
        : SymmetricalComponents.of(lines.stream().map(s -> spectrum(i, s)).toList())
            .negativePercent()
            .value();
  }
}
