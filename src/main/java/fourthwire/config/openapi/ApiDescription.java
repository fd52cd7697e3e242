package fourthwire.config.openapi;

import io.swagger.v3.oas.models.Components;
import io.swagger.v3.oas.models.OpenAPI;
import io.swagger.v3.oas.models.PathItem;
import io.swagger.v3.oas.models.info.Info;
import io.swagger.v3.oas.models.media.Schema;
import java.util.ArrayList;
import java.util.List;
import org.springdoc.core.customizers.OpenApiCustomizer;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

/**
 * The description of the HTTP interface (OpenAPI): its heading, the documents and forms whose shape
 * no Java type tells, and the errors of every call.
 */
@Configuration(proxyBeanMethods = false)
class ApiDescription {
  /** Records of which every key is always sent. */
  private static final List<String> WHOLE =
      List.of(
          "SiteRow", "StoredSurvey", "Audit", "QueuedAudit", "Job", "QueuedJob", "CorrectionMade");

  @Bean
  OpenAPI description() {
    return new OpenAPI()
        .info(
            new Info()
                .title("Fourthwire")
                .version("1")
                .description(
                    "Power-quality audits of facilities. Conductors are L1, L2, L3, N; amps and"
                        + " volts are rms, angles degrees. A figure that can't be computed is null"
                        + " and beside it stands <name>_reason. Errors are problem documents (RFC"
                        + " 9457). On the loopback address a script needs no token."));
  }

  @Bean
  OpenApiCustomizer shapesAndErrors() {
    return api -> {
      Components components = api.getComponents();
      WHOLE.forEach(name -> requireAll(components, name));
      components
          .addSchemas("Problem", Errors.problem())
          .addSchemas("NodeRow", NodeShapes.row())
          .addSchemas("Node", NodeShapes.node())
          .addSchemas("ReadingRow", ReadingShapes.row())
          .addSchemas("Reading", ReadingShapes.reading())
          .addSchemas("Correction", ReadingShapes.correction())
          .addSchemas("LogLimits", LimitShapes.limits())
          .addSchemas("Mapping", ReadingShapes.mapping())
          .addSchemas("Series", SeriesShapes.series())
          .addSchemas("SeriesWeeks", SeriesShapes.weeks())
          .addSchemas("SeriesCoverage", SeriesShapes.coverage());
      api.getPaths().forEach(ApiDescription::complete);
    };
  }

  private static void requireAll(Components components, String name) {
    Schema<?> schema = components.getSchemas().get(name);
    if (schema == null) {
      throw new IllegalStateException("the description has no schema " + name);
    }
    schema.setRequired(new ArrayList<>(schema.getProperties().keySet()));
  }

  private static void complete(String path, PathItem item) {
    item.readOperationsMap()
        .forEach(
            (method, operation) -> {
              Forms.describe(path, method, operation);
              Errors.describe(path, operation);
            });
  }
}
