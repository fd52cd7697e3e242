package fourthwire.intake.reading;

import fourthwire.metering.ReadingMapping;
import fourthwire.quantity.Conductor;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;

/**
 * What is known about a meter's file beside the file.
 *
 * @param siteZone the site's time zone
 * @param nominalHz the site's frequency, 50 or 60
 * @param mapping given with the upload; it overrides what is proposed
 * @param remembered the mapping confirmed before for this meter and a layout
 * @param ctReversed conductors whose current transformer is known to point the wrong way
 * @param ctRatio of the meter, applied to currents a file marks as secondary without a ratio
 * @param nominalV line-to-neutral voltage of the site at the meter
 */
public record ReadingSetting(
    Optional<ZoneId> siteZone,
    double nominalHz,
    Optional<ReadingMapping> mapping,
    Function<String, Optional<ReadingMapping>> remembered,
    List<Conductor> ctReversed,
    OptionalDouble ctRatio,
    OptionalDouble nominalV) {

  /** Of a meter at a node whose nominal voltage is not known. */
  public ReadingSetting(
      Optional<ZoneId> siteZone,
      double nominalHz,
      Optional<ReadingMapping> mapping,
      Function<String, Optional<ReadingMapping>> remembered,
      List<Conductor> ctReversed,
      OptionalDouble ctRatio) {
    this(siteZone, nominalHz, mapping, remembered, ctReversed, ctRatio, OptionalDouble.empty());
  }
}
