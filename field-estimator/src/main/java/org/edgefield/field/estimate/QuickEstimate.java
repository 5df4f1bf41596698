package org.edgefield.field.estimate;

import java.util.ArrayList;
import java.util.List;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.field.gas.PermittedField;
import org.edgefield.field.gas.PermittedFields;
import org.edgefield.field.hotspot.HotSpots;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.result.DutyResult;
import org.edgefield.field.result.FieldResult;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.mesh.SurfaceMesh;

/** The quick estimate of a case: fields from curvatures and gaps, hot spots with their cures. */
public final class QuickEstimate {
  private QuickEstimate() {}

  /**
   * Runs the estimate.
   *
   * @param assembly the model
   * @param mesh its mesh
   * @param nodes the mesh's nodes
   * @param features edge classes and rounded edges
   * @param fieldCase electrodes, duties, surroundings
   * @param progress receives reports
   * @return result of method SCREEN; every value finite
   * @throws org.edgefield.field.gas.GasException where the criterion does not hold for the gas
   */
  public static FieldResult run(
      Assembly assembly,
      SurfaceMesh mesh,
      SurfaceNodes nodes,
      Features features,
      FieldCase fieldCase,
      Progress progress) {
    PermittedField permitted = PermittedFields.of(fieldCase.permitted(), fieldCase.surroundings());
    EstimateModel model = EstimateModel.build(assembly, mesh, nodes, features, fieldCase, progress);
    HotSpots hotSpots =
        new HotSpots(
            assembly, mesh, nodes, features, model, permitted, fieldCase.permitted().amber());
    List<DutyResult> duties = new ArrayList<>();
    for (int d = 0; d < fieldCase.duties().size(); d++) {
      duties.add(hotSpots.of(d, model.field(d, permitted)));
    }
    return new FieldResult(
        FieldResult.Method.SCREEN,
        mesh,
        nodes,
        List.copyOf(duties),
        new double[0],
        Double.NaN,
        true,
        model.warnings());
  }
}
