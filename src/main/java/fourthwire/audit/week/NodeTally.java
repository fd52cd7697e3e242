package fourthwire.audit.week;

import fourthwire.audit.HeadlineFigure;
import fourthwire.audit.HourSeries;
import fourthwire.audit.WeekState;
import fourthwire.audit.judge.Losses;
import fourthwire.audit.judge.NodeFigures;
import fourthwire.limits.Check;
import fourthwire.limits.FindingCode;
import fourthwire.quantity.Figure;
import fourthwire.site.SiteSettings;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.ToDoubleFunction;

/**
 * One node through the different hours of a week. Each group of hours has its own place, so that
 * several can be filled at once.
 */
final class NodeTally {
  private static final double W_PER_KW = 1000;

  private final double[][] figures;
  private final Losses[] losses;

  /** One bit a check, by the ordinal of its code. */
  private final long[] checked;

  private final long[] over;

  NodeTally(int groups) {
    this.figures = new double[groups][];
    this.losses = new Losses[groups];
    this.checked = new long[groups];
    this.over = new long[groups];
  }

  /** Fills the place of a group of hours. */
  void put(int group, NodeFigures node) {
    figures[group] = node.headline();
    losses[group] = node.losses();
    for (Check check : node.checks()) {
      long bit = 1L << check.code().ordinal();
      checked[group] |= bit;
      over[group] |= check.isOver() ? bit : 0;
    }
  }

  /** The week, once every group is filled. */
  WeekState week(List<WeekHours.Alike> groups, String basis, SiteSettings settings) {
    return new WeekState(
        groups.size(), basis, hoursOver(groups), series(groups), energy(groups, settings));
  }

  private Map<String, Integer> hoursOver(List<WeekHours.Alike> groups) {
    Map<String, Integer> hours = new LinkedHashMap<>();
    for (FindingCode code : FindingCode.values()) {
      long bit = 1L << code.ordinal();
      if (Arrays.stream(checked).anyMatch(c -> (c & bit) != 0)) {
        int sum = 0;
        for (int g = 0; g < over.length; g++) {
          sum += (over[g] & bit) != 0 ? groups.get(g).hours().size() : 0;
        }
        hours.put(code.word(), sum);
      }
    }
    return hours;
  }

  private Map<HeadlineFigure, HourSeries> series(List<WeekHours.Alike> groups) {
    Map<HeadlineFigure, HourSeries> all = new EnumMap<>(HeadlineFigure.class);
    for (HeadlineFigure figure : HeadlineFigure.values()) {
      HourSeries series = series(groups, figure.ordinal());
      if (series.isKnown()) {
        all.put(figure, series);
      }
    }
    return all;
  }

  private HourSeries series(List<WeekHours.Alike> groups, int figure) {
    double[] byHour = new double[HourSeries.HOURS];
    for (int g = 0; g < figures.length; g++) {
      for (int hour : groups.get(g).hours()) {
        byHour[hour] = figures[g][figure];
      }
    }
    return HourSeries.of(byHour);
  }

  private WeekState.Energy energy(List<WeekHours.Alike> groups, SiteSettings settings) {
    double activeKwh = 0;
    for (int g = 0; g < figures.length; g++) {
      double watts = figures[g][HeadlineFigure.ACTIVE.ordinal()];
      activeKwh += groups.get(g).hours().size() * watts / W_PER_KW;
    }
    Figure price =
        settings.energyPricePerKwh().isPresent()
            ? Figure.of(settings.energyPricePerKwh().getAsDouble())
            : Figure.unknown("the survey has no energy_price_per_kwh");
    return new WeekState.Energy(
        activeKwh,
        lossKwh(groups, Losses::feederW),
        lossKwh(groups, Losses::feederHarmonicW),
        lossKwh(groups, Losses::windingW),
        lossKwh(groups, Losses::windingHarmonicW),
        price,
        settings.currency().orElse(""));
  }

  private double lossKwh(List<WeekHours.Alike> groups, ToDoubleFunction<Losses> watts) {
    double kwh = 0;
    for (int g = 0; g < losses.length; g++) {
      kwh += groups.get(g).hours().size() * watts.applyAsDouble(losses[g]) / W_PER_KW;
    }
    return kwh;
  }
}
