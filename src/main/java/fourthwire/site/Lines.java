package fourthwire.site;

import fourthwire.quantity.Conductor;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** The conductors of a circuit, as the {@code lines} column writes them. */
public enum Lines {
  L1("L1", true, Conductor.L1),
  L2("L2", true, Conductor.L2),
  L3("L3", true, Conductor.L3),
  L1_L2("L1-L2", false, Conductor.L1, Conductor.L2),
  L2_L3("L2-L3", false, Conductor.L2, Conductor.L3),
  L3_L1("L3-L1", false, Conductor.L3, Conductor.L1),
  L1_L2_L3("L1-L2-L3", false, Conductor.L1, Conductor.L2, Conductor.L3),
  L1_L2_L3_N("L1-L2-L3-N", true, Conductor.L1, Conductor.L2, Conductor.L3),
  L1_L2_N("L1-L2-N", true, Conductor.L1, Conductor.L2),
  L2_L3_N("L2-L3-N", true, Conductor.L2, Conductor.L3),
  L3_L1_N("L3-L1-N", true, Conductor.L3, Conductor.L1);

  private final String word;
  private final boolean neutral;
  private final List<Conductor> lines;

  Lines(String word, boolean neutral, Conductor... lines) {
    this.word = word;
    this.neutral = neutral;
    this.lines = List.of(lines);
  }

  /** The text used in survey tables, IEC 60445 names. */
  public String word() {
    return word;
  }

  /** Whether the circuit has a neutral conductor. */
  public boolean hasNeutral() {
    return neutral;
  }

  /** Its line conductors, in the order written. */
  public List<Conductor> lines() {
    return lines;
  }

  /** Its conductors, lines first, then N where it has one. */
  public List<Conductor> conductors() {
    List<Conductor> all = new ArrayList<>(lines);
    if (neutral) {
      all.add(Conductor.N);
    }
    return List.copyOf(all);
  }

  /** The circuit conductors written so; A, B, C are read as L1, L2, L3. */
  public static Optional<Lines> find(String text) {
    String iec = text.trim().toUpperCase(java.util.Locale.ROOT);
    String named =
        iec.replaceAll("\\bA\\b", "L1").replaceAll("\\bB\\b", "L2").replaceAll("\\bC\\b", "L3");
    return Arrays.stream(values()).filter(l -> l.word.equals(named)).findFirst();
  }
}
