package fourthwire.audit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.audit.run.HarmonicAudit;
import fourthwire.quantity.Conductor;
import fourthwire.site.Survey;
import fourthwire.testsupport.SmallSite;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import org.apache.commons.math3.stat.descriptive.rank.Percentile;
import org.apache.commons.math3.stat.descriptive.rank.Percentile.EstimationType;
import org.junit.jupiter.api.Test;

/**
 * A week of hours by hand: a stiff 400 V supply, a heater behind 0.5 Ω of line and 0.5 Ω of neutral
 * that runs whole for ten hours of each weekday and at a tenth else, and a measured load whose
 * third harmonic is 30 % of its fundamental, always on.
 */
class WeekTest {
  private static final double VOLTS = 400 / Math.sqrt(3);
  private static final double FEEDER_OHM = 1;
  private static final double HEATER_W = 4600;
  private static final int BUSY_HOURS = 50;
  private static final int HOURS = 168;
  private static final double TENTH = 0.1;
  private static final double PRICE = 0.25;

  /** The supply's own impedance is 1.6 µΩ. */
  private static final double STIFF = 1e-4;

  @Test
  void energyAndLossesAreTheSumOfTheHours() {
    WeekState heater = week(audit(tables()), "LP-1:heat");
    WeekState.Energy energy = heater.energy();

    double busyA = VOLTS / (FEEDER_OHM + VOLTS * VOLTS / HEATER_W);
    double idleA = VOLTS / (FEEDER_OHM + VOLTS * VOLTS / (HEATER_W * TENTH));
    double squareAh = BUSY_HOURS * busyA * busyA + (HOURS - BUSY_HOURS) * idleA * idleA;
    double ampereHours = BUSY_HOURS * busyA + (HOURS - BUSY_HOURS) * idleA;
    double lossKwh = FEEDER_OHM * squareAh / 1000;
    double throughKwh = VOLTS * ampereHours / 1000 - lossKwh;

    assertThat(heater.solvedHours()).isEqualTo(2);
    assertThat(energy.feederLossKwh()).isCloseTo(lossKwh, within(STIFF * lossKwh));
    assertThat(energy.activeKwh()).isCloseTo(throughKwh, within(STIFF * throughKwh));
    assertThat(energy.windingLossKwh()).isZero();
    assertThat(energy.cost(energy.activeKwh()).value().orElseThrow())
        .isCloseTo(PRICE * throughKwh, within(STIFF * throughKwh));
    assertThat(heater.series().get(HeadlineFigure.L1_RMS).at(9)).isCloseTo(busyA, within(1e-3));
    assertThat(heater.series().get(HeadlineFigure.L1_RMS).at(HOURS - 1))
        .isCloseTo(idleA, within(1e-3));
  }

  /** The breaker's 16 A are passed in the busy hours and in no other. */
  @Test
  void hoursOverALimitAreCounted() {
    assertThat(week(audit(tables()), "LP-1:heat").hoursOverLimit())
        .containsEntry("line-ampacity", BUSY_HOURS);
  }

  /**
   * An override resistance holds at every order: the third harmonic makes 0.09/1.09 of the heat.
   */
  @Test
  void harmonicsMakeTheirPartOfTheLosses() {
    WeekState.Energy energy = week(audit(tables()), "LP-1:office").energy();

    assertThat(energy.feederHarmonicLossKwh() / energy.feederLossKwh())
        .isCloseTo(0.09 / 1.09, within(1e-6));
  }

  @Test
  void withoutSchedulesEveryHourIsTheDesignState() {
    Map<String, String> tables = tables();
    tables.remove("schedules.csv");
    tables.put("loads.csv", tables.get("loads.csv").replace("busy", ""));
    NodeResult node = node(audit(tables), "LP-1:heat");
    HourSeries line = node.week().orElseThrow().series().get(HeadlineFigure.L1_RMS);

    assertThat(node.week().orElseThrow().solvedHours()).isEqualTo(1);
    assertThat(IntStream.range(0, HOURS).mapToDouble(line::at))
        .containsOnly(
            node.design().orElseThrow().lines().get(Conductor.L1).rmsA().value().orElseThrow());
  }

  @Test
  void onAStandbySupplyThereIsNoWeekAndItSaysSo() {
    AuditResult standby = audit(tables(), Optional.of("SET"));

    assertThat(node(standby, "LP-1").week()).isEmpty();
    assertThat(node(standby, "LP-1").weekReason()).contains("normal supply");
  }

  /** Against a general statistics library, Hyndman and Fan's definition 7. */
  @Test
  void percentilesAreThoseOfAStatisticsLibrary() {
    HourSeries series = week(audit(tables()), "LP-1").series().get(HeadlineFigure.ACTIVE);
    double[] values = IntStream.range(0, HOURS).mapToDouble(series::at).toArray();
    Percentile library = new Percentile().withEstimationType(EstimationType.R_7);

    for (double percent : new double[] {5, 50, 70.3, 95, 99}) {
      assertThat(series.percentile(percent))
          .isCloseTo(library.evaluate(values, percent), within(1e-9));
    }
  }

  private static Map<String, String> tables() {
    Map<String, String> tables = new LinkedHashMap<>();
    tables.put(
        "site.csv",
        "key,value\nname,By hand\nfrequency_hz,50\npractice,iec\ncurrency,EUR\n"
            + "energy_price_per_kwh,0.25\n");
    tables.put(
        "supplies.csv",
        "supply,line_voltage_v,fault_level_mva,role\nGRID,400,100000,normal\nSET,400,2,standby\n");
    tables.put("panels.csv", "panel,fed_from\nLP-1,GRID\n");
    tables.put(
        "circuits.csv",
        "circuit,panel,lines,breaker_a,length_m,resistance_ohm_per_km\n"
            + "heat,LP-1,L1,16,100,5\noffice,LP-1,L2,,100,5\n");
    tables.put(
        "loads.csv",
        "load,circuit,panel,kind,spectrum,quantity,rated_w,schedule\n"
            + "heater,heat,LP-1,resistive,,1,4600,busy\n"
            + "desks,office,LP-1,,pulse,1,1000,\n");
    tables.put("spectra.csv", "spectrum,order,percent,degrees\npulse,1,100,0\npulse,3,30,180\n");
    tables.put("schedules.csv", schedule());
    return tables;
  }

  private static String schedule() {
    StringBuilder csv = new StringBuilder("schedule,days");
    StringBuilder weekday = new StringBuilder("busy,weekday");
    StringBuilder other = new StringBuilder("busy,all");
    for (int hour = 0; hour < HourSeries.HOURS_A_DAY; hour++) {
      csv.append(",h%02d".formatted(hour));
      weekday.append(hour >= 8 && hour < 18 ? ",1" : ",0.1");
      other.append(",0.1");
    }
    return csv + "\n" + weekday + "\n" + other + "\n";
  }

  private static AuditResult audit(Map<String, String> tables) {
    return audit(tables, Optional.empty());
  }

  private static AuditResult audit(Map<String, String> tables, Optional<String> supply) {
    Survey survey = SmallSite.survey(tables);
    return new HarmonicAudit()
        .run(
            new AuditRequest(survey, supply, Map.of(), true, 0, AuditRequest.SEED),
            Progress.SILENT);
  }

  private static NodeResult node(AuditResult audit, String name) {
    return audit.nodes().stream().filter(n -> n.node().equals(name)).findFirst().orElseThrow();
  }

  private static WeekState week(AuditResult audit, String name) {
    return node(audit, name).week().orElseThrow();
  }
}
