package railwalk.device;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * Reads the pins of a data file and sees that every electrode has one. One piece of {@link
 * DataFile}.
 */
final class PinReader {
  private static final String CAP = "cap";
  private static final String JUMPER = "jumper";

  private static final Map<String, PinUse.Role> ROLES =
      Map.of(
          "empty", PinUse.Role.EMPTY,
          "internal", PinUse.Role.INTERNAL,
          "shield", PinUse.Role.SHIELD,
          "sleeve", PinUse.Role.SLEEVE);

  private final DataFile file;
  private final List<SectionType> sections;

  PinReader(DataFile file, List<SectionType> sections) {
    this.file = file;
    this.sections = sections;
  }

  /** Returns the pins by number, 0 for the top cap; none when the file knows none. */
  SortedMap<Integer, PinUse> pins() {
    SortedMap<Integer, PinUse> pins = new TreeMap<>();
    for (DataLine line : file.all("pin")) {
      line.allow(Set.of());
      int number = line.word(0).equals(CAP) ? 0 : (int) line.figure(0);
      String id = line.size() > 2 ? line.word(1) : "";
      boolean jumper = id.equals(JUMPER) && line.word(2).equals("internal");
      if (!id.isEmpty() && !jumper && !file.sectionIds().contains(id)) {
        throw line.error(1, "no section " + id, "");
      }
      PinUse use = pinUse(line, id, line.word(line.size() > 2 ? 2 : 1));
      if (pins.put(number, use) != null) {
        throw line.error(0, "pin " + line.word(0) + " stands twice", "");
      }
    }
    List<DataLine> none = file.all("pins");
    if (!none.isEmpty() && !(none.get(0).word(0).equals("none") && pins.isEmpty())) {
      throw none.get(0).error("pins says none, and nothing else", "pins none, or a pin line each");
    }
    if (!pins.isEmpty()) {
      for (SectionType section : sections) {
        complete(section, pins);
      }
    }
    return pins;
  }

  private PinUse pinUse(DataLine line, String id, String word) {
    PinUse.Role role = ROLES.get(word);
    if (role != null) {
      return new PinUse(role, id, null);
    }
    for (Electrode electrode : Electrode.values()) {
      if (electrode.word().equals(word.toLowerCase(Locale.ROOT))) {
        for (SectionType section : sections) {
          if (has(section, id, electrode)) {
            return new PinUse(PinUse.Role.ELECTRODE, id, electrode);
          }
        }
        throw line.error("no section of that kind has a " + word, "");
      }
    }
    throw line.error("no electrode is called " + word, "plate, screen, grid, cathode, heater1 …");
  }

  private static boolean has(SectionType section, String id, Electrode electrode) {
    if (!id.isEmpty() && !section.id().equals(id)) {
      return false;
    }
    return switch (electrode) {
      case CATHODE, HEATER1, HEATER2, HEATER_TAP -> true;
      case GRID -> amplifies(section);
      case SCREEN, SUPPRESSOR -> section.kind() == SectionKind.PENTODE;
      case DIODE1, DIODE2 -> section.kind() == SectionKind.DIODE;
      case PLATE1, PLATE2 -> section.kind() == SectionKind.RECTIFIER;
      case PLATE -> section.kind() != SectionKind.DIODE;
    };
  }

  private static boolean amplifies(SectionType section) {
    return section.kind() == SectionKind.TRIODE || section.kind() == SectionKind.PENTODE;
  }

  /** Complains about an electrode of an amplifying section that no pin leads to. */
  private void complete(SectionType section, SortedMap<Integer, PinUse> pins) {
    if (!amplifies(section)) {
      return;
    }
    boolean ownCathode = true;
    for (DataLine line : file.all("heater")) {
      ownCathode &= !line.words().contains("direct") && !line.words().contains("joined");
    }
    for (Electrode electrode :
        List.of(Electrode.PLATE, Electrode.SCREEN, Electrode.GRID, Electrode.CATHODE)) {
      boolean wanted =
          electrode == Electrode.CATHODE ? ownCathode : has(section, section.id(), electrode);
      if (wanted && !isThere(section, electrode, pins)) {
        throw file.one("section")
            .error(
                "no pin leads to the "
                    + electrode.word()
                    + (section.id().isEmpty() ? "" : " of section " + section.id()),
                "pin … " + electrode.word());
      }
    }
  }

  private static boolean isThere(
      SectionType section, Electrode electrode, SortedMap<Integer, PinUse> pins) {
    for (PinUse use : pins.values()) {
      boolean own = use.section().isEmpty() || use.section().equals(section.id());
      if (own && use.electrode() == electrode) {
        return true;
      }
    }
    return false;
  }
}
