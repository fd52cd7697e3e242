package fourthwire.load;

import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Collection;
import java.util.Collections;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** The presets, read from the resource {@code presets.csv} (semicolons), in its order. */
public final class Presets {
  private static final Map<String, Preset> BY_NAME = read();

  private Presets() {}

  /** The preset of this name, without regard to case. */
  public static Optional<Preset> find(String name) {
    return BY_NAME.values().stream()
        .filter(p -> p.name().equalsIgnoreCase(name.strip()))
        .findFirst();
  }

  /** All names, in the table's order. */
  public static List<String> names() {
    return List.copyOf(BY_NAME.keySet());
  }

  /** All presets, in the table's order. */
  public static Collection<Preset> all() {
    return BY_NAME.values();
  }

  private static Map<String, Preset> read() {
    try (InputStream in = Presets.class.getResourceAsStream("presets.csv")) {
      if (in == null) {
        throw new IllegalStateException("the table of presets is missing");
      }
      List<String> lines = new String(in.readAllBytes(), StandardCharsets.UTF_8).lines().toList();
      List<String> columns = List.of(lines.get(0).split(";"));
      Map<String, Preset> presets = new LinkedHashMap<>();
      for (String line : lines.subList(1, lines.size())) {
        Preset preset = preset(cells(columns, line.split(";", -1)));
        presets.put(preset.name(), preset);
      }
      return Collections.unmodifiableMap(presets);
    } catch (IOException e) {
      throw new UncheckedIOException("the table of presets can't be read", e);
    }
  }

  private static Map<String, String> cells(List<String> columns, String[] values) {
    Map<String, String> cells = new HashMap<>();
    for (int c = 0; c < columns.size(); c++) {
      cells.put(columns.get(c), values[c]);
    }
    return cells;
  }

  private static Preset preset(Map<String, String> row) {
    return new Preset(
        text(row, "name"),
        LoadKind.find(text(row, "kind")).orElseThrow(),
        number(row, "typical_w").orElseThrow(),
        number(row, "low_w").orElseThrow(),
        number(row, "high_w").orElseThrow(),
        number(row, "displacement_factor"),
        number(row, "thd_low_percent").orElseThrow(),
        number(row, "thd_high_percent").orElseThrow(),
        text(row, "source"),
        sizes(row),
        number(row, "source_resistance_percent"),
        number(row, "input_filter_nf_per_w"));
  }

  private static ModelColumns sizes(Map<String, String> row) {
    OptionalDouble none = OptionalDouble.empty();
    return new ModelColumns(
        number(row, "efficiency"),
        number(row, "capacitance_uf_per_w"),
        none,
        none,
        none,
        none,
        none,
        number(row, "line_choke_percent"),
        number(row, "dc_choke_percent"),
        number(row, "firing_degrees"),
        none,
        number(row, "dead_angle_degrees"),
        none,
        none);
  }

  private static String text(Map<String, String> row, String column) {
    return Optional.ofNullable(row.get(column))
        .orElseThrow(() -> new IllegalStateException("presets have no column " + column));
  }

  private static OptionalDouble number(Map<String, String> row, String column) {
    String cell = text(row, column);
    return cell.isEmpty() ? OptionalDouble.empty() : OptionalDouble.of(Double.parseDouble(cell));
  }
}
