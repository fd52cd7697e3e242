package fourthwire.intake.survey;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.jspecify.annotations.Nullable;

/**
 * The values read from one row, by column. A required column always has a value: the format's
 * stand-in where its cell was damaged.
 */
final class Cells {
  private final Map<String, Object> values;

  Cells(Map<String, Object> values) {
    this.values = values;
  }

  String text(String column) {
    return required(column, String.class);
  }

  double number(String column) {
    return required(column, Double.class);
  }

  int integer(String column) {
    return required(column, Integer.class);
  }

  <V> V required(String column, Class<V> type) {
    return optional(column, type)
        .orElseThrow(() -> new IllegalStateException("no value for column " + column));
  }

  Optional<String> optionalText(String column) {
    return optional(column, String.class);
  }

  OptionalDouble optionalNumber(String column) {
    @Nullable Object value = values.get(column);
    return value == null ? OptionalDouble.empty() : OptionalDouble.of((Double) value);
  }

  OptionalInt optionalInteger(String column) {
    @Nullable Object value = values.get(column);
    return value == null ? OptionalInt.empty() : OptionalInt.of((Integer) value);
  }

  <V> Optional<V> optional(String column, Class<V> type) {
    return Optional.ofNullable(values.get(column)).map(type::cast);
  }

  /** The list in this column, empty where not known. */
  <V> List<V> list(String column, Class<V> type) {
    return optional(column, List.class).stream()
        .flatMap(l -> ((List<?>) l).stream())
        .map(type::cast)
        .toList();
  }
}
