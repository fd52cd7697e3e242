package fourthwire.site.conductor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import fourthwire.site.Feeder;
import fourthwire.site.Feeder.Material;
import fourthwire.site.Practice;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Sizes as people write them, skin effect against the exact solution, whose ampacity counts. */
class ConductorTest {
  @ParameterizedTest
  @CsvSource({
    "25 mm2, 25 mm2",
    "25mm², 25 mm2",
    "'2,5 mm2', 2.5 mm2",
    "4 AWG, 4 AWG",
    "#4 awg, 4 AWG",
    "1/0 AWG, 1/0 AWG",
    "250 kcmil, 250 kcmil",
    "500 MCM, 500 kcmil"
  })
  void sizesAreRead(String text, String word) {
    assertThat(ConductorSize.find(text).map(ConductorSize::word)).contains(word);
  }

  /** 5 AWG and 26 mm2 are no sizes of the tables; 250 AWG and 4 kcmil mix the two series. */
  @ParameterizedTest
  @ValueSource(strings = {"5 AWG", "26 mm2", "250 AWG", "4 kcmil", "25", "", "mm2"})
  void otherTextIsRefused(String text) {
    assertThat(ConductorSize.find(text)).isEmpty();
  }

  /** Copper from 10 to 630 mm2 at 70 °C, orders 1 to 49 of 50 Hz: the Bessel solution. */
  @Test
  void skinEffectFollowsTheBesselSolution() throws IOException {
    Path file = Path.of("src/test/resources/validation/conductors/skin-effect.csv");
    try (CsvReader<NamedCsvRecord> reader =
        CsvReader.builder().commentStrategy(CommentStrategy.SKIP).ofNamedCsvRecord(file)) {
      List<NamedCsvRecord> rows = reader.stream().toList();
      assertThat(rows).hasSizeGreaterThan(200);
      for (NamedCsvRecord row : rows) {
        ConductorSize size = ConductorSize.find(row.getField("area_mm2") + " mm2").orElseThrow();
        double dc = ConductorData.dcOhmPerKm(size, Material.COPPER, Practice.IEC).orElseThrow();
        double exact = Double.parseDouble(row.getField("rac_rdc_bessel"));
        double ratio = ConductorData.skinRatio(dc, 50 * Double.parseDouble(row.getField("order")));
        assertThat(ratio).as("%s", row).isCloseTo(exact, within(0.007 * exact));
      }
    }
  }

  @Test
  void surveyedAmpacityPrevailsOverTheTable() {
    Feeder feeder = feeder("25 mm2", "", 1, OptionalDouble.of(90));
    assertThat(Ampacity.ofLine(feeder).amps().value()).hasValue(90);
    assertThat(Ampacity.ofNeutral(feeder).amps().value()).hasValue(90);
    assertThat(Ampacity.ofLine(feeder("25 mm2", "", 1, OptionalDouble.empty())).basis())
        .contains("method C (assumed)", "from memory");
  }

  /** Half-size neutral: its own table figure; beside a surveyed line, in the tables' proportion. */
  @Test
  void neutralOfAnotherSize() {
    Ampacity table = Ampacity.ofNeutral(feeder("4 AWG", "6 AWG", 1, OptionalDouble.empty()));
    assertThat(table.amps().value()).hasValue(65);
    Ampacity scaled = Ampacity.ofNeutral(feeder("4 AWG", "6 AWG", 1, OptionalDouble.of(68)));
    assertThat(scaled.amps().value().orElseThrow()).isCloseTo(68 * 65 / 85.0, within(1e-9));
  }

  @Test
  void doubledNeutralCarriesTwice() {
    Ampacity doubled = Ampacity.ofNeutral(feeder("4 AWG", "", 2, OptionalDouble.of(85)));
    assertThat(doubled.amps().value()).hasValue(170);
    assertThat(doubled.basis()).contains("2 neutrals");
  }

  @Test
  void whatIsNotKnownSaysWhy() {
    assertThat(Ampacity.ofLine(Feeder.UNKNOWN).amps().reason()).contains("ampacity_a");
    assertThat(Ampacity.ofLine(feeder("630 mm2", "", 1, OptionalDouble.empty())).amps().reason())
        .contains("give ampacity_a");
  }

  private static Feeder feeder(
      String size, String neutralSize, int neutrals, OptionalDouble ampacityA) {
    Feeder u = Feeder.UNKNOWN;
    return new Feeder(
        u.lengthM(),
        Optional.of(size),
        Optional.empty(),
        OptionalInt.empty(),
        neutralSize.isEmpty() ? Optional.empty() : Optional.of(neutralSize),
        OptionalInt.of(neutrals),
        Optional.empty(),
        Optional.empty(),
        OptionalDouble.empty(),
        OptionalDouble.empty(),
        ampacityA,
        u.neutralAmpacityA(),
        u.resistanceOhmPerKm(),
        u.reactanceOhmPerKm(),
        u.neutralResistanceOhmPerKm(),
        u.neutralReactanceOhmPerKm());
  }
}
