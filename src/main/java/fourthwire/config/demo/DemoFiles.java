package fourthwire.config.demo;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.Collectors;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;
import org.springframework.core.io.Resource;
import org.springframework.core.io.support.PathMatchingResourcePatternResolver;

/** The files of the demo site on the class path, whether in a folder or in a jar. */
final class DemoFiles {
  private static final String MAPPING = ".mapping.json";

  private final PathMatchingResourcePatternResolver resolver =
      new PathMatchingResourcePatternResolver();

  /** The survey's tables as one zip; empty where there is no demo site. */
  Optional<byte[]> survey() throws IOException {
    List<Resource> tables = resources("survey/*.csv");
    if (tables.isEmpty()) {
      return Optional.empty();
    }
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (ZipOutputStream zip = new ZipOutputStream(bytes)) {
      for (Resource table : tables) {
        zip.putNextEntry(new ZipEntry(name(table)));
        zip.write(table.getContentAsByteArray());
      }
    }
    return Optional.of(bytes.toByteArray());
  }

  /** Meters' files, those of one capture together, in the order of their names. */
  List<Readings> readings() throws IOException {
    List<Resource> all = resources("readings/*");
    Map<String, String> mappings = new TreeMap<>();
    for (Resource r : all) {
      if (name(r).endsWith(MAPPING)) {
        mappings.put(
            name(r).substring(0, name(r).length() - MAPPING.length()),
            r.getContentAsString(StandardCharsets.UTF_8));
      }
    }
    return all.stream()
        .filter(r -> !name(r).endsWith(MAPPING))
        .collect(Collectors.groupingBy(r -> stem(name(r)), TreeMap::new, Collectors.toList()))
        .values()
        .stream()
        .map(files -> readings(files, mappings))
        .toList();
  }

  private static Readings readings(List<Resource> files, Map<String, String> mappings) {
    return new Readings(
        stem(name(files.get(0))).replaceFirst("__.*", ""),
        files.stream().map(DemoFile::of).toList(),
        files.stream().map(r -> mappings.get(name(r))).filter(Objects::nonNull).findFirst());
  }

  private List<Resource> resources(String pattern) throws IOException {
    if (!resolver.getResource("classpath:sample-data/").exists()) {
      return List.of();
    }
    return Arrays.stream(resolver.getResources("classpath*:sample-data/" + pattern))
        .filter(Resource::isReadable)
        .sorted(Comparator.comparing(DemoFiles::name))
        .toList();
  }

  private static String name(Resource resource) {
    return Objects.requireNonNull(resource.getFilename(), "a file of the demo site has a name");
  }

  private static String stem(String name) {
    return name.substring(0, name.lastIndexOf('.'));
  }

  /**
   * Files of one reading.
   *
   * @param mapping as JSON, where one stands beside the file
   */
  record Readings(String meter, List<DemoFile> files, Optional<String> mapping) {}
}
