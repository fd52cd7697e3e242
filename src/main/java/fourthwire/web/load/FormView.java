package fourthwire.web.load;

import java.util.List;

/**
 * The form as it is shown.
 *
 * @param groups fields that belong together; the last ones may be folded away
 * @param failure what is wrong with the question as a whole, else empty
 */
record FormView(List<Group> groups, String failure) {

  /**
   * Fields that belong together.
   *
   * @param title the key of its heading
   * @param folded stands behind a summary
   * @param open and is open, since one of its fields is filled in or wrong
   */
  record Group(String title, boolean folded, boolean open, List<Field> fields) {}

  /**
   * A field.
   *
   * @param type {@code number}, {@code lines} or {@code select}
   * @param hint what an empty field stands for, or what is asked
   * @param error what is wrong with it, else empty
   * @param choices of a select, in groups of which one without a label stands alone
   */
  record Field(
      String name,
      String type,
      String label,
      String value,
      String hint,
      String error,
      List<Choices> choices) {}

  /** Choices under one label. */
  record Choices(String label, List<Choice> choices) {}

  /** One choice. */
  record Choice(String value, String text, boolean chosen) {}

  /** Whether anything is wrong. */
  boolean wrong() {
    return !failure.isEmpty()
        || groups.stream().flatMap(g -> g.fields().stream()).anyMatch(f -> !f.error().isEmpty());
  }
}
