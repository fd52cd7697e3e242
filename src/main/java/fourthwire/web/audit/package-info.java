/**
 * Audits as a person asks for them, watches them and finds them again.
 *
 * <p>Doors: the controller; {@link fourthwire.web.audit.AuditView}. May use {@code audit, jobs,
 * site}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.web.audit;
