/**
 * Gapless synchronous windows: 10 cycles at 50 Hz, 12 at 60 Hz, each resampled so that it holds a
 * whole number of cycles, and transformed.
 *
 * <p>Door: {@link fourthwire.metering.capture.window.WindowAnalysis}. May use {@code quantity},
 * {@code metering.capture.wave} and {@code metering.capture.fit}. Sources: IEC
 * 61000-4-7:2002+A1:2008 (windows, groups), IEC 61000-4-30:2015 (aggregation).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.metering.capture.window;
