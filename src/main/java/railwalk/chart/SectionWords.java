package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.solve.SectionPoint;
import railwalk.units.Quantity;

/** The lines below a tube's rows: what each of its sections draws and stands. */
final class SectionWords {
  private final Column column;
  private final Wording wording;

  SectionWords(Column column, Wording wording) {
    this.column = column;
    this.wording = wording;
  }

  /** Returns a line for each section in the socket. */
  List<String> of(Socket socket) {
    List<String> lines = new ArrayList<>();
    for (AmplifierSection section : column.circuit().elements(AmplifierSection.class)) {
      if (section.bottle().equals(socket.name())) {
        lines.add(line(section));
      }
    }
    for (RegulatorSection section : column.circuit().elements(RegulatorSection.class)) {
      if (section.bottle().equals(socket.name())) {
        lines.add(line(section));
      }
    }
    return lines;
  }

  private String line(AmplifierSection section) {
    SectionPoint at = column.point().at(section);
    if (column.map().idleSections().contains(section.name())) {
      return letter(section.section())
          + wording.say("no current: {plate} or cathode leads nowhere");
    }
    List<String> parts = new ArrayList<>();
    parts.add(
        wording.say("{plate} ")
            + Quantity.amps(at.plateAmps())
            + ", "
            + Share.of(at.plateWatts(), section.type().ratings().plateWattsMax()));
    if (!Double.isNaN(at.screenAmps())) {
      parts.add(
          "screen "
              + Quantity.amps(at.screenAmps())
              + ", "
              + Share.of(at.screenWatts(), section.type().ratings().screenWattsMax()));
    }
    parts.add(
        wording.say("to cathode: {plate} ")
            + Quantity.volts(at.plateVolts())
            + ", grid "
            + Quantity.volts(at.gridVolts()));
    String system = section.type().ratings().system();
    if (!system.isEmpty()) {
      parts.add(system + " ratings");
    }
    return letter(section.section()) + String.join("; ", parts);
  }

  private String line(RegulatorSection section) {
    SectionPoint at = column.point().at(section);
    return letter(section.section())
        + (column.point().lit(section.name())
            ? "lit at " + Quantity.volts(at.plateVolts()) + ", " + Quantity.amps(at.plateAmps())
            : "dark: it has not struck")
        + "; regulates from "
        + Quantity.amps(section.law().minimumAmps())
        + " to "
        + Quantity.amps(section.law().maximumAmps());
  }

  private static String letter(String section) {
    return section.isEmpty() ? "" : section + ": ";
  }
}
