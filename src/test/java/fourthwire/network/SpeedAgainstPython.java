package fourthwire.network;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * How many times faster all odd orders of a site of 1,000 panels and 20,000 circuits are assembled,
 * eliminated and solved here, on one thread, than by the two references in {@code
 * ../shared/peers/site}, on their site of the same make: general sparse LU factored again ({@code
 * site.py}, without its assembly), and a tree eliminated level by level in numpy ({@code
 * site_tree.py}). All in one run, taking turns; the least time of each counts, which other work on
 * the machine disturbs least. Some minutes; the argument names a Python with numpy and scipy
 * (default {@code python3}).
 *
 * <pre>{@code
 * mvn -q test-compile dependency:build-classpath -Dmdep.outputFile=target/classpath
 * java -cp target/test-classes:target/classes:$(cat target/classpath) \
 *     fourthwire.network.SpeedAgainstPython
 * }</pre>
 */
final class SpeedAgainstPython {
  private static final int ROUNDS = 3;
  private static final int SOLUTIONS = 30;
  private static final Path SCRIPTS = Path.of("../shared/peers/site");

  private SpeedAgainstPython() {}

  /** Takes turns. */
  public static void main(String[] args) throws IOException, InterruptedException {
    String python = args.length > 0 ? args[0] : "python3";
    Path folder = Files.createTempDirectory("site");
    for (String script : List.of("site.py", "site_tree.py")) {
      Files.copy(SCRIPTS.resolve(script), folder.resolve(script));
    }
    double lu = Double.POSITIVE_INFINITY;
    double tree = Double.POSITIVE_INFINITY;
    double here = Double.POSITIVE_INFINITY;
    for (int n = 0; n < ROUNDS; n++) {
      here = Math.min(here, seconds());
      run(python, folder, "site.py", "2");
      lu = Math.min(lu, figure(folder.resolve("timing.json"), "refactor_s_per_draw"));
      here = Math.min(here, seconds());
      run(python, folder, "site_tree.py");
      Path times = folder.resolve("timing_tree.json");
      tree = Math.min(tree, figure(times, "factor_25_s") + figure(times, "solve_25_s"));
    }
    System.out.printf("sparse LU %.0f ms, numpy tree %.0f ms, ", 1e3 * lu, 1e3 * tree);
    System.out.printf("here %.1f ms: %.1f and %.1f times%n", 1e3 * here, lu / here, tree / here);
  }

  /** The least of some solutions. */
  private static double seconds() {
    SiteScaleNetwork site = new SiteScaleNetwork(1000, 11);
    List<Excitation> excitations = new ArrayList<>();
    for (int order = 1; order < 50; order += 2) {
      excitations.add(site.excitation(order, 1000));
    }
    OrderSolution solution = site.network.factor(1).solve(excitations.get(0));
    double least = Double.POSITIVE_INFINITY;
    for (int n = 0; n < SOLUTIONS; n++) {
      long start = System.nanoTime();
      for (int k = 0; k < excitations.size(); k++) {
        site.network.factor(2 * k + 1).solve(excitations.get(k), solution);
      }
      least = Math.min(least, (System.nanoTime() - start) / 1e9);
    }
    return least;
  }

  private static void run(String python, Path folder, String script, String... arguments)
      throws IOException, InterruptedException {
    List<String> command = new ArrayList<>(List.of(python, folder.resolve(script).toString()));
    command.addAll(List.of(arguments));
    int end =
        new ProcessBuilder(command)
            .redirectOutput(ProcessBuilder.Redirect.DISCARD)
            .redirectError(ProcessBuilder.Redirect.INHERIT)
            .start()
            .waitFor();
    if (end != 0) {
      throw new IOException(script + " ended with " + end);
    }
  }

  private static double figure(Path json, String name) throws IOException {
    Matcher matcher =
        Pattern.compile('"' + Pattern.quote(name) + "\": *([0-9.e+-]+)")
            .matcher(Files.readString(json));
    if (!matcher.find()) {
      throw new IOException("no " + name + " in " + json);
    }
    return Double.parseDouble(matcher.group(1));
  }
}
