package fourthwire.json;

import fourthwire.audit.measured.LogVerdict;
import fourthwire.limits.distortion.MeasuredBand;
import java.time.ZoneId;
import java.util.List;
import java.util.Locale;
import tools.jackson.databind.node.ObjectNode;

/** What limits of measured values say of a log. */
public final class LogVerdictJson {
  private LogVerdictJson() {}

  /**
   * The whole document.
   *
   * @param set which set of rows it is of
   */
  public static ObjectNode write(
      String set, List<LogVerdict> verdicts, List<String> notes, ZoneId zone) {
    ObjectNode o = Json.object().put("set", set);
    o.set("notes", Json.strings(notes));
    o.set("limits", Json.list(verdicts, v -> write(v, zone)));
    return o;
  }

  private static ObjectNode write(LogVerdict v, ZoneId zone) {
    MeasuredBand band = v.band();
    ObjectNode o = Json.object().put("code", v.code()).put("basis", band.basis());
    o.put("period", band.values().word()).put("value_s", band.values().seconds());
    o.put("percent_of_values", band.percent()).put("unit", v.unit());
    if (band.isTwoSided()) {
      o.put("band_from", band.low()).put("band_to", band.high());
    }
    o.put("outcome", v.outcome().name().toLowerCase(Locale.ROOT));
    o.set("worst", write(v.worst(), zone));
    o.set("periods", Json.list(v.periods(), p -> write(p, zone)));
    return o;
  }

  private static ObjectNode write(LogVerdict.Period p, ZoneId zone) {
    ObjectNode o = Json.object().put("from", Moments.write(p.from(), zone));
    o.put("place", p.place());
    if (p.order() > 0) {
      o.put("order", p.order());
    }
    return o.put("figure", p.figure())
        .put("limit", p.limit())
        .put("share_percent", p.sharePercent())
        .put("outcome", p.outcome().name().toLowerCase(Locale.ROOT));
  }
}
