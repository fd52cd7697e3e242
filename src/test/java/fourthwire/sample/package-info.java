/**
 * The demo site in {@code sample-data}: what was "measured" there is made here, from the survey's
 * own audit, and the site's verdicts are put to the test.
 *
 * <p>Door: {@link fourthwire.sample.SampleDataGenerator}, run as {@code sample-data/README.md}
 * says. Uses the survey intake and the audit.
 */
package fourthwire.sample;
