package railwalk.netlist;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.source.Diagnostic;
import railwalk.source.SourceSpan;
import railwalk.source.SourceText;

/**
 * All that is said about one netlist. The same thing is said once, however often a sub-circuit is
 * used; assumptions that repeat from part to part are gathered into one note.
 */
final class Report {
  private static final int MOST_NAMES = 8;

  private final Set<Diagnostic> said = new LinkedHashSet<>();
  private final Map<Problem, Gathered> gathered = new LinkedHashMap<>();

  private record Gathered(SourceSpan first, Set<String> names) {}

  /** Returns a report that goes on from here by itself. */
  Report copy() {
    Report copy = new Report();
    copy.said.addAll(said);
    gathered.forEach(
        (problem, notes) ->
            copy.gathered.put(
                problem, new Gathered(notes.first(), new LinkedHashSet<>(notes.names()))));
    return copy;
  }

  /** Says {@code problem} about the place; {@code words} fill its sentence. */
  void add(Problem problem, @Nullable SourceSpan span, Object... words) {
    said.add(problem.at(span, words));
  }

  /** Passes on what the parser found. */
  void add(Diagnostic diagnostic) {
    said.add(diagnostic);
  }

  /** Adds {@code name} to the one note of this kind, which points at its first place. */
  void gather(Problem problem, SourceSpan span, String name) {
    gathered
        .computeIfAbsent(problem, key -> new Gathered(span, new LinkedHashSet<>()))
        .names()
        .add(name);
  }

  /** Returns whether an error is among what was said. */
  boolean hasErrors() {
    return said.stream().anyMatch(Diagnostic::isError);
  }

  /** Returns everything said, file after file as {@code files} lists them, in file order. */
  List<Diagnostic> inOrder(List<SourceText> files) {
    List<Diagnostic> all = new ArrayList<>(said);
    gathered.forEach((problem, notes) -> all.add(problem.at(notes.first(), list(notes.names()))));
    all.sort(
        Comparator.<Diagnostic>comparingInt(d -> place(files, d.span()))
            .thenComparing(Diagnostic.IN_FILE_ORDER));
    return all;
  }

  private static int place(List<SourceText> files, @Nullable SourceSpan span) {
    return span == null ? -1 : files.indexOf(span.text());
  }

  private static String list(Set<String> names) {
    List<String> shown = names.stream().limit(MOST_NAMES).toList();
    String more = names.size() > MOST_NAMES ? " and " + (names.size() - MOST_NAMES) + " more" : "";
    return String.join(", ", shown) + more;
  }
}
