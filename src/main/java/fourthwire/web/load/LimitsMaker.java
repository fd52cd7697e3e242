package fourthwire.web.load;

import fourthwire.limits.equipment.Equipment;
import fourthwire.limits.equipment.EquipmentJudgement;
import fourthwire.limits.equipment.EquipmentLimits;
import fourthwire.limits.equipment.OrderLimit;
import fourthwire.limits.equipment.TotalLimit;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.trial.LoadTrial;
import fourthwire.load.trial.TrialSource;
import fourthwire.quantity.Spectrum;
import fourthwire.web.support.Column;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Verdict;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.IntStream;

/** Holds one unit's current against the equipment standards, and says how it stands. */
final class LimitsMaker {
  private static final double WORTH_LISTING = 1e-3;
  private static final double WORTH_AN_ANGLE = 1e-4;

  private final Words words;
  private final LoadQuestion question;
  private final Equipment equipment;

  /** Of the test's state: its standing and reason hold without one too. */
  private final EquipmentJudgement tested;

  /** Whether the test has a steady state to be judged. */
  private final boolean testable;

  /** Solves the state of the standards' test. */
  LimitsMaker(Words words, LoadQuestion question) {
    this.words = words;
    this.question = question;
    double volts = question.source().nominalV();
    Optional<Spectrum> test = test(question);
    boolean three = question.threeLines();
    double amps =
        test.map(Spectrum::rms).orElse(question.partW() / volts / (three ? Math.sqrt(3) : 1));
    boolean parts = question.parts() == 3;
    double apparentVa = volts * amps * (three ? Math.sqrt(3) : question.parts());
    double ohm = question.sourceOhm();
    this.equipment =
        new Equipment(
            question.use(),
            question.ratedW(),
            amps,
            three || parts,
            three ? volts / Math.sqrt(3) : volts,
            ohm > 0 ? OptionalDouble.of(volts * volts / ohm / apparentVa) : OptionalDouble.empty());
    this.testable = test.isPresent();
    this.tested = EquipmentLimits.judge(equipment, test.orElse(Spectrum.ZERO));
  }

  private static Optional<Spectrum> test(LoadQuestion question) {
    try {
      TrialSource stiff = TrialSource.ideal(question.source().nominalV());
      return Optional.of(LoadTrial.solve(question.tested(), stiff).first());
    } catch (NoSteadyStateException none) {
      return Optional.empty();
    }
  }

  EquipmentJudgement judge(Spectrum unit) {
    return EquipmentLimits.judge(equipment, unit);
  }

  Verdict verdict() {
    return tested.met() || !testable ? Verdict.NONE : Verdict.ACT;
  }

  /**
   * The test's verdict, and beside it that of the state that is shown where it is another state.
   */
  String standing(Optional<Spectrum> unit) {
    if (!tested.limited()) {
      return tested.standing();
    }
    if (!testable) {
      return words.of("loads.untested", tested.standing());
    }
    String verdict = words.of(tested.met() ? "loads.within" : "loads.over", tested.standing());
    if (question.asTested()) {
      return verdict;
    }
    String said = words.of("loads.as-tested", verdict);
    return unit.map(this::judge)
        .filter(shown -> shown.met() != tested.met())
        .map(shown -> words.of(shown.met() ? "loads.but.within" : "loads.but.over", said))
        .orElse(said);
  }

  /** Why these limits hold, how the test comes out, and how the state that is shown does. */
  List<String> sentences(Optional<Spectrum> unit) {
    List<String> said = new ArrayList<>();
    said.add(
        words.of(
            tested.limited() ? "loads.hold" : "loads.hold.none",
            tested.standing(),
            tested.reason()));
    if (tested.limited()) {
      said.add(
          testable ? words.of("loads.tested", outcome(tested)) : words.of("loads.tested.none"));
      if (!question.asTested() && unit.isPresent()) {
        said.add(words.of("loads.here", outcome(judge(unit.get()))));
      }
    }
    return said;
  }

  private String outcome(EquipmentJudgement judgement) {
    List<OrderLimit> over = judgement.orders().stream().filter(o -> !o.met()).toList();
    List<TotalLimit> totals = judgement.totals().stream().filter(t -> !t.met()).toList();
    if (over.isEmpty() && totals.isEmpty()) {
      return nearest(judgement);
    }
    List<String> parts = new ArrayList<>();
    over.stream()
        .max(Comparator.comparingDouble(OrderLimit::ofLimit))
        .ifPresent(
            o ->
                parts.add(
                    words.of(
                        over.size() == 1 ? "loads.over.order" : "loads.over.orders",
                        Numbers.ordinal(o.order()),
                        Numbers.of(o.currentA(), "A"),
                        Numbers.of(o.limitA(), "A"),
                        over.size())));
    totals.forEach(
        t ->
            parts.add(
                words.of(
                    "loads.over.total", total(t), figure(t.figure(), t), figure(t.limit(), t))));
    return String.join("; ", parts);
  }

  private String nearest(EquipmentJudgement judgement) {
    return judgement.orders().stream()
        .max(Comparator.comparingDouble(OrderLimit::ofLimit))
        .filter(o -> o.ofLimit() > 0)
        .map(
            o ->
                words.of(
                    "loads.met.nearest",
                    Numbers.ordinal(o.order()),
                    Numbers.of(100 * o.ofLimit(), "%")))
        .orElseGet(() -> words.of("loads.met"));
  }

  private String total(TotalLimit t) {
    return words.of(
        "loads.total." + t.name().toLowerCase(java.util.Locale.ROOT).replaceAll("[^a-z]+", "-"));
  }

  private static String figure(double value, TotalLimit t) {
    return t.unit().equals("°") ? Numbers.of(value) + "°" : Numbers.of(value, t.unit());
  }

  /** Every order that flows or is limited. */
  LoadPage.Limits table(Spectrum unit) {
    EquipmentJudgement judgement = judge(unit);
    double least = WORTH_LISTING * unit.magnitude(1);
    List<Integer> orders =
        IntStream.rangeClosed(1, Spectrum.HIGHEST_ORDER)
            .filter(h -> unit.magnitude(h) >= least || judgement.order(h).isPresent())
            .boxed()
            .toList();
    List<String> amps = Column.aligned(orders.stream().map(unit::magnitude).toList());
    List<String> percent =
        Column.aligned(
            orders.stream().map(h -> 100 * unit.magnitude(h) / unit.magnitude(1)).toList());
    List<LoadPage.OrderRow> rows = new ArrayList<>();
    for (int i = 0; i < orders.size(); i++) {
      int h = orders.get(i);
      Optional<OrderLimit> limit = judgement.order(h);
      rows.add(
          new LoadPage.OrderRow(
              Numbers.ordinal(h),
              amps.get(i),
              percent.get(i),
              unit.magnitude(h) > WORTH_AN_ANGLE * unit.rms()
                  ? Numbers.withDecimals(unit.at(h).degrees(), 0)
                  : "",
              limit.map(l -> Numbers.of(l.limitA())).orElse(""),
              limit.map(this::verdictOf).orElse("")));
    }
    return new LoadPage.Limits(
        judgement.limited(), judgement.basis(), rows, totals(judgement.totals()));
  }

  private List<LoadPage.TotalRow> totals(List<TotalLimit> totals) {
    return totals.stream()
        .map(
            t ->
                new LoadPage.TotalRow(
                    total(t),
                    figure(t.figure(), t),
                    figure(t.limit(), t),
                    words.of(t.met() ? "loads.verdict.met" : "loads.verdict.over")))
        .toList();
  }

  private String verdictOf(OrderLimit limit) {
    if (limit.disregarded()) {
      return words.of("loads.verdict.disregarded");
    }
    return words.of(limit.met() ? "loads.verdict.met" : "loads.verdict.over");
  }
}
