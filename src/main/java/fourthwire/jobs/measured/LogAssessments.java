package fourthwire.jobs.measured;

import fourthwire.audit.AuditRepository;
import fourthwire.audit.DesignState;
import fourthwire.audit.measured.FrequencyRows;
import fourthwire.audit.measured.LogVerdict;
import fourthwire.audit.measured.LogVerdicts;
import fourthwire.limits.distortion.CurrentDistortion519;
import fourthwire.limits.distortion.Edition519;
import fourthwire.metering.Amount;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.SeriesRepository;
import fourthwire.metering.assess.PeriodFigures.Span;
import fourthwire.metering.correction.CorrectedSeries;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.metering.series.Series;
import fourthwire.quantity.Figure;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import java.time.Duration;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Holds a stored log's percentiles against the limits of measured values, at the node it was taken
 * at. What was formed is kept for a while: it is asked for again with every look at the page.
 */
public final class LogAssessments {
  private static final int MOST_KEPT = 24;

  private final SeriesRepository series;
  private final CorrectionRepository corrections;
  private final AuditRepository audits;
  private final Map<Key, Result> kept =
      new LinkedHashMap<>(16, 0.75f, true) {
        private static final long serialVersionUID = 1L;

        @Override
        protected boolean removeEldestEntry(Map.Entry<Key, Result> eldest) {
          return size() > MOST_KEPT;
        }
      };

  /** From what is stored here. */
  public LogAssessments(
      SeriesRepository series, CorrectionRepository corrections, AuditRepository audits) {
    this.series = series;
    this.corrections = corrections;
    this.audits = audits;
  }

  /**
   * The verdicts on a log.
   *
   * @param set which set of rows they are of, in words
   * @param notes what could not be held against a limit and why, sentences
   */
  public record Result(String set, List<LogVerdict> verdicts, List<String> notes) {}

  private record Key(
      long reading, LogSet set, Optional<SiteTree.Node> node, long audit, String practice) {}

  /** Currents that an audit knows of a node. */
  private record Currents(long audit, OptionalDouble demandA, OptionalDouble faultA, String note) {
    static final Currents NONE =
        new Currents(
            0,
            OptionalDouble.empty(),
            OptionalDouble.empty(),
            "Currents are held against IEEE 519 once an audit has told this node’s short-circuit"
                + " current.");
  }

  /** Of a log; a capture has none. */
  public Optional<Result> of(ReadingRepository.Entry entry, Survey survey) {
    Optional<Series> rows =
        entry.reading().log().isPresent() ? series.series(entry.id()) : Optional.empty();
    return rows.map(read -> of(entry, survey, read));
  }

  /**
   * Limits of harmonic currents at a meter's node.
   *
   * @param demandA I_L, which they are per cent of
   * @param table of IEEE 519
   */
  public record CurrentLimits(double demandA, CurrentDistortion519 table) {
    /** Of an order, amps. */
    public double orderLimitA(int order) {
      return demandA * table.orderLimitPercent(order) / 100;
    }
  }

  /** As the latest audit knows the node; empty where it does not. */
  public Optional<CurrentLimits> currentLimits(ReadingRepository.Entry entry, Survey survey) {
    Currents known = currents(entry);
    if (known.demandA().isEmpty() || known.faultA().isEmpty()) {
      return Optional.empty();
    }
    double demandA = known.demandA().getAsDouble();
    return SiteTree.of(survey)
        .find(entry.meter().node())
        .filter(n -> demandA > 0)
        .map(
            n ->
                new CurrentLimits(
                    demandA,
                    CurrentDistortion519.of(
                        Edition519.IEEE_519_2022,
                        n.nominalV(),
                        known.faultA().getAsDouble(),
                        demandA)));
  }

  private Result of(ReadingRepository.Entry entry, Survey survey, Series read) {
    LogSet set = LogSet.of(entry, corrections);
    Optional<SiteTree.Node> node =
        SiteTree.of(survey).nodes().stream()
            .filter(n -> n.name().equals(entry.meter().node()))
            .findFirst();
    Currents currents = currents(entry);
    Key key =
        new Key(entry.id(), set, node, currents.audit(), survey.settings().practice().toString());
    synchronized (kept) {
      Result there = kept.get(key);
      if (there != null) {
        return there;
      }
    }
    Result made = make(survey, read, set, node, currents);
    synchronized (kept) {
      kept.put(key, made);
    }
    return made;
  }

  private static Result make(
      Survey survey, Series read, LogSet set, Optional<SiteTree.Node> node, Currents currents) {
    if (node.isEmpty()) {
      return new Result(
          set.words(), List.of(), List.of("The survey has this meter’s node no more."));
    }
    Duration interval = set.log().interval();
    Series rows = new CorrectedSeries(read, set.corrections());
    List<LogVerdict> verdicts =
        LogVerdicts.of(
            new LogVerdicts.Request(
                rows,
                interval,
                node.get().nominalV(),
                node.get().lineToNeutralV(),
                survey.settings().frequencyHz(),
                survey.settings().practice(),
                currents.demandA(),
                currents.faultA()));
    List<String> notes = notes(interval, currents);
    if (!Span.YEAR.canBeMadeOf(interval)) {
      FrequencyRows.sentence(rows, interval.toSeconds(), survey.settings().frequencyHz())
          .ifPresent(notes::add);
    }
    return new Result(set.words(), verdicts, notes);
  }

  private static List<String> notes(Duration interval, Currents currents) {
    List<String> notes = new ArrayList<>();
    String rows = "rows of " + interval.toSeconds() + " s";
    if (!Span.WEEK.canBeMadeOf(interval)) {
      notes.add("The 10 min values of a week that standards count can’t be made of " + rows + ".");
    }
    if (!Span.DAY.canBeMadeOf(interval)) {
      notes.add(
          "The 3 s values of a day, which IEEE 519 counts too, can’t be made of " + rows + ".");
    }
    notes.add(currents.note());
    return notes;
  }

  /** From the latest audit that is done. */
  private Currents currents(ReadingRepository.Entry entry) {
    return audits.ofSite(entry.siteId()).stream()
        .filter(a -> a.state() == AuditRepository.State.DONE)
        .findFirst()
        .flatMap(
            a ->
                audits
                    .node(a.id(), entry.meter().node())
                    .flatMap(n -> n.design())
                    .map(d -> currents(a.id(), d)))
        .orElse(Currents.NONE);
  }

  private static Currents currents(long audit, DesignState d) {
    return new Currents(
        audit,
        d.demandA().value(),
        d.shortCircuitA().value(),
        String.format(
            Locale.ROOT,
            "Currents are held against a demand current of %s and a short-circuit current of %s"
                + " (audit %d). %s",
            amps(d.demandA()),
            amps(d.shortCircuitA()),
            audit,
            d.demandBasis()));
  }

  private static String amps(Figure figure) {
    return figure.value().isPresent()
        ? Amount.of(figure.value().getAsDouble(), "A")
        : "unknown size";
  }
}
