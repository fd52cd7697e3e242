package fourthwire.metering.log;

import fourthwire.metering.QualityFinding;
import java.util.List;

/** Looks at one day after the other for what is wrong. */
interface DayCheck {
  /** The next day. */
  void take(LogDay day);

  /** What was found, after the last day. */
  List<QualityFinding> findings();
}
