package railwalk.chart;

import java.util.List;

/**
 * A voltage chart as plain data: what {@link ChartBuilder} hands to the renderers, which draw it
 * and add nothing.
 *
 * @param title of the amplifier, as its netlist gives it
 * @param subject what the document is: "Voltage chart of weirside.cir"
 * @param conditionsLine the conditions in one line, for the head of every sheet
 * @param standingCaution one sentence for the foot of every sheet
 * @param pages in reading order
 * @param figures the same results at full precision, a column for each state: what machines read.
 *     The first is the amplifier as its netlist stands
 */
public record Chart(
    String title,
    String subject,
    String conditionsLine,
    String standingCaution,
    List<Page> pages,
    List<Figures> figures) {
  public Chart {
    pages = List.copyOf(pages);
    figures = List.copyOf(figures);
  }
}
