package fourthwire.load;

import java.util.Locale;

/** What a preset can say of its equipment, by the column of {@code presets.csv}. */
public enum PresetParameter {
  /** Smoothing capacitor for each watt of the direct-current side. */
  CAPACITANCE_UF_PER_W("capacitor", "µF/W"),
  /** The unit's own lead, inrush limiter and filter, in percent of V²/P. */
  SOURCE_RESISTANCE_PERCENT("own resistance", "% of V²/P"),
  /** Choke in the lines, reactance at the fundamental in percent of V²/P. */
  LINE_CHOKE_PERCENT("line choke", "%"),
  /** Choke behind the bridge, likewise. */
  DC_CHOKE_PERCENT("DC choke", "%"),
  /** Firing angle after the voltage's zero crossing. */
  FIRING_DEGREES("firing angle", "degrees"),
  /** Input filter capacitor for each watt of rated power. */
  INPUT_FILTER_NF_PER_W("input filter", "nF/W"),
  /** Dead angle on each side of the crossing at rated power. */
  DEAD_ANGLE_DEGREES("dead angle", "degrees"),
  /** What distortion the control or the iron leaves, in percent of the fundamental. */
  RESIDUAL_PERCENT("residual", "%"),
  /** Cosine of the fundamental's angle, lagging positive. */
  DISPLACEMENT_FACTOR("displacement factor", ""),
  /** Locked-rotor reactance in percent of V²/S. */
  LOCKED_ROTOR_REACTANCE_PERCENT("locked-rotor reactance", "%");

  private final String words;
  private final String unit;

  PresetParameter(String words, String unit) {
    this.words = words;
    this.unit = unit;
  }

  /** In the trade's words, for pages. */
  public String words() {
    return words;
  }

  /** Its unit, empty for a ratio. */
  public String unit() {
    return unit;
  }

  /** Its column in the table of presets. */
  String column() {
    return name().toLowerCase(Locale.ROOT);
  }
}
