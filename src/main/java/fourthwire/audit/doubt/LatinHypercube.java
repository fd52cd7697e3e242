package fourthwire.audit.doubt;

import java.nio.charset.StandardCharsets;
import java.util.Random;

/**
 * Latin-hypercube draws: of n draws each input has exactly one in every n-th of its distribution,
 * and the inputs are paired at random (McKay, Beckman and Conover, 1979). Chosen over Sobol points
 * because a site has as many inputs as load rows, far beyond tables of direction numbers.
 *
 * <p>Every input draws from the seed and its own name, by {@link Random}, whose algorithm its
 * documentation fixes: the same seed gives the same draws on any machine, and a row added to a
 * survey leaves the other rows' draws as they were.
 */
final class LatinHypercube {
  private static final long FNV_START = 0xcbf29ce484222325L;
  private static final long FNV_PRIME = 0x100000001b3L;

  private final long seed;
  private final int draws;

  LatinHypercube(long seed, int draws) {
    this.seed = seed;
    this.draws = draws;
  }

  /** Standard normal deviates of one input, by draw. */
  float[] deviates(String input) {
    Random random = new Random(mixed(seed + hash(input)));
    int[] stratum = shuffled(random);
    float[] deviates = new float[draws];
    for (int k = 0; k < draws; k++) {
      double inside = Math.max(random.nextDouble(), Double.MIN_NORMAL);
      deviates[k] = (float) NormalQuantile.of((stratum[k] + inside) / draws);
    }
    return deviates;
  }

  private int[] shuffled(Random random) {
    int[] order = new int[draws];
    for (int k = 1; k < draws; k++) {
      int other = random.nextInt(k + 1);
      order[k] = order[other];
      order[other] = k;
    }
    return order;
  }

  /** The 64-bit FNV-1a of the name. */
  private static long hash(String name) {
    long hash = FNV_START;
    for (byte b : name.getBytes(StandardCharsets.UTF_8)) {
      hash = (hash ^ (b & 0xff)) * FNV_PRIME;
    }
    return hash;
  }

  /**
   * Spreads neighbouring seeds apart, which {@link Random} alone does not: the finishing steps of
   * SplitMix64 (Steele, Lea and Flood, 2014).
   */
  private static long mixed(long seed) {
    long z = (seed ^ (seed >>> 30)) * 0xbf58476d1ce4e5b9L;
    z = (z ^ (z >>> 27)) * 0x94d049bb133111ebL;
    return z ^ (z >>> 31);
  }
}
