package org.edgefield.cli.report;

import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import org.edgefield.cli.pipeline.ModelLook;
import org.edgefield.curvature.PartSummary;
import org.edgefield.importer.brep.Part;

/** The parts of a model as JSON; SI units, null where there is no such radius. */
public final class PartsJson {
  private PartsJson() {}

  /** The text, with a final line break. */
  public static String text(ModelLook look) {
    ObjectNode root = new ObjectMapper().createObjectNode();
    root.put("format", "edgefield-parts-1");
    root.putObject("input")
        .put("file", look.source().file())
        .put("sha256", look.source().sha256())
        .put("unit", look.source().unit())
        .put("schema", look.source().schema());
    ArrayNode parts = root.putArray("parts");
    for (Part part : look.parts()) {
      PartSummary s = look.summaries().get(part.index());
      ObjectNode node = parts.addObject().put("name", part.name()).put("path", part.path());
      ArrayNode bounds = node.putArray("bounds_m");
      for (double b : part.bounds_m()) {
        bounds.add(b);
      }
      node.put("volume_m3", part.volume_m3())
          .put("area_m2", part.area_m2())
          .put("faces", part.faceCount())
          .put("sharp_convex_edges", s.sharpConvexEdges())
          .put("sharp_convex_length_m", s.sharpConvexLength_m())
          .put("corners", s.corners());
      if (Double.isInfinite(s.smallestConvexRadius_m())) {
        node.putNull("least_convex_radius_m");
      } else {
        node.put("least_convex_radius_m", s.smallestConvexRadius_m());
      }
    }
    ArrayNode warnings = root.putArray("warnings");
    look.warnings().forEach(warnings::add);
    return root.toPrettyString() + "\n";
  }
}
