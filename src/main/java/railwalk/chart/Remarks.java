package railwalk.chart;

import java.util.List;

/** A list of things to know, most urgent first. */
public record Remarks(List<Remark> remarks) implements Block {
  /**
   * One of them.
   *
   * @param mark a word that says how much it matters; may be empty
   * @param place where in the netlist; may be empty
   * @param text a sentence
   * @param hint what to do; may be empty
   */
  public record Remark(String mark, String place, String text, String hint) {}

  public Remarks {
    remarks = List.copyOf(remarks);
  }

  @Override
  public void accept(BlockVisitor visitor) {
    visitor.visit(this);
  }
}
