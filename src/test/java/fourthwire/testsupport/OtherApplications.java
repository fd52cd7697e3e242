package fourthwire.testsupport;

import fourthwire.Application;
import org.springframework.boot.SpringBootConfiguration;
import org.springframework.boot.context.TypeExcludeFilter;
import org.springframework.core.type.classreading.MetadataReader;
import org.springframework.core.type.classreading.MetadataReaderFactory;

/** Keeps applications that other tests start out of the scan of the real one. */
public final class OtherApplications extends TypeExcludeFilter {
  @Override
  public boolean match(MetadataReader reader, MetadataReaderFactory factory) {
    return !reader.getClassMetadata().getClassName().equals(Application.class.getName())
        && reader.getAnnotationMetadata().isAnnotated(SpringBootConfiguration.class.getName());
  }

  @Override
  public boolean equals(Object other) {
    return other != null && other.getClass() == getClass();
  }

  @Override
  public int hashCode() {
    return getClass().hashCode();
  }
}
