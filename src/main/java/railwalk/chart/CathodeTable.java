package railwalk.chart;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import railwalk.chart.Table.Use;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.GlowLamp;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.StandIn;
import railwalk.device.CathodeKind;
import railwalk.device.SectionKind;
import railwalk.device.WarmUpLaw;
import railwalk.device.WarmUpTimes;
import railwalk.units.Quantity;

/** When each kind of cathode of an amplifier begins to conduct. */
final class CathodeTable {
  private static final double BEGUN = 0.01;
  private static final double HALF = 0.5;

  private final Circuit circuit;
  private final Wording wording;
  private final WarmUpTimes times = WarmUpTimes.standard();

  /** Cathodes of one kind that take equally long. */
  private record Group(CathodeKind kind, WarmUpLaw law) {}

  CathodeTable(Circuit circuit, Wording wording) {
    this.circuit = circuit;
    this.wording = wording;
  }

  Table table() {
    List<Table.Column> columns =
        List.of(
            new Table.Column("Cathode", Use.WORDS),
            new Table.Column(wording.say("{Tubes}"), Use.WORDS),
            new Table.Column("Share of current", "1 %", Use.FIGURES),
            new Table.Column("Share of current", "50 %", Use.FIGURES),
            new Table.Column("Share of current", "90 %", Use.FIGURES));
    List<Table.Row> rows = new ArrayList<>();
    members()
        .forEach(
            (group, names) -> {
              boolean atOnce = group.law.seconds() == 0;
              String source = times.source(group.kind);
              boolean own = !atOnce && group.law.seconds() != times.seconds(group.kind);
              rows.add(
                  new Table.Row(
                      List.of(
                          words(group.kind),
                          String.join(" ", names),
                          atOnce ? "at once" : after(group, BEGUN),
                          atOnce ? "" : after(group, HALF),
                          atOnce ? "" : after(group, WarmUpLaw.WARM)),
                      own ? "by its type’s data" : source));
            });
    return Table.of("When cathodes conduct", columns, rows);
  }

  private static String after(Group group, double share) {
    return Quantity.fixed(group.law.secondsTo(share), 1) + " s";
  }

  private Map<Group, List<String>> members() {
    Map<Group, List<String>> members = new LinkedHashMap<>();
    for (Element element : circuit.elements()) {
      SectionKind kind = kind(element);
      Bottle bottle = circuit.bottle(element.bottle()).orElse(null);
      if (kind != null && bottle != null) {
        Group group =
            new Group(CathodeKind.of(bottle.type(), kind), times.law(bottle.type(), kind));
        put(members, group, bottle.name());
      } else if (element instanceof Diode || element instanceof GlowLamp) {
        put(members, new Group(CathodeKind.COLD, new WarmUpLaw(0)), element.name());
      } else if (element instanceof StandIn) {
        put(members, new Group(CathodeKind.INDIRECT, times.law()), element.name());
      }
    }
    return members;
  }

  private static void put(Map<Group, List<String>> members, Group group, String name) {
    List<String> names = members.computeIfAbsent(group, g -> new ArrayList<>());
    if (!names.contains(name)) {
      names.add(name);
    }
  }

  private static @Nullable SectionKind kind(Element element) {
    if (element instanceof AmplifierSection section) {
      return section.type().kind();
    }
    if (element instanceof RectifierSection section) {
      return section.type().kind();
    }
    return element instanceof RegulatorSection ? SectionKind.REGULATOR : null;
  }

  private static String words(CathodeKind kind) {
    return switch (kind) {
      case COLD -> "nothing to heat";
      case FILAMENT -> "filament";
      case INDIRECT -> "indirectly heated";
      case RECTIFIER -> "rectifier, indirectly heated";
      case SLOW_RECTIFIER -> "rectifier, slow";
    };
  }
}
