package railwalk.render.pdf;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import railwalk.chart.Chart;
import railwalk.chart.ChartBuilder;
import railwalk.chart.SampleAmp;
import railwalk.chart.SampleAmp.Order;

/** No text runs into another, none is struck through, none leaves its sheet. */
class LayoutTest {
  private static final Faces FACES = Faces.load();

  /** Height of capitals and depth of tails of the typeface, over the size. */
  private static final double ASCENT = 0.70;

  private static final double DESCENT = 0.20;
  private static final double EDGE_POINTS = 20;

  /** A piece of text and the rectangle it covers. */
  private record Box(String text, double left, double top, double right, double bottom) {
    static Box of(Ink.Words words) {
      double width = FACES.width(words.text(), words.face(), words.size());
      return new Box(
          words.text(),
          words.left(),
          words.baseline() - ASCENT * words.size(),
          words.left() + width,
          words.baseline() + DESCENT * words.size());
    }

    boolean meets(Box other) {
      return left < other.right - 0.05
          && other.left < right - 0.05
          && top < other.bottom - 0.05
          && other.top < bottom - 0.05;
    }

    /** Returns whether a straight line runs through the letters. */
    boolean isStruckBy(Ink.From from, Ink.To to) {
      double inset = 0.3;
      double low = 0;
      double high = 1;
      double[] starts = {from.x(), from.y()};
      double[] ways = {to.x() - from.x(), to.y() - from.y()};
      double[] least = {left + inset, top + inset};
      double[] most = {right - inset, bottom - inset};
      for (int axis = 0; axis < 2; axis++) {
        if (ways[axis] == 0) {
          if (starts[axis] < least[axis] || starts[axis] > most[axis]) {
            return false;
          }
          continue;
        }
        double one = (least[axis] - starts[axis]) / ways[axis];
        double two = (most[axis] - starts[axis]) / ways[axis];
        low = Math.max(low, Math.min(one, two));
        high = Math.min(high, Math.max(one, two));
      }
      return low < high;
    }
  }

  static Stream<Order> orders() {
    return SampleAmp.orders().stream();
  }

  @ParameterizedTest
  @MethodSource("orders")
  void everyTextHasItsOwnPlace(Order order) {
    Chart chart = new ChartBuilder().build(SampleAmp.input(order));
    for (Paper paper : Paper.values()) {
      List<PdfFile.Leaf> leaves = PdfRenderer.layOut(chart, paper, FACES);
      List<String> faults = new ArrayList<>();
      int texts = 0;
      for (int sheet = 0; sheet < leaves.size(); sheet++) {
        List<Box> boxes = boxes(leaves.get(sheet).inks());
        texts += boxes.size();
        faults.addAll(faults(sheet + 1, boxes, leaves.get(sheet).inks(), paper));
      }
      System.out.printf(
          "%d tubes, %d states on %s: %d texts on %d sheets%n",
          order.tubes(), order.states(), paper, texts, leaves.size());
      assertThat(texts).isGreaterThan(100);
      assertThat(faults).isEmpty();
    }
  }

  private static List<Box> boxes(List<Ink> inks) {
    return inks.stream()
        .filter(Ink.Words.class::isInstance)
        .map(ink -> Box.of((Ink.Words) ink))
        .toList();
  }

  private static List<String> faults(int sheet, List<Box> boxes, List<Ink> inks, Paper paper) {
    List<String> faults = new ArrayList<>();
    for (int i = 0; i < boxes.size(); i++) {
      Box box = boxes.get(i);
      if (box.left() < EDGE_POINTS
          || box.top() < EDGE_POINTS
          || box.right() > paper.widthPoints() - EDGE_POINTS
          || box.bottom() > paper.heightPoints() - EDGE_POINTS) {
        faults.add("sheet " + sheet + ": off the sheet: " + box);
      }
      for (Box other : boxes.subList(i + 1, boxes.size())) {
        if (box.meets(other)) {
          faults.add("sheet " + sheet + ": " + box + " meets " + other);
        }
      }
    }
    for (Ink ink : inks) {
      if (ink instanceof Ink.Stroke stroke) {
        faults.addAll(struck(sheet, boxes, stroke));
      }
    }
    return faults;
  }

  private static List<String> struck(int sheet, List<Box> boxes, Ink.Stroke stroke) {
    List<String> faults = new ArrayList<>();
    for (int i = 1; i < stroke.moves().size(); i++) {
      if (stroke.moves().get(i - 1) instanceof Ink.From from
          && stroke.moves().get(i) instanceof Ink.To to) {
        boxes.stream()
            .filter(box -> box.isStruckBy(from, to))
            .forEach(box -> faults.add("sheet " + sheet + ": struck through: " + box));
      }
    }
    return faults;
  }
}
