package fourthwire.audit.plan;

import static fourthwire.quantity.Conductor.N;

import fourthwire.network.NetworkBuilder;
import fourthwire.network.TreeNetwork;
import fourthwire.network.element.FeederConductor;
import fourthwire.network.element.SequenceAdmittance;
import fourthwire.network.element.Shunt;
import fourthwire.quantity.Conductor;
import fourthwire.site.Circuit;
import fourthwire.site.Feeder;
import fourthwire.site.SiteTree;
import fourthwire.site.Supply;
import fourthwire.site.SupplyRole;
import fourthwire.site.Survey;
import fourthwire.site.Transformer;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;

/**
 * The network of a site on one supply: what of it stands where, and the linear elements in it.
 *
 * <p>Every panel and circuit is a node behind its feeder, every transformer two: its primary
 * terminals behind its feeder, and its secondary. Circuits that share a neutral are one node with a
 * line conductor each and the neutral once, joined where their loads return.
 */
public final class NetworkPlan {
  private final TreeNetwork network;
  private final SupplyPlate supply;
  private final Map<String, Place> places;

  private NetworkPlan(TreeNetwork network, SupplyPlate supply, Map<String, Place> places) {
    this.network = network;
    this.supply = supply;
    this.places = places;
  }

  /**
   * Lays a site out.
   *
   * @param devices the loads whose linear parts go into the network
   * @param banks whether capacitor banks and filters are connected
   */
  public static NetworkPlan of(
      Survey survey, Supply supply, SiteTree tree, List<Device> devices, boolean banks) {
    Layout layout = new Layout(survey, supply, tree);
    layout.layNodes();
    devices.forEach(layout::addLinearPart);
    if (banks) {
      new Compensation(survey, layout.places).addTo(layout.builder);
    }
    return new NetworkPlan(layout.builder.build(), layout.plate, layout.places);
  }

  public TreeNetwork network() {
    return network;
  }

  public SupplyPlate supply() {
    return supply;
  }

  /** Every supplied node, parents first. */
  public List<Place> places() {
    return List.copyOf(places.values());
  }

  public Optional<Place> find(String node) {
    return Optional.ofNullable(places.get(node));
  }

  public Place get(String node) {
    return find(node)
        .orElseThrow(() -> new IllegalArgumentException("node " + node + " is not supplied"));
  }

  /** Lays nodes one after the other. */
  private static final class Layout {
    private final NetworkBuilder builder = new NetworkBuilder();
    private final Map<String, Place> places = new LinkedHashMap<>();
    private final SiteTree tree;
    private final Supply supply;
    private final SupplyPlate plate;
    private final FeederPaths feeders;
    private final Map<String, Transformer> transformers;
    private final Map<String, Circuit> circuits;
    private final Map<String, List<Circuit>> sharing;

    Layout(Survey survey, Supply supply, SiteTree tree) {
      this.tree = tree;
      this.supply = supply;
      this.plate = new SupplyPlate(supply, survey.background());
      this.feeders = new FeederPaths(survey.settings());
      this.transformers =
          survey.transformers().stream()
              .collect(Collectors.toMap(Transformer::name, Function.identity()));
      this.circuits =
          survey.circuits().stream().collect(Collectors.toMap(Circuit::id, Function.identity()));
      this.sharing =
          survey.circuits().stream()
              .filter(c -> c.sharedNeutral().isPresent())
              .collect(Collectors.groupingBy(Layout::sharedKey));
    }

    void layNodes() {
      for (SiteTree.Node node : tree.nodes()) {
        if (!places.containsKey(node.name())) {
          lay(node);
        }
      }
    }

    private void lay(SiteTree.Node node) {
      switch (node.kind()) {
        case SUPPLY ->
            put(
                node,
                builder.source(plate.impedance()),
                Numbering.of(node.conductors()),
                FeederPath.NONE);
        case TRANSFORMER -> {
          if (isTakenOver(node)) {
            layBehindFeeder(node);
          } else {
            layTransformer(node);
          }
        }
        case PANEL -> layBehindFeeder(node);
        case CIRCUIT -> {
          Circuit circuit = circuits.get(node.name());
          if (circuit != null && circuit.sharedNeutral().isPresent()) {
            laySharedNeutral(sharing.getOrDefault(sharedKey(circuit), List.of()));
          } else {
            layBehindFeeder(node);
          }
        }
      }
    }

    private boolean isTakenOver(SiteTree.Node node) {
      return supply.roleOrDefault() == SupplyRole.STANDBY
          && node.parent().filter(supply.name()::equals).isPresent();
    }

    private Place parentOf(SiteTree.Node node) {
      Place parent = places.get(node.parent().orElseThrow());
      if (parent == null) {
        throw new IllegalStateException(node.name() + " is laid before what feeds it");
      }
      return parent;
    }

    private void layBehindFeeder(SiteTree.Node node) {
      Place parent = parentOf(node);
      FeederPath path = isTakenOver(node) ? FeederPath.NOT_IN_USE : feeders.of(node.feeder());
      List<FeederConductor> conductors =
          new ArrayList<>(lineConductors(parent, node.parentLines(), path));
      if (node.hasNeutral()) {
        conductors.add(FeederConductor.from(number(parent, N), path.neutral()));
      }
      put(
          node,
          builder.feeder(parent.networkNode(), conductors),
          Numbering.of(node.conductors()),
          path);
    }

    private static List<FeederConductor> lineConductors(
        Place parent, List<Conductor> lines, FeederPath path) {
      return lines.stream()
          .map(line -> FeederConductor.from(number(parent, line), path.line()))
          .toList();
    }

    private void layTransformer(SiteTree.Node node) {
      Place parent = parentOf(node);
      TransformerPlate transformer =
          new TransformerPlate(Objects.requireNonNull(transformers.get(node.name())));
      FeederPath path = feeders.of(node.feeder());
      List<Conductor> primary = new ArrayList<>(node.parentLines());
      List<FeederConductor> conductors = new ArrayList<>(lineConductors(parent, primary, path));
      boolean neutral =
          parent.conductors().has(N) && transformer.wantsPrimaryNeutral(primary.size());
      if (neutral) {
        primary.add(N);
        conductors.add(FeederConductor.from(number(parent, N), path.neutral()));
      }
      int primaryNode = builder.feeder(parent.networkNode(), conductors);
      transformer.primaryShunts(neutral).forEach(shunt -> builder.shunt(primaryNode, shunt));
      int secondary = builder.transformer(primaryNode, transformer.transformer());
      places.put(
          node.name(),
          new Place(
              node,
              secondary,
              Numbering.of(node.conductors()),
              path,
              Optional.of(
                  new Place.TransformerPlace(transformer, primaryNode, Numbering.of(primary)))));
    }

    private void laySharedNeutral(List<Circuit> group) {
      List<FeederConductor> conductors = new ArrayList<>();
      List<List<Integer>> numbers = new ArrayList<>();
      Place parent = parentOf(tree.get(group.get(0).id()));
      for (Circuit circuit : group) {
        List<Integer> own = new ArrayList<>();
        FeederPath path = feeders.of(circuit.feeder());
        for (Conductor line : circuit.lines().lines()) {
          own.add(conductors.size());
          conductors.add(FeederConductor.from(number(parent, line), path.line()));
        }
        numbers.add(own);
      }
      Feeder shared = SharedNeutral.feeder(group);
      FeederPath neutral = feeders.of(shared);
      conductors.add(FeederConductor.from(number(parent, N), neutral.neutral()));
      int joint = builder.feeder(parent.networkNode(), conductors);
      for (int k = 0; k < group.size(); k++) {
        numbers.get(k).add(conductors.size() - 1);
        SiteTree.Node node = tree.get(group.get(k).id());
        FeederPath own = feeders.of(node.feeder());
        put(
            node,
            joint,
            new Numbering(node.conductors(), List.copyOf(numbers.get(k))),
            own.withNeutralOf(neutral));
      }
    }

    private void put(SiteTree.Node node, int networkNode, Numbering numbers, FeederPath path) {
      places.put(node.name(), new Place(node, networkNode, numbers, path, Optional.empty()));
    }

    private static int number(Place place, Conductor conductor) {
      return place.conductors().of(conductor);
    }

    private static String sharedKey(Circuit circuit) {
      return circuit.panel() + "/" + circuit.sharedNeutral().orElseThrow();
    }

    /** What of a load is linear stands in the network itself. */
    void addLinearPart(Device device) {
      if (!device.hasLinearPart()) {
        return;
      }
      Place place = places.get(device.placement().circuit());
      if (place == null) {
        return;
      }
      List<Conductor> from = device.placement().from();
      List<Conductor> to = device.placement().to();
      int common = to.isEmpty() ? Shunt.EARTH : number(place, to.get(0));
      if (device.model().ports() == 1) {
        builder.shunt(
            place.networkNode(),
            Shunt.between(number(place, from.get(0)), common, device.model()::linearSiemens));
        return;
      }
      SequenceAdmittance admittance = device.model()::linearSiemens;
      builder.shunt(
          place.networkNode(),
          new Shunt.ThreeTerminal(
              number(place, from.get(0)),
              number(place, from.get(1)),
              number(place, from.get(2)),
              common,
              to.isEmpty() ? admittance.openToZeroSequence() : admittance));
    }
  }
}
