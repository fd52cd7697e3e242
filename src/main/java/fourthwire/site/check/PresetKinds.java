package fourthwire.site.check;

import fourthwire.site.LoadKind;
import java.util.List;
import java.util.Optional;

/** What the checks must know of the load presets, which are another package's. */
public interface PresetKinds {
  /** Every preset's name. */
  List<String> names();

  /** The kind behind a preset, if there is such a preset. */
  Optional<LoadKind> kindOf(String preset);
}
