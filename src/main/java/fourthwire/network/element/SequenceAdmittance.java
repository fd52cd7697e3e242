package fourthwire.network.element;

/**
 * Three equal legs on three lines, as seen by the symmetrical components of the line potentials
 * against the legs' common point.
 */
@FunctionalInterface
public interface SequenceAdmittance {
  /**
   * The admittances at an order.
   *
   * @param order above 0, also between whole orders
   * @param siemens receives real and imaginary part of the positive-, the negative- and the
   *     zero-sequence admittance one after the other (six values)
   */
  void at(double order, double[] siemens);

  /** Three equal legs whose star point is not connected: open to zero sequence. */
  static SequenceAdmittance isolatedStar(OrderAdmittance leg) {
    return (order, siemens) -> {
      leg.at(order, siemens);
      siemens[2] = siemens[0];
      siemens[3] = siemens[1];
      siemens[4] = 0;
      siemens[5] = 0;
    };
  }

  /** A path for zero sequence only, such as a trap or an earthed star beside a delta. */
  static SequenceAdmittance zeroSequenceOnly(OrderAdmittance zero) {
    return (order, siemens) -> {
      zero.at(order, siemens);
      siemens[4] = siemens[0];
      siemens[5] = siemens[1];
      for (int k = 0; k < 4; k++) {
        siemens[k] = 0;
      }
    };
  }

  /**
   * These legs with their common point not connected, as where there is no neutral to join it to:
   * the same, and open to zero sequence.
   */
  default SequenceAdmittance openToZeroSequence() {
    return (order, siemens) -> {
      at(order, siemens);
      siemens[4] = 0;
      siemens[5] = 0;
    };
  }
}
