package fourthwire.load;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.control.PhaseDimmer;
import fourthwire.load.model.LoadModel;
import fourthwire.load.rectifier.SixPulse;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.Diode;
import fourthwire.quantity.Spectrum;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Load models against closed forms and published figures. */
class PublishedValuesTest {

  @ParameterizedTest
  @CsvSource({"90, 0.7071067812, 53.70292718", "120, 0.4421550740, 77.36799254"})
  void dimmerEqualsItsClosedForm(double degrees, double powerFactor, double thirdPercent) {
    // Closed form of the leading-edge dimmer on a resistance: PF = sqrt((π - a + sin(2a)/2)/π), the
    // third harmonic 100·|∫ sin x·e^(-j3x)|/|∫ sin x·e^(-jx)| over a to π (checks D-90, D3-90,
    // D-120, D3-120).
    LoadModel dimmer = new PhaseDimmer(100, 0, 50, Math.toRadians(degrees));
    Spectrum i = LoadCases.current(dimmer, 230, 0, 0).spectrum(0);
    assertThat(100 * i.magnitude(3) / i.magnitude(1)).isCloseTo(thirdPercent, within(2e-5));
    double rmsOfAllOrders = 230.0 / 100 * powerFactor;
    assertThat(230 * i.re(1) / (230 * rmsOfAllOrders)).isCloseTo(powerFactor, within(1e-6));
  }

  @ParameterizedTest
  @CsvSource({"3, 43.05017924, 40", "5, 32.77160322, 32"})
  void driveNearsTheReactorTable(double linePercent, double modelled, double published) {
    // Published reactor table, from memory, ±5 points (checks ); and an independent
    // model of the same drive (40 µF/kW at 400 V).
    double base = 400 * 400 / 10000.0;
    double x = linePercent / 100 * base;
    BridgeLoad drive =
        new BridgeLoad(10000, 400e-6, x / 15, x / 314.159265, 0, 0, new Diode(3e-11, 1.2, 1e-3));
    Spectrum i = LoadCases.current(new SixPulse(drive, 50), 400, 0, 0).spectrum(0);
    double fifth = 100 * i.magnitude(5) / i.magnitude(1);
    assertThat(fifth).isCloseTo(published, within(5.0));
    assertThat(fifth).isCloseTo(modelled, within(1.0));
  }

  @Test
  void smoothDirectCurrentGivesOneOverTheOrder() {
    // Checks R-id, R-id7: 1/h for a smooth direct current.
    double base = 400 * 400 / 10000.0;
    BridgeLoad drive =
        new BridgeLoad(
            10000, 4000e-6, 0.001, 1e-6, 0.1, base / 314.159265, new Diode(3e-11, 1.2, 1e-3));
    Spectrum i = LoadCases.current(new SixPulse(drive, 50), 400, 0, 0).spectrum(0);
    assertThat(100 * i.magnitude(5) / i.magnitude(1)).isCloseTo(20, within(0.3));
    assertThat(100 * i.magnitude(7) / i.magnitude(1)).isCloseTo(14.29, within(0.3));
  }
}
