/**
 * What every load model is to the network: ports, a linear part, a solver for the rest.
 *
 * <p>Door: {@link fourthwire.load.model.LoadModel}. May use {@code quantity}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.load.model;
