package fourthwire.intake.reading.pqdif;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What a PQDIF file holds that can be read: series of values, each of an observation.
 *
 * @param series of all observations, in the file's order
 * @param notes what was not read and why, in sentences
 */
public record Pqdif(List<ValueSeries> series, List<String> notes) {
  /** Copies the lists. */
  public Pqdif {
    series = List.copyOf(series);
    notes = List.copyOf(notes);
  }

  /** Whether a file begins as one does. */
  public static boolean isOne(byte[] start) {
    return RecordChain.isOne(start);
  }

  /**
   * Reads a file.
   *
   * @throws PqdifException where nothing in it can be read
   */
  public static Pqdif of(byte[] file) {
    RecordChain chain = RecordChain.of(file);
    List<String> notes = new ArrayList<>();
    List<ValueSeries> series = new ArrayList<>();
    Optional<Element.Collection> source = Optional.empty();
    int observation = 0;
    int damaged = 0;
    for (RecordChain.Record r : chain.records()) {
      try {
        if (r.type().equals(Tags.DATA_SOURCE)) {
          source = Optional.of(Tree.of(r));
        } else if (r.type().equals(Tags.OBSERVATION) && source.isPresent()) {
          observation++;
          series.addAll(new ObservationReader(source.get(), Tree.of(r), observation).series(notes));
        }
      } catch (PqdifException e) {
        damaged++;
      }
    }
    if (chain.isCut()) {
      notes.add(
          "The file ends, or is damaged, before its last record; what stood before was read.");
    }
    if (damaged > 0) {
      notes.add(damaged + " of its records are damaged and were left out.");
    }
    if (series.isEmpty()) {
      throw new PqdifException(
          "The file holds no series of values that can be read: "
              + chain.records().size()
              + " records, "
              + observation
              + " observations. "
              + String.join(" ", notes));
    }
    return new Pqdif(series, notes.stream().distinct().toList());
  }
}
