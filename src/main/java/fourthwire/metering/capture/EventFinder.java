package fourthwire.metering.capture;

import fourthwire.metering.VoltageEvents;
import fourthwire.metering.VoltageEvents.Event;
import fourthwire.metering.VoltageEvents.Kind;
import fourthwire.metering.capture.window.PhaseTrack;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Dips, swells and interruptions of all voltages together (IEC 61000-4-30:2015, 5.4 and 5.5, from
 * memory): a dip or swell begins as soon as one voltage passes the threshold and ends when all are
 * back by the hysteresis; an interruption begins when all are below and ends when one is back.
 */
final class EventFinder {
  private static final double HYSTERESIS = 0.02;

  /** A reference further from what the record mostly shows is of another voltage level. */
  private static final double FITS_WITHIN = 0.2;

  private final Map<String, HalfCycles> halves = new LinkedHashMap<>();
  private final double referenceV;
  private final String basis;
  private final double rateHz;
  private final int count;

  private EventFinder(
      Map<String, HalfCycles> halves, OptionalDouble nominalV, boolean pairs, double rateHz) {
    this.halves.putAll(halves);
    this.rateHz = rateHz;
    this.count = halves.values().stream().mapToInt(HalfCycles::count).min().orElse(0);
    double usual = halves.values().stream().mapToDouble(HalfCycles::median).max().orElse(0);
    double nominal = nominalV.orElse(0) * (pairs ? Math.sqrt(3) : 1);
    boolean fits = Math.abs(usual / nominal - 1) < FITS_WITHIN;
    this.referenceV = fits ? nominal : usual;
    this.basis = basis(fits, nominal > 0);
  }

  /**
   * Events of a capture.
   *
   * @param nominalV the site's line-to-neutral voltage at the meter, where it is known
   */
  static VoltageEvents of(Capture capture, Optional<PhaseTrack> track, OptionalDouble nominalV) {
    List<Capture.Channel> voltages = voltages(capture);
    if (voltages.isEmpty()) {
      return none("No events were looked for: no line's voltage was recorded.");
    }
    if (track.isEmpty()) {
      return none("No events were looked for: the sampling is uneven or has gaps.");
    }
    List<HalfCycles> found =
        voltages.parallelStream().map(c -> HalfCycles.of(capture.of(c), track.get())).toList();
    Map<String, HalfCycles> halves = new LinkedHashMap<>();
    for (int c = 0; c < found.size(); c++) {
      String quantity = voltages.get(c).quantity();
      halves.put(quantity.substring(0, quantity.length() - 2), found.get(c));
    }
    boolean pairs = voltages.get(0).quantity().contains("-");
    double rate = capture.time().rateHz().orElseThrow();
    return new EventFinder(halves, nominalV, pairs, rate).find();
  }

  private static VoltageEvents none(String why) {
    return new VoltageEvents(why, Map.of(), Map.of(), List.of());
  }

  /** Line to neutral where there are any, else line to line; what does not move is no voltage. */
  private static List<Capture.Channel> voltages(Capture capture) {
    List<Capture.Channel> all =
        capture.channels().stream()
            .filter(c -> c.quantity().startsWith("L") && c.quantity().endsWith(".v"))
            .filter(c -> !capture.of(c).extremes().isFlat())
            .toList();
    List<Capture.Channel> lines = all.stream().filter(c -> !c.quantity().contains("-")).toList();
    return lines.isEmpty() ? all : lines;
  }

  private String basis(boolean nominal, boolean given) {
    return String.format(
        Locale.ROOT,
        "Thresholds: dip below 90 %%, swell above 110 %%, interruption below 10 %% on all lines,"
            + " hysteresis 2 %%, of %.1f V, %s.",
        referenceV,
        nominal
            ? "the site's nominal voltage"
            : given
                ? "what the record mostly shows: the site's nominal voltage is another"
                : "what the record mostly shows");
  }

  private VoltageEvents find() {
    List<Event> events = new ArrayList<>();
    events.addAll(events(Kind.DIP, 0.9));
    events.addAll(events(Kind.SWELL, 1.1));
    events.addAll(events(Kind.INTERRUPTION, 0.1));
    events.sort(Comparator.comparingDouble(Event::fromS));
    Map<String, Double> lowest = new LinkedHashMap<>();
    Map<String, Double> highest = new LinkedHashMap<>();
    halves.forEach(
        (place, h) -> {
          if (h.count() > 0) {
            lowest.put(place, extreme(h, Kind.DIP, 0, h.count()));
            highest.put(place, extreme(h, Kind.SWELL, 0, h.count()));
          }
        });
    return new VoltageEvents(basis, lowest, highest, events);
  }

  private static double extreme(HalfCycles h, Kind kind, int from, int to) {
    double extreme = h.rms(from);
    for (int k = from + 1; k < to; k++) {
      extreme = kind == Kind.SWELL ? Math.max(extreme, h.rms(k)) : Math.min(extreme, h.rms(k));
    }
    return extreme;
  }

  private List<Event> events(Kind kind, double threshold) {
    List<Event> events = new ArrayList<>();
    int from = -1;
    for (int k = 0; k < count; k++) {
      if (from < 0 && begins(kind, k, threshold * referenceV)) {
        from = k;
      } else if (from >= 0 && ends(kind, k, threshold)) {
        events.add(event(kind, from, k));
        from = -1;
      }
    }
    if (from >= 0) {
      events.add(event(kind, from, count));
    }
    return events;
  }

  private boolean begins(Kind kind, int k, double volts) {
    return switch (kind) {
      case DIP -> halves.values().stream().anyMatch(h -> h.rms(k) < volts);
      case SWELL -> halves.values().stream().anyMatch(h -> h.rms(k) > volts);
      case INTERRUPTION -> halves.values().stream().allMatch(h -> h.rms(k) < volts);
    };
  }

  private boolean ends(Kind kind, int k, double threshold) {
    double back = (kind == Kind.SWELL ? threshold - HYSTERESIS : threshold + HYSTERESIS);
    double volts = back * referenceV;
    return switch (kind) {
      case DIP -> halves.values().stream().allMatch(h -> h.rms(k) >= volts);
      case SWELL -> halves.values().stream().allMatch(h -> h.rms(k) <= volts);
      case INTERRUPTION -> halves.values().stream().anyMatch(h -> h.rms(k) >= volts);
    };
  }

  private Event event(Kind kind, int from, int to) {
    String place = "";
    double furthest = kind == Kind.SWELL ? 0 : Double.POSITIVE_INFINITY;
    for (Map.Entry<String, HalfCycles> e : halves.entrySet()) {
      double extreme = extreme(e.getValue(), kind, from, to);
      if (kind == Kind.SWELL ? extreme > furthest : extreme < furthest) {
        furthest = extreme;
        place = e.getKey();
      }
    }
    HalfCycles clock = halves.values().iterator().next();
    double begins = clock.endPosition(from) / rateHz;
    double ends = clock.endPosition(Math.min(to, count - 1)) / rateHz;
    return new Event(
        kind,
        begins,
        ends - begins,
        from > 0 && to < count,
        place,
        furthest,
        100 * furthest / referenceV);
  }
}
