package fourthwire.audit.week;

import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.LoadPlacement;
import fourthwire.load.DesignPowers;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;

/** The loads at an hour: each at its schedule's share of its demand, those at none left out. */
final class ScheduledLoads {
  private final List<Device> design;
  private final DesignPowers known;

  /** Models made once: a load comes back to the same few shares again and again. */
  private final Map<Key, Device> made = new ConcurrentHashMap<>();

  /**
   * Of these loads.
   *
   * @param design every load as it stands in the design state
   * @param known powers found for them
   */
  ScheduledLoads(List<Device> design, DesignPowers known) {
    this.design = design;
    this.known = known;
  }

  private record Key(int load, double share) {}

  /** The loads that draw at these shares. */
  List<Device> at(Map<String, Double> shares) {
    List<Device> devices = new ArrayList<>();
    for (int k = 0; k < design.size(); k++) {
      Device device = design.get(k);
      double share = device.placement().load().schedule().map(shares::get).orElse(1.0);
      if (share > 0) {
        devices.add(
            share == 1
                ? device
                : made.computeIfAbsent(new Key(k, share), key -> at(device, key.share())));
      }
    }
    return devices;
  }

  private Device at(Device device, double share) {
    LoadPlacement placement = device.placement();
    double demand = placement.request().demand() * share;
    return Device.of(
        placement.with(placement.request().inState(placement.request().units(), demand)), known);
  }
}
