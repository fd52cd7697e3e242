package fourthwire.audit.judge;

import static fourthwire.quantity.Conductor.N;

import fourthwire.audit.HeadlineFigure;
import fourthwire.audit.plan.Place;
import fourthwire.limits.Check;
import fourthwire.limits.Finding;
import fourthwire.limits.Judgement;
import fourthwire.limits.loading.TransformerLoading;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Distortion;
import fourthwire.quantity.Figure;
import fourthwire.quantity.HarmonicLoss;
import fourthwire.quantity.Spectrum;
import fourthwire.site.SiteTree;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.function.Function;

/**
 * One node in one state: its headline figures, its losses, and what is held against limits. Without
 * what only a report needs, so that every hour of a week and every draw can be looked at.
 */
public final class NodeFigures {
  private final AuditContext context;
  private final Place place;
  private final Map<Conductor, Spectrum> currents;
  private final NodeVoltages voltages;
  private final NodeFindings limits;
  private final Losses losses;

  public NodeFigures(AuditContext context, Place place) {
    this.context = context;
    this.place = place;
    this.currents =
        NodeCurrents.spectra(context.solution(), place.networkNode(), place.conductors());
    this.voltages = NodeVoltages.of(context.solution(), place);
    this.limits = new NodeFindings(context, place, currents, voltages);
    this.losses = Losses.of(place, fedWith(), lines());
  }

  /** What the node's feeder carries: of a transformer its primary's currents. */
  private Map<Conductor, Spectrum> fedWith() {
    return place
        .transformer()
        .map(t -> NodeCurrents.spectra(context.solution(), t.networkNode(), t.conductors()))
        .orElse(currents);
  }

  /** Every figure held against a limit. */
  public List<Check> checks() {
    return limits.checks();
  }

  /** What is said besides the checks. */
  public List<Finding> notes() {
    return limits.notes();
  }

  /** All findings by the figures alone, worst first. */
  List<Finding> findings() {
    List<Finding> findings = new ArrayList<>(Judgement.findings(checks()));
    findings.addAll(notes());
    findings.sort(Comparator.comparing(Finding::severity));
    return List.copyOf(findings);
  }

  /** Heat in its feeder, and of a transformer in its windings. */
  public Losses losses() {
    return losses;
  }

  /**
   * The headline figures by their ordinal; NaN where one is not known here. A circuit has only what
   * is told of circuits.
   */
  public double[] headline() {
    double[] figures = new double[HeadlineFigure.values().length];
    Arrays.fill(figures, Double.NaN);
    if (currents.containsKey(N)) {
      double rms = currents.get(N).rms();
      set(figures, HeadlineFigure.NEUTRAL_RMS, Figure.of(rms));
      Figure ampacity = context.ampacities().neutral(place).ampacityA();
      set(figures, HeadlineFigure.NEUTRAL_LOADING, ampacity.map(a -> 100 * rms / a));
    }
    for (Map.Entry<Conductor, Spectrum> e : currents.entrySet()) {
      if (e.getKey().isLine()) {
        HeadlineFigure line = HeadlineFigure.LINES.get(e.getKey().ordinal());
        set(figures, line, Figure.of(e.getValue().rms()));
      }
    }
    set(figures, HeadlineFigure.LOSSES, Figure.of(losses.wholeW()));
    if (place.node().kind() == SiteTree.Kind.CIRCUIT) {
      figures[HeadlineFigure.ACTIVE.ordinal()] = activeW();
    } else {
      addDistortion(figures);
    }
    return figures;
  }

  private void addDistortion(double[] figures) {
    set(figures, HeadlineFigure.CURRENT_THD, worst(lines(), Distortion::thdPercent));
    set(figures, HeadlineFigure.TDD, worst(lines(), context.demand(place)::tddPercent));
    set(figures, HeadlineFigure.VOLTAGE_THD, worst(voltages.list(), Distortion::thdPercent));
    set(figures, HeadlineFigure.HARMONIC_LOSS_FACTOR, harmonicLossFactor());
    NodePower power = power();
    set(figures, HeadlineFigure.ACTIVE, power.whole().activeW());
    set(figures, HeadlineFigure.POWER_FACTOR, power.whole().powerFactor());
    if (place.transformer().isPresent()) {
      set(figures, HeadlineFigure.TRANSFORMER_LOADING, transformer().loadingPercent());
    }
  }

  private static void set(double[] figures, HeadlineFigure which, Figure figure) {
    figures[which.ordinal()] = figure.value().orElse(Double.NaN);
  }

  private static Figure worst(Collection<Spectrum> of, Function<Spectrum, Figure> figure) {
    return of.stream()
        .map(figure)
        .filter(f -> f.value().isPresent())
        .max(Comparator.comparingDouble(f -> f.value().getAsDouble()))
        .orElse(Figure.unknown("no current flows"));
  }

  /** Σ V·I of the lines, to the neutral where there is one, else to earth: their sum is zero. */
  private double activeW() {
    double watts = 0;
    List<Conductor> names = place.node().lines();
    for (int k = 0; k < names.size(); k++) {
      Spectrum v = voltages.toNeutral() ? voltages.list().get(k) : potential(names.get(k));
      Spectrum i = lines().get(k);
      for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
        watts += v.re(h) * i.re(h) + v.im(h) * i.im(h);
      }
    }
    return watts;
  }

  private Spectrum potential(Conductor line) {
    return context.solution().potential(place.networkNode(), place.conductors().of(line));
  }

  Map<Conductor, Spectrum> currents() {
    return currents;
  }

  List<Spectrum> lines() {
    return place.node().lines().stream().map(currents::get).toList();
  }

  NodeVoltages voltages() {
    return voltages;
  }

  NodePower power() {
    return NodePower.of(voltages, currents);
  }

  TransformerLoading transformer() {
    return limits.transformer();
  }

  /** ΣI_h²h²/ΣI_h² of the most loaded line. */
  Figure harmonicLossFactor() {
    return lines().stream()
        .max(Comparator.comparingDouble(Spectrum::rms))
        .map(HarmonicLoss::harmonicLossFactor)
        .orElse(Figure.unknown("no lines"));
  }
}
