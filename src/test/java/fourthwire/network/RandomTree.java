package fourthwire.network;

import fourthwire.network.element.FeederConductor;
import fourthwire.network.element.OrderAdmittance;
import fourthwire.network.element.OrderLaw;
import fourthwire.network.element.SequenceAdmittance;
import fourthwire.network.element.SeriesImpedance;
import fourthwire.network.element.Shunt;
import fourthwire.network.element.SourceImpedance;
import fourthwire.network.element.Transformer;
import fourthwire.network.element.TransformerImpedance;
import fourthwire.quantity.Phasor;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.SplittableRandom;
import java.util.TreeSet;

/**
 * A random radial site at one order, built twice: with the network builder, and as a dense system
 * from formulas written here. Every kind of source, link and shunt occurs.
 */
final class RandomTree {
  /** What a node's conductors are. */
  private record Shape(int lines, boolean neutral) {
    int conductors() {
      return lines + (neutral ? 1 : 0);
    }
  }

  private static final Phasor A = Phasor.polar(1, 120);

  final DenseNetwork dense = new DenseNetwork();
  final TreeNetwork network;
  final Excitation excitation;
  final double order;

  /** Which kinds of source, link and shunt occurred. */
  final Set<String> kinds = new TreeSet<>();

  private final SplittableRandom random;
  private final NetworkBuilder builder = new NetworkBuilder();
  private final List<Shape> shapes = new ArrayList<>();
  private final OrderLaw skin = h -> 0.9 + 0.1 * Math.sqrt(h);

  RandomTree(long seed, int nodes) {
    random = new SplittableRandom(seed);
    order = random.nextInt(3) == 0 ? 1 : random.nextInt(10, 500) / 10.0;
    Phasor[] emf = addSource();
    while (shapes.size() < nodes) {
      addNode(random.nextInt(shapes.size()));
    }
    for (int n = 0; n < nodes; n++) {
      addShunts(n);
    }
    network = builder.build();
    excitation = network.excitation();
    for (int k = 0; k < emf.length; k++) {
      excitation.emf(k, emf[k]);
    }
    for (int n = 0; n < nodes; n++) {
      addLoad(n);
    }
  }

  private double uniform(double low, double high) {
    return random.nextDouble(low, high);
  }

  private Phasor[] addSource() {
    SeriesImpedance z1 = SeriesImpedance.of(uniform(0, 0.01), uniform(0.001, 0.05));
    SeriesImpedance z2 = SeriesImpedance.of(uniform(0, 0.01), uniform(0.001, 0.05));
    SeriesImpedance z0 = SeriesImpedance.of(uniform(0, 0.01), uniform(0.001, 0.05));
    boolean held = random.nextInt(4) == 0;
    Phasor one = held && order == 1 ? Phasor.ZERO : at(z1);
    int kind = random.nextInt(6);
    Phasor[][] z;
    SourceImpedance impedance;
    if (kind < 2) {
      impedance = kind == 0 ? SourceImpedance.singlePhase(z1) : SourceImpedance.splitPhase(z1);
      shapes.add(new Shape(kind + 1, true));
      z = zeros(kind + 2);
      for (int k = 0; k <= kind; k++) {
        z[k][k] = one;
      }
    } else {
      boolean neutral = kind > 2;
      impedance =
          (neutral ? SourceImpedance.fourWire(z1, z0) : SourceImpedance.threeWire(z1, z0))
              .withNegativeSequence(z2);
      shapes.add(new Shape(3, neutral));
      z = zeros(neutral ? 4 : 3);
      paste(fromSequences(one, at(z2), at(z0)), z);
    }
    builder.source(held ? impedance.regulated() : impedance);
    kinds.add("source " + shapes.get(0).lines() + (shapes.get(0).neutral() ? "N" : ""));
    kinds.add(held && order == 1 ? "source held" : "source free");
    Phasor[] emf = new Phasor[z.length];
    for (int k = 0; k < z.length; k++) {
      boolean line = k < shapes.get(0).lines();
      emf[k] = line ? Phasor.polar(uniform(1, 300), uniform(-180, 180)) : Phasor.ZERO;
    }
    dense.source(z, emf);
    return emf;
  }

  private void addNode(int parent) {
    Shape shape = shapes.get(parent);
    boolean threePhase = shape.lines() == 3;
    int pick = random.nextInt(9);
    if ((pick == 0 || pick == 8) && threePhase) {
      addThreePhaseTransformer(parent);
    } else if (pick == 1 && shape.conductors() >= 2) {
      addSinglePhaseTransformer(parent);
    } else if (pick == 2 && shape.neutral()) {
      addSharedNeutral(parent);
    } else if (pick == 3 && shape.lines() >= 2) {
      int a = random.nextInt(shape.lines());
      addFeeder(parent, new Shape(2, false), a, (a + 1) % shape.lines());
    } else if (pick == 4 && shape.neutral()) {
      addFeeder(parent, new Shape(1, true), random.nextInt(shape.lines()), shape.lines());
    } else if (pick == 5 && threePhase) {
      addFeeder(parent, new Shape(3, false), 0, 1, 2);
    } else {
      int[] all = new int[shape.conductors()];
      for (int k = 0; k < all.length; k++) {
        all[k] = k;
      }
      addFeeder(parent, shape, all);
    }
  }

  /** Two to six circuits, any line each (so the same line twice, at times), and one neutral. */
  private void addSharedNeutral(int parent) {
    int lines = shapes.get(parent).lines();
    int[] joined = new int[random.nextInt(3, 8)];
    for (int k = 0; k < joined.length; k++) {
      joined[k] = k == joined.length - 1 ? lines : random.nextInt(lines);
    }
    kinds.add("shared neutral of " + joined.length);
    addFeeder(parent, new Shape(joined.length - 1, true), joined);
  }

  private void addFeeder(int parent, Shape shape, int... joined) {
    boolean without = random.nextInt(4) == 0;
    double[][] a = new double[joined.length][shapes.get(parent).conductors()];
    Phasor[][] z = zeros(joined.length);
    List<FeederConductor> conductors = new ArrayList<>();
    for (int k = 0; k < joined.length; k++) {
      SeriesImpedance impedance =
          without ? SeriesImpedance.NONE : SeriesImpedance.of(uniform(0, 0.3), uniform(0, 0.1));
      if (random.nextBoolean()) {
        impedance = impedance.withResistanceLaw(skin);
      }
      conductors.add(FeederConductor.from(joined[k], impedance));
      a[k][joined[k]] = 1;
      z[k][k] = at(impedance);
    }
    builder.feeder(parent, conductors);
    kinds.add(without ? "feeder without impedance" : "feeder");
    shapes.add(shape);
    dense.node(parent, a, z);
  }

  private void addThreePhaseTransformer(int parent) {
    boolean parentNeutral = shapes.get(parent).neutral();
    int hour = random.nextInt(12);
    boolean neutral = random.nextInt(3) > 0;
    boolean passes = neutral && hour % 2 == 0 && random.nextBoolean();
    double ratio = uniform(0.5, 3);
    TransformerImpedance impedance = randomTransformer();
    builder.transformer(
        parent,
        Transformer.threePhase(
            new Transformer.Connection(hour, neutral, passes), ratio, impedance));
    kinds.add("clock " + hour + (neutral ? "n" : "") + (passes ? " passing zero" : ""));
    shapes.add(new Shape(3, neutral));
    // The definition: positive sequence by -30° times the hour, negative by as much the other way;
    // zero sequence through two windings on one limb, reversed in the hours 2, 6, 10.
    Phasor zero = new Phasor(passes ? (hour % 4 == 0 ? 1 : -1) : 0, 0);
    Phasor[][] turned =
        fromSequences(Phasor.polar(1, -30 * hour), Phasor.polar(1, 30 * hour), zero);
    double[][] a = new double[neutral ? 4 : 3][parentNeutral ? 4 : 3];
    for (int i = 0; i < 3; i++) {
      for (int k = 0; k < 3; k++) {
        a[i][k] = turned[i][k].re() / ratio;
        if (parentNeutral) {
          a[i][3] -= turned[i][k].re() / ratio;
        }
      }
    }
    Phasor[][] z = zeros(a.length);
    Phasor z1 = ofFormula(impedance);
    paste(fromSequences(z1, z1, z1.times(impedance.zeroSequenceRatio())), z);
    dense.node(parent, a, z);
  }

  private TransformerImpedance randomTransformer() {
    return new TransformerImpedance(
        uniform(0.0005, 0.05), uniform(0.001, 0.1), uniform(0, 0.2), uniform(0.1, 5));
  }

  private Phasor ofFormula(TransformerImpedance t) {
    double p = t.eddyFraction();
    return new Phasor(
        t.resistanceOhm() / (1 + p) + t.resistanceOhm() * p / (1 + p) * order * order,
        order * t.reactanceOhm());
  }

  private void addSinglePhaseTransformer(int parent) {
    int count = shapes.get(parent).conductors();
    int from = random.nextInt(count);
    int to = (from + 1 + random.nextInt(count - 1)) % count;
    double ratio = uniform(0.5, 3);
    TransformerImpedance impedance = randomTransformer();
    boolean split = random.nextBoolean();
    int lines = split ? 2 : 1;
    builder.transformer(
        parent,
        split
            ? Transformer.centreTapped(from, to, ratio, impedance)
            : Transformer.singlePhase(from, to, ratio, impedance));
    kinds.add(split ? "centre-tapped" : "single-phase transformer");
    shapes.add(new Shape(lines, true));
    double[][] a = new double[lines + 1][count];
    Phasor[][] z = zeros(lines + 1);
    for (int k = 0; k < lines; k++) {
      a[k][from] = (k == 0 ? 1 : -1) / (ratio * lines);
      a[k][to] = -a[k][from];
      z[k][k] = ofFormula(impedance).times(1.0 / lines);
    }
    dense.node(parent, a, z);
  }

  private void addShunts(int n) {
    Shape shape = shapes.get(n);
    if (shape.conductors() >= 2 && random.nextInt(3) == 0) {
      for (int k = random.nextInt(1, 3); k > 0; k--) {
        addTwoTerminal(n, shape);
      }
    }
    if (shape.lines() == 3 && random.nextInt(3) == 0) {
      addThreeTerminal(n, shape);
    }
  }

  private void addTwoTerminal(int n, Shape shape) {
    int i = random.nextInt(shape.conductors());
    int k = (i + 1 + random.nextInt(shape.conductors() - 1)) % shape.conductors();
    SeriesImpedance z = SeriesImpedance.of(uniform(1, 50), uniform(0, 20));
    Phasor y = new Phasor(1, 0).over(at(z));
    if (random.nextInt(6) == 0) {
      kinds.add("shunt to earth");
      builder.shunt(n, Shunt.between(i, Shunt.EARTH, OrderAdmittance.ofSeries(z)));
      dense.shunt(n, new int[] {i}, new Phasor[][] {{y}});
      return;
    }
    kinds.add("shunt");
    builder.shunt(n, Shunt.between(i, k, OrderAdmittance.ofSeries(z)));
    Phasor minus = y.times(-1);
    dense.shunt(n, new int[] {i, k}, new Phasor[][] {{y, minus}, {minus, y}});
  }

  private void addThreeTerminal(int n, Shape shape) {
    Phasor y1;
    Phasor y2;
    Phasor y0 = Phasor.ZERO;
    if (random.nextBoolean()) {
      // A bank, detuned or not: xc from 0.1 to 5 ohm.
      double xc = uniform(0.1, 5);
      double xl = random.nextBoolean() ? 0.07 * xc : 0;
      double r = uniform(0.001, 0.05);
      kinds.add(xl == 0 ? "bank" : "detuned bank");
      builder.shunt(
          n,
          Shunt.threeLines(
              Shunt.EARTH,
              SequenceAdmittance.isolatedStar(OrderAdmittance.ofSeriesCapacitor(r, xl, xc))));
      y1 = new Phasor(1, 0).over(new Phasor(r, order * xl - xc / order));
      y2 = y1;
    } else {
      y1 = new Phasor(uniform(0, 0.5), uniform(-0.5, 0.5));
      y2 = new Phasor(uniform(0, 0.5), uniform(-0.5, 0.5));
      y0 = random.nextBoolean() ? new Phasor(uniform(0, 2), uniform(-2, 2)) : Phasor.ZERO;
      kinds.add("three-terminal" + (shape.neutral() ? " with neutral" : ""));
      double[] y = {y1.re(), y1.im(), y2.re(), y2.im(), y0.re(), y0.im()};
      builder.shunt(
          n,
          Shunt.threeLines(
              shape.neutral() ? 3 : Shunt.EARTH,
              (h, siemens) -> System.arraycopy(y, 0, siemens, 0, 6)));
    }
    Phasor[][] lines = fromSequences(y1, y2, y0);
    if (!shape.neutral()) {
      dense.shunt(n, new int[] {0, 1, 2}, lines);
      return;
    }
    Phasor[][] all = zeros(4);
    paste(lines, all);
    for (int k = 0; k < 3; k++) {
      all[k][3] = y0.times(-1);
      all[3][k] = y0.times(-1);
    }
    all[3][3] = y0.times(3);
    dense.shunt(n, new int[] {0, 1, 2, 3}, all);
  }

  private void addLoad(int n) {
    Shape shape = shapes.get(n);
    if (random.nextInt(3) == 0 || shape.conductors() < 2) {
      return;
    }
    int from = random.nextInt(shape.lines());
    int to = shape.neutral() ? shape.lines() : (from + 1) % shape.lines();
    Phasor amps = Phasor.polar(uniform(0, 20), uniform(-180, 180));
    excitation.draw(n, from, to, amps);
    dense.inject(n, from, amps.times(-1));
    dense.inject(n, to, amps);
  }

  private Phasor at(SeriesImpedance z) {
    double law = z.resistanceLaw() == skin ? 0.9 + 0.1 * Math.sqrt(order) : 1;
    return new Phasor(z.resistanceOhm() * law, z.reactanceOhm() * order);
  }

  private static Phasor[][] zeros(int size) {
    Phasor[][] z = new Phasor[size][size];
    for (Phasor[] row : z) {
      java.util.Arrays.fill(row, Phasor.ZERO);
    }
    return z;
  }

  private static void paste(Phasor[][] lines, Phasor[][] into) {
    for (int k = 0; k < 3; k++) {
      System.arraycopy(lines[k], 0, into[k], 0, 3);
    }
  }

  /** T·diag(zero, positive, negative)·T⁻¹ with Fortescue's T, multiplied out. */
  static Phasor[][] fromSequences(Phasor positive, Phasor negative, Phasor zero) {
    Phasor one = new Phasor(1, 0);
    Phasor a2 = A.times(A);
    Phasor[][] t = {{one, one, one}, {one, a2, A}, {one, A, a2}};
    Phasor[][] inverse = {{one, one, one}, {one, A, a2}, {one, a2, A}};
    Phasor[] diagonal = {zero, positive, negative};
    Phasor[][] m = zeros(3);
    for (int i = 0; i < 3; i++) {
      for (int k = 0; k < 3; k++) {
        for (int s = 0; s < 3; s++) {
          m[i][k] = m[i][k].plus(t[i][s].times(diagonal[s]).times(inverse[s][k]).times(1.0 / 3));
        }
      }
    }
    return m;
  }
}
