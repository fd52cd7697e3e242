package fourthwire.audit;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * The figures that stand for a node in lists, in the week and under doubt. Each is known by its
 * public word; a node where one has no meaning lacks it.
 */
public enum HeadlineFigure {
  NEUTRAL_RMS("N.rms_a", "A"),
  NEUTRAL_LOADING("N.loading_percent", "%"),
  L1_RMS("L1.rms_a", "A"),
  L2_RMS("L2.rms_a", "A"),
  L3_RMS("L3.rms_a", "A"),
  CURRENT_THD("thd_percent", "%"),
  TDD("tdd_percent", "%"),
  VOLTAGE_THD("voltage_thd_percent", "%"),
  TRANSFORMER_LOADING("transformer_loading_percent", "%"),
  HARMONIC_LOSS_FACTOR("harmonic_loss_factor", ""),
  ACTIVE("active_w", "W"),
  POWER_FACTOR("power_factor", ""),
  LOSSES("losses_w", "W");

  /** The lines' currents, in the lines' order. */
  public static final List<HeadlineFigure> LINES = List.of(L1_RMS, L2_RMS, L3_RMS);

  private final String word;
  private final String unit;

  HeadlineFigure(String word, String unit) {
    this.word = word;
    this.unit = unit;
  }

  /** The word used in the public interface. */
  public String word() {
    return word;
  }

  /** As printed; empty for a plain number. */
  public String unit() {
    return unit;
  }

  /** By its public word. */
  public static Optional<HeadlineFigure> find(String word) {
    return Arrays.stream(values()).filter(f -> f.word.equals(word)).findFirst();
  }

  /** Whether it is told of single circuits too: currents, power and losses. */
  public boolean isOfCircuits() {
    return switch (this) {
      case NEUTRAL_RMS, NEUTRAL_LOADING, L1_RMS, L2_RMS, L3_RMS, ACTIVE, LOSSES -> true;
      default -> false;
    };
  }
}
