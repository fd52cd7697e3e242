package fourthwire.audit.judge;

import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.LoadPlacement;
import fourthwire.quantity.Spectrum;
import fourthwire.site.LoadKind;
import fourthwire.site.SiteTree;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * Which part of the design volt-amperes below each node nonlinear kinds draw: resistive, linear and
 * motor loads are linear, a measured spectrum from 15 % distortion up is not (common practice, no
 * source).
 */
final class NonlinearShare {
  private static final double LINEAR_UP_TO = 0.15;

  private final Map<String, double[]> volumes = new HashMap<>();

  NonlinearShare(SiteTree tree, List<Device> devices) {
    for (Device device : devices) {
      LoadPlacement placement = device.placement();
      double va = device.roughA() * placement.request().nominalPortV();
      boolean nonlinear = isNonlinear(placement);
      for (SiteTree.Node node : tree.path(placement.circuit())) {
        double[] volume = volumes.computeIfAbsent(node.name(), n -> new double[2]);
        volume[0] += nonlinear ? va : 0;
        volume[1] += va;
      }
    }
  }

  /** 0 to 1; 0 where nothing is fed. */
  double at(String node) {
    double[] volume = volumes.getOrDefault(node, new double[2]);
    return volume[1] > 0 ? volume[0] / volume[1] : 0;
  }

  private static boolean isNonlinear(LoadPlacement placement) {
    LoadKind kind = placement.request().kind();
    return switch (kind) {
      case RESISTIVE, LINEAR, MOTOR -> false;
      case MEASURED ->
          placement.request().spectrum().map(NonlinearShare::distortion).orElse(0.0) > LINEAR_UP_TO;
      default -> true;
    };
  }

  private static double distortion(Spectrum spectrum) {
    return spectrum.distortionRms() / spectrum.magnitude(1);
  }
}
