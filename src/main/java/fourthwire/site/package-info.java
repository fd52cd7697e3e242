/**
 * The surveyed site: supplies, transformers, panels, circuits, loads, banks, meters and readings as
 * a person counted them, and the tree they hang in. Immutable, nothing computed.
 *
 * <p>Door: {@link fourthwire.site.Survey}. May use {@code quantity}. Source: the public contract,
 * section 2.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.site;
