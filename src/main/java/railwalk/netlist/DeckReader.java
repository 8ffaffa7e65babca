package railwalk.netlist;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import railwalk.source.NearNames;
import railwalk.source.SourceSpan;
import railwalk.source.SourceText;

/** Sorts the lines of a netlist and its includes into a {@link Deck}. */
final class DeckReader {
  private static final Pattern END =
      Pattern.compile("\\s*\\.end\\s*(;.*)?", Pattern.CASE_INSENSITIVE);
  private static final int DEEPEST_INCLUDE = 16;
  private static final int MOST_FILES = 200;

  private static final Set<String> SETTINGS =
      Set.of(".line", ".mains", ".transformer", ".meter", ".state", ".spread", ".ref", ".words");

  /** Dot words with a meaning here, for suggestions. */
  private static final Set<String> MEANT =
      Set.of(
          ".line",
          ".mains",
          ".transformer",
          ".meter",
          ".state",
          ".spread",
          ".ref",
          ".words",
          ".param",
          ".model",
          ".subckt",
          ".ends",
          ".include",
          ".order",
          ".tube",
          ".tubes");

  /** Dot words of SPICE-style netlists that ask for an analysis or an output: passed over. */
  private static final Set<String> ANALYSIS =
      Set.of(
          ".ac",
          ".dc",
          ".op",
          ".tran",
          ".tf",
          ".four",
          ".noise",
          ".disto",
          ".pz",
          ".sens",
          ".plot",
          ".print",
          ".probe",
          ".save",
          ".option",
          ".options",
          ".opt",
          ".temp",
          ".nodeset",
          ".ic",
          ".measure",
          ".meas",
          ".width",
          ".step",
          ".func",
          ".title",
          ".wave",
          ".net",
          ".alter");

  private final Includes includes;
  private final Report report;

  private final List<Card> parts = new ArrayList<>();
  private final List<Card> settings = new ArrayList<>();
  private final List<Card> parameters = new ArrayList<>();
  private final Map<String, Subcircuit> subcircuits = new LinkedHashMap<>();
  private final Map<String, Card> models = new HashMap<>();
  private final Map<String, Card> orders = new HashMap<>();
  private final List<Deck.TypeSource> types = new ArrayList<>();
  private final List<String> globals = new ArrayList<>();
  private final List<SourceText> files = new ArrayList<>();
  private final List<SourceFile> open = new ArrayList<>();
  private final List<Subcircuit> nesting = new ArrayList<>();
  private final Map<String, SourceSpan> passedOver = new LinkedHashMap<>();
  private @Nullable Card commands;

  private DeckReader(Includes includes, Report report) {
    this.includes = includes;
    this.report = report;
  }

  /** Returns the deck that starts with {@code main}. */
  static Deck read(SourceFile main, Includes includes, Report report) {
    return new DeckReader(includes, report).deck(main);
  }

  private Deck deck(SourceFile main) {
    String firstLine = main.text().line(1).strip();
    String title = firstLine.startsWith("*") ? firstLine.substring(1).strip() : firstLine;
    if (TitleLine.readsLikeElement(firstLine)) {
      int column = main.text().line(1).indexOf(firstLine) + 1;
      report.add(
          Problem.TITLE_LIKE_ELEMENT, new SourceSpan(main.text(), 1, column, firstLine.length()));
    }
    take(main, 2);
    for (Subcircuit unclosed : nesting) {
      report.add(Problem.SUBCKT_WITHOUT_ENDS, unclosed.name().span(), unclosed.name().text());
    }
    if (commands != null) {
      report.add(Problem.COMMANDS_WITHOUT_END, commands.head().span());
    }
    if (!passedOver.isEmpty()) {
      report.add(
          Problem.DOT_LINES_PASSED_OVER,
          passedOver.values().iterator().next(),
          String.join(", ", passedOver.keySet()));
    }
    return new Deck(
        title, parts, settings, parameters, subcircuits, models, orders, types, globals, files);
  }

  private void take(SourceFile file, int firstLine) {
    SourceText text = file.text();
    files.add(text);
    open.add(file);
    int end = firstLine;
    while (end <= text.lines().size() && !END.matcher(text.line(end)).matches()) {
      end++;
    }
    if (firstLine <= text.lines().size()) {
      LineParser.parse(text, firstLine, end).forEach(card -> take(card, file));
    }
    open.remove(open.size() - 1);
  }

  private void take(Card card, SourceFile file) {
    if (commands != null) {
      if (card.isDot(".endc")) {
        commands = null;
      }
      return;
    }
    if (!card.isDot()) {
      if (nesting.isEmpty()) {
        parts.add(card);
      } else {
        nesting.get(nesting.size() - 1).cards().add(card);
      }
      return;
    }
    if (card.flaw() != null) {
      report.add(card.flaw());
    }
    dot(card, file);
  }

  private void dot(Card card, SourceFile file) {
    String word = card.head().text().toLowerCase(Locale.ROOT);
    switch (word) {
      case ".include", ".inc", ".lib" -> include(card, file);
      case ".subckt" -> subcircuit(card);
      case ".ends", ".eom" -> ends(card);
      case ".param", ".params" -> {
        (nesting.isEmpty() ? parameters : nesting.get(nesting.size() - 1).cards()).add(card);
      }
      case ".model" -> named(card, models);
      case ".order" -> named(card, orders);
      case ".global" -> card.words().forEach(w -> globals.add(w.text().toLowerCase(Locale.ROOT)));
      case ".tube" -> types.add(new Deck.TypeSource.Line(card));
      case ".tubes" -> include(card, file);
      case ".control" -> {
        commands = card;
        passedOver.putIfAbsent(word, card.head().span());
      }
      default -> {
        if (SETTINGS.contains(word)) {
          settings.add(card);
        } else {
          passOver(word, card.head().span());
        }
      }
    }
  }

  private void passOver(String word, SourceSpan span) {
    List<String> near = ANALYSIS.contains(word) ? List.of() : NearNames.near(word, MEANT);
    if (near.isEmpty()) {
      passedOver.putIfAbsent(word, span);
    } else {
      report.add(Problem.DOT_WORD_MISTYPED, span, word, NearNames.question(near));
    }
  }

  private void named(Card card, Map<String, Card> cards) {
    String name = firstName(card);
    if (name.isEmpty()) {
      report.add(Problem.DOT_LINE_NAMELESS, card.head().span(), card.head().text());
      return;
    }
    Card other = cards.putIfAbsent(name, card);
    if (other != null && card.isDot(".order")) {
      report.add(
          Problem.SETTING_TWICE,
          card.head().span(),
          card.head().text() + " " + name,
          other.head().span().line());
    }
  }

  private static String firstName(Card card) {
    return card.words().isEmpty() ? "" : card.words().get(0).text().toLowerCase(Locale.ROOT);
  }

  private void subcircuit(Card card) {
    if (card.words().isEmpty()) {
      report.add(Problem.DOT_LINE_NAMELESS, card.head().span(), ".subckt");
    }
    Subcircuit subcircuit = Subcircuit.of(card);
    nesting.add(subcircuit);
    Subcircuit other = subcircuits.putIfAbsent(key(subcircuit.name()), subcircuit);
    if (other != null) {
      report.add(
          Problem.SUBCKT_TWICE,
          subcircuit.name().span(),
          subcircuit.name().text(),
          other.name().span().line());
    }
  }

  private void ends(Card card) {
    if (nesting.isEmpty()) {
      report.add(Problem.ENDS_WITHOUT_SUBCKT, card.head().span());
      return;
    }
    nesting.remove(nesting.size() - 1);
  }

  private static String key(Word name) {
    return name.text().toLowerCase(Locale.ROOT);
  }

  private void include(Card card, SourceFile file) {
    List<Word> words = card.words();
    if (words.isEmpty()) {
      report.add(Problem.DOT_LINE_NAMELESS, card.head().span(), card.head().text());
      return;
    }
    Word first = words.get(0);
    boolean whole = first.form() != Word.Form.PLAIN || card.isDot(".lib");
    String written =
        whole ? first.text() : words.stream().map(Word::text).collect(Collectors.joining(" "));
    Includes.Outcome outcome = includes.find(written, file);
    if (outcome instanceof Includes.Outcome.Found found) {
      if (card.isDot(".tubes")) {
        files.add(found.file().text());
        types.add(new Deck.TypeSource.File(found.file().text(), first));
        return;
      }
      boolean circle = open.stream().anyMatch(o -> samePath(o, found.file()));
      if (circle || open.size() > DEEPEST_INCLUDE || files.size() > MOST_FILES) {
        report.add(Problem.INCLUDE_CIRCLE, first.span(), written);
      } else {
        take(found.file(), 1);
      }
    } else if (outcome instanceof Includes.Outcome.Missing) {
      report.add(Problem.INCLUDE_MISSING, first.span(), written);
    } else if (outcome instanceof Includes.Outcome.Refused) {
      report.add(Problem.INCLUDE_REFUSED, first.span(), written);
    } else if (outcome instanceof Includes.Outcome.Unreadable unreadable) {
      report.add(Problem.INCLUDE_UNREADABLE, first.span(), written, unreadable.reason());
    }
  }

  private static boolean samePath(SourceFile one, SourceFile other) {
    return one.path() != null && one.path().equals(other.path());
  }
}
