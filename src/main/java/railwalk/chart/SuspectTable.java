package railwalk.chart;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import railwalk.chart.Table.Use;
import railwalk.diagnosis.Diagnosis;
import railwalk.diagnosis.Evidence;
import railwalk.diagnosis.Fault;
import railwalk.diagnosis.Suspect;
import railwalk.units.Quantity;

/**
 * The explanations of a sheet, likeliest first, with a stroke for each tenth of the probability and
 * the readings for and against. Those that no reading tells apart stand together, above the test
 * that does.
 */
final class SuspectTable {
  private static final int MOST_EVIDENCE = 3;
  private static final double STROKE = 0.1;

  /** From here on a suspect is worth the warning of what burnt it. */
  private static final double WORTH_A_WARNING = 0.05;

  private final Diagnosis diagnosis;
  private final FaultWords faults;
  private final BenchWords words;
  private final Set<String> warned = new LinkedHashSet<>();

  SuspectTable(Diagnosis diagnosis, FaultWords faults, BenchWords words) {
    this.diagnosis = diagnosis;
    this.faults = faults;
    this.words = words;
  }

  /** Returns the suspects of each group, groups in the order of their likeliest. */
  static List<List<Suspect>> groups(Diagnosis diagnosis) {
    Map<Integer, List<Suspect>> groups = new LinkedHashMap<>();
    for (Suspect suspect : diagnosis.suspects()) {
      groups.computeIfAbsent(suspect.group(), g -> new ArrayList<>()).add(suspect);
    }
    return List.copyOf(groups.values());
  }

  Table table() {
    List<Table.Group> groups = new ArrayList<>();
    List<Table.Row> alone = new ArrayList<>();
    for (List<Suspect> group : groups(diagnosis)) {
      List<Table.Row> rows = group.stream().map(this::row).toList();
      if (group.size() == 1) {
        alone.addAll(rows);
        continue;
      }
      if (!alone.isEmpty()) {
        groups.add(new Table.Group("", "", alone, List.of()));
        alone.clear();
      }
      groups.add(together(group, rows));
    }
    if (!alone.isEmpty()) {
      groups.add(new Table.Group("", "", alone, List.of()));
    }
    return new Table(
        "",
        List.of(
            new Table.Column("Probability", Use.KEY_FIGURES),
            new Table.Column("", Use.WORDS),
            new Table.Column("What is wrong", Use.WORDS)),
        groups);
  }

  private Table.Group together(List<Suspect> group, List<Table.Row> rows) {
    double sum = 0;
    Set<String> tests = new LinkedHashSet<>();
    List<Suspect> found = group.stream().filter(s -> !s.faults().isEmpty()).toList();
    for (Suspect suspect : group) {
      sum += suspect.probability();
    }
    for (int i = 1; i < found.size(); i++) {
      faults
          .apart(found.get(0).faults().get(0), found.get(i).faults().get(0))
          .ifPresent(tests::add);
    }
    String alike = "No pin or supply node tells these apart. ";
    String test = tests.isEmpty() ? "" : "What does: " + String.join(" ", tests);
    return new Table.Group(
        "Together " + share(sum) + ": these read alike", "", rows, List.of((alike + test).strip()));
  }

  private Table.Row row(Suspect suspect) {
    List<String> hints = new ArrayList<>();
    range(suspect, hints);
    evidence(suspect, hints);
    if (suspect.probability() >= WORTH_A_WARNING || suspect.equals(diagnosis.suspects().get(0))) {
      suspect.fault().flatMap(faults::cause).filter(warned::add).ifPresent(hints::add);
    }
    return new Table.Row(
        List.of(share(suspect.probability()), strokes(suspect.probability()), words.name(suspect)),
        String.join(" ", hints));
  }

  static String share(double probability) {
    return probability < 0.01
        ? "<1 %"
        : probability > 0.99 ? ">99 %" : Quantity.percent(probability);
  }

  private static String strokes(double probability) {
    return "|".repeat((int) Math.round(probability / STROKE));
  }

  private static void range(Suspect suspect, List<String> hints) {
    for (int i = 0; i < suspect.faults().size(); i++) {
      double low = suspect.lows().get(i);
      double high = suspect.highs().get(i);
      if (!Double.isNaN(low) && high > low) {
        Fault fault = suspect.faults().get(i);
        hints.add(
            "Likely from "
                + FaultWords.figure(fault, low)
                + " to "
                + FaultWords.figure(fault, high)
                + ".");
      }
    }
  }

  private void evidence(Suspect suspect, List<String> hints) {
    List<Evidence> supporting = first(suspect.supporting());
    if (!supporting.isEmpty()) {
      hints.add(
          "For: "
              + supporting.stream().map(words::speaksFor).collect(Collectors.joining("; "))
              + ".");
    }
    List<Evidence> against = first(suspect.against());
    if (!against.isEmpty()) {
      hints.add(
          "Against: "
              + against.stream()
                  .map(e -> words.speaksAgainst(e, suspect))
                  .collect(Collectors.joining("; "))
              + ".");
    }
  }

  private static List<Evidence> first(List<Evidence> all) {
    return all.subList(0, Math.min(MOST_EVIDENCE, all.size()));
  }
}
