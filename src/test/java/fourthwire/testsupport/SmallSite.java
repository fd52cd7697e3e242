package fourthwire.testsupport;

import fourthwire.intake.survey.SurveyImport;
import fourthwire.site.Survey;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;

/**
 * One supply, one panel, two circuits, a meter; the circuit's name holds every character that could
 * come to grief in an address.
 */
public final class SmallSite {
  /** The name of the awkward circuit. */
  public static final String AWKWARD = "50 %; #1? \"é\" 100%25";

  private SmallSite() {}

  /** Its tables, by file name. */
  public static Map<String, String> tables(String name) {
    Map<String, String> tables = new LinkedHashMap<>();
    tables.put(
        "site.csv",
        "key,value\nname," + name + "\nfrequency_hz,50\npractice,iec\ntimezone,Europe/Vienna\n");
    tables.put(
        "supplies.csv",
        "supply,line_voltage_v,fault_level_mva,role\nGRID,400,20,normal\nSET,400,2,standby\n");
    tables.put("panels.csv", "panel,fed_from\nLP-1,GRID\n");
    tables.put(
        "circuits.csv",
        "circuit,panel,lines\nheat,LP-1,L1-L2-L3-N\n\""
            + AWKWARD.replace("\"", "\"\"")
            + "\",LP-1,L1\n");
    tables.put(
        "loads.csv",
        "load,circuit,panel,kind,quantity,rated_w\nheater,heat,LP-1,resistive,1,3000\n");
    tables.put("meters.csv", "meter,at\nM1,LP-1\n");
    return tables;
  }

  /** The tables as one file. */
  public static byte[] zip(Map<String, String> tables) {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (ZipOutputStream zip = new ZipOutputStream(bytes)) {
      for (Map.Entry<String, String> table : tables.entrySet()) {
        zip.putNextEntry(new ZipEntry(table.getKey()));
        zip.write(table.getValue().getBytes(StandardCharsets.UTF_8));
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return bytes.toByteArray();
  }

  /** The site's survey file. */
  public static byte[] zip(String name) {
    return zip(tables(name));
  }

  /** The site's survey. */
  public static Survey survey(String name) {
    return survey(tables(name));
  }

  /** A survey of tables by file name. */
  public static Survey survey(Map<String, String> tables) {
    SurveyImport.Outcome outcome = SurveyImport.read(zip(tables));
    if (outcome instanceof SurveyImport.Read read) {
      return read.survey();
    }
    throw new IllegalStateException(outcome.toString());
  }
}
