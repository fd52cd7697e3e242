package fourthwire.limits.distortion;

import fourthwire.quantity.PublishedTable;

/** The editions of IEEE 519 that can be applied. They differ in the even orders. */
public enum Edition519 {
  IEEE_519_2014("2014"),
  IEEE_519_2022("2022");

  private static final PublishedTable EVEN_ORDERS =
      PublishedTable.beside(Edition519.class, "ieee519-even-orders.csv");

  private final String year;

  Edition519(String year) {
    this.year = year;
  }

  /** The document's name with its year. */
  public String document() {
    return "IEEE 519-" + year;
  }

  /** A table's basis with this edition in its name. */
  String basis(PublishedTable table) {
    return table.basis().replaceFirst("^IEEE 519", document());
  }

  /** What part of its band's odd-order limit an order may reach: 1 for odd orders. */
  double partOfBand(int order) {
    if (order % 2 == 1) {
      return 1;
    }
    return EVEN_ORDERS.rows().stream()
        .filter(row -> row.text("edition").equals(year))
        .filter(row -> row.number("from_order") <= order && order <= row.number("to_order"))
        .findFirst()
        .orElseThrow()
        .number("multiplier");
  }
}
