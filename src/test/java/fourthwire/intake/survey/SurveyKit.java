package fourthwire.intake.survey;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;
import org.dhatim.fastexcel.Workbook;
import org.dhatim.fastexcel.Worksheet;

/**
 * A small survey with rows in every table, as a tester writes it by hand, to be changed cell by
 * cell and packed. Invented.
 */
final class SurveyKit {
  private static final String HOURS =
      "h00,h01,h02,h03,h04,h05,h06,h07,h08,h09,h10,h11,h12,h13,h14,"
          + "h15,h16,h17,h18,h19,h20,h21,h22,h23";
  private static final String FLAT = ",0.5".repeat(24);

  private final Map<String, List<List<String>>> tables = new LinkedHashMap<>();
  private final Map<String, byte[]> others = new LinkedHashMap<>();

  SurveyKit() {
    add(
        "site",
        "key,value",
        "name,Test house",
        "frequency_hz,50",
        "practice,iec",
        "timezone,Europe/Vienna",
        "currency,EUR",
        "energy_price_per_kwh,0.21",
        "pcc,T1");
    add(
        "supplies",
        "supply,line_voltage_v,fault_level_mva,x_over_r,role,system,generator_kva,"
            + "subtransient_reactance_percent,connects_at",
        "GRID,11000,150,8,normal,three-phase-3-wire,,,",
        "GEN,400,,,standby,,500,12.5,MSB");
    add("background", "supply,order,percent,degrees", "GRID,5,1.5,20", "GRID,7,0.8,");
    add(
        "transformers",
        "transformer,fed_from,rated_kva,primary_v,secondary_v,connection,impedance_percent,"
            + "load_loss_w,primary_lines",
        "T1,GRID,630,11000,400,Dyn11,4.5,6500,",
        "T2,MSB,10,400,240,Iii0,4,200,L1-L2");
    add(
        "panels",
        "panel,fed_from,system,parent_lines,bus_rating_a,neutral_bus_rating_a,length_m,"
            + "conductor_size,conductor_material,neutral_size,ampacity_a",
        "MSB,T1,three-phase-4-wire,,1000,1000,,,,,",
        "LP-1,MSB,,,160,160,35,50 mm2,copper,25 mm2,150",
        "LP-2,MSB,single-phase,L3,63,,20,10 mm2,copper,,55",
        "LP-3,T2,split-phase,,100,,,,,,",
        "PP-1,MSB,three-phase-3-wire,,250,,30,120 mm2,aluminium,,");
    add(
        "circuits",
        "circuit,panel,lines,breaker_a,shared_neutral,length_m,conductor_size,neutral_size",
        "1,LP-1,L1,16,A,25,2.5 mm2,2.5 mm2",
        "2,LP-1,L2,16,A,22,2.5 mm2,",
        "3,LP-1,L3,16,A,20,2.5 mm2,",
        "4,LP-1,L1-L2-L3-N,32,,15,6 mm2,",
        "1,LP-2,L1,16,,12,2.5 mm2,",
        "1,LP-3,L1-L2,20,,,,",
        "M1,PP-1,L1-L2-L3,63,,18,16 mm2,",
        "M2,PP-1,L1-L2-L3,63,,18,16 mm2,");
    add(
        "loads",
        "load,circuit,panel,kind,spectrum,quantity,rated_w,rated_va,rated_a,demand_factor,"
            + "schedule,displacement_factor,low_w,high_w,confidence,line_choke_percent",
        "desks,LP-1:1,,capacitor-input,,12,90,,,0.8,office,,60,120,counted,",
        "desks,2,LP-1,capacitor-input,,10,90,,,0.8,office,,,,counted,",
        "lights,LP-1:3,,,led,40,18,,,,office,,,,nameplate,",
        "heater,LP-1:4,,resistive,,1,6000,,,,,,,,,",
        "kettle,LP-2:1,,linear,,1,,2000,,0.2,,0.98,,,,",
        "dryer,LP-3:1,,resistive,,1,3000,,,,,,,,,",
        "fan drive,M1,,six-pulse,,2,7500,,,,,,,,,3",
        "pump,M2,,motor,,1,,,12,0.9,,0.85,,,,");
    add("spectra", "spectrum,order,percent,degrees", "led,1,100,-5", "led,3,25,170", "led,5,12,");
    add(
        "schedules",
        "schedule,days," + HOURS,
        "office,weekday" + FLAT,
        "office,saturday" + FLAT,
        "office,sunday" + FLAT);
    add(
        "capacitors",
        "capacitor,panel,kvar,rated_v,detuning_percent,quality_factor,steps",
        "C1,MSB,50,440,7,30,4");
    add(
        "filters",
        "filter,panel,type,kvar,rated_v,tuned_order,quality_factor,rated_a,impedance_percent",
        "F1,PP-1,tuned,20,,4.8,40,,",
        "F2,MSB,active,,,,,60,",
        "F3,LP-1,zero-sequence,,,,,80,2");
    add(
        "meters",
        "meter,at,ct_ratio,ct_reversed,instrument",
        "main,MSB,80,L2,class-a",
        "desks,LP-1:1,,,true-rms");
    add(
        "spot_readings",
        "at,time,l1_a,l2_a,l3_a,n_a,l1_v,kw,power_factor,thd_percent,instrument",
        "LP-1,2026-03-10T10:15,31,28,25,34,229,,0.91,38,true-rms",
        "M1,,12,12,11.5,,,7.2,,,average-responding");
  }

  private void add(String table, String... lines) {
    List<List<String>> rows = new ArrayList<>();
    for (String line : lines) {
      rows.add(new ArrayList<>(List.of(line.split(",", -1))));
    }
    tables.put(table, rows);
  }

  /** Sets a cell; the row is counted as a spreadsheet shows it. */
  SurveyKit set(String table, int row, String column, String value) {
    List<List<String>> rows = tables.get(table);
    int index = rows.get(0).indexOf(column);
    if (index < 0) {
      rows.get(0).add(column);
      index = rows.get(0).size() - 1;
      for (int r = 1; r < rows.size(); r++) {
        rows.get(r).add("");
      }
    }
    rows.get(row - 1).set(index, value);
    return this;
  }

  /** Puts a row at the end, given as its header's cells. */
  SurveyKit append(String table, String line) {
    tables.get(table).add(new ArrayList<>(List.of(line.split(",", -1))));
    return this;
  }

  SurveyKit removeRow(String table, int row) {
    tables.get(table).remove(row - 1);
    return this;
  }

  SurveyKit removeColumn(String table, String column) {
    int index = tables.get(table).get(0).indexOf(column);
    tables.get(table).forEach(r -> r.remove(index));
    return this;
  }

  SurveyKit rename(String table, String column, String to) {
    List<String> header = tables.get(table).get(0);
    header.set(header.indexOf(column), to);
    return this;
  }

  SurveyKit removeTable(String table) {
    tables.remove(table);
    return this;
  }

  /** Replaces a table's file by these bytes. */
  SurveyKit file(String path, byte[] bytes) {
    others.put(path, bytes);
    return this;
  }

  SurveyKit file(String path, String text) {
    return file(path, text.getBytes(StandardCharsets.UTF_8));
  }

  List<List<String>> rows(String table) {
    return tables.get(table);
  }

  /** The table as CSV with this separator and line end. */
  String csv(String table, char separator, String lineEnd) {
    StringBuilder text = new StringBuilder();
    for (List<String> row : tables.get(table)) {
      text.append(
          String.join(
              String.valueOf(separator), row.stream().map(c -> quoted(c, separator)).toList()));
      text.append(lineEnd);
    }
    return text.toString();
  }

  private static String quoted(String cell, char separator) {
    boolean plain = cell.indexOf(separator) < 0 && !cell.contains("\"") && !cell.contains("\n");
    return plain ? cell : '"' + cell.replace("\"", "\"\"") + '"';
  }

  Map<String, byte[]> csvFiles() {
    Map<String, byte[]> files = new LinkedHashMap<>();
    for (String table : tables.keySet()) {
      files.put(table + ".csv", csv(table, ',', "\n").getBytes(StandardCharsets.UTF_8));
    }
    files.putAll(others);
    return files;
  }

  byte[] zip() {
    return zip(csvFiles());
  }

  static byte[] zip(Map<String, byte[]> files) {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (ZipOutputStream zip = new ZipOutputStream(bytes)) {
      for (Map.Entry<String, byte[]> file : files.entrySet()) {
        zip.putNextEntry(new ZipEntry(file.getKey()));
        zip.write(file.getValue());
        zip.closeEntry();
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return bytes.toByteArray();
  }

  /** The same tables as a workbook: numbers as numbers, all else as text. */
  byte[] xlsx() {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (Workbook workbook = new Workbook(bytes, "test", null)) {
      tables.forEach((name, rows) -> write(rows, workbook.newWorksheet(name)));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return bytes.toByteArray();
  }

  private static void write(List<List<String>> rows, Worksheet sheet) {
    for (int r = 0; r < rows.size(); r++) {
      for (int c = 0; c < rows.get(r).size(); c++) {
        String text = rows.get(r).get(c);
        if (text.startsWith("=")) {
          sheet.formula(r, c, text.substring(1));
        } else if (text.matches("-?\\d+(\\.\\d+)?")) {
          sheet.value(r, c, new BigDecimal(text));
        } else {
          sheet.value(r, c, text);
        }
      }
    }
  }
}
