package fourthwire.intake.reading.log;

import fourthwire.intake.reading.format.Progress;
import java.util.Locale;
import java.util.function.BiPredicate;
import java.util.function.LongSupplier;

/** Tells how far the reading of rows is: rows, rows a second, time left. */
final class RowProgress {
  /** Share of a whole reading that taking in the rows is. */
  static final double SHARE = 0.7;

  private final BiPredicate<Double, String> listener;
  private final long fileBytes;
  private final LongSupplier nanoTime;
  private final long begun;

  RowProgress(BiPredicate<Double, String> listener, long fileBytes, LongSupplier nanoTime) {
    this.listener = listener;
    this.fileBytes = fileBytes;
    this.nanoTime = nanoTime;
    this.begun = nanoTime.getAsLong();
  }

  /** So many rows and bytes are read; stops the reading where that is asked for. */
  void at(long rows, long bytes) {
    double seconds = (nanoTime.getAsLong() - begun) * 1e-9;
    double share = fileBytes > 0 ? Math.min(1, (double) bytes / fileBytes) : 0;
    String left =
        share > 0 && seconds > 1
            ? String.format(Locale.ROOT, ", %.0f s left", seconds / share * (1 - share))
            : "";
    String rate =
        seconds > 0.2 ? String.format(Locale.ROOT, ", %,.0f a second", rows / seconds) : "";
    Progress.go(
        listener,
        SHARE * share,
        String.format(Locale.ROOT, "reading rows: %,d", rows) + rate + left);
  }
}
