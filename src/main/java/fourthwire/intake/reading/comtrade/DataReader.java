package fourthwire.intake.reading.comtrade;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;

/**
 * Reads a data file (IEEE C37.111-1999, clause 8).
 *
 * <p>Missing samples: {@code 99999} or empty in text, {@code 0x8000} in 16 and {@code 0x80000000}
 * in 32 bits, and in FLOAT32 its lowest number. Times: the sample rates where stated, else the
 * data's own.
 */
final class DataReader {
  private static final String SUBSTITUTE = "\u001A";

  private final Configuration c;
  private final byte[] data;
  private final List<String> notes = new ArrayList<>();
  private double[][] samples = new double[0][];
  private double[] ownTimesS = new double[0];
  private int count;

  DataReader(Configuration configuration, byte[] data) {
    this.c = configuration;
    this.data = data;
  }

  Comtrade read() {
    if (c.channels().isEmpty()) {
      throw new ComtradeException("The record has no analogue channel.");
    }
    if (c.format() == DataFormat.ASCII) {
      text();
    } else {
      binary();
    }
    if (count < 2) {
      throw new ComtradeException("The data holds " + count + " samples: at least two are needed.");
    }
    double[][] kept = new double[samples.length][];
    for (int k = 0; k < kept.length; k++) {
      kept[k] = Arrays.copyOf(samples[k], count);
    }
    return new Comtrade(c, times(), kept, notes);
  }

  private void room(int rows) {
    samples = new double[c.channels().size()][rows];
    ownTimesS = new double[rows];
  }

  private void text() {
    List<String> lines =
        new String(data, StandardCharsets.ISO_8859_1)
            .replace(SUBSTITUTE, "")
            .lines()
            .filter(l -> !l.isBlank())
            .toList();
    room(lines.size());
    for (String line : lines) {
      row(line);
    }
  }

  private void row(String line) {
    String[] f = line.split(",", -1);
    if (f.length < 2 + samples.length) {
      throw new ComtradeException(
          "data, row "
              + (count + 1)
              + ": "
              + f.length
              + " fields, but the configuration asks for "
              + (2 + samples.length + c.digital())
              + ".");
    }
    ownTimesS[count] = time(f[1].trim());
    for (int k = 0; k < samples.length; k++) {
      samples[k][count] = value(k, f[k + 2].trim());
    }
    count++;
  }

  private double time(String text) {
    return text.isEmpty() ? Double.NaN : parsed(text) * tickS();
  }

  /** One unit of the data's own times, seconds. */
  private double tickS() {
    return (c.nanoseconds() ? 1e-9 : 1e-6) * c.timeMultiplier();
  }

  private double value(int channel, String text) {
    if (text.isEmpty()) {
      return Double.NaN;
    }
    double x = parsed(text);
    return x == 99999 ? Double.NaN : scaled(channel, x);
  }

  private double parsed(String text) {
    try {
      return Double.parseDouble(text);
    } catch (NumberFormatException e) {
      throw new ComtradeException(
          "data, row " + (count + 1) + ": \"" + text + "\" is not a number.");
    }
  }

  private double scaled(int channel, double x) {
    AnalogChannel analog = c.channels().get(channel);
    return analog.a() * x + analog.b();
  }

  private void binary() {
    int words = (c.digital() + 15) / 16;
    int row = 8 + c.format().bytes() * c.channels().size() + 2 * words;
    int rows = data.length / row;
    room(rows);
    ByteBuffer in = ByteBuffer.wrap(data).order(ByteOrder.LITTLE_ENDIAN);
    for (count = 0; count < rows; count++) {
      in.position(count * row + 4);
      int own = in.getInt();
      ownTimesS[count] = own == -1 ? Double.NaN : Integer.toUnsignedLong(own) * tickS();
      for (int k = 0; k < samples.length; k++) {
        samples[k][count] = binaryValue(k, in);
      }
    }
    int rest = data.length - rows * row;
    if (rest > 1 || rest == 1 && data[data.length - 1] != 0x1A) {
      notes.add("The last " + rest + " bytes of the data are no whole sample and were left out.");
    }
  }

  private double binaryValue(int channel, ByteBuffer in) {
    switch (c.format()) {
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

  /** Seconds after the first sample. */
  private double[] times() {
    if (c.rates().isEmpty()) {
      return ownTimes();
    }
    double[] t = new double[count];
    int rate = 0;
    for (int k = 1; k < count; k++) {
      while (rate < c.rates().size() - 1 && k >= c.rates().get(rate).lastSample()) {
        rate++;
      }
      t[k] = t[k - 1] + 1 / c.rates().get(rate).hertz();
    }
    if (c.rates().size() == 1) {
      for (int k = 0; k < count; k++) {
        t[k] = k / c.rates().get(0).hertz();
      }
    }
    compare(t[count - 1]);
    return t;
  }

  /** The stated rate rules; where the data's own times tell otherwise it is said. */
  private void compare(double spanS) {
    double own = ownTimesS[count - 1] - ownTimesS[0];
    if (Math.abs(own - spanS) > 0.005 * spanS) {
      notes.add(
          String.format(
              Locale.ROOT,
              "The data's own times span %.6g s, the stated sample rate %.6g s; the rate was used.",
              own,
              spanS));
    }
  }

  private double[] ownTimes() {
    double[] t = Arrays.copyOf(ownTimesS, count);
    double first = t[0];
    for (int k = 0; k < count; k++) {
      t[k] -= first;
      if (Double.isNaN(t[k]) || k > 0 && t[k] <= t[k - 1]) {
        throw new ComtradeException(
            "data, row "
                + (k + 1)
                + ": the configuration states no sample rate, and this sample's own time is missing"
                + " or does not rise.");
      }
    }
    return t;
  }
}
