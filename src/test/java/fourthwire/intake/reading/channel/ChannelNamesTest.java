package fourthwire.intake.reading.channel;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.intake.reading.heading.Heading;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Ways in which recorders name their channels; common practice, no source. */
class ChannelNamesTest {
  /** Channels as {@code name/phase/unit}; what each holds, - for nothing, ? for a question. */
  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "VA/A/kV VB/B/kV VC/C/kV VN/N/kV | L1.v*1000 L2.v*1000 L3.v*1000 N.v*1000",
        "Va//V Vb//V Vc//V Ia//A Ib//A Ic//A In//A | L1.v L2.v L3.v L1.i L2.i L3.i N.i",
        "UL1//V UL2//V UL3//V IL1//A IL2//A IL3//A IN//A | L1.v L2.v L3.v L1.i L2.i L3.i N.i",
        "UL1-N//V UL2-N//V UL3-N//V UL1-L2//V UL12//V | L1.v L2.v L3.v L1-L2.v L1-L2.v",
        "U1//V U2//V U3//V I1//mA I4//A | L1.v L2.v L3.v L1.i*0.001 N.i",
        "U12//V U23//V U31//V U13//V | L1-L2.v L2-L3.v L3-L1.v L3-L1.v*-1",
        "IA//A IB//A IC//A 3I0//A | L1.i L2.i L3.i N.i",
        "IA//A IB//A IC//A I0//A I1//A I2//A 3U0//V | L1.i L2.i L3.i N.i - - -",
        "IR//A IY//A IB//A VR//kV VY//kV VB//kV | L1.i L2.i L3.i L1.v*1000 L2.v*1000 L3.v*1000",
        "IR//A IS//A IT//A | L1.i L2.i L3.i",
        "IA//A IB//A IC//A IR//A IG//A | L1.i L2.i L3.i N.i N.i",
        "IU//A IV//A IW//A | L1.i L2.i L3.i",
        "VAB//V VBC//V VCA//V VAN//V | L1-L2.v L2-L3.v L3-L1.v L1.v",
        "Current/A/A Current/B/A Current/C/A Voltage/A-B/V Voltage/N/V | L1.i L2.i L3.i L1-L2.v"
            + " N.v",
        "Phase_A_Current//A Phase_B_Voltage//V Neutral_Current//A | L1.i L2.v N.i",
        "Line_1_IA//Amps Line_1_VA//Volts | L1.i L1.v",
        "CT1/A/A CT2/B/A VT1/C/kV | L1.i L2.i L3.v*1000",
        "I_A//A I_B//A V_A-B//V | L1.i L2.i L1-L2.v",
        "iL1//A uL2//V | L1.i L2.v",
        "IA1//A IB1//A IC1//A | L1.i L2.i L3.i",
        "I1/I1/ampere U1/V1/volt | L1.i L1.v",
        "FREQ//Hz P//MW VBAT//V IA_ang//deg | - - ? -",
        "IA/B/A | ?",
        "VA//pu VB//MV | ? ?",
        "VA VB VC IA | L1.v L2.v L3.v L1.i",
        "L1.v L1-L2.v//kV N.i | L1.v L1-L2.v*1000 N.i"
      })
  void readsWhatPeopleWrite(String channels, String expected) {
    List<ChannelNames.Channel> asked =
        Arrays.stream(channels.trim().split(" ")).map(ChannelNamesTest::channel).toList();
    String read =
        ChannelNames.read(asked).stream()
            .map(ChannelNamesTest::text)
            .collect(Collectors.joining(" "));
    assertThat(read).isEqualTo(expected.trim());
  }

  private static ChannelNames.Channel channel(String text) {
    String[] parts = text.split("/", -1);
    return new ChannelNames.Channel(
        parts[0].replace('_', ' '),
        parts.length > 1 ? parts[1] : "",
        parts.length > 2 ? parts[2] : "");
  }

  private static String text(Heading h) {
    return switch (h.meaning()) {
      case NONE -> "-";
      case UNCLEAR -> "?";
      default -> h.quantity() + (h.factor() == 1 ? "" : "*" + plain(h.factor()));
    };
  }

  private static String plain(double x) {
    return Double.toString(x).replaceAll("\\.0$", "");
  }

  /** Units in the headings of a table of samples. */
  @ParameterizedTest
  @CsvSource({
    "U1 [V], L1.v, 1",
    "I1 [mA], L1.i, 0.001",
    "Ia (A), L1.i, 1",
    "Voltage L2 (kV), L2.v, 1000",
    "I L1 A, L1.i, 1",
    "v_ab, L1-L2.v, 1"
  })
  void readsUnitsInHeadings(String heading, String quantity, double factor) {
    Heading h = ChannelNames.read(List.of(new ChannelNames.Channel(heading, "", ""))).get(0);
    assertThat(h.quantity()).isEqualTo(quantity);
    assertThat(h.factor()).isEqualTo(factor);
  }
}
