package fourthwire.config.openapi;

import io.swagger.v3.oas.models.media.JsonSchema;
import io.swagger.v3.oas.models.media.Schema;
import java.util.Arrays;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;

/** The shape of a JSON object, written down key by key: each with its type and its meaning. */
final class Shape {
  private final Schema<Object> schema = typed("object", "");

  private Shape() {}

  static Shape of(String meaning) {
    Shape shape = new Shape();
    shape.schema.description(meaning);
    return shape;
  }

  /** A text that is always there. */
  Shape text(String key, String meaning) {
    return part(key, typed("string", meaning));
  }

  /** A text that is null where there is none. */
  Shape textOrNull(String key, String meaning) {
    return part(key, nullable("string", meaning));
  }

  /** One of these words. */
  Shape word(String key, String meaning, String... words) {
    Schema<Object> word = typed("string", meaning);
    word.setEnum(List.<Object>of((Object[]) words));
    return part(key, word);
  }

  /** A number that is always known. */
  Shape number(String key, String meaning) {
    return part(key, typed("number", meaning));
  }

  /** A number that is null where there is none. */
  Shape numberOrNull(String key, String meaning) {
    return part(key, nullable("number", meaning));
  }

  /** A whole number. */
  Shape whole(String key, String meaning) {
    return part(key, typed("integer", meaning));
  }

  /** A whole number that is null where there is none. */
  Shape wholeOrNull(String key, String meaning) {
    return part(key, nullable("integer", meaning));
  }

  /** Figures that are null, with the reason beside them, where they can't be computed. */
  Shape figure(String key, String meaning) {
    part(key, nullable("number", meaning));
    return optional(key + "_reason", reason(key));
  }

  /** An object that is null, with the reason beside it, where there is none. */
  Shape partOrReason(String key, Schema<?> part) {
    part.setTypes(either("object"));
    part(key, part);
    return optional(key + "_reason", reason(key));
  }

  /** A list. */
  Shape list(String key, String meaning, Schema<?> item) {
    return part(key, listOf(meaning, item));
  }

  /** A part with a shape of its own that is always there. */
  Shape part(String key, Schema<?> part) {
    schema.addProperty(key, part);
    schema.addRequiredItem(key);
    return this;
  }

  /** A part that may be missing. */
  Shape optional(String key, Schema<?> part) {
    schema.addProperty(key, part);
    return this;
  }

  /** A figure that is there only for some, and then null with its reason where not known. */
  Shape figureOfSome(String key, String meaning) {
    return optional(key, nullable("number", meaning)).optional(key + "_reason", reason(key));
  }

  /** Any further keys, each of this shape. */
  Shape others(Schema<?> each) {
    schema.setAdditionalProperties(each);
    return this;
  }

  Schema<?> schema() {
    return schema;
  }

  static Schema<?> listOf(String meaning, Schema<?> item) {
    Schema<Object> list = typed("array", meaning);
    list.setItems(item);
    return list;
  }

  static Schema<Object> text(String meaning) {
    return typed("string", meaning);
  }

  static Schema<Object> number(String meaning) {
    return typed("number", meaning);
  }

  static Schema<Object> whole(String meaning) {
    return typed("integer", meaning);
  }

  private static Schema<Object> reason(String key) {
    return typed("string", "Why " + key + " is null; there only where it is");
  }

  private static Schema<Object> nullable(String type, String meaning) {
    Schema<Object> schema = typed(type, meaning);
    schema.setTypes(either(type));
    return schema;
  }

  private static Set<String> either(String type) {
    return new LinkedHashSet<>(Arrays.asList(type, "null"));
  }

  private static Schema<Object> typed(String type, String meaning) {
    Schema<Object> schema = new JsonSchema();
    schema.setTypes(new LinkedHashSet<>(List.of(type)));
    schema.setDescription(meaning);
    return schema;
  }
}
