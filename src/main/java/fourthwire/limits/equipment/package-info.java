/**
 * What a single piece of equipment may draw at each order: IEC 61000-3-2 to 16 A a line, IEC
 * 61000-3-12 above that to 75 A.
 *
 * <p>These are type tests on a stiff, sinusoidal supply: they help to choose equipment and never
 * judge a panel or a site. Door: {@link fourthwire.limits.equipment.EquipmentLimits}. May use
 * {@code quantity}. The tables lie beside the classes, typed as printed; how open points are read
 * stands in {@code src/docs/readings-of-standards.md}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.limits.equipment;
