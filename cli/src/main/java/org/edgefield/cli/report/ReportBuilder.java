package org.edgefield.cli.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import org.edgefield.cli.Version;
import org.edgefield.cli.casefile.CaseFile;
import org.edgefield.cli.report.Report.CureReport;
import org.edgefield.cli.report.Report.DutyReport;
import org.edgefield.cli.report.Report.ElectrodeReport;
import org.edgefield.cli.report.Report.Spot;
import org.edgefield.cli.report.Report.Timing;
import org.edgefield.cli.report.Report.VoltageReport;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.result.DutyResult;
import org.edgefield.field.result.FieldResult;
import org.edgefield.field.result.HotSpot;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.Part;

/** Makes the report of a result. */
public final class ReportBuilder {
  private final Assembly assembly;
  private final FieldCase fieldCase;
  private final FieldResult result;
  private final PartLabels labels;

  private ReportBuilder(Assembly assembly, FieldCase fieldCase, FieldResult result) {
    this.assembly = assembly;
    this.fieldCase = fieldCase;
    this.result = result;
    this.labels = new PartLabels(assembly.parts());
  }

  /** The report of one run. */
  public static Report build(
      CaseFile file, FieldCase fieldCase, Assembly assembly, FieldResult result, Timing timing) {
    return new ReportBuilder(assembly, fieldCase, result).build(file, timing);
  }

  private Report build(CaseFile file, Timing timing) {
    List<DutyReport> duties = new ArrayList<>();
    Verdict worst = Verdict.PASS;
    for (int d = 0; d < result.duties().size(); d++) {
      DutyReport duty = duty(fieldCase.duties().get(d), result.duties().get(d));
      duties.add(duty);
      worst = duty.verdict().compareTo(worst) > 0 ? duty.verdict() : worst;
    }
    Map<String, Double> partEdges = new TreeMap<>();
    fieldCase.edges().partRadius_m().forEach((part, r) -> partEdges.put(labels.of(part), r));
    return new Report(
        Version.number(),
        assembly.source(),
        file.file().toString(),
        result.method().name().toLowerCase(Locale.ROOT),
        fieldCase.permitted(),
        fieldCase.surroundings(),
        fieldCase.edges().radius_m(),
        file.edges().given(),
        partEdges,
        fieldCase.electrodes().stream().map(this::electrode).toList(),
        fieldCase.ignored().stream().map(labels::of).toList(),
        duties,
        worst,
        warnings(file),
        result.mesh().vertexCount(),
        result.mesh().triangleCount(),
        result.capacitance_F(),
        result.errorEstimate(),
        result.converged(),
        timing);
  }

  private List<String> warnings(CaseFile file) {
    List<String> warnings = new ArrayList<>(assembly.warnings());
    warnings.addAll(result.warnings());
    if (!file.edges().given()) {
      warnings.add(
          "the case file gives no edge radius as made: "
              + Human.length(fieldCase.edges().radius_m())
              + " is assumed on sharp edges; set it with  edges: {radius as made: 0.3 mm}");
    }
    return warnings.stream().distinct().toList();
  }

  private ElectrodeReport electrode(Electrode electrode) {
    List<String> parts = new ArrayList<>();
    for (int p : electrode.parts()) {
      parts.add(labels.of(p));
    }
    return new ElectrodeReport(
        electrode.name(), electrode.kind().name().toLowerCase(Locale.ROOT), parts);
  }

  private DutyReport duty(Duty duty, DutyResult found) {
    List<VoltageReport> voltages = new ArrayList<>();
    for (int e = 0; e < fieldCase.electrodes().size(); e++) {
      Electrode electrode = fieldCase.electrodes().get(e);
      if (electrode.kind() != Electrode.Kind.FLOATING) {
        double re = duty.real_V()[e];
        double im = duty.imaginary_V()[e];
        // A negative DC value keeps its sign; a phasor is told by amplitude and angle.
        voltages.add(
            im == 0
                ? new VoltageReport(electrode.name(), re, 0)
                : new VoltageReport(
                    electrode.name(), Math.hypot(re, im), Math.toDegrees(Math.atan2(im, re))));
      }
    }
    return new DutyReport(
        duty.name(),
        voltages,
        spot(found.peak()),
        found.hotSpots().stream().map(this::spot).toList(),
        Verdict.of(found.peak().utilisation(), fieldCase.permitted().amber()));
  }

  private Spot spot(HotSpot h) {
    Part part = assembly.parts().get(h.part());
    return new Spot(
        h.id(),
        labels.of(h.part()),
        part.path(),
        h.feature(),
        h.at_m(),
        h.field_V_per_m(),
        h.permitted_V_per_m(),
        h.utilisation(),
        h.uncertainty(),
        h.area_m2(),
        h.length_m(),
        h.radius_m(),
        h.gap_m(),
        Verdict.of(h.utilisation(), fieldCase.permitted().amber()),
        h.opposing() < 0 ? null : labels.of(h.opposing()),
        h.law().text(),
        new CureReport(
            h.cure().radius_m(), h.cure().voltage_V(), h.cure().voltageFactor(), h.cure().gap_m()),
        RegionExtent.of(h.at_m(), h.nodes(), result.nodes(), result.mesh()));
  }
}
