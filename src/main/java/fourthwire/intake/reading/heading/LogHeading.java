package fourthwire.intake.reading.heading;

import fourthwire.intake.reading.heading.Vocabulary.Sense;
import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.ReadingMapping.Statistic;
import java.util.Optional;
import java.util.Set;

/** Reads the heading of a column of an interval log. */
final class LogHeading {
  private static final int HIGHEST_ORDER = 50;
  private static final Set<String> SUMMED =
      Set.of("active_w", "reactive_var", "apparent_va", "energy_wh");

  private static final Heading OF_RMS =
      Heading.leftOut("percent of the rms value, where the fundamental is asked for");
  private static final Heading PEAK = Heading.leftOut("peak values");

  private final LogWords words;
  private final LogPlace places;
  private final Optional<Unit.Kind> unit;

  LogHeading(LogWords words, LogPlace places) {
    this.words = words;
    this.places = places;
    this.unit = words.unit().map(Unit::kind);
  }

  Heading read() {
    Heading read = meaning();
    return words.hasOpenUnit() && read.meaning() != Heading.Meaning.NONE
        ? Heading.unclear("the factor: what its unit says beside A, V, W or % is not understood")
        : read;
  }

  private Heading meaning() {
    boolean peak = words.says(Sense.PEAK) && (voltage() || current());
    if (words.says(Sense.OTHER) || words.says(Sense.OF_RMS) || peak || words.saysNothing()) {
      return peak ? PEAK : words.says(Sense.OF_RMS) ? OF_RMS : Heading.none();
    }
    if (words.says(Sense.UNBALANCE)) {
      return unbalance();
    }
    if (words.order() > 0
        || words.says(Sense.HARMONIC)
        || words.says(Sense.INDIVIDUAL_DISTORTION)) {
      return harmonic(words.order());
    }
    if (words.says(Sense.DISTORTION)) {
      return distortion();
    }
    if (words.says(Sense.ENERGY) || is(Unit.Kind.ENERGY)) {
      return energy();
    }
    if (words.says(Sense.DISPLACEMENT)
        || words.says(Sense.POWER_FACTOR)
        || words.says(Sense.FACTOR)) {
      return factor();
    }
    if (words.says(Sense.ANGLE) || is(Unit.Kind.ANGLE) || is(Unit.Kind.SHARE)) {
      return Heading.none();
    }
    if (words.says(Sense.FREQUENCY) || is(Unit.Kind.FREQUENCY)) {
      return settled("frequency_hz", true);
    }
    return words.says(Sense.FUNDAMENTAL) ? fundamental() : plain();
  }

  private boolean is(Unit.Kind kind) {
    return unit.filter(k -> k == kind).isPresent();
  }

  private Heading share(String measure) {
    return words.saysRms()
        ? Heading.unclear(
            "whether this is percent of the fundamental, as is asked for, or of the rms value")
        : at(measure, unit.isPresent());
  }

  private boolean isOfRms() {
    return words.shareOf().equals(UnitText.OF_RMS);
  }

  private boolean current() {
    return words.says(Sense.CURRENT) || is(Unit.Kind.CURRENT);
  }

  private boolean voltage() {
    return words.says(Sense.VOLTAGE) || is(Unit.Kind.VOLTAGE);
  }

  private boolean power() {
    return words.says(Sense.POWER)
        || words.says(Sense.ACTIVE)
        || words.says(Sense.REACTIVE)
        || words.says(Sense.APPARENT);
  }

  private Heading unbalance() {
    boolean percent = unit.isEmpty() || is(Unit.Kind.SHARE);
    return percent && words.places().isEmpty() && current() != voltage()
        ? settled((current() ? "current" : "voltage") + "_unbalance_percent", unit.isPresent())
        : Heading.none();
  }

  private Heading harmonic(int order) {
    if (order < 1 || order > HIGHEST_ORDER || power()) {
      return Heading.none();
    }
    if (current() == voltage()) {
      return Heading.unclear("whether this harmonic is of current or voltage");
    }
    String start = (current() ? "current_h" : "voltage_h") + order;
    if (words.says(Sense.ANGLE) || is(Unit.Kind.ANGLE)) {
      return at(start + "_deg", unit.isPresent());
    }
    if (unit.isEmpty()) {
      return words.says(Sense.INDIVIDUAL_DISTORTION)
          ? at(start + "_percent", false)
          : open(
              start + (current() ? "_a" : "_v"),
              "the unit of this harmonic: "
                  + (current() ? "A" : "V")
                  + " or percent of the fundamental");
    }
    if (is(Unit.Kind.SHARE)) {
      return isOfRms() ? OF_RMS : share(start + "_percent");
    }
    boolean fits = is(current() ? Unit.Kind.CURRENT : Unit.Kind.VOLTAGE);
    return fits ? at(start + (current() ? "_a" : "_v"), true) : Heading.none();
  }

  private Heading fundamental() {
    return power() || current() == voltage()
        ? Heading.none()
        : at(current() ? "current_h1_a" : "voltage_h1_v", unit.isPresent());
  }

  private Heading distortion() {
    if (unit.isPresent() && !is(Unit.Kind.SHARE) || isOfRms()) {
      return isOfRms() ? OF_RMS : Heading.none();
    }
    if (words.says(Sense.CURRENT) == words.says(Sense.VOLTAGE)) {
      return Heading.unclear("whether this distortion is of current or voltage");
    }
    return share((words.says(Sense.CURRENT) ? "current" : "voltage") + "_thd_percent");
  }

  private Heading energy() {
    if (words.says(Sense.REACTIVE) || words.says(Sense.APPARENT) || words.says(Sense.EXPORTED)) {
      return Heading.none();
    }
    if (unit.isPresent() && !is(Unit.Kind.ENERGY)) {
      return Heading.none();
    }
    return unit.isPresent()
        ? at("energy_wh", true)
        : open("energy_wh", "the unit of this energy: Wh, kWh or MWh");
  }

  private Heading factor() {
    if (!words.says(Sense.POWER_FACTOR)
        && !words.says(Sense.DISPLACEMENT)
        && !words.says(Sense.POWER)) {
      return Heading.none();
    }
    boolean angle = words.says(Sense.ANGLE) || is(Unit.Kind.ANGLE);
    boolean ofFundamental = words.says(Sense.DISPLACEMENT) || words.says(Sense.FUNDAMENTAL);
    return angle
        ? Heading.none()
        : at(ofFundamental ? "displacement_factor" : "power_factor", true);
  }

  /** Volts, amps and powers; what words and unit say must agree. */
  private Heading plain() {
    if (voltage() && current() || power() && (voltage() || current())) {
      return Heading.unclear("which quantity this is: its name and its unit disagree");
    }
    if (words.saysSecondary() && (current() || voltage())) {
      return Heading.unclear(
          "whether its values are those behind the instrument transformer: map it with the ratio"
              + " as factor, or 1");
    }
    if (current()) {
      return at("rms_a", unit.isPresent());
    }
    if (voltage()) {
      return at("rms_v", unit.isPresent());
    }
    if (words.says(Sense.EXPORTED)) {
      return Heading.unclear(
          "whether this is power drawn, with a sign: named as sent out, it counts as negative");
    }
    Optional<String> named = named();
    Optional<String> measured = unit.flatMap(LogHeading::powerOf);
    if (named.isPresent() && measured.isPresent() && !named.equals(measured)) {
      return Heading.unclear("which power this is: its name and its unit disagree");
    }
    if (measured.isPresent()) {
      return at(measured.get(), true);
    }
    if (named.isPresent()) {
      return open(named.get(), "the unit of this power: W, kW, var, kvar, VA or kVA");
    }
    return words.says(Sense.POWER)
        ? Heading.unclear("the unit of this power: W, kW, var, kvar, VA or kVA")
        : Heading.none();
  }

  private Optional<String> named() {
    if (words.says(Sense.REACTIVE)) {
      return Optional.of("reactive_var");
    }
    if (words.says(Sense.APPARENT)) {
      return Optional.of("apparent_va");
    }
    return words.says(Sense.ACTIVE) ? Optional.of("active_w") : Optional.empty();
  }

  private static Optional<String> powerOf(Unit.Kind kind) {
    return switch (kind) {
      case ACTIVE -> Optional.of("active_w");
      case REACTIVE -> Optional.of("reactive_var");
      case APPARENT -> Optional.of("apparent_va");
      default -> Optional.empty();
    };
  }

  private Heading open(String measure, String question) {
    Heading found = at(measure, false);
    return found.quantity().isEmpty()
        ? found
        : new Heading(Heading.Meaning.UNIT_OPEN, found.quantity(), found.statistic(), 1, question);
  }

  /** At the place it names; powers and energies of no named line are the total. */
  private Heading at(String measure, boolean unitNamed) {
    boolean summed = SUMMED.contains(measure) || measure.endsWith("_factor");
    Optional<String> named = places.of(words.places());
    if (words.says(Sense.NEUTRAL)) {
      named = named.filter(p -> !p.equals(LogPlace.TOTAL)).or(() -> Optional.of("N"));
    }
    boolean placeless = words.places().isEmpty();
    if (named.isEmpty() && (summed && placeless || words.says(Sense.TOTAL))) {
      named = Optional.of(LogPlace.TOTAL);
    }
    if (named.isEmpty()) {
      return Heading.placeless(measure, "which conductor this is (L1, L2, L3, N), or total");
    }
    String quantity = named.get() + "." + measure;
    return MeasuredQuantity.ofLog(quantity).isPresent()
        ? settled(quantity, unitNamed)
        : Heading.none();
  }

  private Heading settled(String quantity, boolean unitNamed) {
    boolean ratio = quantity.endsWith("_factor");
    double factor = words.factor();
    return new Heading(
        unitNamed ? Heading.Meaning.CLEAR : Heading.Meaning.LIKELY,
        quantity,
        statistic(),
        ratio && is(Unit.Kind.SHARE) ? 0.01 : factor,
        "");
  }

  private Statistic statistic() {
    if (words.says(Sense.MIN)) {
      return Statistic.MIN;
    }
    if (words.says(Sense.MAX) || words.says(Sense.PEAK)) {
      return Statistic.MAX;
    }
    return words.says(Sense.INSTANT) ? Statistic.INSTANT : Statistic.MEAN;
  }
}
