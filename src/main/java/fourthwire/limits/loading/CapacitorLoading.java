package fourthwire.limits.loading;

import fourthwire.limits.Finding;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Judgement;
import fourthwire.limits.Severity;
import fourthwire.limits.Words;
import fourthwire.quantity.PublishedTable;
import fourthwire.quantity.Spectrum;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** A capacitor bank against the continuous overloads its standard makes it stand. */
public final class CapacitorLoading {
  private static final PublishedTable TABLE =
      PublishedTable.beside(CapacitorLoading.class, "capacitor-overload.csv");

  private CapacitorLoading() {}

  /** The standard a bank was built to. */
  public enum Standard {
    IEEE_18("IEEE 18-2012"),
    IEC_60831("IEC 60831-1:2014");

    private final String document;

    Standard(String document) {
      this.document = document;
    }

    /** Document and edition. */
    public String document() {
      return document;
    }
  }

  /**
   * One phase of a bank.
   *
   * @param bank its name
   * @param current through the capacitors of one line, amps
   * @param voltage across them, line to the bank's star point, volts
   * @param ratedV rated voltage line to star point, volts
   * @param ratedVar rated reactive power of one phase, vars
   */
  public record Phase(
      String bank, Spectrum current, Spectrum voltage, double ratedV, double ratedVar) {
    double ratedA() {
      return ratedVar / ratedV;
    }

    /** Sum of V·I over the orders: a capacitor's current leads each by a quarter turn. */
    double reactiveVar() {
      double sum = 0;
      for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
        sum += voltage.magnitude(h) * current.magnitude(h);
      }
      return sum;
    }
  }

  /** Judges the most loaded phase of a bank: current, voltage and reactive power. */
  public static List<Finding> judge(Phase phase, Standard standard) {
    List<Finding> findings = new ArrayList<>();
    for (PublishedTable.Row row : TABLE.rows()) {
      if (row.text("standard").equals(standard.document())) {
        judge(phase, row, findings);
      }
    }
    return findings;
  }

  private static void judge(Phase phase, PublishedTable.Row row, List<Finding> findings) {
    switch (row.text("quantity")) {
      case "current" ->
          add(
              phase,
              row,
              findings,
              FindingCode.CAPACITOR_CURRENT,
              "current",
              phase.current().rms(),
              phase.ratedA(),
              "A");
      case "voltage" ->
          add(
              phase,
              row,
              findings,
              FindingCode.CAPACITOR_VOLTAGE,
              "voltage",
              phase.voltage().rms(),
              phase.ratedV(),
              "V");
      default ->
          add(
              phase,
              row,
              findings,
              FindingCode.CAPACITOR_POWER,
              "reactive power",
              phase.reactiveVar() / 1000,
              phase.ratedVar() / 1000,
              "kvar");
    }
  }

  private static void add(
      Phase phase,
      PublishedTable.Row row,
      List<Finding> findings,
      FindingCode code,
      String what,
      double figure,
      double rated,
      String unit) {
    double limit = rated * row.number("limit");
    String sentence =
        "Bank %s: %s %s %s a phase; it may stand %s times its rated %s %s, that is %s %s."
            .formatted(
                phase.bank(),
                what,
                Words.number(figure),
                unit,
                Words.number(row.number("limit")),
                Words.number(rated),
                unit,
                Words.number(limit),
                unit);
    String memory = row.text("provenance").equals("from memory") ? " (figures from memory)" : "";
    String basis = row.text("standard") + ", " + row.text("clause") + memory;
    severity(code, figure, limit)
        .map(severity -> Judgement.finding(code, severity, figure, limit, unit, basis, sentence))
        .ifPresent(findings::add);
  }

  /** At its rated voltage a bank stands at 91 % of the permissible: that is no news. */
  private static Optional<Severity> severity(FindingCode code, double figure, double limit) {
    if (code == FindingCode.CAPACITOR_VOLTAGE && figure <= limit) {
      return Optional.empty();
    }
    return Judgement.of(figure, limit);
  }
}
