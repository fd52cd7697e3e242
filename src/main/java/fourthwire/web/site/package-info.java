/**
 * The list of sites, and one site as the tree it is.
 *
 * <p>Doors: the controllers. May use {@code site, audit, jobs, limits} and the rows of {@code
 * web.panel}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.web.site;
