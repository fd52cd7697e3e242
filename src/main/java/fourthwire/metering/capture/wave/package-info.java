/**
 * Samples and the instants they stand at.
 *
 * <p>Doors: {@link fourthwire.metering.capture.wave.Samples}, {@link
 * fourthwire.metering.capture.wave.TimeAxis}. Uses nothing else of ours.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.metering.capture.wave;
