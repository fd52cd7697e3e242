package fourthwire.web.reading;

import fourthwire.jobs.measured.LogAssessments;
import fourthwire.metering.CaptureResult;
import fourthwire.metering.LogResult;
import fourthwire.metering.Period;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import fourthwire.web.figure.Shapes;
import fourthwire.web.panel.NodePage;
import fourthwire.web.support.Moments;
import fourthwire.web.support.Names;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.springframework.stereotype.Component;

/** Makes a reading's page and its row in the list. */
@Component
class ReadingPageMaker {
  /** Before the name of a meter of the survey, in the list of places. */
  static final String METER = "meter ";

  private final Words words;
  private final CorrectionRepository corrections;
  private final LogAssessments assessments;

  ReadingPageMaker(Words words, CorrectionRepository corrections, LogAssessments assessments) {
    this.words = words;
    this.corrections = corrections;
    this.assessments = assessments;
  }

  ReadingPage.Row row(ReadingRepository.Entry entry, Survey survey) {
    return new ReadingPage.Row(
        entry.id(),
        kindKey(entry.reading()),
        period(entry.reading(), survey),
        String.join(", ", entry.files()),
        entry.reading().quality().size());
  }

  /** The survey's meters, then every node but circuits, then the circuits. */
  List<ReadingPage.Place> places(Survey survey) {
    List<ReadingPage.Place> places = new ArrayList<>();
    survey
        .meters()
        .forEach(
            m ->
                places.add(
                    new ReadingPage.Place(
                        METER + m.name(), words.of("reading.place.meter", m.name(), m.at()))));
    List<SiteTree.Node> nodes = SiteTree.of(survey).nodes();
    nodes.stream()
        .filter(n -> n.kind() != SiteTree.Kind.CIRCUIT)
        .forEach(n -> places.add(new ReadingPage.Place(n.name(), n.name())));
    nodes.stream()
        .filter(n -> n.kind() == SiteTree.Kind.CIRCUIT)
        .forEach(n -> places.add(new ReadingPage.Place(n.name(), n.name())));
    return places;
  }

  ReadingPage make(ReadingRepository.Entry entry, Survey survey) {
    Reading reading = entry.reading();
    Names names = new Names(survey.settings().practice());
    QuantitiesMaker quantities = new QuantitiesMaker(words, names);
    Faults faults = new FaultsMaker(words, survey).make(entry, corrections.ofReading(entry.id()));
    Optional<LimitsView> limits =
        assessments.of(entry, survey).map(new LimitsMaker(words, survey)::make);
    return new ReadingPage(
        entry.id(),
        entry.meter().name(),
        entry.meter().node(),
        reading
            .capture()
            .map(new CaptureHeading(words, names)::of)
            .orElseGet(() -> new ReadingHeading(words).of(limits, faults)),
        reading
            .capture()
            .map(c -> new CaptureHeading(words, names).about(c, period(reading, survey)))
            .or(() -> reading.log().map(quantities::neutral))
            .orElse(""),
        kindKey(reading),
        facts(entry, survey),
        reading.notes().stream().map(names::in).toList(),
        faults,
        limits,
        reading.log().map(l -> quantities.make(l, corrections.cleaned(entry.id()))),
        reading.capture().map(c -> new CaptureTables(words, names).of(c)).orElse(List.of()),
        reading
            .capture()
            .filter(c -> !c.spectrum().isEmpty())
            .map(c -> new CaptureTables(words, names).orders(c)),
        reading.capture().map(c -> new CaptureTables(words, names).spectrum(c)).orElse(""),
        reading.capture().map(c -> keys(c, names)).orElse(List.of()),
        reading.capture().map(c -> names.in(c.basis() + " " + c.neutralBasis())).orElse(""),
        reading.capture().map(c -> new CaptureViewMaker(words, names).of(c)));
  }

  private static String kindKey(Reading reading) {
    return "reading.kind." + reading.kind().word();
  }

  private String period(Reading reading, Survey survey) {
    Moments moments = Moments.of(survey);
    return reading.period().map(p -> period(p, moments)).orElse(words.of("reading.period.unknown"));
  }

  /** Of what is shorter than a minute also how long it is. */
  private String period(Period p, Moments moments) {
    return p.length().toMinutes() < 1
        ? words.of(
            "reading.period.short",
            moments.second(p.from()),
            Numbers.plain(p.length().toMillis() / 1000.0, "s"))
        : words.of("reading.period", moments.minute(p.from()), moments.minute(p.to()));
  }

  private List<ReadingPage.Fact> facts(ReadingRepository.Entry entry, Survey survey) {
    Reading reading = entry.reading();
    List<ReadingPage.Fact> facts = new ArrayList<>();
    facts.add(fact("files", String.join(", ", entry.files())));
    facts.add(fact("when", period(reading, survey)));
    facts.add(fact("count." + reading.kind().word(), Numbers.withDecimals(reading.count(), 0)));
    if (reading.capture().isPresent()) {
      reading
          .sampleRateHz()
          .ifPresent(rate -> facts.add(fact("rate", Numbers.plain(rate, words.of("reading.hz")))));
    }
    reading.log().ifPresent(l -> facts.add(fact("interval", seconds(l))));
    reading.capture().ifPresent(c -> facts.add(fact("frequency", frequency(c))));
    facts.add(fact("sha", entry.sha256()));
    return facts;
  }

  /** To the millihertz that it is found to. */
  private static String frequency(CaptureResult c) {
    return Numbers.withDecimals(c.frequencyHz(), 3) + Numbers.THIN_SPACE + "Hz";
  }

  private static String seconds(LogResult log) {
    return Numbers.plain(log.interval().toMillis() / 1000.0, "s");
  }

  private static ReadingPage.Fact fact(String key, String text) {
    return new ReadingPage.Fact("reading.fact." + key, text);
  }

  private static List<NodePage.Key> keys(CaptureResult capture, Names names) {
    return capture.picture().channels().keySet().stream()
        .map(CapturePictures::conductor)
        .distinct()
        .sorted()
        .map(c -> new NodePage.Key(Shapes.sample(c), names.of(c)))
        .toList();
  }
}
