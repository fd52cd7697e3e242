package fourthwire.audit.doubt;

import fourthwire.audit.Progress;
import fourthwire.audit.judge.AuditContext;
import fourthwire.audit.judge.NodeFigures;
import fourthwire.audit.judge.SiteState;
import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.LoadPlacements;
import fourthwire.audit.solve.Workers;
import fourthwire.load.DesignPowers;
import fourthwire.site.SiteTree;
import fourthwire.site.Supply;
import fourthwire.site.Survey;
import fourthwire.testsupport.SmallSite;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** A small site in its design state, ready for draws. */
final class DrawnSite {
  private final Workers workers;
  private final SiteState.Source states;
  private final Survey survey;
  private final List<Device> devices;
  private final AuditContext design;

  private DrawnSite(Survey survey, int threads) {
    this.workers = new Workers(threads, () -> {});
    this.survey = survey;
    Supply supply = survey.normalSupply();
    SiteTree tree = SiteTree.of(survey, supply);
    this.devices =
        LoadPlacements.of(survey, tree).stream()
            .map(p -> Device.of(p, new DesignPowers()))
            .toList();
    this.states = SiteState.Source.of(survey, supply, tree, workers);
    SiteState state = states.solve(devices, Progress.SILENT);
    this.design =
        new AuditContext(survey, supply, tree, devices, state.plan(), state.solution(), workers);
  }

  /**
   * One board on a 400 V supply.
   *
   * @param faultMva of the supply
   * @param circuits the table's rows
   * @param loads the table's rows
   */
  static DrawnSite of(double faultMva, String circuits, String loads) {
    Map<String, String> tables = new LinkedHashMap<>();
    tables.put("site.csv", "key,value\nname,Drawn\nfrequency_hz,50\npractice,iec\n");
    tables.put(
        "supplies.csv", "supply,line_voltage_v,fault_level_mva\nGRID,400," + faultMva + "\n");
    tables.put("panels.csv", "panel,fed_from,bus_rating_a\nLP-1,GRID,60\nLP-2,GRID,\n");
    tables.put("circuits.csv", "circuit,panel,lines\n" + circuits);
    tables.put("loads.csv", loads);
    tables.put("spectra.csv", "spectrum,order,percent,degrees\npulse,1,100,0\npulse,3,60,180\n");
    return new DrawnSite(SmallSite.survey(tables), 2);
  }

  /** The same site worked on by so many threads. */
  DrawnSite on(int threads) {
    return new DrawnSite(survey, threads);
  }

  Map<String, Doubt.Outcome> doubt(int draws, long seed) {
    return doubt(draws, seed, Progress.SILENT);
  }

  Map<String, Doubt.Outcome> doubt(int draws, long seed, Progress progress) {
    SiteState.Source fresh = SiteState.Source.of(survey, design.supply(), design.tree(), workers);
    return new Doubt(fresh, design, devices, draws, seed).solve(progress);
  }

  DrawnLoads loads(int draws, long seed) {
    return new DrawnLoads(devices, new LatinHypercube(seed, draws));
  }

  /** The headline figures of a node on one site drawn by itself. */
  double[] truth(String node, long seed) {
    List<Device> drawn = loads(1, seed).at(0);
    SiteState state = states.solve(drawn, Progress.SILENT);
    AuditContext context = design.drawn(drawn, state.plan(), state.solution());
    return new NodeFigures(context, state.plan().get(node)).headline();
  }
}
