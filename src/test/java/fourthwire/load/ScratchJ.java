package fourthwire.load;
import fourthwire.load.model.*;
import fourthwire.load.rectifier.node.NodeRectifiers;
import fourthwire.quantity.*;
import java.util.*;
public class ScratchJ {
  public static void main(String[] a) {
    for (JointReference c : JointReference.all()) {
      int n = c.rows().size();
      PortSpectra[] e = new PortSpectra[n], i = new PortSpectra[n];
      for (int k = 0; k < n; k++) { e[k] = c.emf(); i[k] = new PortSpectra(1); }
      NodeRectifiers r = new NodeRectifiers(c.loads(), c.number(0, "f_Hz"));
      try { r.solve(e, c.source(), i); } catch (NoSteadyStateException x) { System.out.println(c + " " + x.getMessage()); continue; }
      StringBuilder s = new StringBuilder(c.toString());
      for (int k = 0; k < n; k++) {
        Spectrum g = i[k].spectrum(0), t = c.simulated(k);
        double w = 0; int at = 0;
        for (int h = 1; h < 40; h++) { double d = g.at(h).minus(t.at(h)).magnitude() / t.magnitude(1) * 100; if (d > w) { w = d; at = h; } }
        s.append(String.format(" | row %d %.3f%% @%d rms %+.3f%%", k, w, at, 100 * (g.rms() / t.rms() - 1)));
      }
      long best = Long.MAX_VALUE;
      for (int rep = 0; rep < 400; rep++) {
        long t0 = System.nanoTime();
        for (PortSpectra x : e) x.re[0][5] += (rep % 2 == 0 ? 1 : -1) * 0.02;
        r.solve(e, c.source(), i);
        best = Math.min(best, System.nanoTime() - t0);
      }
      System.out.println(s + String.format(" warm %.3f ms", best / 1e6));
    }
  }
}
