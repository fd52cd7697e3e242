package fourthwire.load.model;

import java.util.Arrays;
import java.util.List;

/**
 * Equipment as the network sees it: a linear part that goes into the network's matrix, and a
 * current that follows from the voltage and is injected.
 *
 * <p>A model has one port (a terminal pair: line to neutral or line to line) or three (three lines;
 * port voltages are line to neutral, or to any common point where there is no neutral; only their
 * differences count then). Current is positive into the equipment at the port's line. A model
 * stands for all units of its row together: N equal units are one unit N times as large.
 */
public interface LoadModel {
  /** Number of ports, 1 or 3. */
  int ports();

  /**
   * The linear part at an order: admittance in siemens.
   *
   * @param order 1 to 50, also between whole orders for impedance scans
   * @param y receives re, im of the port's admittance (one port), or of the positive-, negative-
   *     and zero-sequence admittances one after the other (three ports, length 6); all zero where
   *     the model has no linear part, as most have none
   */
  default void linearSiemens(double order, double[] y) {
    Arrays.fill(y, 0, 2 * ports(), 0);
  }

  /** Whether the linear part is all there is: such a model injects nothing. */
  default boolean isLinear() {
    return false;
  }

  /**
   * Whether this model and another break each other's voltage so sharply that they are to be solved
   * together ({@link #newJointSolver}) where they stand side by side.
   */
  default boolean joins(LoadModel other) {
    return false;
  }

  /**
   * A solver for models side by side, this one among them.
   *
   * @param all each joins this one
   * @throws UnsupportedOperationException where none joins it
   */
  default JointSolver newJointSolver(List<LoadModel> all) {
    throw new UnsupportedOperationException("nothing joins this model");
  }

  /**
   * A solver for the injected current, with its own workspace and warm start; not for use by two
   * threads at once.
   */
  LoadSolver newSolver();
}
