package org.edgefield.field.result;

/**
 * Field of one duty on the nodes of the mesh; NaN-free. Nodes of ignored parts hold 0.
 *
 * @param duty name of the duty
 * @param field_V_per_m field strength per node, peak over the cycle
 * @param permitted_V_per_m permitted field per node
 * @param gap_m distance to the nearest body at another potential per node, infinite where none
 * @param radius_m radius that the law used per node, infinite on flat faces
 * @param law ordinal of {@link Law} per node
 * @param uncertainty relative uncertainty per node (0.01 = 1 %)
 */
public record DutyField(
    String duty,
    double[] field_V_per_m,
    double[] permitted_V_per_m,
    double[] gap_m,
    double[] radius_m,
    byte[] law,
    double[] uncertainty) {}
