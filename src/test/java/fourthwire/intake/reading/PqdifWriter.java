package fourthwire.intake.reading;

import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.UUID;
import java.util.zip.Deflater;

/**
 * Writes PQDIF files for tests (IEEE 1159.3-2003, from memory), from its own reading of the layout:
 * it shares no code with the reader. Identifiers are spelled out in full.
 */
final class PqdifWriter {
  private static final String FAMILY = "-11cf-9d89-0080c72e70a3";
  private static final int UNSIGNED4 = 32;
  private static final int REAL8 = 41;
  private static final int MOMENT = 50;
  private static final int GUID = 60;

  private final List<Node> definitions = new ArrayList<>();
  private final boolean compressed;

  PqdifWriter(boolean compressed) {
    this.compressed = compressed;
  }

  /** An element: children, or a type with its bytes. */
  private record Node(UUID tag, List<Node> children, int type, byte[] bytes, int count) {}

  static UUID tag(String begin) {
    return UUID.fromString(begin + FAMILY);
  }

  private static Node collection(String tag, List<Node> children) {
    return new Node(tag(tag), children, 0, new byte[0], -1);
  }

  private static Node number(String tag, long value) {
    return new Node(tag(tag), List.of(), UNSIGNED4, little(4).putInt((int) value).array(), 0);
  }

  private static Node real(String tag, double value) {
    return new Node(tag(tag), List.of(), REAL8, little(8).putDouble(value).array(), 0);
  }

  private static Node reals(String tag, double[] values) {
    ByteBuffer out = little(8 * values.length);
    for (double v : values) {
      out.putDouble(v);
    }
    return new Node(tag(tag), List.of(), REAL8, out.array(), values.length);
  }

  private static Node shorts(String tag, int[] values) {
    ByteBuffer out = little(2 * values.length);
    for (int v : values) {
      out.putShort((short) v);
    }
    return new Node(tag(tag), List.of(), 21, out.array(), values.length);
  }

  private static Node text(String tag, String text) {
    byte[] bytes = (text + "\0").getBytes(StandardCharsets.ISO_8859_1);
    return new Node(tag(tag), List.of(), 10, bytes, bytes.length);
  }

  private static Node identifier(String tag, UUID value) {
    return new Node(tag(tag), List.of(), GUID, bytes(value), 0);
  }

  private static Node moment(String tag, Instant at) {
    Duration since = Duration.between(Instant.parse("1900-01-01T00:00:00Z"), at);
    ByteBuffer out = little(12).putInt((int) since.toDays());
    out.putDouble((since.getSeconds() % 86400) + since.getNano() * 1e-9);
    return new Node(tag(tag), List.of(), MOMENT, out.array(), 0);
  }

  private static ByteBuffer little(int bytes) {
    return ByteBuffer.allocate(bytes).order(ByteOrder.LITTLE_ENDIAN);
  }

  private static byte[] bytes(UUID id) {
    ByteBuffer out = little(16);
    out.putInt((int) (id.getMostSignificantBits() >>> 32));
    out.putShort((short) (id.getMostSignificantBits() >>> 16));
    out.putShort((short) id.getMostSignificantBits());
    return out.order(ByteOrder.BIG_ENDIAN).putLong(id.getLeastSignificantBits()).array();
  }

  /**
   * Defines a channel of a time series and further ones.
   *
   * @param phase number
   * @param measured 1 voltage, 2 current
   * @param unit number
   * @param characteristic first part of the identifier, of the family of characteristics
   * @param valueTypes first parts of the identifiers of its series
   */
  void define(
      String name,
      boolean waveform,
      int phase,
      int measured,
      int unit,
      String characteristic,
      boolean scaled,
      String... valueTypes) {
    List<Node> series = new ArrayList<>();
    series.add(
        collection(
            "b48d859a-f5f5",
            List.of(
                number("b48d859b-f5f5", 2),
                identifier("b48d859c-f5f5", tag("c690e862-f755")),
                number("b48d85a1-f5f5", waveform ? 4 : 1))));
    for (String type : valueTypes) {
      series.add(
          collection(
              "b48d859a-f5f5",
              List.of(
                  number("b48d859b-f5f5", unit),
                  identifier("b48d859c-f5f5", tag(type)),
                  identifier(
                      "3d786f9e-f76e",
                      UUID.fromString(characteristic + "-b451-11d1-ae17-0060083a2628")),
                  number("b48d85a1-f5f5", scaled ? 3 : 1))));
    }
    definitions.add(
        collection(
            "b48d858e-f5f5",
            List.of(
                text("b48d8590-f5f5", name),
                number("b48d8591-f5f5", phase),
                identifier("b48d8592-f5f5", tag(waveform ? "67f6af80-f753" : "67f6af82-f753")),
                number("c690e872-f755", measured),
                collection("b48d8598-f5f5", series))));
  }

  /** A channel's values in an observation: times as a run or as they are, then each series. */
  Instance instance(int definition) {
    return new Instance(definition);
  }

  /** Values of a channel. */
  static final class Instance {
    private final int definition;
    private final List<Node> series = new ArrayList<>();

    private Instance(int definition) {
      this.definition = definition;
    }

    Instance even(int count, double stepS) {
      series.add(
          collection(
              "3d786f95-f76e",
              List.of(PqdifWriter.reals("3d786f99-f76e", new double[] {1, count, stepS}))));
      return this;
    }

    Instance reals(double... values) {
      series.add(collection("3d786f95-f76e", List.of(PqdifWriter.reals("3d786f99-f76e", values))));
      return this;
    }

    Instance scaled(double scale, double offset, int... values) {
      series.add(
          collection(
              "3d786f95-f76e",
              List.of(
                  real("3d786f96-f76e", scale),
                  real("62f28182-f9c4", offset),
                  shorts("3d786f99-f76e", values))));
      return this;
    }

    /** The time series of another channel's instance. */
    Instance shared(int instance) {
      series.add(
          collection(
              "3d786f95-f76e",
              List.of(number("8973861f-f1c3", instance), number("89738620-f1c3", 0))));
      return this;
    }

    private Node node() {
      return collection(
          "3d786f92-f76e",
          List.of(number("b48d858f-f5f5", definition), collection("3d786f93-f76e", series)));
    }
  }

  /** An observation. */
  record Observation(String name, Instant start, List<Instance> instances) {}

  byte[] file(List<Observation> observations) {
    List<byte[]> bodies = new ArrayList<>();
    List<UUID> types = new ArrayList<>();
    types.add(tag("89738606-f1c3"));
    bodies.add(
        body(List.of(text("89738608-f1c3", "test"), number("8973861c-f1c3", compressed ? 1 : 0))));
    types.add(tag("89738619-f1c3"));
    bodies.add(
        body(List.of(text("b48d8587-f5f5", "meter"), collection("b48d858d-f5f5", definitions))));
    for (Observation o : observations) {
      types.add(tag("8973861a-f1c3"));
      bodies.add(
          body(
              List.of(
                  text("3d786f8a-f76e", o.name()),
                  moment("3d786f8c-f76e", o.start()),
                  collection(
                      "3d786f91-f76e", o.instances().stream().map(Instance::node).toList()))));
    }
    return chained(types, bodies);
  }

  private byte[] chained(List<UUID> types, List<byte[]> bodies) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    for (int k = 0; k < bodies.size(); k++) {
      // The container stays plain: it says that the rest is compressed.
      byte[] body = compressed && k > 0 ? deflated(bodies.get(k)) : bodies.get(k);
      int next = k == bodies.size() - 1 ? 0 : out.size() + 64 + body.length;
      ByteBuffer header = little(64);
      header.put(bytes(UUID.fromString("4a111440-e49f-11cf-9900-505144494600")));
      header.put(bytes(types.get(k))).putInt(64).putInt(body.length).putInt(next);
      out.writeBytes(header.array());
      out.writeBytes(body);
    }
    return out.toByteArray();
  }

  private static byte[] deflated(byte[] body) {
    Deflater deflater = new Deflater();
    deflater.setInput(body);
    deflater.finish();
    byte[] out = new byte[body.length + 100];
    int length = deflater.deflate(out);
    deflater.end();
    return java.util.Arrays.copyOf(out, length);
  }

  private static byte[] body(List<Node> elements) {
    ByteBuffer out = little(4_000_000);
    collection(out, elements);
    return java.util.Arrays.copyOf(out.array(), out.position());
  }

  private static void collection(ByteBuffer out, List<Node> elements) {
    int at = out.position();
    out.putInt(elements.size());
    out.position(at + 4 + 28 * elements.size());
    for (int k = 0; k < elements.size(); k++) {
      Node e = elements.get(k);
      int entry = at + 4 + 28 * k;
      byte[] tag = bytes(e.tag());
      for (int b = 0; b < 16; b++) {
        out.put(entry + b, tag[b]);
      }
      boolean embedded = e.count() == 0 && e.bytes().length <= 8;
      out.put(entry + 16, (byte) (e.count() < 0 ? 1 : e.count() == 0 ? 2 : 3));
      out.put(entry + 17, (byte) e.type());
      out.put(entry + 18, (byte) (embedded ? 1 : 0));
      if (embedded) {
        for (int b = 0; b < e.bytes().length; b++) {
          out.put(entry + 20 + b, e.bytes()[b]);
        }
      } else {
        out.putInt(entry + 20, out.position());
        place(out, e);
      }
    }
  }

  private static void place(ByteBuffer out, Node e) {
    if (e.count() < 0) {
      collection(out, e.children());
    } else {
      if (e.count() > 0) {
        out.putInt(e.count());
      }
      out.put(e.bytes());
      out.position((out.position() + 3) / 4 * 4);
    }
  }
}
