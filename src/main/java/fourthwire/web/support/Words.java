package fourthwire.web.support;

import java.util.Locale;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;

/** Visible text out of {@code messages.properties}. */
@Component
public final class Words {
  private final MessageSource messages;

  /** The words of this source. */
  public Words(MessageSource messages) {
    this.messages = messages;
  }

  /** The text of this key with its arguments put in. */
  public String of(String key, Object... arguments) {
    return messages.getMessage(key, arguments, Locale.ENGLISH);
  }

  /** The text of this key if there is one, else the other text. */
  public String orElse(String key, String otherwise, Object... arguments) {
    String found = messages.getMessage(key, arguments, "", Locale.ENGLISH);
    return found == null || found.isEmpty() ? otherwise : found;
  }

  /** A count in words up to twelve, in figures above: "two", "14". */
  public String count(int count) {
    return count <= 12 ? of("count." + count) : Numbers.withDecimals(count, 0);
  }
}
