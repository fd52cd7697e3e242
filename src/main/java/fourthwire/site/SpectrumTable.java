package fourthwire.site;

import java.util.List;
import java.util.OptionalDouble;

/** The rows of {@code spectra} under one name: a measured or supplied current spectrum. */
public record SpectrumTable(String name, List<Row> rows) {
  /**
   * One order.
   *
   * @param order 1 to 50
   * @param percent of the fundamental
   * @param degrees sine reference against the load's own terminal voltage; empty: not known
   */
  public record Row(int order, double percent, OptionalDouble degrees) {}
}
