/**
 * The database side: implements the storage doors that {@code site}, {@code metering} and {@code
 * audit} declare, on H2 and PostgreSQL alike, with the SQL written here and in {@code
 * db/migration}.
 *
 * <p>Doors: {@link fourthwire.store.Store} makes each of them. Results are kept as the public
 * interface's JSON documents, files in parts of 512 KiB. May use {@code quantity}, {@code site},
 * {@code load}, {@code limits}, {@code metering}, {@code audit}, {@code json}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.store;
