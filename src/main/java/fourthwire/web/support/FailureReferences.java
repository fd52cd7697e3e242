package fourthwire.web.support;

import java.util.LinkedHashMap;
import java.util.Map;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.boot.web.error.ErrorAttributeOptions;
import org.springframework.boot.webmvc.error.DefaultErrorAttributes;
import org.springframework.stereotype.Component;
import org.springframework.web.context.request.WebRequest;

/**
 * What is told of a failure that no controller's page caught: one in a template, in a filter, or
 * anywhere else before or after. It gets a reference number that stands beside its cause in the
 * log; the cause itself, its message and its class are never told.
 */
@Component
final class FailureReferences extends DefaultErrorAttributes {
  private static final Logger LOG = LoggerFactory.getLogger(FailureReferences.class);
  private static final int FIRST_OWN_FAULT = 500;

  @Override
  public Map<String, Object> getErrorAttributes(WebRequest request, ErrorAttributeOptions options) {
    Map<String, Object> told =
        new LinkedHashMap<>(
            super.getErrorAttributes(
                request,
                ErrorAttributeOptions.of(
                    ErrorAttributeOptions.Include.STATUS,
                    ErrorAttributeOptions.Include.ERROR,
                    ErrorAttributeOptions.Include.PATH)));
    if (told.get("status") instanceof Integer status && status >= FIRST_OWN_FAULT) {
      String reference = PageErrors.newReference();
      LOG.error("{} failed, reference {}", told.get("path"), reference, getError(request));
      told.put("reference", reference);
    }
    return told;
  }
}
