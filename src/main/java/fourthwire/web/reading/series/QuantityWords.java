package fourthwire.web.reading.series;

import fourthwire.web.support.Names;
import fourthwire.web.support.Words;

/** What the pages of a log call a quantity, whose public name is {@code L1.current_h3_a}. */
public final class QuantityWords {
  private final Words words;
  private final Names names;

  /** In these words and with these names of conductors. */
  public QuantityWords(Words words, Names names) {
    this.words = words;
    this.names = names;
  }

  /** Where, what and in which unit: "L1: Current, rms, A". */
  public String of(String quantity) {
    Measure measure = Measure.of(quantity);
    String place = Measure.parsed(quantity).place();
    String label = measure.label(words);
    String unit = measure.unit(0);
    String what = unit.isEmpty() || label.contains("%") ? label : label + ", " + unit;
    return place.isEmpty() || place.equals("total")
        ? what
        : words.of("quantity.at", names.of(place), what);
  }
}
