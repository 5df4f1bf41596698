package org.edgefield.cli.report;

import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.edgefield.importer.brep.Part;

/** Short unique labels of parts: the name, or the instance path where two parts share the name. */
public final class PartLabels {
  private final List<Part> parts;
  private final Map<String, Long> uses;

  /** Labels for the parts of a model. */
  public PartLabels(List<Part> parts) {
    this.parts = parts;
    this.uses = parts.stream().collect(Collectors.groupingBy(Part::name, Collectors.counting()));
  }

  /** Label of a part. */
  public String of(int part) {
    Part p = parts.get(part);
    return uses.get(p.name()) == 1 ? p.name() : p.path();
  }
}
