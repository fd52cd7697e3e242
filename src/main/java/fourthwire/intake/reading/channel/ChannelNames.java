package fourthwire.intake.reading.channel;

import fourthwire.intake.reading.heading.Heading;
import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.ReadingMapping.Statistic;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/**
 * Reads the names of a capture's channels, all together: {@code IB} is the second line where there
 * is an {@code IC}, the third where there is an {@code IY}.
 */
public final class ChannelNames {
  private final Convention convention;
  private final Set<String> lettered;

  private ChannelNames(List<ChannelSymbol> symbols) {
    this.convention = Convention.of(symbols);
    this.lettered =
        symbols.stream()
            .filter(s -> s.first().matches("[abcrsty]"))
            .map(ChannelSymbol::letter)
            .collect(Collectors.toUnmodifiableSet());
  }

  /**
   * A channel as its file describes it.
   *
   * @param name as the file has it
   * @param phase phase identifier beside the name; empty text for none
   * @param unit unit beside the name; empty text where the name may hold it
   */
  public record Channel(String name, String phase, String unit) {}

  /** What each of these channels holds, in order. */
  public static List<Heading> read(List<Channel> channels) {
    List<ChannelSymbol> symbols =
        channels.stream().map(c -> ChannelSymbol.of(c.name(), c.phase())).toList();
    ChannelNames names = new ChannelNames(symbols);
    return IntStream.range(0, channels.size())
        .mapToObj(k -> names.read(channels.get(k), symbols.get(k)))
        .toList();
  }

  private Heading read(Channel channel, ChannelSymbol symbol) {
    ChannelUnit unit = ChannelUnit.of(channel.unit(), channel.name());
    if (MeasuredQuantity.ofCapture(channel.name().trim()).isPresent()) {
      double factor = unit.isElectric() ? unit.factor() : 1;
      return heading(Heading.Meaning.EXACT, channel.name().trim(), factor);
    }
    String letter = unit.isElectric() ? unit.letter() : symbol.letter();
    if (unit.isOther() || letter.isEmpty() || symbol.isNoWave() || isSequence(symbol)) {
      return heading(Heading.Meaning.NONE, "", 1);
    }
    if (unit.isUnclear()) {
      return unclear("the factor from its unit to volts or amps");
    }
    return placed(symbol, letter, unit);
  }

  /** Where lines are named by letters, {@code I1}, {@code I2} beside them are sequences. */
  private boolean isSequence(ChannelSymbol s) {
    boolean residualVoltage = s.isResidual() && s.letter().equals("v");
    return residualVoltage
        || lettered.contains(s.letter()) && s.isNumbered() && s.phase().isEmpty();
  }

  private Heading placed(ChannelSymbol symbol, String letter, ChannelUnit unit) {
    Optional<String> place = place(symbol);
    if (place.isEmpty()) {
      return unclear(
          "which conductor this is: L1, L2, L3, N" + (letter.equals("v") ? ", L1-L2 …" : ""));
    }
    String turned =
        place.get().length() == 5
            ? place.get().substring(3) + "-" + place.get().substring(0, 2)
            : place.get();
    boolean asNamed = MeasuredQuantity.ofCapture(place.get() + "." + letter).isPresent();
    String quantity = (asNamed ? place.get() : turned) + "." + letter;
    if (MeasuredQuantity.ofCapture(quantity).isEmpty()) {
      return unclear("which conductor this is");
    }
    // A numbered fourth input is the neutral by habit only.
    boolean byHabit = !unit.isElectric() || symbol.first().equals("4");
    return heading(
        byHabit ? Heading.Meaning.LIKELY : Heading.Meaning.CLEAR,
        quantity,
        (asNamed ? 1 : -1) * unit.factor());
  }

  /** The symbol's conductors; where its phase field names others, neither is trusted. */
  private Optional<String> place(ChannelSymbol symbol) {
    Optional<String> byName = convention.place(symbol.first(), symbol.second());
    Optional<String> byPhase = convention.place(symbol.phaseFirst(), symbol.phaseSecond());
    if (byPhase.isEmpty() || !symbol.isWhole()) {
      return byPhase.or(() -> byName);
    }
    boolean agree = byName.isEmpty() || byName.equals(byPhase);
    boolean pairSaysMore = byName.filter(n -> n.length() == 5).isPresent();
    return agree || pairSaysMore ? byName.or(() -> byPhase) : Optional.empty();
  }

  private static Heading heading(Heading.Meaning meaning, String quantity, double factor) {
    return new Heading(meaning, quantity, Statistic.INSTANT, factor, "");
  }

  private static Heading unclear(String question) {
    return new Heading(Heading.Meaning.UNCLEAR, "", Statistic.INSTANT, 1, question);
  }
}
