package fourthwire.intake.reading.comtrade;

import fourthwire.metering.capture.Capture;
import fourthwire.metering.capture.wave.Samples;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * Reads a data file (IEEE C37.111-1999, clause 8).
 *
 * <p>Missing samples: {@code 99999} or empty in text, {@code 0x8000} in 16 and {@code 0x80000000}
 * in 32 bits, and in FLOAT32 its lowest number.
 */
final class DataReader {
  private static final int SUBSTITUTE = 0x1A;
  private static final double MISSING = 99999;
  private static final int NUMBER_AND_TIME = 8;

  private final Configuration c;
  private final byte[] data;
  private final List<String> notes = new ArrayList<>();
  private final List<Samples.Gatherer> samples = new ArrayList<>();
  private final OwnTimes ownTimes;
  private final DataFormat format;
  private int rows;

  DataReader(Configuration configuration, byte[] data) {
    this.c = configuration;
    this.data = data;
    this.ownTimes = new OwnTimes(configuration);
    this.format = configuration.format().orElseGet(() -> DataFormat.guessed(data));
  }

  Comtrade read() {
    if (c.channels().isEmpty()) {
      throw new ComtradeException("The record has no analogue channel.");
    }
    if (format == DataFormat.ASCII) {
      text();
    } else {
      binary();
    }
    if (rows < 2) {
      throw new ComtradeException("The data holds " + rows + " samples: at least two are needed.");
    }
    if (c.format().isEmpty()) {
      notes.add("The configuration does not state the data's format; read as " + format + ".");
    }
    SampleTimes times = new SampleTimes(c, ownTimes, rows);
    return new Comtrade(
        c, times.axis(notes), samples.stream().map(Samples.Gatherer::done).toList(), notes);
  }

  private void room(int rowsExpected) {
    if ((long) rowsExpected * c.channels().size() > Capture.MOST_SAMPLES) {
      throw new ComtradeException(
          String.format(
              Locale.ROOT,
              "The record has %d samples of %d channels; at most %d samples in all are read: cut it"
                  + " into shorter records.",
              rowsExpected,
              c.channels().size(),
              Capture.MOST_SAMPLES));
    }
    for (int k = 0; k < c.channels().size(); k++) {
      samples.add(new Samples.Gatherer(rowsExpected));
    }
  }

  private void text() {
    int lines = 1;
    for (byte b : data) {
      lines += b == '\n' ? 1 : 0;
    }
    room(lines);
    int from = 0;
    while (from < data.length) {
      int to = from;
      while (to < data.length && data[to] != '\n' && data[to] != '\r') {
        to++;
      }
      String line = line(from, to);
      if (!line.isEmpty() && !row(line)) {
        atEnd(line, to);
        return;
      }
      from = to + 1;
    }
  }

  /** A line without the substitute character that ends old text files. */
  private String line(int from, int to) {
    return new String(data, from, to - from, StandardCharsets.ISO_8859_1)
        .replace((char) SUBSTITUTE, ' ')
        .trim();
  }

  /** A line that is no row may stand at the end of the data; elsewhere it is damage. */
  private void atEnd(String line, int at) {
    int left = 0;
    for (int k = at; k < data.length; k++) {
      left += data[k] == '\n' ? 1 : 0;
    }
    if (rows < 2 || left > 2) {
      throw new ComtradeException(
          "data, row "
              + (rows + 1)
              + ": \""
              + (line.length() > 40 ? line.substring(0, 40) + "…" : line)
              + "\" is no row of "
              + (2 + c.channels().size() + c.digital())
              + " numbers, as the configuration asks for.");
    }
    notes.add("After row " + rows + " the data holds no further whole row; the rest was left out.");
  }

  private boolean row(String line) {
    String[] f = line.split(line.indexOf(',') >= 0 ? "," : "[;\\s]+", -1);
    int channels = samples.size();
    if (f.length < 2 + channels) {
      return false;
    }
    double[] values = new double[channels];
    for (int k = 0; k < channels; k++) {
      String text = f[k + 2].trim();
      if (!text.isEmpty() && !isNumber(text)) {
        return false;
      }
      values[k] = text.isEmpty() ? Double.NaN : value(k, Double.parseDouble(text));
    }
    ownTimes.add(isNumber(f[1].trim()) ? Double.parseDouble(f[1].trim()) : Double.NaN);
    for (int k = 0; k < channels; k++) {
      samples.get(k).add(values[k]);
    }
    rows++;
    return true;
  }

  private static boolean isNumber(String text) {
    try {
      return Double.isFinite(Double.parseDouble(text));
    } catch (NumberFormatException e) {
      return false;
    }
  }

  /** {@code 99999} marks a missing sample unless the channel's range reaches beyond. */
  private double value(int channel, double x) {
    boolean missing = x == MISSING && !(c.channels().get(channel).highest() > MISSING);
    return missing ? Double.NaN : scaled(channel, x);
  }

  private double scaled(int channel, double x) {
    AnalogChannel analog = c.channels().get(channel);
    return analog.a() * x + analog.b();
  }

  private void binary() {
    ByteBuffer in = ByteBuffer.wrap(data).order(ByteOrder.LITTLE_ENDIAN);
    int length = rowLength(in);
    int held = data.length / length;
    room(held);
    for (rows = 0; rows < held; rows++) {
      in.position(rows * length + 4);
      int own = in.getInt();
      ownTimes.add(own == -1 ? Double.NaN : Integer.toUnsignedLong(own));
      for (int k = 0; k < samples.size(); k++) {
        samples.get(k).add(binaryValue(k, in));
      }
    }
    int rest = data.length - held * length;
    if (rest > 1 || rest == 1 && data[data.length - 1] != SUBSTITUTE) {
      notes.add("The last " + rest + " bytes of the data are no whole sample and were left out.");
    }
  }

  /**
   * Bytes of a sample: as the configuration says, unless the samples' numbers count up only with
   * the status words left out.
   */
  private int rowLength(ByteBuffer in) {
    int analog = NUMBER_AND_TIME + format.bytes() * c.channels().size();
    int stated = analog + 2 * ((c.digital() + 15) / 16);
    if (stated != analog && !countsUp(in, stated) && countsUp(in, analog)) {
      notes.add("The data holds no status words although the configuration names status channels.");
      return analog;
    }
    return stated;
  }

  private static boolean countsUp(ByteBuffer in, int length) {
    return in.capacity() >= 3 * length
        && in.getInt(length) == in.getInt(0) + 1
        && in.getInt(2 * length) == in.getInt(0) + 2;
  }

  private double binaryValue(int channel, ByteBuffer in) {
    switch (format) {
      case BINARY -> {
        short x = in.getShort();
        return x == Short.MIN_VALUE ? Double.NaN : scaled(channel, x);
      }
      case BINARY32 -> {
        int x = in.getInt();
        return x == Integer.MIN_VALUE ? Double.NaN : scaled(channel, x);
      }
      default -> {
        float x = in.getFloat();
        return x == -Float.MAX_VALUE || Float.isNaN(x) ? Double.NaN : scaled(channel, x);
      }
    }
  }
}
