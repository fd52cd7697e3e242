package fourthwire.load.model;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;

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
   * Whether its current breaks the voltage at others beside it so sharply that they are to be
   * solved together ({@link #newJointSolver}).
   */
  default boolean shapesOthers() {
    return false;
  }

  /**
   * A solver for such models side by side, this one among them; empty where there is none for
   * these.
   */
  default Optional<JointSolver> newJointSolver(List<LoadModel> all) {
    return Optional.empty();
  }

  /**
   * A solver for the injected current, with its own workspace and warm start; not for use by two
   * threads at once.
   */
  LoadSolver newSolver();
}
