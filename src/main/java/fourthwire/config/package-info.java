/**
 * Wires the rooms of the house together: database, repositories, jobs, the audit, what a start
 * does. Nothing uses this package; it may use every other.
 *
 * <p>Settings that an installation may change stand in {@link
 * fourthwire.config.InstallationProperties} and {@code application.properties}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.config;
