package fourthwire.intake.reading.heading;

import java.text.Normalizer;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** A heading in plain letters, with phrases of the trade as single words. */
final class PlainText {
  private static final Pattern RAISED = Pattern.compile("(?<=10)([⁻]?)([⁰¹²³⁴⁵⁶⁷⁸⁹])");

  /** Phrases and what stands for them, one after the other. */
  private static final Map<Pattern, String> PHRASES = new LinkedHashMap<>();

  static {
    phrase("\\p{M}", "");
    phrase("[Σ∑]", " total ");
    phrase("total\\s+harmonic\\s+dist(ortion|\\.)?", " thd ");
    phrase("harmonic\\s+distortion", " thd ");
    phrase("power[\\s_-]*factor", " pf ");
    phrase("cos\\s*[-_(]?\\s*(phi|φ)\\s*\\)?", " cosphi ");
    phrase("line[\\s-]+to[\\s-]+(line|neutral)", " ");
    phrase(
        "(?<!harmonic |harm |order"
            + " |h)(?<![\\p{L}\\d])(?:10|15|30|60)[\\s_-]*(?:min|minutes?|sec|s)(?!\\p{L})",
        " ");
    phrase("k[\\s-]factor", " kfactor ");
    phrase("(?<=volt)[\\s-]+(?=amp)|(?<=watt)[\\s-]+(?=hour)|(?<=kilo)[\\s-]+(?=[vwa])", "");
    phrase("(?<=volt)amps?(?![\\p{L}])", "ampere");
    phrase("thd[\\s-]?f\\b", " thd ");
    phrase("thd[\\s_-]r(?![\\p{L}\\d])(?=.*\\d|.*[abc]\\b)", " thdr ");
    phrase("(?<=\\b(?:[iuv]?l?|phase |ph)[123abc]\\b.{0,40})thd[\\s_-]r\\b", " thdr ");
    phrase("(?<!\\p{L})([uv])_?n[\\s_-]?(?:g|gnd|pe|earth|ground)(?![\\p{L}\\p{N}])", " $1n ");
    phrase(
        "neutral[\\s-]*(?:to)?[\\s-]*(?:earth|ground|gnd|pe)[\\s-]*(voltage|volts?)(?!\\p{L})",
        " neutral $1 ");
    phrase("(?<![\\p{L}\\d])(?:3-?|three[\\s-])ph(?:ase)?(?![\\p{L}\\d])", " total ");
    phrase("thd\\s*\\(\\s*r\\s*\\)", " thdr ");
    phrase("tan\\s*[-_(]?\\s*(phi|φ)\\s*\\)?", " tanphi ");
  }

  private PlainText() {}

  private static void phrase(String pattern, String words) {
    PHRASES.put(Pattern.compile(pattern, Pattern.CASE_INSENSITIVE), words);
  }

  /** Accents, subscripts and Greek letters as plain ones; phrases as one word. */
  static String of(String heading) {
    String text =
        Normalizer.normalize(
            RAISED.matcher(heading.replace('ϕ', 'φ').replace('º', '°')).replaceAll("^$1$2"),
            Normalizer.Form.NFKD);
    text = text.replace('\u2212', '-');
    for (Map.Entry<Pattern, String> phrase : PHRASES.entrySet()) {
      Matcher m = phrase.getKey().matcher(text);
      text = m.find() ? m.replaceAll(phrase.getValue()) : text;
    }
    return text;
  }
}
