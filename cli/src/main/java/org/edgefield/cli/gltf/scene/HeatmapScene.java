package org.edgefield.cli.gltf.scene;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;
import org.edgefield.cli.colour.ColourScale;
import org.edgefield.cli.gltf.HeatmapStamp;
import org.edgefield.cli.gltf.SliceLayer;
import org.edgefield.cli.gltf.file.GlbBuilder;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.result.DutyResult;
import org.edgefield.field.result.FieldResult;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;

/** Puts a heatmap together: parts, sharp edges, pins, slices, board, and the file's own account. */
public final class HeatmapScene {
  /** Duties that viewers can switch between: four sets of texture coordinates, two duties each. */
  static final int MOST_DUTIES = 8;

  /** Version of the layout described in {@code asset.extras.format}. */
  private static final String FORMAT = "edgefield-heatmap/1";

  private HeatmapScene() {}

  /**
   * Builds the content of the file.
   *
   * @param slices cuts through the gas, may be empty
   */
  public static GlbBuilder build(
      Assembly assembly,
      FieldCase job,
      FieldResult result,
      HeatmapStamp stamp,
      List<SliceLayer> slices) {
    GlbBuilder glb = new GlbBuilder();
    ColourScale scale = new ColourScale(job.permitted().amber());
    int[] shown = shownDuties(result.duties());
    List<DutyResult> duties = Arrays.stream(shown).mapToObj(result.duties()::get).toList();
    List<String> names = Arrays.stream(shown).mapToObj(d -> job.duties().get(d).name()).toList();
    int governing = governing(duties);
    account(glb, assembly, job, result, stamp, shown, governing);
    SceneTree tree =
        new SceneTree(glb, Words.fileName(assembly.source().file()) + " - edgefield heatmap");
    Materials materials = new Materials(glb, names, governing, scale);

    SurfaceMesh mesh = result.mesh();
    List<Part> parts = assembly.parts();
    PartLayout layout = new PartLayout(parts, mesh);
    Utilisation utilisation = new Utilisation(duties, result.nodes().cornerNode());
    OuterSkin skin =
        new OuterSkin(parts, job.electrodes(), mesh, layout, calm(result, utilisation, scale));
    Box box = bounds(mesh);

    PartNodes partNodes =
        new PartNodes(
            tree, materials, mesh, result.nodes(), duties, utilisation, scale.amberLimit());
    int[] electrode = job.electrodeOfPart(parts.size());
    for (Part part : parts) {
      int e = electrode[part.index()];
      String name = e < 0 ? null : job.electrodes().get(e).name();
      partNodes.add(part, layout.triangles(part.index()), name, skin);
    }
    SharpEdges edges = new SharpEdges(mesh, result.nodes());
    EdgeNodes edgeNodes = new EdgeNodes(tree, materials, mesh, edges, utilisation, box.diagonal());
    List<Ints> segments = segments(edges, layout, parts.size());
    for (Part part : parts) {
      edgeNodes.add(part, segments.get(part.index()).toArray());
    }
    if (duties.stream().anyMatch(d -> !d.hotSpots().isEmpty())) {
      PinNodes pins =
          new PinNodes(
              tree,
              materials,
              parts,
              scale,
              mesh,
              result.nodes(),
              skin,
              box.diagonal(),
              duties.size());
      for (int d = 0; d < duties.size(); d++) {
        pins.add(d, names.get(d), duties.get(d).hotSpots());
      }
    }
    for (SliceLayer slice : slices) {
      SliceNodes.add(tree, materials, slice, shown);
    }
    board(
        tree,
        materials,
        box,
        new LegendBoard(assembly, job, result, stamp, scale, skin.encloser()),
        shown);
    return glb;
  }

  /** All duties, or the worst of them in their own order where there are too many. */
  private static int[] shownDuties(List<DutyResult> duties) {
    return IntStream.range(0, duties.size())
        .boxed()
        .sorted(Comparator.comparingDouble(d -> -duties.get(d).peak().utilisation()))
        .limit(MOST_DUTIES)
        .mapToInt(Integer::intValue)
        .sorted()
        .toArray();
  }

  private static int governing(List<DutyResult> duties) {
    int worst = 0;
    for (int d = 1; d < duties.size(); d++) {
      if (duties.get(d).peak().utilisation() > duties.get(worst).peak().utilisation()) {
        worst = d;
      }
    }
    return worst;
  }

  private static boolean[] calm(FieldResult result, Utilisation utilisation, ColourScale scale) {
    double limit = Math.min(ColourScale.CALM, scale.amberLimit());
    int[] corner = result.nodes().cornerNode();
    boolean[] calm = new boolean[corner.length / 3];
    for (int t = 0; t < calm.length; t++) {
      calm[t] = true;
      for (int c = 0; c < 3; c++) {
        calm[t] &= utilisation.mostOnFace(corner[3 * t + c]) < limit;
      }
    }
    return calm;
  }

  private static Box bounds(SurfaceMesh mesh) {
    Box box = new Box();
    double[] x = mesh.xyz();
    for (int v : mesh.triangles()) {
      box.add(x[3 * v], x[3 * v + 2], 0 - x[3 * v + 1]);
    }
    return box;
  }

  private static List<Ints> segments(SharpEdges edges, PartLayout layout, int parts) {
    List<Ints> out = new ArrayList<>();
    for (int p = 0; p < parts; p++) {
      out.add(new Ints());
    }
    for (int s = 0; s < edges.count(); s++) {
      if (edges.isSharp(s)) {
        out.get(layout.partOf(edges.corner(s, 0) / 3)).add(s);
      }
    }
    return out;
  }

  private static void board(
      SceneTree tree, Materials materials, Box box, LegendBoard legend, int[] shown) {
    List<Board> boards = Arrays.stream(shown).mapToObj(legend::of).toList();
    int rows = boards.stream().mapToInt(Board::rows).max().orElseThrow();
    int[] image = new int[shown.length];
    for (int d = 0; d < shown.length; d++) {
      Board board = boards.get(d);
      board.skip(rows - board.rows());
      image[d] = tree.glb().png(board.png(), "legend board " + (d + 1));
    }
    BoardNode.add(tree, materials, box, image, rows);
  }

  private static void account(
      GlbBuilder glb,
      Assembly assembly,
      FieldCase job,
      FieldResult result,
      HeatmapStamp stamp,
      int[] shown,
      int governing) {
    ObjectNode asset = glb.root().putObject("asset");
    asset.put("version", "2.0").put("generator", "edgefield " + stamp.toolVersion());
    ObjectNode extras = asset.putObject("extras");
    extras.put("format", FORMAT);
    extras.put("date", stamp.date().toString());
    extras
        .putObject("input")
        .put("file", Words.fileName(assembly.source().file()))
        .put("sha256", assembly.source().sha256())
        .put("unit", assembly.source().unit());
    extras
        .putObject("units")
        .put("length", "m")
        .put("field", "V/m")
        .put("utilisation", "field / permitted field")
        .put("axes", "model (x, y, z) is (x, z, -y) here");
    extras.put("method", result.method().name().toLowerCase(Locale.ROOT));
    extras
        .putObject("limits")
        .put("amber", job.permitted().amber())
        .put("red", 1.0)
        .put("margin", job.permitted().margin())
        .put("criterion", job.permitted().criterion().name().toLowerCase(Locale.ROOT));
    var list = extras.putArray("duties");
    for (int d = 0; d < shown.length; d++) {
      Duty duty = job.duties().get(shown[d]);
      list.addObject()
          .put("name", duty.name())
          .put("utilisation_attribute", ScaledAttributes.named("_UTILISATION", d))
          .put("field_attribute", ScaledAttributes.named("_FIELD_V_PER_M", d))
          .put("peak_utilisation", result.duties().get(shown[d]).peak().utilisation())
          .put("hot_spots", result.duties().get(shown[d]).hotSpots().size())
          .put("governing", d == governing);
    }
    extras.put("duties_left_out", result.duties().size() - shown.length);
  }
}
