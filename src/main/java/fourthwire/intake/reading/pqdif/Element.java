package fourthwire.intake.reading.pqdif;

import java.nio.ByteBuffer;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.UUID;

/** An element of a record's tree: a collection of others, or values. */
sealed interface Element {
  /** Its tag. */
  UUID tag();

  /** Elements under tags. */
  record Collection(UUID tag, List<Element> elements) implements Element {
    /** The collections of this tag, in order. */
    List<Collection> collections(UUID of) {
      return elements.stream()
          .filter(e -> e.tag().equals(of))
          .filter(Collection.class::isInstance)
          .map(Collection.class::cast)
          .toList();
    }

    /** The first collection of this tag. */
    Optional<Collection> collection(UUID of) {
      return collections(of).stream().findFirst();
    }

    /** The first values of this tag. */
    Optional<Values> values(UUID of) {
      return elements.stream()
          .filter(e -> e.tag().equals(of))
          .filter(Values.class::isInstance)
          .map(Values.class::cast)
          .findFirst();
    }

    /** The first number of this tag. */
    OptionalDouble number(UUID of) {
      Optional<Values> found = values(of).filter(v -> v.count() > 0 && v.isNumeric());
      return found.isPresent() ? OptionalDouble.of(found.get().number(0)) : OptionalDouble.empty();
    }

    /** The identifier of this tag. */
    Optional<UUID> identifier(UUID of) {
      return values(of).filter(v -> v.type() == Physical.GUID && v.count() > 0).map(Values::guid);
    }

    /** The text of this tag; empty text for none. */
    String text(UUID of) {
      return values(of).filter(Values::isText).map(Values::text).orElse("");
    }
  }

  /**
   * A scalar, or a vector of them.
   *
   * @param at where they stand in the body
   */
  record Values(UUID tag, Physical type, ByteBuffer body, int at, int count) implements Element {
    private static final Instant EPOCH = Instant.parse("1900-01-01T00:00:00Z");
    private static final double NANO = 1e9;

    boolean isNumeric() {
      return type != Physical.GUID && !isText();
    }

    boolean isText() {
      return type == Physical.CHAR1 || type == Physical.CHAR2;
    }

    /** One number; of a moment, seconds after 1900. */
    double number(int k) {
      int p = at + k * type.bytes();
      return switch (type) {
        case BOOLEAN1, INTEGER1 -> body.get(p);
        case UNSIGNED1, CHAR1 -> body.get(p) & 0xFF;
        case BOOLEAN2, INTEGER2 -> body.getShort(p);
        case UNSIGNED2, CHAR2 -> body.getShort(p) & 0xFFFF;
        case BOOLEAN4, INTEGER4 -> body.getInt(p);
        case UNSIGNED4 -> body.getInt(p) & 0xFFFFFFFFL;
        case REAL4, COMPLEX8 -> body.getFloat(p);
        case REAL8, COMPLEX16 -> body.getDouble(p);
        case MOMENT -> 86400.0 * (body.getInt(p) & 0xFFFFFFFFL) + body.getDouble(p + 4);
        case GUID -> Double.NaN;
      };
    }

    /** One moment: days after the first of January 1900 and seconds of the day. */
    Instant moment(int k) {
      int p = at + k * type.bytes();
      double seconds = body.getDouble(p + 4);
      if (!(seconds >= 0 && seconds < 2 * 86400)) {
        throw new PqdifException("A time of day of " + seconds + " s is none.");
      }
      return EPOCH
          .plus(Duration.ofDays(body.getInt(p) & 0xFFFFFFFFL))
          .plusNanos(Math.round(seconds * NANO));
    }

    UUID guid() {
      return RecordChain.guid(body, at);
    }

    String text() {
      StringBuilder text = new StringBuilder();
      for (int k = 0; k < count && number(k) != 0; k++) {
        text.append((char) number(k));
      }
      return text.toString().trim();
    }
  }
}
