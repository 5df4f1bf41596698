package org.edgefield.field.bem.solve;

import java.util.ArrayList;
import java.util.List;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.curvature.node.NodeBuilder;
import org.edgefield.field.bem.edge.AsMadeField;
import org.edgefield.field.bem.edge.SharpEdges;
import org.edgefield.field.bem.evaluate.FieldEvaluator;
import org.edgefield.field.bem.recovery.FieldRecovery;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.parallel.Workers;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * One solved mesh: raw and recovered field magnitudes of every duty at the unknowns.
 *
 * @param mesh the mesh
 * @param nodes its smooth-patch nodes
 * @param surface charged part of it
 * @param units solved densities
 * @param zoneEdge per unknown on a sharp edge or too near to one to have a peak, the nearest
 *     unknown on that edge; -1 elsewhere
 * @param raw per duty, magnitude over the cycle at every unknown, V/m
 * @param recovered the same, smoothed
 * @param sharp field around edges drawn sharp, null where there are none
 * @param asMade per duty, peak fields on those edges at their radius as made; empty where none
 */
record Level(
    SurfaceMesh mesh,
    SurfaceNodes nodes,
    ChargedSurface surface,
    UnitFields units,
    int[] zoneEdge,
    List<double[]> raw,
    List<double[]> recovered,
    AsMadeField sharp,
    List<AsMadeField.Values> asMade) {

  static Level solve(
      Assembly assembly,
      Features features,
      SharpEdges sharpEdges,
      SurfaceMesh mesh,
      FieldCase fieldCase,
      double farTolerance,
      Workers workers,
      Progress progress) {
    SurfaceNodes nodes = NodeBuilder.smoothPatches(assembly.geometry(), mesh, features);
    ChargedSurface surface = ChargedSurface.of(assembly, mesh, nodes, fieldCase);
    if (surface.unknowns() == 0) {
      throw new SolveException("no electrode has a surface that can carry charge");
    }
    UnitFields units = UnitFields.solve(surface, fieldCase, farTolerance, workers, progress);
    double[] normal = new double[3 * surface.unknowns()];
    for (int i = 0; i < surface.unknowns(); i++) {
      System.arraycopy(nodes.normal(), 3 * surface.unknownNode()[i], normal, 3 * i, 3);
    }
    FieldRecovery recovery =
        new FieldRecovery(surface.cornerUnknown(), surface.position(), normal, surface.seam());
    double[][] smooth = new double[units.density().length][];
    for (int k = 0; k < smooth.length; k++) {
      smooth[k] = recovery.recover(units.density()[k]);
    }
    List<double[]> raw = new ArrayList<>();
    List<double[]> recovered = new ArrayList<>();
    AsMadeField sharp =
        sharpEdges.count() == 0
            ? null
            : sharpField(
                assembly,
                features,
                sharpEdges,
                mesh,
                nodes,
                surface,
                units,
                fieldCase,
                farTolerance,
                workers);
    List<AsMadeField.Values> asMade = new ArrayList<>();
    for (Duty duty : fieldCase.duties()) {
      Superposition weights = Superposition.of(fieldCase, duty, units.charge_C());
      raw.add(magnitude(weights, units.density()));
      recovered.add(magnitude(weights, smooth));
      if (sharp != null) {
        asMade.add(
            sharp.of(
                (perSet, i) -> Math.hypot(weights.real(perSet, i), weights.imaginary(perSet, i)),
                fieldCase.edges()::radius_m));
      }
    }
    int[] partOfUnknown = new int[surface.unknowns()];
    for (int c = 0; c < surface.cornerUnknown().length; c++) {
      partOfUnknown[surface.cornerUnknown()[c]] =
          assembly.geometry().facePart(mesh.triangleFace()[surface.meshTriangle()[c / 3]]);
    }
    int[] zone =
        EdgeZone.of(
            assembly,
            surface,
            partOfUnknown,
            fieldCase.edges(),
            fieldCase.surroundings().earthPlane());
    return new Level(mesh, nodes, surface, units, zone, raw, recovered, sharp, asMade);
  }

  private static AsMadeField sharpField(
      Assembly assembly,
      Features features,
      SharpEdges sharpEdges,
      SurfaceMesh mesh,
      SurfaceNodes nodes,
      ChargedSurface surface,
      UnitFields units,
      FieldCase fieldCase,
      double farTolerance,
      Workers workers) {
    boolean[] charged = new boolean[mesh.triangleCount()];
    for (int t : surface.meshTriangle()) {
      charged[t] = true;
    }
    int[] electrodeOfPart = fieldCase.electrodeOfPart(assembly.parts().size());
    FieldEvaluator evaluator = evaluator(surface, units, fieldCase, farTolerance, workers);
    return AsMadeField.of(
        assembly.geometry(),
        features,
        sharpEdges,
        mesh,
        nodes,
        charged,
        evaluator,
        (t, set) ->
            electrodeOfPart[assembly.geometry().facePart(mesh.triangleFace()[t])] == set ? 1 : 0,
        units.density().length);
  }

  private static FieldEvaluator evaluator(
      ChargedSurface surface,
      UnitFields units,
      FieldCase fieldCase,
      double farTolerance,
      Workers workers) {
    double[][] ambient = new double[units.density().length][3];
    int electrodes = fieldCase.electrodes().size();
    if (ambient.length > electrodes) {
      ambient[electrodes] = fieldCase.surroundings().ambientField_V_per_m();
    }
    return new FieldEvaluator(
        surface.triangles(),
        surface.cornerUnknown(),
        units.density(),
        UnitFields.mirror(fieldCase.surroundings()),
        ambient,
        farTolerance,
        workers);
  }

  /**
   * Potential and field of every solved set off the surface.
   *
   * @param workers threads; must stay open while the evaluator is used
   */
  FieldEvaluator evaluator(FieldCase fieldCase, double farTolerance, Workers workers) {
    return evaluator(surface, units, fieldCase, farTolerance, workers);
  }

  /**
   * Vertex with the highest field of a duty on an electrode's sharp edges.
   *
   * @return mesh vertex, -1 where the electrode has none
   */
  int edgePeak(int duty, int electrode) {
    int best = -1;
    if (asMade.isEmpty()) {
      return best;
    }
    double[] value = asMade.get(duty).field_V_per_m();
    for (int i = 0; i < surface.unknowns(); i++) {
      int v = nodes.nodeVertex()[surface.unknownNode()[i]];
      if (surface.electrode()[i] == electrode
          && !Double.isNaN(value[v])
          && (best < 0 || value[v] > value[best])) {
        best = v;
      }
    }
    return best;
  }

  // Only the normal component exists on a conductor, so the peak over the cycle is the modulus.
  private static double[] magnitude(Superposition weights, double[][] density) {
    double[] out = new double[density[0].length];
    for (int i = 0; i < out.length; i++) {
      out[i] = 4 * Math.PI * Math.hypot(weights.real(density, i), weights.imaginary(density, i));
    }
    return out;
  }

  /**
   * Unknown with the highest recovered field of a duty on an electrode, sharp edges and their zones
   * left out.
   *
   * @return unknown, -1 where the electrode has none off an edge zone
   */
  int peak(int duty, int electrode) {
    int best = -1;
    double[] value = recovered.get(duty);
    for (int i = 0; i < value.length; i++) {
      if (surface.electrode()[i] == electrode
          && zoneEdge[i] < 0
          && (best < 0 || value[i] > value[best])) {
        best = i;
      }
    }
    return best;
  }
}
