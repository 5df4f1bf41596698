package org.edgefield.field.result;

import java.util.List;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Outcome of a screen or a solve.
 *
 * @param method screen or solve
 * @param mesh the mesh the values live on
 * @param nodes its nodes
 * @param duties in the order of the case
 * @param capacitance_F capacitance matrix over the electrodes, row by row; empty for a screen
 * @param errorEstimate relative error the solve claims for its peaks; NaN for a screen
 * @param converged whether the asked accuracy was met; true for a screen
 * @param warnings remarks for the user
 */
public record FieldResult(
    Method method,
    SurfaceMesh mesh,
    SurfaceNodes nodes,
    List<DutyResult> duties,
    double[] capacitance_F,
    double errorEstimate,
    boolean converged,
    List<String> warnings) {
  /** How the field was found. */
  public enum Method {
    SCREEN,
    SOLVE
  }
}
