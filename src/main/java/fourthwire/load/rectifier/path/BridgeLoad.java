package fourthwire.load.rectifier.path;

/**
 * The electrical data of a rectifier with a smoothing capacitor and a constant-power load, all
 * units of a row together.
 *
 * @param powerW direct-current power drawn from the capacitor, watts
 * @param capacitanceF smoothing capacitance, farads
 * @param leadOhm resistance of the equipment's lead ahead of the windings of its two bridges, ohms
 *     per line; with one bridge it may as well count in the line's
 * @param leadHenry inductance likewise, henries
 * @param lineOhm resistance of each bridge's lead, filter and line choke (for one port the loop's,
 *     for three per line), ohms
 * @param lineHenry inductance likewise, henries
 * @param dcOhm resistance of the choke between bridge and capacitor, ohms
 * @param dcHenry inductance likewise, henries
 * @param diode each of the two diodes in the path
 */
public record BridgeLoad(
    double powerW,
    double capacitanceF,
    double leadOhm,
    double leadHenry,
    double lineOhm,
    double lineHenry,
    double dcOhm,
    double dcHenry,
    Diode diode) {

  /** Equipment with one bridge. */
  public BridgeLoad(
      double powerW,
      double capacitanceF,
      double lineOhm,
      double lineHenry,
      double dcOhm,
      double dcHenry,
      Diode diode) {
    this(powerW, capacitanceF, 0, 0, lineOhm, lineHenry, dcOhm, dcHenry, diode);
  }

  /** N equal units as one unit N times as large: exact admittance scaling. */
  public BridgeLoad parallel(double units) {
    return new BridgeLoad(
        powerW * units,
        capacitanceF * units,
        leadOhm / units,
        leadHenry / units,
        lineOhm / units,
        lineHenry / units,
        dcOhm / units,
        dcHenry / units,
        diode.parallel(units));
  }

  /** The same equipment delivering another power. */
  public BridgeLoad atPower(double watts) {
    return new BridgeLoad(
        watts, capacitanceF, leadOhm, leadHenry, lineOhm, lineHenry, dcOhm, dcHenry, diode);
  }
}
