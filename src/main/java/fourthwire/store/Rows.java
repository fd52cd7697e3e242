package fourthwire.store;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.temporal.ChronoUnit;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalLong;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient.StatementSpec;
import org.springframework.jdbc.support.GeneratedKeyHolder;

/** What both databases need doing alike. */
final class Rows {
  private Rows() {}

  /** The current time, in the microseconds that both databases keep. */
  static OffsetDateTime now(Clock clock) {
    return OffsetDateTime.ofInstant(clock.instant().truncatedTo(ChronoUnit.MICROS), ZoneOffset.UTC);
  }

  static Instant instant(ResultSet row, String column) throws SQLException {
    return row.getObject(column, OffsetDateTime.class).toInstant();
  }

  static String text(ResultSet row, String column) throws SQLException {
    return Objects.requireNonNull(row.getString(column), column);
  }

  static Optional<String> optionalText(ResultSet row, String column) throws SQLException {
    return Optional.ofNullable(row.getString(column));
  }

  static OptionalLong optionalLong(ResultSet row, String column) throws SQLException {
    long value = row.getLong(column);
    return row.wasNull() ? OptionalLong.empty() : OptionalLong.of(value);
  }

  /** Runs an insert and gives the id that the database made. */
  static long insert(StatementSpec statement) {
    GeneratedKeyHolder key = new GeneratedKeyHolder();
    statement.update(key, "id");
    @Nullable Number id = key.getKey();
    return Objects.requireNonNull(id, "generated id").longValue();
  }
}
