package railwalk.netlist;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Line;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.State;
import railwalk.circuit.Winding;
import railwalk.device.Catalogue;
import railwalk.source.NearNames;
import railwalk.source.SourceSpan;

/** Makes a circuit of a sorted deck. */
final class CircuitAssembler {
  private final Deck deck;
  private final Report report;
  private final Draft draft;
  private final Frame top;
  private final Settings settings;

  private CircuitAssembler(
      Deck deck, Catalogue catalogue, boolean chassisIsReference, Report report) {
    this.deck = deck;
    this.report = report;
    this.draft = new Draft(catalogue, deck, chassisIsReference, report);
    PartLines lines = new PartLines(draft);
    this.top =
        new Frame("", Map.of(), draft.globalScope(), lines.plainNames(deck.parts()), List.of());
    this.settings = new Settings(draft, top);
    for (Card card : deck.parameters()) {
      card.words().forEach(word -> report.add(Problem.PARAMETER_SHAPE, word.span(), word.text()));
      card.options()
          .forEach(o -> draft.globalScope().define(o.key().text(), o.value(), draft.globalScope()));
    }
    settings.read(deck.settings());
    settings.check(deck.orders().values());
    lines.read(deck.parts(), top);
    draft.tubes().fit();
    draft.runChecks();
  }

  /**
   * What comes out.
   *
   * @param circuit empty when an error stands against it
   * @param report what was said before, and what there is to say about the parts
   */
  record Assembled(Optional<Circuit> circuit, Origins origins, Report report) {}

  /**
   * Returns the circuit of {@code deck}. The chassis is tried as a node of its own first: where no
   * part joins it to the reference and there is no {@code .ref}, it is the reference.
   *
   * @param said what was said about the deck already
   */
  static Assembled assemble(Deck deck, Catalogue catalogue, Report said) {
    CircuitAssembler apart = new CircuitAssembler(deck, catalogue, false, said.copy());
    CircuitAssembler chosen =
        apart.chassisIsApart() ? apart : new CircuitAssembler(deck, catalogue, true, said.copy());
    return chosen.finish();
  }

  /** Returns whether the chassis is a node of its own, or never named. */
  private boolean chassisIsApart() {
    Node chassis = draft.nodes().chassis().orElse(null);
    if (chassis == null || draft.referenceWord() != null) {
      return true;
    }
    return draft.elements().stream()
        .filter(e -> !isSection(e) && e.nodes().contains(chassis))
        .anyMatch(e -> e.nodes().stream().anyMatch(draft.nodes()::isZero));
  }

  private static boolean isSection(Element element) {
    return element instanceof AmplifierSection
        || element instanceof RectifierSection
        || element instanceof RegulatorSection;
  }

  private Assembled finish() {
    Node reference = reference();
    StateReader stateReader = new StateReader(draft, top);
    List<State> states = stateReader.read(deck.settings());
    new StructureCheck(draft).run(reference);
    if (draft.elements().isEmpty() && !report.hasErrors()) {
      report.add(Problem.NO_PARTS, null);
    }
    boolean windings = draft.elements().stream().anyMatch(Winding.class::isInstance);
    if (windings && !draft.line().stated()) {
      report.add(Problem.LINE_NOT_STATED, null, Math.round(line().hertz()));
    }
    Origins origins =
        new Origins(
            draft.spans(),
            draft.nodes().spans(),
            draft.tubes().spans(),
            stateReader.spans(),
            draft.unknowns());
    if (report.hasErrors()) {
      return new Assembled(Optional.empty(), origins, report);
    }
    Circuit circuit =
        new Circuit(
            deck.title(),
            draft.nodes().nodes(),
            reference,
            draft.elements(),
            draft.tubes().bottles(),
            List.copyOf(draft.transformers().values()),
            line(),
            settings.meter(),
            settings.spread(),
            states,
            settings.words());
    return new Assembled(Optional.of(circuit), origins, report);
  }

  private Line line() {
    Line stated = draft.line();
    return stated.stated() || Double.isNaN(draft.sineHertz())
        ? stated
        : new Line(stated.volts(), draft.sineHertz(), stated.designVolts());
  }

  private Node reference() {
    Word named = draft.referenceWord();
    if (named == null) {
      return draft.nodes().reference();
    }
    Node node = draft.nodes().find(named.text()).orElse(null);
    if (node == null) {
      SourceSpan span = named.span();
      List<String> names = draft.nodes().nodes().stream().map(Node::name).toList();
      report.add(Problem.NO_SUCH_NODE, span, named.text(), NearNames.hint(named.text(), names));
      return draft.nodes().reference();
    }
    return node;
  }
}
