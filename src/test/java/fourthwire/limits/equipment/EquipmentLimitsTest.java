package fourthwire.limits.equipment;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Which standard and class hold, by the thresholds of IEC 61000-3-2:2018, clauses 1, 5 and 7, and
 * of IEC 61000-3-12:2011, clause 1. The figures themselves are validation rows.
 */
class EquipmentLimitsTest {
  @ParameterizedTest
  @CsvSource(
      textBlock =
          """
          other,            75,    0.4,  230, 'IEC 61000-3-2: no limits'
          other,            76,    0.4,  230, 'IEC 61000-3-2, class A'
          other,            76,    0.4,  120, 'IEC 61000-3-2: no limits'
          computer,         600,   3,    230, 'IEC 61000-3-2, class D'
          computer,         601,   3,    230, 'IEC 61000-3-2, class A'
          cooling,          120,   1,    230, 'IEC 61000-3-2, class D'
          portable-tool,    900,   5,    230, 'IEC 61000-3-2, class B'
          lighting,         4.9,   0.04, 230, 'IEC 61000-3-2: no limits'
          lighting,         5,     0.04, 230, 'IEC 61000-3-2, class C, 5 to 25 W'
          lighting,         25,    0.2,  230, 'IEC 61000-3-2, class C, 5 to 25 W'
          lighting,         26,    0.2,  230, 'IEC 61000-3-2, class C'
          dimmer,           1000,  4,    230, 'IEC 61000-3-2: no limits'
          dimmer,           1001,  4,    230, 'IEC 61000-3-2, class A'
          heating-control,  200,   1,    230, 'IEC 61000-3-2: no limits'
          professional,     1001,  6,    230, 'IEC 61000-3-2: no limits'
          professional,     1000,  6,    230, 'IEC 61000-3-2, class A'
          other,            3600,  16,   230, 'IEC 61000-3-2, class A'
          other,            3700,  16.1, 230, 'IEC 61000-3-12, Table 2'
          other,            17000, 75,   230, 'IEC 61000-3-12, Table 2'
          other,            17500, 75.1, 230, 'No equipment standard'
          """)
  void standardAndClass(String use, double w, double a, double v, String standing) {
    Equipment equipment = equipment(use, w, a, v);
    EquipmentJudgement judgement = EquipmentLimits.judge(equipment, sine(a));
    assertThat(judgement.standing()).isEqualTo(standing);
    assertThat(judgement.basis()).isNotBlank();
    assertThat(judgement.reason()).isNotBlank();
    assertThat(judgement.met()).as("a sine keeps every limit").isTrue();
  }

  @Test
  void balancedThreePhaseEquipmentIsClassAWhateverItIsFor() {
    Equipment lights =
        new Equipment(EquipmentUse.LIGHTING, 3000, 4.5, true, 230, OptionalDouble.empty());
    assertThat(EquipmentLimits.judge(lights, sine(4.5)).standing())
        .isEqualTo("IEC 61000-3-2, class A");
  }

  @Test
  void anOrderOverItsLimitIsNamed() {
    Spectrum current = spectrum(Map.of(1, 1.0, 3, 0.35, 5, 0.18));
    EquipmentJudgement judgement =
        EquipmentLimits.judge(equipment("computer", 100, 1.1, 230), current);
    assertThat(judgement.met()).isFalse();
    assertThat(judgement.order(3).orElseThrow().met()).isFalse();
    assertThat(judgement.order(5).orElseThrow().met()).isTrue();
    assertThat(judgement.ofLimit()).isCloseTo(0.35 / 0.34, within(1e-9));
  }

  /** Clause 6.3.3: currents under 5 mA or 0.6 % of the input current do not count. */
  @Test
  void tinyCurrentsAreDisregarded() {
    Spectrum current = spectrum(Map.of(1, 0.13, 11, 0.0045, 13, 0.0051));
    EquipmentJudgement judgement =
        EquipmentLimits.judge(equipment("lighting", 30, 0.13, 230), current);
    assertThat(judgement.order(11).orElseThrow().disregarded()).isTrue();
    assertThat(judgement.order(13).orElseThrow().met()).isFalse();
  }

  /** Clause 7.4.3: any one of three sets of limits is enough. */
  @Test
  void smallLightingMayKeepToAnyOfThreeSets() {
    Equipment lamp = equipment("lighting", 10, 0.08, 230);
    Spectrum thirdOption = spectrum(Map.of(1, 0.06, 3, 0.02, 5, 0.014, 7, 0.015));
    assertThat(EquipmentLimits.judge(lamp, thirdOption).met()).isTrue();
    Spectrum early = pulse(0.06, -30);
    EquipmentJudgement second = EquipmentLimits.judge(lamp, early);
    assertThat(second.met()).as("an early broad pulse: %s", second).isTrue();
    assertThat(second.totals()).extracting(TotalLimit::name).contains("last peak by");
    assertThat(EquipmentLimits.judge(lamp, pulse(0.06, 0)).met())
        .as("the same pulse at the crest peaks too late")
        .isFalse();
  }

  /** THC and PWHC by hand: √(10² + 5²) A and √(17·2²) A on 20 A. */
  @Test
  void totalsOfLargeEquipment() {
    Spectrum current = spectrum(Map.of(1, 20.0, 5, 10.0, 7, 5.0, 17, 2.0));
    EquipmentJudgement judgement =
        EquipmentLimits.judge(
            new Equipment(EquipmentUse.OTHER, 8000, 20, true, 230, OptionalDouble.of(120)),
            current);
    assertThat(judgement.totals().get(0).figure())
        .isCloseTo(100 * Math.sqrt(129) / 20, within(1e-9));
    assertThat(judgement.totals().get(1).figure())
        .isCloseTo(100 * Math.sqrt(68) / 20, within(1e-9));
    assertThat(judgement.met()).isFalse();
  }

  @ParameterizedTest
  @CsvSource(
      textBlock =
          """
          'LED lamp 5 to 25 W',                    LIGHTING
          'fluorescent lamp, magnetic ballast',    LIGHTING
          'magnetic-ballast',                      LIGHTING
          'dimmed halogen lamps',                  DIMMER
          'phase-dimmer',                          DIMMER
          'desktop computer, no PFC',              COMPUTER
          'laptop adapter over 75 W',              COMPUTER
          'fridge, inverter',                      COOLING
          'welder',                                PORTABLE_TOOL
          'pump drive, controlled',                OTHER
          'server supply',                         OTHER
          """)
  void wordsSayTheUse(String name, EquipmentUse use) {
    assertThat(EquipmentUse.named(name)).isEqualTo(use);
  }

  private static Equipment equipment(String use, double w, double a, double v) {
    for (EquipmentUse u : EquipmentUse.values()) {
      if (u.word().equals(use)) {
        return new Equipment(u, w, a, false, v, OptionalDouble.empty());
      }
    }
    throw new IllegalArgumentException(use);
  }

  private static Spectrum sine(double a) {
    return spectrum(Map.of(1, a));
  }

  private static Spectrum spectrum(Map<Integer, Double> amps) {
    return Spectrum.of(h -> new Phasor(amps.getOrDefault(h, 0.0), 0));
  }

  /** A raised half-sine of 70° about the crest, moved by some degrees, by its Fourier integral. */
  private static Spectrum pulse(double a, double degrees) {
    double half = Math.toRadians(35);
    double centre = Math.toRadians(90 + degrees);
    int steps = 4000;
    double[] re = new double[51];
    double[] im = new double[51];
    for (int k = 0; k < steps; k++) {
      double x = -half + (k + 0.5) * 2 * half / steps;
      double i = Math.cos(x * Math.PI / (2 * half));
      for (int h = 1; h <= 39; h += 2) {
        re[h] += i * Math.sin(h * (x + centre));
        im[h] += i * Math.cos(h * (x + centre));
      }
    }
    Spectrum raw = Spectrum.of(re, im);
    return raw.times(a / raw.magnitude(1));
  }
}
