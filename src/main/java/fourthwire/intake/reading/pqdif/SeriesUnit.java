package fourthwire.intake.reading.pqdif;

/**
 * Units of series by their number; those that a building's readings come in (IEEE 1159.3, the task
 * force's list of standard identifiers, version 1.5, quantity units).
 */
public enum SeriesUnit {
  MOMENT(1),
  SECONDS(2),
  CYCLES(3),
  VOLTS(6),
  AMPS(7),
  VOLT_AMPERES(8),
  WATTS(9),
  VARS(10),
  HERTZ(15),
  DEGREES(17),
  PERCENT(19),
  PER_UNIT(20),
  WATT_HOURS(23),
  OTHER(-1);

  private final int number;

  SeriesUnit(int number) {
    this.number = number;
  }

  static SeriesUnit of(double number) {
    for (SeriesUnit u : values()) {
      if (u.number == number) {
        return u;
      }
    }
    return OTHER;
  }
}
