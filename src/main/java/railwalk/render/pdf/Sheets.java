package railwalk.render.pdf;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** The sheets of a document as they fill up from the top. */
final class Sheets {
  private final Faces faces;
  private final Paper paper;
  private final List<Pen> pens = new ArrayList<>();
  private double y;
  private Slab.@Nullable Head headOnSheet;
  private Slab.@Nullable Head headBegun;

  Sheets(Faces faces, Paper paper) {
    this.faces = faces;
    this.paper = paper;
    startSheet();
  }

  List<Pen> pens() {
    return pens;
  }

  /** Returns the height between the margins. */
  double bodyHeight() {
    return paper.heightPoints() - Style.MARGIN_TOP - Style.MARGIN_BOTTOM;
  }

  void startSheet() {
    pens.add(new Pen(faces));
    y = Style.MARGIN_TOP;
    headOnSheet = null;
  }

  /** Starts a sheet unless nothing is on this one yet. */
  void startFreshSheet() {
    if (y > Style.MARGIN_TOP) {
      startSheet();
    }
  }

  /** Adds empty room between blocks; none at the top of a sheet. */
  void space(double height) {
    if (y > Style.MARGIN_TOP) {
      y += height;
    }
    headOnSheet = null;
  }

  /** Places a slab: in one piece where it asks for that and fits, else slice by slice. */
  void place(Slab slab) {
    List<Slice> opening = new ArrayList<>(slab.lead());
    opening.addAll(headNeeded(slab));
    double whole = Slab.height(opening) + Slab.height(slab.slices());
    boolean mayBeParted = !slab.whole() || whole > bodyHeight();
    double needed = mayBeParted ? Slab.height(opening) + firstSlices(slab) : whole;
    if (needed > room()) {
      startFreshSheet();
      opening = new ArrayList<>(slab.lead());
      opening.addAll(headNeeded(slab));
    }
    opening.forEach(this::draw);
    if (slab.head() != null) {
      headOnSheet = slab.head();
      headBegun = slab.head();
    }
    for (Slice slice : slab.slices()) {
      if (slice.height() > room()) {
        if (slice.isGap()) {
          continue;
        }
        startFreshSheet();
        headNeeded(slab).forEach(this::draw);
        headOnSheet = slab.head();
        Slice again = slab.again();
        if (again != null) {
          draw(again);
        }
      }
      draw(slice);
    }
  }

  private static double firstSlices(Slab slab) {
    return Slab.height(slab.slices().subList(0, Math.min(3, slab.slices().size())));
  }

  private List<Slice> headNeeded(Slab slab) {
    Slab.Head head = slab.head();
    if (head == null || head == headOnSheet) {
      return List.of();
    }
    return List.of(head == headBegun ? head.repeated() : head.first());
  }

  /** Returns the height still free on this sheet. */
  double room() {
    return paper.heightPoints() - Style.MARGIN_BOTTOM - y;
  }

  private void draw(Slice slice) {
    slice.draw(pens.get(pens.size() - 1), Style.MARGIN_SIDE, y);
    y += slice.height();
  }
}
