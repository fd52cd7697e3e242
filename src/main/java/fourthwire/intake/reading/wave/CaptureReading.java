package fourthwire.intake.reading.wave;

import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.intake.reading.format.Progress;
import fourthwire.metering.Reading;
import fourthwire.metering.capture.Capture;
import fourthwire.metering.capture.CaptureAnalysis;
import fourthwire.metering.capture.fit.NoFundamentalException;
import fourthwire.quantity.Conductor;
import java.util.ArrayList;
import java.util.List;
import java.util.function.BiPredicate;
import java.util.stream.Collectors;

/** From a capture, whatever format it came in, to its reading. */
final class CaptureReading {
  private CaptureReading() {}

  static Reading of(
      Capture capture,
      ReadingSetting setting,
      List<String> notes,
      BiPredicate<Double, String> progress) {
    Progress.go(progress, 0.5, "analysing the waveforms");
    List<Conductor> reversed =
        setting.ctReversed().stream().filter(c -> capture.nameOf(c + ".i").isPresent()).toList();
    List<String> all = new ArrayList<>(notes);
    if (!reversed.isEmpty()) {
      all.add(
          "Turned, as the meter's ct_reversed says: "
              + reversed.stream().map(Conductor::name).collect(Collectors.joining(", "))
              + ".");
    }
    try {
      return CaptureAnalysis.of(
          capture.turned(reversed.stream().map(c -> c + ".i").toList()),
          setting.nominalHz(),
          setting.nominalV(),
          all);
    } catch (NoFundamentalException e) {
      throw new ReadingRefusedException(String.valueOf(e.getMessage()));
    }
  }
}
