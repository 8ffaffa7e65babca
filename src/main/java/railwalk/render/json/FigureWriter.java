package railwalk.render.json;

import com.fasterxml.jackson.core.JsonGenerator;
import java.io.IOException;
import railwalk.chart.Chart;
import railwalk.chart.Figures;

/** Writes the members in the order of the published form. */
record FigureWriter(JsonGenerator json) {
  void chart(Chart chart) throws IOException {
    json.writeStartObject();
    json.writeStringField("title", chart.title());
    members(chart.figures().get(0));
    json.writeArrayFieldStart("states");
    for (Figures state : chart.figures().subList(1, chart.figures().size())) {
      json.writeStartObject();
      json.writeStringField("name", state.conditions().state());
      members(state);
      json.writeEndObject();
    }
    json.writeEndArray();
    json.writeEndObject();
  }

  private void members(Figures figures) throws IOException {
    conditions(figures.conditions());
    json.writeArrayFieldStart("points");
    for (Figures.Point point : figures.points()) {
      point(point);
    }
    for (Figures.Alternating alternating : figures.alternating()) {
      alternating(alternating);
    }
    json.writeEndArray();
    json.writeArrayFieldStart("tubes");
    for (Figures.Tube tube : figures.tubes()) {
      tube(tube);
    }
    json.writeEndArray();
    json.writeArrayFieldStart("supplies");
    for (Figures.Supply supply : figures.supplies()) {
      supply(supply);
    }
    json.writeEndArray();
    json.writeArrayFieldStart("findings");
    for (Figures.Finding finding : figures.findings()) {
      finding(finding);
    }
    json.writeEndArray();
  }

  void conditions(Figures.Conditions conditions) throws IOException {
    json.writeObjectFieldStart("conditions");
    number("line_volts", conditions.lineVolts());
    number("line_hertz", conditions.lineHertz());
    json.writeStringField("meter", conditions.meter());
    text("state", conditions.state());
    json.writeStringField("reference", conditions.reference());
    json.writeEndObject();
  }

  private void point(Figures.Point point) throws IOException {
    json.writeStartObject();
    json.writeStringField("node", point.node());
    json.writeStringField("kind", "dc");
    number("volts", point.volts());
    number("low_volts", point.lowVolts());
    number("high_volts", point.highVolts());
    number("meter_volts", point.meterVolts());
    json.writeArrayFieldStart("pins");
    for (String pin : point.pins()) {
      json.writeString(pin);
    }
    json.writeEndArray();
    json.writeEndObject();
  }

  private void alternating(Figures.Alternating alternating) throws IOException {
    json.writeStartObject();
    json.writeStringField("node", alternating.node());
    json.writeStringField("kind", alternating.kind());
    number("volts", alternating.rmsVolts());
    json.writeNullField("low_volts");
    json.writeNullField("high_volts");
    json.writeNullField("meter_volts");
    json.writeArrayFieldStart("pins");
    json.writeEndArray();
    json.writeEndObject();
  }

  private void tube(Figures.Tube tube) throws IOException {
    json.writeStartObject();
    json.writeStringField("tube", tube.tube());
    text("section", tube.section());
    json.writeStringField("type", tube.type());
    number("plate_volts", tube.plateVolts());
    number("screen_volts", tube.screenVolts());
    number("grid_volts", tube.gridVolts());
    number("plate_amps", tube.plateAmps());
    number("screen_amps", tube.screenAmps());
    number("grid_amps", tube.gridAmps());
    number("plate_watts", tube.plateWatts());
    number("screen_watts", tube.screenWatts());
    number("plate_watts_max", tube.plateWattsMax());
    json.writeEndObject();
  }

  private void supply(Figures.Supply supply) throws IOException {
    json.writeStartObject();
    json.writeStringField("node", supply.node());
    number("dc_amps", supply.dcAmps());
    number("peak_amps", supply.peakAmps());
    number("ripple_volts_rms", supply.rippleVoltsRms());
    json.writeEndObject();
  }

  private void finding(Figures.Finding finding) throws IOException {
    json.writeStartObject();
    json.writeStringField("severity", finding.severity());
    json.writeStringField("code", finding.code());
    json.writeStringField("message", finding.message());
    json.writeStringField("file", finding.file());
    if (finding.line() > 0) {
      json.writeNumberField("line", finding.line());
    } else {
      json.writeNullField("line");
    }
    json.writeEndObject();
  }

  void number(String name, double value) throws IOException {
    if (Double.isFinite(value)) {
      json.writeNumberField(name, value + 0.0);
    } else {
      json.writeNullField(name);
    }
  }

  void text(String name, String value) throws IOException {
    if (value.isEmpty()) {
      json.writeNullField(name);
    } else {
      json.writeStringField(name, value);
    }
  }
}
