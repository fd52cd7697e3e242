package fourthwire.web.load;

import fourthwire.limits.equipment.EquipmentJudgement;
import fourthwire.limits.equipment.OrderLimit;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Spectrum;
import fourthwire.web.figure.SpectrumPlot;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.List;
import java.util.function.IntFunction;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;

/** Draws one unit's harmonics beside their limits, as far up as an order matters. */
final class SpectrumMaker {
  private static final int MOST_ORDERS = 14;
  private static final int USUAL_HIGHEST = 15;

  /** Of the strongest harmonic: above it an order is drawn, and above the second it matters. */
  private static final double FLOWS = 0.01;

  private static final double MATTERS = 0.1;

  /** A limit up to so many times the tallest bar has its place in the picture. */
  private static final double ROOM = 2.5;

  private final Words words;
  private final Spectrum current;
  private final EquipmentJudgement judgement;
  private final boolean threeLines;
  private final double strongest;

  SpectrumMaker(Words words, Spectrum current, EquipmentJudgement judgement, boolean threeLines) {
    this.words = words;
    this.current = current;
    this.judgement = judgement;
    this.threeLines = threeLines;
    this.strongest =
        IntStream.rangeClosed(2, Spectrum.HIGHEST_ORDER)
            .mapToDouble(current::magnitude)
            .max()
            .orElse(0);
  }

  String draw(String name) {
    List<Integer> orders = drawn();
    List<SpectrumPlot.Group> groups =
        orders.stream()
            .map(
                h ->
                    new SpectrumPlot.Group(
                        h,
                        List.of(current.magnitude(h)),
                        judgement.order(h).stream().mapToDouble(OrderLimit::limitA).findFirst()))
            .toList();
    return SpectrumPlot.draw(
        List.of(Conductor.L1),
        groups,
        ROOM,
        written(orders),
        "A",
        words.of("loads.spectrum.alternative", name));
  }

  /** Beside what the harmonics flow, and whose limits are marked. */
  String about() {
    String of = words.of("loads.spectrum.of", Numbers.of(current.magnitude(1), "A"));
    return judgement.limited()
        ? of + "; " + words.of("loads.spectrum.limit", judgement.standing())
        : of;
  }

  /** Where many are drawn, every second or third, counted from the last. */
  private static IntFunction<String> written(List<Integer> orders) {
    int last = orders.size() - 1;
    int step = last / MOST_ORDERS + 1;
    return h -> (last - orders.indexOf(h)) % step == 0 ? Numbers.ordinal(h) : "";
  }

  /**
   * The usual odd orders up to the last that flows, and others that flow: the lowest of them, or as
   * many as reach to the last that matters.
   */
  List<Integer> drawn() {
    IntPredicate flows = h -> over(h) || current.magnitude(h) > FLOWS * strongest;
    int last = Math.max(USUAL_HIGHEST, last(flows));
    int least = last(h -> over(h) || current.magnitude(h) > MATTERS * strongest);
    List<Integer> all =
        IntStream.rangeClosed(2, Spectrum.HIGHEST_ORDER)
            .filter(h -> usual(h) && h <= last || flows.test(h))
            .boxed()
            .toList();
    int many = (int) all.stream().filter(h -> h <= least).count();
    return all.subList(0, Math.min(all.size(), Math.max(MOST_ORDERS, many)));
  }

  private static int last(IntPredicate holds) {
    return IntStream.rangeClosed(2, Spectrum.HIGHEST_ORDER).filter(holds).max().orElse(0);
  }

  private boolean over(int order) {
    return judgement.order(order).filter(o -> !o.met()).isPresent();
  }

  private boolean usual(int order) {
    return order % 2 == 1 && (!threeLines || order % 3 != 0);
  }
}
