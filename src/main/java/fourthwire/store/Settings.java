package fourthwire.store;

import java.util.Optional;
import org.springframework.jdbc.core.simple.JdbcClient;

/** What this installation remembers of itself: named texts. */
public final class Settings {
  private final JdbcClient jdbc;

  Settings(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  /** The text under this name. */
  public Optional<String> find(String name) {
    return jdbc.sql("select setting_value from settings where name = ?")
        .param(name)
        .query(String.class)
        .optional();
  }

  /** Stores or replaces the text under this name. */
  public void put(String name, String value) {
    int changed =
        jdbc.sql("update settings set setting_value = ? where name = ?")
            .params(value, name)
            .update();
    if (changed == 0) {
      jdbc.sql("insert into settings (name, setting_value) values (?, ?)")
          .params(name, value)
          .update();
    }
  }
}
