package railwalk.render.pdf;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.zip.CRC32;
import org.apache.fontbox.ttf.TTFParser;
import org.apache.fontbox.ttf.TrueTypeFont;
import org.apache.pdfbox.io.RandomAccessReadBuffer;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDDocumentInformation;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.PDPageContentStream;
import org.apache.pdfbox.pdmodel.common.PDRectangle;
import org.apache.pdfbox.pdmodel.font.PDFont;
import org.apache.pdfbox.pdmodel.font.PDType0Font;
import org.apache.pdfbox.pdmodel.interactive.documentnavigation.outline.PDDocumentOutline;
import org.apache.pdfbox.pdmodel.interactive.documentnavigation.outline.PDOutlineItem;
import org.apache.pdfbox.pdmodel.interactive.viewerpreferences.PDViewerPreferences;
import railwalk.render.type.Typeface;

/**
 * Writes laid-out sheets as a PDF. It carries no date and an identifier made from its title, so
 * that the same sheets give the same bytes.
 */
final class PdfFile {
  private final String title;
  private final String subject;
  private final String product;

  PdfFile(String title, String subject, String product) {
    this.title = title;
    this.subject = subject;
    this.product = product;
  }

  /**
   * One sheet.
   *
   * @param bookmark by which a viewer lists it; empty for none
   */
  record Leaf(List<Ink> inks, String bookmark) {
    Leaf {
      inks = List.copyOf(inks);
    }
  }

  byte[] bytes(List<Leaf> leaves, Faces faces, Paper paper) {
    try (PDDocument document = new PDDocument()) {
      describe(document);
      PDFont regular = font(document, faces.regular());
      PDFont bold = font(document, faces.bold());
      PDDocumentOutline outline = new PDDocumentOutline();
      for (Leaf leaf : leaves) {
        PDPage page =
            new PDPage(new PDRectangle((float) paper.widthPoints(), (float) paper.heightPoints()));
        document.addPage(page);
        draw(document, page, leaf.inks(), regular, bold, paper.heightPoints());
        if (!leaf.bookmark().isEmpty()) {
          PDOutlineItem item = new PDOutlineItem();
          item.setTitle(leaf.bookmark());
          item.setDestination(page);
          outline.addLast(item);
        }
      }
      document.getDocumentCatalog().setDocumentOutline(outline);
      ByteArrayOutputStream out = new ByteArrayOutputStream();
      document.save(out);
      return out.toByteArray();
    } catch (IOException e) {
      throw new UncheckedIOException("memory takes all that is written to it", e);
    }
  }

  private void describe(PDDocument document) {
    PDDocumentInformation information = new PDDocumentInformation();
    information.setTitle(title);
    information.setSubject(subject);
    information.setCreator(product);
    information.setProducer(product);
    document.setDocumentInformation(information);
    document.getDocumentCatalog().setLanguage("en");
    PDViewerPreferences preferences =
        new PDViewerPreferences(document.getDocumentCatalog().getCOSObject());
    preferences.setDisplayDocTitle(true);
    document.getDocumentCatalog().setViewerPreferences(preferences);
    CRC32 id = new CRC32();
    id.update((title + "\n" + subject).getBytes(StandardCharsets.UTF_8));
    document.setDocumentId(id.getValue());
  }

  /** Returns an embedded font that maps one sign to one glyph: widths are those laid out with. */
  private static PDFont font(PDDocument document, Typeface typeface) throws IOException {
    TrueTypeFont file = new TTFParser().parse(new RandomAccessReadBuffer(typeface.file()));
    file.setEnableGsub(false);
    return PDType0Font.load(document, file, true);
  }

  private static void draw(
      PDDocument document,
      PDPage page,
      List<Ink> inks,
      PDFont regular,
      PDFont bold,
      double heightPoints)
      throws IOException {
    try (PDPageContentStream content = new PDPageContentStream(document, page)) {
      for (Ink ink : inks) {
        if (ink instanceof Ink.Words words) {
          content.beginText();
          content.setNonStrokingColor((float) words.grey());
          content.setFont(words.face() == Ink.Face.BOLD ? bold : regular, (float) words.size());
          content.newLineAtOffset((float) words.left(), (float) (heightPoints - words.baseline()));
          content.showText(words.text());
          content.endText();
        } else if (ink instanceof Ink.Stroke stroke) {
          content.setStrokingColor((float) stroke.grey());
          content.setLineWidth((float) stroke.width());
          path(content, stroke.moves(), heightPoints);
          content.stroke();
        } else if (ink instanceof Ink.Fill fill) {
          content.setNonStrokingColor((float) fill.grey());
          path(content, fill.moves(), heightPoints);
          content.fill();
        }
      }
    }
  }

  private static void path(PDPageContentStream content, List<Ink.Move> moves, double heightPoints)
      throws IOException {
    for (Ink.Move move : moves) {
      if (move instanceof Ink.From from) {
        content.moveTo((float) from.x(), (float) (heightPoints - from.y()));
      } else if (move instanceof Ink.To to) {
        content.lineTo((float) to.x(), (float) (heightPoints - to.y()));
      } else if (move instanceof Ink.Curve curve) {
        content.curveTo(
            (float) curve.x1(),
            (float) (heightPoints - curve.y1()),
            (float) curve.x2(),
            (float) (heightPoints - curve.y2()),
            (float) curve.x(),
            (float) (heightPoints - curve.y()));
      }
    }
  }
}
