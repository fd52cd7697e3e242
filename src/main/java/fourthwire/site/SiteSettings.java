package fourthwire.site;

import java.util.Optional;
import java.util.OptionalDouble;

/** The {@code site} table: settings of the whole site; empty means not known. */
public record SiteSettings(
    String name,
    int frequencyHz,
    Practice practice,
    Optional<String> timezone,
    Optional<String> currency,
    OptionalDouble energyPricePerKwh,
    OptionalDouble demandPricePerKvaMonth,
    OptionalDouble powerFactorTarget,
    OptionalDouble discountRatePercent,
    Optional<String> pcc) {}
