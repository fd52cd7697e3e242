package fourthwire.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * The colours' contrast, light and dark, after the formula of WCAG 2.2 (W3C, definitions of
 * contrast ratio and relative luminance): text 4.5 : 1 (success criterion 1.4.3), rails 3 : 1
 * (1.4.11).
 */
class ThemeContrastTest {
  private static final Pattern TOKEN = Pattern.compile("--([a-z0-9-]+): (#[0-9a-f]{6});");

  @ParameterizedTest
  @ValueSource(strings = {"light", "dark"})
  void textStandsOutFromItsGround(String theme) throws IOException {
    Map<String, String> tokens = tokens(theme);
    for (String text : List.of("ink", "muted", "act", "watch")) {
      for (String ground : List.of("paper", "bed")) {
        assertThat(contrast(tokens.get(text), tokens.get(ground)))
            .as("%s on %s, %s", text, ground, theme)
            .isGreaterThanOrEqualTo(4.5);
      }
    }
    assertThat(contrast(tokens.get("on-n"), tokens.get("n"))).isGreaterThanOrEqualTo(4.5);
  }

  @ParameterizedTest
  @ValueSource(strings = {"light", "dark"})
  void railsStandOutFromPaperAndBed(String theme) throws IOException {
    Map<String, String> tokens = tokens(theme);
    for (String rail : List.of("l1", "l2", "l3", "n", "field-edge")) {
      String ground = rail.equals("field-edge") ? "paper" : "bed";
      assertThat(contrast(tokens.get(rail), tokens.get(ground)))
          .as("%s on %s, %s", rail, ground, theme)
          .isGreaterThanOrEqualTo(3);
    }
  }

  private static Map<String, String> tokens(String theme) throws IOException {
    String css = Files.readString(Path.of("src/main/resources/static/css/fourthwire.css"));
    int dark = css.indexOf("prefers-color-scheme: dark");
    String part = theme.equals("dark") ? css.substring(dark) : css.substring(0, dark);
    Map<String, String> tokens = new HashMap<>();
    Matcher matcher = TOKEN.matcher(part);
    while (matcher.find()) {
      tokens.putIfAbsent(matcher.group(1), matcher.group(2));
    }
    return tokens;
  }

  private static double contrast(String one, String other) {
    double a = luminance(one);
    double b = luminance(other);
    return (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
  }

  private static double luminance(String colour) {
    return 0.2126 * linear(colour, 1) + 0.7152 * linear(colour, 3) + 0.0722 * linear(colour, 5);
  }

  private static double linear(String colour, int at) {
    double c = Integer.parseInt(colour.substring(at, at + 2), 16) / 255.0;
    return c <= 0.04045 ? c / 12.92 : Math.pow((c + 0.055) / 1.055, 2.4);
  }
}
