package fourthwire.limits;

/**
 * The checks of an audit by their short, stable words. A code names what is checked, not how it
 * came out: the severity says that.
 */
public enum FindingCode {
  /** One order of the line current against IEEE 519 (worst order named). */
  CURRENT_ORDER("current-order", "One order of the line current, percent of the demand current"),
  /** Total demand distortion against IEEE 519. */
  CURRENT_TDD("current-tdd", "Total demand distortion of the line current"),
  /** One order of the voltage against the table that leads (worst order named). */
  VOLTAGE_ORDER("voltage-order", "One order of the voltage, percent of the fundamental"),
  /** Total harmonic distortion of the voltage. */
  VOLTAGE_THD("voltage-thd", "Total harmonic distortion of the voltage"),
  /** Negative-sequence voltage. */
  VOLTAGE_UNBALANCE("voltage-unbalance", "Negative on positive sequence of the voltage"),
  /** Harmonic voltage factor of NEMA MG 1, for motors on the node. */
  MOTOR_VOLTAGE("motor-voltage", "Harmonic voltage factor at motors"),
  /** Neutral's rms against its ampacity after the harmonic factor. */
  NEUTRAL_AMPACITY("neutral-ampacity", "Neutral current against what the neutral carries"),
  /** A line's rms against its ampacity after the harmonic factor. */
  LINE_AMPACITY("line-ampacity", "Line current against what the line carries"),
  /** Multiples of three beyond the third, which the cable factors do not cover. */
  OTHER_TRIPLENS("other-triplens", "Orders 6, 9, 12, 15 … of the line current together"),
  /** Loading against the rating derated for harmonic loss. */
  TRANSFORMER_LOADING("transformer-loading", "Transformer load against its derated rating"),
  /** K-factor of the load against the K rating. */
  TRANSFORMER_K_RATING("transformer-k-rating", "K-factor of the load against the K rating"),
  /** Rms current of a capacitor bank. */
  CAPACITOR_CURRENT("capacitor-current", "Rms current of a capacitor bank"),
  /** Voltage across a capacitor bank. */
  CAPACITOR_VOLTAGE("capacitor-voltage", "Rms voltage across a capacitor bank"),
  /** Reactive power of a capacitor bank, all orders. */
  CAPACITOR_POWER("capacitor-power", "Reactive power of a capacitor bank, all orders"),
  /** Parallel resonance near an order that carries current. */
  RESONANCE("resonance", "Parallel resonance near an order that carries current"),
  /** Two circuits of the same line share one neutral: their currents add in it. */
  SHARED_NEUTRAL_SAME_LINE(
      "shared-neutral-same-line", "Circuits of the same line share one neutral"),
  /** Measured neutral current is not the sum of the measured line currents. */
  NEUTRAL_NOT_SUM("neutral-not-sum", "Measured neutral current is not the sum of the lines");

  private final String word;
  private final String meaning;

  FindingCode(String word, String meaning) {
    this.word = word;
    this.meaning = meaning;
  }

  /** The word used in the public interface and stored with results. */
  public String word() {
    return word;
  }

  /** What is checked, in a few words a page can show. */
  public String meaning() {
    return meaning;
  }
}
