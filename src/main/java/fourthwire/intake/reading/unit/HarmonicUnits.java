package fourthwire.intake.reading.unit;

import fourthwire.intake.reading.heading.Heading;
import fourthwire.intake.reading.heading.Heading.Meaning;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Pattern;

/** Units of harmonics: those of a line make its THD in amps or in percent, not in both. */
final class HarmonicUnits {
  private static final List<String> PLACES =
      List.of("L1", "L2", "L3", "N", "L1-L2", "L2-L3", "L3-L1");

  private final OpenHeadings open;

  HarmonicUnits(OpenHeadings open) {
    this.open = open;
  }

  void settle() {
    for (String place : PLACES) {
      for (String kind : List.of("current", "voltage")) {
        Map<Integer, double[]> orders = orders(place, kind);
        if (!orders.isEmpty()) {
          settle(
              place,
              kind,
              new HarmonicUnit(
                  orders, rms(place, kind), open.find(place + "." + kind + "_thd_percent")));
        }
      }
    }
    shareUnit("current");
    shareUnit("voltage");
  }

  private Optional<double[]> rms(String place, String kind) {
    return open.find(place + (kind.equals("current") ? ".rms_a" : ".rms_v"));
  }

  private Map<Integer, double[]> orders(String place, String kind) {
    Map<Integer, double[]> orders = new LinkedHashMap<>();
    String start = place + "." + kind + "_h";
    open.all()
        .forEach(
            (column, h) -> {
              if (h.meaning() == Meaning.UNIT_OPEN && h.quantity().startsWith(start)) {
                orders.put(order(h), open.values().of(column));
              }
            });
    return orders;
  }

  private static int order(Heading h) {
    int from = h.quantity().lastIndexOf("_h") + 2;
    return Integer.parseInt(h.quantity(), from, h.quantity().indexOf('_', from), 10);
  }

  private void settle(String place, String kind, HarmonicUnit unit) {
    unit.percent().ifPresent(percent -> become(place + "." + kind + "_h", percent, unit.reason()));
  }

  private void become(String start, boolean percent, String reason) {
    List<String> columns = new ArrayList<>();
    open.all()
        .replaceAll(
            (column, h) -> {
              boolean open = h.meaning() == Meaning.UNIT_OPEN && h.quantity().startsWith(start);
              if (open) {
                columns.add(column);
              }
              return open ? asHarmonic(h, percent) : h;
            });
    if (!columns.isEmpty()) {
      String base = start.contains("current") ? "A" : "V";
      open.notes()
          .add(
              "Harmonics from "
                  + columns.get(0)
                  + " on are in "
                  + (percent ? "%" : base)
                  + ", "
                  + reason);
    }
  }

  private static Heading asHarmonic(Heading h, boolean percent) {
    String quantity = percent ? h.quantity().replaceAll("_[av]$", "_percent") : h.quantity();
    return new Heading(Meaning.LIKELY, quantity, h.statistic(), 1, "");
  }

  /** Harmonics of one kind are written alike on all conductors of a file. */
  private void shareUnit(String kind) {
    Pattern harmonic = Pattern.compile(".*\\." + kind + "_h\\d+_(?:[av]|percent).*");
    List<Boolean> units =
        open.all().values().stream()
            .filter(h -> h.meaning() == Meaning.LIKELY && harmonic.matcher(h.quantity()).matches())
            .map(h -> h.quantity().endsWith("_percent"))
            .distinct()
            .toList();
    if (units.size() == 1) {
      for (String place : PLACES) {
        become(place + "." + kind + "_h", units.get(0), "as the other lines' are.");
      }
    }
  }

  /** The distortion that harmonics of known unit make, percent. */
  Optional<double[]> distortionMade(String place, String kind) {
    List<double[]> percent = new ArrayList<>();
    String start = place + "." + kind + "_h";
    open.all()
        .forEach(
            (column, h) -> {
              if (h.quantity().startsWith(start)
                  && h.quantity().endsWith("_percent")
                  && order(h) > 1) {
                percent.add(open.values().of(column));
              }
            });
    return percent.isEmpty() ? Optional.empty() : Optional.of(SampledColumns.rootSum(percent));
  }
}
