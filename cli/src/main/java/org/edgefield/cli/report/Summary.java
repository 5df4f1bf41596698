package org.edgefield.cli.report;

import java.util.List;
import java.util.Locale;
import org.edgefield.cli.Version;
import org.edgefield.cli.report.Report.DutyReport;
import org.edgefield.cli.report.Report.ElectrodeReport;
import org.edgefield.cli.report.Report.Spot;
import org.edgefield.cli.report.Report.VoltageReport;
import org.edgefield.field.job.Permitted;
import org.edgefield.field.job.Surroundings;

/**
 * The result as a Markdown page for people: verdict first, then each duty, then what it rests on.
 */
public final class Summary {
  private final Report report;
  private final StringBuilder out = new StringBuilder();

  private Summary(Report report) {
    this.report = report;
  }

  /** The page. */
  public static String text(Report report) {
    return new Summary(report).page();
  }

  private String page() {
    line("# " + report.input().file() + ": " + report.verdict().key());
    line("");
    line(headline());
    for (DutyReport duty : report.duties()) {
      duty(duty);
    }
    warnings();
    basis();
    line("");
    line("## What is not covered");
    line("");
    Cautions.of(report.method()).forEach(c -> line("- " + c));
    line("- The applicable standards, local codes and licensed practice decide.");
    return out.toString();
  }

  private String headline() {
    long red = count(Verdict.RED);
    long amber = count(Verdict.AMBER);
    String how =
        report.method().equals("solve")
            ? "Solved by boundary elements; the peak fields are uncertain by "
                + Human.percent(report.errorEstimate())
                + (report.converged() ? "." : ", **more than was asked for**.")
            : "Quick estimate from curvature and gap: it tells where to look.";
    return red
        + " red and "
        + amber
        + " amber hot spots over "
        + report.duties().size()
        + (report.duties().size() == 1 ? " duty. " : " duties. ")
        + how;
  }

  private long count(Verdict state) {
    return report.duties().stream()
        .flatMap(d -> d.hotSpots().stream())
        .filter(s -> s.state() == state)
        .count();
  }

  private void duty(DutyReport duty) {
    line("");
    line("## Duty " + escaped(duty.name()) + ": " + duty.verdict().key());
    line("");
    StringBuilder voltages = new StringBuilder("Voltages (peak): ");
    for (int i = 0; i < duty.voltages().size(); i++) {
      VoltageReport v = duty.voltages().get(i);
      voltages
          .append(i == 0 ? "" : ", ")
          .append(escaped(v.electrode()))
          .append(' ')
          .append(Human.voltage(v.peak_V()));
      if (v.phase_deg() != 0) {
        voltages.append(String.format(Locale.ROOT, " at %.0f deg", v.phase_deg()));
      }
    }
    line(voltages + ".");
    line("");
    if (duty.hotSpots().isEmpty()) {
      Spot p = duty.peak();
      line(
          "Nothing reaches the amber limit. Highest: "
              + Human.field(p.field_V_per_m())
              + " (utilisation "
              + Human.utilisation(p.utilisation())
              + ") on "
              + place(p)
              + " at "
              + Human.point(p.at_m())
              + ".");
      return;
    }
    line("| # | place | at, mm | field | permitted | utilisation | radius | gap | size | law |");
    line("|---|---|---|---|---|---|---|---|---|---|");
    for (Spot s : duty.hotSpots()) {
      line(
          "| "
              + String.join(
                  " | ",
                  String.valueOf(s.id()),
                  place(s),
                  Human.point(s.at_m()).replace(" mm", ""),
                  Human.field(s.field_V_per_m())
                      + " ±"
                      + Human.percent(s.uncertainty()).replace(" ", " "),
                  Human.field(s.permitted_V_per_m()),
                  Human.utilisation(s.utilisation()) + " " + s.state().key(),
                  Double.isInfinite(s.radius_m()) ? "flat" : Human.length(s.radius_m()),
                  Double.isInfinite(s.gap_m())
                      ? "open"
                      : Human.length(s.gap_m())
                          + (s.opposing() == null ? "" : " to " + escaped(s.opposing())),
                  Human.size(s),
                  s.law())
              + " |");
    }
    line("");
    for (Spot s : duty.hotSpots()) {
      line("- " + s.id() + ": " + Human.cure(s));
    }
  }

  private static String place(Spot spot) {
    return escaped(spot.feature() + " of " + spot.part());
  }

  private static String escaped(String text) {
    return text.replace("|", "\\|").replace("<", "\\<");
  }

  private void warnings() {
    if (report.warnings().isEmpty()) {
      return;
    }
    line("");
    line("## Warnings");
    line("");
    report.warnings().forEach(w -> line("- " + escaped(w)));
  }

  private void basis() {
    Permitted p = report.permitted();
    Surroundings s = report.surroundings();
    line("");
    line("## Basis");
    line("");
    line("- tool: " + Version.TOOL + " " + report.toolVersion() + ", method " + report.method());
    line(
        "- model: "
            + escaped(report.input().file())
            + ", "
            + report.input().schema()
            + ", drawn in "
            + report.input().unit()
            + ", SHA-256 "
            + report.input().sha256());
    for (ElectrodeReport e : report.electrodes()) {
      line("- electrode " + escaped(e.name()) + " (" + e.kind() + "): " + names(e.parts()));
    }
    if (!report.ignored().isEmpty()) {
      line("- ignored: " + names(report.ignored()));
    }
    line(
        "- permitted field: "
            + (p.criterion() == Permitted.Criterion.FIXED
                ? "fixed, " + Human.field(p.field_V_per_m())
                : p.criterion().name().toLowerCase(Locale.ROOT)
                    + ", roughness factor "
                    + Human.number(p.roughness()))
            + ", margin "
            + Human.number(p.margin())
            + ", amber from "
            + Human.number(p.amber()));
    line(
        "- gas: "
            + s.gas()
            + ", "
            + Human.number(s.pressure_Pa() * 1e-3)
            + " kPa, "
            + Human.number(s.temperature_K() - 273.15)
            + " degC"
            + (Double.isNaN(s.altitude_m())
                ? ""
                : ", altitude " + Human.number(s.altitude_m()) + " m"));
    if (s.earthPlane() != null) {
      line(
          "- earth plane: "
              + "xyz".charAt(s.earthPlane().axis())
              + " = "
              + Human.number(1e3 * s.earthPlane().offset_m())
              + " mm");
    }
    line("- edge radius as made: " + Human.length(report.edgeRadius_m()));
    report
        .partEdgeRadius_m()
        .forEach((part, r) -> line("- edge radius of " + escaped(part) + ": " + Human.length(r)));
    line("- mesh: " + report.vertices() + " vertices, " + report.triangles() + " triangles");
    if (report.capacitance_F().length > 0) {
      capacitance();
    }
  }

  private void capacitance() {
    int n = report.electrodes().size();
    line("");
    line("Capacitance matrix, pF (charge of the row's electrode per volt on the column's):");
    line("");
    StringBuilder head = new StringBuilder("| |");
    StringBuilder rule = new StringBuilder("|---|");
    for (ElectrodeReport e : report.electrodes()) {
      head.append(' ').append(escaped(e.name())).append(" |");
      rule.append("---|");
    }
    line(head.toString());
    line(rule.toString());
    for (int i = 0; i < n; i++) {
      StringBuilder row =
          new StringBuilder("| " + escaped(report.electrodes().get(i).name()) + " |");
      for (int j = 0; j < n; j++) {
        row.append(' ').append(Human.number(1e12 * report.capacitance_F()[i * n + j])).append(" |");
      }
      line(row.toString());
    }
  }

  private static String names(List<String> names) {
    return String.join(", ", names.stream().map(Summary::escaped).toList());
  }

  private void line(String text) {
    out.append(text).append('\n');
  }
}
