package fourthwire.quantity;

/**
 * The power figures of a node or of one of its lines, IEEE 1459-2010 clause 3.
 *
 * @param activeW active power P, watts
 * @param fundamentalReactiveVar fundamental (positive-sequence) reactive power Q1, vars
 * @param apparentVa apparent power S, effective S_e on three phases, volt-amperes
 * @param nonfundamentalVa non-fundamental apparent power √(S² - S1²), volt-amperes
 * @param powerFactor true power factor P/S
 * @param displacementFactor fundamental power factor P1/S1, positive sequence on three phases
 */
public record PowerFigures(
    Figure activeW,
    Figure fundamentalReactiveVar,
    Figure apparentVa,
    Figure nonfundamentalVa,
    Figure powerFactor,
    Figure displacementFactor) {}
