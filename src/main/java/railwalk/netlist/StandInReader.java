package railwalk.netlist;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import railwalk.circuit.Node;
import railwalk.circuit.StandIn;
import railwalk.device.Electrode;
import railwalk.device.ElectrodeNames;
import railwalk.source.NearNames;
import railwalk.units.Measure;

/**
 * Reads the stand-in for a tube of unknown type: {@code XV6 UNKNOWN plate=p cathode=k draws
 * plate=2.6mA}.
 */
final class StandInReader {
  private StandInReader() {}

  static void read(PartCard part, Card card) {
    part.words().clear();
    part.takeOptions();
    Map<Electrode, Node> electrodes = new LinkedHashMap<>();
    Map<Electrode, Double> draws = new LinkedHashMap<>();
    Map<Electrode, Word> drawWords = new LinkedHashMap<>();
    boolean afterDraws = false;
    boolean allKnown = true;
    for (Field field : card.fields()) {
      if (field instanceof Field.Bare bare) {
        afterDraws |= bare.word().is("draws");
      } else if (field instanceof Field.Option option) {
        Optional<Electrode> electrode = electrode(part, option.key());
        if (electrode.isEmpty()) {
          allKnown = false;
        } else if (afterDraws) {
          drawWords.put(electrode.get(), option.key());
          draws.put(electrode.get(), part.read(option.value(), Measure.CURRENT));
        } else {
          Node node = part.draft().nodes().node(option.value(), part.frame());
          electrodes.put(electrode.get(), node);
        }
      }
    }
    if (!allKnown) {
      return;
    }
    drawWords.forEach(
        (electrode, word) -> {
          if (!electrodes.containsKey(electrode)) {
            part.report().add(Problem.STAND_IN_NODE, word.span(), electrode.word());
          }
        });
    if (draws.isEmpty()) {
      part.report().add(Problem.STAND_IN_DRAWS, part.end(), part.name());
    } else if (!electrodes.containsKey(Electrode.CATHODE)) {
      part.report().add(Problem.STAND_IN_CATHODE, part.span(), part.name());
    } else if (electrodes.keySet().containsAll(draws.keySet())) {
      part.report().add(Problem.STAND_IN, part.span(), part.name());
      part.draft().add(new StandIn(part.name(), electrodes, draws), part.span());
    }
  }

  private static Optional<Electrode> electrode(PartCard part, Word key) {
    if (ElectrodeNames.pin(key.text()).isPresent()) {
      part.report().add(Problem.STAND_IN_PIN, key.span(), key.text());
      return Optional.empty();
    }
    Optional<Electrode> electrode = ElectrodeNames.electrode(key.text());
    if (electrode.isEmpty()) {
      List<String> words = ElectrodeNames.all();
      part.report()
          .add(
              Problem.ELECTRODE_UNKNOWN, key.span(), key.text(), NearNames.hint(key.text(), words));
    }
    return electrode;
  }
}
