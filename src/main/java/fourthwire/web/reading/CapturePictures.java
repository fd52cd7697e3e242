package fourthwire.web.reading;

import fourthwire.metering.CaptureResult;
import fourthwire.metering.WaveformPicture;
import fourthwire.quantity.Conductor;
import fourthwire.web.figure.EnvelopePlot;
import fourthwire.web.figure.PhasorPlot;
import fourthwire.web.figure.PhasorPlot.Arrow;
import fourthwire.web.support.Names;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.List;

/** Draws a capture: its waveforms, and its fundamental phasors. */
final class CapturePictures {
  private static final double SMALLEST_ARROW = 0.01;

  private final Words words;
  private final Names names;

  CapturePictures(Words words, Names names) {
    this.words = words;
    this.names = names;
  }

  /** Those of the first cycles. */
  ReadingPage.Waves first(WaveformPicture picture) {
    return new ReadingPage.Waves(
        waves(picture, ".v", "V", "reading.waves.first.voltage"),
        waves(picture, ".i", "A", "reading.waves.first.current"));
  }

  /** Those of the whole record. */
  ReadingPage.Waves whole(WaveformPicture picture) {
    return new ReadingPage.Waves(
        waves(picture, ".v", "V", "reading.waves.whole.voltage"),
        waves(picture, ".i", "A", "reading.waves.whole.current"));
  }

  private String waves(WaveformPicture picture, String kind, String unit, String alternative) {
    List<EnvelopePlot.Trace> traces =
        picture.channels().entrySet().stream()
            .filter(e -> e.getKey().endsWith(kind))
            .map(e -> trace(e.getKey(), e.getValue()))
            .toList();
    return traces.isEmpty()
        ? ""
        : EnvelopePlot.draw(traces, picture.stepS(), unit, words.of(alternative));
  }

  private static EnvelopePlot.Trace trace(String quantity, WaveformPicture.Trace values) {
    return new EnvelopePlot.Trace(conductor(quantity), values);
  }

  /** Of a place or a quantity; of two lines, the first. */
  static Conductor conductor(String place) {
    return Conductor.valueOf(place.split("[-.]")[0]);
  }

  String phasors(CaptureResult capture) {
    List<Arrow> arrows = new ArrayList<>();
    capture
        .voltageSpectrum()
        .forEach(
            (place, s) ->
                arrows.add(new Arrow("U " + names.of(place), conductor(place), true, s.at(1))));
    capture
        .spectrum()
        .forEach((c, s) -> arrows.add(new Arrow("I " + names.of(c), c, false, s.at(1))));
    List<Arrow> shown =
        arrows.stream()
            .filter(a -> a.phasor().magnitude() > SMALLEST_ARROW * largest(arrows, a))
            .toList();
    return shown.isEmpty() ? "" : PhasorPlot.draw(shown, words.of("reading.phasors.alternative"));
  }

  private static double largest(List<Arrow> arrows, Arrow like) {
    return arrows.stream()
        .filter(a -> a.isVoltage() == like.isVoltage())
        .mapToDouble(a -> a.phasor().magnitude())
        .max()
        .orElse(0);
  }
}
