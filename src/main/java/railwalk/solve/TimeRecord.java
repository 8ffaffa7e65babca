package railwalk.solve;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.RectifierSection;

/** What one run of a {@link TimeSweep} was like: instants, volts, and when rectifiers conducted. */
final class TimeRecord implements TimeSweep.Observer {
  /** A rectifier conducts from this part of its greatest current on. */
  private static final double CONDUCTING = 1e-3;

  private final TimeNetwork net;
  private final int[] rectifiers;
  final List<Double> seconds = new ArrayList<>();
  final List<double[]> unknowns = new ArrayList<>();
  final List<double[]> rectifierAmps = new ArrayList<>();

  TimeRecord(TimeNetwork net) {
    this.net = net;
    List<Integer> places = new ArrayList<>();
    for (int i = 0; i < net.devices.twoPoles.size(); i++) {
      Element element = net.devices.twoPoles.get(i).element();
      if (element instanceof Diode || element instanceof RectifierSection) {
        places.add(i);
      }
    }
    rectifiers = new int[places.size()];
    for (int i = 0; i < rectifiers.length; i++) {
      rectifiers[i] = places.get(i);
    }
  }

  /** Returns the two-poles that rectify, by their number among the devices. */
  int[] rectifiers() {
    return rectifiers;
  }

  @Override
  public void instant(double second, double[] x) {
    double[] amps = new double[rectifiers.length];
    for (int i = 0; i < amps.length; i++) {
      amps[i] = net.devices.twoPoleAmps(rectifiers[i], x);
    }
    seconds.add(second);
    unknowns.add(x.clone());
    rectifierAmps.add(amps);
  }

  double peakAmps(int rectifier) {
    double peak = 0;
    for (double[] amps : rectifierAmps) {
      peak = Math.max(peak, amps[rectifier]);
    }
    return peak;
  }

  /** Returns the shares of the period at which a rectifier begins or ends to conduct. */
  List<Double> switchings() {
    List<Double> shares = new ArrayList<>();
    int last = seconds.size() - 1;
    for (int r = 0; r < rectifiers.length; r++) {
      double threshold = CONDUCTING * peakAmps(r);
      if (!(threshold > 1e-9)) {
        continue;
      }
      for (int k = 0; k <= last; k++) {
        double before = rectifierAmps.get(k == 0 ? last : k - 1)[r] - threshold;
        double after = rectifierAmps.get(k)[r] - threshold;
        if (before < 0 != after < 0) {
          double from = k == 0 ? 0 : seconds.get(k - 1);
          double instant = from + (seconds.get(k) - from) * before / (before - after);
          shares.add(instant * net.hertz);
        }
      }
    }
    return shares;
  }
}
