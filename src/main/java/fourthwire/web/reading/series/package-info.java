/**
 * Interval logs in pictures: over time, in order of size, by hour of the week, order by order; and
 * which days a site's meters cover.
 *
 * <p>Door: the controller, and {@link fourthwire.web.reading.series.CoverageMaker} for the list of
 * readings. May use {@code jobs.series, metering, limits, site} and the pictures of {@code
 * web.figure}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.web.reading.series;
