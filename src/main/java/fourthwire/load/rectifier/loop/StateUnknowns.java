package fourthwire.load.rectifier.loop;

/**
 * Which of a state's numbers are independent: of each bridge one current of a pair, or the two
 * like-signed of three, and the capacitor's voltage.
 */
final class StateUnknowns {
  /** Their places in the state. */
  final int[] at = new int[LoopTangent.MOST];

  /** How many they are. */
  int size;

  private final int volts;
  private final int linesOfOne;

  /** As {@link StateNewton#StateNewton}. */
  StateUnknowns(int lines, int linesOfOne) {
    volts = lines;
    this.linesOfOne = linesOfOne;
  }

  /** Looks which lines conduct. */
  void find(double[] state) {
    size = 0;
    for (int k = 0; k < volts; k += linesOfOne) {
      int sign = balance(state, k) >= 0 ? 1 : -1;
      for (int m = k; m < k + linesOfOne; m++) {
        if (state[m] * sign > 0) {
          at[size++] = m;
        }
      }
    }
    at[size++] = volts;
  }

  private double balance(double[] state, int first) {
    double sum = 0;
    for (int k = first; k < first + linesOfOne; k++) {
      sum += Math.signum(state[k]);
    }
    return sum;
  }

  /** Changes one unknown of a row, keeping the sum of the currents of its bridge in the state. */
  void shift(double[] row, double[] state, int index, double by) {
    if (index < volts) {
      int first = index - index % linesOfOne;
      for (int k = first; k < first + linesOfOne; k++) {
        if (state[k] * state[index] < 0) {
          row[k] -= by;
          break;
        }
      }
    }
    row[index] += by;
  }
}
