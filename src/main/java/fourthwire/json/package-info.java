/**
 * The JSON documents of the public interface, written and read back: a node's result, a row of an
 * audit's list, a reading, a mapping of its columns.
 *
 * <p>Every key is written in one place of this package. A figure that is not known is {@code null},
 * and beside it stands {@code <key>_reason}. Numbers are written in full: nothing is rounded.
 *
 * <p>Doors: {@link fourthwire.json.NodeJson}, {@link fourthwire.json.SummaryJson}, {@link
 * fourthwire.json.ReadingJson}, {@link fourthwire.json.MappingJson}. May use the engine packages
 * whose results it writes. Source: the public contract, sections 4 to 6.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.json;
