/**
 * The description of the HTTP interface (OpenAPI): the shape and meaning of every document that
 * goes in and comes out, and the errors of every call.
 *
 * <p>Door: {@link fourthwire.config.openapi.ApiDescription}, found by the start. It uses none of
 * our packages; a test holds the shapes against real answers. Source: the public contract, sections
 * 4 to 6.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.config.openapi;
