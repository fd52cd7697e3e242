package fourthwire.limits.equipment;

import fourthwire.quantity.PublishedTable;
import java.util.Optional;
import java.util.OptionalDouble;

/** A printed table of IEC 61000-3-2 with bands of orders, some of them falling as 1/n. */
final class OrderTable {
  private final PublishedTable table;

  OrderTable(String resource) {
    table = PublishedTable.beside(OrderTable.class, resource);
  }

  PublishedTable table() {
    return table;
  }

  /** The printed figure at an order, in the table's own unit; a band holds every second order. */
  OptionalDouble at(int order) {
    Optional<PublishedTable.Row> row =
        table.rows().stream()
            .filter(r -> r.number("from_order") <= order && order <= r.number("to_order"))
            .filter(r -> (order - (int) r.number("from_order")) % 2 == 0)
            .findFirst();
    return row.isEmpty() ? OptionalDouble.empty() : OptionalDouble.of(limit(row.get(), order));
  }

  private static double limit(PublishedTable.Row row, int order) {
    OptionalDouble times = row.optional("times_over_n");
    return row.number("limit") * (times.isPresent() ? times.getAsDouble() / order : 1);
  }
}
