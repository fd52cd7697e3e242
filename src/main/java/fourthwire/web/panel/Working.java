package fourthwire.web.panel;

import fourthwire.web.support.Words;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;

/** How a figure of the page comes about: its formula and where that stands. */
public enum Working {
  RMS,
  FUNDAMENTAL,
  THD,
  TDD,
  DEMAND,
  LOADING,
  NEUTRAL,
  MEAN_LINE,
  HEAT,
  ADDER,
  VOLTAGE_THD,
  DROP,
  NEUTRAL_VOLTAGE,
  ACTIVE,
  REACTIVE,
  APPARENT,
  NONFUNDAMENTAL,
  POWER_FACTOR,
  DISPLACEMENT,
  K_FACTOR,
  LOSS_FACTOR,
  DERATED,
  FACTOR_K,
  LOSSES,
  UNBALANCE;

  /** One figure's working, in words. */
  public record Line(String name, String formula, String source) {}

  /** These workings in words. */
  static List<Line> lines(Words words, Working... workings) {
    return Arrays.stream(workings).map(w -> w.line(words)).toList();
  }

  private Line line(Words words) {
    String key = "working." + name().toLowerCase(Locale.ROOT).replace('_', '-');
    return new Line(words.of(key), words.of(key + ".formula"), words.of(key + ".source"));
  }
}
