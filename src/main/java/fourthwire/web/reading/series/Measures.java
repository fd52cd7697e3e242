package fourthwire.web.reading.series;

import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The measures of a log, in the order in which they are offered. */
final class Measures {
  private static final List<String> GROUPS =
      List.of("current", "voltage", "power", "orders-current", "orders-voltage");
  private static final List<String> PLACES =
      List.of("L1", "L2", "L3", "N", "L1-L2", "L2-L3", "L3-L1", "total", "");

  private final Map<String, Measure> byWord = new LinkedHashMap<>();

  /** One choice of a list. */
  record Option(String value, String label) {}

  /** Choices under one heading. */
  record Group(String label, List<Option> options) {}

  Measures(List<String> quantities) {
    Map<String, List<String>> found = new LinkedHashMap<>();
    for (String place : PLACES) {
      quantities.stream()
          .filter(q -> Measure.parsed(q).place().equals(place))
          .forEach(
              q ->
                  found
                      .computeIfAbsent(Measure.parsed(q).measure(), m -> new ArrayList<>())
                      .add(q));
    }
    for (String group : GROUPS) {
      found.entrySet().stream()
          .map(e -> new Measure(e.getKey(), List.copyOf(e.getValue())))
          .filter(m -> m.group().equals(group))
          .sorted(java.util.Comparator.comparingInt(m -> m.order().orElse(0)))
          .forEach(m -> byWord.put(m.word(), m));
    }
  }

  /** The measure of this word. */
  Optional<Measure> find(String word) {
    return Optional.ofNullable(byWord.get(word));
  }

  /** The measure of this word, or the first there is. */
  Measure orFirst(String word) {
    return find(word).orElseGet(() -> byWord.values().iterator().next());
  }

  /** All, in groups. */
  List<Group> groups(Words words) {
    List<Group> groups = new ArrayList<>();
    for (String group : GROUPS) {
      List<Option> options =
          byWord.values().stream()
              .filter(m -> m.group().equals(group))
              .map(m -> new Option(m.word(), m.label(words)))
              .toList();
      if (!options.isEmpty()) {
        groups.add(new Group(words.of("measure.group." + group), options));
      }
    }
    return groups;
  }
}
