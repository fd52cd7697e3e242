package fourthwire.intake.reading;

import fourthwire.metering.Reading;
import java.util.function.BiPredicate;

/** A text file of rows: an interval log, or a capture of instantaneous values. */
final class TextFormat implements Format {
  private final Part part;

  private TextFormat(Part part) {
    this.part = part;
  }

  static TextFormat of(Part part) {
    return new TextFormat(part);
  }

  @Override
  public ReadingPlan plan(ReadingSetting setting) {
    throw new ReadingRefusedException(part.name() + ": CSV files are not read yet.");
  }

  @Override
  public Reading read(
      ReadingPlan plan, ReadingSetting setting, BiPredicate<Double, String> progress) {
    throw new ReadingRefusedException(part.name() + ": CSV files are not read yet.");
  }
}
