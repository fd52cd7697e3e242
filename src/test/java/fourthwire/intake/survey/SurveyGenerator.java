package fourthwire.intake.survey;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/**
 * Makes good surveys of invented sites from a seed, as tables of text: a supply, a transformer, a
 * main board, panels of every system in chains, circuits on the lines each panel has, loads of
 * every kind that fits, and rows in the other tables. The same seed gives the same survey.
 */
final class SurveyGenerator {
  private static final List<String> SINGLE_PHASE =
      List.of(
          "resistive",
          "linear",
          "capacitor-input",
          "capacitor-input-choke",
          "pfc-critical",
          "pfc-continuous",
          "magnetic-ballast",
          "phase-dimmer");
  private static final List<String> THREE_PHASE =
      List.of("motor", "six-pulse", "twelve-pulse", "active-front-end", "resistive", "linear");
  private static final List<String> NAMES =
      List.of("Küche", "A \"quoted\" one", "x, y; z", "007", "1e3");

  private final Random random;
  private final List<SurveyTable> tables = new ArrayList<>();
  private final List<List<String>> panels = new ArrayList<>();
  private final List<List<String>> circuits = new ArrayList<>();
  private final List<List<String>> loads = new ArrayList<>();

  private SurveyGenerator(long seed) {
    random = new Random(seed);
  }

  /** The tables of one survey. */
  static List<SurveyTable> tables(long seed) {
    return new SurveyGenerator(seed).make();
  }

  private List<SurveyTable> make() {
    add(
        "site",
        "key,value",
        List.of(
            List.of("name", "Site " + pick(NAMES)),
            List.of("frequency_hz", pick(List.of("50", "60"))),
            List.of("practice", pick(List.of("iec", "north-america"))),
            List.of("energy_price_per_kwh", number(0, 1)),
            List.of("timezone", "Europe/Vienna")));
    add(
        "supplies",
        "supply,line_voltage_v,fault_level_mva,x_over_r,zero_sequence_ratio,system",
        List.of(List.of("GRID", "11000", number(50, 500), number(1, 20), "", "")));
    add("background", "supply,order,percent,degrees", background());
    add(
        "transformers",
        "transformer,fed_from,rated_kva,primary_v,secondary_v,connection,impedance_percent,"
            + "load_loss_w",
        List.of(
            List.of(
                "T1",
                "GRID",
                number(300, 2000),
                number(10600, 11400),
                "400",
                pick(List.of("Dyn11", "Dyn1", "YNyn0", "Yzn11", "Dzn0")),
                number(4, 8),
                number(100, 3000))));
    makePanels();
    add(
        "panels",
        "panel,fed_from,system,parent_lines,bus_rating_a,length_m,conductor_size",
        panels);
    add("circuits", "circuit,panel,lines,breaker_a,shared_neutral", circuits);
    add(
        "loads",
        "load,circuit,panel,kind,spectrum,quantity,rated_w,rated_va,rated_a,demand_factor,schedule,"
            + "displacement_factor,confidence,diode_saturation_a",
        loads);
    add("spectra", "spectrum,order,percent,degrees", spectrum());
    add("schedules", "schedule,days," + hours("h%02d"), schedules());
    add("meters", "meter,at,ct_ratio,ct_reversed", meters());
    add("spot_readings", "at,time,l1_a,n_a,kw", readings());
    return tables;
  }

  private void makePanels() {
    panels.add(List.of("MSB", "T1", "three-phase-4-wire", "", number(100, 2000), "", ""));
    makeCircuits("MSB", "three-phase-4-wire");
    String parent = "MSB";
    int count = 1 + random.nextInt(6);
    for (int i = 0; i < count; i++) {
      String name = "LP-" + i + (i == 1 ? " " + pick(NAMES) : "");
      String system =
          pick(
              List.of(
                  "three-phase-4-wire", "three-phase-3-wire", "single-phase", "split-phase", ""));
      String parentLines =
          switch (system) {
            case "single-phase" -> pick(List.of("L1", "L2", "L3"));
            case "split-phase" -> pick(List.of("L1-L2", "L2-L3", "L3-L1"));
            default -> "";
          };
      boolean sized = random.nextBoolean();
      panels.add(
          List.of(
              name,
              parent,
              system,
              parentLines,
              number(60, 400),
              sized ? number(1, 90) : "",
              sized ? pick(List.of("25 mm2", "4 AWG", "250 kcmil")) : ""));
      makeCircuits(name, system);
      if (system.startsWith("three-phase-4") && random.nextBoolean()) {
        parent = name;
      }
    }
  }

  private void makeCircuits(String panel, String system) {
    List<String> lines =
        switch (system) {
          case "three-phase-3-wire" -> List.of("L1-L2-L3", "L1-L2", "L3-L1");
          case "single-phase" -> List.of("L1");
          case "split-phase" -> List.of("L1", "L2", "L1-L2", "L1-L2-N");
          default -> List.of("L1", "L2", "L3", "L2-L3", "L1-L2-L3", "L1-L2-L3-N", "L3-L1-N");
        };
    int count = 1 + random.nextInt(8);
    for (int i = 1; i <= count; i++) {
      String on = pick(lines);
      boolean shared = (on.equals("L1") || on.equals("L2")) && random.nextInt(4) == 0;
      circuits.add(List.of("" + i, panel, on, number(6, 63), shared ? "S" + i : ""));
      makeLoad(panel, "" + i, on);
    }
  }

  private void makeLoad(String panel, String circuit, String lines) {
    boolean three = lines.startsWith("L1-L2-L3");
    boolean measured = !lines.equals("L1-L2-L3") && random.nextInt(5) == 0;
    String kind = pick(three ? THREE_PHASE : SINGLE_PHASE);
    int rating = random.nextInt(3);
    loads.add(
        List.of(
            "load of " + pick(NAMES),
            circuit,
            panel,
            measured ? "" : kind,
            measured ? "led" : "",
            number(1, 40),
            rating == 0 ? number(1, 5000) : "",
            rating == 1 ? number(1, 5000) : "",
            rating == 2 ? number(0, 20) : "",
            number(0, 1),
            pick(List.of("", "office")),
            pick(List.of("", "-0.9", number(0.1, 1))),
            pick(List.of("", "guess", "measured", "counted", "nameplate")),
            pick(List.of("", "3e-11", "0.00000000002"))));
  }

  private List<List<String>> background() {
    return IntStream.of(3, 5, 7, 11)
        .filter(h -> random.nextBoolean())
        .mapToObj(h -> List.of("GRID", "" + h, number(0, 3), number(-180, 180)))
        .toList();
  }

  private List<List<String>> spectrum() {
    List<List<String>> rows = new ArrayList<>();
    rows.add(List.of("led", "1", "100", pick(List.of("", number(-30, 30)))));
    for (int h = 3; h <= 49; h += 2) {
      if (random.nextBoolean()) {
        rows.add(List.of("led", "" + h, number(0, 90), pick(List.of("", number(-180, 180)))));
      }
    }
    return rows;
  }

  private List<List<String>> schedules() {
    List<List<String>> rows = new ArrayList<>();
    for (String days : List.of("all", "sunday")) {
      List<String> row = new ArrayList<>(List.of("office", days));
      IntStream.range(0, 24).forEach(h -> row.add(number(0, 1)));
      rows.add(row);
    }
    return rows;
  }

  private List<List<String>> meters() {
    List<String> circuit = pick(circuits);
    return List.of(
        List.of("M1", "MSB", number(1, 400), pick(List.of("", "L1-N", "L2"))),
        List.of("M2", circuit.get(1) + ":" + circuit.get(0), "", ""));
  }

  private List<List<String>> readings() {
    return List.of(
        List.of("MSB", "2026-03-10T10:15", number(0, 900), number(0, 900), number(-9, 90)),
        List.of("T1", "2026-03-10 10:15:30", number(0, 900), "", ""));
  }

  private static String hours(String format) {
    return IntStream.range(0, 24).mapToObj(format::formatted).collect(Collectors.joining(","));
  }

  private void add(String table, String header, List<List<String>> rows) {
    List<SurveyTable.Row> numbered = new ArrayList<>();
    rows.forEach(r -> numbered.add(new SurveyTable.Row(numbered.size() + 2, r)));
    tables.add(new SurveyTable(table, List.of(header.split(",")), numbered, false));
  }

  private <T> T pick(List<T> from) {
    return from.get(random.nextInt(from.size()));
  }

  /** A number above the lowest, with as many digits as it happens to have. */
  private String number(double lowest, double highest) {
    double value = lowest + (highest - lowest) * (1e-9 + random.nextDouble() * (1 - 1e-9));
    return switch (random.nextInt(4)) {
      case 0 -> String.valueOf(value);
      case 1 -> String.valueOf(Math.max(Math.ceil(lowest + 1e-9), Math.rint(value)));
      case 2 -> String.valueOf(Math.ceil(value * 1000) / 1000);
      default -> String.valueOf((float) value);
    };
  }
}
