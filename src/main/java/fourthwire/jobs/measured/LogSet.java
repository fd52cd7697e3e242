package fourthwire.jobs.measured;

import fourthwire.metering.Correction;
import fourthwire.metering.LogResult;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.correction.CorrectionRepository;
import java.util.List;

/**
 * Which set of a log's figures is used: as read, or as corrected where corrections hold.
 *
 * @param log its figures
 * @param corrections that hold
 */
record LogSet(LogResult log, List<Correction> corrections) {
  static LogSet of(ReadingRepository.Entry entry, CorrectionRepository corrections) {
    List<Correction> holding =
        corrections.ofReading(entry.id()).stream()
            .filter(CorrectionRepository.Entry::holds)
            .map(CorrectionRepository.Entry::correction)
            .toList();
    LogResult read = entry.reading().log().orElseThrow();
    return new LogSet(
        corrections.cleaned(entry.id()).map(CorrectionRepository.Cleaned::log).orElse(read),
        holding);
  }

  /** Which it is, in words. */
  String words() {
    return corrections.isEmpty()
        ? "as read"
        : corrections.size() == 1
            ? "as corrected (one correction)"
            : "as corrected (" + corrections.size() + " corrections)";
  }
}
