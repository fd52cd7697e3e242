package fourthwire.intake.survey;

import java.util.Optional;
import java.util.function.Function;

/**
 * A column of a table.
 *
 * @param name as the header writes it
 * @param required whether the column must be there and every cell filled
 * @param format how its cells are written
 * @param print the cell of a record, empty where its value is not known
 */
record Column<R>(
    String name, boolean required, Format<?> format, Function<R, Optional<String>> print) {}
