package railwalk.chart;

import java.util.List;

/**
 * How the stages of one amplifier idle with one type or another in their sockets.
 *
 * @param netlist its file's name
 * @param sections for each type in turn, the one the netlist has first
 */
public record StagesIdle(String netlist, List<StageIdle> sections) {
  public StagesIdle {
    sections = List.copyOf(sections);
  }
}
