package fourthwire.web.reading;

import java.util.List;
import java.util.Optional;

/**
 * What is wrong with a reading, and what was done about it.
 *
 * @param faults worst first
 * @param history every correction made, the latest first, those taken back too
 */
record Faults(List<Fault> faults, List<Done> history) {
  /** How many corrections hold. */
  public long holding() {
    return history.stream().filter(d -> d.undone().isEmpty()).count();
  }

  /**
   * One fault.
   *
   * @param number as the interface counts it
   * @param period when; empty where it is of the whole reading
   * @param offers what would mend it
   * @param mended the correction that does
   */
  record Fault(
      int number,
      String period,
      String sentence,
      String effect,
      List<Offer> offers,
      Optional<Done> mended) {}

  /** A correction that is offered. */
  record Offer(int number, String sentence) {}

  /**
   * A correction that was made.
   *
   * @param of sentence of the fault
   * @param made when
   * @param undone when it was taken back; empty while it holds
   */
  record Done(long id, int fault, String sentence, String of, String made, String undone) {}
}
