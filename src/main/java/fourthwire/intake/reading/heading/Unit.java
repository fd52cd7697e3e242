package fourthwire.intake.reading.heading;

import java.util.HashMap;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/** Units that columns come in, with the factor to the base unit of their kind. */
enum Unit {
  AMPERE(Kind.CURRENT, 1, "a", "amp", "amps", "ampere", "amperes", "arms", "aac", "aeff"),
  MILLIAMPERE(Kind.CURRENT, 1e-3, "ma"),
  KILOAMPERE(Kind.CURRENT, 1e3, "ka", "kiloampere", "kiloamperes", "kiloamp", "kiloamps"),
  VOLT(Kind.VOLTAGE, 1, "v", "volt", "volts", "vrms", "vac", "veff"),
  MILLIVOLT(Kind.VOLTAGE, 1e-3, "mv"),
  KILOVOLT(Kind.VOLTAGE, 1e3, "kv", "kilovolt", "kilovolts"),
  WATT(Kind.ACTIVE, 1, "w", "watt", "watts"),
  KILOWATT(Kind.ACTIVE, 1e3, "kw", "kilowatt", "kilowatts"),
  MEGAWATT(Kind.ACTIVE, 1e6, "mw", "megawatt", "megawatts"),
  VAR(Kind.REACTIVE, 1, "var", "vars"),
  KILOVAR(Kind.REACTIVE, 1e3, "kvar", "kvars", "kilovar", "kilovars"),
  MEGAVAR(Kind.REACTIVE, 1e6, "mvar"),
  VOLTAMPERE(Kind.APPARENT, 1, "va", "voltampere", "voltamperes"),
  KILOVOLTAMPERE(Kind.APPARENT, 1e3, "kva", "kilovoltampere", "kilovoltamperes"),
  MEGAVOLTAMPERE(Kind.APPARENT, 1e6, "mva"),
  WATTHOUR(Kind.ENERGY, 1, "wh"),
  KILOWATTHOUR(Kind.ENERGY, 1e3, "kwh", "kilowatthour", "kilowatthours"),
  MEGAWATTHOUR(Kind.ENERGY, 1e6, "mwh"),
  PERCENT(Kind.SHARE, 1, "%", "pct", "percent"),
  DEGREE(Kind.ANGLE, 1, "°", "deg", "degree", "degrees"),
  HERTZ(Kind.FREQUENCY, 1, "hz", "hertz");

  /** What a unit measures. */
  enum Kind {
    CURRENT,
    VOLTAGE,
    ACTIVE,
    REACTIVE,
    APPARENT,
    ENERGY,
    SHARE,
    ANGLE,
    FREQUENCY
  }

  private static final Map<String, Unit> BY_WORD = new HashMap<>();

  static {
    for (Unit unit : values()) {
      for (String word : unit.words) {
        BY_WORD.put(word, unit);
      }
    }
  }

  private final Kind kind;
  private final double factor;
  private final String[] words;

  Unit(Kind kind, double factor, String... words) {
    this.kind = kind;
    this.factor = factor;
    this.words = words;
  }

  Kind kind() {
    return kind;
  }

  double factor() {
    return factor;
  }

  /** The unit of this name; mW and mVA of a building are none, only MW and MVA. */
  static Optional<Unit> find(String text) {
    String name = text.trim();
    return Optional.ofNullable(BY_WORD.get(name.toLowerCase(Locale.ROOT)))
        .filter(u -> u.factor != 1e6 || name.startsWith("M") || name.startsWith("mega"));
  }
}
