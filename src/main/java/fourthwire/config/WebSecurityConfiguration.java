package fourthwire.config;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.http.HttpStatus;
import org.springframework.security.config.annotation.web.builders.HttpSecurity;
import org.springframework.security.config.annotation.web.configurers.AbstractHttpConfigurer;
import org.springframework.security.config.http.SessionCreationPolicy;
import org.springframework.security.web.SecurityFilterChain;
import org.springframework.security.web.access.intercept.AuthorizationFilter;
import org.springframework.security.web.firewall.HttpFirewall;
import org.springframework.security.web.firewall.RequestRejectedHandler;
import org.springframework.security.web.firewall.StrictHttpFirewall;
import org.springframework.security.web.header.writers.ReferrerPolicyHeaderWriter.ReferrerPolicy;
import org.springframework.security.web.savedrequest.NullRequestCache;

/**
 * Who may talk to the service.
 *
 * <p>It has no accounts: it is bound to the loopback address, and who can run a program on the
 * machine may use it. What must be kept out is a foreign web page in the user's own browser, and
 * {@link RequestGuard} does that by host name and origin. It takes the place of form tokens: those
 * need a session and a rendered form, which a script does not have, and guard the same door.
 */
@Configuration(proxyBeanMethods = false)
class WebSecurityConfiguration {
  private static final String CONTENT_POLICY =
      "default-src 'self'; img-src 'self' data:; object-src 'none'; base-uri 'none';"
          + " form-action 'self'; frame-ancestors 'none'";

  @Bean
  SecurityFilterChain security(HttpSecurity http, InstallationProperties installation) {
    return http.csrf(AbstractHttpConfigurer::disable)
        .logout(AbstractHttpConfigurer::disable)
        .requestCache(cache -> cache.requestCache(new NullRequestCache()))
        .sessionManagement(s -> s.sessionCreationPolicy(SessionCreationPolicy.STATELESS))
        .addFilterBefore(new RequestGuard(installation.allowedHosts()), AuthorizationFilter.class)
        .authorizeHttpRequests(requests -> requests.anyRequest().permitAll())
        .headers(
            headers ->
                headers
                    .contentSecurityPolicy(csp -> csp.policyDirectives(CONTENT_POLICY))
                    .frameOptions(frame -> frame.deny())
                    .referrerPolicy(referrer -> referrer.policy(ReferrerPolicy.SAME_ORIGIN)))
        .build();
  }

  /**
   * Names of nodes stand in addresses and may hold any character a person types, so encoded ones
   * are let through: no file is ever looked up by them.
   */
  @Bean
  HttpFirewall firewall() {
    StrictHttpFirewall firewall = new StrictHttpFirewall();
    firewall.setAllowUrlEncodedPercent(true);
    firewall.setAllowUrlEncodedSlash(true);
    firewall.setAllowUrlEncodedDoubleSlash(true);
    firewall.setAllowUrlEncodedPeriod(true);
    firewall.setAllowBackSlash(true);
    firewall.setAllowSemicolon(true);
    return firewall;
  }

  @Bean
  RequestRejectedHandler rejected() {
    return (request, response, rejected) ->
        refuse(response, HttpStatus.BAD_REQUEST, "the address or a header is malformed");
  }

  /** Answers a problem document before any controller is asked. */
  static void refuse(HttpServletResponse response, HttpStatus status, String detail)
      throws IOException {
    response.setStatus(status.value());
    response.setContentType("application/problem+json");
    response.setCharacterEncoding(StandardCharsets.UTF_8);
    response
        .getWriter()
        .write(
            """
            {"type":"about:blank","title":"%s","status":%d,"detail":"%s"}\
            """
                .formatted(status.getReasonPhrase(), status.value(), detail));
  }
}
