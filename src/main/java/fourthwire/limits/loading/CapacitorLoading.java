package fourthwire.limits.loading;

import fourthwire.limits.Check;
import fourthwire.limits.Finding;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Judgement;
import fourthwire.limits.Words;
import fourthwire.quantity.PublishedTable;
import fourthwire.quantity.Spectrum;
import java.util.ArrayList;
import java.util.List;

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
    return Judgement.findings(checks(phase, standard));
  }

  /** The checks behind {@link #judge}. */
  public static List<Check> checks(Phase phase, Standard standard) {
    List<Check> checks = new ArrayList<>();
    for (PublishedTable.Row row : TABLE.rows()) {
      if (row.text("standard").equals(standard.document())) {
        checks.add(check(phase, row));
      }
    }
    return checks;
  }

  private static Check check(Phase phase, PublishedTable.Row row) {
    return switch (row.text("quantity")) {
      case "current" ->
          check(
              phase,
              row,
              FindingCode.CAPACITOR_CURRENT,
              "current",
              phase.current().rms(),
              phase.ratedA(),
              "A");
      case "voltage" ->
          check(
              phase,
              row,
              FindingCode.CAPACITOR_VOLTAGE,
              "voltage",
              phase.voltage().rms(),
              phase.ratedV(),
              "V");
      default ->
          check(
              phase,
              row,
              FindingCode.CAPACITOR_POWER,
              "reactive power",
              phase.reactiveVar() / 1000,
              phase.ratedVar() / 1000,
              "kvar");
    };
  }

  private static Check check(
      Phase phase,
      PublishedTable.Row row,
      FindingCode code,
      String what,
      double figure,
      double rated,
      String unit) {
    double limit = rated * row.number("limit");
    String memory = row.text("provenance").equals("from memory") ? " (figures from memory)" : "";
    return new Check(
        code,
        phase.bank(),
        rule(code),
        figure,
        limit,
        unit,
        row.text("standard") + ", " + row.text("clause") + memory,
        () ->
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
                    unit));
  }

  /** At its rated voltage a bank stands at 91 % of the permissible: that is no news. */
  private static Check.Rule rule(FindingCode code) {
    return code == FindingCode.CAPACITOR_VOLTAGE
        ? Check.Rule.BINDING_FROM_THE_LIMIT
        : Check.Rule.BINDING;
  }
}
