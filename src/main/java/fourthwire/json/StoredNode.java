package fourthwire.json;

import fourthwire.audit.NodeResult;
import fourthwire.audit.NodeSummary;

/** A node's result and its row of the audit's list as they are stored, small. */
public final class StoredNode {
  private StoredNode() {}

  /** A result's stored form. */
  public static byte[] bytes(NodeResult result) {
    return DeflatedText.of(text(result));
  }

  /** A row's stored form. */
  public static byte[] bytes(NodeSummary row) {
    return DeflatedText.of(text(row));
  }

  /** The result that a stored form holds. */
  public static NodeResult result(byte[] bytes) {
    return NodeJson.read(DeflatedText.text(bytes));
  }

  /** The row that a stored form holds. */
  public static NodeSummary row(byte[] bytes) {
    return SummaryJson.read(DeflatedText.text(bytes));
  }

  static String text(NodeResult result) {
    return CompactNode.of(NodeJson.write(result)).toString();
  }

  static String text(NodeSummary row) {
    return CompactNode.of(SummaryJson.write(row)).toString();
  }
}
