package fourthwire.limits.equipment;

import java.util.List;
import java.util.Optional;

/**
 * One current held against the limits of its equipment.
 *
 * @param standing document and class, or document and table: {@code IEC 61000-3-2, class D}
 * @param basis document, edition, clause and table, and "from memory" where figures were recalled
 * @param reason why these limits hold, or why none do: a sentence without its stop
 * @param orders every order that has a limit, rising; empty where no limits hold
 * @param totals limits of the whole current beside them
 */
public record EquipmentJudgement(
    String standing,
    String basis,
    String reason,
    List<OrderLimit> orders,
    List<TotalLimit> totals) {

  /** Copies the lists. */
  public EquipmentJudgement {
    orders = List.copyOf(orders);
    totals = List.copyOf(totals);
  }

  static EquipmentJudgement none(String standing, String basis, String reason) {
    return new EquipmentJudgement(standing, basis, reason, List.of(), List.of());
  }

  /** Whether any limit holds for this equipment. */
  public boolean limited() {
    return !orders.isEmpty();
  }

  /** Whether every limit is kept; true where none holds. */
  public boolean met() {
    return orders.stream().allMatch(OrderLimit::met) && totals.stream().allMatch(TotalLimit::met);
  }

  /** The limit of this order, if it has one. */
  public Optional<OrderLimit> order(int order) {
    return orders.stream().filter(o -> o.order() == order).findFirst();
  }

  /** How far the most used limit is used, 1 at the limit; 0 where none holds. */
  public double ofLimit() {
    double worst = orders.stream().mapToDouble(OrderLimit::ofLimit).max().orElse(0);
    return Math.max(worst, totals.stream().mapToDouble(TotalLimit::ofLimit).max().orElse(0));
  }
}
