package fourthwire.web.reading;

import fourthwire.metering.CaptureResult;
import fourthwire.metering.CaptureResult.CurrentFigures;
import fourthwire.metering.CaptureResult.VoltageFigures;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.web.support.Names;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * Says first of a capture what it shows: what the neutral carried; without a neutral the line that
 * carried most; without currents the voltage distorted most. And of what it is.
 */
final class CaptureHeading {
  private final Words words;
  private final Names names;

  CaptureHeading(Words words, Names names) {
    this.words = words;
    this.names = names;
  }

  /** The verdict; empty where there is no figure to tell. */
  String of(CaptureResult c) {
    return neutral(c).or(() -> line(c)).or(() -> voltage(c)).orElse("");
  }

  private Optional<String> neutral(CaptureResult c) {
    return Optional.ofNullable(c.current().get(Conductor.N))
        .filter(
            n -> n.rmsA().value().isPresent() && c.neutralPercentOfMeanLine().value().isPresent())
        .map(
            n ->
                words.of(
                    "capture.heading.neutral",
                    text(n.rmsA(), "A"),
                    text(c.neutralPercentOfMeanLine(), "%")));
  }

  private Optional<String> line(CaptureResult c) {
    return largest(c.current(), CurrentFigures::rmsA)
        .map(
            l ->
                words.of(
                    "capture.heading.line",
                    names.of(l.getKey()),
                    text(l.getValue().rmsA(), "A"),
                    text(l.getValue().thdPercent(), "%")));
  }

  private Optional<String> voltage(CaptureResult c) {
    return largest(c.voltage(), VoltageFigures::thdPercent)
        .map(
            v ->
                words.of(
                    "capture.heading.voltage",
                    names.of(v.getKey()),
                    text(v.getValue().rmsV(), "V"),
                    text(v.getValue().thdPercent(), "%")));
  }

  private static <K, V> Optional<Map.Entry<K, V>> largest(Map<K, V> of, Function<V, Figure> by) {
    return of.entrySet().stream()
        .filter(e -> by.apply(e.getValue()).value().isPresent())
        .max(Comparator.comparingDouble(e -> by.apply(e.getValue()).value().orElse(0)));
  }

  private static String text(Figure figure, String unit) {
    return figure.value().isPresent() ? Numbers.of(figure.value().getAsDouble(), unit) : "–";
  }

  /** What was recorded, and for how long. */
  String about(CaptureResult c, String period) {
    List<String> recorded = new ArrayList<>();
    recorded.add(list("capture.voltages", c.voltage().keySet().stream().map(k -> names.of(k))));
    recorded.add(
        list("capture.currents", c.current().keySet().stream().sorted().map(k -> names.of(k))));
    String what = recorded.stream().filter(r -> !r.isEmpty()).collect(Collectors.joining("; "));
    String about = words.of("capture.about", what, c.cycles(), period);
    return about.substring(0, 1).toUpperCase(Locale.ENGLISH) + about.substring(1);
  }

  private String list(String key, Stream<String> names) {
    String all = names.collect(Collectors.joining(", "));
    return all.isEmpty() ? "" : words.of(key, all);
  }
}
