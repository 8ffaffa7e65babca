package railwalk.netlist;

import java.util.List;
import java.util.Optional;
import railwalk.circuit.Bottle;
import railwalk.circuit.Lead;
import railwalk.circuit.Node;
import railwalk.circuit.Socket;
import railwalk.device.Electrode;
import railwalk.device.ElectrodeNames;
import railwalk.device.SectionType;
import railwalk.device.TubeType;
import railwalk.source.NearNames;

/**
 * Reads a tube wired by socket pin ({@code XV1 12AX7 1=p1 …}) or by electrode ({@code XV3 6V6GT
 * plate=p3 …}).
 */
final class TubeByKeys {
  private final PartCard part;
  private final TubeType type;
  private final TubeSections sections;

  private TubeByKeys(PartCard part, TubeType type) {
    this.part = part;
    this.type = type;
    this.sections = new TubeSections(part, type);
  }

  /** Reads the keys of the line; its one bare word was the type. */
  static void read(PartCard part, TubeType type) {
    part.words().clear();
    new TubeByKeys(part, type).read();
  }

  private void read() {
    List<Field.Option> all = part.takeOptions();
    List<Field.Option> options = all.stream().filter(this::isMeant).toList();
    boolean byPin = options.isEmpty() || isPin(options.get(0).key());
    Field.Option odd =
        options.stream().filter(o -> isPin(o.key()) != byPin).findFirst().orElse(null);
    if (odd != null) {
      part.report()
          .add(Problem.PINS_AND_ELECTRODES, odd.key().span(), part.name(), odd.key().text());
      return;
    }
    if (byPin && !options.isEmpty() && type.pins().isEmpty()) {
      part.report().add(Problem.PINS_NOT_KNOWN, options.get(0).key().span(), type.name());
      return;
    }
    Bottle.Wiring wiring = byPin ? Bottle.Wiring.BY_PIN : Bottle.Wiring.BY_ELECTRODE;
    TubeRack.Entry entry = part.draft().tubes().entry(sections.tube(), type, wiring, part);
    if (entry == null) {
      return;
    }
    if (options.size() < all.size()) {
      entry.spoil();
    }
    for (Field.Option option : options) {
      if (option.values().size() > 1) {
        Word second = option.values().get(1);
        part.report().add(Problem.COMMA_BETWEEN_WORDS, second.span(), second.text());
      }
      Node node = part.draft().nodes().node(option.value(), part.frame());
      boolean wired =
          byPin ? wirePin(entry, option.key(), node) : wireElectrode(entry, option.key(), node);
      if (!wired) {
        entry.spoil();
      }
    }
    part.done();
  }

  private static boolean isPin(Word key) {
    return ElectrodeNames.pin(key.text()).isPresent();
  }

  private boolean isMeant(Field.Option option) {
    Word key = option.key();
    if (isPin(key) || ElectrodeNames.electrode(key.text()).isPresent()) {
      return true;
    }
    part.report()
        .add(
            Problem.ELECTRODE_UNKNOWN,
            key.span(),
            key.text(),
            NearNames.hint(key.text(), ElectrodeNames.all()));
    return false;
  }

  private boolean wirePin(TubeRack.Entry entry, Word key, Node node) {
    int pin = ElectrodeNames.pin(key.text()).orElseThrow();
    String name = ElectrodeNames.pinName(pin);
    if (!Socket.hasPin(type, pin)) {
      String pins = Socket.pinsInWords(type);
      part.report().add(Problem.NO_SUCH_PIN, key.span(), type.name(), name, pins);
      return false;
    }
    if (!entry.wirePin(pin, node, key.span())) {
      part.report().add(Problem.PIN_TWICE, key.span(), name, entry.name());
      return false;
    }
    return true;
  }

  private boolean wireElectrode(TubeRack.Entry entry, Word key, Node node) {
    Optional<Electrode> named = ElectrodeNames.electrode(key.text());
    Electrode electrode = named.orElseThrow();
    if (electrode.isHeater()) {
      if (!type.pins().isEmpty() && type.pinsOf("", electrode).isEmpty()) {
        return notInType(key);
      }
      return wire(entry, key, List.of(new Lead("", electrode, node)));
    }
    List<SectionType> having = sections.having(electrode);
    if (having.isEmpty()) {
      return notInType(key);
    }
    SectionType section = sections.choose(having, key);
    if (section == null) {
      return false;
    }
    entry.names(section.id(), part);
    return wire(entry, key, sections.leads(section, electrode, node));
  }

  private boolean notInType(Word key) {
    part.report().add(Problem.ELECTRODE_NOT_IN_TYPE, key.span(), type.name(), key.text());
    return false;
  }

  private boolean wire(TubeRack.Entry entry, Word key, List<Lead> leads) {
    for (Lead lead : leads) {
      if (!entry.wireLead(lead)) {
        part.report().add(Problem.PIN_TWICE, key.span(), lead.electrode().word(), part.name());
        return false;
      }
    }
    return true;
  }
}
