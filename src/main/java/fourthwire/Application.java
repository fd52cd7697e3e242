package fourthwire;

import org.springframework.boot.SpringApplication;
import org.springframework.boot.autoconfigure.SpringBootApplication;

/** Starts the Fourthwire service. */
@SpringBootApplication
public class Application {
  /**
   * Starts the service.
   *
   * @param args Spring Boot's command line, for example {@code --server.port=9000}
   */
  public static void main(String[] args) {
    SpringApplication.run(Application.class, args);
  }
}
