package org.edgefield.cli.casefile;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import org.edgefield.importer.brep.Part;

/**
 * A starter case: parts sorted into live, earthed and ignored by their names, as far as names tell
 * (common practice of naming, in English and German), everything else live; comments say what to
 * check.
 */
public final class CaseDraft {
  private static final List<String> EARTHED =
      List.of(
          "housing",
          "enclosure",
          "cabinet",
          "tank",
          "frame",
          "earth",
          "ground",
          "wall",
          "door",
          "plate",
          "floor",
          "gehäuse",
          "schrank",
          "kessel",
          "rahmen",
          "erde",
          "wand");
  private static final List<String> INSULATING =
      List.of("insulator", "bushing", "spacer", "isolator", "stützer", "durchführung");

  private CaseDraft() {}

  /**
   * The text of the case file.
   *
   * @param folder where the case file will lie
   * @param model the model
   * @param parts its parts
   */
  public static String text(Path folder, Path model, List<Part> parts) {
    Set<String> live = new LinkedHashSet<>();
    Set<String> earthed = new LinkedHashSet<>();
    Set<String> ignored = new LinkedHashSet<>();
    for (Part part : parts) {
      String name = part.name().toLowerCase(Locale.ROOT);
      if (INSULATING.stream().anyMatch(name::contains)) {
        ignored.add(part.name());
      } else if (EARTHED.stream().anyMatch(name::contains)) {
        earthed.add(part.name());
      } else {
        live.add(part.name());
      }
    }
    if (live.isEmpty()) {
      live.addAll(earthed);
      earthed.clear();
    }
    StringBuilder out = new StringBuilder();
    out.append("# Starter case; check electrodes, voltages and place before you trust a number.\n");
    out.append("model: ").append(quoted(relative(folder, model))).append('\n');
    out.append("# Every part belongs to one electrode or to ignore; names may carry * and ?.\n");
    out.append("electrodes:\n");
    out.append("  - {name: live, parts: ").append(list(live)).append("}\n");
    if (!earthed.isEmpty()) {
      out.append("  - {name: earthed, parts: ").append(list(earthed)).append(", earth: true}\n");
    }
    if (!ignored.isEmpty()) {
      out.append("# Insulators carry no potential of their own.\n");
      out.append("ignore: ").append(list(ignored)).append('\n');
    }
    out.append("surroundings: {gas: air, altitude: 0 m, temperature: 20 degC}\n");
    out.append(
        "# Radius the shop really makes where the model is drawn sharp; the worst counts.\n");
    out.append("edges: {radius as made: 0.2 mm}\n");
    out.append("# \"10 kV\" is a peak or DC value; write \"10 kV rms\" for an effective value.\n");
    out.append("duties:\n");
    out.append("  - name: service\n    voltages: {live: 10 kV rms}\n");
    out.append("permitted: {criterion: fixed, field: 3 kV/mm, margin: 1.0, amber: 0.8}\n");
    return out.toString();
  }

  private static String relative(Path folder, Path model) {
    Path absolute = model.toAbsolutePath().normalize();
    try {
      return folder.relativize(absolute).toString().replace('\\', '/');
    } catch (IllegalArgumentException e) {
      // Another drive: only the whole path will do.
      return absolute.toString();
    }
  }

  private static String list(Set<String> names) {
    List<String> quoted = new ArrayList<>();
    names.forEach(n -> quoted.add(quoted(n)));
    return "[" + String.join(", ", quoted) + "]";
  }

  private static String quoted(String text) {
    return '"' + text.replace("\\", "\\\\").replace("\"", "\\\"") + '"';
  }
}
