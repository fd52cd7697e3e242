package fourthwire.audit.doubt;

import fourthwire.load.PresetParameter;
import fourthwire.site.LoadKind;

/** One thing the survey leaves open. */
sealed interface OpenInput {
  /** What tells it from every other; also what its draws start from. */
  String name();

  /** How much equipment of a kind there is and draws, on the whole site. */
  record KindAmount(LoadKind kind) implements OpenInput {
    @Override
    public String name() {
      return "Power of every " + kind.word() + " load on the site";
    }
  }

  /** One parameter of a kind's equipment, on the whole site. */
  record KindParameter(LoadKind kind, PresetParameter parameter) implements OpenInput {
    @Override
    public String name() {
      String of = kind == LoadKind.MEASURED ? "harmonics" : parameter.words();
      return Character.toUpperCase(of.charAt(0))
          + of.substring(1)
          + " of "
          + kind.word()
          + " equipment";
    }
  }

  /** How much one load row by itself draws. */
  record RowAmount(String circuit, String load, int row) implements OpenInput {
    @Override
    public String name() {
      return circuit + " / " + load + " / " + row;
    }
  }
}
