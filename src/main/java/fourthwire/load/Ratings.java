package fourthwire.load;

/** Turns a rating, in whatever unit the survey has it, into the one a model is made from. */
final class Ratings {
  private Ratings() {}

  /** The number itself, in its own unit. */
  static double amount(LoadRequest.Rating rating) {
    if (rating instanceof LoadRequest.Rating.Watts w) {
      return w.w();
    }
    if (rating instanceof LoadRequest.Rating.VoltAmperes va) {
      return va.va();
    }
    return ((LoadRequest.Rating.Amps) rating).a();
  }

  /** Volt-amperes of a line current at nominal voltage. */
  static double voltAmperes(LoadRequest request, double lineAmps) {
    return lineAmps * request.nominalPortV() * (request.ports() == 3 ? Math.sqrt(3) : 1);
  }

  /**
   * Volt-amperes of one unit.
   *
   * @param powerFactor watts over volt-amperes of this equipment
   */
  static double voltAmperes(LoadRequest request, LoadRequest.Rating rating, double powerFactor) {
    if (rating instanceof LoadRequest.Rating.Watts w) {
      return w.w() / powerFactor;
    }
    if (rating instanceof LoadRequest.Rating.VoltAmperes va) {
      return va.va();
    }
    return voltAmperes(request, ((LoadRequest.Rating.Amps) rating).a());
  }
}
