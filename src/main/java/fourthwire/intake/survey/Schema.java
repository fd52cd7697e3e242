package fourthwire.intake.survey;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.function.Function;

/**
 * A table of the contract: its columns in the contract's order, how a row becomes a record and how
 * a record becomes a row. Import and export read the same schema, so they can't disagree.
 *
 * @param name the table's name
 * @param columns in the contract's order
 * @param make builds the record of a row
 */
record Schema<R>(String name, List<Column<R>> columns, Function<Cells, R> make) {

  static <R> Builder<R> of(String name) {
    return new Builder<>(name);
  }

  List<String> columnNames() {
    return columns.stream().map(Column::name).toList();
  }

  /** Collects the columns of a table. */
  static final class Builder<R> {
    private final String name;
    private final List<Column<R>> columns = new ArrayList<>();

    private Builder(String name) {
      this.name = name;
    }

    <V> Builder<R> required(String column, Format<V> format, Function<R, V> get) {
      return add(column, true, format, r -> Optional.of(format.printer().apply(get.apply(r))));
    }

    <V> Builder<R> optional(String column, Format<V> format, Function<R, Optional<V>> get) {
      return add(column, false, format, r -> get.apply(r).map(format.printer()));
    }

    Builder<R> number(String column, Range range, Function<R, OptionalDouble> get) {
      return number(column, Formats.number(range), get);
    }

    Builder<R> number(String column, Format<Double> format, Function<R, OptionalDouble> get) {
      return add(column, false, format, r -> print(get.apply(r)));
    }

    Builder<R> count(String column, Function<R, OptionalInt> get) {
      return add(
          column,
          false,
          Formats.integer(1, Integer.MAX_VALUE),
          r -> get.apply(r).stream().mapToObj(String::valueOf).findFirst());
    }

    /** A list whose emptiness means "not known". */
    <V> Builder<R> list(String column, Format<List<V>> format, Function<R, List<V>> get) {
      return optional(column, format, r -> Optional.of(get.apply(r)).filter(l -> !l.isEmpty()));
    }

    /** The columns of a part that several tables share. */
    <P> Builder<R> part(List<Column<P>> shared, Function<R, P> get) {
      shared.forEach(
          c -> add(c.name(), c.required(), c.format(), r -> c.print().apply(get.apply(r))));
      return this;
    }

    Schema<R> build(Function<Cells, R> make) {
      return new Schema<>(name, List.copyOf(columns), make);
    }

    private Builder<R> add(
        String column, boolean required, Format<?> format, Function<R, Optional<String>> print) {
      columns.add(new Column<>(column, required, format, print));
      return this;
    }

    private static Optional<String> print(OptionalDouble value) {
      return value.stream().mapToObj(Numbers::print).findFirst();
    }
  }
}
