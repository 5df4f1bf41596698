package org.edgefield.field.estimate;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.field.contact.HiddenTriangles;
import org.edgefield.field.edge.RoundedCorner;
import org.edgefield.field.gas.FieldProfile;
import org.edgefield.field.gas.PermittedField;
import org.edgefield.field.hotspot.LocalLaw;
import org.edgefield.field.hotspot.SharpVertices;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Surroundings.EarthPlane;
import org.edgefield.field.result.DutyField;
import org.edgefield.field.result.Law;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/**
 * The geometry of a quick estimate, worked out once: per node the flux tube, the opposing
 * electrodes and their distances. Fields of any duty follow by superposition; the same laws tell
 * how a field changes with radius and gap, which the cures of a solve use too.
 *
 * <p>Between a node of electrode A and an opposing electrode B the tube widens by A's law up to a
 * point and narrows by B's from there; the point divides the way by the logarithms of both
 * widenings, so that a plane facing a rod takes none of it and equal rods half each. With the
 * potentials V of a duty
 *
 * <pre>E = max over B of |(V_A - V_B) g_B + V_m g_env|,  V_m = (1 - w) V_A + w V_B</pre>
 *
 * where w is A's share of the way and g_env stands for what the pair together, at V_m, has against
 * the rest of the world (earth at infinity or other earthed electrodes), screened in the gap. V_A
 * against infinity alone is looked at as well. The earth plane is one more opposing electrode.
 */
public final class EstimateModel implements LocalLaw {
  private final FieldCase fieldCase;
  private final Sites sites;
  private final SharpVertices sharp;
  private final int[] electrode;
  private final double[] toInfinity;
  private final Opposing[] opposing;
  private final double[][] conductance;
  private final double[][] share;
  private final AmbientField ambient;
  private final List<String> warnings = new ArrayList<>();

  private EstimateModel(
      Assembly assembly,
      SurfaceMesh mesh,
      SurfaceNodes nodes,
      Features features,
      FieldCase fieldCase,
      Progress progress) {
    this.fieldCase = fieldCase;
    int parts = assembly.parts().size();
    int[] electrodeOfPart = fieldCase.electrodeOfPart(parts);
    int[] group = new int[mesh.triangleCount()];
    for (int t = 0; t < group.length; t++) {
      int part = assembly.geometry().facePart(mesh.triangleFace()[t]);
      group[t] = electrodeOfPart[part] < 0 ? -1 : part;
    }
    progress.report("estimate", 0, "");
    TriangleTree tree = TriangleTree.build(mesh.xyz(), mesh.triangles(), group);
    boolean[] hidden = HiddenTriangles.of(assembly, mesh, electrodeOfPart);
    SiteBuilder builder =
        new SiteBuilder(assembly, mesh, nodes, features, fieldCase.edges(), tree, hidden);
    sites = builder.build();
    sharp = builder.sharp();
    int count = sites.count();
    electrode = new int[count];
    boolean[] seen = new boolean[count];
    for (int i = 0; i < nodes.cornerNode().length; i++) {
      seen[sites.siteOfNode[nodes.cornerNode()[i]]] |= !hidden[i / 3];
    }
    for (int s = 0; s < count; s++) {
      electrode[s] = seen[s] ? electrodeOfPart[sites.part[s]] : -1;
    }
    Shelter.find(sites, electrode, fieldCase, assembly.parts(), nodes, tree);
    int electrodes = fieldCase.electrodes().size();
    EarthPlane plane = fieldCase.surroundings().earthPlane();
    opposing = new Opposing[electrodes + 1];
    for (int e = 0; e < electrodes; e++) {
      progress.report("estimate", 0.2 + 0.5 * e / electrodes, "distances");
      boolean[] own = new boolean[count];
      for (int s = 0; s < count; s++) {
        own[s] = electrode[s] < 0 || electrode[s] == e;
      }
      boolean[] target = new boolean[parts];
      for (int p : fieldCase.electrodes().get(e).parts()) {
        target[p] = true;
      }
      opposing[e] = Opposing.electrode(sites, mesh, nodes, tree, own, target);
    }
    if (plane != null) {
      opposing[electrodes] = Opposing.plane(sites, plane.axis(), plane.offset_m());
    }
    progress.report("estimate", 0.7, "flux tubes");
    toInfinity = new double[count];
    conductance = new double[electrodes + 1][];
    share = new double[electrodes + 1][];
    for (int e = 0; e <= electrodes; e++) {
      if (opposing[e] != null) {
        conductance[e] = new double[count];
        share[e] = new double[count];
      }
    }
    blocks(
        count,
        (from, to) -> {
          FluxTube here = new FluxTube();
          FluxTube there = new FluxTube();
          for (int s = from; s < to; s++) {
            if (electrode[s] >= 0) {
              toInfinity[s] =
                  1
                      / sites
                          .tube(s, here)
                          .resistance(Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY);
              for (int e = 0; e <= electrodes; e++) {
                if (opposing[e] != null && opposing[e].gap[s] < Double.POSITIVE_INFINITY) {
                  pair(s, e, here, there);
                }
              }
            }
          }
        });
    ambient =
        fieldCase.surroundings().ambientField_V_per_m() == null
            ? null
            : new AmbientField(sites, fieldCase, electrode);
    remarks();
    progress.report("estimate", 1, "");
  }

  /**
   * Works out the geometry.
   *
   * @param assembly the model
   * @param mesh its mesh
   * @param nodes the mesh's nodes
   * @param features edge classes and rounded edges
   * @param fieldCase electrodes, surroundings, edges
   * @param progress receives reports
   */
  public static EstimateModel build(
      Assembly assembly,
      SurfaceMesh mesh,
      SurfaceNodes nodes,
      Features features,
      FieldCase fieldCase,
      Progress progress) {
    return new EstimateModel(assembly, mesh, nodes, features, fieldCase, progress);
  }

  /** A range of sites for one thread. */
  private interface Range {
    void run(int from, int to);
  }

  private static void blocks(int count, Range work) {
    int blocks = (count + SiteBuilder.BLOCK - 1) / SiteBuilder.BLOCK;
    IntStream.range(0, blocks)
        .parallel()
        .forEach(
            b -> work.run(b * SiteBuilder.BLOCK, Math.min(count, (b + 1) * SiteBuilder.BLOCK)));
  }

  private void pair(int s, int e, FluxTube here, FluxTube there) {
    int far = opposing[e].site[s];
    sites.tube(s, here);
    FluxTube other = far < 0 ? null : sites.tube(far, there);
    double gap = opposing[e].gap[s];
    boolean facing = far >= 0 && facing(s, far, gap);
    double w = facing ? 1 : shareOf(here, other, gap);
    share[e][s] = w;
    conductance[e][s] =
        facing
            ? ParallelSurfacesLaw.field_V_per_m(1, sites.k1[s], sites.k2[s], gap)
            : 1 / resistance(here, other, gap, w);
  }

  /**
   * Whether the far surface is a parallel surface of this one, near enough that the bodies' ends do
   * not tell: then the law of parallel surfaces is exact.
   */
  private boolean facing(int s, int far, double gap) {
    if (sites.form[s] != Sites.SMOOTH || sites.form[far] != Sites.SMOOTH) {
      return false;
    }
    double dot = 0;
    for (int c = 0; c < 3; c++) {
      dot += sites.normal[3 * s + c] * sites.normal[3 * far + c];
    }
    if (dot > -FACING || gap * gap * ends(s) > ENDS) {
      return false;
    }
    double a = ParallelSurfacesLaw.held(sites.k1[s], gap);
    double b = ParallelSurfacesLaw.held(sites.k2[s], gap);
    double misfit =
        Math.abs(sites.k2[far] + a / (1 + a * gap)) + Math.abs(sites.k1[far] + b / (1 + b * gap));
    return misfit * gap < MISFIT;
  }

  /** Larger of the end terms of directions in which the body does not close on itself. */
  private double ends(int s) {
    double k1 = sites.k1[s];
    double k2 = sites.k2[s];
    double e1 = k1 * k1 < 0.5 * sites.end1[s] ? sites.end1[s] : 0;
    double e2 = k2 * k2 < 0.5 * sites.end2[s] ? sites.end2[s] : 0;
    return Math.max(e1, e2);
  }

  private static final double FACING = 0.99;
  private static final double ENDS = 0.25;
  private static final double MISFIT = 0.02;

  private static double shareOf(FluxTube here, FluxTube other, double gap) {
    double a = Math.max(0, Math.log(here.growth(gap, gap)));
    double b = other == null ? 0 : Math.max(0, Math.log(other.growth(gap, gap)));
    return a + b < 1e-12 ? (other == null ? 1 : 0.5) : a / (a + b);
  }

  /** Potential difference per field strength through a tube that widens, then narrows. */
  private static double resistance(FluxTube here, FluxTube other, double gap, double w) {
    if (other == null || w == 1) {
      return here.resistance(gap, gap);
    }
    double x = w * gap;
    double first = w == 0 ? 0 : here.resistance(x, gap);
    double rest = gap - x;
    return first + other.resistance(rest, gap) * other.growth(rest, gap) / here.growth(x, gap);
  }

  /**
   * Estimates one duty.
   *
   * @param duty index in the case
   * @param permitted what each point may bear
   * @return values on the nodes
   */
  public DutyField field(int duty, PermittedField permitted) {
    int n = sites.siteOfNode.length;
    double[] field = new double[sites.count()];
    double[] limit = new double[sites.count()];
    double[] gap = new double[sites.count()];
    Duty d = fieldCase.duties().get(duty);
    blocks(
        sites.count(),
        (from, to) -> {
          for (int s = from; s < to; s++) {
            limit[s] = permitted.at_V_per_m(sites.k1[s], sites.k2[s]);
            gap[s] = nearest(s);
            if (electrode[s] >= 0) {
              field[s] = evaluate(s, d).field;
            }
          }
        });
    double[] nodeField = new double[n];
    double[] nodeLimit = new double[n];
    double[] nodeGap = new double[n];
    double[] nodeRadius = new double[n];
    byte[] nodeLaw = new byte[n];
    double[] uncertainty = new double[n];
    for (int i = 0; i < n; i++) {
      int s = sites.siteOfNode[i];
      nodeField[i] = field[s];
      nodeLimit[i] = limit[s];
      nodeGap[i] = gap[s];
      nodeRadius[i] = sites.radius(s);
      nodeLaw[i] = code(sites.law[s]);
      uncertainty[i] = uncertainty(sites.law[s]);
    }
    return new DutyField(d.name(), nodeField, nodeLimit, nodeGap, nodeRadius, nodeLaw, uncertainty);
  }

  /** The form in which {@link DutyField#law} keeps a law. */
  @SuppressWarnings("EnumOrdinal")
  private static byte code(Law law) {
    return (byte) law.ordinal();
  }

  /** Relative uncertainty per law, from the comparisons with closed forms in the tests. */
  private static double uncertainty(Law law) {
    return switch (law) {
      case PARALLEL_SURFACES -> 0.3;
      case ROUNDED_WEDGE, EDGE_AS_MADE -> 0.4;
      case CORNER_AS_MADE -> 0.5;
      case SOLVED -> throw new IllegalStateException("an estimate solves nothing");
    };
  }

  private double nearest(int s) {
    double gap = Double.POSITIVE_INFINITY;
    for (Opposing o : opposing) {
      if (o != null) {
        gap = Math.min(gap, o.gap[s]);
      }
    }
    return gap;
  }

  /**
   * The value at one site and what governs it.
   *
   * @param field V/m
   * @param against index of the electrode (or the plane) that governs, -1 for earth at infinity
   * @param difference_V potential difference to it
   */
  private record Value(double field, int against, double difference_V) {}

  private Value evaluate(int s, Duty duty) {
    int a = electrode[s];
    boolean floating = isFloating(a);
    double re = floating ? 0 : duty.real_V()[a];
    double im = floating ? 0 : duty.imaginary_V()[a];
    double own = Math.hypot(re, im);
    double driven = ambient == null ? 0 : ambient.field_V_per_m(s);
    double best = driven + own * toInfinity[s];
    double difference = own;
    int against = -1;
    for (int e = 0; e < opposing.length; e++) {
      if (opposing[e] == null || e == a || !(opposing[e].gap[s] < Double.POSITIVE_INFINITY)) {
        continue;
      }
      double bre = 0;
      double bim = 0;
      boolean loose = floating;
      if (e < fieldCase.electrodes().size()) {
        bre = duty.real_V()[e];
        bim = duty.imaginary_V()[e];
        loose |= isFloating(e);
      }
      double g = conductance[e][s];
      double value;
      double u;
      if (loose) {
        // A floating body may sit anywhere between the electrodes: the widest difference counts.
        u = widestDifference_V(duty);
        value = u * g;
      } else {
        u = Math.hypot(re - bre, im - bim);
        double w = share[e][s];
        double rest = environment(s, e);
        double common = screened(rest, opposing[e].gap[s]);
        value =
            Math.hypot(
                (re - bre) * g + ((1 - w) * re + w * bre) * common,
                (im - bim) * g + ((1 - w) * im + w * bim) * common);
      }
      value += driven;
      if (value > best) {
        best = value;
        against = e;
        difference = u;
      }
    }
    return new Value(best, against, difference);
  }

  private boolean isFloating(int e) {
    return fieldCase.electrodes().get(e).kind() == Electrode.Kind.FLOATING;
  }

  /** Largest difference between any two set electrodes, earth included. */
  private double widestDifference_V(Duty duty) {
    double widest = 0;
    for (int a = 0; a < duty.real_V().length; a++) {
      if (isFloating(a)) {
        continue;
      }
      widest = Math.max(widest, Math.hypot(duty.real_V()[a], duty.imaginary_V()[a]));
      for (int b = 0; b < a; b++) {
        if (!isFloating(b)) {
          widest = Math.max(widest, duty.difference_V(a, b));
        }
      }
    }
    return widest;
  }

  /** Field per volt of a site against everything earthed but one electrode. */
  private double environment(int s, int except) {
    double g = toInfinity[s];
    for (int e = 0; e < opposing.length; e++) {
      boolean earth =
          e == fieldCase.electrodes().size()
              || fieldCase.electrodes().get(e).kind() == Electrode.Kind.EARTH;
      if (e != except
          && earth
          && opposing[e] != null
          && opposing[e].gap[s] < Double.POSITIVE_INFINITY) {
        g = Math.max(g, conductance[e][s]);
      }
    }
    return g;
  }

  private static double screened(double g, double gap) {
    return g == 0 ? 0 : g / (1 + 1 / (g * gap));
  }

  private void remarks() {
    for (Electrode e : fieldCase.electrodes()) {
      if (e.kind() == Electrode.Kind.FLOATING) {
        warnings.add(
            "electrode "
                + e.name()
                + " floats: the estimate takes the widest voltage difference of the duty on it;"
                + " solve finds its potential");
      }
    }
    if (ambient != null) {
      warnings.add(AmbientField.REMARK);
    }
    boolean touch = false;
    for (Opposing o : opposing) {
      for (int s = 0; o != null && s < sites.count(); s++) {
        touch |= o.gap[s] <= 2 * Opposing.LEAST_GAP;
      }
    }
    if (touch) {
      warnings.add("parts of different electrodes touch: the field there means nothing");
    }
    boolean thick = false;
    for (int s = 0; s < sites.count(); s++) {
      thick |= sites.law[s] == Law.EDGE_AS_MADE && sites.radius(s) > 0.1 * sites.thickness[s];
    }
    if (thick) {
      warnings.add(
          "edge radius as made above a tenth of the body's thickness: model the rounding instead");
    }
  }

  @Override
  public SharpVertices sharp() {
    return sharp;
  }

  /** Remarks for the user. */
  public List<String> warnings() {
    return List.copyOf(warnings);
  }

  @Override
  public int opposingPart(int duty, int node) {
    int s = sites.siteOfNode[node];
    Value v = evaluate(s, fieldCase.duties().get(duty));
    int far = v.against < 0 ? -1 : opposing[v.against].site[s];
    return far < 0 ? -1 : sites.part[far];
  }

  @Override
  public double difference_V(int duty, int node) {
    return evaluate(sites.siteOfNode[node], fieldCase.duties().get(duty)).difference_V;
  }

  @Override
  public double gap_m(int duty, int node) {
    int s = sites.siteOfNode[node];
    Value v = evaluate(s, fieldCase.duties().get(duty));
    return v.against < 0 ? Double.POSITIVE_INFINITY : opposing[v.against].gap[s];
  }

  @Override
  public double[] curvatures(int node) {
    int s = sites.siteOfNode[node];
    return new double[] {sites.k1[s], sites.k2[s]};
  }

  @Override
  public double largestRadius_m(int node) {
    int s = sites.siteOfNode[node];
    return sites.form[s] == Sites.SMOOTH ? Double.POSITIVE_INFINITY : sites.thickness[s] / 2;
  }

  @Override
  public double change(int duty, int node, double radius_m, double gap_m) {
    int s = sites.siteOfNode[node];
    Value v = evaluate(s, fieldCase.duties().get(duty));
    return law(s, v.against, radius_m, gap_m) / law(s, v.against, Double.NaN, Double.NaN);
  }

  @Override
  public FieldProfile asMade(int node) {
    int s = sites.siteOfNode[node];
    double radius = sites.radius(s);
    return switch (sites.law[s]) {
      case EDGE_AS_MADE -> x -> sites.wedge[s].decay(x / radius);
      case CORNER_AS_MADE -> x -> 1 / RoundedCorner.spread(x / radius);
      default -> null;
    };
  }

  private double law(int s, int against, double radius_m, double gap_m) {
    FluxTube here = sites.tube(s, new FluxTube(), radius_m);
    if (against < 0) {
      return 1 / here.resistance(Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY);
    }
    double gap = Double.isNaN(gap_m) ? opposing[against].gap[s] : gap_m;
    int far = opposing[against].site[s];
    FluxTube there = far < 0 ? null : sites.tube(far, new FluxTube());
    return 1 / resistance(here, there, gap, share[against][s]);
  }
}
