/**
 * The HTTP interface for programs, under {@code /api/v1}: sites, surveys, readings, jobs, audits
 * and the results of their nodes.
 *
 * <p>Controllers translate only: they ask {@code jobs}, {@code intake} and the storage doors, and
 * answer the documents of {@code json}. Every error is a problem document (RFC 9457), made in one
 * place, {@link fourthwire.web.api.ApiProblems}. Source: the public contract, section 5.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.web.api;
