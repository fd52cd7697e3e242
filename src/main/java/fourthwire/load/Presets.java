package fourthwire.load;

import fourthwire.site.LoadKind;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Collection;
import java.util.Collections;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The presets, read from the resource {@code presets.csv} (semicolons), in its order.
 *
 * <p>A figure stands there as {@code low..typical..high}, fifth and ninety-fifth percentile, or as
 * one number; a band of what to expect as {@code low..high}. The source is the last column and may
 * hold semicolons of its own.
 */
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
        Preset preset = preset(cells(columns, line.split(";", columns.size())));
        if (presets.put(preset.name(), preset) != null) {
          throw new IllegalStateException("two presets are named " + preset.name());
        }
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
    double[] thd = band(text(row, "thd_percent"));
    double[] powerFactor = band(text(row, "power_factor"));
    String volts = text(row, "sized_for_v");
    return new Preset(
        text(row, "name"),
        LoadKind.find(text(row, "kind")).orElseThrow(),
        Spread.parse(text(row, "watts")),
        volts.isEmpty() ? OptionalDouble.empty() : OptionalDouble.of(Double.parseDouble(volts)),
        parameters(row),
        thd[0],
        thd[1],
        powerFactor[0],
        powerFactor[1],
        text(row, "source"));
  }

  private static Map<PresetParameter, Spread> parameters(Map<String, String> row) {
    Map<PresetParameter, Spread> parameters = new EnumMap<>(PresetParameter.class);
    for (PresetParameter parameter : PresetParameter.values()) {
      String cell = text(row, parameter.column());
      if (!cell.isEmpty()) {
        parameters.put(parameter, Spread.parse(cell));
      }
    }
    return parameters;
  }

  private static double[] band(String text) {
    String[] ends = text.split("\\.\\.", -1);
    return new double[] {Double.parseDouble(ends[0]), Double.parseDouble(ends[1])};
  }

  private static String text(Map<String, String> row, String column) {
    return Optional.ofNullable(row.get(column))
        .orElseThrow(() -> new IllegalStateException("presets have no column " + column));
  }
}
