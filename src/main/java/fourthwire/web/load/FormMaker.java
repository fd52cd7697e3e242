package fourthwire.web.load;

import fourthwire.limits.equipment.EquipmentUse;
import fourthwire.load.Presets;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import fourthwire.web.load.FormView.Choice;
import fourthwire.web.load.FormView.Choices;
import fourthwire.web.load.FormView.Field;
import fourthwire.web.load.FormView.Group;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;

/** Makes the form: only the fields that the chosen equipment has, each with what empty means. */
final class FormMaker {
  private final Words words;
  private final Typed typed;
  private final QuestionReader reader;

  FormMaker(Words words, Typed typed, QuestionReader reader) {
    this.words = words;
    this.typed = typed;
    this.reader = reader;
  }

  FormView make(String failure) {
    return new FormView(
        List.of(
            group("loads.group.equipment", false, equipment()),
            group("loads.group.supply", false, supply()),
            group("loads.group.model", true, model())),
        failure);
  }

  private Group group(String title, boolean folded, List<Field> fields) {
    boolean open = fields.stream().anyMatch(f -> !f.error().isEmpty() || !f.value().isEmpty());
    return new Group(title, folded, open, fields);
  }

  private List<Field> equipment() {
    List<Field> fields = new ArrayList<>();
    LoadKind kind = reader.chosen().kind();
    fields.add(select("load", loads(), ""));
    fields.add(number("watts", assumed("loads.unit.w", OptionalDouble.of(reader.assumedWatts()))));
    if (kind.runsAtLowerPower()) {
      fields.add(number("level", words.of("loads.hint.level")));
    }
    fields.add(number("units", words.of("loads.hint.units")));
    if (kind.family() != LoadKind.Family.THREE_PHASE) {
      fields.add(lines(kind));
    }
    if (kind == LoadKind.MEASURED) {
      fields.add(lines("spectrum", words.of("loads.hint.spectrum")));
    }
    return fields;
  }

  /** Three lines: with N for a single-phase kind, without for one that spans them. */
  private Field lines(LoadKind kind) {
    boolean three = reader.threeLines() || reader.parts() == 3;
    String key =
        kind.family() == LoadKind.Family.SINGLE_PHASE ? "loads.lines.parts" : "loads.lines.three";
    List<Choice> choices =
        List.of(
            new Choice("one", words.of("loads.lines.one"), !three),
            new Choice("three", words.of(key), three));
    return select("lines", List.of(new Choices("", choices)), "");
  }

  private List<Choices> loads() {
    String chosen = reader.chosen().name();
    return List.of(
        new Choices(
            words.of("loads.presets"),
            Presets.names().stream().map(n -> new Choice(n, n, n.equals(chosen))).toList()),
        new Choices(
            words.of("loads.kinds"),
            Arrays.stream(LoadKind.values())
                .map(
                    k ->
                        new Choice(
                            k.word(), words.of("loads.kind." + k.word()), k.word().equals(chosen)))
                .toList()));
  }

  private List<Field> supply() {
    return List.of(
        number("volts", assumed("loads.unit.v", OptionalDouble.of(reader.assumedVolts()))),
        select("hz", choices("hz", "50", "60"), ""),
        number("fault_mva", words.of("loads.hint.fault_mva")),
        number("x_over_r", words.of("loads.hint.x_over_r")),
        number(
            "r_ohm",
            words.of(
                "loads.hint.r_ohm."
                    + (reader.threeLines() || reader.parts() == 3 ? "three" : "one"))),
        number("x_ohm", words.of("loads.hint.x_ohm")),
        select(
            "background",
            choices(
                "background",
                Arrays.stream(Backgrounds.values()).map(Backgrounds::word).toArray(String[]::new)),
            ""),
        lines("orders", words.of("loads.hint.orders")));
  }

  private List<Field> model() {
    List<Field> fields = new ArrayList<>();
    LoadKind kind = reader.chosen().kind();
    fields.add(
        select(
            "use",
            List.of(
                new Choices(
                    "",
                    Stream.concat(
                            Stream.of(
                                new Choice("", words.of("loads.use"), typed.text("use").isEmpty())),
                            Arrays.stream(EquipmentUse.values()).map(u -> choice("use", u.word())))
                        .toList())),
            ""));
    if (LoadDefaults.displacement(kind).isPresent()) {
      fields.add(
          number("displacement_factor", assumed("loads.unit.none", reader.assumedDisplacement())));
    }
    for (ModelField field : ModelField.of(kind)) {
      fields.add(number(field.column(), hint(field)));
    }
    return fields;
  }

  /** What the preset gives, else what the kind takes for granted. */
  private String hint(ModelField field) {
    double volts = typed.number("volts", 24, 1000).orElse(reader.assumedVolts());
    double watts = typed.number("watts", 0.1, 2e6).orElse(reader.assumedWatts()) / reader.parts();
    Optional<ModelColumns> ofPreset = reader.chosen().preset().map(p -> p.columns(watts, volts));
    OptionalDouble given = ofPreset.map(field::of).orElse(OptionalDouble.empty());
    if (given.isPresent()) {
      return words.of("loads.hint.preset", Typed.bound(given.getAsDouble()));
    }
    OptionalDouble otherwise = LoadDefaults.of(field, reader.chosen().kind(), volts, watts);
    return otherwise.isPresent()
        ? words.of("loads.hint.assumed", Typed.bound(otherwise.getAsDouble()))
        : words.orElse("loads.hint." + field.column(), "");
  }

  private String assumed(String unit, OptionalDouble value) {
    return value.isPresent() ? words.of(unit, Typed.bound(value.getAsDouble())) : "";
  }

  private List<Choices> choices(String field, String... values) {
    return List.of(new Choices("", Arrays.stream(values).map(v -> choice(field, v)).toList()));
  }

  private Choice choice(String field, String value) {
    return new Choice(
        value, words.of("loads." + field + "." + value), value.equals(typed.text(field)));
  }

  private Field number(String name, String hint) {
    return field(name, "number", hint, List.of());
  }

  private Field lines(String name, String hint) {
    return field(name, "lines", hint, List.of());
  }

  private Field select(String name, List<Choices> choices, String hint) {
    return field(name, "select", hint, choices);
  }

  private Field field(String name, String type, String hint, List<Choices> choices) {
    return new Field(
        name,
        type,
        words.of("loads.field." + name),
        typed.text(name),
        hint,
        typed.errors().getOrDefault(name, ""),
        choices);
  }
}
