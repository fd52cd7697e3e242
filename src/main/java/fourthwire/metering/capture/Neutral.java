package fourthwire.metering.capture;

import fourthwire.quantity.Conductor;
import java.util.Locale;
import java.util.Optional;

/**
 * The neutral current of a capture: its own channel where that is the sum of the lines (Kirchhoff's
 * current law; what leaks to earth is small), else the sum itself.
 *
 * @param fit the current taken for N; empty where it can't be known
 * @param channel the channel mapped as N
 * @param agreement how that channel stands to the sum of the lines
 * @param basis where N comes from, one sentence
 */
record Neutral(
    Optional<ChannelFigures> fit,
    Optional<ChannelFigures> channel,
    Agreement agreement,
    String basis) {
  /** Instruments of class 1 at the end of their range, and earth leakage, stay within this. */
  private static final double OF_SUM = 0.1;

  private static final double OF_LINE = 0.01;

  /** How the channel stands to the sum of the lines. */
  enum Agreement {
    /** One of them is missing. */
    NOT_COMPARED,
    SAME,
    /** The same with its sign turned: its clamp points the other way. */
    OPPOSITE,
    DIFFERENT
  }

  static Neutral of(Channels channels) {
    Optional<ChannelFigures> channel = channels.current(Conductor.N);
    Optional<ChannelFigures> sum = channels.sumOfLines();
    Agreement agreement =
        channel.isPresent() && sum.isPresent()
            ? compare(channel.get(), sum.get(), channels)
            : Agreement.NOT_COMPARED;
    boolean own = channel.isPresent() && (agreement == Agreement.SAME || sum.isEmpty());
    return new Neutral(own ? channel : sum, channel, agreement, basis(channel, sum, agreement));
  }

  /** Whether its current was measured: a clamp that only points the wrong way did measure it. */
  boolean isMeasured() {
    return channel.isPresent() && agreement != Agreement.DIFFERENT;
  }

  private static Agreement compare(ChannelFigures channel, ChannelFigures sum, Channels channels) {
    double allowed = OF_SUM * Math.max(sum.rms(), channel.rms()) + OF_LINE * channels.meanLineA();
    double product = channels.neutralTimesSum();
    if (distance(channel, sum, product) <= allowed) {
      return Agreement.SAME;
    }
    return distance(channel, sum, -product) <= allowed ? Agreement.OPPOSITE : Agreement.DIFFERENT;
  }

  /** Rms of the difference of two currents whose mean product is this. */
  private static double distance(ChannelFigures channel, ChannelFigures sum, double product) {
    return Math.sqrt(
        Math.max(0, Math.pow(channel.rms(), 2) + Math.pow(sum.rms(), 2) - 2 * product));
  }

  private static String basis(
      Optional<ChannelFigures> channel, Optional<ChannelFigures> sum, Agreement agreement) {
    if (sum.isEmpty()) {
      return channel.isPresent()
          ? "As its channel reads; not all three lines were recorded, so it can't be checked."
          : "Not known: there is no neutral channel, and not all three lines were recorded.";
    }
    return switch (agreement) {
      case SAME -> "As its channel reads; the sum of the lines agrees.";
      case NOT_COMPARED -> "The sum of the line currents: no channel is mapped as N.";
      case OPPOSITE -> "The sum of the line currents: the channel mapped as N is turned.";
      case DIFFERENT ->
          String.format(
              Locale.ROOT,
              "The sum of the line currents: the channel mapped as N reads %.2f A and is not it.",
              channel.map(ChannelFigures::rms).orElse(0.0));
    };
  }
}
