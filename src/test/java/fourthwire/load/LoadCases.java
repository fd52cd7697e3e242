package fourthwire.load;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.PortSpectra;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.Optional;
import java.util.OptionalDouble;

/** Small builders for load model tests. */
final class LoadCases {
  private LoadCases() {}

  /** A request of this kind with every model column empty. */
  static LoadRequest request(LoadKind kind, double watts, double units, double demand) {
    boolean three = kind.family() == LoadKind.Family.THREE_PHASE;
    return new LoadRequest(
        kind,
        three ? 3 : 1,
        50,
        three ? 400 : 230,
        new LoadRequest.Rating.Watts(watts),
        units,
        demand,
        true,
        OptionalDouble.empty(),
        ModelColumns.NONE,
        Optional.empty());
  }

  /** One rectifier at 230 V with a choke of so many percent behind its bridge. */
  static LoadRequest choked(double watts, double demand, double dcPercent) {
    LoadRequest plain = request(LoadKind.CAPACITOR_INPUT_CHOKE, watts, 1, demand);
    ModelColumns columns = ModelColumns.NONE.with(ModelColumns.Column.DC_CHOKE_PERCENT, dcPercent);
    return new LoadRequest(
        plain.kind(),
        plain.ports(),
        plain.frequencyHz(),
        plain.nominalPortV(),
        plain.rating(),
        1,
        demand,
        true,
        OptionalDouble.empty(),
        columns,
        Optional.empty());
  }

  /** A request of one unit of a preset at its usual figures. */
  static LoadRequest request(
      Preset preset, double watts, double portV, double hertz, double demand) {
    return new LoadRequest(
        preset.kind(),
        preset.kind().family() == LoadKind.Family.THREE_PHASE ? 3 : 1,
        hertz,
        portV,
        new LoadRequest.Rating.Watts(watts),
        1,
        demand,
        true,
        preset.displacementFactor(),
        preset.columns(watts, portV),
        Optional.empty());
  }

  /** Sinusoidal, balanced electromotive force of nominal port voltage, turned by some degrees. */
  static PortSpectra emf(int ports, double nominalV, double degrees) {
    PortSpectra emf = new PortSpectra(ports);
    double v = ports == 3 ? nominalV / Math.sqrt(3) : nominalV;
    for (int p = 0; p < ports; p++) {
      double angle = Math.toRadians(degrees - 120 * p);
      emf.re[p][1] = v * Math.cos(angle);
      emf.im[p][1] = v * Math.sin(angle);
    }
    return emf;
  }

  /** Whole current (injected and, from the terminal voltage, linear) behind a series R-L. */
  static PortSpectra current(LoadModel model, double nominalV, double ohm, double henry) {
    PortSpectra emf = emf(model.ports(), nominalV, 0);
    PortSpectra current = new PortSpectra(model.ports());
    model.newSolver().solve(emf, ohm, henry, current);
    double[] y = new double[6];
    model.linearSiemens(1, y);
    for (int p = 0; p < model.ports(); p++) {
      double re = emf.re[p][1];
      double im = emf.im[p][1];
      current.re[p][1] += y[0] * re - y[1] * im;
      current.im[p][1] += y[0] * im + y[1] * re;
    }
    return current;
  }
}
