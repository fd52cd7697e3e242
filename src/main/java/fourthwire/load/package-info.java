/**
 * Load models: what one piece of equipment draws at the voltage it stands at, from physics.
 *
 * <p>Door: {@link fourthwire.load.LoadModel}. May use {@code quantity} and {@code site} (kinds and
 * model columns).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.load;
