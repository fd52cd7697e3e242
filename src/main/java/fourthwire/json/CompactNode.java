package fourthwire.json;

import java.util.List;
import java.util.Map;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.DoubleNode;
import tools.jackson.databind.node.IntNode;
import tools.jackson.databind.node.ObjectNode;

/**
 * The document of a node made small before it is compressed: figures to nine significant digits,
 * spectra as a column a quantity instead of a row an order, and nothing that the rest tells.
 */
final class CompactNode {
  private static final int DIGITS = 9;

  private CompactNode() {}

  /** Makes a public document small; it is changed. */
  static ObjectNode of(ObjectNode document) {
    if (document.path("week") instanceof ObjectNode week) {
      week.remove(WeekJson.PERCENTILES_KEY);
    }
    turnSpectra(document.path("design"));
    turnSpectra(document.path("design").path("primary"));
    shorten(document);
    return document;
  }

  private static void turnSpectra(JsonNode state) {
    for (String key : List.of("spectrum", "voltage_spectrum")) {
      if (state.path(key) instanceof ArrayNode rows) {
        ((ObjectNode) state).set(key, SpectrumJson.columns(rows));
      }
    }
  }

  private static void shorten(JsonNode node) {
    if (node instanceof ObjectNode object) {
      for (Map.Entry<String, JsonNode> e : object.properties()) {
        e.setValue(shortened(e.getValue()));
      }
    } else if (node instanceof ArrayNode array) {
      for (int n = 0; n < array.size(); n++) {
        array.set(n, shortened(array.get(n)));
      }
    }
  }

  private static JsonNode shortened(JsonNode node) {
    if (!(node instanceof DoubleNode)) {
      shorten(node);
      return node;
    }
    double value = Digits.rounded(node.doubleValue(), DIGITS);
    return value == 0 ? IntNode.valueOf(0) : DoubleNode.valueOf(value);
  }
}
