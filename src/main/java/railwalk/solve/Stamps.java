package railwalk.solve;

import java.util.Arrays;

/**
 * The equations of a network as they are written down part by part: a list of matrix entries (row,
 * column, value), later entries at the same place adding up, and the right-hand side. Row or column
 * −1 is the reference node and counts for nothing, but keeps its number, so that two networks of
 * one topology give lists of one shape.
 */
final class Stamps {
  private final IntList rows = new IntList();
  private final IntList columns = new IntList();
  private double[] values = new double[64];
  private double[] rightHandSide = new double[32];
  private int size;

  /** Starts over, for unknowns 0 to {@code nodeCount} − 1 being node volts. */
  void start(int nodeCount) {
    rows.clear();
    columns.clear();
    size = nodeCount;
    Arrays.fill(rightHandSide, 0);
  }

  /** Returns the number of an unknown of its own: a current. */
  int newBranch() {
    return size++;
  }

  /** Returns how many unknowns there are. */
  int size() {
    return size;
  }

  /** Adds an entry and returns its number. */
  int entry(int row, int column, double value) {
    int number = rows.size();
    if (number == values.length) {
      values = Arrays.copyOf(values, 2 * number);
    }
    rows.add(row);
    columns.add(column);
    values[number] = value;
    return number;
  }

  /** Adds to the right-hand side of {@code row}. */
  void source(int row, double value) {
    if (row < 0) {
      return;
    }
    if (row >= rightHandSide.length) {
      rightHandSide = Arrays.copyOf(rightHandSide, 2 * row);
    }
    rightHandSide[row] += value;
  }

  /**
   * Writes a conductance between two nodes; returns the number of the first of its four entries.
   */
  int conductance(int a, int b, double siemens) {
    int first = entry(a, a, siemens);
    entry(a, b, -siemens);
    entry(b, a, -siemens);
    entry(b, b, siemens);
    return first;
  }

  /**
   * Writes a part whose current is unknown {@code branch}: {@code va − vb − ohms · i = volts}, i
   * flowing from a through the part to b.
   */
  void branch(int branch, int a, int b, double ohms, double volts) {
    entry(a, branch, 1);
    entry(b, branch, -1);
    entry(branch, a, 1);
    entry(branch, b, -1);
    entry(branch, branch, -ohms);
    source(branch, volts);
  }

  int count() {
    return rows.size();
  }

  int row(int number) {
    return rows.get(number);
  }

  int column(int number) {
    return columns.get(number);
  }

  double value(int number) {
    return values[number];
  }

  /** Returns the right-hand side, one figure for each unknown. */
  double[] rightHandSide() {
    return Arrays.copyOf(rightHandSide, size);
  }
}
