package railwalk.netlist;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.ControlledSource;
import railwalk.device.ElectrodeNames;
import railwalk.device.GasLaw;
import railwalk.device.TubeType;
import railwalk.source.NearNames;

/** Sends each line of a part to the reader of its kind. */
final class PartLines {
  private static final String UNKNOWN_TYPE = "UNKNOWN";
  private static final String DRAWS = "draws";

  /** Stands before the parameters of a sub-circuit in some netlists. */
  private static final String PARAMS = "params:";

  private final Draft draft;

  PartLines(Draft draft) {
    this.draft = draft;
  }

  /** Reads all {@code cards} in {@code frame}. */
  void read(List<Card> cards, Frame frame) {
    for (Card card : cards) {
      if (!draft.nextCard(card.head().span())) {
        return;
      }
      read(card, frame);
    }
  }

  /** Returns the names of lines that are neither X lines nor tubes, in upper case. */
  Set<String> plainNames(List<Card> cards) {
    Set<String> names = new HashSet<>();
    for (Card card : cards) {
      String name = card.head().text().toUpperCase(Locale.ROOT);
      if (!name.startsWith("X") && !card.isDot() && !isTubeWithoutX(card)) {
        names.add(name);
      }
    }
    return names;
  }

  private void read(Card card, Frame frame) {
    if (card.flaw() != null) {
      draft.report().add(card.flaw());
      return;
    }
    if (card.isDot()) {
      return;
    }
    String name = card.head().text();
    char letter = name.isEmpty() ? ' ' : Character.toUpperCase(name.charAt(0));
    if (misshapen(card, letter)) {
      return;
    }
    if (letter == 'X') {
      xLine(card, frame);
      return;
    }
    int keyword = keyword(card.words());
    if (keyword >= 2) {
      Switchgear.read(new PartCard(card, frame, draft), keyword);
      return;
    }
    if (isTubeWithoutX(card)) {
      keyed(card, frame);
      return;
    }
    PartCard part = new PartCard(card, frame, draft);
    switch (letter) {
      case 'R' -> PassiveParts.resistor(part);
      case 'C' -> PassiveParts.capacitor(part);
      case 'L' -> PassiveParts.coil(part);
      case 'K' -> PassiveParts.coupling(part);
      case 'I' -> PassiveParts.currentSource(part);
      case 'V' -> SourceParts.voltageSource(part);
      case 'D' -> DiodeReader.diode(part);
      case 'E' -> SourceParts.controlledSource(part, ControlledSource.Kind.VOLTS_BY_VOLTS);
      case 'F' -> SourceParts.controlledSource(part, ControlledSource.Kind.AMPS_BY_AMPS);
      case 'G' -> SourceParts.controlledSource(part, ControlledSource.Kind.AMPS_BY_VOLTS);
      case 'H' -> SourceParts.controlledSource(part, ControlledSource.Kind.VOLTS_BY_AMPS);
      default -> unknownPart(card, letter);
    }
  }

  /** Reports a comma between words, or parentheses where only words may stand. */
  private boolean misshapen(Card card, char letter) {
    boolean lists = "EFGH".indexOf(letter) >= 0;
    int nodes = letter == 'X' ? card.fields().size() : 2;
    for (int i = 0; i < card.fields().size(); i++) {
      Field field = card.fields().get(i);
      if (field instanceof Field.Bare bare && bare.afterComma()) {
        draft.report().add(Problem.COMMA_BETWEEN_WORDS, bare.word().span(), bare.word().text());
        return true;
      }
      if (!(field instanceof Field.Call call) || lists) {
        continue;
      }
      if (i < nodes) {
        draft.report().add(Problem.BAD_NODE_NAME, call.name().span(), call.name().text() + "()");
        return true;
      }
      if (!Signals.isWave(call.name())) {
        draft.report().add(Problem.STRAY_PARENTHESES, call.name().span(), call.name().text());
        return true;
      }
    }
    return false;
  }

  private void unknownPart(Card card, char letter) {
    Word head = card.head();
    Problem problem =
        switch (letter) {
          case 'Q', 'J', 'M', 'Z' -> Problem.TRANSISTOR;
          case 'P', 'S', 'N' -> Problem.KEYWORD_MISSING;
          default -> Problem.UNKNOWN_PART;
        };
    draft.report().add(problem, head.span(), head.text());
  }

  /** Returns whether a line such as {@code V1 12AX7 1=p1} is a tube though it lacks the X. */
  private boolean isTubeWithoutX(Card card) {
    List<Word> words = wordsBeforeDraws(card);
    if (!card.head().text().toUpperCase(Locale.ROOT).startsWith("V") || words.size() != 1) {
      return false;
    }
    boolean keyed =
        card.options().stream()
            .anyMatch(
                option ->
                    ElectrodeNames.pin(option.key().text()).isPresent()
                        || ElectrodeNames.electrode(option.key().text()).isPresent());
    return keyed || draft.catalogue().find(words.get(0).text()).isPresent();
  }

  private static List<Word> wordsBeforeDraws(Card card) {
    List<Word> words = card.words();
    for (int i = 0; i < words.size(); i++) {
      if (words.get(i).is(DRAWS)) {
        return words.subList(0, i);
      }
    }
    return words;
  }

  private static int keyword(List<Word> words) {
    for (int i = 0; i < words.size(); i++) {
      Word word = words.get(i);
      if (Switchgear.KEYWORDS.stream().anyMatch(word::is)) {
        return i;
      }
    }
    return -1;
  }

  private void xLine(Card written, Frame frame) {
    Card card = written.without(PARAMS);
    if (wordsBeforeDraws(card).size() == 1) {
      keyed(card, frame);
      return;
    }
    List<Word> words = card.words();
    if (words.isEmpty()) {
      draft.report().add(Problem.X_LINE_EMPTY, card.head().span(), card.head().text());
      return;
    }
    String chartName = ChartName.of(card.head(), frame, draft.report());
    int keyword = keyword(words);
    if (keyword >= 0) {
      Switchgear.read(new PartCard(card, frame, draft, chartName), keyword);
      return;
    }
    byLastWord(card, frame, chartName);
  }

  private void byLastWord(Card card, Frame frame, String chartName) {
    PartCard part = new PartCard(card, frame, draft, chartName);
    List<Word> words = part.words();
    Word last = words.remove(words.size() - 1);
    if (words.size() > 1 && words.get(words.size() - 1).is(last.text())) {
      words.remove(words.size() - 1);
    }
    Subcircuit subcircuit = subcircuit(last);
    Optional<TubeType> type = draft.catalogue().find(last.text());
    boolean modelOfType = subcircuit != null && ElectrodeOrder.looksLikeTube(subcircuit);
    if (type.isPresent()
        && (subcircuit == null || GivenTypes.isExactly(type.get(), last.text()) || modelOfType)) {
      TubeByPosition.read(part, type.get(), last);
      return;
    }
    if (subcircuit != null) {
      new Expansion(draft, this).expand(card, frame, words, subcircuit);
      return;
    }
    GasLaw neon = Switchgear.neonLaw(last.text());
    if (neon != null) {
      Switchgear.neon(part, last, neon);
      return;
    }
    unknownType(last);
  }

  private @Nullable Subcircuit subcircuit(Word name) {
    return draft.deck().subcircuits().get(name.text().toLowerCase(Locale.ROOT));
  }

  /** Reads a line of one bare word: a type with pins or electrodes by key. */
  private void keyed(Card card, Frame frame) {
    Word typeWord = card.words().get(0);
    String chartName = ChartName.of(card.head(), frame, draft.report());
    boolean draws = card.words().stream().anyMatch(word -> word.is(DRAWS));
    if (typeWord.is(UNKNOWN_TYPE) || draws) {
      StandInReader.read(new PartCard(card, frame, draft, chartName), card);
      return;
    }
    Optional<TubeType> type = draft.catalogue().find(typeWord.text());
    if (type.isPresent()) {
      TubeByKeys.read(new PartCard(card, frame, draft, chartName), type.get());
      return;
    }
    Subcircuit subcircuit = subcircuit(typeWord);
    if (subcircuit != null) {
      new Expansion(draft, this).expand(card, frame, List.of(), subcircuit);
      return;
    }
    unknownType(typeWord);
  }

  private void unknownType(Word word) {
    if (draft.catalogue() instanceof GivenTypes given && given.isGiven(word.text())) {
      return;
    }
    Set<String> names = draft.deck().subcircuits().keySet();
    List<String> near = new ArrayList<>(draft.catalogue().near(word.text()));
    near.addAll(NearNames.near(word.text(), names));
    draft
        .report()
        .add(
            Problem.UNKNOWN_TYPE,
            word.span(),
            word.text(),
            NearNames.question(near.stream().distinct().toList()));
  }
}
