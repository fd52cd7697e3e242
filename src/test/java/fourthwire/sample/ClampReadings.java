package fourthwire.sample;

import fourthwire.audit.AuditResult;
import fourthwire.audit.DesignState;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Waveform;
import fourthwire.site.Instrument;
import fourthwire.site.SpotReading;
import java.time.LocalDateTime;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;

/**
 * Clamp readings of one working morning, a few minutes from board to board: design figures, times
 * what the schedules leave, times 3 % of doubt. One of them was taken with an instrument that
 * averages and so reads a pulsed current low: its readings are worked out from the waveform.
 */
final class ClampReadings {
  private static final LocalDateTime START = LocalDateTime.of(2026, 3, 3, 9, 30);
  private static final double SPREAD = 0.03;

  /** Rms of a sine on the mean of its rectified value, by which an averaging instrument is set. */
  private static final double SINE_FORM_FACTOR = Math.PI / (2 * Math.sqrt(2));

  private static final int SAMPLES = 1024;

  private final AuditResult audit;
  private final Occupancy occupancy;
  private final Random random;

  ClampReadings(AuditResult audit, Occupancy occupancy, long seed) {
    this.audit = audit;
    this.occupancy = occupancy;
    this.random = new Random(seed);
  }

  /** True-rms readings at these nodes in turn, then one at the last place by an averaging clamp. */
  List<SpotReading> at(List<String> nodes, String averaged) {
    List<SpotReading> readings = new ArrayList<>();
    LocalDateTime time = START;
    for (String node : nodes) {
      readings.add(reading(node, time, Instrument.TRUE_RMS));
      time = time.plusMinutes(4 + random.nextInt(5));
    }
    readings.add(reading(averaged, time, Instrument.AVERAGE_RESPONDING));
    return readings;
  }

  private SpotReading reading(String node, LocalDateTime time, Instrument instrument) {
    DesignState design = DemoSurvey.node(audit, node).design().orElseThrow();
    Figures figures = new Figures(design);
    boolean power = instrument == Instrument.TRUE_RMS && figures.has(Conductor.L3);
    double share = occupancy.all(node, time);
    return new SpotReading(
        node,
        Optional.of(time),
        amps(design, Conductor.L1, share, instrument),
        amps(design, Conductor.L2, share, instrument),
        amps(design, Conductor.L3, share, instrument),
        amps(design, Conductor.N, occupancy.neutral(node, time), instrument),
        volts(figures, Conductor.L1),
        volts(figures, Conductor.L2),
        volts(figures, Conductor.L3),
        power ? read(figures.activeW() / 1000 * share) : OptionalDouble.empty(),
        OptionalDouble.empty(),
        OptionalDouble.empty(),
        Optional.of(instrument));
  }

  private OptionalDouble amps(
      DesignState design, Conductor conductor, double share, Instrument instrument) {
    Figures figures = new Figures(design);
    if (!design.currentSpectrum().containsKey(conductor)) {
      return OptionalDouble.empty();
    }
    double shown =
        instrument == Instrument.AVERAGE_RESPONDING ? averagingError(design, conductor) : 1;
    return read(figures.rmsA(conductor) * share * shown);
  }

  /** What an averaging instrument shows on the true rms. */
  private static double averagingError(DesignState design, Conductor conductor) {
    Waveform wave = Waveform.of(design.currentSpectrum().get(conductor), SAMPLES);
    double mean = Arrays.stream(wave.toArray()).map(Math::abs).average().orElseThrow();
    return SINE_FORM_FACTOR * mean / wave.rms();
  }

  private OptionalDouble volts(Figures figures, Conductor line) {
    return figures.has(line) && figures.hasNeutral()
        ? OptionalDouble.of(tenths(figures.rmsV(line) + 0.5 * random.nextGaussian()))
        : OptionalDouble.empty();
  }

  private OptionalDouble read(double value) {
    return OptionalDouble.of(tenths(value * (1 + SPREAD * random.nextGaussian())));
  }

  private static double tenths(double value) {
    return Math.round(10 * value) / 10.0;
  }
}
