package fourthwire.config.openapi;

import io.swagger.v3.oas.models.Operation;
import io.swagger.v3.oas.models.PathItem;
import io.swagger.v3.oas.models.media.Content;
import io.swagger.v3.oas.models.media.Encoding;
import io.swagger.v3.oas.models.media.MediaType;
import io.swagger.v3.oas.models.media.Schema;
import io.swagger.v3.oas.models.parameters.RequestBody;

/** The multipart forms that calls take. */
final class Forms {
  /** Media type of a form with files. */
  static final String MULTIPART = "multipart/form-data";

  private Forms() {}

  static void describe(String path, PathItem.HttpMethod method, Operation operation) {
    if (method == PathItem.HttpMethod.GET) {
      return;
    }
    if (path.endsWith("/sites") || path.endsWith("/survey")) {
      operation.setRequestBody(form(new MediaType().schema(survey())));
    }
    if (path.endsWith("/readings")) {
      operation.setRequestBody(
          form(
              new MediaType()
                  .schema(readings())
                  .addEncoding("mapping", new Encoding().contentType("application/json"))));
    }
  }

  private static RequestBody form(MediaType form) {
    return new RequestBody().required(true).content(new Content().addMediaType(MULTIPART, form));
  }

  private static Schema<?> survey() {
    return Shape.of("A form with one file")
        .part("survey", file("A zip of CSV tables, or an xlsx workbook with a sheet per table"))
        .schema();
  }

  private static Schema<?> readings() {
    return Shape.of("A meter's file; give meter or at")
        .list("file", "One file; of a COMTRADE capture both, or a zip of them", file("A file"))
        .optional("meter", Shape.text("A meter of the survey"))
        .optional(
            "at", Shape.text("A supply, transformer, panel or circuit; a meter is made there"))
        .optional("mapping", new Schema<>().$ref("#/components/schemas/Mapping"))
        .schema();
  }

  private static Schema<?> file(String meaning) {
    Schema<Object> file = Shape.text(meaning);
    file.setFormat("binary");
    return file;
  }
}
