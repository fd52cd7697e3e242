package fourthwire.intake.reading;

import java.nio.charset.StandardCharsets;
import java.time.LocalDateTime;
import java.time.temporal.ChronoUnit;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** As {@link LayoutTest}: a third lot, in the manner of instruments that write for themselves. */
class FurtherLayoutsTest {
  private static final Map<String, LayoutWriter> LAYOUTS = new LinkedHashMap<>();

  private static LayoutWriter layout(String name, LayoutWriter layout) {
    LAYOUTS.put(name, layout);
    return layout;
  }

  private static LayoutWriter dated() {
    return LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm:ss");
  }

  static {
    layout("letters with statistics", dated())
        .lines("V@RMS", "rms_v")
        .lines("I@RMS", "rms_a")
        .column("InRMS", "N.rms_a")
        .lines("THD-I L# (%)", "current_thd_percent")
        .lines("THD-V L# (%)", "voltage_thd_percent");
    layout("red, yellow, blue", LayoutWriter.of(",", '.').time("DateTime", "dd-MM-yyyy HH:mm:ss"))
        .column("VRN", "L1.rms_v")
        .column("VYN", "L2.rms_v")
        .column("VBN", "L3.rms_v")
        .column("VRY", "L1-L2.rms_v")
        .column("IR (A)", "L1.rms_a")
        .column("IY (A)", "L2.rms_a")
        .column("IB (A)", "L3.rms_a")
        .column("IN (A)", "N.rms_a");
    layout(
            "small letters and cosines",
            LayoutWriter.of(";", ',').time("Datum Zeit", "dd.MM.yyyy HH:mm"))
        .column("Uab", "L1-L2.rms_v")
        .column("Ubc", "L2-L3.rms_v")
        .column("Uca", "L3-L1.rms_v")
        .column("Ua", "L1.rms_v")
        .column("Ub", "L2.rms_v")
        .column("Uc", "L3.rms_v")
        .column("Ia", "L1.rms_a")
        .column("Ib", "L2.rms_a")
        .column("Ic", "L3.rms_a")
        .column("Pa (kW)", "L1.active_w", 3)
        .column("Pb (kW)", "L2.active_w", 3)
        .column("Pc (kW)", "L3.active_w", 3);
    layout(
            "units in square brackets below, blank line below them",
            LayoutWriter.of(";", ',')
                .time("Date|[dd.mm.yyyy]", "dd.MM.yyyy")
                .time("Time|[hh:mm:ss]", "HH:mm:ss"))
        .lines("U#N|[V]", "rms_v")
        .lines("I#|[A]", "rms_a")
        .column("IN|[A]", "N.rms_a")
        .lines("P#|[kW]", "active_w", 3)
        .lines("PF#|[ ]", "power_factor");
    layout("units glued", LayoutWriter.of("\t", '.').time("Date/Time", "yyyy/MM/dd HH:mm:ss"))
        .lines("U#N(V)", "rms_v")
        .lines("I#(A)", "rms_a")
        .column("f(Hz)", "frequency_hz")
        .column("PF total", "total.power_factor");
    layout(
            "spreadsheet days with comma",
            LayoutWriter.of(";", ',')
                .time(
                    "Datum/Uhrzeit",
                    t ->
                        String.format(
                            Locale.GERMANY,
                            "%.9f",
                            ChronoUnit.SECONDS.between(LocalDateTime.of(1899, 12, 30, 0, 0), t)
                                / 86400.0)))
        .lines("Spannung L# [V]", "rms_v")
        .lines("Strom L# [A]", "rms_a");
    layout("twelve hours, points", LayoutWriter.of(";", ',').time("Date", "dd.MM.yyyy hh:mm:ss a"))
        .lines("Voltage L# (V)", "rms_v")
        .lines("Current L# (A)", "rms_a");
    layout("offset without colon", LayoutWriter.of(",", '.').time("t", t -> t + ":00.000+0100"))
        .lines("V_RMS_L#", "rms_v")
        .lines("I_RMS_L#", "rms_a")
        .column("I_RMS_N", "N.rms_a");
    layout("ISO without marks", LayoutWriter.of(",", '.').time("timestamp", "yyyyMMdd'T'HHmmss"))
        .lines("u_l#n", "rms_v")
        .lines("i_l#", "rms_a")
        .column("i_n", "N.rms_a");
    layout("orders in brackets", dated())
        .lines("I# (A)", "rms_a")
        .lines("I#(3) [%]", "current_h3_percent")
        .lines("I#(5) [%]", "current_h5_percent");
    layout("orders behind underscores", dated())
        .lines("Harm_I_L#_03 (A)", "current_h3_a")
        .lines("Harm_I_L#_05 (A)", "current_h5_a")
        .lines("Harm_I_L#_07 (A)", "current_h7_a");
    layout("orders with letters", dated())
        .column("IaH03 (A)", "L1.current_h3_a")
        .column("IbH03 (A)", "L2.current_h3_a")
        .column("IcH03 (A)", "L3.current_h3_a")
        .column("IaH05 (A)", "L1.current_h5_a");
    layout("orders in words", dated())
        .lines("L# Harmonic 3 Current (A)", "current_h3_a")
        .lines("L# Harmonic 5 Current (A)", "current_h5_a")
        .lines("L# Current (A)", "rms_a");
    layout("order, line, letter", dated())
        .lines("H3 L# I (%)", "current_h3_percent")
        .lines("H5 L# I (%)", "current_h5_percent")
        .lines("I L# (A)", "rms_a");
    layout("har. with a point", LayoutWriter.of(";", ',').time("Zeit", "dd.MM.yyyy HH:mm:ss"))
        .lines("I# har.3 [%]", "current_h3_percent")
        .lines("I# har.5 [%]", "current_h5_percent")
        .lines("I# [A]", "rms_a");
    layout("order named", dated())
        .lines("Current harmonic phase # order 3 (%)", "current_h3_percent")
        .lines("Current harmonic phase # order 5 (%)", "current_h5_percent");
    layout("orders of sentences", dated())
        .column("3rd Harmonic Current, Phase A (%)", "L1.current_h3_percent")
        .column("3rd Harmonic Current, Phase B (%)", "L2.current_h3_percent")
        .column("3rd Harmonic Current, Phase C (%)", "L3.current_h3_percent")
        .column("5th Harmonic Current, Phase A (%)", "L1.current_h5_percent");
    layout("orders above, lines below", LayoutWriter.of(",", '.').time("|Time", "yyyy-MM-dd HH:mm"))
        .column("I harmonic 3 (A)|L1", "L1.current_h3_a")
        .column("|L2", "L2.current_h3_a")
        .column("|L3", "L3.current_h3_a")
        .column("I harmonic 5 (A)|L1", "L1.current_h5_a")
        .column("|L2", "L2.current_h5_a");
    layout("energy in and out", LayoutWriter.of(",", '.').time("Timestamp", "yyyy-MM-dd HH:mm"))
        .column("kWh import", "total.energy_wh", 3)
        .column("kWh export", "")
        .column("kvarh import", "")
        .lines("kW L#", "active_w", 3)
        .column("kW total", "total.active_w", 3);
    layout(
            "UTF-16 with tabs, no mark",
            LayoutWriter.of("\t", ',')
                .time("Datum", "dd.MM.yy")
                .time("Uhrzeit", "HH:mm")
                .encoded(StandardCharsets.UTF_16LE, ""))
        .lines("U L#-N (V)", "rms_v")
        .lines("I L# (A)", "rms_a")
        .trailingSeparator();
    layout(
            "hash before the header",
            LayoutWriter.of(",", '.').time("# Time", "yyyy-MM-dd HH:mm:ss"))
        .lines("V L# (V)", "rms_v")
        .lines("I L# (A)", "rms_a");
    layout(
            "preamble as wide as the table",
            LayoutWriter.of(",", '.')
                .time("Time", "yyyy-MM-dd HH:mm")
                .preamble("Site,Works,,,,,", "Meter,7,,,,,", "CT ratio,400,5,,,,", ",,,,,,"))
        .lines("V L# (V)", "rms_v")
        .lines("I L# (A)", "rms_a");
    layout(
            "device and number before the time",
            LayoutWriter.of(";", '.').time("Time", "dd/MM/yyyy HH:mm:ss"))
        .column("Device", "")
        .lines("V L# (V)", "rms_v")
        .lines("I L# (A)", "rms_a")
        .column("Alarm", "");
    layout("means over the lines beside them", dated())
        .lines("V L#-N (V)", "rms_v")
        .column("V L-N Avg (V)", "")
        .lines("I L# (A)", "rms_a")
        .column("I Avg (A)", "");
    layout("earth current beside", dated())
        .lines("I L# (A)", "rms_a")
        .column("I N (A)", "N.rms_a")
        .column("I PE (A)", "");
    layout(
            "THD first letters",
            LayoutWriter.of(";", ',').time("Zeitstempel", "dd.MM.yyyy HH:mm:ss"))
        .lines("THDu L# [%]", "voltage_thd_percent")
        .lines("THDi L# [%]", "current_thd_percent")
        .lines("PF L#", "power_factor");
    layout("powers by letter", LayoutWriter.of(",", '.').time("Date Time", "M/d/yyyy H:mm"))
        .lines("Volts @N", "rms_v")
        .lines("Amps @", "rms_a")
        .lines("Watts @", "active_w")
        .lines("PF @", "power_factor")
        .column("Watts Total", "total.active_w");
    layout(
            "a notice between the rows",
            LayoutWriter.of(";", ',').time("Datum", "dd.MM.yyyy").time("Zeit", "HH:mm:ss"))
        .lines("U L# [V]", "rms_v")
        .lines("I L# [A]", "rms_a")
        .headerEvery(100)
        .footer("", "*** end of recording ***", "Rows: 420");
    layout(
            "month names without year first",
            LayoutWriter.of(",", '.').time("Time", "MMM d, yyyy h:mm:ss a"))
        .lines("Voltage L# V", "rms_v")
        .lines("Current L# A", "rms_a");
    layout("lines before the letter", dated())
        .lines("L#_U_rms_V", "rms_v")
        .lines("L#_I_rms_A", "rms_a")
        .column("N_I_rms_A", "N.rms_a")
        .lines("L#_P_W", "active_w")
        .lines("L#_S_VA", "apparent_va");
    layout(
            "local and universal time",
            LayoutWriter.of(",", '.')
                .time("Local Time", "yyyy-MM-dd HH:mm:ss")
                .time("UTC", t -> t.minusHours(1).toString() + ":00Z"))
        .lines("V L# (V)", "rms_v")
        .lines("I L# (A)", "rms_a");
    layout(
            "broken headings",
            LayoutWriter.of(",", '.').time("Date\nTime", "yyyy-MM-dd HH:mm:ss").quoted())
        .lines("Voltage\nL#\n[V]", "rms_v")
        .lines("Current\nL#\n[A]", "rms_a");
    layout("plus signs", dated().plusSigns())
        .lines("P L# (W)", "active_w")
        .lines("V L# (V)", "rms_v");
    layout("units in the cells", dated().cellUnits())
        .lines("Voltage L# (V)", "rms_v")
        .lines("Current L# (A)", "rms_a");
    layout("numbers with exponents", dated().exponents())
        .lines("V L# (V)", "rms_v")
        .lines("I L# (A)", "rms_a")
        .lines("P L# (W)", "active_w");
    layout("line by name behind a dash", dated())
        .column("Voltage - Phase A", "L1.rms_v")
        .column("Voltage - Phase B", "L2.rms_v")
        .column("Voltage - Phase C", "L3.rms_v")
        .column("Current - Phase A", "L1.rms_a")
        .column("Current - Phase B", "L2.rms_a")
        .column("Current - Phase C", "L3.rms_a")
        .column("Current - Neutral", "N.rms_a");
    layout("dots between", LayoutWriter.of(",", '.').time("log.time", "yyyy-MM-dd HH:mm:ss"))
        .lines("meter.l#.voltage", "rms_v")
        .lines("meter.l#.current", "rms_a")
        .column("meter.total.active_power_w", "total.active_w");
    layout(
            "units first in brackets",
            LayoutWriter.of(";", ',').time("[dd.mm.yy] Datum", "dd.MM.yy HH:mm"))
        .lines("[V] U#", "rms_v")
        .lines("[A] I#", "rms_a");
    layout("averages by prefix", dated())
        .lines("Avg_Vrms_L#", "rms_v")
        .lines("Avg_Irms_L#", "rms_a")
        .column("Avg_Freq", "frequency_hz")
        .column("Avg_PF_Total", "total.power_factor");
    layout("averages behind in brackets", dated())
        .lines("U L# (avg) [V]", "rms_v")
        .lines("I L# (avg) [A]", "rms_a")
        .column("I N (avg) [A]", "N.rms_a");
    layout("three of each in brackets", dated())
        .column("V1 (Avg)", "L1.rms_v")
        .column("V1 (Min)", "L1.rms_v.min")
        .column("V1 (Max)", "L1.rms_v.max")
        .column("I1 (Avg)", "L1.rms_a")
        .column("I1 (Min)", "L1.rms_a.min")
        .column("I1 (Max)", "L1.rms_a.max");
    layout(
            "Spanish in groups",
            LayoutWriter.of(";", ',').time("Fecha|", "dd/MM/yyyy").time("Hora|", "H:mm:ss"))
        .lines("Tensión L#|V", "rms_v")
        .lines("Corriente L#|A", "rms_a")
        .column("Corriente neutro|A", "N.rms_a")
        .column("Potencia activa total|kW", "total.active_w", 3)
        .column("Factor de potencia total|", "total.power_factor");
    layout(
            "demand words",
            LayoutWriter.of(",", '.')
                .time("Interval End", t -> t.plusMinutes(10).toString().replace('T', ' ')))
        .lines("Current Demand L# (A)", "rms_a")
        .column("kW Demand Total", "total.active_w", 3);
    layout("orders of three digits", dated())
        .lines("I#_H003_A", "current_h3_a")
        .lines("I#_H005_A", "current_h5_a")
        .lines("I#_A", "rms_a");
    layout("orders behind i", dated())
        .lines("I#", "rms_a")
        .lines("THDI#", "current_thd_percent")
        .lines("IH3_L#", "current_h3_percent")
        .lines("IH5_L#", "current_h5_percent")
        .lines("IH7_L#", "current_h7_percent")
        .lines("IH9_L#", "current_h9_percent");
    layout("orders between", dated())
        .lines("L#_h03_I_A", "current_h3_a")
        .lines("L#_h05_I_A", "current_h5_a");
    layout("harmonic distortions of orders", dated())
        .lines("HD3 I# (%)", "current_h3_percent")
        .lines("HD5 I# (%)", "current_h5_percent")
        .lines("I# (A)", "rms_a");
    layout(
            "quoted semicolons, text with separators",
            LayoutWriter.of(";", ',').time("Zeit", "dd.MM.yyyy HH:mm:ss").quoted())
        .lines("U L#; Mittelwert [V]", "rms_v")
        .lines("I L#; Mittelwert [A]", "rms_a");
    layout("apparent and reactive by line first", dated())
        .lines("Phase # Apparent Power (kVA)", "apparent_va", 3)
        .lines("Phase # Reactive Power (kVAR)", "reactive_var", 3)
        .lines("Phase # Real Power (kW)", "active_w", 3)
        .lines("Phase # Power Factor", "power_factor");
    layout("letters T for total", dated())
        .lines("P@ (kW)", "active_w", 3)
        .column("PT (kW)", "total.active_w", 3)
        .column("QT (kvar)", "total.reactive_var", 3)
        .column("ST (kVA)", "total.apparent_va", 3)
        .column("PFT", "total.power_factor");
    layout(
            "seconds with thousandths behind commas",
            LayoutWriter.of(";", ',').time("Zeit", "dd.MM.yyyy HH:mm:ss,SSS"))
        .lines("U# [V]", "rms_v")
        .lines("I# [A]", "rms_a");
    layout(
            "header twice at the top",
            LayoutWriter.of(",", '.')
                .time("Time", "yyyy-MM-dd HH:mm")
                .preamble("Time,V L1 (V),V L2 (V),V L3 (V),I L1 (A),I L2 (A),I L3 (A)"))
        .lines("V L# (V)", "rms_v")
        .lines("I L# (A)", "rms_a");
    layout(
            "zone offset in its own words",
            LayoutWriter.of(",", '.')
                .time("Time", t -> t.toString().replace('T', ' ') + " UTC+01:00"))
        .lines("V L# (V)", "rms_v")
        .lines("I L# (A)", "rms_a");
    layout(
            "day of the week in front, German",
            LayoutWriter.of(";", ',')
                .time(
                    "Tag", t -> "Mo Di Mi Do Fr Sa So".split(" ")[t.getDayOfWeek().getValue() - 1])
                .time("Datum", "dd.MM.yyyy")
                .time("Uhrzeit", "HH:mm"))
        .lines("U L# [V]", "rms_v")
        .lines("I L# [A]", "rms_a");
    layout(
            "German month names",
            LayoutWriter.of(";", ',')
                .time(
                    "Zeit",
                    t -> t.getDayOfMonth() + ". Februar " + t.getYear() + " " + t.toLocalTime()))
        .lines("U L# [V]", "rms_v")
        .lines("I L# [A]", "rms_a");
    layout("things that no quantity is", dated())
        .lines("V L# (V)", "rms_v")
        .lines("I L# (A)", "rms_a")
        .column("Ground current (A)", "")
        .column("Nominal voltage L1 (V)", "")
        .column("I L1 P95 (A)", "")
        .column("I L1 DC (A)", "")
        .column("V L1 Peak (V)", "")
        .column("I L1 Crest factor", "")
        .column("Residual current (A)", "");
    layout(
            "lines of one voltage meter",
            LayoutWriter.of(",", '.').time("Date Time", "yyyy-MM-dd hh:mm:ss a"))
        .column("CH1 V", "L1.rms_v")
        .column("CH2 V", "L2.rms_v")
        .column("CH3 V", "L3.rms_v");
    layout("percent signs in the cells", dated().cellUnits())
        .lines("THD I L# (%)", "current_thd_percent")
        .lines("THD V L# (%)", "voltage_thd_percent");
    layout("lines over a row of units", LayoutWriter.of(",", '.').time("Time|", "yyyy-MM-dd HH:mm"))
        .lines("L#|V", "rms_v")
        .lines("L#|A", "rms_a")
        .lines("L#|kW", "active_w", 3);
    layout("lines and units alone", dated())
        .lines("L# V", "rms_v")
        .lines("L# A", "rms_a")
        .lines("L#_kW", "active_w", 3)
        .lines("L# [kvar]", "reactive_var", 3)
        .column("W total", "total.active_w");
    layout("demand beside power, transients beside volts", dated())
        .column("kW demand", "")
        .column("kW total", "total.active_w", 3)
        .lines("Transient L# (V)", "")
        .lines("V L# (V)", "rms_v");
    layout("newest row first", dated().newestFirst())
        .lines("V L# (V)", "rms_v")
        .lines("I L# (A)", "rms_a");
    layout(
            "newest row first, offsets written",
            LayoutWriter.of(";", '.').time("Time", t -> t + ":00+01:00").newestFirst())
        .lines("V L# (V)", "rms_v")
        .lines("I L# (A)", "rms_a");
    layout("voltage harmonics and others", dated())
        .lines("U L# H5 phase (°)", "")
        .lines("U L# interharmonic 5 (%)", "")
        .lines("U L# (V)", "rms_v")
        .lines("I# H 3 (A)", "current_h3_a");
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
