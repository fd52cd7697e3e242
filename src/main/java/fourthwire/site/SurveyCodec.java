package fourthwire.site;

/** Turns a survey into the bytes it is stored and exported as, and back. */
public interface SurveyCodec {
  /** The canonical zip of the survey's tables: the same survey gives the same bytes. */
  byte[] encode(Survey survey);

  /** The survey of bytes that {@link #encode} made. */
  Survey decode(byte[] zip);
}
