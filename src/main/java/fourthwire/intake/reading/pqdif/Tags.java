package fourthwire.intake.reading.pqdif;

import java.util.UUID;

/**
 * Identifiers of records, elements and characteristics. What values may be (quantity and value
 * types, characteristics) is held against the IEEE 1159.3 task force's list of standard
 * identifiers, version 1.5; records and elements are those of IEEE 1159.3-2003, from memory.
 */
final class Tags {
  static final UUID CONTAINER = of("89738606-f1c3");
  static final UUID DATA_SOURCE = of("89738619-f1c3");
  static final UUID OBSERVATION = of("8973861a-f1c3");

  static final UUID SOURCE_NAME = of("b48d8587-f5f5");
  static final UUID CHANNEL_DEFINITIONS = of("b48d858d-f5f5");
  static final UUID CHANNEL_DEFINITION = of("b48d858e-f5f5");
  static final UUID CHANNEL_NAME = of("b48d8590-f5f5");
  static final UUID PHASE = of("b48d8591-f5f5");
  static final UUID QUANTITY_TYPE = of("b48d8592-f5f5");
  static final UUID QUANTITY_MEASURED = of("c690e872-f755");
  static final UUID SERIES_DEFINITIONS = of("b48d8598-f5f5");
  static final UUID SERIES_DEFINITION = of("b48d859a-f5f5");
  static final UUID UNITS = of("b48d859b-f5f5");
  static final UUID VALUE_TYPE = of("b48d859c-f5f5");
  static final UUID STORAGE = of("b48d85a1-f5f5");
  static final UUID CHARACTERISTIC = of("3d786f9e-f76e");

  static final UUID OBSERVATION_NAME = of("3d786f8a-f76e");
  static final UUID TIME_START = of("3d786f8c-f76e");
  static final UUID CHANNEL_INSTANCES = of("3d786f91-f76e");
  static final UUID CHANNEL_INSTANCE = of("3d786f92-f76e");
  static final UUID DEFINITION_INDEX = of("b48d858f-f5f5");
  static final UUID SERIES_INSTANCES = of("3d786f93-f76e");
  static final UUID SERIES_INSTANCE = of("3d786f95-f76e");
  static final UUID SCALE = of("3d786f96-f76e");
  static final UUID OFFSET = of("62f28182-f9c4");
  static final UUID VALUES = of("3d786f99-f76e");
  static final UUID SHARED_CHANNEL = of("8973861f-f1c3");
  static final UUID SHARED_SERIES = of("89738620-f1c3");

  static final UUID WAVEFORM = of("67f6af80-f753");
  static final UUID VALUE_LOG = of("67f6af82-f753");

  static final UUID TYPE_VALUE = of("67f6af97-f753");
  static final UUID TYPE_MIN = of("67f6af98-f753");
  static final UUID TYPE_MAX = of("67f6af99-f753");
  static final UUID TYPE_MEAN = of("67f6af9a-f753");
  static final UUID TYPE_INSTANT = of("67f6af9b-f753");
  static final UUID TYPE_TIME = of("c690e862-f755");

  static final UUID IS_INSTANTANEOUS = characteristic("a6b31add");
  static final UUID IS_RMS = characteristic("a6b31ae5");
  static final UUID IS_TOTAL_DISTORTION = characteristic("a6b31aec");
  static final UUID IS_ACTIVE_POWER = characteristic("a6b31ae1");
  static final UUID IS_POWER_FACTOR = characteristic("a6b31ae3");
  static final UUID IS_REACTIVE_POWER = characteristic("a6b31ae4");
  static final UUID IS_APPARENT_POWER = characteristic("a6b31ae6");
  static final UUID IS_DISPLACEMENT_FACTOR = characteristic("a6b31ad3");
  static final UUID IS_FREQUENCY = UUID.fromString("07ef68af-9ff5-11d2-b30b-006008b37183");
  static final UUID IS_ENERGY = UUID.fromString("07ef68a6-9ff5-11d2-b30b-006008b37183");
  static final UUID IS_ENERGY_TAKEN = UUID.fromString("07ef68a7-9ff5-11d2-b30b-006008b37183");

  private Tags() {}

  private static UUID of(String begin) {
    return UUID.fromString(begin + "-11cf-9d89-0080c72e70a3");
  }

  private static UUID characteristic(String begin) {
    return UUID.fromString(begin + "-b451-11d1-ae17-0060083a2628");
  }
}
