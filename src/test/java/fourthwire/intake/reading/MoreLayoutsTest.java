package fourthwire.intake.reading;

import java.nio.charset.StandardCharsets;
import java.time.format.DateTimeFormatter;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * As {@link LayoutTest}: layouts that were written after the reader, to see what it makes of them.
 */
class MoreLayoutsTest {
  private static final Map<String, LayoutWriter> LAYOUTS = new LinkedHashMap<>();

  private static LayoutWriter layout(String name, LayoutWriter layout) {
    LAYOUTS.put(name, layout);
    return layout;
  }

  static {
    layout(
            "recorder with long preamble",
            LayoutWriter.of(";", ',')
                .time("Date", "dd.MM.yyyy")
                .time("Time", "HH:mm:ss.SSS")
                .preamble(
                    "Recorder type;PQ 4",
                    "Recorder number;000123",
                    "Recording from;11.02.2025 21:00:00",
                    "Recording to;14.02.2025 08:50:00",
                    "Nominal voltage;230 V",
                    "CT ratio;400/5",
                    "",
                    "Mean values 10 min",
                    ""))
        .lines("UL# rms [V]", "rms_v")
        .lines("IL# rms [A]", "rms_a")
        .column("IN rms [A]", "N.rms_a")
        .lines("PL# [kW]", "active_w", 3)
        .lines("QL# [kvar]", "reactive_var", 3)
        .lines("PF L#", "power_factor");
    layout(
            "words before units, average named",
            LayoutWriter.of(",", '.').time("Timestamp", "dd-MMM-yy HH:mm:ss"))
        .lines("Vrms_L#_AVG", "rms_v")
        .lines("Irms_L#_AVG", "rms_a")
        .column("Irms_N_AVG", "N.rms_a")
        .lines("PowerP_L#_AVG [W]", "active_w");
    layout(
            "total harmonic distortion in words",
            LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm:ss"))
        .lines("Total Harmonic Distortion Current Phase # (%)", "current_thd_percent")
        .lines("Total Harmonic Distortion Voltage Phase # (%)", "voltage_thd_percent")
        .lines("Current Phase # (A)", "rms_a");
    layout(
            "line to line and line to neutral",
            LayoutWriter.of(",", '.').time("Date", "MM/dd/yyyy").time("Time", "HH:mm"))
        .column("Voltage L1-L2 (V)", "L1-L2.rms_v")
        .column("Voltage L2-L3 (V)", "L2-L3.rms_v")
        .column("Voltage L3-L1 (V)", "L3-L1.rms_v")
        .lines("Voltage L#-N (V)", "rms_v")
        .lines("Amps L#", "rms_a");
    layout("numbers of pairs", LayoutWriter.of(";", '.').time("Zeitstempel", "yyyy-MM-dd HH:mm:ss"))
        .column("U12 [V]", "L1-L2.rms_v")
        .column("U23 [V]", "L2-L3.rms_v")
        .column("U31 [V]", "L3-L1.rms_v")
        .lines("U#N [V]", "rms_v")
        .column("f [Hz]", "frequency_hz");
    layout("true, reactive, apparent", LayoutWriter.of(",", '.').time("DateTime", "M/d/yyyy H:mm"))
        .column("Total Real Power (kW)", "total.active_w", 3)
        .column("Total Reactive Power (kVAR)", "total.reactive_var", 3)
        .column("Total Apparent Power (kVA)", "total.apparent_va", 3)
        .column("Total Power Factor", "total.power_factor");
    layout(
            "index column and record number",
            LayoutWriter.of(",", '.').time("Date/Time", "yyyy-MM-dd HH:mm:ss"))
        .column("Record No.", "")
        .lines("I# [A]", "rms_a")
        .lines("V# [V]", "rms_v");
    layout(
            "unbalance, crest and flicker beside",
            LayoutWriter.of(";", ',').time("Zeit", "dd.MM.yyyy HH:mm"))
        .lines("U L# [V]", "rms_v")
        .lines("I L# [A]", "rms_a")
        .column("Drehfeld", "")
        .column("Pst L1", "")
        .column("CF I L1", "")
        .column("K-Faktor L1", "")
        .column("Temperatur [°C]", "");
    layout(
            "time zone behind each time",
            LayoutWriter.of(",", '.')
                .time(
                    "Time",
                    t -> DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm:ss").format(t) + " CET"))
        .lines("V# avg", "rms_v")
        .lines("I# avg", "rms_a");
    layout("ISO with Z", LayoutWriter.of(",", '.').time("time", t -> t.minusHours(1) + ":00.000Z"))
        .lines("ph#_voltage_v", "rms_v")
        .lines("ph#_current_a", "rms_a")
        .lines("ph#_power_w", "active_w")
        .column("freq_hz", "frequency_hz");
    layout(
            "compact date",
            LayoutWriter.of(";", '.').time("DATE", "yyyyMMdd").time("TIME", "HHmmss"))
        .lines("U# V", "rms_v")
        .lines("I# A", "rms_a");
    layout("compact date and time", LayoutWriter.of(",", '.').time("datetime", "yyyyMMddHHmm"))
        .lines("u#", "rms_v")
        .lines("i#", "rms_a")
        .column("in", "N.rms_a");
    layout(
            "interval as from - to",
            LayoutWriter.of(";", ',')
                .time(
                    "Intervall",
                    t ->
                        DateTimeFormatter.ofPattern("dd.MM.yyyy HH:mm").format(t)
                            + " - "
                            + DateTimeFormatter.ofPattern("HH:mm").format(t.plusMinutes(10))))
        .lines("U L# (V)", "rms_v")
        .lines("I L# (A)", "rms_a");
    layout(
            "French",
            LayoutWriter.of(";", ',')
                .time("Date", "dd/MM/yyyy")
                .time("Heure", "HH:mm:ss")
                .encoded(StandardCharsets.ISO_8859_1, ""))
        .lines("Tension phase # (V)", "rms_v")
        .lines("Courant phase # (A)", "rms_a")
        .column("Courant neutre (A)", "N.rms_a")
        .column("Puissance réactive totale (kvar)", "total.reactive_var", 3)
        .column("Facteur de puissance", "total.power_factor")
        .column("Énergie active (kWh)", "total.energy_wh", 3);
    layout("Dutch", LayoutWriter.of(";", ',').time("Tijdstip", "dd-MM-yyyy HH:mm"))
        .lines("Spanning L# (V)", "rms_v")
        .lines("Stroom L# (A)", "rms_a")
        .column("Stroom nul (A)", "N.rms_a")
        .column("Vermogen totaal (kW)", "total.active_w", 3)
        .column("Frequentie (Hz)", "frequency_hz");
    layout(
            "Italian, short names",
            LayoutWriter.of(";", ',').time("Data", "dd/MM/yyyy").time("Ora", "HH.mm.ss"))
        .lines("Tensione L# [V]", "rms_v")
        .lines("Corrente L# [A]", "rms_a")
        .column("Potenza attiva tot [W]", "total.active_w");
    layout(
            "amps per order, lines outside",
            LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .lines("L# I H1 (A)", "current_h1_a")
        .lines("L# I H3 (A)", "current_h3_a")
        .lines("L# I H5 (A)", "current_h5_a")
        .lines("L# I H7 (A)", "current_h7_a");
    layout("orders in groups above", LayoutWriter.of(",", '.').time("|Time", "yyyy-MM-dd HH:mm"))
        .column("Current harmonics L1 [%]|H3", "L1.current_h3_percent")
        .column("|H5", "L1.current_h5_percent")
        .column("|H7", "L1.current_h7_percent")
        .column("Current harmonics L2 [%]|H3", "L2.current_h3_percent")
        .column("|H5", "L2.current_h5_percent");
    layout("statistics below names", LayoutWriter.of(";", '.').time("Time|", "yyyy-MM-dd HH:mm"))
        .column("V L1 (V)|Min", "L1.rms_v.min")
        .column("V L1 (V)|Mean", "L1.rms_v")
        .column("V L1 (V)|Max", "L1.rms_v.max")
        .column("I L1 (A)|Min", "L1.rms_a.min")
        .column("I L1 (A)|Mean", "L1.rms_a")
        .column("I L1 (A)|Max", "L1.rms_a.max");
    layout(
            "statistic names over three columns",
            LayoutWriter.of(",", '.').time("|Time", "MM/dd/yyyy hh:mm:ss a"))
        .column("Average|U1 V", "L1.rms_v")
        .column("|I1 A", "L1.rms_a")
        .column("Minimum|U1 V", "L1.rms_v.min")
        .column("|I1 A", "L1.rms_a.min")
        .column("Maximum|U1 V", "L1.rms_v.max")
        .column("|I1 A", "L1.rms_a.max");
    layout("two-digit years, hyphens", LayoutWriter.of(",", '.').time("Time", "yy-MM-dd HH:mm"))
        .lines("V L#", "rms_v")
        .lines("I L#", "rms_a");
    layout(
            "ends of intervals, midnight as 24:00",
            LayoutWriter.of(";", ',')
                .time("Datum", t -> DateTimeFormatter.ofPattern("dd.MM.yyyy").format(t))
                .time(
                    "Zeit",
                    t ->
                        DateTimeFormatter.ofPattern("HH:mm")
                            .format(t.plusMinutes(10))
                            .replace("00:00", "24:00")))
        .lines("U L# [V]", "rms_v")
        .lines("I L# [A]", "rms_a");
    layout(
            "year, month, day, hour and minute in columns of their own",
            LayoutWriter.of(",", '.')
                .time("Year", "yyyy")
                .time("Month", "M")
                .time("Day", "d")
                .time("Hour", "H")
                .time("Minute", "m"))
        .lines("V# (V)", "rms_v")
        .lines("I# (A)", "rms_a");
    layout(
            "a date, and hours and minutes in columns of their own",
            LayoutWriter.of(";", ',')
                .time("Datum", "dd.MM.yyyy")
                .time("Stunde", "HH")
                .time("Minute", "mm"))
        .lines("U L# [V]", "rms_v")
        .lines("P L# [kW]", "active_w", 3);
    layout("basic ISO with offset", LayoutWriter.of(",", '.').time("t", "yyyyMMdd'T'HHmmss'+0100'"))
        .lines("i_#", "rms_a")
        .lines("u_#", "rms_v");
    layout("units spelt out", LayoutWriter.of(",", '.').time("Time", "dd/MMM/yyyy:HH:mm:ss"))
        .lines("Current phase @ (amperes)", "rms_a")
        .lines("Voltage phase @ (volts)", "rms_v")
        .column("Real power (kilowatts)", "total.active_w", 3)
        .column("Apparent power (kilovolt-amperes)", "total.apparent_va", 3);
    layout("Portuguese", LayoutWriter.of(";", ',').time("Data", "dd/MM/yyyy").time("Hora", "HH:mm"))
        .lines("Corrente L# (A)", "rms_a")
        .lines("Tensão L# (V)", "rms_v")
        .column("Potência Ativa Total (kW)", "total.active_w", 3)
        .column("Fator de Potência Total", "total.power_factor");
    layout("lines by colour", LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .column("Red amps", "L1.rms_a")
        .column("White amps", "L2.rms_a")
        .column("Blue amps", "L3.rms_a")
        .column("Neutral amps", "N.rms_a");
    layout(
            "length of the mean in the heading",
            LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .lines("Avg. RMS current - phase # - 10 min [A]", "rms_a")
        .lines("Avg. THD current - phase # - 10 min [%]", "current_thd_percent");
    layout(
            "direct current beside the grid",
            LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .lines("Grid current L# (A)", "rms_a")
        .column("PV1 voltage (V)", "")
        .column("Total input power (kW)", "");
    layout(
            "harmonics that make the distortion, without units",
            LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .lines("I#", "rms_a")
        .lines("I#THD", "current_thd_percent")
        .lines("I#H3", "current_h3_percent")
        .lines("I#H5", "current_h5_percent")
        .lines("I#H7", "current_h7_percent")
        .lines("I#H9", "current_h9_percent");
    layout(
            "newest first, days that may be months",
            LayoutWriter.of(",", '.')
                .time("Time", "dd/MM/yyyy HH:mm")
                .from(LayoutTruth.START.minusDays(6))
                .newestFirst())
        .lines("V# (V)", "rms_v");
    layout(
            "time before date",
            LayoutWriter.of(",", '.').time("Time", "HH:mm:ss").time("Date", "dd/MM/yyyy"))
        .lines("U L# [V]", "rms_v")
        .lines("I L# [A]", "rms_a");
    layout("whole numbers", LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .lines("P L# (W)", "active_w")
        .column("P total (W)", "total.active_w")
        .lines("S L# (VA)", "apparent_va")
        .lines("Q L# (var)", "reactive_var");
    layout(
            "W and volts without any unit",
            LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .lines("U#", "rms_v")
        .lines("I#", "rms_a")
        .lines("P#", "active_w")
        .column("Ptot", "total.active_w")
        .column("Stot", "total.apparent_va")
        .column("Qtot", "total.reactive_var");
    layout(
            "values with few digits",
            LayoutWriter.of(";", ',').time("Zeit", "dd.MM.yyyy HH:mm").withoutTrailingZeros())
        .lines("U L# [V]", "rms_v")
        .lines("I L# [A]", "rms_a")
        .lines("P L# [kW]", "active_w", 3);
    layout(
            "names with blanks and dots",
            LayoutWriter.of(",", '.').time("Date. Time.", "yyyy-MM-dd HH:mm"))
        .lines("Volt. Ph. # (V)", "rms_v")
        .lines("Curr. Ph. # (A)", "rms_a")
        .lines("Act. Pow. Ph. # (kW)", "active_w", 3);
    layout(
            "units in the first cells of names",
            LayoutWriter.of("\t", '.').time("Time", "yyyy-MM-dd HH:mm"))
        .lines("(V) Phase @", "rms_v")
        .lines("(A) Phase @", "rms_a")
        .lines("(kW) Phase @", "active_w", 3)
        .column("(A) Neutral", "N.rms_a");
    layout(
            "month first, steps tell",
            LayoutWriter.of(",", '.')
                .time(
                    "Time",
                    t -> DateTimeFormatter.ofPattern("MM/dd/yyyy HH:mm", Locale.ENGLISH).format(t))
                .rows(200))
        .lines("Vrms # (V)", "rms_v")
        .lines("Irms # (A)", "rms_a");
    layout("energy import and export", LayoutWriter.of(";", ',').time("Zeit", "dd.MM.yyyy HH:mm"))
        .column("Wirkenergie Bezug (kWh)", "total.energy_wh", 3)
        .column("Wirkenergie Abgabe (kWh)", "")
        .column("Blindenergie (kvarh)", "")
        .column("P gesamt (kW)", "total.active_w", 3);
  }

  static Stream<String> layouts() {
    return LAYOUTS.keySet().stream();
  }

  @ParameterizedTest
  @MethodSource("layouts")
  void isReadToTheLastDigit(String name) {
    LayoutTest.check(LAYOUTS.get(name));
  }
}
