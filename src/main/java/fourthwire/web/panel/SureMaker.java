package fourthwire.web.panel;

import fourthwire.audit.HeadlineFigure;
import fourthwire.audit.NodeDoubt;
import fourthwire.audit.NodeDoubt.Range;
import fourthwire.audit.NodeSummary;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.web.figure.RangeBar;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Makes what a node's page says of how sure it is. */
final class SureMaker {
  private static final double PERCENT = 100;

  private final Words words;
  private final NodeCase node;
  private final NodeDoubt doubt;

  SureMaker(Words words, NodeCase node, NodeDoubt doubt) {
    this.words = words;
    this.node = node;
    this.doubt = doubt;
  }

  StatesView.Sure make() {
    return new StatesView.Sure(
        words.of("sure.small", doubt.draws()),
        rows(),
        words.of("sure.ranked", name(doubt.ranked())),
        doubt.inputs().stream().map(i -> StatesView.Share.of(i.input(), i.share())).toList());
  }

  private List<StatesView.RangeRow> rows() {
    NodeSummary computed = NodeSummary.of(node.node());
    List<StatesView.RangeRow> rows = new ArrayList<>();
    for (Map.Entry<HeadlineFigure, Range> e : doubt.range().entrySet()) {
      Figure figure = figure(computed, e.getKey());
      figure.value().ifPresent(value -> rows.add(row(e.getKey(), e.getValue(), value)));
    }
    return rows;
  }

  private StatesView.RangeRow row(HeadlineFigure figure, Range range, double computed) {
    String alternative =
        words.of(
            "sure.alternative",
            name(figure),
            StatesView.amount(figure, range.p5()),
            StatesView.amount(figure, range.p50()),
            StatesView.amount(figure, range.p95()));
    return new StatesView.RangeRow(
        name(figure),
        RangeBar.draw(range.p5(), range.p50(), range.p95(), computed, limit(figure), alternative),
        StatesView.amount(figure, range.p5()),
        StatesView.amount(figure, range.p50()),
        StatesView.amount(figure, range.p95()),
        StatesView.amount(figure, computed));
  }

  private double limit(HeadlineFigure figure) {
    return switch (figure) {
      case NEUTRAL_LOADING, TRANSFORMER_LOADING -> PERCENT;
      case NEUTRAL_RMS ->
          node.design()
              .map(d -> d.neutral().ampacityA())
              .flatMap(f -> f.value().stream().boxed().findFirst())
              .orElse(Double.NaN);
      case L1_RMS, L2_RMS, L3_RMS ->
          node.design()
              .flatMap(d -> Optional.ofNullable(d.lines().get(conductor(figure))))
              .flatMap(l -> l.ampacityA().value().stream().boxed().findFirst())
              .orElse(Double.NaN);
      default -> Double.NaN;
    };
  }

  private static Conductor conductor(HeadlineFigure line) {
    return Conductor.values()[HeadlineFigure.LINES.indexOf(line)];
  }

  private static Figure figure(NodeSummary s, HeadlineFigure figure) {
    return switch (figure) {
      case NEUTRAL_RMS -> s.neutralRmsA();
      case NEUTRAL_LOADING -> s.neutralLoadingPercent();
      case L1_RMS, L2_RMS, L3_RMS ->
          s.lineRmsA().getOrDefault(conductor(figure), Figure.unknown(""));
      case CURRENT_THD -> s.currentThdPercent();
      case TDD -> s.tddPercent();
      case VOLTAGE_THD -> s.voltageThdPercent();
      case TRANSFORMER_LOADING -> s.transformerLoadingPercent();
      case HARMONIC_LOSS_FACTOR -> s.harmonicLossFactor();
      case ACTIVE -> s.activeW();
      case POWER_FACTOR -> s.powerFactor();
      case LOSSES -> s.lossesW();
    };
  }

  private String name(HeadlineFigure figure) {
    return node.names().in(words.of("headline-figure." + figure.word()));
  }
}
