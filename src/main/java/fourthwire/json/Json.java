package fourthwire.json;

import fourthwire.quantity.Figure;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.function.BiConsumer;
import java.util.function.Function;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.JsonNodeFactory;
import tools.jackson.databind.node.ObjectNode;

/** The habits all documents share: unknown figures with their reason, absent values as null. */
final class Json {
  private static final JsonMapper MAPPER = JsonMapper.builder().build();
  private static final String REASON = "_reason";

  private Json() {}

  static ObjectNode object() {
    return JsonNodeFactory.instance.objectNode();
  }

  static ArrayNode array() {
    return JsonNodeFactory.instance.arrayNode();
  }

  static JsonNode parse(String text) {
    return MAPPER.readTree(text);
  }

  /** Writes a figure, or null and its reason. */
  static void put(ObjectNode into, String key, Figure figure) {
    if (figure.value().isPresent()) {
      into.put(key, figure.value().getAsDouble());
    } else {
      into.putNull(key);
      into.put(key + REASON, figure.reason());
    }
  }

  static Figure figure(JsonNode from, String key) {
    JsonNode value = from.path(key);
    return value.isNumber()
        ? Figure.of(value.doubleValue())
        : Figure.unknown(from.path(key + REASON).asString(""));
  }

  /** Writes null and why there is nothing. */
  static void putAbsent(ObjectNode into, String key, String reason) {
    into.putNull(key);
    into.put(key + REASON, reason);
  }

  static void put(ObjectNode into, String key, Optional<String> text) {
    text.ifPresentOrElse(t -> into.put(key, t), () -> into.putNull(key));
  }

  static void put(ObjectNode into, String key, OptionalDouble number) {
    number.ifPresentOrElse(n -> into.put(key, n), () -> into.putNull(key));
  }

  static void put(ObjectNode into, String key, OptionalLong number) {
    number.ifPresentOrElse(n -> into.put(key, n), () -> into.putNull(key));
  }

  static Optional<String> text(JsonNode from, String key) {
    JsonNode value = from.path(key);
    return value.isString() ? Optional.of(value.asString()) : Optional.empty();
  }

  static OptionalDouble number(JsonNode from, String key) {
    JsonNode value = from.path(key);
    return value.isNumber() ? OptionalDouble.of(value.doubleValue()) : OptionalDouble.empty();
  }

  static OptionalLong whole(JsonNode from, String key) {
    JsonNode value = from.path(key);
    return value.isNumber() ? OptionalLong.of(value.longValue()) : OptionalLong.empty();
  }

  static ArrayNode strings(List<String> texts) {
    ArrayNode array = array();
    texts.forEach(array::add);
    return array;
  }

  static List<String> strings(JsonNode from, String key) {
    return list(from, key, JsonNode::asString);
  }

  static <T> ArrayNode list(List<T> items, Function<T, ? extends JsonNode> write) {
    ArrayNode array = array();
    items.forEach(item -> array.add(write.apply(item)));
    return array;
  }

  static <T> List<T> list(JsonNode from, String key, Function<JsonNode, T> read) {
    List<T> items = new ArrayList<>();
    from.path(key).forEach(item -> items.add(read.apply(item)));
    return List.copyOf(items);
  }

  static <K, V> ObjectNode map(Map<K, V> map, Function<V, ? extends JsonNode> write) {
    ObjectNode object = object();
    map.forEach((key, value) -> object.set(key.toString(), write.apply(value)));
    return object;
  }

  static <V> Map<String, V> map(JsonNode from, String key, Function<JsonNode, V> read) {
    Map<String, V> map = new LinkedHashMap<>();
    entries(from.path(key), (name, value) -> map.put(name, read.apply(value)));
    return map;
  }

  static <K extends Enum<K>, V> Map<K, V> map(
      JsonNode from, String key, Class<K> keys, Function<JsonNode, V> read) {
    Map<K, V> map = new EnumMap<>(keys);
    entries(from.path(key), (name, value) -> map.put(Enum.valueOf(keys, name), read.apply(value)));
    return map;
  }

  static void entries(JsonNode object, BiConsumer<String, JsonNode> each) {
    object.properties().forEach(e -> each.accept(e.getKey(), e.getValue()));
  }
}
