package fourthwire.intake.reading.pqdif;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.UUID;

/**
 * Reads the tree in a record's body: a count, and so many entries of 28 bytes, each with its tag,
 * its kind, its physical type, and its value or the place where that stands.
 */
final class Tree {
  private static final int ENTRY = 28;
  private static final int COLLECTION = 1;
  private static final int SCALAR = 2;
  private static final int VECTOR = 3;
  private static final int DEEPEST = 12;
  private static final int MOST_ELEMENTS = 500_000;

  private final ByteBuffer body;
  private int elements;

  private Tree(byte[] body) {
    this.body = ByteBuffer.wrap(body).order(ByteOrder.LITTLE_ENDIAN);
  }

  /** The record's own collection. */
  static Element.Collection of(RecordChain.Record record) {
    Tree tree = new Tree(record.body());
    return new Element.Collection(record.type(), tree.collection(0, 0));
  }

  private PqdifException damaged(String what) {
    return new PqdifException("The file is damaged: " + what + ".");
  }

  private List<Element> collection(int at, int depth) {
    if (depth > DEEPEST || at < 0 || at > body.capacity() - 4) {
      throw damaged("a collection stands outside its record, or in itself");
    }
    int count = body.getInt(at);
    if (count < 0 || (long) count * ENTRY > body.capacity() - 4 - at) {
      throw damaged("a collection of " + count + " elements is longer than its record");
    }
    elements += count;
    if (elements > MOST_ELEMENTS) {
      throw damaged("a record of more than " + MOST_ELEMENTS + " elements");
    }
    List<Element> found = new ArrayList<>();
    for (int k = 0; k < count; k++) {
      element(at + 4 + k * ENTRY, depth).ifPresent(found::add);
    }
    return found;
  }

  /** Kinds and types that are not known are passed over. */
  private Optional<Element> element(int at, int depth) {
    UUID tag = RecordChain.guid(body, at);
    int kind = body.get(at + 16);
    Optional<Physical> type = Physical.find(body.get(at + 17) & 0xFF);
    boolean embedded = body.get(at + 18) != 0;
    int link = body.getInt(at + 20);
    if (kind == COLLECTION) {
      return Optional.of(new Element.Collection(tag, collection(link, depth + 1)));
    }
    return type.flatMap(
        t ->
            switch (kind) {
              case SCALAR ->
                  Optional.of(values(tag, t, embedded && t.bytes() <= 8 ? at + 20 : link, 1));
              case VECTOR -> Optional.of(vector(tag, t, link));
              default -> Optional.empty();
            });
  }

  private Element vector(UUID tag, Physical type, int link) {
    if (link < 0 || link > body.capacity() - 4) {
      throw damaged("a vector stands outside its record");
    }
    return values(tag, type, link + 4, body.getInt(link));
  }

  private Element values(UUID tag, Physical type, int at, int count) {
    if (at < 0 || count < 0 || at + (long) count * type.bytes() > body.capacity()) {
      throw damaged("a vector of " + count + " values is longer than its record");
    }
    return new Element.Values(tag, type, body, at, count);
  }
}
