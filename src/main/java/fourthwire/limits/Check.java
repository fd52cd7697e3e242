package fourthwire.limits;

import fourthwire.quantity.Figure;
import java.util.Optional;
import java.util.function.Supplier;

/**
 * One figure beside one limit, before it is known whether that is worth saying. Hours of a week and
 * draws of the doubt count checks; an audit's result tells the findings among them.
 *
 * @param code what is checked
 * @param of what tells it from other checks of the same code at the same node: a document, a bank;
 *     empty where there is only one
 * @param rule what it means to be over
 * @param figure the figure, in {@code unit}
 * @param limit what it is held against, likewise
 * @param basis document, edition and clause
 * @param sentence made only where it is told
 */
public record Check(
    FindingCode code,
    String of,
    Rule rule,
    double figure,
    double limit,
    String unit,
    String basis,
    Supplier<String> sentence) {
  /** From this probability of being over the limit on, to act (public contract, section 6). */
  public static final double LIKELY = 0.5;

  /** From this probability on, to watch. */
  public static final double POSSIBLE = 0.1;

  private static final Figure NO_DRAWS = Figure.unknown("no spread was computed");

  /** What being over a limit means. */
  public enum Rule {
    /** Act over the limit, watch near it. */
    BINDING,
    /** Act over the limit; near it is usual. */
    BINDING_FROM_THE_LIMIT,
    /** Watch over the limit, never more. */
    GUIDE
  }

  /** Whether the figure passes the limit. */
  public boolean isOver() {
    return figure > limit;
  }

  /** What tells this check from every other at its node. */
  public String key() {
    return of.isEmpty() ? code.word() : code.word() + ' ' + of;
  }

  /** The finding by the figure alone; empty where nothing is to be said. */
  public Optional<Finding> finding() {
    return finding(severity(isOver(), false), NO_DRAWS);
  }

  /**
   * The finding with the doubt counted in.
   *
   * @param probability of being over the limit, 0 to 1
   */
  public Optional<Finding> finding(double probability) {
    return finding(
        severity(isOver() || probability >= LIKELY, probability >= POSSIBLE),
        Figure.of(probability));
  }

  private Optional<Severity> severity(boolean over, boolean possible) {
    boolean near = figure > Judgement.NEAR * limit;
    return switch (rule) {
      case BINDING -> over ? Optional.of(Severity.ACT) : watch(near || possible);
      case BINDING_FROM_THE_LIMIT -> over ? Optional.of(Severity.ACT) : watch(possible);
      case GUIDE -> watch(over);
    };
  }

  private static Optional<Severity> watch(boolean worth) {
    return worth ? Optional.of(Severity.WATCH) : Optional.empty();
  }

  private Optional<Finding> finding(Optional<Severity> severity, Figure probability) {
    return severity.map(
        s ->
            new Finding(
                code.word(),
                s,
                Figure.of(figure),
                Figure.of(limit),
                unit,
                probability,
                basis,
                sentence.get()));
  }
}
