package fourthwire.metering.capture;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.metering.CaptureResult;
import fourthwire.metering.VoltageEvents.Event;
import fourthwire.metering.VoltageEvents.Kind;
import fourthwire.metering.capture.wave.Samples;
import fourthwire.metering.capture.wave.TimeAxis;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;

/**
 * Events made by formula, 230 V: thresholds 90, 110 and 10 %, hysteresis 2 % (IEC 61000-4-30:2015,
 * 5.4 and 5.5, from memory). A change is seen within the cycle that Urms(1/2) looks back on.
 */
class EventFinderTest {
  private static final double CYCLE_S = 0.02;

  /** Three lines; the share of 230 V on L1 over time, and on the others. */
  private static CaptureResult of(
      double seconds, DoubleUnaryOperator first, DoubleUnaryOperator others) {
    double rate = 6400;
    int n = (int) (seconds * rate);
    List<Capture.Channel> channels = new ArrayList<>();
    List<Samples> samples = new ArrayList<>();
    for (int line = 0; line < 3; line++) {
      DoubleUnaryOperator share = line == 0 ? first : others;
      double[] x = new double[n];
      for (int k = 0; k < n; k++) {
        double t = k / rate;
        x[k] =
            share.applyAsDouble(t)
                * Math.sqrt(2)
                * 230
                * Math.sin(2 * Math.PI * (50 * t - line / 3.0));
      }
      channels.add(new Capture.Channel("U" + line, "L" + (line + 1) + ".v"));
      samples.add(Samples.of(x));
    }
    Capture capture = new Capture(Optional.empty(), TimeAxis.even(rate, n), channels, samples);
    return CaptureAnalysis.of(capture, 50, OptionalDouble.of(230), List.of())
        .capture()
        .orElseThrow();
  }

  private static DoubleUnaryOperator between(double from, double to, double share) {
    return t -> t >= from && t < to ? share : 1;
  }

  @Test
  void aDipOfOneLineIsOneEventOfItsDepthAndLength() {
    CaptureResult r = of(3, between(1.003, 1.203, 0.6), t -> 1);
    assertThat(r.events().events()).hasSize(1);
    Event dip = r.events().events().get(0);
    assertThat(dip.kind()).isEqualTo(Kind.DIP);
    assertThat(dip.place()).isEqualTo("L1");
    assertThat(dip.extremeV()).isEqualTo(138, within(0.1));
    assertThat(dip.percent()).isEqualTo(60, within(0.1));
    assertThat(dip.fromS()).isEqualTo(1.003, within(CYCLE_S));
    assertThat(dip.durationS()).isEqualTo(0.2, within(CYCLE_S + 0.005));
    assertThat(dip.whole()).isTrue();
  }

  @Test
  void aSwellAndAnInterruptionAreToldApart() {
    DoubleUnaryOperator both =
        t -> between(0.5, 0.7, 1.2).applyAsDouble(t) * between(1.5, 2.1, 0.02).applyAsDouble(t);
    CaptureResult r = of(4, both, both);
    assertThat(r.events().events())
        .extracting(Event::kind)
        .containsExactly(Kind.SWELL, Kind.DIP, Kind.INTERRUPTION);
    assertThat(r.events().events().get(2).durationS()).isEqualTo(0.6, within(2 * CYCLE_S));
    // The clock runs on through the time without a voltage.
    assertThat(r.frequencyHz()).isEqualTo(50, within(0.02));
  }

  @Test
  void aVoltageWithinTheHysteresisGoesOnWithTheDip() {
    DoubleUnaryOperator share =
        t -> between(1, 1.2, 0.8).applyAsDouble(t) * between(1.2, 1.4, 0.91).applyAsDouble(t);
    CaptureResult r = of(3, share, t -> 1);
    assertThat(r.events().events()).hasSize(1);
    assertThat(r.events().events().get(0).durationS()).isEqualTo(0.4, within(2 * CYCLE_S));
  }

  @Test
  void aSteadyRecordHasNone() {
    CaptureResult r = of(1, t -> 1, t -> 1.05);
    assertThat(r.events().events()).isEmpty();
    assertThat(r.events().lowestV().get("L1")).isEqualTo(230, within(0.05));
    assertThat(r.events().highestV().get("L2")).isEqualTo(241.5, within(0.05));
  }
}
