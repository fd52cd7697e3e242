package fourthwire.testsupport;

import fourthwire.site.Survey;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.SplittableRandom;

/**
 * A seeded, invented site of any size with everything in it: a 250 MVA supply at 11 kV, a 1,600 kVA
 * transformer and a main board for every hundred panels, distribution boards below, final panels
 * below those, circuits on the final panels, each with one load, no two alike: 40 %
 * capacitor-input, 25 % with power factor correction, 5 % six-pulse drives, 12 % linear, 8 %
 * motors, 10 % measured; schedules for all of them, one capacitor bank at the first main board. A
 * transformer carries about two thirds of its rating at 18 circuits a panel.
 */
public final class MixedSite {
  /** Every hundred panels have a transformer of their own. */
  private static final int PANELS_PER_TRANSFORMER = 100;

  private static final int BOARDS_PER_TRANSFORMER = 9;
  private static final double PHASE_V = 230;
  private static final int SPECTRA = 5;
  private static final int SCHEDULES = 4;
  private static final String[] LINES = {"L1", "L2", "L3"};

  private final SplittableRandom random;
  private final int panels;
  private final int circuits;
  private final StringBuilder panelRows =
      new StringBuilder(
          "panel,fed_from,bus_rating_a,length_m,conductor_size,conductors_per_line\n");
  private final StringBuilder circuitRows =
      new StringBuilder("circuit,panel,lines,breaker_a,length_m,conductor_size\n");
  private final StringBuilder loadRows =
      new StringBuilder(
          "load,circuit,panel,kind,spectrum,quantity,rated_w,displacement_factor,schedule,"
              + "capacitance_uf_per_w,source_resistance_ohm,line_choke_percent,dc_choke_percent\n");

  private MixedSite(int panels, int circuits, long seed) {
    this.panels = panels;
    this.circuits = circuits;
    this.random = new SplittableRandom(seed);
  }

  /** The survey's tables by file name; the same seed gives the same bytes. */
  public static Map<String, String> tables(int panels, int circuits, long seed) {
    return new MixedSite(panels, circuits, seed).make();
  }

  /** The same as a survey file. */
  public static byte[] zip(int panels, int circuits, long seed) {
    return SmallSite.zip(tables(panels, circuits, seed));
  }

  /** The same as a survey. */
  public static Survey survey(int panels, int circuits, long seed) {
    return SmallSite.survey(tables(panels, circuits, seed));
  }

  private Map<String, String> make() {
    int transformers = Math.max(1, panels / PANELS_PER_TRANSFORMER);
    int boards = Math.max(1, BOARDS_PER_TRANSFORMER * panels / PANELS_PER_TRANSFORMER);
    int finals = panels - transformers - boards;
    StringBuilder transformerRows =
        new StringBuilder(
            "transformer,fed_from,rated_kva,primary_v,secondary_v,connection,impedance_percent,"
                + "load_loss_w,length_m,conductor_size\n");
    for (int t = 0; t < transformers; t++) {
      row(transformerRows, "T%d,GRID,1600,11000,400,Dyn11,6,14000,%.1f,95 mm2", t, any(20, 300));
      row(panelRows, "MSB-%d,T%d,2500,%.2f,240 mm2,7", t, t, any(4, 12));
    }
    for (int b = 0; b < boards; b++) {
      row(panelRows, "DB-%d,MSB-%d,400,%.2f,150 mm2,2", b, b % transformers, any(15, 60));
    }
    for (int p = 0; p < finals; p++) {
      row(panelRows, "LP-%d,DB-%d,160,%.2f,70 mm2,1", p, random.nextInt(boards), any(8, 45));
    }
    for (int c = 0; c < circuits; c++) {
      circuit("LP-" + random.nextInt(finals), c);
    }
    Map<String, String> tables = new LinkedHashMap<>();
    tables.put(
        "site.csv", "key,value\nname,Mixed site\nfrequency_hz,50\npractice,iec\ntimezone,UTC\n");
    tables.put(
        "supplies.csv", "supply,line_voltage_v,fault_level_mva,x_over_r\nGRID,11000,250,10\n");
    tables.put("background.csv", "supply,order,percent,degrees\nGRID,5,0.8,170\nGRID,7,0.5,-40\n");
    tables.put("transformers.csv", transformerRows.toString());
    tables.put("panels.csv", panelRows.toString());
    tables.put("circuits.csv", circuitRows.toString());
    tables.put("loads.csv", loadRows.toString());
    tables.put("spectra.csv", spectra());
    tables.put("schedules.csv", schedules());
    tables.put("capacitors.csv", "capacitor,panel,kvar\nC1,MSB-0,300\n");
    return tables;
  }

  private void circuit(String panel, int number) {
    double pick = random.nextDouble();
    boolean threeLines = pick >= .65 && pick < .70 || pick >= .82 && pick < .90;
    String lines = threeLines ? "L1-L2-L3" : LINES[random.nextInt(3)];
    String size = threeLines ? "6 mm2" : "2.5 mm2";
    row(
        circuitRows,
        "%d,%s,%s,%d,%.2f,%s",
        number,
        panel,
        lines,
        threeLines ? 40 : 16,
        any(4, 35),
        size);
    String at = "load %d,%d,%s,".formatted(number, number, panel);
    String when = "S" + random.nextInt(SCHEDULES);
    if (pick < .40) {
      double watts = any(25, 120);
      double ohm = any(.01, .03) * PHASE_V * PHASE_V / watts;
      row(
          loadRows,
          at + "capacitor-input,,%d,%.2f,,%s,%.3f,%.3f,,",
          random.nextInt(1, 6),
          watts,
          when,
          any(.7, 1.6),
          ohm);
    } else if (pick < .65) {
      String kind = random.nextInt(3) == 0 ? "pfc-critical" : "pfc-continuous";
      row(loadRows, at + kind + ",,%d,%.2f,,%s,,,,", random.nextInt(1, 8), any(50, 160), when);
    } else if (pick < .70) {
      row(
          loadRows,
          at + "six-pulse,,1,%.1f,,%s,%.4f,,%.2f,%.2f",
          any(1500, 6000),
          when,
          any(.02, .06),
          any(.5, 4),
          any(0, 3));
    } else if (pick < .82) {
      row(loadRows, at + "linear,,1,%.2f,%.3f,%s,,,,", any(100, 900), any(.8, 1), when);
    } else if (pick < .90) {
      row(loadRows, at + "motor,,1,%.1f,%.3f,%s,,,,", any(700, 3500), any(.75, .9), when);
    } else {
      row(
          loadRows,
          at + ",lamp-%d,%d,%.2f,,%s,,,,",
          random.nextInt(SPECTRA),
          random.nextInt(4, 30),
          any(9, 40),
          when);
    }
  }

  private String spectra() {
    StringBuilder rows = new StringBuilder("spectrum,order,percent,degrees\n");
    for (int s = 0; s < SPECTRA; s++) {
      row(rows, "lamp-%d,1,100,%.1f", s, any(-15, 25));
      for (int h = 3; h < 50; h += 2) {
        row(rows, "lamp-%d,%d,%.2f,%.1f", s, h, any(20, 70) / h, any(-180, 180));
      }
    }
    return rows.toString();
  }

  /** Weekdays with a shape of their own, weekends at a level: 72 different hours a week. */
  private String schedules() {
    StringBuilder rows = new StringBuilder("schedule,days");
    for (int h = 0; h < 24; h++) {
      rows.append(",h%02d".formatted(h));
    }
    rows.append('\n');
    for (int s = 0; s < SCHEDULES; s++) {
      for (String days : new String[] {"weekday", "saturday", "sunday"}) {
        rows.append("S%d,%s".formatted(s, days));
        for (int h = 0; h < 24; h++) {
          double day = Math.max(0, Math.sin(Math.PI * (h - 6) / 14.0));
          double share = days.equals("weekday") ? .15 + .7 * day : .15 + .2 * day;
          rows.append(String.format(Locale.ROOT, ",%.3f", share + any(0, .12)));
        }
        rows.append('\n');
      }
    }
    return rows.toString();
  }

  private double any(double from, double to) {
    return random.nextDouble(from, to);
  }

  private static void row(StringBuilder rows, String format, Object... values) {
    rows.append(String.format(Locale.ROOT, format, values)).append('\n');
  }
}
