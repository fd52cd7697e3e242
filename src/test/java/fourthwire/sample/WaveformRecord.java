package fourthwire.sample;

import fourthwire.audit.DesignState;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.Waveform;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * A record of instantaneous values as a recorder stores it (IEEE C37.111-1999, ASCII): ten cycles
 * of the node's computed voltages and currents, in steps of the recorder's resolution.
 */
final class WaveformRecord {
  private static final int PER_CYCLE = 128;
  private static final int CYCLES = 10;
  private static final double VOLTS_A_STEP = 0.02;
  private static final double AMPS_A_STEP = 0.005;

  /** One channel; the steps are what a unit of the data file stands for. */
  private record Channel(String name, String line, String unit, double step, Waveform cycle) {
    long at(int sample) {
      return Math.round(cycle.at(sample % PER_CYCLE) / step);
    }
  }

  private final List<Channel> channels = new ArrayList<>();
  private final int frequencyHz;

  /**
   * A record.
   *
   * @param load the currents at the moment of the record on the design currents
   */
  WaveformRecord(DesignState design, int frequencyHz, double load) {
    this.frequencyHz = frequencyHz;
    design
        .voltageSpectrum()
        .forEach(
            (line, v) -> channels.add(new Channel(line + ".v", line, "V", VOLTS_A_STEP, cycle(v))));
    for (Conductor c : Conductor.values()) {
      Spectrum current = design.currentSpectrum().get(c);
      if (current != null) {
        channels.add(new Channel(c + ".i", c.name(), "A", AMPS_A_STEP, cycle(current.times(load))));
      }
    }
  }

  private static Waveform cycle(Spectrum spectrum) {
    return Waveform.of(spectrum, PER_CYCLE);
  }

  /** The configuration file. */
  String configuration() {
    StringBuilder text = new StringBuilder("Ferrow Yard block C,M2,1999\n");
    text.append("%d,%dA,0D\n".formatted(channels.size(), channels.size()));
    for (int k = 0; k < channels.size(); k++) {
      Channel c = channels.get(k);
      text.append(
          String.format(
              Locale.ROOT,
              "%d,%s,%s,,%s,%.3f,0,0,-32767,32767,1,1,P\n",
              k + 1,
              c.name(),
              c.line(),
              c.unit(),
              c.step()));
    }
    int samples = PER_CYCLE * CYCLES;
    text.append("%d\n1\n%d,%d\n".formatted(frequencyHz, PER_CYCLE * frequencyHz, samples));
    text.append("03/03/2026,10:15:00.000000\n03/03/2026,10:15:00.000000\nASCII\n1\n");
    return text.toString();
  }

  /** The data file. */
  String data() {
    StringBuilder text = new StringBuilder();
    double microseconds = 1e6 / (PER_CYCLE * frequencyHz);
    for (int sample = 0; sample < PER_CYCLE * CYCLES; sample++) {
      text.append(sample + 1).append(',').append(Math.round(sample * microseconds));
      for (Channel c : channels) {
        text.append(',').append(c.at(sample));
      }
      text.append('\n');
    }
    return text.toString();
  }
}
