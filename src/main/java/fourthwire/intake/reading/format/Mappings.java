package fourthwire.intake.reading.format;

import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.metering.ReadingMapping;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.function.UnaryOperator;

/**
 * The mapping known before a file is looked at.
 *
 * @param mapping given with the upload, else remembered for the layout
 * @param whence which of them
 */
public record Mappings(Optional<ReadingMapping> mapping, ReadingPlan.Confidence whence) {
  public static Mappings of(ReadingSetting setting, String layout) {
    return setting.mapping().isPresent()
        ? new Mappings(setting.mapping(), ReadingPlan.Confidence.GIVEN)
        : new Mappings(setting.remembered().apply(layout), ReadingPlan.Confidence.REMEMBERED);
  }

  /** The same with every column under the heading it stands for. */
  public Mappings under(UnaryOperator<String> heading) {
    return new Mappings(mapping.map(m -> under(m, heading)), whence);
  }

  private static ReadingMapping under(ReadingMapping m, UnaryOperator<String> heading) {
    Map<String, ReadingMapping.Column> columns = new LinkedHashMap<>();
    m.columns()
        .forEach(
            (name, column) -> {
              boolean twice = columns.containsKey(heading.apply(name));
              columns.put(twice ? name : heading.apply(name), column);
            });
    ReadingMapping.Time time = m.time();
    return new ReadingMapping(
        m.kind(),
        new ReadingMapping.Time(
            time.columns().stream().map(heading).toList(),
            time.format(),
            time.zone(),
            time.stamp(),
            time.intervalS()),
        m.sampleRateHz(),
        columns);
  }
}
