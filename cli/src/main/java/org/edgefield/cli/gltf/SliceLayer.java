package org.edgefield.cli.gltf;

/**
 * A cut through the gas with the field strength on it, drawn in the scale of the surfaces.
 *
 * @param name what the cut is, "slice y = 0 mm"
 * @param xyz_m points, 3 per vertex, metres, in model axes
 * @param triangles vertex ids, 3 per triangle
 * @param field_V_per_m field strength per duty of the case and vertex, [duty][vertex]
 * @param utilisation field over permitted field of the undisturbed gas, [duty][vertex]
 */
public record SliceLayer(
    String name,
    double[] xyz_m,
    int[] triangles,
    double[][] field_V_per_m,
    double[][] utilisation) {}
