package fourthwire.audit;

import fourthwire.quantity.Conductor;
import fourthwire.site.Background;
import fourthwire.site.CapacitorBank;
import fourthwire.site.Circuit;
import fourthwire.site.Feeder;
import fourthwire.site.Filter;
import fourthwire.site.Lines;
import fourthwire.site.Load;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import fourthwire.site.Panel;
import fourthwire.site.PhaseSystem;
import fourthwire.site.Practice;
import fourthwire.site.SiteSettings;
import fourthwire.site.SpectrumTable;
import fourthwire.site.Supply;
import fourthwire.site.SupplyRole;
import fourthwire.site.Survey;
import fourthwire.site.Transformer;
import fourthwire.site.VectorGroup;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;

/** Writes small surveys in few lines; every impedance is given in ohms. */
final class SurveyBuilder {
  private static final OptionalDouble NOT_KNOWN = OptionalDouble.empty();

  private final int frequencyHz;
  private final List<Supply> supplies = new ArrayList<>();
  private final List<Background> background = new ArrayList<>();
  private final List<Transformer> transformers = new ArrayList<>();
  private final List<Panel> panels = new ArrayList<>();
  private final List<Circuit> circuits = new ArrayList<>();
  private final List<Load> loads = new ArrayList<>();
  private final List<SpectrumTable> spectra = new ArrayList<>();
  private final List<CapacitorBank> capacitors = new ArrayList<>();
  private final List<Filter> filters = new ArrayList<>();

  SurveyBuilder(int frequencyHz) {
    this.frequencyHz = frequencyHz;
  }

  static OptionalDouble some(double value) {
    return OptionalDouble.of(value);
  }

  SurveyBuilder supply(String name, double lineV, double faultMva, double xOverR) {
    return supply(name, lineV, faultMva, xOverR, Optional.empty());
  }

  SurveyBuilder supply(
      String name, double lineV, double faultMva, double xOverR, Optional<PhaseSystem> system) {
    supplies.add(
        new Supply(
            name,
            lineV,
            some(faultMva),
            some(xOverR),
            Optional.of(SupplyRole.NORMAL),
            system,
            NOT_KNOWN,
            NOT_KNOWN,
            NOT_KNOWN,
            Optional.empty(),
            NOT_KNOWN));
    return this;
  }

  SurveyBuilder generator(String name, double lineV, double kva, double xPercent, String at) {
    supplies.add(
        new Supply(
            name,
            lineV,
            NOT_KNOWN,
            NOT_KNOWN,
            Optional.of(SupplyRole.STANDBY),
            Optional.empty(),
            NOT_KNOWN,
            some(kva),
            some(xPercent),
            Optional.of(at),
            NOT_KNOWN));
    return this;
  }

  SurveyBuilder background(String supply, int order, double percent, double degrees) {
    background.add(new Background(supply, order, percent, some(degrees)));
    return this;
  }

  SurveyBuilder transformer(
      String name,
      String fedFrom,
      double kva,
      double primaryV,
      double secondaryV,
      String connection,
      double zPercent,
      double lossW,
      Conductor... primaryLines) {
    transformers.add(
        new Transformer(
            name,
            fedFrom,
            kva,
            primaryV,
            secondaryV,
            VectorGroup.parse(connection),
            zPercent,
            some(lossW),
            NOT_KNOWN,
            some(5),
            NOT_KNOWN,
            NOT_KNOWN,
            Arrays.asList(primaryLines),
            NOT_KNOWN,
            Feeder.UNKNOWN));
    return this;
  }

  SurveyBuilder panel(String name, String fedFrom, Feeder feeder) {
    return panel(name, fedFrom, Optional.empty(), feeder);
  }

  SurveyBuilder panel(
      String name,
      String fedFrom,
      Optional<PhaseSystem> system,
      Feeder feeder,
      Conductor... parentLines) {
    panels.add(
        new Panel(
            name,
            fedFrom,
            system,
            Arrays.asList(parentLines),
            NOT_KNOWN,
            NOT_KNOWN,
            NOT_KNOWN,
            feeder));
    return this;
  }

  SurveyBuilder circuit(String name, String panel, String lines, Feeder feeder) {
    return circuit(name, panel, lines, Optional.empty(), feeder);
  }

  SurveyBuilder circuit(
      String name, String panel, String lines, Optional<String> sharedNeutral, Feeder feeder) {
    circuits.add(
        new Circuit(
            name, panel, Lines.find(lines).orElseThrow(), NOT_KNOWN, sharedNeutral, feeder));
    return this;
  }

  SurveyBuilder load(String panel, String circuit, LoadKind kind, double watts, double quantity) {
    return load(panel, circuit, kind, watts, quantity, Optional.empty(), ModelColumns.NONE);
  }

  SurveyBuilder load(
      String panel,
      String circuit,
      LoadKind kind,
      double watts,
      double quantity,
      Optional<String> spectrum,
      ModelColumns columns) {
    loads.add(
        new Load(
            kind.word() + " " + (loads.size() + 1),
            circuit,
            panel,
            Optional.of(kind),
            Optional.empty(),
            spectrum,
            quantity,
            some(watts),
            NOT_KNOWN,
            NOT_KNOWN,
            NOT_KNOWN,
            Optional.empty(),
            Optional.empty(),
            kind == LoadKind.LINEAR ? some(0.8) : NOT_KNOWN,
            NOT_KNOWN,
            NOT_KNOWN,
            Optional.empty(),
            columns));
    return this;
  }

  SurveyBuilder spectrum(String name, double... orderPercentDegrees) {
    List<SpectrumTable.Row> rows = new ArrayList<>();
    for (int k = 0; k < orderPercentDegrees.length; k += 3) {
      rows.add(
          new SpectrumTable.Row(
              (int) orderPercentDegrees[k],
              orderPercentDegrees[k + 1],
              some(orderPercentDegrees[k + 2])));
    }
    spectra.add(new SpectrumTable(name, rows));
    return this;
  }

  SurveyBuilder bank(String name, String panel, double kvar, double detuningPercent) {
    return bank(name, panel, kvar, detuningPercent, OptionalInt.empty());
  }

  SurveyBuilder bank(
      String name, String panel, double kvar, double detuningPercent, OptionalInt steps) {
    capacitors.add(
        new CapacitorBank(
            name,
            panel,
            kvar,
            NOT_KNOWN,
            detuningPercent > 0 ? some(detuningPercent) : NOT_KNOWN,
            NOT_KNOWN,
            steps));
    return this;
  }

  SurveyBuilder filter(Filter filter) {
    filters.add(filter);
    return this;
  }

  /** A feeder of 1000 m with these ohms per kilometre: lines, then neutral. */
  static Feeder ohms(double r, double x, double neutralR, double neutralX) {
    return new Feeder(
        some(1000),
        Optional.empty(),
        Optional.empty(),
        OptionalInt.empty(),
        Optional.empty(),
        OptionalInt.empty(),
        Optional.empty(),
        Optional.empty(),
        NOT_KNOWN,
        NOT_KNOWN,
        NOT_KNOWN,
        NOT_KNOWN,
        some(r),
        some(x),
        some(neutralR),
        some(neutralX));
  }

  Survey build() {
    return new Survey(
        new SiteSettings(
            "test site",
            frequencyHz,
            Practice.IEC,
            Optional.empty(),
            Optional.empty(),
            NOT_KNOWN,
            NOT_KNOWN,
            NOT_KNOWN,
            NOT_KNOWN,
            Optional.empty()),
        supplies,
        background,
        transformers,
        panels,
        circuits,
        loads,
        spectra,
        List.of(),
        capacitors,
        filters,
        List.of(),
        List.of());
  }
}
