package fourthwire.json;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.zip.GZIPInputStream;
import java.util.zip.GZIPOutputStream;
import tools.jackson.databind.JsonNode;

/** Documents as they are stored. */
public final class Documents {
  private Documents() {}

  /** The gzipped UTF-8 of a document. */
  public static byte[] zipped(JsonNode document) {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (GZIPOutputStream zip = new GZIPOutputStream(bytes)) {
      zip.write(document.toString().getBytes(StandardCharsets.UTF_8));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return bytes.toByteArray();
  }

  /** The text of a gzipped document. */
  public static String unzipped(byte[] bytes) {
    try (GZIPInputStream zip = new GZIPInputStream(new ByteArrayInputStream(bytes))) {
      return new String(zip.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** A list of sentences as a document. */
  public static String ofTexts(List<String> texts) {
    return Json.strings(texts).toString();
  }

  /** The sentences of such a document. */
  public static List<String> texts(String document) {
    return Json.strings(Json.object().set("texts", Json.parse(document)), "texts");
  }
}
