package fourthwire.intake.reading.heading;

import java.util.HashMap;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Words of headings and what they say: English, German, Dutch, French, Spanish, Italian. */
final class Vocabulary {
  /** What a word says of a column. */
  enum Sense {
    VOLTAGE,
    CURRENT,
    POWER,
    ACTIVE,
    REACTIVE,
    APPARENT,
    POWER_FACTOR,
    DISPLACEMENT,
    FACTOR,
    DISTORTION,
    /** A distortion in percent of the rms value. */
    OF_RMS,
    HARMONIC,
    INDIVIDUAL_DISTORTION,
    FUNDAMENTAL,
    ANGLE,
    FREQUENCY,
    ENERGY,
    EXPORTED,
    DEMAND,
    TOTAL,
    NEUTRAL,
    LINE,
    MIN,
    MAX,
    MEAN,
    INSTANT,
    PEAK,
    UNBALANCE,
    /** Something no quantity of a log is: flicker, crest, temperature, counts. */
    OTHER,
    /** Adds nothing. */
    NOTHING
  }

  private static final Map<String, Sense> WORDS = new HashMap<>();

  static {
    put(
        Sense.VOLTAGE,
        "voltage voltages volt volts spannung tension tensione tensao spanning voltaje u v");
    put(
        Sense.CURRENT,
        "current currents amp amps ampere amperes strom stroom courant corriente corrente i");
    put(Sense.POWER, "power leistung vermogen puissance potencia potenza pwr kraft");
    put(Sense.ACTIVE, "active real true wirkleistung wirk activa attiva ativa actif p watt watts");
    put(Sense.REACTIVE, "reactive blindleistung blind reactiva reattiva reativa reactif q vars");
    put(Sense.APPARENT, "apparent scheinleistung schein schijnbaar apparente aparente s complex");
    put(Sense.POWER_FACTOR, "pf tpf lf powerfactor leistungsfaktor λ lambda");
    put(Sense.DISPLACEMENT, "cos cosphi cosφ dpf displacement phi φ");
    put(Sense.FACTOR, "factor faktor facteur fattore fator facto fp");
    put(Sense.DISTORTION, "thd thdf distortion klirrfaktor");
    put(
        Sense.HARMONIC,
        "harmonic harmonics harm har harmon h order oberschwingung oberschwingungen harmonische"
            + " harmonique armonico armonica ordnung ord hrm");
    put(Sense.OF_RMS, "thdr thdrms");
    put(Sense.INDIVIDUAL_DISTORTION, "hd ihd");
    put(Sense.FUNDAMENTAL, "fundamental fund grundschwingung fondamental fond");
    put(Sense.ANGLE, "angle ang winkel angulo phaseangle");
    put(Sense.FREQUENCY, "frequency freq frequenz frequentie frequence frecuencia frequenza f hz");
    put(Sense.ENERGY, "energy energie energia work arbeit");
    put(
        Sense.EXPORTED,
        "export exported exp received generated rev reverse abgabe einspeisung out");
    put(Sense.DEMAND, "demand");
    put(
        Sense.TOTAL,
        "total tot sum sys system summe gesamt totaal totale somme suma tt 3ph 3p 3phase threephase"
            + " all σ σp");
    put(Sense.NEUTRAL, "neutral neutre neutro neut nul neutralleiter nulleider");
    put(
        Sense.LINE,
        "phase phases ph line leg pole fase fas faza faze fasa vaihe leiter ligne linea linha ltn"
            + " ltl ll ln conductor ch channel");
    put(Sense.MIN, "min minimum lowest minimal minimo mini mn");
    put(Sense.MAX, "max maximum highest maximal maximo maxi mx");
    put(
        Sense.MEAN,
        "avg mean average ave mittel mittelwert moy moyenne media gemiddeld medio av durchschnitt");
    put(Sense.INSTANT, "inst instantaneous momentan instant");
    put(Sense.PEAK, "peak pk pp spitze crest vpp vpk vpkpk vpeak app apk apkpk apeak");
    put(
        Sense.UNBALANCE,
        "unbalance imbalance unbal unb asymmetry unsymmetrie desequilibre onbalans squilibrio vunb"
            + " iunb");
    put(
        Sense.OTHER,
        "flicker pst plt ifl cf kf kfactor k tdd temp temperature battery status event events flag"
            + " flags dip swell sag record rec count index sequence seq positive negative zero"
            + " interharmonic interharmonics ripple std stdev stddev deviation sigma dc tif tan"
            + " tanphi tanφ distortionpower nonactive signalling rvc quality samples sample no nr"
            + " number id h0 transient transients impulse impulses surge surges inrush rotation"
            + " humidity speed alarm ground earth gnd pe residual leakage erde erdstrom tierra"
            + " terre nominal rated setpoint limit threshold target delta difference diff forecast"
            + " baseline predicted expected budget cost price tariff unidentified");
    put(
        Sense.NOTHING,
        "rms trms true-rms eff efficace effektiv value values wert valeur measured to the of import"
            + " imported imp delivered del consumption consumed bezug interval period conn"
            + " node ac");
  }

  private static final Set<String> CONNECTORS = Set.of("in", "en", "as", "and", "d", "de", "der");

  private Vocabulary() {}

  private static void put(Sense sense, String words) {
    for (String word : words.split(" ")) {
      WORDS.put(word, sense);
    }
  }

  /** What this word says; empty where it is not known. */
  static Optional<Sense> sense(String word) {
    return Optional.ofNullable(WORDS.get(word.toLowerCase(Locale.ROOT)));
  }

  static boolean isConnector(String word) {
    return CONNECTORS.contains(word);
  }
}
