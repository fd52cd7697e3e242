package fourthwire.metering;

import java.util.Arrays;
import java.util.Optional;

/** What a meter's file holds. */
public enum ReadingKind {
  /** Rows of mean, lowest or highest values over intervals of seconds to an hour. */
  LOG("log"),
  /** Instantaneous values of a few cycles or more. */
  CAPTURE("capture");

  private final String word;

  ReadingKind(String word) {
    this.word = word;
  }

  /** The word used in the public interface. */
  public String word() {
    return word;
  }

  /** The kind of this word. */
  public static Optional<ReadingKind> find(String word) {
    return Arrays.stream(values()).filter(k -> k.word.equals(word)).findFirst();
  }
}
