package fourthwire.json;

import fourthwire.audit.AuditRequest;
import fourthwire.audit.NodeResult;
import fourthwire.audit.NodeSummary;
import fourthwire.audit.Progress;
import fourthwire.audit.run.HarmonicAudit;
import fourthwire.sample.DemoSurvey;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.Collectors;

/**
 * Makes a dictionary for stored results from an audit of the demo site: one document of every shape
 * there is, the commonest last, their figures cut short. A dictionary in use is never made again;
 * this is how the next one is made.
 *
 * <pre>{@code
 * mvn -q test-compile dependency:build-classpath -Dmdep.outputFile=target/classpath
 * java -cp target/test-classes:target/classes:$(cat target/classpath) \
 *     fourthwire.json.NodeDictionary node-dictionary-2.txt
 * }</pre>
 */
final class NodeDictionary {
  private static final int DRAWS = 5;

  /** What a deflater can look back on, less the length of a document. */
  private static final int LONGEST = 24_000;

  private NodeDictionary() {}

  /** Writes the file named. */
  public static void main(String[] args) throws IOException {
    AuditRequest request =
        new AuditRequest(
            DemoSurvey.read(), Optional.empty(), Map.of(), true, DRAWS, AuditRequest.SEED);
    List<NodeResult> nodes = new HarmonicAudit().run(request, Progress.SILENT).nodes();
    Files.writeString(Path.of(args[0]), of(nodes), StandardCharsets.UTF_8);
  }

  private static String of(List<NodeResult> nodes) {
    Map<String, String> rows = new TreeMap<>();
    Map<String, String> documents = new TreeMap<>();
    for (NodeResult node : nodes) {
      add(rows, StoredNode.text(NodeSummary.of(node)));
      add(documents, StoredNode.text(node));
    }
    String all = longestFirst(documents) + longestFirst(rows);
    return all.substring(Math.max(0, all.length() - LONGEST));
  }

  /** One text of each shape: texts that differ in figures and names only are of one shape. */
  private static void add(Map<String, String> shapes, String text) {
    String cut = text.replaceAll("(?<=[:\\[,])-?\\d+\\.\\d+(E-?\\d+)?", "0.1");
    cut = cut.replaceAll("(?<=[\\[,])(0\\.1,|0,)+", "0.1,");
    shapes.putIfAbsent(cut.replaceAll("\"[^\"]*\"(?=[,}\\]])|\\d+", ""), cut);
  }

  private static String longestFirst(Map<String, String> shapes) {
    return shapes.values().stream()
        .sorted(Comparator.comparingInt(String::length).reversed())
        .collect(Collectors.joining());
  }
}
