/**
 * The demo site that an empty store gets at its first start.
 *
 * <p>It is taken from the class path folder {@code sample-data}: {@code survey/} holds the tables
 * of its survey as CSV; {@code readings/} holds meters' files, named after the meter up to two
 * underscores or the extension ({@code M-LP3__week.csv}), and beside a file whose columns do not
 * name themselves its mapping ({@code M-LP3__week.csv.mapping.json}). Files of one name with
 * different extensions are one capture.
 *
 * <p>Door: {@link fourthwire.config.demo.DemoSite}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.config.demo;
