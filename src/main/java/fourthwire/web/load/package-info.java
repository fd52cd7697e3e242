/**
 * The load model page: one piece of equipment behind a source, computed when it is asked for. Its
 * question stands in the address, so that a result can be kept and passed on; it works without
 * script. Package-private throughout; the physics is {@code load.trial}'s, the limits {@code
 * limits.equipment}'s.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.web.load;
