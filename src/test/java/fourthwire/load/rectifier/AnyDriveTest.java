package fourthwire.load.rectifier;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.loop.MultiPulseSolver;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Any drive that a survey may hold ends in a steady state or in a reason, never in a figure that is
 * none: {@value #SETS} seeded random sets for each number of bridges.
 *
 * <p>All 10,000 (some minutes):
 *
 * <pre>{@code
 * mvn -q test-compile dependency:build-classpath -Dmdep.outputFile=target/classpath
 * java -cp target/test-classes:target/classes:$(cat target/classpath) \
 *     fourthwire.load.rectifier.AnyDriveTest 10000
 * }</pre>
 */
class AnyDriveTest {
  private static final int SETS = 250;

  @ParameterizedTest(name = "{0} bridges")
  @ValueSource(ints = {1, 2})
  void anyDriveEndsInAStateOrAReason(int bridges) {
    assertThat(states(bridges, SETS)).isGreaterThan(SETS / 2);
  }

  /** Solves so many sets; how many of them have a steady state. */
  private static int states(int bridges, int sets) {
    int states = 0;
    for (int seed = 0; seed < sets; seed++) {
      RandomRectifier given = RandomRectifier.anyDrive(seed);
      MultiPulseSolver solver = new MultiPulseSolver(bridges, given.load(), given.hertz());
      PortSpectra current = new PortSpectra(3);
      try {
        solver.solve(given.emf(), given.ohm(), given.henry(), current);
        check(given, current);
        states++;
      } catch (NoSteadyStateException none) {
        assertThat(none.getMessage())
            .as(given.toString())
            .matches(".*(cannot give what|does not repeat|no voltage|switches too often).*");
      }
    }
    return states;
  }

  private static void check(RandomRectifier given, PortSpectra current) {
    for (int port = 0; port < 3; port++) {
      assertThat(current.spectrum(port).rms()).as(given.toString()).isFinite().isNotNegative();
    }
  }

  /** Solves so many sets for one bridge, then for two, and says how many have a steady state. */
  public static void main(String[] sets) {
    for (int bridges = 1; bridges <= 2; bridges++) {
      int count = Integer.parseInt(sets[0]);
      System.out.printf("%d bridges: %d of %d%n", bridges, states(bridges, count), count);
    }
  }
}
