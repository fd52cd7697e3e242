package fourthwire.intake.reading.heading;

import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.ReadingMapping.Statistic;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Reads the heading of a column of an interval log. */
final class LogHeading {
  private static final Pattern ORDER =
      Pattern.compile("(?:h|harm|harmonic|order)0?(\\d{1,2})|(\\d{1,2})(?:st|nd|rd|th|h)");
  private static final Pattern NUMBER = Pattern.compile("0?(\\d{1,2})");

  private final Words words;
  private final Optional<Unit.Kind> unit;

  LogHeading(Words words) {
    this.words = words;
    this.unit = words.unit().map(Unit::kind);
  }

  Heading read() {
    Optional<String> measure = measure();
    if (measure.isEmpty()) {
      return Heading.none();
    }
    if (measure.get().equals("frequency_hz")) {
      return settled("frequency_hz", true);
    }
    if (measure.get().startsWith("?")) {
      return Heading.unclear(measure.get().substring(1));
    }
    Optional<String> place = place(measure.get());
    if (place.isEmpty()) {
      return Heading.unclear("which conductor this is (L1, L2, L3, N), or total");
    }
    String quantity = ordered(place.get(), measure.get()) + "." + measure.get();
    return MeasuredQuantity.ofLog(quantity).isPresent()
        ? settled(quantity, unitNamed(measure.get()))
        : Heading.none();
  }

  /** Powers of no named line are the total; a line-to-line rms has no direction. */
  private Optional<String> place(String measure) {
    Optional<String> named = Place.of(words);
    boolean power = measure.matches("active_w|reactive_var|apparent_va|.*_factor|energy_wh");
    return named.or(() -> power ? Optional.of(Place.TOTAL) : Optional.empty());
  }

  private static String ordered(String place, String measure) {
    boolean pairBackwards = place.matches("L2-L1|L3-L2|L1-L3");
    return pairBackwards && !measure.endsWith("_deg")
        ? place.substring(3) + "-" + place.substring(0, 2)
        : place;
  }

  private boolean unitNamed(String measure) {
    return unit.isPresent() || measure.endsWith("_factor");
  }

  private Heading settled(String quantity, boolean unitNamed) {
    return new Heading(
        unitNamed ? Heading.Meaning.CLEAR : Heading.Meaning.LIKELY,
        quantity,
        statistic(),
        words.unit().map(Unit::factor).orElse(1.0),
        "");
  }

  private Statistic statistic() {
    if (words.has("min", "minimum", "lowest")) {
      return Statistic.MIN;
    }
    if (words.has("max", "maximum", "peak", "highest")) {
      return Statistic.MAX;
    }
    return words.has("inst", "instantaneous") ? Statistic.INSTANT : Statistic.MEAN;
  }

  /** The measure; starting with ? what is unclear about it. */
  private Optional<String> measure() {
    if (words.has(
        w -> w.contains("unbalance") || w.contains("imbalance") || w.matches("flicker|p[sl]t"))) {
      return Optional.empty();
    }
    Optional<String> order = order();
    if (order.isPresent()) {
      return harmonic(order.get());
    }
    if (words.has(w -> w.contains("thd")) || words.together().contains("distortion")) {
      return distortion();
    }
    return factor().or(this::byUnit).or(this::byWords);
  }

  private Optional<String> order() {
    Optional<Matcher> order = words.first(ORDER);
    if (order.isPresent()) {
      Matcher m = order.get();
      return Optional.of(m.group(1) != null ? m.group(1) : m.group(2));
    }
    int at = words.all().indexOf("harmonic");
    at = at < 0 ? words.all().indexOf("order") : at;
    if (at >= 0 && at + 1 < words.all().size()) {
      Matcher m = NUMBER.matcher(words.all().get(at + 1));
      return m.matches() ? Optional.of(m.group(1)) : Optional.empty();
    }
    return Optional.empty();
  }

  private Optional<String> harmonic(String order) {
    boolean current = unit.filter(k -> k == Unit.Kind.CURRENT).isPresent() || current();
    boolean voltage = unit.filter(k -> k == Unit.Kind.VOLTAGE).isPresent() || voltage();
    if (current == voltage) {
      return Optional.of("?whether this harmonic is of current or voltage");
    }
    String start = (current ? "current_h" : "voltage_h") + Integer.parseInt(order);
    if (unit.isEmpty()) {
      return Optional.of(
          "?the unit of this harmonic: "
              + (current ? "A" : "V")
              + " or percent of the fundamental");
    }
    return switch (unit.get()) {
      case CURRENT -> Optional.of(start + "_a");
      case VOLTAGE -> Optional.of(start + "_v");
      case SHARE -> Optional.of(start + "_percent");
      case ANGLE -> Optional.of(start + "_deg");
      default -> Optional.empty();
    };
  }

  private Optional<String> distortion() {
    boolean current = current() || words.has(w -> w.matches("thdi.?|ithd.*|thdin"));
    boolean voltage = voltage() || words.has(w -> w.matches("thd[uv].{0,2}|[uv]thd.*"));
    if (unit.isPresent() && unit.get() != Unit.Kind.SHARE) {
      return Optional.empty();
    }
    return Optional.of(
        current == voltage
            ? "?whether this distortion is of current or voltage"
            : (current ? "current" : "voltage") + "_thd_percent");
  }

  private Optional<String> factor() {
    if (words.has(w -> w.matches("cos|cosphi|cosφ|φ|dpf.{0,2}")) || words.has("displacement")) {
      return Optional.of("displacement_factor");
    }
    boolean factor =
        words.has(w -> w.matches("pf.{0,3}|powerfactor"))
            || words.has("power") && words.has("factor");
    return factor ? Optional.of("power_factor") : Optional.empty();
  }

  private Optional<String> byUnit() {
    if (unit.isEmpty()) {
      return Optional.empty();
    }
    return switch (unit.get()) {
      case CURRENT -> Optional.of("rms_a");
      case VOLTAGE -> Optional.of("rms_v");
      case ACTIVE -> Optional.of("active_w");
      case REACTIVE -> Optional.of("reactive_var");
      case APPARENT -> Optional.of("apparent_va");
      case ENERGY -> Optional.of("energy_wh");
      case FREQUENCY -> Optional.of("frequency_hz");
      case SHARE, ANGLE -> Optional.empty();
    };
  }

  private Optional<String> byWords() {
    if (words.has(w -> w.matches("frequency|freq|f"))) {
      return Optional.of("frequency_hz");
    }
    if (words.has(w -> w.matches("energy")) || words.has("active") && words.has("import")) {
      return Optional.of("?the unit of this energy: Wh, kWh or MWh");
    }
    if (words.has("power") || words.has(w -> w.matches("[pqs](l?[123]|[abc]|tot|total|sum|t)?"))) {
      return Optional.of("?the unit of this power: W, kW, var, kvar, VA or kVA");
    }
    if (current()) {
      return Optional.of("rms_a");
    }
    return voltage() ? Optional.of("rms_v") : Optional.empty();
  }

  private boolean current() {
    return words.has(w -> w.matches("currents?|amps?|amperes?|i|irms.*|i(l?[1-4]|[abcrstn])"));
  }

  private boolean voltage() {
    return words.has(
        w -> w.matches("voltages?|volts?|[uv]|[uv]rms.*|[uv](l?[1-4]|[abcrstn]){1,2}"));
  }
}
