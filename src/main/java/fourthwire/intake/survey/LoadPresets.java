package fourthwire.intake.survey;

import fourthwire.load.Preset;
import fourthwire.load.Presets;
import fourthwire.site.LoadKind;
import fourthwire.site.check.PresetKinds;
import java.util.List;
import java.util.Optional;

/** The load presets as the checks ask for them. */
final class LoadPresets implements PresetKinds {
  @Override
  public List<String> names() {
    return Presets.names();
  }

  @Override
  public Optional<LoadKind> kindOf(String preset) {
    return Presets.find(preset).map(Preset::kind);
  }
}
