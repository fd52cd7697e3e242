package fourthwire.load.rectifier;

/**
 * The electrical data of a bridge rectifier with a smoothing capacitor and a constant-power load,
 * all units of a row together.
 *
 * @param powerW direct-current power drawn from the capacitor, watts
 * @param capacitanceF smoothing capacitance, farads
 * @param lineOhm resistance of the equipment's own lead, filter and line choke (for one port the
 *     loop's, for three per line), ohms
 * @param lineHenry inductance likewise, henries
 * @param dcOhm resistance of the choke between bridge and capacitor, ohms
 * @param dcHenry inductance likewise, henries
 * @param diode each of the two diodes in the path
 */
public record BridgeLoad(
    double powerW,
    double capacitanceF,
    double lineOhm,
    double lineHenry,
    double dcOhm,
    double dcHenry,
    Diode diode) {

  /** N equal units as one unit N times as large: exact admittance scaling. */
  public BridgeLoad parallel(double units) {
    return new BridgeLoad(
        powerW * units,
        capacitanceF * units,
        lineOhm / units,
        lineHenry / units,
        dcOhm / units,
        dcHenry / units,
        diode.parallel(units));
  }

  /** The same equipment delivering another power. */
  public BridgeLoad atPower(double watts) {
    return new BridgeLoad(watts, capacitanceF, lineOhm, lineHenry, dcOhm, dcHenry, diode);
  }
}
