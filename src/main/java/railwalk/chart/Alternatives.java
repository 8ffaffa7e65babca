package railwalk.chart;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Collectors;
import railwalk.device.AmplifierLaw;
import railwalk.device.DataFile;
import railwalk.device.Electrode;
import railwalk.device.GasLaw;
import railwalk.device.Heater;
import railwalk.device.LikeSections;
import railwalk.device.Ratings;
import railwalk.device.RectifierRatings;
import railwalk.device.SectionCurrents;
import railwalk.device.SectionKind;
import railwalk.device.SectionType;
import railwalk.device.TubeType;
import railwalk.device.TwoPoleLaw;
import railwalk.fit.TypeSheet;
import railwalk.units.Quantity;

/**
 * Finds the types that come nearest to one that is not at hand: as many sections of each kind, like
 * currents at the volts of its first published point, and as little as may be to change around the
 * socket. How much each difference weighs is common sense, not a published figure.
 */
public final class Alternatives {
  private static final int MOST = 6;
  private static final double TOO_FAR = 2.6;
  private static final double NOTHING = 0.05;
  private static final double SAME_HEATER_VOLTS = 0.05;
  private static final double SAME_HEATER_AMPS = 0.12;
  private static final double OTHER_PINS = 0.5;
  private static final double OTHER_SOCKET = 0.8;
  private static final double OTHER_HEATER_VOLTS = 0.5;
  private static final double SAME_GLOW_VOLTS = 0.04;
  private static final double CURRENT_WEIGHT = 1;
  private static final double GM_WEIGHT = 0.5;
  private static final double MU_WEIGHT = 1.5;
  private static final double LIMIT_WEIGHT = 0.6;
  private static final double DROP_WEIGHT = 0.7;
  private static final double USUAL_RECTIFIER_AMPS = 0.07;

  private final TubeType wanted;
  private final Optional<PointPlace> work;

  private Alternatives(DataFile file) {
    this.wanted = file.type();
    this.work = work(file);
  }

  /** Returns the alternatives to the type in {@code file} among {@code types}, nearest first. */
  public static List<Alternative> of(DataFile file, List<TubeType> types) {
    Alternatives search = new Alternatives(file);
    List<Alternative> found = new ArrayList<>();
    for (TubeType type : types) {
      if (!type.name().equals(search.wanted.name())) {
        search.compare(type).ifPresent(found::add);
      }
    }
    found.sort(
        Comparator.comparingDouble(Alternative::distance)
            .thenComparing(a -> a.type().name(), NaturalOrder.INSTANCE));
    return List.copyOf(found.subList(0, Math.min(MOST, found.size())));
  }

  /** Returns the first published point of the first amplifying section, electrode volts. */
  private static Optional<PointPlace> work(DataFile file) {
    List<LikeSections> groups = file.likeSections();
    if (groups.isEmpty()) {
      return Optional.empty();
    }
    return NumberedPoint.of(TypeSheet.of(file).rows()).stream()
        .map(PointPlace::of)
        .flatMap(Optional::stream)
        .filter(place -> !place.joined())
        .findFirst();
  }

  private Optional<Alternative> compare(TubeType type) {
    for (SectionKind kind : SectionKind.values()) {
      int needed = Alternative.ofKind(wanted, kind).size();
      if (Alternative.ofKind(type, kind).size() < needed) {
        return Optional.empty();
      }
    }
    Differences differences = new Differences(type);
    SectionType main = wanted.sections().get(0);
    SectionType own = Alternative.counterpart(main, wanted, type);
    boolean comparable =
        switch (main.kind()) {
          case TRIODE, PENTODE -> differences.amplifier(main, own);
          case RECTIFIER -> differences.rectifier(main, own);
          case REGULATOR -> differences.regulator(main, own);
          case DIODE -> false;
        };
    if (!comparable) {
      return Optional.empty();
    }
    differences.socket();
    differences.heater();
    return differences.distance > TOO_FAR
        ? Optional.empty()
        : Optional.of(new Alternative(type, differences.distance, differences.words));
  }

  /** Collects what differs between the wanted type and one other. */
  private final class Differences {
    private final TubeType type;
    private final List<String> words = new ArrayList<>();
    private double distance;

    Differences(TubeType type) {
      this.type = type;
    }

    boolean amplifier(SectionType main, SectionType own) {
      if (work.isEmpty()) {
        return false;
      }
      SectionCurrents is = at(main, work.get());
      SectionCurrents would = at(own, work.get());
      double current = would.plateAmps / is.plateAmps;
      double gm = would.plateByGridSiemens / is.plateByGridSiemens;
      if (!(current > 0 && gm > 0)) {
        return false;
      }
      weigh(CURRENT_WEIGHT, current);
      weigh(GM_WEIGHT, gm);
      if (Math.abs(current - 1) > NOTHING) {
        words.add("plate current " + change(current) + " at the same volts");
      }
      if (main.kind() == SectionKind.TRIODE) {
        double was = is.plateByGridSiemens / is.plateByPlateSiemens;
        double mu = would.plateByGridSiemens / would.plateByPlateSiemens;
        weigh(MU_WEIGHT, mu / was);
        if (Math.abs(mu / was - 1) > NOTHING) {
          words.add("mu " + Math.round(mu) + " for " + Math.round(was));
        }
      } else if (Math.abs(gm - 1) > 2 * NOTHING) {
        words.add("gm " + change(gm));
      }
      Ratings before = main.ratings();
      Ratings after = own.ratings();
      limit("plate", before.plateWattsMax(), after.plateWattsMax(), "W");
      limit("plate", before.plateVoltsMax(), after.plateVoltsMax(), "V");
      limit("screen", before.screenVoltsMax(), after.screenVoltsMax(), "V");
      limit("screen", before.screenWattsMax(), after.screenWattsMax(), "W");
      return true;
    }

    private SectionCurrents at(SectionType section, PointPlace place) {
      SectionCurrents currents = new SectionCurrents();
      double screen = Double.isNaN(place.screenVolts()) ? 0 : place.screenVolts();
      ((AmplifierLaw) section.law())
          .evaluate(place.plateVolts(), screen, place.gridVolts(), currents);
      return currents;
    }

    boolean rectifier(SectionType main, SectionType own) {
      if (plates(wanted) != plates(type)) {
        return false;
      }
      double rated = main.rectifierRatings().dcAmpsMax();
      double amps = Double.isNaN(rated) ? USUAL_RECTIFIER_AMPS : rated;
      double was = drop(main, amps);
      double drop = drop(own, amps);
      weigh(DROP_WEIGHT, drop / was);
      if (Math.abs(drop / was - 1) > 2 * NOTHING) {
        words.add(
            "drops "
                + Math.round(drop)
                + " V for "
                + Math.round(was)
                + " V at "
                + Quantity.amps(amps));
      }
      RectifierRatings before = main.rectifierRatings();
      RectifierRatings after = own.rectifierRatings();
      limit("DC output", before.dcAmpsMax(), after.dcAmpsMax(), "A");
      limit("peak inverse", before.peakInverseVoltsMax(), after.peakInverseVoltsMax(), "V");
      limit(
          "first capacitor",
          before.firstCapacitorFaradsMax(),
          after.firstCapacitorFaradsMax(),
          "F");
      if (wanted.heater().directlyHeated() != type.heater().directlyHeated()) {
        words.add(
            type.heater().directlyHeated()
                ? "filament: high tension is there before the other heaters are warm"
                : "indirectly heated: high tension comes up slowly");
      }
      return true;
    }

    private long plates(TubeType of) {
      return of.pins().values().stream().filter(use -> use.electrode() == Electrode.PLATE2).count();
    }

    private double drop(SectionType section, double amps) {
      return PlateDrop.volts((TwoPoleLaw) section.law(), amps);
    }

    boolean regulator(SectionType main, SectionType own) {
      GasLaw before = (GasLaw) main.law();
      GasLaw after = (GasLaw) own.law();
      double volts = after.operatingVolts() / before.operatingVolts();
      if (Math.abs(volts - 1) > SAME_GLOW_VOLTS) {
        return false;
      }
      weigh(CURRENT_WEIGHT, volts);
      if (after.operatingVolts() != before.operatingVolts()) {
        words.add(
            "holds "
                + Quantity.volts(after.operatingVolts())
                + " for "
                + Quantity.volts(before.operatingVolts()));
      }
      limit("current", before.maximumAmps(), after.maximumAmps(), "A");
      return true;
    }

    /** Says where the other type stands less. */
    private void limit(String what, double before, double after, String unit) {
      if (after < before * (1 - NOTHING / 2)) {
        weigh(LIMIT_WEIGHT, after / before);
        words.add(
            what + " limit " + Quantity.of(after, unit) + " for " + Quantity.of(before, unit));
      }
    }

    void socket() {
      if (!type.family().equalsIgnoreCase(wanted.family())) {
        distance += OTHER_SOCKET;
        words.add(0, "other socket: " + type.family());
        return;
      }
      if (wanted.pins().isEmpty() || type.pins().isEmpty()) {
        distance += OTHER_PINS;
        words.add(0, "pins not confirmed");
        return;
      }
      PinDifferences pins = PinDifferences.of(wanted, type);
      if (!pins.differing().isEmpty()) {
        distance += OTHER_PINS;
        words.add(0, "same socket, other pins: " + list(pins.differing()));
      } else {
        words.add(0, "same pins");
      }
      if (!pins.taken().isEmpty()) {
        words.add("connected inside where the other is free: " + list(pins.taken()));
      }
    }

    private String list(List<Integer> pins) {
      return pins.stream()
          .map(pin -> pin == 0 ? "cap" : Integer.toString(pin))
          .collect(Collectors.joining(", "));
    }

    void heater() {
      List<Heater.Connection> before = wanted.heater().connections();
      List<Heater.Connection> after = type.heater().connections();
      if (before.isEmpty() || after.isEmpty()) {
        return;
      }
      boolean sameVolts = false;
      for (Heater.Connection a : before) {
        for (Heater.Connection b : after) {
          if (Math.abs(b.volts() / a.volts() - 1) < SAME_HEATER_VOLTS) {
            sameVolts = true;
            if (Math.abs(b.amps() / a.amps() - 1) < SAME_HEATER_AMPS) {
              return;
            }
          }
        }
      }
      Heater.Connection usual = after.get(0);
      weigh(LIMIT_WEIGHT / 2, usual.volts() * usual.amps() / watts(before.get(0)));
      distance += sameVolts ? 0 : OTHER_HEATER_VOLTS;
      words.add(
          "heater " + CataloguePage.heater(usual) + " for " + CataloguePage.heater(before.get(0)));
    }

    private double watts(Heater.Connection connection) {
      return connection.volts() * connection.amps();
    }

    private void weigh(double weight, double ratio) {
      distance += weight * Math.abs(Math.log(ratio));
    }

    private String change(double ratio) {
      return ratio > 2
          ? String.format(Locale.ROOT, "%.1f times", ratio)
          : (ratio > 1 ? "+" : "") + Quantity.percent(ratio - 1);
    }
  }
}
