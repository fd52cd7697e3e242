/**
 * The pictures, as SVG text: pure functions of plain numbers, drawn on the server, with no script
 * and no style attribute, so that a strict content policy holds.
 *
 * <p>Positions along an axis are percentages of the picture's width and heights are pixels, so a
 * picture fills any screen without its letters growing or shrinking. Colours and dashes come from
 * classes in {@code fourthwire.css}. Doors: {@link fourthwire.web.figure.Rail}, {@link
 * fourthwire.web.figure.SmallRails}, {@link fourthwire.web.figure.SpectrumPlot}, {@link
 * fourthwire.web.figure.CyclePlot}. May use {@code quantity}. Source: SVG 2, W3C.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.web.figure;
