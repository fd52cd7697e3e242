package fourthwire.json;

import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.correction.CorrectionRepository;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Optional;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ObjectNode;

/** A reading, section 5 of the public contract. */
public final class ReadingJson {
  private static final String PERIOD = "period";

  private ReadingJson() {}

  /** The whole document of a stored reading, its times with the offset of this zone. */
  public static ObjectNode write(ReadingRepository.Entry entry, ZoneId zone) {
    ObjectNode o = heading(entry, zone);
    writeResult(o, entry.reading(), zone);
    o.set("mapping", MappingJson.write(entry.mapping()));
    return o;
  }

  /**
   * The whole document of a stored reading with what was corrected.
   *
   * @param made all of its corrections, those taken back too
   */
  public static ObjectNode write(
      ReadingRepository.Entry entry,
      List<CorrectionRepository.Entry> made,
      Optional<CorrectionRepository.Cleaned> cleaned,
      ZoneId zone) {
    ObjectNode o = write(entry, zone);
    for (int finding = 0; finding < entry.reading().quality().size(); finding++) {
      int of = finding;
      Json.put(
          (ObjectNode) o.path("quality").path(finding),
          "corrected",
          made.stream()
              .filter(c -> c.holds() && c.finding() == of)
              .mapToLong(CorrectionRepository.Entry::id)
              .findFirst());
    }
    o.set("corrections", Json.list(made, c -> CorrectionJson.write(c, zone)));
    cleaned.ifPresentOrElse(
        c -> o.set("cleaned", CorrectionJson.write(c.log(), zone).put("rows", c.rows())),
        () -> o.putNull("cleaned"));
    return o;
  }

  /** Its row in a list: what it is, without its figures. */
  public static ObjectNode row(ReadingRepository.Entry entry, ZoneId zone) {
    ObjectNode o = heading(entry, zone);
    writeKind(o, entry.reading(), zone);
    return o.put("quality_findings", entry.reading().quality().size());
  }

  private static ObjectNode heading(ReadingRepository.Entry entry, ZoneId zone) {
    ObjectNode o = Json.object().put("id", entry.id()).put("site", entry.siteId());
    o.put("meter", entry.meter().name()).put("at", entry.meter().node());
    o.set("files", Json.strings(entry.files()));
    return o.put("sha256", entry.sha256()).put("added", Moments.write(entry.added(), zone));
  }

  /** What a reading says, without where it is stored. */
  public static ObjectNode write(Reading reading) {
    ObjectNode o = Json.object();
    writeResult(o, reading, ZoneOffset.UTC);
    return o;
  }

  private static void writeResult(ObjectNode o, Reading r, ZoneId zone) {
    writeKind(o, r, zone);
    o.set("notes", Json.strings(r.notes()));
    o.set("quality", Json.list(r.quality(), q -> write(q, zone)));
    r.log().ifPresent(log -> LogJson.write(o, log, zone));
    r.capture().ifPresent(capture -> CaptureJson.write(o, capture));
  }

  private static void writeKind(ObjectNode o, Reading r, ZoneId zone) {
    o.put("kind", r.kind().word());
    write(o, r.period(), zone);
    o.put(countKey(r.kind()), r.count());
    Json.put(o, "sample_rate_hz", r.sampleRateHz());
  }

  private static String countKey(ReadingKind kind) {
    return kind == ReadingKind.LOG ? "rows" : "samples";
  }

  private static void write(ObjectNode into, Optional<Period> period, ZoneId zone) {
    period.ifPresentOrElse(
        p ->
            into.set(
                PERIOD,
                Moments.write(
                    p.from().atZone(zone).toOffsetDateTime(),
                    p.to().atZone(zone).toOffsetDateTime())),
        () -> into.putNull(PERIOD));
  }

  private static ObjectNode write(QualityFinding q, ZoneId zone) {
    ObjectNode o = Json.object().put("code", q.code());
    write(o, q.period(), zone);
    o.put("effect", q.effect()).put("sentence", q.sentence());
    o.set("corrections", Json.list(q.corrections(), CorrectionJson::write));
    return o;
  }

  /** The reading that {@link #write(Reading)} wrote. */
  public static Reading read(String document) {
    JsonNode o = Json.parse(document);
    ReadingKind kind = ReadingKind.find(o.path("kind").asString()).orElseThrow();
    boolean log = kind == ReadingKind.LOG;
    return new Reading(
        kind,
        period(o),
        o.path(countKey(kind)).longValue(),
        Json.number(o, "sample_rate_hz"),
        Json.strings(o, "notes"),
        Json.list(o, "quality", ReadingJson::quality),
        log ? Optional.of(LogJson.read(o)) : Optional.empty(),
        log ? Optional.empty() : Optional.of(CaptureJson.read(o)));
  }

  private static Optional<Period> period(JsonNode o) {
    JsonNode p = o.path(PERIOD);
    return p.isObject()
        ? Optional.of(new Period(Moments.from(p).toInstant(), Moments.to(p).toInstant()))
        : Optional.empty();
  }

  private static QualityFinding quality(JsonNode o) {
    return new QualityFinding(
        o.path("code").asString(),
        period(o),
        o.path("effect").asString(),
        o.path("sentence").asString(),
        Json.list(o, "corrections", CorrectionJson::read));
  }
}
