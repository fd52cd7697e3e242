package fourthwire.testsupport;

import io.zonky.test.db.postgres.embedded.EmbeddedPostgres;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.UUID;
import javax.sql.DataSource;
import org.flywaydb.core.Flyway;
import org.h2.jdbcx.JdbcDataSource;

/** Empty databases of both kinds, migrated; PostgreSQL is a real server that runs in the test. */
public enum Databases {
  H2 {
    @Override
    public DataSource empty() {
      JdbcDataSource database = new JdbcDataSource();
      database.setUrl(
          "jdbc:h2:mem:"
              + UUID.randomUUID()
              + ";MODE=PostgreSQL;DATABASE_TO_LOWER=TRUE;DEFAULT_NULL_ORDERING=HIGH"
              + ";DB_CLOSE_DELAY=-1");
      return database;
    }
  },
  POSTGRESQL {
    @Override
    public DataSource empty() {
      String name = "test" + UUID.randomUUID().toString().replace("-", "");
      try (Connection c = Server.RUNNING.getPostgresDatabase().getConnection()) {
        c.createStatement().execute("create database " + name);
      } catch (SQLException e) {
        throw new IllegalStateException(e);
      }
      return Server.RUNNING.getDatabase("postgres", name);
    }
  };

  /** A database without tables. */
  public abstract DataSource empty();

  /** A database with the migrated tables, empty. */
  public DataSource migrated() {
    DataSource database = empty();
    Flyway.configure().dataSource(database).locations("classpath:db/migration").load().migrate();
    return database;
  }

  /** Started once, when first asked for. */
  private static final class Server {
    static final EmbeddedPostgres RUNNING = start();

    private static EmbeddedPostgres start() {
      try {
        return EmbeddedPostgres.start();
      } catch (IOException e) {
        throw new UncheckedIOException(e);
      }
    }
  }
}
