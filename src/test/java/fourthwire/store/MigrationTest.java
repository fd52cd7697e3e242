package fourthwire.store;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.testsupport.Databases;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.springframework.jdbc.core.simple.JdbcClient;

/** The one line of migrations makes the same tables on both databases. */
class MigrationTest {
  /** Names that the two databases give the same type. */
  private static final Map<String, String> SAME =
      Map.of("bytea", "binary varying", "text", "character varying");

  @Test
  void bothDatabasesGetTheSameColumns() {
    List<String> h2 = columns(Databases.H2);

    assertThat(h2).hasSizeGreaterThan(60);
    assertThat(columns(Databases.POSTGRESQL)).isEqualTo(h2);
  }

  private static List<String> columns(Databases kind) {
    return JdbcClient.create(kind.migrated())
        .sql(
            """
            select table_name, column_name, data_type, is_nullable
            from information_schema.columns
            where table_schema = 'public' and table_name <> 'flyway_schema_history'
            """)
        .query(
            (row, n) ->
                "%s.%s %s %s"
                    .formatted(
                        row.getString(1),
                        row.getString(2),
                        type(row.getString(3)),
                        row.getString(4)))
        .list()
        .stream()
        .sorted()
        .toList();
  }

  private static String type(String name) {
    String lower = name.toLowerCase(Locale.ROOT);
    return SAME.getOrDefault(lower, lower);
  }
}
