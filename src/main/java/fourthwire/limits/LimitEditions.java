package fourthwire.limits;

import java.util.List;

/** The documents and editions whose limits this program applies. */
public final class LimitEditions {
  private LimitEditions() {}

  /**
   * What audits apply, stored with each: every document with its edition, and "from memory" where
   * its figures were recalled.
   */
  public static List<String> editions() {
    return List.of(
        "IEEE 519-2022 (Tables 3 and 4, and Table 1 above 1 kV, from memory)",
        "IEC 61000-2-4:2002 (from memory)",
        "EN 50160:2010",
        "IEC 60364-5-52:2009, Annex E",
        "NFPA 70-2023, 310.15(C)(1) and (E)",
        "IEEE C57.110-2018 (from memory)",
        "UL 1561, K-factor (from memory)",
        "EN 50464-3 / HD 538.3, factor K",
        "IEEE 18-2012",
        "IEC 60831-1:2014 (from memory)",
        "NEMA MG 1, 30.1.2.1 (from memory)");
  }

  /** What single pieces of equipment are held against, which no audit applies; likewise. */
  public static List<String> equipment() {
    return List.of(
        "IEC 61000-3-2:2018 (lighting of 5 to 25 W, and the 3rd of other lighting, from memory)",
        "IEC 61000-3-12:2011 (from memory)");
  }
}
