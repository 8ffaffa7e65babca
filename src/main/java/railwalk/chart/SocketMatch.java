package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import railwalk.chart.SocketWiring.Look;
import railwalk.circuit.Node;
import railwalk.circuit.Socket;
import railwalk.device.Electrode;
import railwalk.device.Heater;
import railwalk.device.PinUse;
import railwalk.device.SectionKind;
import railwalk.device.TubeType;
import railwalk.units.Quantity;

/**
 * How well one type goes with the wires of a socket. How much each sign weighs is common sense: a
 * heater on the wrong volts or a plate on chassis rules a type out, a tie point says little.
 *
 * @param agreeing how many signs speak for it
 * @param against how much speaks against it
 * @param doubts what does, in words
 * @param idle plate currents with it in the socket, in words; empty until it is tried
 */
public record SocketMatch(
    TubeType type, int agreeing, double against, List<String> doubts, String idle) {
  private static final double RULES_OUT = 3;
  private static final double SPEAKS_AGAINST = 1.5;
  private static final double ODD = 0.7;
  private static final double SLIGHT = 0.2;
  private static final double HEATER_SHARE = 0.12;

  public SocketMatch {
    doubts = List.copyOf(doubts);
  }

  /** Returns the match with one more doubt. */
  public SocketMatch doubting(String doubt) {
    List<String> all = new ArrayList<>(doubts);
    all.add(doubt);
    return new SocketMatch(type, agreeing, against + SPEAKS_AGAINST, all, idle);
  }

  /** Returns the match with the plate currents that it idles at. */
  public SocketMatch idlingAt(List<Double> plateAmps) {
    String words = plateAmps.stream().map(Quantity::amps).collect(Collectors.joining(", "));
    return new SocketMatch(type, agreeing, against, doubts, words);
  }

  /** Returns how {@code type} goes with {@code wiring}. */
  static SocketMatch of(TubeType type, SocketWiring wiring) {
    Count count = new Count(type, wiring);
    wiring.pins().keySet().forEach(count::pin);
    count.open();
    count.heater();
    return new SocketMatch(type, count.agreeing, count.against, count.doubts, "");
  }

  /** Counts what speaks for and against. */
  private static final class Count {
    private final TubeType type;
    private final SocketWiring wiring;
    private final List<String> doubts = new ArrayList<>();
    private int agreeing;
    private double against;

    Count(TubeType type, SocketWiring wiring) {
      this.type = type;
      this.wiring = wiring;
    }

    private void doubt(double weight, String words) {
      against += weight;
      doubts.add(words);
    }

    void pin(int pin) {
      if (!Socket.hasPin(type, pin)) {
        doubt(RULES_OUT, "no pin " + pin);
        return;
      }
      PinUse use = type.pins().get(pin);
      Electrode electrode = use == null ? null : use.electrode();
      if (use == null || use.role() == PinUse.Role.EMPTY) {
        against += SLIGHT;
      } else if (electrode == null) {
        if (wiring.look(pin) != Look.CHASSIS) {
          doubt(ODD, "pin " + pin + " is no electrode but connected inside");
        }
      } else {
        Look look = wiring.look(pin);
        double weight = weight(electrode, look);
        if (weight > 0) {
          doubt(weight, PinWords.of(type, use) + " (" + pinName(pin) + ") " + look.words());
        } else if (weight < 0) {
          agreeing++;
        }
      }
    }

    /** Returns what {@code look} says of an electrode: below zero for, above it against. */
    private double weight(Electrode electrode, Look look) {
      return switch (electrode) {
        case HEATER1, HEATER2, HEATER_TAP ->
            switch (look) {
              case HEATER -> -1;
              case CHASSIS, LOOSE, HIGH_AC -> 0;
              case LOW, BETWEEN -> ODD;
              case FED, NEGATIVE, HIGH -> RULES_OUT;
            };
        case PLATE -> isRectifier() ? rectifierPlate(look) : plate(look);
        case SCREEN -> plate(look);
        case PLATE1, PLATE2 -> rectifierPlate(look);
        case GRID ->
            switch (look) {
              case HIGH, NEGATIVE -> -1;
              case BETWEEN, LOOSE -> 0;
              case CHASSIS, LOW, FED -> SPEAKS_AGAINST;
              case HEATER, HIGH_AC -> RULES_OUT;
            };
        case CATHODE -> cathode(look);
        case SUPPRESSOR ->
            switch (look) {
              case CHASSIS, LOW -> -1;
              case BETWEEN, LOOSE, HIGH, NEGATIVE -> ODD;
              case FED, HEATER, HIGH_AC -> RULES_OUT;
            };
        case DIODE1, DIODE2 ->
            switch (look) {
              case CHASSIS, LOW, HIGH, BETWEEN, LOOSE, NEGATIVE -> 0;
              case FED, HEATER, HIGH_AC -> RULES_OUT;
            };
      };
    }

    private static double plate(Look look) {
      return switch (look) {
        case FED -> -1;
        case LOOSE, BETWEEN -> ODD;
        case LOW, HIGH, CHASSIS, NEGATIVE, HEATER, HIGH_AC -> RULES_OUT;
      };
    }

    private static double rectifierPlate(Look look) {
      return switch (look) {
        case HIGH_AC -> -1;
        case LOOSE -> 0;
        case FED, BETWEEN -> SPEAKS_AGAINST;
        case LOW, HIGH, CHASSIS, NEGATIVE, HEATER -> RULES_OUT;
      };
    }

    private double cathode(Look look) {
      boolean supplies = isRectifier() || isRegulator();
      return switch (look) {
        case LOW, CHASSIS -> isRectifier() ? SPEAKS_AGAINST : -1;
        case BETWEEN, LOOSE -> 0;
        case HIGH -> ODD;
        case FED -> supplies ? -1 : RULES_OUT;
        case HEATER -> type.heater().cathodeJoined() ? -1 : SPEAKS_AGAINST;
        case NEGATIVE -> SPEAKS_AGAINST;
        case HIGH_AC -> RULES_OUT;
      };
    }

    private boolean isRectifier() {
      return type.sections().get(0).kind() == SectionKind.RECTIFIER;
    }

    private boolean isRegulator() {
      return type.sections().get(0).kind() == SectionKind.REGULATOR;
    }

    /** Counts the electrodes that nothing is wired to, of sections that are in use. */
    void open() {
      TreeSet<String> used = new TreeSet<>();
      for (Map.Entry<Integer, PinUse> pin : type.pins().entrySet()) {
        boolean own = !pin.getValue().section().isEmpty() || type.sections().size() == 1;
        Electrode electrode = pin.getValue().electrode();
        if (own && electrode != null && !electrode.isHeater() && isWired(pin.getKey())) {
          used.add(pin.getValue().section());
        }
      }
      for (Map.Entry<Integer, PinUse> pin : type.pins().entrySet()) {
        Electrode electrode = pin.getValue().electrode();
        if (electrode == null
            || electrode == Electrode.SUPPRESSOR
            || electrode.isHeater()
            || isWired(pin.getKey())
            || !(used.contains(pin.getValue().section()) || pin.getValue().section().isEmpty())) {
          continue;
        }
        boolean twice =
            type.pinsOf(pin.getValue().section(), electrode).stream().anyMatch(this::isWired);
        if (!twice) {
          doubt(
              SPEAKS_AGAINST,
              "nothing on "
                  + PinWords.of(type, pin.getValue())
                  + " ("
                  + pinName(pin.getKey())
                  + ")");
        }
      }
    }

    void heater() {
      Node first = node(Electrode.HEATER1);
      Node second = node(Electrode.HEATER2);
      if (second == null && type.heater().cathodeJoined()) {
        second = node(Electrode.CATHODE);
      }
      Node tap = node(Electrode.HEATER_TAP);
      List<Heater.Connection> rated = type.heater().connections();
      boolean socketHasHeater =
          wiring.pins().keySet().stream().anyMatch(pin -> wiring.look(pin) == Look.HEATER);
      if (rated.isEmpty()) {
        return;
      }
      if (first == null || second == null) {
        if (socketHasHeater) {
          doubt(SPEAKS_AGAINST, "heater not wired");
        }
        return;
      }
      boolean parallel = first.equals(second);
      if (parallel && tap == null) {
        doubt(RULES_OUT, "heater pins joined: the heater is shorted");
        return;
      }
      double volts =
          tap != null && parallel ? wiring.acVolts(first, tap) : wiring.acVolts(first, second);
      if (Double.isNaN(volts)) {
        return;
      }
      double wanted = rated.get(0).volts();
      if (parallel) {
        wanted = rated.get(rated.size() - 1).volts();
      }
      if (Math.abs(volts / wanted - 1) < HEATER_SHARE) {
        agreeing++;
      } else {
        doubt(
            RULES_OUT,
            "heater gets " + Quantity.volts(volts) + ", wants " + Quantity.volts(wanted));
      }
    }

    private @Nullable Node node(Electrode electrode) {
      for (int pin : type.pinsOf("", electrode)) {
        if (isWired(pin)) {
          return wiring.pins().get(pin);
        }
      }
      return null;
    }

    private boolean isWired(int pin) {
      return wiring.pins().containsKey(pin);
    }

    private static String pinName(int pin) {
      return pin == 0 ? "cap" : "pin " + pin;
    }
  }
}
