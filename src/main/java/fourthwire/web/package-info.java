/**
 * What a person sees in a browser and what a program gets over HTTP, one package per subject.
 *
 * <p>Doors: the controllers. May use {@code jobs, audit, json, intake, site, load, metering,
 * limits, quantity}; never {@code store} or {@code network}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.web;
