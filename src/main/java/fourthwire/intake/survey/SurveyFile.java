package fourthwire.intake.survey;

import fourthwire.site.check.SurveyError;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The tables found in a survey file, zip of CSV or xlsx; the content says which, not the name.
 * Whatever else the file holds is a warning.
 */
final class SurveyFile {
  private static final int OLE2_FIRST_BYTE = 0xD0;
  private static final int OLE2_SECOND_BYTE = 0xCF;
  private static final int MOST_COLUMNS = 1000;

  /** A table file: at the top or in one folder. */
  private static final Pattern TABLE_FILE =
      Pattern.compile("(?:([^/]+)/)?([^/]+)\\.csv", Pattern.CASE_INSENSITIVE);

  private final Map<String, SurveyTable> tables = new LinkedHashMap<>();
  private final Set<String> unreadable = new LinkedHashSet<>();
  private final Remarks remarks;

  private SurveyFile(Remarks remarks) {
    this.remarks = remarks;
  }

  /** Tables that stand by themselves. */
  static SurveyFile of(List<SurveyTable> tables, Remarks remarks) {
    SurveyFile file = new SurveyFile(remarks);
    tables.forEach(t -> file.add(t.name(), t));
    return file;
  }

  static SurveyFile read(byte[] bytes, Remarks remarks) throws RefusedException {
    Guards guards = Guards.of(bytes.length);
    if (!Archive.isZip(bytes)) {
      throw notASurvey(bytes);
    }
    List<Archive.Entry> entries = Archive.unpack(bytes, guards);
    SurveyFile file = new SurveyFile(remarks);
    if (entries.stream().anyMatch(e -> e.path().equals(XlsxTables.CONTENT_TYPES))) {
      XlsxTables.read(entries, guards).forEach(t -> file.add(t.name(), t));
    } else {
      file.addCsv(entries, guards);
    }
    if (file.tables.isEmpty() && file.unreadable.isEmpty()) {
      throw new RefusedException(
          SurveyError.ofFile(
              "The file holds no table of a survey. Expected are a zip of CSV files or an xlsx"
                  + " workbook with the tables "
                  + String.join(", ", Schemas.tables())
                  + "."));
    }
    return file;
  }

  Optional<SurveyTable> find(String table) {
    return Optional.ofNullable(tables.get(table));
  }

  /** Whether it is there and can't be read, which is reported already. */
  boolean isUnreadable(String table) {
    return unreadable.contains(table);
  }

  private void add(String name, SurveyTable table) {
    if (!Schemas.has(name)) {
      remarks.warning("table \"" + name + "\" is not known and was left out.");
    } else if (tables.containsKey(name)) {
      reportTwice(name);
    } else if (table.header().isEmpty() && table.rows().isEmpty()) {
      unreadable.add(name);
      remarks.error(SurveyError.ofTable(name, "The sheet is empty; row 1 must name the columns."));
    } else if (table.header().size() > MOST_COLUMNS) {
      unreadable.add(name);
      remarks.error(
          SurveyError.ofTable(
              name,
              "The table has %d columns; at most %d are accepted."
                  .formatted(table.header().size(), MOST_COLUMNS)));
    } else if (table.header().isEmpty()) {
      unreadable.add(name);
      remarks.error(
          new SurveyError(
              name, 1, "", "", "Row 1 is empty; it must hold the names of the columns."));
    } else {
      tables.put(name, table);
    }
  }

  private void addCsv(List<Archive.Entry> entries, Guards guards) throws RefusedException {
    Map<String, List<Archive.Entry>> files = new LinkedHashMap<>();
    Optional<String> folder = Optional.empty();
    for (Archive.Entry entry : entries) {
      Matcher path = TABLE_FILE.matcher(entry.path());
      String name = path.matches() ? Text.key(path.group(2)) : "";
      if (!Schemas.has(name)) {
        remarks.warning("\"" + entry.path() + "\" is no table of a survey and was left out.");
        continue;
      }
      String its = path.group(1) == null ? "" : path.group(1);
      folder = Optional.of(folder.orElse(its));
      if (its.equals(folder.get())) {
        files.computeIfAbsent(name, n -> new ArrayList<>()).add(entry);
      } else {
        remarks.warning("\"" + entry.path() + "\" is in another folder and was left out.");
      }
    }
    for (Map.Entry<String, List<Archive.Entry>> file : files.entrySet()) {
      addCsv(file.getKey(), file.getValue(), guards);
    }
  }

  private void addCsv(String name, List<Archive.Entry> files, Guards guards)
      throws RefusedException {
    if (files.size() > 1) {
      reportTwice(name);
      return;
    }
    try {
      add(name, CsvTables.read(name, files.get(0).bytes(), Schemas.columns(name), guards));
    } catch (RefusedException e) {
      if (e.error().table().isEmpty() || guards.isOverRows()) {
        throw e;
      }
      unreadable.add(name);
      remarks.error(e.error());
    }
  }

  private void reportTwice(String name) {
    tables.remove(name);
    unreadable.add(name);
    remarks.error(SurveyError.ofTable(name, "The file holds this table twice; keep one."));
  }

  private static RefusedException notASurvey(byte[] bytes) {
    boolean ole2 =
        bytes.length > 1
            && (bytes[0] & 0xFF) == OLE2_FIRST_BYTE
            && (bytes[1] & 0xFF) == OLE2_SECOND_BYTE;
    return new RefusedException(
        SurveyError.ofFile(
            ole2
                ? "The file is a workbook of the older xls format or is protected by a password."
                    + " Save it as xlsx without a password."
                : "The file is neither a zip nor an xlsx workbook. Expected are a zip of CSV files"
                    + " or an xlsx workbook."));
  }
}
