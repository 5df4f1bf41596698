package org.edgefield.field.estimate;

import org.edgefield.field.result.DutyField;
import org.edgefield.importer.kernel.KernelAssembly;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.models.cases.Quantity;
import org.edgefield.models.cases.ValidationCase;

/** The estimate of the quantity of a case, from its STEP file. */
final class CaseEstimate {
  private CaseEstimate() {}

  static double of(ValidationCase c) {
    try (var assembly = ScreenedModel.read(c.model())) {
      return of(assembly, c);
    }
  }

  private static double of(KernelAssembly assembly, ValidationCase c) {
    ScreenedModel screened = ScreenedModel.of(assembly, ScreenedModel.fieldCase(assembly, c));
    SurfaceMesh mesh = screened.mesh();
    DutyField field = screened.estimate().field(0, (k1, k2) -> 3e6);
    boolean peak = c.quantity() instanceof Quantity.PeakField;
    String electrode =
        peak
            ? ((Quantity.PeakField) c.quantity()).electrode()
            : ((Quantity.FieldAt) c.quantity()).electrode();
    double best = 0;
    double nearest = Double.POSITIVE_INFINITY;
    for (int n = 0; n < screened.nodes().count(); n++) {
      if (!assembly.parts().get(screened.nodePart()[n]).name().equals(electrode)) {
        continue;
      }
      double e = field.field_V_per_m()[n];
      if (peak) {
        best = Math.max(best, e);
      } else {
        Quantity.FieldAt at = (Quantity.FieldAt) c.quantity();
        int v = 3 * screened.nodes().nodeVertex()[n];
        double dx = mesh.xyz()[v] - at.x_m();
        double dy = mesh.xyz()[v + 1] - at.y_m();
        double dz = mesh.xyz()[v + 2] - at.z_m();
        double d = dx * dx + dy * dy + dz * dz;
        if (d < nearest) {
          nearest = d;
          best = e;
        }
      }
    }
    return best;
  }
}
