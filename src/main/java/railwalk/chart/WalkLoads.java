package railwalk.chart;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Collectors;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Node;
import railwalk.circuit.StandIn;
import railwalk.device.Electrode;
import railwalk.solve.OperatingPoint;
import railwalk.solve.SectionPoint;
import railwalk.walk.DcStep;
import railwalk.walk.SupplyLoad;
import railwalk.walk.SupplyLoads;
import railwalk.walk.TubeElectrode;

/** Where the current of a node goes, in words: "5.1 mA: V3 screen 3.0, b3 2.1". */
final class WalkLoads {
  /** Currents below this share of the whole are not worth a word. */
  private static final double SMALLEST_SHARE = 2e-3;

  /** A part that leads to electrodes is named after them up to this share of other current. */
  private static final double OTHER_SHARE = 0.25;

  private final OperatingPoint point;
  private final Wording wording;
  private final WalkTerms terms;

  /** The smallest share prints as this many units of the last place at least. */
  private static final double LEAST_PLACES = 0.95;

  /** One receiver and its current. */
  record Share(String name, double amps) {}

  WalkLoads(OperatingPoint point, Wording wording) {
    this.point = point;
    this.wording = wording;
    this.terms = new WalkTerms(point);
  }

  /** Returns what draws from a supply node; currents towards it count as negative. */
  List<Share> of(Node supplyNode) {
    return SupplyLoads.of(point.map(), point.circuit(), supplyNode).stream()
        .map(load -> new Share(name(load), amps(load)))
        .toList();
  }

  private double amps(SupplyLoad load) {
    if (load.parts().isEmpty()) {
      return load.electrodes().stream().mapToDouble(this::amps).sum();
    }
    return load.parts().stream().mapToDouble(terms::amps).sum();
  }

  private double amps(TubeElectrode end) {
    if (end.tube() instanceof StandIn standIn) {
      return standIn.draws().getOrDefault(end.electrode(), 0.0);
    }
    if (!(end.tube() instanceof AmplifierSection section)
        || point.map().idleSections().contains(section.name())) {
      return 0;
    }
    SectionPoint at = point.at(section);
    return switch (end.electrode()) {
      case PLATE -> at.plateAmps();
      case SCREEN -> at.screenAmps();
      case GRID -> at.gridAmps();
      case CATHODE -> -at.cathodeAmps();
      default -> 0;
    };
  }

  private String name(SupplyLoad load) {
    if (!load.supplyNodes().isEmpty()) {
      return load.supplyNodes().stream().map(Node::name).collect(Collectors.joining("+"));
    }
    List<TubeElectrode> fed =
        load.electrodes().stream().filter(WalkLoads::isFed).distinct().toList();
    List<TubeElectrode> named = fed.isEmpty() ? load.electrodes() : fed;
    if (!named.isEmpty() && isFor(load, named)) {
      return named.stream()
          .map(end -> end.tube().name())
          .distinct()
          .map(tube -> tube + " " + electrodes(tube, named))
          .collect(Collectors.joining("+"));
    }
    return load.parts().stream()
        .map(DcStep::element)
        .map(element -> element.name())
        .collect(Collectors.joining("+"));
  }

  /** Returns whether most of what a part carries goes into those electrodes: no divider's chain. */
  private boolean isFor(SupplyLoad load, List<TubeElectrode> ends) {
    if (load.parts().isEmpty()) {
      return true;
    }
    double whole = amps(load);
    double inside = ends.stream().mapToDouble(this::amps).sum();
    return Math.abs(whole - inside) <= OTHER_SHARE * Math.abs(whole);
  }

  private static boolean isFed(TubeElectrode end) {
    return end.electrode() == Electrode.PLATE || end.electrode() == Electrode.SCREEN;
  }

  private String electrodes(String tube, List<TubeElectrode> ends) {
    return ends.stream()
        .filter(end -> end.tube().name().equals(tube))
        .map(end -> wording.electrode(end.electrode()))
        .distinct()
        .collect(Collectors.joining("+"));
  }

  /**
   * Returns the whole with its shares: "5.1 mA: V3 screen 3.0, b3 2.1". The printed shares add up
   * to the printed whole: where rounding each by itself would not, those nearest to the middle
   * between two figures go the other way.
   */
  static String text(WalkAmps whole, List<Share> shares) {
    List<Share> notable =
        shares.stream()
            .filter(share -> Math.abs(share.amps()) > Math.abs(whole.amps()) * SMALLEST_SHARE)
            .toList();
    if (notable.isEmpty()) {
      return whole.printed() == 0 ? "no current" : whole.text();
    }
    WalkAmps total = fineEnough(whole, notable);
    double direction = notable.stream().mapToDouble(Share::amps).sum() < 0 ? -1 : 1;
    List<Double> units = apportioned(total, notable, direction);
    List<String> words = new ArrayList<>();
    for (int k = 0; k < notable.size(); k++) {
      words.add(notable.get(k).name() + " " + total.like(units.get(k) * total.place()).number());
    }
    return total.text() + ": " + String.join(", ", words);
  }

  /**
   * Returns the whole with so many places that no share prints as nothing, and with one more where
   * the shares, each rounded by itself, do not add up.
   */
  private static WalkAmps fineEnough(WalkAmps whole, List<Share> shares) {
    double least = shares.stream().mapToDouble(s -> Math.abs(s.amps())).min().orElse(0);
    WalkAmps total = whole;
    while (least < total.place() * LEAST_PLACES && total.finer(1).place() < total.place()) {
      total = total.finer(1);
    }
    double place = total.place();
    double sum = Math.abs(shares.stream().mapToDouble(s -> Math.rint(s.amps() / place)).sum());
    return sum == Math.rint(Math.abs(whole.amps()) / place) ? total : total.finer(1);
  }

  /** Returns the shares in printed places, whole numbers. */
  private static List<Double> apportioned(WalkAmps whole, List<Share> shares, double direction) {
    List<Double> units = new ArrayList<>();
    List<Integer> order = new ArrayList<>();
    double missing = Math.rint(Math.abs(whole.amps()) / whole.place());
    for (Share share : shares) {
      double exact = direction * share.amps() / whole.place();
      order.add(units.size());
      units.add(Math.rint(exact));
      missing -= Math.rint(exact);
    }
    double sign = Math.signum(missing);
    order.sort(
        Comparator.comparingDouble(
            k -> -sign * (direction * shares.get(k).amps() / whole.place() - units.get(k))));
    if (Math.abs(missing) <= shares.size()) {
      for (int k = 0; k < Math.abs(missing); k++) {
        int index = order.get(k);
        units.set(index, units.get(index) + sign);
      }
    }
    return units;
  }
}
