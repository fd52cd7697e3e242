/**
 * Survey files in and out: a zip of CSV files or an xlsx workbook becomes a checked survey or a
 * list of errors; a survey becomes the same files again, byte for byte.
 *
 * <p>Doors: {@link fourthwire.intake.survey.SurveyImport}, {@link
 * fourthwire.intake.survey.SurveyExport}, {@link fourthwire.intake.survey.ZipSurveyCodec}. May use
 * {@code quantity}, {@code site}, {@code load}. Sources: the public contract, section 2; RFC 4180
 * (CSV); ECMA-376 (xlsx).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.intake.survey;
