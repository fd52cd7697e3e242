package fourthwire.web.load;

import fourthwire.limits.equipment.EquipmentUse;
import fourthwire.load.LoadModels;
import fourthwire.load.LoadRequest;
import fourthwire.load.Preset;
import fourthwire.load.Presets;
import fourthwire.load.trial.TrialSource;
import fourthwire.quantity.Spectrum;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import fourthwire.web.support.Words;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Understands the form; everything that is wrong is said at once, field by field. */
final class QuestionReader {
  private static final double X_OVER_R = 10;
  private static final double MOST_UNITS = 10_000;

  private final Words words;
  private final Typed typed;
  private final Chosen chosen;

  /** The equipment named in the form. */
  record Chosen(String name, LoadKind kind, Optional<Preset> preset) {
    /** The first of the list where nothing is named, or nothing that is known. */
    static Chosen of(String name) {
      Optional<Preset> preset = Presets.find(name);
      Optional<LoadKind> kind = LoadKind.find(name);
      if (preset.isEmpty() && kind.isPresent()) {
        return new Chosen(name, kind.get(), Optional.empty());
      }
      Preset found = preset.orElseGet(() -> Presets.all().iterator().next());
      return new Chosen(found.name(), found.kind(), Optional.of(found));
    }
  }

  QuestionReader(Words words, Typed typed) {
    this.words = words;
    this.typed = typed;
    this.chosen = Chosen.of(typed.text("load"));
  }

  Chosen chosen() {
    return chosen;
  }

  /** Whether the equipment stands on three lines. */
  boolean threeLines() {
    return switch (chosen.kind().family()) {
      case THREE_PHASE -> true;
      case SINGLE_PHASE -> false;
      case LINEAR, ANY -> typed.text("lines").equals("three");
    };
  }

  /** Equal parts it is made of, each on a line of its own: a single-phase kind on three lines. */
  int parts() {
    boolean single = chosen.kind().family() == LoadKind.Family.SINGLE_PHASE;
    String lines = typed.text("lines");
    boolean three = lines.isEmpty() ? chosen.name().contains("three-phase") : lines.equals("three");
    return single && three ? 3 : 1;
  }

  double hertz() {
    return typed.text("hz").equals("60") ? 60 : 50;
  }

  double assumedVolts() {
    return LoadDefaults.volts(threeLines(), hertz());
  }

  double assumedWatts() {
    return chosen.preset().map(Preset::typicalW).orElse(LoadDefaults.watts(chosen.kind()));
  }

  /** The displacement factor that applies where none is typed. */
  OptionalDouble assumedDisplacement() {
    OptionalDouble ofPreset =
        chosen.preset().map(Preset::displacementFactor).orElse(OptionalDouble.empty());
    return ofPreset.isPresent() ? ofPreset : LoadDefaults.displacement(chosen.kind());
  }

  /** The question; empty where a field is wrong, which is then said in what was typed. */
  Optional<LoadQuestion> read() {
    checkChoices();
    double volts = typed.number("volts", 24, 1000).orElse(assumedVolts());
    double watts = typed.number("watts", 0.1, 2e6).orElse(assumedWatts());
    double level = typed.number("level", 1, 100).orElse(100);
    double units = typed.number("units", 1, MOST_UNITS).orElse(1);
    if (units != Math.rint(units)) {
      typed.error("units", words.of("loads.error.whole", typed.text("units")));
    }
    OptionalDouble displacement = displacement();
    ModelColumns columns = columns(watts / parts(), volts);
    Optional<Spectrum> spectrum = spectrum(displacement);
    Optional<TrialSource> source = source(volts);
    if (!typed.errors().isEmpty() || source.isEmpty()) {
      return Optional.empty();
    }
    LoadRequest request =
        new LoadRequest(
            chosen.kind(),
            threeLines() ? 3 : 1,
            hertz(),
            volts,
            new LoadRequest.Rating.Watts(watts / parts()),
            units,
            chosen.kind().runsAtLowerPower() ? level / 100 : 1,
            chosen.kind().runsAtLowerPower(),
            displacement,
            columns,
            spectrum);
    return Optional.of(
        new LoadQuestion(chosen.name(), chosen.preset(), request, parts(), source.get(), use()));
  }

  private void checkChoices() {
    String name = typed.text("load");
    if (!name.isEmpty() && Presets.find(name).isEmpty() && LoadKind.find(name).isEmpty()) {
      typed.error("load", words.of("loads.error.load", name));
    }
    choice("hz", "50", "60");
    choice("lines", "one", "three");
    choice(
        "background",
        Arrays.stream(Backgrounds.values()).map(Backgrounds::word).toArray(String[]::new));
    choice(
        "use", Arrays.stream(EquipmentUse.values()).map(EquipmentUse::word).toArray(String[]::new));
  }

  private void choice(String field, String... accepted) {
    if (typed.has(field) && !Arrays.asList(accepted).contains(typed.text(field))) {
      typed.error(
          field, words.of("loads.error.choice", typed.text(field), String.join(", ", accepted)));
    }
  }

  private OptionalDouble displacement() {
    OptionalDouble typedFactor = typed.number("displacement_factor", -1, 1);
    if (typedFactor.isPresent() && Math.abs(typedFactor.getAsDouble()) < 0.01) {
      typed.error("displacement_factor", words.of("loads.error.displacement"));
    }
    return typedFactor.isPresent()
        ? typedFactor
        : chosen.preset().map(Preset::displacementFactor).orElse(OptionalDouble.empty());
  }

  private ModelColumns columns(double watts, double volts) {
    Map<ModelField, Double> values = new EnumMap<>(ModelField.class);
    for (ModelField field : ModelField.of(chosen.kind())) {
      typed.number(field.column(), field.low(), field.high()).ifPresent(v -> values.put(field, v));
    }
    ModelColumns own = ModelField.columns(values);
    return chosen.preset().map(p -> own.orElse(p.columns(watts / parts(), volts))).orElse(own);
  }

  /** Of a measured load, on a fundamental of 1. */
  private Optional<Spectrum> spectrum(OptionalDouble displacement) {
    if (chosen.kind() != LoadKind.MEASURED) {
      return Optional.empty();
    }
    if (!typed.has("spectrum")) {
      typed.error("spectrum", words.of("loads.error.spectrum"));
      return Optional.empty();
    }
    double degrees = LoadModels.fundamentalDegrees(OptionalDouble.empty(), displacement);
    Optional<Spectrum> read = OrderList.current(typed, "spectrum", degrees, words);
    read.ifPresent(this::checkZeroSequence);
    return read;
  }

  private void checkZeroSequence(Spectrum s) {
    for (int h = 3; h <= Spectrum.HIGHEST_ORDER && threeLines(); h += 3) {
      if (s.magnitude(h) > 0) {
        typed.error("spectrum", words.of("loads.error.zero-sequence", h));
      }
    }
  }

  private Optional<TrialSource> source(double volts) {
    OptionalDouble fault = typed.number("fault_mva", 1e-4, 1e5);
    OptionalDouble ratio = typed.number("x_over_r", 0, 1000);
    OptionalDouble r = typed.number("r_ohm", 0, 1e4);
    OptionalDouble x = typed.number("x_ohm", 0, 1e4);
    if (fault.isPresent() && (r.isPresent() || x.isPresent())) {
      typed.error("fault_mva", words.of("loads.error.impedance"));
    }
    double ohm = r.orElse(0);
    double reactance = x.orElse(0);
    if (fault.isPresent()) {
      double z = volts * volts / (fault.getAsDouble() * 1e6);
      double t = ratio.orElse(X_OVER_R);
      ohm = z / Math.hypot(1, t);
      reactance = ohm * t;
    }
    double resistance = ohm;
    double henry = reactance / (2 * Math.PI * hertz());
    return background().map(b -> new TrialSource(volts, resistance, henry, b));
  }

  private Optional<Spectrum> background() {
    if (typed.has("orders")) {
      return OrderList.background(typed, "orders", words);
    }
    return Optional.of(
        Arrays.stream(Backgrounds.values())
            .filter(b -> b.word().equals(typed.text("background")))
            .findFirst()
            .orElse(Backgrounds.NONE)
            .spectrum());
  }

  EquipmentUse use() {
    return Arrays.stream(EquipmentUse.values())
        .filter(u -> u.word().equals(typed.text("use")))
        .findFirst()
        .orElseGet(() -> EquipmentUse.named(chosen.name()));
  }
}
