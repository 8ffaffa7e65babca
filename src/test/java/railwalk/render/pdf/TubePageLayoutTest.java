package railwalk.render.pdf;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import railwalk.chart.TubePage;
import railwalk.chart.TubePageBuilder;
import railwalk.device.Catalogue;
import railwalk.device.TubeType;

/** The page of every type: on one sheet, no text over another, none off the sheet. */
class TubePageLayoutTest {
  private static final Faces FACES = Faces.load();
  private static final double ASCENT = 0.66;
  private static final double EDGE_POINTS = 20;

  private record Box(String text, double left, double top, double right, double bottom) {
    static Box of(Ink.Words words) {
      double width = FACES.width(words.text(), words.face(), words.size());
      return new Box(
          words.text(),
          words.left(),
          words.baseline() - ASCENT * words.size(),
          words.left() + width,
          words.baseline());
    }

    boolean meets(Box other) {
      return left < other.right - 0.05
          && other.left < right - 0.05
          && top < other.bottom - 0.05
          && other.top < bottom - 0.05;
    }

    boolean isOnSheet(Paper paper) {
      return left > EDGE_POINTS
          && top > EDGE_POINTS
          && right < paper.widthPoints() - EDGE_POINTS
          && bottom < paper.heightPoints() - EDGE_POINTS;
    }
  }

  static Stream<String> types() {
    return Catalogue.standard().types().stream().map(TubeType::name);
  }

  @ParameterizedTest
  @MethodSource("types")
  void fitsOnOneSheetWithEveryTextInItsOwnPlace(String type) {
    TubePage page = TubePageBuilder.of(Catalogue.standard().file(type).orElseThrow());
    for (Paper paper : Paper.values()) {
      List<PdfFile.Leaf> leaves = TubePageRenderer.layOut(page, paper, FACES);
      assertThat(leaves).as("sheets of " + type + " on " + paper).hasSize(1);
      List<Box> boxes =
          leaves.get(0).inks().stream()
              .filter(Ink.Words.class::isInstance)
              .map(ink -> Box.of((Ink.Words) ink))
              .toList();
      assertThat(boxes).as("texts of " + type).hasSizeGreaterThan(15);
      assertThat(boxes).as(type + " on " + paper).allMatch(box -> box.isOnSheet(paper));
      assertThat(overlaps(boxes)).as(type + " on " + paper).isEmpty();
    }
  }

  private static List<String> overlaps(List<Box> boxes) {
    List<String> overlaps = new ArrayList<>();
    for (int i = 0; i < boxes.size(); i++) {
      for (int j = i + 1; j < boxes.size(); j++) {
        if (boxes.get(i).meets(boxes.get(j))) {
          overlaps.add(boxes.get(i).text() + " over " + boxes.get(j).text());
        }
      }
    }
    return overlaps;
  }
}
