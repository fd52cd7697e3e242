package fourthwire.intake.reading;

import fourthwire.metering.RawFile;
import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * Writes COMTRADE records for tests, every revision and format (IEEE C37.111-1991, -1999, -2013).
 * Three voltages in kilovolts and three currents as secondary amps, 5th order on both; what else is
 * written can be bent.
 */
final class RecordWriter {
  static final double VOLTS = 231;
  static final double AMPS = 80;
  static final double RATIO = 40;
  private static final String[] NAMES = {"VA", "VB", "VC", "IA", "IB", "IC"};

  int revision = 1999;
  String format = "BINARY";
  double hz = 50;
  double rateHz = 6400;
  double secondRateHz = 0;
  int samples = 1600;
  int digital = 3;
  double timeMultiplier = 1;
  boolean statesRate = true;
  boolean ownTimes = true;
  String lineEnd = "\r\n";
  double skewS = 0;
  int missingEvery = 0;

  /** Time of a sample. */
  private double time(int k) {
    int half = samples / 2;
    return secondRateHz == 0 || k < half ? k / rateHz : half / rateHz + (k - half) / secondRateHz;
  }

  /** What channel c shows at sample k, volts or primary amps. */
  private double value(int c, int k) {
    double t = time(k) + (c == 3 ? skewS : 0);
    double w = 2 * Math.PI * hz * t - 2 * Math.PI / 3 * (c % 3) - (c < 3 ? 0 : Math.PI / 6);
    double size = Math.sqrt(2) * (c < 3 ? VOLTS : AMPS);
    return size * (Math.sin(w) + (c < 3 ? 0.03 : 0.2) * Math.sin(5 * w + 1));
  }

  private double step(int c) {
    return format.startsWith("FLOAT")
        ? 1
        : (c < 3 ? VOLTS / 1000 : AMPS / RATIO) * 2 / (format.equals("BINARY32") ? 1e8 : 30000);
  }

  private double written(int c, int k) {
    double inUnit = c < 3 ? value(c, k) / 1000 : value(c, k) / RATIO;
    return inUnit / step(c);
  }

  private boolean isMissing(int c, int k) {
    return missingEvery > 0 && c == 4 && k % missingEvery == 7;
  }

  /** The configuration's lines. */
  List<String> configuration() {
    List<String> lines = new ArrayList<>();
    lines.add("Hall B,recorder 2" + (revision > 1991 ? "," + revision : ""));
    lines.add(6 + digital + ",6A," + digital + "D");
    for (int c = 0; c < 6; c++) {
      String ratio = revision > 1991 ? (c < 3 ? ",1,1,P" : "," + RATIO + ",1,S") : "";
      lines.add(
          String.format(
              Locale.ROOT,
              "%d,%s,%s,board,%s,%.12g,0,%.3f,-99999,99999%s",
              c + 1,
              NAMES[c],
              "ABC".charAt(c % 3),
              c < 3 ? "kV" : "A",
              step(c),
              c == 3 ? skewS * 1e6 : 0,
              ratio));
    }
    for (int d = 0; d < digital; d++) {
      lines.add(d + 1 + ",D" + d + (revision > 1991 ? ",,," : ",") + "0");
    }
    lines.add(String.valueOf((int) hz));
    rates(lines);
    lines.add(revision > 1991 ? "23/02/2026,10:20:30.123456" : "02/23/26,10:20:30.123456");
    lines.add(revision > 1991 ? "23/02/2026,10:20:30.173456" : "02/23/26,10:20:30.173456");
    lines.add(format);
    if (revision > 1991) {
      lines.add(String.valueOf(timeMultiplier));
    }
    if (revision > 1999) {
      lines.add("+1,+1");
      lines.add("0,0");
    }
    return lines;
  }

  private void rates(List<String> lines) {
    if (!statesRate) {
      lines.add("0");
      lines.add("0," + samples);
    } else if (secondRateHz > 0) {
      lines.add("2");
      lines.add(rateHz + "," + samples / 2);
      lines.add(secondRateHz + "," + samples);
    } else {
      lines.add("1");
      lines.add(rateHz + "," + samples);
    }
  }

  byte[] configurationBytes() {
    return (String.join(lineEnd, configuration()) + lineEnd).getBytes(StandardCharsets.UTF_8);
  }

  byte[] data() {
    return format.equals("ASCII") ? text() : binary();
  }

  private byte[] text() {
    StringBuilder text = new StringBuilder();
    for (int k = 0; k < samples; k++) {
      text.append(k + 1).append(',');
      text.append(ownTimes ? String.valueOf(ticks(k)) : "");
      for (int c = 0; c < 6; c++) {
        text.append(',').append(isMissing(c, k) ? "99999" : Math.round(written(c, k)));
      }
      text.append(",0".repeat(digital)).append(lineEnd);
    }
    return text.toString().getBytes(StandardCharsets.US_ASCII);
  }

  private long ticks(int k) {
    return Math.round(time(k) * 1e6 / timeMultiplier);
  }

  private byte[] binary() {
    int width = format.equals("BINARY") ? 2 : 4;
    int row = 8 + 6 * width + 2 * ((digital + 15) / 16);
    ByteBuffer out = ByteBuffer.allocate(samples * row).order(ByteOrder.LITTLE_ENDIAN);
    for (int k = 0; k < samples; k++) {
      out.putInt(k + 1).putInt(ownTimes ? (int) ticks(k) : -1);
      for (int c = 0; c < 6; c++) {
        put(out, c, k);
      }
      out.position((k + 1) * row);
    }
    return out.array();
  }

  private void put(ByteBuffer out, int c, int k) {
    boolean missing = isMissing(c, k);
    switch (format) {
      case "BINARY" -> out.putShort(missing ? Short.MIN_VALUE : (short) Math.round(written(c, k)));
      case "BINARY32" -> out.putInt(missing ? Integer.MIN_VALUE : (int) Math.round(written(c, k)));
      default -> out.putFloat(missing ? -Float.MAX_VALUE : (float) written(c, k));
    }
  }

  /** Both files. */
  List<RawFile> files() {
    return List.of(Files.of("r.CFG", configurationBytes()), Files.of("R.dat", data()));
  }

  /** One file of all parts. */
  List<RawFile> combined() {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    byte[] data = data();
    String length = format.equals("ASCII") ? "" : ": " + data.length;
    out.writeBytes(("--- file type: CFG ---" + lineEnd).getBytes(StandardCharsets.US_ASCII));
    out.writeBytes(configurationBytes());
    out.writeBytes(
        ("--- file type: INF ---"
                + lineEnd
                + "--- file type: HDR ---"
                + lineEnd
                + "a note"
                + lineEnd)
            .getBytes(StandardCharsets.US_ASCII));
    out.writeBytes(
        ("--- file type: DAT " + format + length + " ---" + lineEnd)
            .getBytes(StandardCharsets.US_ASCII));
    out.writeBytes(data);
    return List.of(Files.of("r.cff", out.toByteArray()));
  }
}
