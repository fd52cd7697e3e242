package fourthwire.web.panel;

import fourthwire.audit.HeadlineFigure;
import fourthwire.web.support.Numbers;
import java.util.List;
import java.util.Optional;

/**
 * What a node's page shows besides the design state.
 *
 * @param sureReason why it is not known how sure the figures are; else empty
 * @param weekReason why there is no week; else empty
 */
public record StatesView(
    Optional<Sure> sure,
    String sureReason,
    Optional<Week> week,
    String weekReason,
    Optional<Impedance> impedance) {
  private static final double W_PER_KW = 1000;

  /** A headline figure as pages write it: watts as kilowatts. */
  static String amount(HeadlineFigure figure, double value) {
    return Numbers.of(scaled(figure, value), unit(figure));
  }

  /** The number of {@link #amount}. */
  static double scaled(HeadlineFigure figure, double value) {
    return figure.unit().equals("W") ? value / W_PER_KW : value;
  }

  /** The unit of {@link #amount}. */
  static String unit(HeadlineFigure figure) {
    return figure.unit().equals("W") ? "kW" : figure.unit();
  }

  /**
   * How sure the figures are.
   *
   * @param small how many sites were drawn, a few words
   * @param ranked what the ranking is of, one sentence
   * @param inputs what the doubt comes from, largest first
   */
  public record Sure(String small, List<RangeRow> rows, String ranked, List<Share> inputs) {}

  /** One figure: its bar, its percentiles, and the computed figure. */
  public record RangeRow(
      String name, String svg, String p5, String p50, String p95, String computed) {}

  /**
   * A share of a whole.
   *
   * @param bar its length, per cent
   */
  public record Share(String name, String text, String bar) {
    /** A share of 0 to 1. */
    public static Share of(String name, double share) {
      String percent = Numbers.withDecimals(100 * share, 0);
      return new Share(name, percent + Numbers.THIN_SPACE + "%", percent + "%");
    }
  }

  /**
   * A week.
   *
   * @param basis how it was made
   * @param over in how many hours a limit is passed, sentences
   */
  public record Week(
      String basis,
      List<HourFigure> pictures,
      List<String> over,
      NodePage.Grid energy,
      NodePage.Grid spread) {}

  /** One figure over the hours. */
  public record HourFigure(String title, String svg, String caption) {}

  /**
   * Impedance against the order.
   *
   * @param steps the resonances of switched banks; empty without one
   */
  public record Impedance(String svg, String caption, Optional<NodePage.Grid> steps) {}
}
