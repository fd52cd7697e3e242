/**
 * What a channel of instantaneous values is, by its name, phase and unit and by its neighbours'.
 *
 * <p>Door: {@link fourthwire.intake.reading.channel.ChannelNames}. May use {@code metering} and
 * {@code intake.reading.heading}. The ways of naming are common practice, no source.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.intake.reading.channel;
