package fourthwire.intake.survey;

import fourthwire.site.check.SurveyError;

/** The limits a survey file is held to, and the count of what was read so far. */
final class Guards {
  /** The most bytes of a file, packed or unpacked: 200 MB. */
  static final long MOST_BYTES = 200_000_000;

  /** The most rows of all tables together, headers and blank rows included. */
  static final int MOST_ROWS = 1_000_000;

  /** Deflate packs a written survey 5 to 60 times; far more than that is no survey. */
  private static final long MOST_RATIO = 100;

  /** Below this size any ratio is harmless. */
  private static final long HARMLESS_BYTES = 20_000_000;

  private static final String CAPS =
      " A survey may have at most 200 MB, unpacked, and 1,000,000 rows.";

  private final long packedBytes;
  private final long mostBytes;
  private long unpackedBytes;
  private int rows;

  private Guards(long packedBytes, long mostBytes) {
    this.packedBytes = packedBytes;
    this.mostBytes = mostBytes;
  }

  /** Guards for a file of this size. */
  static Guards of(long packedBytes) throws RefusedException {
    if (packedBytes > MOST_BYTES) {
      throw refusal("The file is too large." + CAPS);
    }
    return new Guards(packedBytes, MOST_BYTES);
  }

  /** No limits, for files of our own making. */
  static Guards none() {
    return new Guards(Long.MAX_VALUE / MOST_RATIO, Long.MAX_VALUE);
  }

  void countUnpacked(long bytes) throws RefusedException {
    unpackedBytes += bytes;
    if (unpackedBytes > mostBytes) {
      throw refusal("The file unpacks to more than 200 MB." + CAPS);
    }
    if (unpackedBytes > HARMLESS_BYTES && unpackedBytes > MOST_RATIO * packedBytes) {
      throw refusal(
          "The file unpacks to more than 100 times its size, as no written survey does." + CAPS);
    }
  }

  /** Counts a row of this table. */
  void countRow(String table) throws RefusedException {
    if (++rows > MOST_ROWS) {
      throw new RefusedException(
          SurveyError.ofTable(
              table,
              "With this table the survey has more than 1,000,000 rows; it was read no further."
                  + CAPS));
    }
  }

  /** Whether no more rows can be read. */
  boolean isOverRows() {
    return rows > MOST_ROWS;
  }

  private static RefusedException refusal(String message) {
    return new RefusedException(SurveyError.ofFile(message));
  }
}
