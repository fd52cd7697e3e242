package fourthwire.intake.reading.pqdif;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.UUID;
import java.util.zip.DataFormatException;
import java.util.zip.Inflater;

/**
 * The physical layer: records one after the other, each with a header of signature, type, sizes and
 * the place of the next; the body plain, or compressed by zlib.
 */
final class RecordChain {
  static final UUID SIGNATURE = UUID.fromString("4a111440-e49f-11cf-9900-505144494600");
  private static final int HEADER = 64;
  private static final int MOST_RECORDS = 100_000;
  private static final long MOST_BYTES = 300_000_000;
  private static final int ZLIB = 0x78;

  private final ByteBuffer file;
  private final List<Record> records = new ArrayList<>();
  private boolean cut;
  private long unpacked;

  /** A record's type and its body, unpacked. */
  record Record(UUID type, byte[] body) {
    @Override
    public boolean equals(Object other) {
      return other instanceof Record r && type.equals(r.type) && Arrays.equals(body, r.body);
    }

    @Override
    public int hashCode() {
      return 31 * type.hashCode() + Arrays.hashCode(body);
    }

    @Override
    public String toString() {
      return "Record[" + type + ", " + body.length + " bytes]";
    }
  }

  private RecordChain(byte[] file) {
    this.file = ByteBuffer.wrap(file).order(ByteOrder.LITTLE_ENDIAN);
  }

  /** Whether a file begins as a record does. */
  static boolean isOne(byte[] start) {
    return start.length >= 16
        && guid(ByteBuffer.wrap(start).order(ByteOrder.LITTLE_ENDIAN), 0).equals(SIGNATURE);
  }

  static RecordChain of(byte[] file) {
    RecordChain chain = new RecordChain(file);
    chain.follow();
    return chain;
  }

  List<Record> records() {
    return records;
  }

  /** Whether the file ends, or a record is damaged, before the chain does. */
  boolean isCut() {
    return cut;
  }

  /** The first three fields of an identifier stand little-endian, the rest byte by byte. */
  static UUID guid(ByteBuffer in, int at) {
    long high =
        (in.getInt(at) & 0xFFFFFFFFL) << 32
            | (in.getShort(at + 4) & 0xFFFFL) << 16
            | in.getShort(at + 6) & 0xFFFFL;
    long low = 0;
    for (int k = 8; k < 16; k++) {
      low = low << 8 | in.get(at + k) & 0xFF;
    }
    return new UUID(high, low);
  }

  private void follow() {
    int at = 0;
    do {
      if (at + HEADER > file.capacity() || !guid(file, at).equals(SIGNATURE)) {
        cut = true;
        return;
      }
      UUID type = guid(file, at + 16);
      int header = file.getInt(at + 32);
      int size = file.getInt(at + 36);
      int next = file.getInt(at + 40);
      if (header < HEADER || size < 0 || (long) at + header + size > file.capacity()) {
        cut = true;
        return;
      }
      add(type, Arrays.copyOfRange(file.array(), at + header, at + header + size));
      // A chain runs forward through the file; anything else would never end.
      cut = next != 0 && next <= at;
      at = next;
    } while (at > 0 && !cut);
  }

  private void add(UUID type, byte[] body) {
    if (records.size() >= MOST_RECORDS) {
      throw new PqdifException("The file has more than " + MOST_RECORDS + " records.");
    }
    records.add(new Record(type, body.length > 0 && body[0] == ZLIB ? inflated(body) : body));
  }

  /** As it is where it only looks compressed: then its tree is read, or found damaged. */
  private byte[] inflated(byte[] body) {
    Inflater inflater = new Inflater();
    inflater.setInput(body);
    byte[] out = new byte[Math.max(1024, (int) Math.min(MOST_BYTES, 4L * body.length))];
    int length = 0;
    try {
      int got = inflater.inflate(out);
      while (got > 0) {
        length += got;
        if (unpacked + length > MOST_BYTES) {
          throw new PqdifException(
              "The file unpacks to more than " + MOST_BYTES / 1_000_000 + " MB.");
        }
        if (length == out.length) {
          out = Arrays.copyOf(out, (int) Math.min(MOST_BYTES + 1, 2L * length));
        }
        got = inflater.inflate(out, length, out.length - length);
      }
      boolean whole = inflater.finished();
      unpacked += length;
      return whole ? Arrays.copyOf(out, length) : body;
    } catch (DataFormatException e) {
      return body;
    } finally {
      inflater.end();
    }
  }
}
