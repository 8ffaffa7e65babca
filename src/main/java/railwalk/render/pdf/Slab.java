package railwalk.render.pdf;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * Slices that follow each other; where they don't fit on a sheet they are parted between slices.
 *
 * @param whole whether they stay on one sheet as long as they fit on one
 * @param lead slices before the head, such as a heading
 * @param head of the table that the slices are rows of; null outside tables
 * @param again drawn first where the slab goes on on a further sheet; null for nothing
 */
record Slab(
    boolean whole,
    List<Slice> lead,
    @Nullable Head head,
    @Nullable Slice again,
    List<Slice> slices) {
  Slab {
    lead = List.copyOf(lead);
    slices = List.copyOf(slices);
  }

  /** One table's head: as it starts the table, and as it is repeated on a further sheet. */
  static final class Head {
    private final Slice first;
    private final Slice repeated;

    Head(Slice first, Slice repeated) {
      this.first = first;
      this.repeated = repeated;
    }

    Slice first() {
      return first;
    }

    Slice repeated() {
      return repeated;
    }

    /** Returns this head, {@code scale} times as large. */
    Head scaled(double scale, Faces faces) {
      return new Head(first.scaled(scale, faces), repeated.scaled(scale, faces));
    }
  }

  /** Returns a slab outside tables. */
  static Slab of(List<Slice> slices) {
    return new Slab(true, List.of(), null, null, slices);
  }

  /** Returns the same with {@code slice} before all else. */
  Slab after(List<Slice> slicesBefore) {
    List<Slice> all = new ArrayList<>(slicesBefore);
    all.addAll(lead);
    return new Slab(whole, all, head, again, slices);
  }

  /** Returns all its slices with the head as it first stands, for a place where it is not cut. */
  List<Slice> all() {
    List<Slice> all = new ArrayList<>(lead);
    if (head != null) {
      all.add(head.first());
    }
    all.addAll(slices);
    return all;
  }

  /** Returns the same, {@code scale} times as large, under a head that is already so. */
  Slab scaled(double scale, @Nullable Head scaledHead, Faces faces) {
    return new Slab(
        whole,
        scaled(lead, scale, faces),
        scaledHead,
        again == null ? null : again.scaled(scale, faces),
        scaled(slices, scale, faces));
  }

  private static List<Slice> scaled(List<Slice> slices, double scale, Faces faces) {
    return slices.stream().map(slice -> slice.scaled(scale, faces)).toList();
  }

  static double height(List<Slice> slices) {
    return slices.stream().mapToDouble(Slice::height).sum();
  }
}
