package fourthwire.limits;

import fourthwire.quantity.Figure;

/**
 * One figure held against one limit.
 *
 * @param code our own short, stable word for the check, for example {@code neutral-ampacity}
 * @param severity act, watch or note
 * @param figure the figure judged
 * @param limit what it is held against; unknown with a reason for plain information
 * @param unit of both, as printed: {@code A}, {@code %}, {@code kVA} …
 * @param probability that the limit is passed, 0 to 1; unknown where no doubt was computed
 * @param basis document, edition and clause, or "common practice, no source"
 * @param sentence one sentence a client can read
 */
public record Finding(
    String code,
    Severity severity,
    Figure figure,
    Figure limit,
    String unit,
    Figure probability,
    String basis,
    String sentence) {}
