package fourthwire.config;

import jakarta.servlet.FilterChain;
import jakarta.servlet.ServletException;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.net.URI;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpHeaders;
import org.springframework.http.HttpStatus;
import org.springframework.web.filter.OncePerRequestFilter;

/**
 * Refuses what a foreign web page could make the user's browser send.
 *
 * <p>The host name a request was sent to must be a loopback name or one the installation allows:
 * otherwise a page could point a name of its own at this machine and read the answers. A request
 * that says which origin it comes from must come from this very service, and one that a browser
 * marks as coming from another site is let through only as a link that a person follows. A script
 * sends none of these marks.
 */
final class RequestGuard extends OncePerRequestFilter {
  private static final Set<String> LOOPBACK = Set.of("localhost", "127.0.0.1", "[::1]");
  private static final Set<String> OWN_SITE = Set.of("same-origin", "none");

  private final Set<String> hosts;

  RequestGuard(List<String> allowedHosts) {
    this.hosts = new HashSet<>(LOOPBACK);
    allowedHosts.forEach(host -> hosts.add(host.strip().toLowerCase(Locale.ROOT)));
  }

  @Override
  protected void doFilterInternal(
      HttpServletRequest request, HttpServletResponse response, FilterChain chain)
      throws ServletException, IOException {
    Optional<String> refusal = refusal(request);
    if (refusal.isPresent()) {
      WebSecurityConfiguration.refuse(response, HttpStatus.FORBIDDEN, refusal.get());
    } else {
      chain.doFilter(request, response);
    }
  }

  private Optional<String> refusal(HttpServletRequest request) {
    String host = header(request, HttpHeaders.HOST).orElse("");
    if (!hosts.contains(withoutPort(host))) {
      return Optional.of(
          "this host name is not allowed; the setting fourthwire.allowed-hosts lists those that"
              + " are, beside localhost");
    }
    if (header(request, HttpHeaders.ORIGIN).filter(o -> !isOwn(o, host)).isPresent()) {
      return Optional.of("requests from pages of another origin are not allowed");
    }
    if (isSentByAnotherSite(request) && !isFollowedLink(request)) {
      return Optional.of("requests from pages of another site are not allowed");
    }
    return Optional.empty();
  }

  private static String withoutPort(String host) {
    return host.toLowerCase(Locale.ROOT).replaceFirst(":\\d+$", "");
  }

  /** Whether host and port are this service's; a proxy in front may have changed the scheme. */
  private static boolean isOwn(String origin, String host) {
    try {
      @Nullable String authority = URI.create(origin).getRawAuthority();
      return authority != null && authority.equalsIgnoreCase(host);
    } catch (IllegalArgumentException e) {
      return false;
    }
  }

  private static boolean isSentByAnotherSite(HttpServletRequest request) {
    return header(request, "Sec-Fetch-Site").filter(s -> !OWN_SITE.contains(s)).isPresent();
  }

  private static boolean isFollowedLink(HttpServletRequest request) {
    return request.getMethod().equals("GET")
        && header(request, "Sec-Fetch-Mode").filter("navigate"::equals).isPresent()
        && header(request, "Sec-Fetch-Dest").filter("document"::equals).isPresent();
  }

  private static Optional<String> header(HttpServletRequest request, String name) {
    return Optional.ofNullable(request.getHeader(name));
  }
}
