package fourthwire.audit.plan;

import fourthwire.quantity.Conductor;
import java.util.List;
import java.util.stream.IntStream;

/**
 * Which number at its network node each conductor of a site's node has.
 *
 * @param conductors in order, N last
 * @param numbers of each, in the same order
 */
public record Numbering(List<Conductor> conductors, List<Integer> numbers) {
  /** Conductors numbered from 0 in their order. */
  public static Numbering of(List<Conductor> conductors) {
    return new Numbering(conductors, IntStream.range(0, conductors.size()).boxed().toList());
  }

  /** The number of a conductor that is there. */
  public int of(Conductor conductor) {
    int at = conductors.indexOf(conductor);
    if (at < 0) {
      throw new IllegalArgumentException("there is no conductor " + conductor + " here");
    }
    return numbers.get(at);
  }

  public boolean has(Conductor conductor) {
    return conductors.contains(conductor);
  }
}
