package fourthwire.audit.doubt;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fourthwire.audit.HeadlineFigure;
import fourthwire.audit.NodeDoubt;
import fourthwire.audit.NodeDoubt.InputShare;
import fourthwire.audit.NodeDoubt.Range;
import fourthwire.audit.Progress;
import fourthwire.audit.plan.Device;
import fourthwire.load.Spread;
import fourthwire.quantity.Percentiles;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Random;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.apache.commons.math3.stat.descriptive.rank.Percentile;
import org.apache.commons.math3.stat.descriptive.rank.Percentile.EstimationType;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The draws: their laws, what they promise, and closed forms on sites where the sum is plain. */
class DoubtTest {
  private static final double STIFF_MVA = 100_000;

  /** Against a general statistics library. */
  @ParameterizedTest
  @ValueSource(
      doubles = {1e-12, 1e-5, 0.01, 0.05, 0.074, 0.076, 0.3, 0.5, 0.7, 0.95, 0.999, 1 - 1e-9})
  void normalDeviatesAreThoseOfAStatisticsLibrary(double part) {
    assertThat(new NormalDistribution().cumulativeProbability(NormalQuantile.of(part)))
        .isCloseTo(part, within(1e-13 + 1e-9 * part));
  }

  /** Hyndman and Fan's definition 6, against the same library. */
  @ParameterizedTest
  @ValueSource(doubles = {5, 50, 95})
  void percentilesOfDrawsAreThoseOfAStatisticsLibrary(double percent) {
    double[] sorted = new Random(3).doubles(87).sorted().toArray();

    assertThat(Percentiles.expected(sorted, percent))
        .isCloseTo(
            new Percentile().withEstimationType(EstimationType.R_6).evaluate(sorted, percent),
            within(1e-12));
  }

  /** The law of a Latin hypercube: every n-th of the distribution has one draw. */
  @ParameterizedTest(name = "{0} draws")
  @ValueSource(ints = {1, 7, 200})
  void everyStratumIsDrawnOnce(int draws) {
    float[] deviates = new LatinHypercube(5, draws).deviates("anything");
    NormalDistribution normal = new NormalDistribution();

    assertThat(
            IntStream.range(0, draws)
                .map(k -> (int) (normal.cumulativeProbability(deviates[k]) * draws))
                .distinct())
        .hasSize(draws);
    assertThat(new LatinHypercube(5, draws).deviates("anything")).isEqualTo(deviates);
    assertThat(new LatinHypercube(6, draws).deviates("anything")).isNotEqualTo(deviates);
  }

  @ParameterizedTest(name = "{0}, {1}, {2}")
  @CsvSource({"60,100,140", "60,100,100", "97,100,103", "0,2,4"})
  void medianAndPercentilesAreThoseGiven(double low, double typical, double high) {
    Spread spread = new Spread(low, typical, high);
    double oneInTwenty = NormalQuantile.of(0.95);

    assertThat(TwoPieces.at(spread, -oneInTwenty)).isCloseTo(low, within(1e-12 * high));
    assertThat(TwoPieces.at(spread, 0)).isEqualTo(typical);
    assertThat(TwoPieces.at(spread, oneInTwenty)).isCloseTo(high, within(1e-12 * high));
  }

  /**
   * Watts on a stiff supply are a sum: of a log-normal factor with small σ, half of the variance
   * goes with (Σ w)² of the kind, half with Σ w² of the rows.
   */
  @Test
  void sharesOfVarianceAreThoseOfASum() {
    DrawnSite site =
        DrawnSite.of(
            STIFF_MVA,
            "a,LP-1,L1\nb,LP-1,L2\nc,LP-1,L3\n",
            "load,circuit,panel,kind,quantity,rated_w,confidence\n"
                + "x,a,LP-1,resistive,1,3000,measured\n"
                + "y,b,LP-1,resistive,1,1000,measured\n"
                + "z,c,LP-1,linear,1,2000,measured\n");
    DrawnLoads loads = site.loads(2000, 1);
    float[] watts = new float[2000];
    double[] rated = {3000, 1000, 2000};
    for (int draw = 0; draw < watts.length; draw++) {
      List<Device> drawn = loads.at(draw);
      for (int k = 0; k < rated.length; k++) {
        watts[draw] += (float) (rated[k] * drawn.get(k).placement().request().units());
      }
    }
    double whole = 4000 * 4000 + 3000 * 3000 + 1000 * 1000 + 2 * 2000 * 2000;

    Map<String, Double> shares =
        InputRanking.of(loads, watts.length).of(watts).stream()
            .collect(Collectors.toMap(InputShare::input, InputShare::share));
    assertThat(shares.get("Power of every resistive load on the site"))
        .isCloseTo(4000 * 4000 / whole, within(0.03));
    assertThat(shares.get("Power of each resistive load on LP-1"))
        .isCloseTo((3000 * 3000 + 1000 * 1000) / whole, within(0.03));
    assertThat(shares.get("Power of every linear load on the site"))
        .isCloseTo(2000 * 2000 / whole, within(0.03));
    assertThat(shares.values().stream().mapToDouble(x -> x).sum()).isCloseTo(1, within(0.01));
  }

  /** One resistive load of known percentiles: the current's are the same, in amps. */
  @Test
  void rangeOfASingleLoadIsItsOwn() {
    DrawnSite site =
        DrawnSite.of(
            STIFF_MVA,
            "a,LP-1,L1\n",
            "load,circuit,panel,kind,quantity,rated_w,low_w,high_w\n"
                + "x,a,LP-1,resistive,1,2000,1500,3500\n");
    Range range = site.doubt(1000, 1).get("LP-1").doubt().range().get(HeadlineFigure.L1_RMS);
    double volts = 400 / Math.sqrt(3);

    assertThat(range.p50()).isCloseTo(2000 / volts, within(0.02 * 2000 / volts));
    assertThat(range.p5()).isCloseTo(1500 / volts, within(0.03 * 1500 / volts));
    assertThat(range.p95()).isCloseTo(3500 / volts, within(0.04 * 3500 / volts));
  }

  @Test
  void sameSeedGivesTheSameFiguresWhateverTheThreads() {
    DrawnSite site = mixed(4);
    Map<String, Doubt.Outcome> one = site.on(1).doubt(24, 7);

    assertThat(site.on(4).doubt(24, 7)).isEqualTo(one);
    assertThat(site.doubt(24, 8)).isNotEqualTo(one);
  }

  /** A cancel ends the draws at once. */
  @Test
  void aCancelEndsTheDraws() {
    DrawnSite site = mixed(5);
    AtomicInteger heard = new AtomicInteger();

    assertThatThrownBy(
            () ->
                site.doubt(
                    500,
                    1,
                    (share, message) -> {
                      if (heard.incrementAndGet() > 20) {
                        throw new Progress.CancelledException();
                      }
                    }))
        .isInstanceOf(Progress.CancelledException.class);
    assertThat(heard.get()).isLessThan(500);
  }

  @Test
  void largePercentilesOfTwoSeedsAgree() {
    DrawnSite site = mixed(11);
    Map<HeadlineFigure, Range> one = site.doubt(1000, 1).get("LP-1").doubt().range();
    Map<HeadlineFigure, Range> two = site.doubt(1000, 2).get("LP-1").doubt().range();

    assertThat(one).isNotEqualTo(two);
    one.forEach(
        (figure, range) ->
            assertThat(two.get(figure).p95())
                .as(figure.word())
                .isCloseTo(range.p95(), within(0.02 * range.p95())));
  }

  /**
   * Calibration: over 200 sites with the truth drawn from the same spreads, it lies inside P5 to
   * P95 in 90 ± 4 % (one standard deviation of one figure on 200 sites is 2.1 %).
   */
  @Test
  void truthLiesInsideTheRangeInNineOfTenSites() {
    List<HeadlineFigure> figures =
        List.of(HeadlineFigure.NEUTRAL_RMS, HeadlineFigure.L1_RMS, HeadlineFigure.ACTIVE);
    int[] inside = new int[figures.size()];
    int sites = 200;
    for (int seed = 0; seed < sites; seed++) {
      DrawnSite site = mixed(seed);
      Map<HeadlineFigure, Range> ranges = site.doubt(39, seed).get("LP-1").doubt().range();
      double[] truth = site.truth("LP-1", 5_000 + seed);
      for (int f = 0; f < inside.length; f++) {
        Range range = ranges.get(figures.get(f));
        double value = truth[figures.get(f).ordinal()];
        inside[f] += value >= range.p5() && value <= range.p95() ? 1 : 0;
      }
    }
    assertThat(Arrays.stream(inside).mapToDouble(n -> 100.0 * n / sites))
        .as("inside, percent: " + figures)
        .allSatisfy(percent -> assertThat(percent).isBetween(86.0, 94.0));
  }

  /** The breaker of a heater that may draw more than it bears: a verdict with a probability. */
  @Test
  void aVerdictHasTheProbabilityThatItsLimitIsPassed() {
    double volts = 400 / Math.sqrt(3);
    double limitW = 60 * volts * 3;
    double ratedW = limitW / 1.1;
    DrawnSite site =
        DrawnSite.of(
            STIFF_MVA,
            "a,LP-1,L1-L2-L3\n",
            String.format(
                Locale.ROOT,
                "load,circuit,panel,kind,quantity,rated_w,low_w,high_w\n"
                    + "x,a,LP-1,resistive,1,%f,%f,%f\n",
                ratedW,
                ratedW / 1.5,
                ratedW * 1.5));
    Doubt.Outcome board = site.doubt(1000, 1).get("LP-1");
    double sigma = Math.log(1.5) / NormalQuantile.of(0.95);
    double expected = 1 - new NormalDistribution().cumulativeProbability(Math.log(1.1) / sigma);

    assertThat(board.findings())
        .filteredOn(f -> f.code().equals("line-ampacity"))
        .singleElement()
        .satisfies(
            f ->
                assertThat(f.probability().value().orElseThrow())
                    .isCloseTo(expected, within(0.03)));
  }

  /** The undecided verdict hangs on one board: that is where to clamp. */
  @Test
  void clampsWhereTheVerdictHangs() {
    DrawnSite site =
        DrawnSite.of(
            STIFF_MVA,
            "a,LP-1,L1-L2-L3\nb,LP-2,L1-L2-L3\n",
            "load,circuit,panel,kind,quantity,rated_w\n"
                + "x,a,LP-1,resistive,1,40000\n"
                + "y,b,LP-2,linear,1,40000\n");
    NodeDoubt root = site.doubt(200, 1).get("GRID").doubt();

    assertThat(root.clampNext()).first().satisfies(p -> assertThat(p.node()).isEqualTo("LP-1"));
    assertThat(root.clampNext().get(0).share()).isGreaterThan(0.9);
  }

  private static DrawnSite mixed(long seed) {
    Random random = new Random(seed);
    String[] confidence = {"measured", "counted", "guess", "nameplate"};
    StringBuilder circuits = new StringBuilder();
    StringBuilder loads =
        new StringBuilder("load,circuit,panel,kind,spectrum,quantity,rated_w,confidence\n");
    for (int k = 0; k < 3; k++) {
      circuits.append("c%d,LP-1,L%d\n".formatted(k, k % 3 + 1));
      boolean measured = k % 2 == 0;
      loads.append(
          String.format(
              Locale.ROOT,
              "x%d,c%d,LP-1,%s,%s,2,%.1f,%s\n",
              k,
              k,
              measured ? "" : k == 1 ? "linear" : "resistive",
              measured ? "pulse" : "",
              200 + 800 * random.nextDouble(),
              confidence[random.nextInt(3)]));
    }
    return DrawnSite.of(5, circuits.toString(), loads.toString());
  }
}
