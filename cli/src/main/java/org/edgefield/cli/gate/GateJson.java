package org.edgefield.cli.gate;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.util.List;
import java.util.Map;
import org.edgefield.cli.report.JsonWriter;

/** Writes a comparison as JSON. */
final class GateJson {
  private static final String FORMAT = "edgefield-gate-1";

  private GateJson() {}

  static String text(Comparison comparison) {
    StringWriter text = new StringWriter();
    try (JsonGenerator generator = new JsonFactory().createGenerator(text)) {
      generator.setPrettyPrinter(
          new DefaultPrettyPrinter().withObjectIndenter(new DefaultIndenter("  ", "\n")));
      JsonWriter json = new JsonWriter(generator);
      json.open().put("format", FORMAT).put("gate", comparison.passes() ? "pass" : "fail");
      json.put("changed_conditions", comparison.changedConditions()).openArray("duties");
      for (Map.Entry<String, List<GateFinding>> duty : comparison.findings().entrySet()) {
        json.open().put("name", duty.getKey()).openArray("findings");
        for (GateFinding f : duty.getValue()) {
          json.open()
              .put("change", f.change().key())
              .put("fails", f.fails())
              .put("state", f.spot().red() ? "red" : "amber")
              .put("part", f.spot().part())
              .put("feature", f.spot().feature())
              .numbers("at_m", f.spot().at_m())
              .put("accepted_utilisation", f.accepted())
              .put("utilisation", f.now())
              .close();
        }
        json.closeArray().close();
      }
      json.closeArray().close();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return text.append('\n').toString();
  }
}
