package fourthwire.config;

import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingReader;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.metering.RawFile;
import fourthwire.metering.Reading;
import java.util.List;
import java.util.function.BiPredicate;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

/** Until the reader of meters' files is there: refuses them. */
@Configuration(proxyBeanMethods = false)
class InterimReadings {
  @Bean
  ReadingReader readingReader() {
    return new ReadingReader() {
      @Override
      public ReadingPlan plan(List<RawFile> files, ReadingSetting setting) {
        throw new ReadingRefusedException("meters' files are not read yet", List.of(), List.of());
      }

      @Override
      public Reading read(
          List<RawFile> files,
          ReadingPlan plan,
          ReadingSetting setting,
          BiPredicate<Double, String> progress) {
        throw new ReadingRefusedException("meters' files are not read yet", List.of(), List.of());
      }
    };
  }
}
