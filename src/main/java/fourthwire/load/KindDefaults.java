package fourthwire.load;

import fourthwire.site.LoadKind;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Collection;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * What a unit of a kind is taken to be where the survey says nothing of it, each parameter with its
 * spread, in the form of a preset; read from the resource {@code kind-defaults.csv}. The usual
 * figures are those the models fall back on; the spreads are common practice, no source.
 *
 * <p>The residual of {@code measured} is what part of its spectrum's harmonics is there, percent.
 */
public final class KindDefaults {
  private static final Spread ONE = new Spread(1, 1, 1);
  private static final List<Row> ROWS = read();

  private KindDefaults() {}

  private record Row(LoadKind kind, double belowV, Preset preset) {}

  /**
   * The defaults of a kind.
   *
   * @param portV nominal port voltage, volts
   */
  public static Preset of(LoadKind kind, double portV) {
    return ROWS.stream()
        .filter(row -> row.kind() == kind && portV < row.belowV())
        .map(Row::preset)
        .findFirst()
        .orElseGet(() -> preset(kind, OptionalDouble.empty(), Map.of()));
  }

  /** Every row of the table, for pages. */
  public static Collection<Preset> all() {
    return ROWS.stream().map(Row::preset).toList();
  }

  private static Preset preset(
      LoadKind kind, OptionalDouble sizedForV, Map<PresetParameter, Spread> parameters) {
    return new Preset(
        kind.word(), kind, ONE, sizedForV, parameters, 0, 0, 0, 0, "common practice, no source");
  }

  private static List<Row> read() {
    try (InputStream in = KindDefaults.class.getResourceAsStream("kind-defaults.csv")) {
      if (in == null) {
        throw new IllegalStateException("the table of the kinds' defaults is missing");
      }
      List<String> lines = new String(in.readAllBytes(), StandardCharsets.UTF_8).lines().toList();
      List<String> columns = List.of(lines.get(0).split(";"));
      List<Row> rows = new ArrayList<>();
      lines.stream().skip(1).forEach(line -> rows.add(row(columns, line.split(";", -1))));
      return List.copyOf(rows);
    } catch (IOException e) {
      throw new UncheckedIOException("the table of the kinds' defaults can't be read", e);
    }
  }

  private static Row row(List<String> columns, String[] cells) {
    LoadKind kind = LoadKind.find(cells[0]).orElseThrow();
    double belowV = cells[1].isEmpty() ? Double.POSITIVE_INFINITY : Double.parseDouble(cells[1]);
    Map<PresetParameter, Spread> parameters = new EnumMap<>(PresetParameter.class);
    for (PresetParameter parameter : PresetParameter.values()) {
      String cell = cells[columns.indexOf(parameter.column())];
      if (!cell.isEmpty()) {
        parameters.put(parameter, Spread.parse(cell));
      }
    }
    return new Row(kind, belowV, preset(kind, number(cells[2]), parameters));
  }

  private static OptionalDouble number(String cell) {
    return cell.isEmpty() ? OptionalDouble.empty() : OptionalDouble.of(Double.parseDouble(cell));
  }
}
