package fourthwire.limits.loading;

/** Which rule says what harmonics take from a cable's ampacity. */
public enum AmpacityRule {
  /** IEC 60364-5-52 Annex E: by the third harmonic of the lines. */
  THIRD_HARMONIC_CONTENT {
    @Override
    AmpacityFactors factors(NeutralCase c) {
      return ThirdHarmonicContent.factors(c);
    }
  },
  /** NFPA 70, 310.15(C)(1) and (E): by counting the neutral as a current-carrying conductor. */
  CURRENT_CARRYING_COUNT {
    @Override
    AmpacityFactors factors(NeutralCase c) {
      return CurrentCarryingCount.factors(c);
    }
  };

  abstract AmpacityFactors factors(NeutralCase c);
}
