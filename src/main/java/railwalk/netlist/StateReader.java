package railwalk.netlist;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Bottle;
import railwalk.circuit.Element;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.StandIn;
import railwalk.circuit.State;
import railwalk.circuit.StateChange;
import railwalk.circuit.Switch;
import railwalk.device.TubeType;
import railwalk.source.NearNames;
import railwalk.source.SourceSpan;
import railwalk.units.Measure;

/** Reads {@code .state} lines, when all parts are known. */
final class StateReader {
  private final Draft draft;
  private final Frame frame;
  private final Map<String, SourceSpan> spans = new HashMap<>();

  StateReader(Draft draft, Frame frame) {
    this.draft = draft;
    this.frame = frame;
  }

  /** Returns the states among the settings, in file order. */
  List<State> read(List<Card> cards) {
    List<State> states = new ArrayList<>();
    for (Card card : cards) {
      if (!card.isDot(".state") || card.flaw() != null) {
        continue;
      }
      String name = card.words().stream().map(Word::text).collect(Collectors.joining(" "));
      if (name.isEmpty()) {
        draft
            .report()
            .add(
                Problem.SETTING_EMPTY,
                card.head().span(),
                ".state",
                "a name: .state standby S1=open");
        continue;
      }
      SourceSpan other = spans.putIfAbsent(name.toUpperCase(Locale.ROOT), card.head().span());
      if (other != null) {
        draft.nameTwice(name, card.head().span(), other);
      }
      List<StateChange> changes = new ArrayList<>();
      for (Field.Option option : card.options()) {
        StateChange change = change(option, card);
        if (change != null) {
          changes.add(change);
        }
      }
      if (card.options().isEmpty()) {
        draft.report().add(Problem.STATE_EMPTY, card.head().span(), name);
      }
      states.add(new State(name, changes));
    }
    return states;
  }

  /** Returns where states stand, by name in upper case. */
  Map<String, SourceSpan> spans() {
    return spans;
  }

  private @Nullable StateChange change(Field.Option option, Card card) {
    Word key = option.key();
    Word value = option.value();
    if (key.is("line") || key.is("mains")) {
      double volts = new PartCard(card, frame, draft).readPositive(value, Measure.VOLTAGE);
      if (!draft.line().stated()) {
        draft.report().add(Problem.STATE_LINE, key.span());
      } else if (volts == 0) {
        draft.report().add(Problem.LINE_RANGE, value.span(), value.text(), "volts");
      }
      return new StateChange.LineVolts(volts);
    }
    Optional<Bottle> bottle =
        draft.tubes().bottles().stream().filter(b -> names(key, b.name())).findFirst();
    if (bottle.isPresent()) {
      return tube(bottle.get(), value);
    }
    Element element = element(key);
    if (element instanceof Switch contact) {
      OptionalInt position = Switchgear.position(value, contact.poles().size());
      if (position.isEmpty()) {
        draft
            .report()
            .add(
                Problem.SWITCH_POSITION,
                value.span(),
                value.text(),
                contact.name(),
                contact.poles().size());
        return null;
      }
      return new StateChange.SwitchPosition(contact.name(), position.getAsInt());
    }
    if (element instanceof Potentiometer pot) {
      double share = new PartCard(card, frame, draft).read(value, Measure.SHARE);
      if (share < 0 || share > 1) {
        draft.report().add(Problem.POT_SET_RANGE, value.span(), value.text());
      }
      return new StateChange.ControlSet(pot.name(), share);
    }
    if (element instanceof StandIn && value.is("out")) {
      return new StateChange.TubeOut(element.name());
    }
    if (element != null) {
      draft.report().add(Problem.STATE_OF_PART, key.span(), element.name());
    } else {
      draft.report().add(Problem.NO_SUCH_PART, key.span(), key.text(), nearHint(key));
    }
    return null;
  }

  private @Nullable Element element(Word key) {
    return draft.element(key.text()).or(() -> draft.element(withoutX(key.text()))).orElse(null);
  }

  private static boolean names(Word key, String name) {
    return key.is(name) || withoutX(key.text()).equalsIgnoreCase(name);
  }

  private static String withoutX(String name) {
    return name.toUpperCase(Locale.ROOT).startsWith("X") ? name.substring(1) : name;
  }

  private String nearHint(Word key) {
    Stream<String> settable =
        draft.elements().stream()
            .filter(e -> e instanceof Switch || e instanceof Potentiometer)
            .map(Element::name);
    Stream<String> bottles = draft.tubes().bottles().stream().map(Bottle::name);
    List<String> names = Stream.concat(bottles, settable).toList();
    String near = NearNames.hint(key.text(), names);
    return near.isEmpty() && !names.isEmpty() ? "there are " + String.join(", ", names) : near;
  }

  private @Nullable StateChange tube(Bottle bottle, Word value) {
    if (value.is("out")) {
      return new StateChange.TubeOut(bottle.name());
    }
    if (value.is("in")) {
      return new StateChange.TubeFitted(bottle.name(), bottle.type());
    }
    Optional<TubeType> type = draft.catalogue().find(value.text());
    if (type.isEmpty()) {
      if (draft.catalogue() instanceof GivenTypes given && given.isGiven(value.text())) {
        return null;
      }
      draft
          .report()
          .add(
              Problem.UNKNOWN_TYPE,
              value.span(),
              value.text(),
              NearNames.question(draft.catalogue().near(value.text())));
      return null;
    }
    String family = type.get().family();
    String socket = bottle.type().family();
    if (!family.isEmpty() && !socket.isEmpty() && !family.equals(socket)) {
      draft
          .report()
          .add(
              Problem.STATE_SOCKET, value.span(), type.get().name(), family, bottle.name(), socket);
      return null;
    }
    TubeType.LookAlike other = lookAlike(bottle.type(), type.get());
    other = other == null ? lookAlike(type.get(), bottle.type()) : other;
    if (other != null) {
      draft
          .report()
          .add(
              Problem.STATE_LOOK_ALIKE,
              value.span(),
              type.get().name(),
              bottle.type().name(),
              other.type(),
              other.difference());
    }
    return new StateChange.TubeFitted(bottle.name(), type.get());
  }

  /** Returns what the data of {@code type} say of {@code other}; null when nothing. */
  private static TubeType.@Nullable LookAlike lookAlike(TubeType type, TubeType other) {
    for (TubeType.LookAlike known : type.care().lookAlikes()) {
      if (GivenTypes.isExactly(other, known.type())) {
        return known;
      }
    }
    return null;
  }
}
