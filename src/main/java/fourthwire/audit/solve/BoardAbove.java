package fourthwire.audit.solve;

/**
 * Where a board's feeders begin.
 *
 * @param node the board above, or the board itself
 * @param conductors for each of its own conductors, the one there that it is joined to
 */
record BoardAbove(int node, int[] conductors) {}
