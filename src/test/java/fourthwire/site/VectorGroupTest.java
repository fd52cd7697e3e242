package fourthwire.site;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The connection symbols of the survey; IEC 60076-1:2011, clause 7 (from memory). */
class VectorGroupTest {
  @ParameterizedTest
  @CsvSource({
    "Dyn11,true,false,false", "Dyn1,true,false,false", "Dd0,false,false,false",
    "Dz0,false,false,false", "Dzn0,true,false,false", "Yy0,false,false,false",
    "Yyn0,true,false,false", "YNyn0,true,true,false", "YNyn6,true,true,false",
    "YNy0,false,false,false", "YNd11,false,false,true", "Yd1,false,false,false",
    "Yzn11,true,false,false", "YNzn5,true,false,false", "Ii0,true,false,false",
    "Iii0,true,false,false"
  })
  @DisplayName("Every supported pair is read and knows what becomes of the zero sequence")
  void readsSupportedPairs(String symbol, boolean neutral, boolean passes, boolean shunts) {
    VectorGroup group = VectorGroup.parse(symbol);
    assertThat(group.symbol()).isEqualTo(symbol);
    assertThat(group.hasSecondaryNeutral()).isEqualTo(neutral);
    assertThat(group.passesZeroSequence()).isEqualTo(passes);
    assertThat(group.shuntsPrimaryZeroSequence()).isEqualTo(shunts);
    assertThat(VectorGroup.parse(" " + symbol.toUpperCase() + " ")).isEqualTo(group);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "Dyn0",
        "Dyn2",
        "Dd1",
        "Yy1",
        "Yd0",
        "Yzn0",
        "Dzn11",
        "Dyn12",
        "Dyn",
        "Dyn111",
        "Ii6",
        "",
        "Vv0",
        "Yna0",
        "Ya0",
        "delta-star",
        "Zyn11",
        "Dyyn11",
        "Iy0",
        "Dyn-1",
        "11"
      })
  @DisplayName("Anything else is refused, naming what is supported")
  void refusesTheRest(String symbol) {
    assertThatThrownBy(() -> VectorGroup.parse(symbol))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageMatching("(?s).*(supported are|clock number is 0 to 11).*");
  }

  @Test
  @DisplayName("Zero-sequence impedance where the survey is silent")
  void assumesZeroSequenceImpedance() {
    // Common practice, no source; stated as defaults in the public contract.
    assertThat(VectorGroup.parse("Dyn11").assumedZeroSequencePercent(6)).isEqualTo(6);
    assertThat(VectorGroup.parse("YNyn0").assumedZeroSequencePercent(6)).isEqualTo(6);
    assertThat(VectorGroup.parse("Yyn0").assumedZeroSequencePercent(6)).isEqualTo(50);
    assertThat(VectorGroup.parse("Dzn0").assumedZeroSequencePercent(6))
        .isEqualTo(0.6, within(1e-12));
  }
}
