package fourthwire.audit.plan;

import fourthwire.load.LoadRequest;
import fourthwire.quantity.Conductor;
import fourthwire.site.Load;
import java.util.List;

/**
 * One part of a load row on the conductors it stands between.
 *
 * @param load the row
 * @param circuit {@code panel:circuit}
 * @param from where its current enters: one conductor, or three lines
 * @param to where it leaves, for one port: N or another line; for three ports N, or empty where the
 *     circuit has no neutral
 * @param request what its model is made from
 */
public record LoadPlacement(
    Load load, String circuit, List<Conductor> from, List<Conductor> to, LoadRequest request) {
  /** The same load at the same place, as another request makes it. */
  public LoadPlacement with(LoadRequest other) {
    return new LoadPlacement(load, circuit, from, to, other);
  }
}
