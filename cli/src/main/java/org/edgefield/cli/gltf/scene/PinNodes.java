package org.edgefield.cli.gltf.scene;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.edgefield.cli.colour.ColourScale;
import org.edgefield.cli.gltf.file.GlbBuilder;
import org.edgefield.cli.gltf.text.Canvas;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.field.result.HotSpot;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Pins at the hot spots: a thin spike that ends at the peak, and a square lantern with the rank on
 * all four sides and on top, amber or red by the verdict.
 */
final class PinNodes {
  /** Pins per duty; the rest of the hot spots is in the result file. */
  static final int MOST = 20;

  /** Edge length of a lantern as a share of the scene's diagonal. */
  static final double HEAD = 0.03;

  /** Usual length of a pin as a share of the scene's diagonal. */
  static final double REACH = 0.065;

  private static final double SPIKE_OF_HEAD = 0.13;
  private static final int CELL = 128;
  private static final int COLUMNS = 8;
  private static final int RIM = 9;
  private static final int DARK = 0x1e2529;
  private static final int WHITE = 0xffffff;

  private final SceneTree tree;
  private final Materials materials;
  private final List<Part> parts;
  private final ColourScale scale;
  private final SurfaceMesh mesh;
  private final SurfaceNodes nodes;
  private final PinPlacement placement;
  private final double diagonal;
  private final int dutyCount;

  PinNodes(
      SceneTree tree,
      Materials materials,
      List<Part> parts,
      ColourScale scale,
      SurfaceMesh mesh,
      SurfaceNodes nodes,
      OuterSkin skin,
      double diagonal,
      int dutyCount) {
    this.tree = tree;
    this.materials = materials;
    this.parts = parts;
    this.scale = scale;
    this.mesh = mesh;
    this.nodes = nodes;
    this.placement = new PinPlacement(mesh, skin, HEAD * diagonal, REACH * diagonal);
    this.diagonal = diagonal;
    this.dutyCount = dutyCount;
  }

  /** Rows of the texture for so many pins: a power of two, as viewers like it. */
  private static int rows(int pins) {
    int rows = 1;
    while (rows * COLUMNS < pins) {
      rows *= 2;
    }
    return rows;
  }

  /** One texture with a cell per pin of a duty. */
  private int labels(List<HotSpot> spots) {
    int rows = rows(spots.size());
    Canvas canvas = new Canvas(COLUMNS * CELL, rows * CELL, DARK);
    for (int i = 0; i < spots.size(); i++) {
      int left = i % COLUMNS * CELL;
      int top = i / COLUMNS * CELL;
      boolean red = spots.get(i).utilisation() >= 1;
      int ground = scale.rgb(red ? 1 : scale.amberLimit());
      canvas.fill(left + RIM, top + RIM, CELL - 2 * RIM, CELL - 2 * RIM, ground);
      String text = Integer.toString(spots.get(i).id());
      double capital = text.length() == 1 ? 74 : text.length() == 2 ? 60 : 40;
      double x = left + (CELL - Canvas.textWidth(text, capital)) / 2;
      canvas.text(text, x, top + (CELL + capital) / 2, capital, red ? WHITE : DARK);
    }
    return tree.glb().png(canvas.png(), "pin numbers");
  }

  /**
   * Adds the pins of a duty.
   *
   * @param duty index among the duties shown
   * @param dutyName appended to the names where there are several
   */
  void add(int duty, String dutyName, List<HotSpot> hotSpots) {
    List<HotSpot> spots = hotSpots.subList(0, Math.min(MOST, hotSpots.size()));
    if (spots.isEmpty()) {
      return;
    }
    int[] image = new int[dutyCount];
    Arrays.fill(image, -1);
    image[duty] = labels(spots);
    int rows = rows(spots.size());
    for (int i = 0; i < spots.size(); i++) {
      HotSpot spot = spots.get(i);
      String name =
          spot.id()
              + " - "
              + Words.field(spot.field_V_per_m())
              + " - "
              + Words.place(spot, parts.get(spot.part()))
              + (dutyCount > 1 ? " [" + dutyName + "]" : "");
      SceneTree.Leaf leaf = tree.leaf("hot spots", name);
      leaf.node()
          .putObject("extras")
          .put("duty", dutyName)
          .put("rank", spot.id())
          .put("part", parts.get(spot.part()).name())
          .put("feature", spot.feature())
          .put("field_V_per_m", spot.field_V_per_m())
          .put("permitted_V_per_m", spot.permitted_V_per_m())
          .put("utilisation", spot.utilisation())
          .put("law", spot.law().text())
          .put("cure", Words.cure(spot.cure()))
          .putArray("at_m")
          .add(spot.at_m()[0])
          .add(spot.at_m()[1])
          .add(spot.at_m()[2]);
      Pin pin = new Pin(i % COLUMNS, i / COLUMNS, rows);
      pin.build(spot.at_m(), placement.head(spot.at_m(), normal(spot)));
      GlbBuilder glb = tree.glb();
      ObjectNode primitive =
          leaf.primitive(glb.positions(pin.xyz.toArray()), glb.indices(pin.index.toArray()));
      primitive.withObject("/attributes").put("TEXCOORD_0", glb.floats(pin.uv.toArray(), 2));
      materials.pictured(primitive, "pins, " + dutyName, image);
    }
  }

  /** Mean normal of the nodes at the mesh vertex nearest to a hot spot, in model axes. */
  private double[] normal(HotSpot spot) {
    double[] at = spot.at_m();
    double least = Double.POSITIVE_INFINITY;
    List<Integer> nearest = new ArrayList<>();
    for (int node : spot.nodes()) {
      int v = 3 * nodes.nodeVertex()[node];
      double dx = mesh.xyz()[v] - at[0];
      double dy = mesh.xyz()[v + 1] - at[1];
      double dz = mesh.xyz()[v + 2] - at[2];
      double square = dx * dx + dy * dy + dz * dz;
      if (square < least) {
        least = square;
        nearest.clear();
      }
      if (square <= least) {
        nearest.add(node);
      }
    }
    double[] sum = new double[3];
    for (int node : nearest) {
      for (int c = 0; c < 3; c++) {
        sum[c] += nodes.normal()[3 * node + c];
      }
    }
    boolean none = sum[0] == 0 && sum[1] == 0 && sum[2] == 0;
    return none ? new double[] {0, 0, 1} : Triangles.unit(sum);
  }

  /** Geometry of one pin, in glTF axes. */
  private final class Pin {
    final Floats xyz = new Floats();
    final Floats uv = new Floats();
    final Ints index = new Ints();
    private final double u0;
    private final double v0;
    private final double du = 1.0 / COLUMNS;
    private final double dv;

    Pin(int column, int row, int rows) {
      u0 = column * du;
      dv = 1.0 / rows;
      v0 = row * dv;
    }

    void build(double[] atModel, double[] headModel) {
      double[] at = Axes.of(atModel, 0);
      double[] c = Axes.of(headModel, 0);
      spike(at, c);
      double h = HEAD * diagonal / 2;
      // Sides in turn, then top and bottom: right and up vectors of each face as seen from outside.
      double[][][] faces = {
        {{1, 0, 0}, {0, 1, 0}, {0, 0, 1}},
        {{0, 0, -1}, {0, 1, 0}, {1, 0, 0}},
        {{-1, 0, 0}, {0, 1, 0}, {0, 0, -1}},
        {{0, 0, 1}, {0, 1, 0}, {-1, 0, 0}},
        {{1, 0, 0}, {0, 0, -1}, {0, 1, 0}},
        {{1, 0, 0}, {0, 0, 1}, {0, -1, 0}},
      };
      for (double[][] f : faces) {
        int first = xyz.size() / 3;
        for (int corner = 0; corner < 4; corner++) {
          double right = corner == 1 || corner == 2 ? h : -h;
          double up = corner >= 2 ? h : -h;
          double[] p = new double[3];
          for (int k = 0; k < 3; k++) {
            p[k] = c[k] + right * f[0][k] + up * f[1][k] + h * f[2][k];
          }
          xyz.add(p);
          uv.add(u0 + (right > 0 ? du : 0), v0 + (up > 0 ? 0 : dv));
        }
        index.add(first, first + 1, first + 2, first, first + 2, first + 3);
      }
    }

    private void spike(double[] tip, double[] c) {
      double[] d = Triangles.unit(new double[] {c[0] - tip[0], c[1] - tip[1], c[2] - tip[2]});
      double[] helper = Math.abs(d[1]) < 0.9 ? new double[] {0, 1, 0} : new double[] {1, 0, 0};
      double[] a = Triangles.unit(cross(d, helper));
      double[] b = cross(d, a);
      double r = SPIKE_OF_HEAD * HEAD * diagonal;
      // The rim of the cell is plain dark.
      double u = u0 + du * RIM / CELL / 2;
      double v = v0 + dv * RIM / CELL / 2;
      xyz.add(tip);
      uv.add(u, v);
      for (int k = 0; k < 3; k++) {
        double angle = 2 * Math.PI * k / 3;
        double ca = r * Math.cos(angle);
        double sa = r * Math.sin(angle);
        xyz.add(
            c[0] + ca * a[0] + sa * b[0],
            c[1] + ca * a[1] + sa * b[1],
            c[2] + ca * a[2] + sa * b[2]);
        uv.add(u, v);
        index.add(0, 1 + (k + 1) % 3, 1 + k);
      }
    }
  }

  private static double[] cross(double[] a, double[] b) {
    return new double[] {
      a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]
    };
  }
}
