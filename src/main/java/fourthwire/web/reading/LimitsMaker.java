package fourthwire.web.reading;

import fourthwire.audit.measured.LogVerdict;
import fourthwire.jobs.measured.LogAssessments;
import fourthwire.limits.distortion.MeasuredBand;
import fourthwire.metering.assess.PeriodFigures.Outcome;
import fourthwire.site.Survey;
import fourthwire.web.support.Moments;
import fourthwire.web.support.Names;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Verdict;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** Words a log's percentiles against the limits of measured values. */
final class LimitsMaker {
  /** From this part of a limit on it is worth watching, as for computed figures. */
  private static final double NEAR = 0.8;

  private final Words words;
  private final Names names;
  private final Moments moments;

  LimitsMaker(Words words, Survey survey) {
    this.words = words;
    this.names = new Names(survey.settings().practice());
    this.moments = Moments.of(survey);
  }

  LimitsView make(LogAssessments.Result result) {
    return new LimitsView(
        words.of("reading.limits.set", result.set()),
        result.verdicts().stream().map(this::row).toList(),
        result.notes().stream().map(names::in).toList());
  }

  private LimitsView.Row row(LogVerdict v) {
    LogVerdict.Period worst = v.worst();
    MeasuredBand band = v.band();
    return new LimitsView.Row(
        what(v, worst),
        counted(band),
        band.basis(),
        figure(worst.figure()),
        allowed(band, worst),
        moments.minute(worst.from()),
        share(worst),
        verdict(v, worst),
        outcome(v),
        v.periods().stream().map(p -> period(v, p)).toList());
  }

  private String what(LogVerdict v, LogVerdict.Period p) {
    String place = p.place().isEmpty() ? "" : names.of(p.place());
    String unit = v.code().equals(LogVerdict.FREQUENCY) ? "Hz" : "V";
    return v.band().isTwoSided()
        ? words.of(
            "reading.limits.what." + v.code(),
            place,
            Numbers.plain(v.band().low(), unit),
            Numbers.plain(v.band().high(), unit))
        : words.of(
            "reading.limits.what." + v.code(),
            place,
            p.order() > 0 ? Numbers.ordinal(p.order()) : "");
  }

  private String counted(MeasuredBand band) {
    String key = "reading.limits." + band.values().word();
    return band.percent() == 100
        ? words.of(key + ".all")
        : words.of(key, Numbers.plain(band.percent(), "%"));
  }

  private static String figure(double value) {
    return Numbers.plain(value, "%");
  }

  private String allowed(MeasuredBand band, LogVerdict.Period p) {
    return band.percent() == 100
        ? words.of("reading.limits.none")
        : words.of(
            band.isTwoSided() ? "reading.limits.may" : "reading.limits.of", figure(p.limit()));
  }

  private String share(LogVerdict.Period p) {
    return words.of("reading.limits.share", String.format(Locale.ROOT, "%.0f", p.sharePercent()));
  }

  private static Verdict verdict(LogVerdict v, LogVerdict.Period worst) {
    return switch (v.outcome()) {
      case OVER -> Verdict.ACT;
      case OPEN -> Verdict.NOTE;
      case WITHIN ->
          worst.figure() > NEAR * worst.limit() && worst.limit() > 0 ? Verdict.WATCH : Verdict.NONE;
    };
  }

  /** "Over in 2 of 5, within in 3": how the periods came out. */
  private String outcome(LogVerdict v) {
    List<String> parts = new ArrayList<>();
    for (Outcome o : List.of(Outcome.OVER, Outcome.WITHIN, Outcome.OPEN)) {
      long count = v.count(o);
      if (count > 0) {
        String word = o.name().toLowerCase(Locale.ROOT);
        parts.add(words.of("reading.limits." + word + "." + v.band().values().word() + "s", count));
      }
    }
    String text = String.join(", ", parts);
    return text.substring(0, 1).toUpperCase(Locale.ENGLISH) + text.substring(1);
  }

  private LimitsView.Period period(LogVerdict v, LogVerdict.Period p) {
    String place = p.place().isEmpty() ? "" : names.of(p.place());
    return new LimitsView.Period(
        moments.minute(p.from()),
        p.order() > 0 ? place + ", " + Numbers.ordinal(p.order()) : place,
        figure(p.figure()),
        figure(p.limit()),
        share(p),
        words.of("reading.limits." + p.outcome().name().toLowerCase(Locale.ROOT)));
  }
}
