package fourthwire.intake.survey;

import fourthwire.site.LoadKind;
import fourthwire.site.check.PresetKinds;
import java.util.List;
import java.util.Optional;

/** The load presets as the checks ask for them. */
final class LoadPresets implements PresetKinds {
  @Override
  public List<String> names() {
    return List.of();
  }

  @Override
  public Optional<LoadKind> kindOf(String preset) {
    return Optional.empty();
  }
}
