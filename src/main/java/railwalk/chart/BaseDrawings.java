package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import railwalk.device.PinUse;
import railwalk.device.TubeType;

/**
 * Makes the drawing of a type's base. Where pins stand is common practice: octal and loctal eight
 * around a key, miniature seven of eight places, noval and novar nine of ten, rimlock eight beside
 * a bead, any other in a ring with a gap. Older bases have the filament or heater on the first and
 * the last pin, which are the two thick ones, at the bottom; with five pins all are alike.
 */
final class BaseDrawings {
  private static final double FULL_TURN = 360;
  private static final int ALL_ALIKE = 5;

  private BaseDrawings() {}

  /**
   * A kind of base.
   *
   * @param places in the ring, empty ones included
   * @param pins at the first of them
   * @param start degrees of the first place from the bottom, in places
   */
  private record Ring(int places, int pins, double start, BaseDrawing.Mark mark) {}

  /** Returns the drawing; empty where the type's pins are not known. */
  static Optional<BaseDrawing> of(TubeType type) {
    if (type.pins().isEmpty()) {
      return Optional.empty();
    }
    Ring ring = ring(type);
    List<BaseDrawing.Contact> contacts = new ArrayList<>();
    for (int pin = 1; pin <= ring.pins(); pin++) {
      contacts.add(contact(type, ring, pin));
    }
    PinUse cap = type.pins().get(0);
    return Optional.of(
        new BaseDrawing(
            "Base " + TypeFacts.base(type) + ", seen from below",
            ring.mark(),
            contacts,
            cap == null ? "" : PinWords.of(type, cap)));
  }

  private static BaseDrawing.Contact contact(TubeType type, Ring ring, int pin) {
    PinUse use = type.pins().get(pin);
    boolean ends = pin == 1 || pin == ring.pins();
    return new BaseDrawing.Contact(
        pin,
        FULL_TURN * (pin - 1 + ring.start()) / ring.places(),
        ring.mark() == BaseDrawing.Mark.THICK_PINS && ends && ring.pins() != ALL_ALIKE,
        use != null,
        use == null ? "" : PinWords.of(type, use),
        use != null && use.role() != PinUse.Role.EMPTY);
  }

  private static Ring ring(TubeType type) {
    String family = type.family().toLowerCase(Locale.ROOT);
    int highest = type.pins().lastKey();
    if (family.startsWith("octal") || family.startsWith("loctal")) {
      return new Ring(8, 8, 0.5, BaseDrawing.Mark.KEY);
    }
    if (family.startsWith("rimlock")) {
      return new Ring(8, 8, 0.5, BaseDrawing.Mark.BEAD);
    }
    if (family.startsWith("miniature")) {
      return new Ring(8, 7, 1, BaseDrawing.Mark.GAP);
    }
    if (family.startsWith("nova") || family.startsWith("magnoval")) {
      return new Ring(10, 9, 1, BaseDrawing.Mark.GAP);
    }
    if (family.startsWith("ux") || family.startsWith("uy") || family.endsWith("-pin")) {
      return new Ring(highest, highest, 0.5, BaseDrawing.Mark.THICK_PINS);
    }
    return new Ring(highest + 1, highest, 1, BaseDrawing.Mark.GAP);
  }
}
