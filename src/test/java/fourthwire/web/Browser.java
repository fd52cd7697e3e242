package fourthwire.web;

import com.deque.html.axecore.args.AxeRunOptions;
import com.deque.html.axecore.playwright.AxeBuilder;
import com.deque.html.axecore.results.Rule;
import com.microsoft.playwright.BrowserContext;
import com.microsoft.playwright.BrowserType;
import com.microsoft.playwright.Page;
import com.microsoft.playwright.Playwright;
import com.microsoft.playwright.options.ColorScheme;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;

/** A real browser, where one is installed; nothing is downloaded. */
final class Browser implements AutoCloseable {
  private static final List<String> PLACES =
      List.of("/usr/bin/chromium", "/usr/bin/chromium-browser", "/usr/bin/google-chrome");

  private final Map<String, BrowserContext> contexts = new HashMap<>();
  private final Playwright playwright;
  private final com.microsoft.playwright.Browser browser;

  Browser() {
    playwright =
        Playwright.create(
            new Playwright.CreateOptions().setEnv(Map.of("PLAYWRIGHT_SKIP_BROWSER_DOWNLOAD", "1")));
    browser =
        playwright
            .chromium()
            .launch(
                new BrowserType.LaunchOptions()
                    .setExecutablePath(installed().orElseThrow())
                    .setArgs(
                        List.of(
                            "--headless",
                            "--no-sandbox",
                            "--disable-gpu",
                            "--disable-quic",
                            "--no-first-run",
                            "--disable-background-networking",
                            "--disable-component-update",
                            "--disable-sync")));
  }

  /** Where the browser is; FOURTHWIRE_BROWSER names another place. */
  static java.util.Optional<Path> installed() {
    Stream<String> named = Stream.ofNullable(System.getenv("FOURTHWIRE_BROWSER"));
    return Stream.concat(named, PLACES.stream())
        .map(Path::of)
        .filter(Files::isExecutable)
        .findFirst();
  }

  /** An empty page of this width. */
  Page page(int width, ColorScheme scheme) {
    return contexts.computeIfAbsent(width + " " + scheme, key -> context(width, scheme)).newPage();
  }

  private BrowserContext context(int width, ColorScheme scheme) {
    BrowserContext context =
        browser.newContext(
            new com.microsoft.playwright.Browser.NewContextOptions()
                .setViewportSize(width, 900)
                .setColorScheme(scheme));
    context.setDefaultTimeout(60_000);
    return context;
  }

  /**
   * What the accessibility rules find, one line each. All rules run; only what they find wrong is
   * handed over whole, and as no page has frames, in the page itself.
   */
  static List<String> violations(Page page) {
    AxeRunOptions whole = new AxeRunOptions();
    whole.setResultTypes(List.of("violations"));
    return new AxeBuilder(page)
        .options(whole).setLegacyMode(true).analyze().getViolations().stream()
            .map(Browser::line)
            .toList();
  }

  private static String line(Rule rule) {
    return rule.getId()
        + ": "
        + rule.getHelp()
        + " "
        + rule.getNodes().stream().limit(3).map(n -> n.getHtml()).toList();
  }

  @Override
  public void close() {
    browser.close();
    playwright.close();
  }
}
