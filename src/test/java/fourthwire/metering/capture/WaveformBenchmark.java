package fourthwire.metering.capture;

import com.sun.management.OperatingSystemMXBean;
import fourthwire.metering.CaptureResult;
import fourthwire.metering.capture.wave.Samples;
import fourthwire.metering.capture.wave.TimeAxis;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.PowerFigures;
import java.io.IOException;
import java.io.InputStream;
import java.lang.management.ManagementFactory;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import java.util.zip.ZipFile;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/**
 * Samples a second of the whole analysis, and its errors, over records of known truth written by
 * the reference script: run by {@code deploy/bench-waveforms.sh}, side by side with it.
 */
public final class WaveformBenchmark {
  private static final List<String> QUANTITIES =
      List.of("L1.v", "L2.v", "L3.v", "L1.i", "L2.i", "L3.i", "N.i");
  private static final List<String> NAMES = List.of("Va", "Vb", "Vc", "Ia", "Ib", "Ic", "In");

  private WaveformBenchmark() {}

  /** The folder of records, and how often each is analysed before and during the measurement. */
  public static void main(String[] args) throws IOException {
    int warm = Integer.parseInt(args[1]);
    int measured = Integer.parseInt(args[2]);
    try (Stream<Path> files = Files.list(Path.of(args[0]))) {
      List<Path> records = files.filter(f -> f.toString().endsWith(".npz")).sorted().toList();
      for (Path f : records) {
        run(f, warm, 0);
      }
      for (Path f : records) {
        run(f, 0, measured);
      }
    }
  }

  private static void run(Path file, int warm, int measured) throws IOException {
    double rate = array(file, "fs")[0];
    double[] x = array(file, "x");
    Capture capture = capture(x, x.length / NAMES.size(), rate);
    for (int k = 0; k < warm; k++) {
      analysed(capture);
    }
    double[] seconds = new double[measured];
    OperatingSystemMXBean system =
        (OperatingSystemMXBean) ManagementFactory.getOperatingSystemMXBean();
    long busy = system.getProcessCpuTime();
    for (int k = 0; k < measured; k++) {
      long from = System.nanoTime();
      analysed(capture);
      seconds[k] = (System.nanoTime() - from) * 1e-9;
    }
    double cpu = (system.getProcessCpuTime() - busy) * 1e-9 / Math.max(1, measured);
    if (measured > 0) {
      Arrays.sort(seconds);
      Path truth = Path.of(file.toString().replace(".npz", ".truth.json"));
      System.out.printf(
          Locale.ROOT,
          "%s wall %.4f s (median of %d, best %.4f) cpu %.4f s  %.2f Msamples/s %s%n",
          file.getFileName(),
          seconds[measured / 2],
          measured,
          seconds[0],
          cpu,
          x.length / seconds[measured / 2] * 1e-6,
          errors(analysed(capture), new JsonMapper().readTree(Files.readString(truth))));
    }
  }

  private static CaptureResult analysed(Capture capture) {
    return CaptureAnalysis.of(capture, 50, List.of()).capture().orElseThrow();
  }

  private static Capture capture(double[] x, int n, double rate) {
    List<Capture.Channel> channels = new ArrayList<>();
    List<Samples> samples = new ArrayList<>();
    for (int c = 0; c < NAMES.size(); c++) {
      double[] column = new double[n];
      for (int k = 0; k < n; k++) {
        column[k] = x[k * NAMES.size() + c];
      }
      channels.add(new Capture.Channel(NAMES.get(c), QUANTITIES.get(c)));
      samples.add(Samples.of(column));
    }
    return new Capture(Optional.empty(), TimeAxis.even(rate, n), channels, samples);
  }

  /** The same figures as the reference script prints. */
  private static String errors(CaptureResult r, JsonNode truth) {
    double voltage = 0;
    double current = 0;
    double rms = 0;
    double thd = 0;
    for (int c = 0; c < NAMES.size(); c++) {
      String q = QUANTITIES.get(c);
      JsonNode t = truth.path("channels").path(NAMES.get(c));
      List<Double> subgroups = r.windows().orElseThrow().groups().get(q).subgroups();
      double worst = 0;
      for (Map.Entry<String, JsonNode> h : t.path("harmonics").properties()) {
        double error =
            subgroups.get(Integer.parseInt(h.getKey()) - 1) - h.getValue().get(0).asDouble();
        worst = Math.max(worst, 100 * Math.abs(error) / t.path("fund").asDouble());
      }
      voltage = q.endsWith("v") ? Math.max(voltage, worst) : voltage;
      current = q.endsWith("i") ? Math.max(current, worst) : current;
      rms = Math.max(rms, 100 * Math.abs(rms(r, q) / t.path("rms").asDouble() - 1));
      thd = Math.max(thd, Math.abs(distortion(subgroups) - t.path("THD_40_pct").asDouble()));
    }
    return String.format(
        Locale.ROOT,
        "{\"max_subgroup_err_pct_fund_V\": %.6f, \"max_subgroup_err_pct_fund_I\": %.6f,"
            + " \"f_mean_err_mHz\": %.5f, \"rms_err_pct\": %.6f, \"THD_err_pctpt\": %.6f,"
            + " \"1459_phase_err_pct_of_S\": %.6f}",
        voltage,
        current,
        1000 * (r.frequencyHz() - truth.path("f0").asDouble()),
        rms,
        thd,
        powers(r, truth));
  }

  private static double rms(CaptureResult r, String quantity) {
    String place = quantity.substring(0, 2).replace(".", "");
    return (quantity.endsWith("v")
            ? r.voltage().get(place).rmsV()
            : r.current().get(Conductor.valueOf(place)).rmsA())
        .value()
        .orElseThrow();
  }

  private static double distortion(List<Double> subgroups) {
    double square = 0;
    for (int h = 2; h <= 40; h++) {
      square += Math.pow(subgroups.get(h - 1), 2);
    }
    return 100 * Math.sqrt(square) / subgroups.get(0);
  }

  private static double powers(CaptureResult r, JsonNode truth) {
    double worst = 0;
    for (int k = 0; k < 3; k++) {
      JsonNode t = truth.path("phase_1459").path("abc".substring(k, k + 1));
      PowerFigures p = r.powerByLine().get(Conductor.values()[k]);
      Map<String, Figure> figures =
          Map.of(
              "P", p.activeW(),
              "Q1", p.fundamentalReactiveVar(),
              "S", p.apparentVa(),
              "S_N", p.nonfundamentalVa());
      for (Map.Entry<String, Figure> f : figures.entrySet()) {
        double error = f.getValue().value().orElseThrow() - t.path(f.getKey()).asDouble();
        worst = Math.max(worst, 100 * Math.abs(error) / t.path("S").asDouble());
      }
    }
    return worst;
  }

  /** A little-endian array of doubles or of one integer, as numpy stores it. */
  private static double[] array(Path file, String name) throws IOException {
    try (ZipFile zip = new ZipFile(file.toFile());
        InputStream in = zip.getInputStream(zip.getEntry(name + ".npy"))) {
      ByteBuffer bytes = ByteBuffer.wrap(in.readAllBytes()).order(ByteOrder.LITTLE_ENDIAN);
      int header = Short.toUnsignedInt(bytes.getShort(8));
      String text = new String(bytes.array(), 10, header, StandardCharsets.US_ASCII);
      boolean real = text.contains("<f8");
      double[] values = new double[(bytes.capacity() - 10 - header) / 8];
      for (int k = 0; k < values.length; k++) {
        int at = 10 + header + 8 * k;
        values[k] = real ? bytes.getDouble(at) : bytes.getLong(at);
      }
      return values;
    }
  }
}
