package fourthwire.audit.doubt;

/**
 * The standard normal deviate below which a given part of the distribution lies, to about 16
 * digits: M. J. Wichura, algorithm AS 241 (PPND16), Applied Statistics 37 (1988), 477-484.
 */
final class NormalQuantile {
  private static final double[] CENTRE_TOP = {
    2509.0809287301226727, 33430.575583588128105, 67265.770927008700853, 45921.953931549871457,
    13731.693765509461125, 1971.5909503065514427, 133.14166789178437745, 3.387132872796366608
  };
  private static final double[] CENTRE_BOTTOM = {
    5226.495278852854561,
    28729.085735721942674,
    39307.89580009271061,
    21213.794301586595867,
    5394.1960214247511077,
    687.1870074920579083,
    42.313330701600911252,
    1
  };
  private static final double[] MIDDLE_TOP = {
    7.7454501427834140764e-4, 0.0227238449892691845833, 0.24178072517745061177,
    1.27045825245236838258, 3.64784832476320460504, 5.7694972214606914055,
    4.6303378461565452959, 1.42343711074968357734
  };
  private static final double[] MIDDLE_BOTTOM = {
    1.05075007164441684324e-9, 5.475938084995344946e-4, 0.0151986665636164571966,
    0.14810397642748007459, 0.68976733498510000455, 1.6763848301838038494,
    2.05319162663775882187, 1
  };
  private static final double[] TAIL_TOP = {
    2.01033439929228813265e-7, 2.71155556874348757815e-5, 0.0012426609473880784386,
    0.026532189526576123093, 0.29656057182850489123, 1.7848265399172913358,
    5.4637849111641143699, 6.6579046435011037772
  };
  private static final double[] TAIL_BOTTOM = {
    2.04426310338993978564e-15, 1.4215117583164458887e-7, 1.8463183175100546818e-5,
    7.868691311456132591e-4, 0.0148753612908506148525, 0.13692988092273580531,
    0.59983220655588793769, 1
  };

  private static final double CENTRE = 0.425;
  private static final double CENTRE_SQUARE = 0.180625;
  private static final double TAIL_FROM = 5;
  private static final double MIDDLE_SHIFT = 1.6;

  private NormalQuantile() {}

  /** The deviate; {@code part} lies between 0 and 1. */
  static double of(double part) {
    if (!(part > 0 && part < 1)) {
      throw new IllegalArgumentException("no normal deviate for the part " + part);
    }
    double fromHalf = part - 0.5;
    if (Math.abs(fromHalf) <= CENTRE) {
      double r = CENTRE_SQUARE - fromHalf * fromHalf;
      return fromHalf * polynomial(CENTRE_TOP, r) / polynomial(CENTRE_BOTTOM, r);
    }
    double r = Math.sqrt(-Math.log(Math.min(part, 1 - part)));
    double size =
        r <= TAIL_FROM
            ? polynomial(MIDDLE_TOP, r - MIDDLE_SHIFT) / polynomial(MIDDLE_BOTTOM, r - MIDDLE_SHIFT)
            : polynomial(TAIL_TOP, r - TAIL_FROM) / polynomial(TAIL_BOTTOM, r - TAIL_FROM);
    return Math.copySign(size, fromHalf);
  }

  /** Highest power first. */
  private static double polynomial(double[] coefficients, double x) {
    double sum = 0;
    for (double c : coefficients) {
      sum = sum * x + c;
    }
    return sum;
  }
}
