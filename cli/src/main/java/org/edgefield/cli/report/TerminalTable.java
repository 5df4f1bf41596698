package org.edgefield.cli.report;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import org.edgefield.cli.console.Console;
import org.edgefield.cli.console.Table;
import org.edgefield.cli.console.Wrap;
import org.edgefield.cli.report.Report.DutyReport;
import org.edgefield.cli.report.Report.Spot;

/** The result for a terminal: a table per duty that fits its width, and the verdict. */
public final class TerminalTable {
  private static final int SHOWN = 12;
  private static final String PLAIN = "\u001b[0m";

  private TerminalTable() {}

  /** The text, with final line breaks. */
  public static String text(Report report, Console console) {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (PrintStream out = new PrintStream(bytes, false, StandardCharsets.UTF_8)) {
      for (DutyReport duty : report.duties()) {
        duty(duty, console, out);
      }
      String word = report.verdict().key();
      String verdict =
          "verdict: "
              + (console.colour() ? colour(report.verdict()) + word + PLAIN : word)
              + "   method: "
              + report.method()
              + uncertainty(report);
      out.println(Wrap.text(verdict, console.width()));
    }
    return bytes.toString(StandardCharsets.UTF_8);
  }

  private static String uncertainty(Report report) {
    return Double.isNaN(report.errorEstimate())
        ? ", an estimate: it tells where to look"
        : ", peak uncertainty " + Human.percent(report.errorEstimate());
  }

  private static void duty(DutyReport duty, Console console, PrintStream out) {
    String head =
        "duty: "
            + duty.name()
            + " ("
            + duty.verdict().key()
            + ", highest utilisation "
            + Human.utilisation(duty.peak().utilisation())
            + ")";
    out.println(Wrap.text(head, console.width()));
    List<Spot> spots = duty.hotSpots().isEmpty() ? List.of(duty.peak()) : duty.hotSpots();
    List<String[]> rows = new ArrayList<>();
    for (Spot spot : spots.subList(0, Math.min(SHOWN, spots.size()))) {
      rows.add(
          new String[] {
            spot.id() + "  " + spot.feature() + " of " + spot.part(),
            Human.field(spot.field_V_per_m()),
            Human.field(spot.permitted_V_per_m()),
            Human.utilisation(spot.utilisation()),
            spot.state().key()
          });
    }
    new Table("hot spot", "field", "permitted", "use", "state").print(rows, console.width(), out);
    if (spots.size() > SHOWN) {
      out.println("... and " + (spots.size() - SHOWN) + " more in summary.md");
    }
    out.println(Wrap.text(Human.cure(spots.get(0)), console.width()));
    out.println();
  }

  private static String colour(Verdict verdict) {
    return switch (verdict) {
      case PASS -> "\u001b[36m";
      case AMBER -> "\u001b[33m";
      case RED -> "\u001b[31m";
    };
  }
}
