package railwalk.render.json;

import com.fasterxml.jackson.core.JsonGenerator;
import java.io.IOException;
import java.util.List;
import railwalk.chart.BenchFigures;

/** Writes a bench report. */
record BenchWriter(FigureWriter figures) {
  void report(BenchFigures report) throws IOException {
    JsonGenerator json = figures.json();
    json.writeStartObject();
    figures.conditions(report.conditions());
    json.writeArrayFieldStart("points");
    for (BenchFigures.Point point : report.points()) {
      point(point);
    }
    json.writeEndArray();
    json.writeArrayFieldStart("suspects");
    for (BenchFigures.Suspect suspect : report.suspects()) {
      suspect(suspect);
    }
    json.writeEndArray();
    if (report.nextProbe().isEmpty()) {
      json.writeNullField("next_probe");
    } else {
      next(report.nextProbe().get(0));
    }
    if (!report.values().isEmpty()) {
      json.writeArrayFieldStart("values");
      for (BenchFigures.Value value : report.values()) {
        value(value);
      }
      json.writeEndArray();
    }
    json.writeEndObject();
  }

  private void point(BenchFigures.Point point) throws IOException {
    JsonGenerator json = figures.json();
    json.writeStartObject();
    json.writeStringField("point", point.point());
    json.writeStringField("kind", point.kind());
    figures.text("state", point.state());
    figures.number("read", point.read());
    figures.number("expected", point.expected());
    figures.number("low", point.low());
    figures.number("high", point.high());
    figures.number("meter", point.meter());
    json.writeStringField("verdict", point.verdict());
    json.writeEndObject();
  }

  private void suspect(BenchFigures.Suspect suspect) throws IOException {
    JsonGenerator json = figures.json();
    json.writeStartObject();
    figures.text("element", suspect.element());
    json.writeStringField("fault", suspect.fault());
    figures.number("estimate", suspect.estimate());
    figures.text("unit", suspect.unit());
    figures.number("probability", suspect.probability());
    sentences("for", suspect.supporting());
    sentences("against", suspect.against());
    json.writeNumberField("group", suspect.group());
    json.writeEndObject();
  }

  private void value(BenchFigures.Value value) throws IOException {
    JsonGenerator json = figures.json();
    json.writeStartObject();
    json.writeStringField("element", value.element());
    json.writeBooleanField("determined", value.determined());
    figures.number("ohms", value.ohms());
    figures.number("log_deviation", value.logDeviation());
    figures.number("nearest", value.nearest());
    sentences("told_by", value.toldBy());
    figures.text("read_point", value.readPoint());
    figures.text("read_kind", value.readKind());
    json.writeEndObject();
  }

  private void sentences(String name, List<String> sentences) throws IOException {
    figures.json().writeArrayFieldStart(name);
    for (String sentence : sentences) {
      figures.json().writeString(sentence);
    }
    figures.json().writeEndArray();
  }

  private void next(BenchFigures.NextProbe next) throws IOException {
    JsonGenerator json = figures.json();
    json.writeObjectFieldStart("next_probe");
    json.writeStringField("point", next.point());
    json.writeStringField("kind", next.kind());
    json.writeStringField("action", next.action());
    json.writeStringField("why", next.why());
    json.writeArrayFieldStart("outcomes");
    for (BenchFigures.Outcome outcome : next.outcomes()) {
      json.writeStartObject();
      figures.number("reading", outcome.reading());
      json.writeStringField("suspect", outcome.suspect());
      json.writeEndObject();
    }
    json.writeEndArray();
    json.writeEndObject();
  }
}
