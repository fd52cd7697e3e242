package fourthwire.web.reading;

import fourthwire.metering.QualityFinding;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.site.Survey;
import fourthwire.web.support.Moments;
import fourthwire.web.support.Names;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/** Words what is wrong with a reading and what was done about it. */
final class FaultsMaker {
  private final Words words;
  private final Names names;
  private final Moments moments;

  FaultsMaker(Words words, Survey survey) {
    this.words = words;
    this.names = new Names(survey.settings().practice());
    this.moments = Moments.of(survey);
  }

  Faults make(ReadingRepository.Entry entry, List<CorrectionRepository.Entry> made) {
    List<QualityFinding> found = entry.reading().quality();
    List<Faults.Done> history = new ArrayList<>();
    made.forEach(c -> history.add(done(c, found)));
    Collections.reverse(history);
    List<Faults.Fault> faults = new ArrayList<>();
    for (int k = 0; k < found.size(); k++) {
      faults.add(fault(k, found.get(k), history));
    }
    return new Faults(faults, history);
  }

  private Faults.Fault fault(int number, QualityFinding q, List<Faults.Done> history) {
    List<Faults.Offer> offers = new ArrayList<>();
    q.corrections()
        .forEach(c -> offers.add(new Faults.Offer(offers.size(), names.in(c.sentence()))));
    return new Faults.Fault(
        number,
        q.period()
            .map(p -> words.of("reading.period", moments.minute(p.from()), moments.minute(p.to())))
            .orElse(words.of("reading.fault.whole")),
        names.in(q.sentence()),
        names.in(q.effect()),
        offers,
        history.stream().filter(d -> d.undone().isEmpty() && d.fault() == number).findFirst());
  }

  private Faults.Done done(CorrectionRepository.Entry c, List<QualityFinding> found) {
    return new Faults.Done(
        c.id(),
        c.finding(),
        names.in(c.correction().sentence()),
        c.finding() < found.size() ? names.in(found.get(c.finding()).sentence()) : "",
        moments.minute(c.made()),
        c.undone().map(moments::minute).orElse(""));
  }
}
