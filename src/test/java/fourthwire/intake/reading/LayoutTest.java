package fourthwire.intake.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.intake.reading.upload.FormatReader;
import fourthwire.metering.QuantitySummary;
import fourthwire.metering.RawFile;
import fourthwire.metering.Reading;
import java.math.BigDecimal;
import java.math.MathContext;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.time.Duration;
import java.time.LocalDateTime;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.time.temporal.ChronoUnit;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * One truth in many layouts, read without a mapping: every figure comes back to the last digit. The
 * layouts are invented in the manner in which meters write.
 */
class LayoutTest {
  private static final Charset LATIN_1 = StandardCharsets.ISO_8859_1;
  private static final Map<String, LayoutWriter> LAYOUTS = new LinkedHashMap<>();

  private static LayoutWriter layout(String name, LayoutWriter layout) {
    LAYOUTS.put(name, layout);
    return layout;
  }

  static {
    layout(
            "plain, units in brackets",
            LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm:ss"))
        .lines("Voltage L# [V]", "rms_v")
        .lines("Current L# [A]", "rms_a")
        .column("Current N [A]", "N.rms_a")
        .lines("Active power L# [kW]", "active_w", 3)
        .column("Frequency [Hz]", "frequency_hz");
    layout(
            "semicolons, comma, German words",
            LayoutWriter.of(";", ',').time("Datum", "dd.MM.yyyy").time("Uhrzeit", "HH:mm:ss"))
        .lines("Spannung L# [V]", "rms_v")
        .lines("Strom L# [A]", "rms_a")
        .column("Strom N [A]", "N.rms_a")
        .lines("Wirkleistung L# [kW]", "active_w", 3)
        .lines("Blindleistung L# [kvar]", "reactive_var", 3)
        .column("Frequenz [Hz]", "frequency_hz")
        .column("Leistungsfaktor gesamt", "total.power_factor")
        .encoded(LATIN_1, "")
        .lineEnd("\r\n");
    layout("symbols without units", LayoutWriter.of(",", '.').time("timestamp", "yyyy-MM-dd HH:mm"))
        .lines("V#", "rms_v")
        .lines("I#", "rms_a")
        .column("IN", "N.rms_a")
        .lines("P#", "active_w", 3)
        .lines("Q#", "reactive_var", 3)
        .lines("S#", "apparent_va", 3)
        .lines("PF#", "power_factor")
        .lines("THDI#", "current_thd_percent")
        .lines("THDV#", "voltage_thd_percent")
        .column("F", "frequency_hz");
    layout("letters of phases", LayoutWriter.of("\t", '.').time("Date Time", "M/d/yyyy h:mm:ss a"))
        .lines("V@N", "rms_v")
        .column("Vab", "L1-L2.rms_v")
        .column("Vbc", "L2-L3.rms_v")
        .column("Vca", "L3-L1.rms_v")
        .lines("I@", "rms_a")
        .column("In", "N.rms_a")
        .lines("kW @", "active_w", 3)
        .lines("kVA @", "apparent_va", 3)
        .column("kW Total", "total.active_w", 3);
    layout(
            "units row",
            LayoutWriter.of(";", ',')
                .time("Date|dd.mm.yyyy", "dd.MM.yyyy")
                .time("Time|hh:mm", "HH:mm")
                .preamble("Device;PQ recorder", "Serial;1234567", "Interval;10 min", ""))
        .lines("U L#|V", "rms_v")
        .lines("I L#|A", "rms_a")
        .column("I N|A", "N.rms_a")
        .column("P total|kW", "total.active_w", 3)
        .column("cos phi|", "")
        .column("f|Hz", "frequency_hz");
    layout("groups above", LayoutWriter.of(",", '.').time("|Time", "yyyy/MM/dd HH:mm:ss"))
        .column("Voltage (V)|L1", "L1.rms_v")
        .column("|L2", "L2.rms_v")
        .column("|L3", "L3.rms_v")
        .column("Current (A)|L1", "L1.rms_a")
        .column("|L2", "L2.rms_a")
        .column("|L3", "L3.rms_a")
        .column("|N", "N.rms_a");
    layout(
            "min avg max",
            LayoutWriter.of(",", '.')
                .time("Start", "dd/MM/yyyy HH:mm")
                .time(
                    "End",
                    t ->
                        java.time.format.DateTimeFormatter.ofPattern("dd/MM/yyyy HH:mm")
                            .format(t.plusMinutes(10))))
        .column("U1 min [V]", "L1.rms_v.min")
        .column("U1 avg [V]", "L1.rms_v")
        .column("U1 max [V]", "L1.rms_v.max")
        .column("I1 avg [A]", "L1.rms_a");
    layout("UTF-16 LE with mark", LayoutWriter.of("\t", ',').time("Zeit", "dd.MM.yyyy HH:mm:ss"))
        .lines("U# (V)", "rms_v")
        .lines("I# (A)", "rms_a")
        .lines("P# (W)", "active_w")
        .encoded(StandardCharsets.UTF_16LE, "\uFEFF")
        .lineEnd("\r\n");
    layout("UTF-16 BE without mark", LayoutWriter.of(";", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .lines("Vrms ph#", "rms_v")
        .lines("Irms ph#", "rms_a")
        .encoded(StandardCharsets.UTF_16BE, "");
    layout("UTF-8 with mark", LayoutWriter.of(";", ',').time("Horodatage", "dd/MM/yyyy HH:mm"))
        .lines("Tension L# (V)", "rms_v")
        .lines("Courant L# (A)", "rms_a")
        .column("Puissance active totale (kW)", "total.active_w", 3)
        .column("Fréquence (Hz)", "frequency_hz")
        .encoded(StandardCharsets.UTF_8, "\uFEFF");
    layout(
            "12-hour in two columns",
            LayoutWriter.of(",", '.').time("Date", "MM/dd/yy").time("Time", "hh:mm:ss a"))
        .lines("Volts L#", "rms_v")
        .lines("Amps L#", "rms_a")
        .column("Amps N", "N.rms_a");
    layout("offsets", LayoutWriter.of(",", '.').time("timestamp", t -> t.toString() + ":00+01:00"))
        .lines("voltage_l#", "rms_v")
        .lines("current_l#", "rms_a")
        .lines("active_power_l#_kw", "active_w", 3);
    layout(
            "epoch seconds",
            LayoutWriter.of(",", '.')
                .time(
                    "unix_time",
                    t -> String.valueOf(t.minusHours(1).toEpochSecond(ZoneOffset.UTC))))
        .lines("voltage_l#", "rms_v")
        .lines("current_l#", "rms_a")
        .column("frequency", "frequency_hz");
    layout(
            "epoch milliseconds",
            LayoutWriter.of(";", '.')
                .time("ts", t -> t.minusHours(1).toEpochSecond(ZoneOffset.UTC) + "000"))
        .lines("UL# [V]", "rms_v")
        .lines("IL# [A]", "rms_a");
    layout(
            "days of a spreadsheet",
            LayoutWriter.of(",", '.')
                .time(
                    "Date/Time",
                    t ->
                        String.format(
                            java.util.Locale.ROOT,
                            "%.8f",
                            ChronoUnit.SECONDS.between(LocalDateTime.of(1899, 12, 30, 0, 0), t)
                                / 86400.0)))
        .lines("Phase # Voltage (V)", "rms_v")
        .lines("Phase # Current (A)", "rms_a");
    layout("thousands by point", LayoutWriter.of(";", ',').time("Zeitpunkt", "dd.MM.yyyy HH:mm"))
        .lines("U L# [V]", "rms_v")
        .lines("P L# [W]", "active_w")
        .column("E [Wh]", "total.energy_wh")
        .grouping(".");
    layout(
            "thousands by comma in quotes",
            LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .lines("V L# (V)", "rms_v")
        .lines("P L# (W)", "active_w")
        .column("Energy (Wh)", "total.energy_wh")
        .grouping(",");
    layout("thousands by blanks", LayoutWriter.of(";", ',').time("Tid", "yyyy-MM-dd HH:mm"))
        .lines("U L# [V]", "rms_v")
        .lines("P L# [W]", "active_w")
        .column("Energi [Wh]", "total.energy_wh")
        .grouping("\u00A0");
    layout("thousands by apostrophes", LayoutWriter.of(";", '.').time("Zeit", "dd.MM.yyyy HH:mm"))
        .lines("U L# [V]", "rms_v")
        .lines("P L# [W]", "active_w")
        .column("E total [kWh]", "total.energy_wh", 3)
        .grouping("'");
    layout(
            "decimal comma in quoted cells",
            LayoutWriter.of(",", ',').time("Time", "yyyy-MM-dd HH:mm"))
        .lines("V L# (V)", "rms_v")
        .lines("I L# (A)", "rms_a");
    layout(
            "harmonics in amps without unit",
            LayoutWriter.of(",", '.').time("timestamp", "yyyy-MM-dd HH:mm:ss"))
        .lines("I#", "rms_a")
        .lines("I#_H1", "current_h1_a")
        .lines("I#_H3", "current_h3_a")
        .lines("I#_H5", "current_h5_a")
        .lines("I#_H7", "current_h7_a")
        .lines("I#_H9", "current_h9_a");
    layout(
            "harmonics in percent without unit",
            LayoutWriter.of(",", '.').time("timestamp", "yyyy-MM-dd HH:mm:ss"))
        .lines("I#", "rms_a")
        .lines("I# H01", "current_h1_percent")
        .lines("I# H03", "current_h3_percent")
        .lines("I# H05", "current_h5_percent");
    layout(
            "harmonics by their distortion: amps",
            LayoutWriter.of(",", '.').time("timestamp", "yyyy-MM-dd HH:mm:ss"))
        .lines("I#", "rms_a")
        .lines("THD I# %", "current_thd_percent")
        .lines("I# h3", "current_h3_a")
        .lines("I# h5", "current_h5_a")
        .lines("I# h7", "current_h7_a")
        .lines("I# h9", "current_h9_a");
    layout(
            "harmonics by their distortion: percent",
            LayoutWriter.of(",", '.').time("timestamp", "yyyy-MM-dd HH:mm:ss"))
        .lines("I#", "rms_a")
        .lines("THD I# %", "current_thd_percent")
        .lines("Harm 3 I#", "current_h3_percent")
        .lines("Harm 5 I#", "current_h5_percent")
        .lines("Harm 7 I#", "current_h7_percent")
        .lines("Harm 9 I#", "current_h9_percent");
    layout("harmonics with units", LayoutWriter.of(";", ',').time("Zeit", "dd.MM.yyyy HH:mm"))
        .lines("I L# H3 [A]", "current_h3_a")
        .lines("I L# H5 [A]", "current_h5_a")
        .lines("I L# 7. Harm [A]", "current_h7_a")
        .lines("9. Oberschwingung I L# [A]", "current_h9_a");
    layout("harmonics by name, percent", LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .lines("Current L# 3rd harmonic (%)", "current_h3_percent")
        .lines("Current L# 5th harmonic (% of fund)", "current_h5_percent")
        .lines("Ih7 L# [%f]", "current_h7_percent");
    layout(
            "header repeated and notes",
            LayoutWriter.of(";", ',').time("Datum", "dd.MM.yyyy").time("Zeit", "HH:mm"))
        .lines("U# [V]", "rms_v")
        .lines("I# [A]", "rms_a")
        .headerEvery(144)
        .footer("", "Summary;;;;;;;", "Max;;231,0;231,0;232,0;99,0;99,0;99,0", "End of file");
    layout(
            "marks for what was not measured",
            LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .column("I L1 (A)", "L1.rms_a")
        .column("I L2 (A)", "L2.rms_a")
        .mark(3, "")
        .mark(9, "-")
        .mark(20, "N/A")
        .mark(40, "OL")
        .mark(41, "---")
        .mark(42, "NaN")
        .mark(50, ">600")
        .mark(51, "Err")
        .mark(60, "overrange");
    layout(
            "trailing separators, carriage returns",
            LayoutWriter.of(";", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .lines("U L# V", "rms_v")
        .lines("I L# A", "rms_a")
        .trailingSeparator()
        .lineEnd("\r");
    layout(
            "everything quoted",
            LayoutWriter.of(",", '.').time("Date", "dd-MMM-yyyy").time("Time", "HH:mm:ss"))
        .lines("Voltage, Phase # (V)", "rms_v")
        .lines("Current, Phase # (A)", "rms_a")
        .quoted();
    layout(
            "kilovolts and milliamps",
            LayoutWriter.of("\t", '.').time("Local time", "d MMM yyyy HH:mm"))
        .lines("U# [kV]", "rms_v", 3)
        .lines("I# [mA]", "rms_a", -3)
        .column("P [MW]", "total.active_w", 6);
    layout("R S T", LayoutWriter.of(";", ',').time("Fecha", "dd/MM/yyyy").time("Hora", "HH:mm"))
        .lines("Tensión $ (V)", "rms_v")
        .lines("Corriente $ (A)", "rms_a")
        .lines("Potencia activa $ (kW)", "active_w", 3)
        .column("Frecuencia (Hz)", "frequency_hz");
    layout("unit first", LayoutWriter.of(",", '.').time("Date & Time", "MM-dd-yyyy HH:mm"))
        .lines("V_L#", "rms_v")
        .lines("A_L#", "rms_a")
        .lines("kW_L#", "active_w", 3)
        .lines("kVAR_L#", "reactive_var", 3)
        .lines("kVA_L#", "apparent_va", 3)
        .column("Hz", "frequency_hz");
    layout("bars", LayoutWriter.of("|", '.').time("Time", "yyyy.MM.dd HH:mm:ss"))
        .lines("Urms_#(V)", "rms_v")
        .lines("Irms_#(A)", "rms_a")
        .lines("P_#(W)", "active_w");
    layout(
            "lined up by blanks",
            LayoutWriter.of("   ", '.').time("Date", "yyyy-MM-dd").time("Time", "HH:mm:ss"))
        .lines("V#(V)", "rms_v")
        .lines("I#(A)", "rms_a");
    layout("units behind a slash", LayoutWriter.of(";", ',').time("Datum/Zeit", "dd.MM.yy HH:mm"))
        .lines("U L# / V", "rms_v")
        .lines("I L# / A", "rms_a")
        .column("P ges / kW", "total.active_w", 3)
        .encoded(LATIN_1, "");
    layout("power factor in percent", LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .lines("PF L# (%)", "power_factor", -2)
        .lines("V L# (V)", "rms_v");
    layout(
            "text columns between",
            LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm").preamble("sep=,"))
        .column("Status", "")
        .lines("V L# avg (V)", "rms_v")
        .column("Event flag", "")
        .lines("I L# avg (A)", "rms_a");
    layout("camel case", LayoutWriter.of(",", '.').time("TimeStamp", "yyyy-MM-dd'T'HH:mm:ss"))
        .lines("VoltageL#", "rms_v")
        .lines("CurrentL#", "rms_a")
        .lines("ActivePowerL#kW", "active_w", 3)
        .column("CurrentN", "N.rms_a");
    layout(
            "UTC in the heading",
            LayoutWriter.of(",", '.').time("Time (UTC)", t -> t.minusHours(1).toString()))
        .lines("U_L#_V", "rms_v")
        .lines("I_L#_A", "rms_a");
    layout(
            "zone above",
            LayoutWriter.of(",", '.')
                .time("Time", t -> t.minusHours(1).toString())
                .preamble("Site,Works", "Time zone,UTC"))
        .lines("Pst L#", "")
        .lines("V#-N (V)", "rms_v")
        .lines("I# (A)", "rms_a");
    layout("three rows of header", LayoutWriter.of(";", ',').time("Zeit||", "dd.MM.yyyy HH:mm"))
        .column("U1|min|V", "L1.rms_v.min")
        .column("U1|avg|V", "L1.rms_v")
        .column("U1|max|V", "L1.rms_v.max")
        .column("I1|avg|A", "L1.rms_a");
    layout(
            "one day whose start stands above",
            LayoutWriter.of(",", '.')
                .time("Time", "MM/dd/yyyy HH:mm")
                .rows(18)
                .preamble("Recording start:,2025-02-11 21:00:00", ""))
        .lines("V# (V)", "rms_v")
        .lines("I# (A)", "rms_a");
    layout("day names", LayoutWriter.of(",", '.').time("Time", "EEE MM/dd/yyyy HH:mm").rows(18))
        .lines("V# (V)", "rms_v")
        .lines("I# (A)", "rms_a");
  }

  static Stream<String> layouts() {
    return LAYOUTS.keySet().stream();
  }

  @ParameterizedTest
  @MethodSource("layouts")
  void isReadToTheLastDigit(String name) {
    LayoutWriter layout = LAYOUTS.get(name);
    check(layout);
  }

  static void check(LayoutWriter layout) {
    List<RawFile> files = List.of(Files.of("log.csv", layout.bytes()));
    ReadingSetting setting = Files.setting(50);
    ReadingReader reader = new FormatReader();
    Reading reading;
    try {
      reading = reader.read(files, reader.plan(files, setting), setting, (share, message) -> true);
    } catch (ReadingRefusedException e) {
      throw new AssertionError(e.getMessage() + " " + e.questions() + " of " + e.columns(), e);
    }
    Map<String, QuantitySummary> found = reading.log().orElseThrow().quantities();
    Map<String, List<BigDecimal>> expected = layout.expected();
    assertThat(reading.count()).isEqualTo(layout.rowCount());
    assertThat(reading.log().orElseThrow().interval()).isEqualTo(Duration.ofMinutes(10));
    assertThat(reading.period().orElseThrow().from())
        .isEqualTo(layout.start().atZone(ZoneId.of("Europe/Amsterdam")).toInstant());
    assertThat(found.keySet()).containsExactlyInAnyOrderElementsOf(expected.keySet());
    expected.forEach((quantity, values) -> check(quantity, found.get(quantity), values));
  }

  private static void check(String quantity, QuantitySummary found, List<BigDecimal> values) {
    List<BigDecimal> sorted = values.stream().sorted().toList();
    double mean =
        values.stream()
            .reduce(BigDecimal.ZERO, BigDecimal::add)
            .divide(BigDecimal.valueOf(values.size()), MathContext.DECIMAL64)
            .doubleValue();
    assertThat(found.count()).as(quantity).isEqualTo(values.size());
    assertThat(found.min()).as(quantity).isEqualTo(sorted.get(0).doubleValue());
    assertThat(found.max()).as(quantity).isEqualTo(sorted.get(sorted.size() - 1).doubleValue());
    assertThat(found.mean()).as(quantity).isCloseTo(mean, within(1e-12 * Math.abs(mean)));
    assertThat(found.p95()).as(quantity).isCloseTo(percentile(sorted, 0.95), within(1e-9));
  }

  private static double percentile(List<BigDecimal> sorted, double share) {
    double at = (sorted.size() - 1) * share;
    double below = sorted.get((int) at).doubleValue();
    return below + (at - (int) at) * (sorted.get((int) at + 1).doubleValue() - below);
  }
}
