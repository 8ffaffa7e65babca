package railwalk.render.json;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import railwalk.chart.BenchFigures;
import railwalk.chart.Chart;

/**
 * A chart's figures as JSON, at full precision in SI units. The first column's members stand at the
 * top; {@code states} holds the same five for every state. What is unknown is null, never absent.
 * Stateless.
 */
public final class JsonRenderer {
  /** Returns one JSON object and a newline. */
  public String render(Chart chart) {
    return written(json -> new FigureWriter(json).chart(chart));
  }

  /** Returns a bench report as one JSON object and a newline. */
  public String render(BenchFigures report) {
    return written(json -> new BenchWriter(new FigureWriter(json)).report(report));
  }

  /** What is written. */
  private interface Content {
    void writeTo(JsonGenerator json) throws IOException;
  }

  private static String written(Content content) {
    StringWriter out = new StringWriter();
    try (JsonGenerator json = new JsonFactory().createGenerator(out)) {
      DefaultIndenter indent = new DefaultIndenter("  ", "\n");
      json.setPrettyPrinter(
          new DefaultPrettyPrinter().withObjectIndenter(indent).withArrayIndenter(indent));
      content.writeTo(json);
    } catch (IOException e) {
      throw new UncheckedIOException("a string takes all that is written to it", e);
    }
    return out + "\n";
  }
}
