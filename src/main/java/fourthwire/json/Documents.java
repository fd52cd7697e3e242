package fourthwire.json;

import java.util.List;

/** Lists of sentences as they are stored. */
public final class Documents {
  private Documents() {}

  /** A list of sentences as a document. */
  public static String ofTexts(List<String> texts) {
    return Json.strings(texts).toString();
  }

  /** The sentences of such a document. */
  public static List<String> texts(String document) {
    return Json.strings(Json.object().set("texts", Json.parse(document)), "texts");
  }
}
