package org.edgefield.cli.report;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.util.List;
import java.util.Map;
import org.edgefield.cli.Version;
import org.edgefield.cli.report.Report.DutyReport;
import org.edgefield.cli.report.Report.ElectrodeReport;
import org.edgefield.cli.report.Report.Spot;
import org.edgefield.cli.report.Report.VoltageReport;
import org.edgefield.field.job.Permitted;
import org.edgefield.field.job.Surroundings;

/**
 * Writes result.json, as result.schema.json describes it. Keys keep one order, numbers nine
 * significant digits, so that equal results are equal byte for byte but for {@code timing}.
 */
public final class ResultJson {
  /** Value of the key {@code format}. */
  public static final String FORMAT = "edgefield-result-1";

  private final JsonWriter json;

  private ResultJson(JsonWriter json) {
    this.json = json;
  }

  /** The JSON text of a report, with a final line break. */
  public static String text(Report report) {
    StringWriter text = new StringWriter();
    DefaultPrettyPrinter printer =
        new DefaultPrettyPrinter().withObjectIndenter(new DefaultIndenter("  ", "\n"));
    try (JsonGenerator generator = new JsonFactory().createGenerator(text)) {
      generator.setPrettyPrinter(printer);
      new ResultJson(new JsonWriter(generator)).write(report);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return text.append('\n').toString();
  }

  private void write(Report r) throws IOException {
    json.open();
    json.put("format", FORMAT);
    json.open("tool").put("name", Version.TOOL).put("version", r.toolVersion()).close();
    json.open("input")
        .put("file", r.input().file())
        .put("sha256", r.input().sha256())
        .put("unit", r.input().unit())
        .put("schema", r.input().schema())
        .put("case", r.caseFile())
        .close();
    json.put("method", r.method());
    json.put("verdict", r.verdict().key());
    conditions(r);
    json.openArray("electrodes");
    for (ElectrodeReport e : r.electrodes()) {
      json.open().put("name", e.name()).put("kind", e.kind()).put("parts", e.parts()).close();
    }
    json.closeArray();
    json.put("ignored", r.ignored());
    json.openArray("duties");
    for (DutyReport duty : r.duties()) {
      duty(duty);
    }
    json.closeArray();
    if (r.capacitance_F().length > 0) {
      int n = r.electrodes().size();
      json.openArray("capacitance_F");
      for (int i = 0; i < n; i++) {
        json.numbers(java.util.Arrays.copyOfRange(r.capacitance_F(), i * n, (i + 1) * n));
      }
      json.closeArray();
    }
    json.putIfNumber("error_estimate", r.errorEstimate());
    json.put("converged", r.converged());
    json.put("warnings", r.warnings());
    json.put("cautions", Cautions.of(r.method()));
    json.open("mesh").put("vertices", r.vertices()).put("triangles", r.triangles()).close();
    json.open("timing").put("started", r.timing().started().toString());
    json.open("seconds");
    for (Map.Entry<String, Double> phase : r.timing().seconds().entrySet()) {
      json.put(phase.getKey(), phase.getValue());
    }
    json.close().close();
    json.close();
  }

  private void conditions(Report r) throws IOException {
    Permitted p = r.permitted();
    Surroundings s = r.surroundings();
    json.open("conditions");
    json.open("permitted")
        .put("criterion", p.criterion().name().toLowerCase(java.util.Locale.ROOT));
    if (p.criterion() == Permitted.Criterion.FIXED) {
      json.put("field_V_per_m", p.field_V_per_m());
    }
    json.put("margin", p.margin()).put("amber", p.amber()).put("roughness", p.roughness()).close();
    json.open("surroundings")
        .put("gas", s.gas())
        .put("pressure_Pa", s.pressure_Pa())
        .put("temperature_K", s.temperature_K())
        .putIfNumber("humidity_kg_per_m3", s.humidity_kg_per_m3())
        .putIfNumber("altitude_m", s.altitude_m());
    if (s.earthPlane() != null) {
      json.open("earth_plane")
          .put("axis", List.of("x", "y", "z").get(s.earthPlane().axis()))
          .put("offset_m", s.earthPlane().offset_m())
          .close();
    }
    if (s.ambientField_V_per_m() != null) {
      json.numbers("ambient_field_V_per_m", s.ambientField_V_per_m());
    }
    json.close();
    json.put("edge_radius_m", r.edgeRadius_m());
    if (!r.partEdgeRadius_m().isEmpty()) {
      json.open("part_edge_radius_m");
      for (Map.Entry<String, Double> part : r.partEdgeRadius_m().entrySet()) {
        json.put(part.getKey(), part.getValue());
      }
      json.close();
    }
    json.close();
  }

  private void duty(DutyReport duty) throws IOException {
    json.open().put("name", duty.name()).put("verdict", duty.verdict().key());
    json.openArray("voltages");
    for (VoltageReport v : duty.voltages()) {
      json.open()
          .put("electrode", v.electrode())
          .put("peak_V", v.peak_V())
          .put("phase_deg", v.phase_deg())
          .close();
    }
    json.closeArray();
    json.open("peak");
    spot(duty.peak());
    json.close();
    json.openArray("hot_spots");
    for (Spot spot : duty.hotSpots()) {
      json.open().put("id", spot.id());
      spot(spot);
      json.open("extent");
      json.numbers("points_m", spot.extent().points_m());
      json.put("spacing_m", spot.extent().spacing_m()).close();
      json.close();
    }
    json.closeArray().close();
  }

  private void spot(Spot s) throws IOException {
    json.put("state", s.state().key())
        .put("part", s.part())
        .put("part_path", s.partPath())
        .put("feature", s.feature());
    json.numbers("at_m", s.at_m());
    json.put("field_V_per_m", s.field_V_per_m())
        .put("permitted_V_per_m", s.permitted_V_per_m())
        .put("utilisation", s.utilisation())
        .put("uncertainty", s.uncertainty())
        .putIfNumber("area_m2", s.area_m2())
        .putIfNumber("length_m", s.length_m())
        .put("radius_m", s.radius_m())
        .put("gap_m", s.gap_m());
    if (s.opposing() != null) {
      json.put("opposing", s.opposing());
    }
    json.put("law", s.law());
    json.open("cure")
        .put("text", Human.cure(s))
        .put("radius_m", s.cure().radius_m())
        .put("voltage_V", s.cure().voltage_V())
        .put("voltage_factor", s.cure().voltageFactor())
        .put("gap_m", s.cure().gap_m())
        .close();
  }
}
