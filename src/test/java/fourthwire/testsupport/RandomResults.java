package fourthwire.testsupport;

import fourthwire.audit.BankStep;
import fourthwire.audit.DesignState;
import fourthwire.audit.HeadlineFigure;
import fourthwire.audit.HourSeries;
import fourthwire.audit.ImpedanceCurve;
import fourthwire.audit.MeasuredState;
import fourthwire.audit.NodeDoubt;
import fourthwire.audit.NodeResult;
import fourthwire.audit.WeekState;
import fourthwire.limits.Finding;
import fourthwire.limits.Severity;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import fourthwire.site.SiteTree;
import java.math.BigDecimal;
import java.math.MathContext;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Random;
import java.util.function.Supplier;
import java.util.stream.Stream;

/** Results of every shape an audit may give, with figures that mean nothing. */
public final class RandomResults {
  private final Random random;

  /** The same seed gives the same results. */
  public RandomResults(long seed) {
    this.random = new Random(seed);
  }

  /** A node of this name. */
  public NodeResult node(String name) {
    boolean supplied = random.nextInt(5) > 0;
    Optional<NodeDoubt> doubt = maybe(this::doubt);
    Optional<WeekState> week = maybe(this::week);
    return new NodeResult(
        name,
        pick(SiteTree.Kind.values()),
        maybe(() -> "fed from " + random.nextInt()),
        "GRID",
        supplied ? Optional.of(design()) : Optional.empty(),
        supplied ? "" : "not supplied in this state",
        maybe(() -> ImpedanceCurve.of(shortNumbers(ImpedanceCurve.POINTS))),
        list(3, () -> new BankStep(sentence(), 1, 2, number(), number(), number())),
        doubt,
        doubt.isPresent() ? "" : "no draws were asked for",
        week,
        week.isPresent() ? "" : "not supplied in this state",
        list(2, this::measured),
        list(3, this::finding),
        list(2, this::sentence));
  }

  private NodeDoubt doubt() {
    Map<HeadlineFigure, NodeDoubt.Range> ranges = new EnumMap<>(HeadlineFigure.class);
    for (HeadlineFigure figure : HeadlineFigure.values()) {
      ranges.put(figure, new NodeDoubt.Range(number(), number(), number()));
    }
    return new NodeDoubt(
        random.nextInt(1000),
        random.nextLong(),
        ranges,
        pick(HeadlineFigure.values()),
        list(3, () -> new NodeDoubt.InputShare(sentence(), number())),
        list(3, () -> new NodeDoubt.ClampPoint(sentence(), number())));
  }

  private WeekState week() {
    Map<HeadlineFigure, HourSeries> series = new EnumMap<>(HeadlineFigure.class);
    series.put(pick(HeadlineFigure.values()), HourSeries.of(shortNumbers(HourSeries.HOURS)));
    return new WeekState(
        random.nextInt(168),
        sentence(),
        Map.of("code-" + random.nextInt(9), random.nextInt(168)),
        series,
        new WeekState.Energy(
            number(), number(), number(), number(), number(), figure(), sentence()));
  }

  /** Numbers of few digits, as series are written. */
  private double[] shortNumbers(int count) {
    double[] numbers = new double[count];
    Arrays.setAll(numbers, k -> random.nextInt(1000) / 4.0);
    return numbers;
  }

  private DesignState design() {
    boolean transformer = random.nextBoolean();
    return new DesignState(
        lines(),
        neutral(),
        voltages(),
        figure(),
        currentSpectra(),
        voltageSpectra(),
        power(),
        sentence(),
        random.nextBoolean() ? Map.of() : byLine(this::power),
        figure(),
        sentence(),
        figure(),
        transformer
            ? Optional.of(new DesignState.TransformerState(figure(), figure(), figure(), figure()))
            : Optional.empty(),
        transformer
            ? Optional.of(new DesignState.PrimaryState(lines(), neutral(), currentSpectra()))
            : Optional.empty(),
        figure(),
        figure(),
        figure(),
        figure(),
        figure(),
        list(
            2,
            () -> new DesignState.Resonance(number(), number(), sentence(), random.nextBoolean())),
        list(4, () -> new DesignState.NeutralAdder(sentence(), number())));
  }

  private MeasuredState measured() {
    return new MeasuredState(
        sentence(),
        random.nextBoolean() ? OptionalLong.empty() : OptionalLong.of(random.nextInt(1000)),
        random.nextBoolean() ? Optional.empty() : Optional.of(span()),
        sentence(),
        lines(),
        neutral(),
        voltages(),
        power(),
        random.nextBoolean() ? Map.of() : currentSpectra());
  }

  private MeasuredState.Span span() {
    OffsetDateTime from =
        OffsetDateTime.of(2026, 1 + random.nextInt(12), 1, 0, 0, 0, 0, ZoneOffset.ofHours(2))
            .plusNanos(1000L * random.nextInt());
    return new MeasuredState.Span(from, from.plusNanos(1000L * random.nextInt(1_000_000)));
  }

  private Finding finding() {
    return new Finding(
        "code-" + random.nextInt(9),
        pick(Severity.values()),
        figure(),
        figure(),
        "A",
        figure(),
        sentence(),
        sentence());
  }

  private Map<Conductor, DesignState.LineCurrent> lines() {
    return byLine(
        () ->
            new DesignState.LineCurrent(
                figure(), figure(), figure(), figure(), figure(), figure(), sentence()));
  }

  private DesignState.NeutralCurrent neutral() {
    return new DesignState.NeutralCurrent(figure(), figure(), figure(), figure(), sentence());
  }

  private Map<String, DesignState.LineVoltage> voltages() {
    Map<String, DesignState.LineVoltage> voltages = new LinkedHashMap<>();
    keys()
        .forEach(
            k ->
                voltages.put(
                    k, new DesignState.LineVoltage(figure(), figure(), figure(), figure())));
    return voltages;
  }

  private List<String> keys() {
    return random.nextBoolean() ? List.of("L1", "L2", "L3") : List.of("L1-L2", "L2-L3", "L3-L1");
  }

  private Map<Conductor, Spectrum> currentSpectra() {
    Map<Conductor, Spectrum> spectra = byLine(this::spectrum);
    spectra.put(Conductor.N, spectrum());
    return spectra;
  }

  private Map<String, Spectrum> voltageSpectra() {
    Map<String, Spectrum> spectra = new LinkedHashMap<>();
    keys().forEach(k -> spectra.put(k, spectrum()));
    return spectra;
  }

  private Spectrum spectrum() {
    return Spectrum.of(h -> random.nextInt(4) == 0 ? Phasor.ZERO : new Phasor(number(), number()));
  }

  private PowerFigures power() {
    return new PowerFigures(figure(), figure(), figure(), figure(), figure(), figure());
  }

  private <V> Map<Conductor, V> byLine(Supplier<V> value) {
    Map<Conductor, V> map = new EnumMap<>(Conductor.class);
    for (Conductor line : List.of(Conductor.L1, Conductor.L2, Conductor.L3)) {
      map.put(line, value.get());
    }
    return map;
  }

  private Figure figure() {
    return random.nextInt(4) == 0 ? Figure.unknown(sentence()) : Figure.of(number());
  }

  /** Figures are stored to nine significant digits. */
  private static double nineDigits(double value) {
    return new BigDecimal(value).round(new MathContext(9)).doubleValue();
  }

  private double number() {
    return random.nextInt(10) == 0
        ? 0
        : nineDigits(random.nextGaussian() * Math.pow(10, random.nextInt(12) - 4));
  }

  private String sentence() {
    return pick(new String[] {"", "a \"quoted\" word", "50 % of 3·I₁; Ω, é", "plain"})
        + random.nextInt(100);
  }

  private <T> T pick(T[] of) {
    return of[random.nextInt(of.length)];
  }

  private <T> Optional<T> maybe(Supplier<T> value) {
    return random.nextBoolean() ? Optional.of(value.get()) : Optional.empty();
  }

  private <T> List<T> list(int most, Supplier<T> item) {
    return Stream.generate(item).limit(random.nextInt(most + 1)).toList();
  }
}
