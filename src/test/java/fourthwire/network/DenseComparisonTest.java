package fourthwire.network;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.quantity.Phasor;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.LongStream;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Random trees of every kind of link against a dense solution of the whole circuit by a general
 * linear-algebra library (EJML, LU with partial pivoting).
 */
class DenseComparisonTest {
  static LongStream seeds() {
    return LongStream.rangeClosed(1, 200);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("seeds")
  @DisplayName("Elimination equals the dense solution within 1e-9 of the largest amount")
  void equalsDenseSolution(long seed) {
    RandomTree tree = new RandomTree(seed, 4 + (int) (seed % 37));
    tree.dense.solve();
    OrderSolution solution = tree.network.factor(tree.order).solve(tree.excitation);
    double volts = 1e-9 * tree.dense.largest(false);
    double amps = 1e-9 * tree.dense.largest(true);
    for (int n = 0; n < tree.network.nodes(); n++) {
      for (int k = 0; k < tree.network.conductors(n); k++) {
        Phasor v = tree.dense.potential(n, k).minus(solution.potential(n, k));
        assertThat(v.magnitude()).as("potential of %d.%d", n, k).isLessThanOrEqualTo(volts);
        Phasor i = tree.dense.current(n, k).minus(solution.current(n, k));
        assertThat(i.magnitude()).as("current of %d.%d", n, k).isLessThanOrEqualTo(amps);
      }
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("seeds")
  @DisplayName("Kirchhoff's laws and the balance of power hold within 1e-8")
  void obeysKirchhoff(long seed) {
    RandomTree tree = new RandomTree(seed, 4 + (int) (seed % 37));
    FactoredOrder factored = tree.network.factor(tree.order);
    SolutionCheck check = factored.check(tree.excitation, factored.solve(tree.excitation));
    assertThat(check.worst()).as(check.toString()).isLessThanOrEqualTo(1e-8);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("seeds")
  @DisplayName("Driving-point impedances are what a unit current meets in the dense solution")
  void drivingPointsEqualDenseSolution(long seed) {
    RandomTree tree = new RandomTree(seed, 4 + (int) (seed % 17));
    FactoredOrder factored = tree.network.factor(tree.order);
    int node = tree.network.nodes() - 1;
    DrivingPoint at = factored.drivingPoint(node);
    tree.dense.solve();
    Phasor[] before = potentials(tree.dense, node, at.conductors());
    int into = (int) (seed % at.conductors());
    tree.dense.inject(node, into, new Phasor(1000, 0));
    tree.dense.solve();
    Phasor[] after = potentials(tree.dense, node, at.conductors());
    for (int k = 0; k < after.length; k++) {
      Phasor expected = after[k].minus(before[k]).times(1e-3);
      assertThat(at.at(k, into).minus(expected).magnitude())
          .isLessThanOrEqualTo(1e-9 * tree.dense.largest(false));
      assertThat(factored.drivingPoints().at(node).at(k, into)).isEqualTo(at.at(k, into));
    }
  }

  @Test
  @DisplayName("The random trees hold every kind of source, link and shunt")
  void everyKindOccurs() {
    Set<String> kinds = new TreeSet<>();
    seeds().forEach(s -> kinds.addAll(new RandomTree(s, 4 + (int) (s % 37)).kinds));
    Set<String> expected = new TreeSet<>();
    for (int hour = 0; hour < 12; hour++) {
      expected.addAll(List.of("clock " + hour, "clock " + hour + "n"));
      if (hour % 2 == 0) {
        expected.add("clock " + hour + "n passing zero");
      }
    }
    for (int conductors = 3; conductors < 8; conductors++) {
      expected.add("shared neutral of " + conductors);
    }
    expected.addAll(List.of("source 1N", "source 2N", "source 3", "source 3N", "source free"));
    expected.addAll(List.of("source held", "feeder", "feeder without impedance", "shunt"));
    expected.addAll(List.of("centre-tapped", "single-phase transformer", "shunt to earth"));
    expected.addAll(List.of("bank", "detuned bank", "three-terminal"));
    expected.add("three-terminal with neutral");
    assertThat(kinds).containsExactlyElementsOf(expected);
  }

  private static Phasor[] potentials(DenseNetwork dense, int node, int count) {
    Phasor[] v = new Phasor[count];
    for (int k = 0; k < count; k++) {
      v[k] = dense.potential(node, k);
    }
    return v;
  }
}
