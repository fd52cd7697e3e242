package fourthwire.json;

import fourthwire.metering.Correction;
import fourthwire.metering.Correction.DropRepeats;
import fourthwire.metering.Correction.DropRows;
import fourthwire.metering.Correction.FormDistortion;
import fourthwire.metering.Correction.KeepWithin;
import fourthwire.metering.Correction.LeaveOut;
import fourthwire.metering.Correction.Reorder;
import fourthwire.metering.Correction.Rows;
import fourthwire.metering.Correction.Scale;
import fourthwire.metering.Correction.ShiftClock;
import fourthwire.metering.Correction.Step;
import fourthwire.metering.Correction.SumLines;
import fourthwire.metering.Correction.TurnSign;
import fourthwire.metering.LogResult;
import fourthwire.metering.correction.CorrectionRepository;
import java.time.ZoneId;
import java.time.ZoneOffset;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ObjectNode;

/** A correction of a log: its sentence and its steps. */
public final class CorrectionJson {
  private static final String QUANTITIES = "quantities";
  private static final String QUANTITY = "quantity";

  private CorrectionJson() {}

  /** The correction's document. */
  public static ObjectNode write(Correction c) {
    ObjectNode o = Json.object().put("sentence", c.sentence());
    o.set("steps", Json.list(c.steps(), CorrectionJson::write));
    return o;
  }

  /** A correction that was made. */
  public static ObjectNode write(CorrectionRepository.Entry e, ZoneId zone) {
    ObjectNode o = Json.object().put("id", e.id()).put("finding", e.finding());
    o.setAll(write(e.correction()));
    o.put("made", Moments.write(e.made(), zone));
    e.undone()
        .ifPresentOrElse(at -> o.put("undone", Moments.write(at, zone)), () -> o.putNull("undone"));
    return o;
  }

  /** What a log says as corrected, in the shape of what it says as read. */
  public static ObjectNode write(LogResult log) {
    return write(log, ZoneOffset.UTC);
  }

  static ObjectNode write(LogResult log, ZoneId zone) {
    ObjectNode o = Json.object();
    LogJson.write(o, log, zone);
    return o;
  }

  /** The log that {@link #write(LogResult)} wrote. */
  public static LogResult log(String document) {
    return LogJson.read(Json.parse(document));
  }

  private static ObjectNode write(Step step) {
    if (step instanceof LeaveOut s) {
      ObjectNode o = kind("leave-out", s.rows());
      o.set(QUANTITIES, Json.strings(s.quantities()));
      return o;
    }
    if (step instanceof KeepWithin s) {
      return kind("keep-within", Rows.ALL)
          .put(QUANTITY, s.quantity())
          .put("low", s.low())
          .put("high", s.high());
    }
    if (step instanceof DropRepeats s) {
      return kind("drop-repeats", s.rows());
    }
    if (step instanceof DropRows s) {
      return kind("drop-rows", s.rows());
    }
    if (step instanceof ShiftClock s) {
      return kind("shift-clock", s.rows()).put("seconds", s.millis() / 1000.0);
    }
    return writeOther(step);
  }

  private static ObjectNode writeOther(Step step) {
    if (step instanceof TurnSign s) {
      ObjectNode o = kind("turn-sign", s.rows());
      o.set(QUANTITIES, Json.strings(s.quantities()));
      return o;
    }
    if (step instanceof Scale s) {
      ObjectNode o = kind("scale", s.rows()).put("factor", s.factor());
      o.set(QUANTITIES, Json.strings(s.quantities()));
      return o;
    }
    if (step instanceof Reorder s) {
      ObjectNode o = kind("reorder", s.rows());
      ObjectNode from = o.putObject("from");
      s.from().forEach(from::put);
      return o;
    }
    if (step instanceof SumLines s) {
      return kind("sum-lines", s.rows()).put("measure", s.measure());
    }
    FormDistortion s = (FormDistortion) step;
    return kind("form-distortion", s.rows()).put(QUANTITY, s.quantity());
  }

  private static ObjectNode kind(String word, Rows rows) {
    ObjectNode o = Json.object().put("kind", word);
    if (!rows.equals(Rows.ALL)) {
      o.put("from_row", rows.from());
      if (rows.to() < Long.MAX_VALUE) {
        o.put("to_row", rows.to());
      }
    }
    return o;
  }

  /** The correction that {@link #write(Correction)} wrote. */
  public static Correction read(String document) {
    return read(Json.parse(document));
  }

  static Correction read(JsonNode o) {
    return new Correction(
        o.path("sentence").asString(), Json.list(o, "steps", CorrectionJson::step));
  }

  private static Step step(JsonNode o) {
    Rows rows =
        new Rows(
            Json.whole(o, "from_row").orElse(0), Json.whole(o, "to_row").orElse(Long.MAX_VALUE));
    String quantity = o.path(QUANTITY).asString("");
    String kind = o.path("kind").asString();
    return switch (kind) {
      case "leave-out" -> new LeaveOut(Json.strings(o, QUANTITIES), rows);
      case "keep-within" ->
          new KeepWithin(quantity, o.path("low").doubleValue(), o.path("high").doubleValue());
      case "drop-repeats" -> new DropRepeats(rows);
      case "drop-rows" -> new DropRows(rows);
      case "shift-clock" ->
          new ShiftClock(Math.round(1000 * o.path("seconds").doubleValue()), rows);
      case "turn-sign" -> new TurnSign(Json.strings(o, QUANTITIES), rows);
      case "scale" -> new Scale(Json.strings(o, QUANTITIES), o.path("factor").doubleValue(), rows);
      case "reorder" -> new Reorder(Json.map(o, "from", JsonNode::asString), rows);
      case "sum-lines" -> new SumLines(o.path("measure").asString(), rows);
      case "form-distortion" -> new FormDistortion(quantity, rows);
      default -> throw new IllegalArgumentException("no correction is \"" + kind + "\"");
    };
  }
}
