package fourthwire.config;

import java.nio.file.Path;
import org.springframework.boot.jdbc.autoconfigure.JdbcConnectionDetails;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.context.annotation.Profile;

/**
 * The H2 file in the data folder; the profile {@code postgresql} brings its own settings instead.
 */
@Configuration(proxyBeanMethods = false)
@Profile("!postgresql")
class DatabaseConfiguration {
  /** The cache in KiB: what is large is read once and in order, and the system keeps files too. */
  private static final String OPTIONS =
      ";MODE=PostgreSQL;DATABASE_TO_LOWER=TRUE;DEFAULT_NULL_ORDERING=HIGH;DB_CLOSE_ON_EXIT=FALSE"
          + ";CACHE_SIZE=16384";

  @Bean
  JdbcConnectionDetails dataFolder(InstallationProperties installation) {
    return new H2File(installation.dataDir());
  }

  /** A database named fourthwire in this folder. */
  private record H2File(Path folder) implements JdbcConnectionDetails {
    @Override
    public String getUsername() {
      return "sa";
    }

    @Override
    public String getPassword() {
      return "";
    }

    @Override
    public String getJdbcUrl() {
      return "jdbc:h2:file:" + folder.toAbsolutePath().normalize().resolve("fourthwire") + OPTIONS;
    }
  }
}
