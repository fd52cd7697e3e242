package fourthwire.web.api;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import tools.jackson.databind.JsonNode;

/**
 * Holds an answer against its schema in the description: every key sent is described, every key
 * called required is there, every value is of a type the schema allows. The part of JSON Schema
 * 2020-12 that the description uses.
 */
final class DescribedShape {
  private final JsonNode description;

  DescribedShape(JsonNode description) {
    this.description = description;
  }

  /** The answer of a call, as described for this status. */
  void check(String method, String path, int status, JsonNode answer) {
    JsonNode content =
        description
            .path("paths")
            .path("/api/v1" + path)
            .path(method)
            .path("responses")
            .path(String.valueOf(status))
            .path("content");
    assertThat(content.propertyNames()).as(method + " " + path).containsExactly("application/json");
    walk(method + " " + path, content.path("application/json").path("schema"), answer);
  }

  private void walk(String where, JsonNode schema, JsonNode value) {
    JsonNode shape = resolved(schema);
    assertThat(types(shape)).as(where + " in " + shape).contains(typeOf(value));
    if (value.isObject()) {
      shape
          .path("required")
          .forEach(key -> assertThat(value.propertyNames()).as(where).contains(key.asString()));
      value
          .properties()
          .forEach(e -> key(where + "/" + e.getKey(), shape, e.getKey(), e.getValue()));
    }
    for (int i = 0; value.isArray() && i < value.size(); i++) {
      walk(where + "/" + i, shape.path("items"), value.path(i));
    }
  }

  private void key(String where, JsonNode shape, String key, JsonNode value) {
    JsonNode property = shape.path("properties").path(key);
    JsonNode described = property.isMissingNode() ? shape.path("additionalProperties") : property;
    assertThat(described.isObject()).as(where + " is described").isTrue();
    walk(where, described, value);
  }

  private JsonNode resolved(JsonNode schema) {
    return schema.has("$ref")
        ? description.at(schema.path("$ref").asString().substring(1))
        : schema;
  }

  private static List<String> types(JsonNode shape) {
    JsonNode type = shape.path("type");
    List<String> types = new ArrayList<>();
    if (type.isArray()) {
      type.forEach(t -> types.add(t.asString()));
    } else {
      types.add(type.asString());
    }
    if (types.contains("number")) {
      types.add("integer");
    }
    return types;
  }

  private static String typeOf(JsonNode value) {
    return switch (value.getNodeType()) {
      case OBJECT -> "object";
      case ARRAY -> "array";
      case STRING -> "string";
      case BOOLEAN -> "boolean";
      case NULL -> "null";
      case NUMBER -> value.isIntegralNumber() ? "integer" : "number";
      default -> "unknown " + value.getNodeType();
    };
  }
}
