package railwalk.netlist;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import railwalk.device.Electrode;
import railwalk.device.ElectrodeNames;
import railwalk.device.SectionKind;
import railwalk.device.SectionType;
import railwalk.device.TubeType;

/** In which order the nodes of a tube named by position stand. */
final class ElectrodeOrder {
  private static final List<Electrode> TRIODE =
      List.of(Electrode.PLATE, Electrode.GRID, Electrode.CATHODE);
  private static final List<Electrode> PENTODE =
      List.of(Electrode.PLATE, Electrode.SCREEN, Electrode.GRID, Electrode.CATHODE);
  private static final List<Electrode> PENTODE_OF_FIVE =
      List.of(
          Electrode.PLATE,
          Electrode.SCREEN,
          Electrode.SUPPRESSOR,
          Electrode.GRID,
          Electrode.CATHODE);
  private static final List<Electrode> TWO_POLES = List.of(Electrode.PLATE, Electrode.CATHODE);
  private static final List<Electrode> TWO_PLATES =
      List.of(Electrode.PLATE1, Electrode.PLATE2, Electrode.CATHODE);

  private ElectrodeOrder() {}

  /** Returns whether a sub-circuit's header reads like a tube's: electrodes, or plain numbers. */
  static boolean looksLikeTube(Subcircuit subcircuit) {
    return subcircuit.ports().stream()
        .allMatch(
            port ->
                ElectrodeNames.electrode(port.text()).isPresent()
                    || ElectrodeNames.pin(port.text()).isPresent());
  }

  /** Returns the order that the netlist gives for {@code typeWord}; null when it gives none. */
  static @Nullable List<Electrode> given(Draft draft, Word typeWord, TubeType type) {
    Deck deck = draft.deck();
    for (String name : List.of(typeWord.text(), type.name())) {
      Card order = deck.orders().get(name.toLowerCase(Locale.ROOT));
      if (order != null) {
        return order(order.words().subList(1, order.words().size()));
      }
    }
    Subcircuit header = deck.subcircuits().get(typeWord.text().toLowerCase(Locale.ROOT));
    return header == null ? null : order(header.ports());
  }

  /** Returns the electrodes in the order of {@code words}; null when a word names none. */
  private static @Nullable List<Electrode> order(List<Word> words) {
    List<Electrode> order = new ArrayList<>();
    for (Word word : words) {
      Optional<Electrode> electrode = ElectrodeNames.electrode(word.text());
      if (electrode.isEmpty()) {
        return null;
      }
      order.add(electrode.get());
    }
    return order.isEmpty() ? null : order;
  }

  /** Returns the usual order for {@code count} nodes; extra ones at the end are heater nodes. */
  static List<Electrode> usual(SectionType section, TubeType type, int count) {
    return switch (section.kind()) {
      case TRIODE -> TRIODE;
      case PENTODE -> count == 5 || count == 7 ? PENTODE_OF_FIVE : PENTODE;
      case RECTIFIER -> count > 2 && hasTwoPlates(type) ? TWO_PLATES : TWO_POLES;
      case REGULATOR, DIODE -> TWO_POLES;
    };
  }

  /** Returns whether a rectifier has two plates, or may have for all its data tells. */
  static boolean hasTwoPlates(TubeType type) {
    return type.sections().stream().anyMatch(s -> s.kind() == SectionKind.RECTIFIER)
        && (type.pins().isEmpty()
            || type.pins().values().stream().anyMatch(p -> p.electrode() == Electrode.PLATE2));
  }

  /** Returns the order in words, for messages. */
  static String words(List<Electrode> order) {
    return String.join(" ", order.stream().map(Electrode::word).toList());
  }
}
