package fourthwire.web.support;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.limits.FindingCode;
import java.io.IOException;
import java.io.Reader;
import java.io.StringReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Collection;
import java.util.List;
import java.util.Properties;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.springframework.context.support.StaticMessageSource;

/** Every key a page asks for has its text, and no text is damaged or asked for by nobody. */
class MessagesTest {
  private static final Path TEMPLATES = Path.of("src/main/resources/templates");
  private static final Path MESSAGES = Path.of("src/main/resources/messages.properties");
  private static final Pattern IN_TEMPLATE = Pattern.compile("#\\{([a-z0-9.-]+)[(}]");
  private static final Pattern QUOTED = Pattern.compile("\"([a-z0-9]+(?:[.-][a-z0-9-]+)+)\"");

  /** Keys that are put together when a page is made. */
  private static final List<String> COMPOSED =
      List.of(
          "verdict.",
          "kind.",
          "count.",
          "heat.",
          "confidence.",
          "headline.",
          "row.below.",
          "finding.",
          "working.",
          "audit.state.",
          "spectrum.of.",
          "headline-figure.",
          "week.day.",
          "reading.kind.",
          "reading.event.kind.",
          "reading.fact.",
          "reading.limits.what.",
          "reading.limits.week",
          "reading.limits.day",
          "reading.limits.year",
          "reading.limits.over",
          "reading.limits.within",
          "reading.limits.open",
          "columns.asked",
          "columns.likely",
          "columns.sure",
          "columns.unread",
          "columns.measure.",
          "columns.statistic.",
          "measure.",
          "series.length.",
          "series.way.",
          "orders.of.",
          "orders.step.",
          "orders.when.",
          "orders.verdict.",
          "orders.typical.",
          "orders.highest.",
          "reading.verdict.",
          "log.",
          "loads.kind.",
          "loads.model.",
          "loads.field.",
          "loads.hint.",
          "loads.use.",
          "loads.hz.",
          "loads.lines.",
          "loads.background.",
          "loads.chart.",
          "loads.total.",
          "loads.active.",
          "loads.reactive.",
          "loads.apparent.",
          "loads.nonfundamental.");

  @Test
  void everyKeyOfATemplateHasItsText() throws IOException {
    assertThat(inTemplates()).hasSizeGreaterThan(80).isSubsetOf(keys());
  }

  @Test
  void everyKeyAskedForInCodeHasItsText() throws IOException {
    Set<String> known = keys();
    Pattern asked = Pattern.compile("words\\.of\\(\\s*\"([a-z0-9.-]+[a-z0-9])\"");
    assertThat(find(asked, Path.of("src/main/java/fourthwire/web"), ".java"))
        .hasSizeGreaterThan(60)
        .isSubsetOf(known);
  }

  @Test
  void noTextIsAskedForByNobody() throws IOException {
    Set<String> used = inTemplates();
    used.addAll(find(QUOTED, Path.of("src/main/java/fourthwire/web"), ".java"));
    assertThat(keys()).filteredOn(k -> COMPOSED.stream().noneMatch(k::startsWith)).isSubsetOf(used);
  }

  @Test
  void everyCheckHasAHeadlineOfItsOwnOrIsNoneThatMakesOne() throws IOException {
    Set<String> known = keys();
    for (String code : Headline.weighed()) {
      assertThat(Stream.of(FindingCode.values()).map(FindingCode::word)).contains(code);
      for (String manner : Headline.manners(code)) {
        String key = "headline." + code + "." + manner;
        assertThat(known).contains(key + ".one", key + ".many");
      }
      for (String manner : Headline.manners(code)) {
        assertThat(known).contains("finding." + code + "." + manner);
      }
    }
  }

  @Test
  void noTextIsDamaged() throws IOException {
    String all = Files.readString(MESSAGES, StandardCharsets.UTF_8);
    assertThat(all).doesNotContain("\ufffd").doesNotContain("TODO");
    assertThat(properties().values().stream().map(String::valueOf))
        .allSatisfy(text -> assertThat(text).isNotBlank().doesNotContain("'"));
  }

  @Test
  void aMissingKeyIsFoundByTheseTests() {
    StaticMessageSource none = new StaticMessageSource();
    assertThat(new Words(none).orElse("no.such.key", "otherwise")).isEqualTo("otherwise");
    assertThat(matches(IN_TEMPLATE, "<p th:text=\"#{no.such.key(${x})}\">"))
        .containsExactly("no.such.key");
  }

  private static Set<String> inTemplates() throws IOException {
    return find(IN_TEMPLATE, TEMPLATES, ".html");
  }

  private static Set<String> find(Pattern pattern, Path folder, String ending) throws IOException {
    Set<String> found = new TreeSet<>();
    try (Stream<Path> files = Files.walk(folder)) {
      for (Path file : files.filter(f -> f.toString().endsWith(ending)).toList()) {
        found.addAll(matches(pattern, Files.readString(file)));
      }
    }
    return found;
  }

  private static Collection<String> matches(Pattern pattern, String text) {
    Set<String> found = new TreeSet<>();
    Matcher matcher = pattern.matcher(text);
    while (matcher.find()) {
      found.add(matcher.group(1));
    }
    return found;
  }

  private static Set<String> keys() throws IOException {
    return properties().stringPropertyNames();
  }

  private static Properties properties() throws IOException {
    Properties properties = new Properties();
    try (Reader reader = new StringReader(Files.readString(MESSAGES))) {
      properties.load(reader);
    }
    return properties;
  }
}
