package fourthwire.config;

import org.apache.catalina.core.StandardHost;
import org.apache.tomcat.util.buf.EncodedSolidusHandling;
import org.springframework.boot.tomcat.servlet.TomcatServletWebServerFactory;
import org.springframework.boot.web.server.WebServerFactoryCustomizer;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

/** The web server's handling of addresses that hold names, and of requests it can't read. */
@Configuration(proxyBeanMethods = false)
class ServerConfiguration {
  @Bean
  WebServerFactoryCustomizer<TomcatServletWebServerFactory> encodedNamesInAddresses() {
    return factory -> {
      factory.addConnectorCustomizers(
          connector -> {
            connector.setEncodedSolidusHandling(EncodedSolidusHandling.PASS_THROUGH.getValue());
            connector.setEncodedReverseSolidusHandling(
                EncodedSolidusHandling.PASS_THROUGH.getValue());
          });
      factory.addContextCustomizers(
          context -> {
            if (context.getParent() instanceof StandardHost host) {
              host.setErrorReportValveClass(ProblemValve.class.getName());
            }
          });
    };
  }
}
