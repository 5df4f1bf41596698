package org.edgefield.cli.gate;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import org.edgefield.cli.console.Console;
import org.edgefield.cli.console.Table;
import org.edgefield.cli.console.Wrap;
import org.edgefield.cli.gate.GateFinding.Change;
import org.edgefield.cli.report.Human;

/** Prints a comparison on a terminal. */
final class GateText {
  private static final int SHOWN = 20;

  private GateText() {}

  static void print(Comparison comparison, Console console) {
    for (Map.Entry<String, List<GateFinding>> duty : comparison.findings().entrySet()) {
      console.out().println("duty: " + duty.getKey());
      if (duty.getValue().isEmpty()) {
        console.out().println("no hot spots, none accepted");
      } else {
        print(duty.getValue(), console);
      }
      console.out().println();
    }
    comparison
        .changedConditions()
        .forEach(c -> console.out().println(Wrap.text("changed: " + c, console.width())));
    console.out().println(Wrap.text("gate: " + comparison.verdict(), console.width()));
  }

  // Rows for what changed; what stayed or got better is only counted.
  private static void print(List<GateFinding> findings, Console console) {
    List<String[]> rows = new ArrayList<>();
    Map<Change, Long> counts = new EnumMap<>(Change.class);
    for (GateFinding f : findings) {
      counts.merge(f.change(), 1L, Long::sum);
      boolean told = f.fails() || f.change() == Change.NEW || f.change() == Change.WORSE;
      if (told && rows.size() < SHOWN) {
        rows.add(
            new String[] {
              f.spot().feature() + " of " + f.spot().part(),
              f.change().key(),
              f.spot().red() ? "red" : "amber",
              use(f.accepted()),
              use(f.now()),
              f.fails() ? "FAIL" : "ok"
            });
      }
    }
    if (!rows.isEmpty()) {
      new Table("hot spot", "change", "state", "accepted", "now", "gate")
          .print(rows, console.width(), console.out());
    }
    List<String> words = new ArrayList<>();
    counts.forEach((change, count) -> words.add(count + " " + change.key()));
    console.out().println("hot spots: " + String.join(", ", words));
  }

  static String use(double utilisation) {
    return Double.isNaN(utilisation) ? "-" : Human.utilisation(utilisation);
  }
}
