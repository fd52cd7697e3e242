package fourthwire.web.load;

import fourthwire.quantity.Spectrum;
import java.util.Locale;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/** A spectrum as rows of the survey's {@code spectra} table. */
final class SpectrumRows {
  /** Percent of the fundamental below which an order is left out. */
  private static final double LEAST_PERCENT = 5e-4;

  private SpectrumRows() {}

  /**
   * The table with its header.
   *
   * @param name what the spectrum is called
   * @param current at the angles of the public contract's spectrum tables
   */
  static String csv(String name, Spectrum current) {
    double fundamental = current.magnitude(1);
    return IntStream.rangeClosed(1, Spectrum.HIGHEST_ORDER)
        .filter(h -> 100 * current.magnitude(h) / fundamental >= LEAST_PERCENT)
        .mapToObj(
            h ->
                String.format(
                    Locale.ROOT,
                    "%s,%d,%.4f,%.2f\n",
                    quoted(name),
                    h,
                    100 * current.magnitude(h) / fundamental,
                    current.at(h).degrees()))
        .collect(Collectors.joining("", "spectrum,order,percent,degrees\n", ""));
  }

  private static String quoted(String text) {
    return text.matches("[\\w .()-]+") ? text : "\"" + text.replace("\"", "\"\"") + "\"";
  }
}
