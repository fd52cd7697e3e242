/**
 * The page of one node: a panel, and likewise a transformer, supply or circuit.
 *
 * <p>Door: the controller; {@link fourthwire.web.panel.NodePage} is all a template sees. May use
 * {@code audit, site, limits, quantity} and the pictures of {@code web.figure}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.web.panel;
