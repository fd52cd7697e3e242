package fourthwire.load.model;

/**
 * The series R-L by which the network stands before several loads with one port each: what they
 * share of it, and what each has for itself (Thevenin). Symmetric.
 */
public interface SharedSource {
  /** Volts that a load's port loses for each amp into another load's, or into its own; ohms. */
  double ohm(int load, int other);

  /** Likewise for each amp a second; henries. */
  double henry(int load, int other);
}
