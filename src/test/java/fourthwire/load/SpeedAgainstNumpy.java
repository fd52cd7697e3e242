package fourthwire.load;

import fourthwire.load.model.PortSpectra;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Arrays;

/**
 * How many times faster a cold capacitor-input solution is than the vectorised numpy reference
 * {@code ../shared/peers/rectifiers/batch_speed.py}, over 1,000 cases of the same ranges on the
 * same sinusoidal voltage, the two taking turns in one run. Prints each round and the median; the
 * reference's diodes are ideal and its step is fixed. About half a minute; the argument names a
 * Python with numpy (default {@code python3}).
 *
 * <pre>{@code
 * mvn -q test-compile dependency:build-classpath -Dmdep.outputFile=target/classpath
 * java -cp target/test-classes:target/classes:$(cat target/classpath) \
 *     fourthwire.load.SpeedAgainstNumpy
 * }</pre>
 */
final class SpeedAgainstNumpy {
  private static final int CASES = 1000;
  private static final int ROUNDS = 5;

  /** About as long as the reference takes, so that other work on the machine slows both alike. */
  private static final int REPEATS = 40;

  private static final Path SCRIPT = Path.of("../shared/peers/rectifiers/batch_speed.py");

  private SpeedAgainstNumpy() {}

  /** Takes turns. */
  public static void main(String[] args) throws IOException {
    String python = args.length > 0 ? args[0] : "python3";
    RectifierFleet fleet = new RectifierFleet(CASES, 3);
    millisecondsACase(fleet);
    double[] ratio = new double[ROUNDS];
    for (int n = 0; n < ROUNDS; n++) {
      double theirs = referenceMillisecondsACase(python);
      double ours = millisecondsACase(fleet);
      ratio[n] = theirs / ours;
      System.out.printf("numpy %.3f ms, here %.4f ms a case: %.1f times%n", theirs, ours, ratio[n]);
    }
    Arrays.sort(ratio);
    System.out.printf("median: %.1f times%n", ratio[ROUNDS / 2]);
  }

  private static double millisecondsACase(RectifierFleet fleet) {
    PortSpectra emf = RectifierFleet.sinusoidal();
    PortSpectra current = new PortSpectra(1);
    long start = System.nanoTime();
    for (int n = 0; n < REPEATS * CASES; n++) {
      fleet.solve(n % CASES, emf, current);
    }
    return (System.nanoTime() - start) / 1e6 / (REPEATS * CASES);
  }

  private static double referenceMillisecondsACase(String python) throws IOException {
    Process process =
        new ProcessBuilder(python, SCRIPT.toString(), String.valueOf(CASES))
            .redirectError(ProcessBuilder.Redirect.INHERIT)
            .start();
    try (BufferedReader out =
        new BufferedReader(
            new InputStreamReader(process.getInputStream(), StandardCharsets.UTF_8))) {
      String line = out.readLine();
      if (line == null) {
        throw new IOException("no result from " + SCRIPT);
      }
      return Double.parseDouble(line.substring(0, line.indexOf(' ')));
    }
  }
}
