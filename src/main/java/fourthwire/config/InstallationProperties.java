package fourthwire.config;

import java.nio.file.Path;
import java.util.List;
import org.springframework.boot.context.properties.ConfigurationProperties;
import org.springframework.boot.context.properties.bind.DefaultValue;

/**
 * What an installation may set, as {@code fourthwire.*}.
 *
 * @param dataDir folder of the H2 database
 * @param demo whether an empty store gets the demo site at its first start
 * @param allowedHosts host names under which browsers may reach the service, beside the loopback
 *     names
 */
@ConfigurationProperties("fourthwire")
public record InstallationProperties(
    @DefaultValue("./fourthwire-data") Path dataDir,
    @DefaultValue("true") boolean demo,
    @DefaultValue List<String> allowedHosts) {}
