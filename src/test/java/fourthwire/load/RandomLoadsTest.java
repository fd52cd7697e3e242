package fourthwire.load;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * 10,000 random rows of every kind that is no rectifier, anywhere in what the survey accepts, on
 * voltages and behind sources from usual to absurd: each ends in a finite current or in a reason
 * that can be read.
 */
class RandomLoadsTest {
  private static final int SETS = 10_000;

  @ParameterizedTest(name = "{0}, seed {1}")
  @CsvSource({
    "RESISTIVE, 101",
    "LINEAR, 102",
    "PFC_CRITICAL, 103",
    "PFC_CONTINUOUS, 104",
    "PHASE_DIMMER, 105",
    "MOTOR, 106",
    "MAGNETIC_BALLAST, 107",
    "ACTIVE_FRONT_END, 108",
    "MEASURED, 109"
  })
  void endsInACurrentOrAReason(LoadKind kind, long seed) {
    Random r = new Random(seed);
    int solved = 0;
    for (int n = 0; n < SETS; n++) {
      LoadRequest request = request(r, kind);
      String given = "seed " + seed + ", set " + n + ": " + request;
      try {
        LoadModel model = LoadModels.of(request);
        PortSpectra emf = emf(r, request);
        double base = request.nominalPortV() * request.nominalPortV() / watts(request);
        double ohm = r.nextInt(4) == 0 ? 0 : base * logarithmic(r, 1e-5, 1);
        double henry = r.nextInt(4) == 0 ? 0 : base * logarithmic(r, 1e-5, 1) / 314;
        checkLinear(given, model);
        LoadSolver solver = model.newSolver();
        PortSpectra current = new PortSpectra(request.ports());
        solver.solve(emf, ohm, henry, current);
        checkCurrent(given, current);
        checkPower(given, request, emf, current, ohm);
        solved++;
      } catch (NoSteadyStateException | IllegalArgumentException reason) {
        readable(given, reason);
      } catch (RuntimeException broken) {
        fail(given, broken);
      }
    }
    System.out.printf("%s, seed %d: %d of %d solved%n", kind.word(), seed, solved, SETS);
    assertThat(solved).isGreaterThan(SETS / 2);
  }

  private static void checkCurrent(String given, PortSpectra current) {
    for (int p = 0; p < current.ports(); p++) {
      for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
        if (!Double.isFinite(current.re[p][h]) || !Double.isFinite(current.im[p][h])) {
          fail(given + ": order " + h + " is not finite");
        }
      }
    }
  }

  private static void checkLinear(String given, LoadModel model) {
    double[] y = new double[6];
    for (double order = 1; order <= 50; order += 0.7) {
      model.linearSiemens(order, y);
      for (double part : y) {
        if (!Double.isFinite(part)) {
          fail(given + ": admittance at " + order + " is not finite");
        }
      }
    }
  }

  /** What the source gives less what its resistance takes: never negative, and as the kind says. */
  private static void checkPower(
      String given, LoadRequest request, PortSpectra emf, PortSpectra current, double ohm) {
    double source = 0;
    double lost = 0;
    for (int p = 0; p < current.ports(); p++) {
      for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
        double re = current.re[p][h];
        double im = current.im[p][h];
        source += emf.re[p][h] * re + emf.im[p][h] * im;
        lost += ohm * (re * re + im * im);
      }
    }
    boolean constantPower =
        request.kind() == LoadKind.PFC_CRITICAL || request.kind() == LoadKind.PFC_CONTINUOUS;
    if (constantPower && request.rating() instanceof LoadRequest.Rating.Watts) {
      double watts = watts(request) * request.units() * request.demand();
      if (Math.abs(source - lost - watts) > 1e-6 * source) {
        fail(given + ": takes " + (source - lost) + " W instead of " + watts);
      }
    }
    if (request.kind() == LoadKind.PHASE_DIMMER && source - lost < -1e-6 * Math.abs(source)) {
      fail(given + ": gives power back");
    }
  }

  private static void readable(String given, RuntimeException reason) {
    assertThat(reason.getMessage()).as(given).isNotBlank().doesNotContain("NaN", "null");
  }

  private static double watts(LoadRequest request) {
    double amount = Ratings.amount(request.rating());
    return request.rating() instanceof LoadRequest.Rating.Amps
        ? Ratings.voltAmperes(request, amount)
        : amount;
  }

  private static LoadRequest request(Random r, LoadKind kind) {
    int ports =
        switch (kind.family()) {
          case THREE_PHASE -> 3;
          case SINGLE_PHASE -> 1;
          default -> r.nextBoolean() ? 1 : 3;
        };
    double amount = logarithmic(r, 0.5, 2e5);
    double volts = logarithmic(r, 100, 700);
    LoadRequest.Rating rating =
        switch (r.nextInt(4)) {
          case 0 -> new LoadRequest.Rating.VoltAmperes(amount);
          case 1 -> new LoadRequest.Rating.Amps(amount / volts);
          default -> new LoadRequest.Rating.Watts(amount);
        };
    return new LoadRequest(
        kind,
        ports,
        r.nextBoolean() ? 50 : 60,
        volts,
        rating,
        logarithmic(r, 0.3, 500),
        r.nextInt(3) == 0 ? 1 : logarithmic(r, 0.001, 1),
        r.nextBoolean(),
        maybe(r, (r.nextInt(5) == 0 ? -1 : 1) * (0.02 + 0.98 * r.nextDouble())),
        columns(r),
        kind == LoadKind.MEASURED ? Optional.of(spectrum(r)) : Optional.empty());
  }

  private static ModelColumns columns(Random r) {
    OptionalDouble none = OptionalDouble.empty();
    return new ModelColumns(
        none,
        none,
        none,
        none,
        none,
        none,
        none,
        none,
        none,
        maybe(r, 179 * r.nextDouble()),
        maybe(r, logarithmic(r, 1e-3, 1e3)),
        maybe(r, 80 * r.nextDouble()),
        maybe(r, 100 * r.nextDouble() * r.nextDouble()),
        maybe(r, logarithmic(r, 0.1, 100)));
  }

  private static Spectrum spectrum(Random r) {
    double[] percent = new double[Spectrum.HIGHEST_ORDER + 1];
    double[] degrees = new double[Spectrum.HIGHEST_ORDER + 1];
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      percent[h] = h == 1 ? 1 : r.nextDouble() * r.nextDouble() / Math.sqrt(h);
      degrees[h] = (h == 1 ? 120 : 360) * (r.nextDouble() - 0.5);
    }
    return Spectrum.of(h -> Phasor.polar(percent[h], degrees[h]));
  }

  /** From half to a fifth over nominal, up to 40 % distorted, unbalanced, now and then dead. */
  private static PortSpectra emf(Random r, LoadRequest request) {
    PortSpectra emf = new PortSpectra(request.ports());
    double nominal = request.nominalPortV() / (request.ports() == 3 ? Math.sqrt(3) : 1);
    int step = r.nextInt(3) == 0 ? 1 : 2;
    double distortion = r.nextInt(4) == 0 ? 0 : 0.4 * r.nextDouble() * r.nextDouble();
    double start = 2 * Math.PI * r.nextDouble();
    boolean dead = r.nextInt(200) == 0;
    for (int p = 0; p < request.ports(); p++) {
      double line = nominal * (0.5 + 0.7 * r.nextDouble());
      for (int h = 1; h <= Spectrum.HIGHEST_ORDER && !dead; h += step) {
        double volts = h == 1 ? line : line * distortion / h * r.nextDouble();
        double angle = h == 1 ? start - p * 2 * Math.PI / 3 : 2 * Math.PI * r.nextDouble();
        emf.re[p][h] = volts * Math.cos(angle);
        emf.im[p][h] = volts * Math.sin(angle);
      }
    }
    return emf;
  }

  private static OptionalDouble maybe(Random r, double value) {
    return r.nextBoolean() ? OptionalDouble.of(value) : OptionalDouble.empty();
  }

  private static double logarithmic(Random r, double low, double high) {
    return low * Math.pow(high / low, r.nextDouble());
  }
}
