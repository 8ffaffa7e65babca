package railwalk.solve;

import java.util.Arrays;

/** A growing row of ints. */
final class IntList {
  private int[] values = new int[64];
  private int size;

  void add(int value) {
    if (size == values.length) {
      values = Arrays.copyOf(values, 2 * size);
    }
    values[size++] = value;
  }

  int get(int index) {
    return values[index];
  }

  int size() {
    return size;
  }

  void clear() {
    size = 0;
  }

  int[] toArray() {
    return Arrays.copyOf(values, size);
  }
}
