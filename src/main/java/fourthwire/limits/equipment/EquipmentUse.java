package fourthwire.limits.equipment;

import java.util.List;
import java.util.Locale;
import java.util.function.Predicate;

/** What equipment is for, as far as IEC 61000-3-2:2018, clause 5, asks. */
public enum EquipmentUse {
  /** Lighting: class C. */
  LIGHTING("lighting"),
  /** Personal computers and their monitors, television receivers: class D to 600 W. */
  COMPUTER("computer"),
  /** Refrigerators and freezers with a variable-speed drive: class D to 600 W. */
  COOLING("cooling"),
  /** Portable tools and arc welders that are not for professionals: class B. */
  PORTABLE_TOOL("portable-tool"),
  /** Dimmers of incandescent lamps: class A, free up to a power. */
  DIMMER("dimmer"),
  /** Heating elements under symmetrical control: class A, free up to a power. */
  HEATING_CONTROL("heating-control"),
  /** Equipment for trades and industries, not sold to the public: class A, free above a power. */
  PROFESSIONAL("professional"),
  /** Everything else: class A. */
  OTHER("other");

  private final String word;

  EquipmentUse(String word) {
    this.word = word;
  }

  /** Our own short word for it. */
  public String word() {
    return word;
  }

  /**
   * What a plain name says of the use: "LED lamp 5 to 25 W" is lighting. Everything that names
   * nothing of the kind is {@link #OTHER}; no name makes equipment professional.
   *
   * @param name a preset's or a load kind's name, in any case
   */
  public static EquipmentUse named(String name) {
    List<String> words = List.of(name.toLowerCase(Locale.ROOT).split("[^a-z]+"));
    Predicate<String> any = w -> words.stream().anyMatch(word -> word.startsWith(w));
    if (any.test("dimm")) {
      return DIMMER;
    }
    if (words.contains("led")
        || any.test("lamp")
        || any.test("light")
        || any.test("luminaire")
        || any.test("ballast")
        || any.test("fluorescent")) {
      return LIGHTING;
    }
    if (any.test("computer")
        || any.test("monitor")
        || any.test("television")
        || any.test("laptop")) {
      return COMPUTER;
    }
    if ((any.test("fridge") || any.test("refrigerator") || any.test("freezer"))
        && (any.test("inverter") || any.test("variable"))) {
      return COOLING;
    }
    return any.test("welder") || any.test("portable") ? PORTABLE_TOOL : OTHER;
  }
}
