package org.edgefield.field.estimate;

import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Surroundings.EarthPlane;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.spatial.TriangleCursor;
import org.edgefield.importer.mesh.spatial.TriangleTree;

/**
 * Parts at the same potential shelter each other: a flux tube widens freely only up to where the
 * neighbour's tubes take the room, at {@value #SHARE} of the distance to it; from there on no
 * faster than the neighbour's own tubes.
 *
 * <p>The share is on the safe side for what stands on a plane: a hemisphere and half-spheroids in a
 * uniform field have their exact tip field at 0.22 to 0.73 of their height, upright strips at 0.6
 * (closed forms of ellipsoids, recomputed).
 */
final class Shelter {
  private static final double SHARE = 0.75;

  private Shelter() {}

  /**
   * Finds the neighbour that shelters each site most and notes it there.
   *
   * @param electrode electrode per site, negative where it sees no field
   * @param tree triangles by part
   */
  static void find(
      Sites sites,
      int[] electrode,
      FieldCase fieldCase,
      List<Part> parts,
      SurfaceNodes nodes,
      TriangleTree tree) {
    int[] electrodeOfPart = fieldCase.electrodeOfPart(parts.size());
    int[][] others = new int[parts.size()][];
    for (int p = 0; p < others.length; p++) {
      others[p] = others(p, electrodeOfPart, fieldCase);
    }
    EarthPlane plane = fieldCase.surroundings().earthPlane();
    int blocks = (sites.count() + SiteBuilder.BLOCK - 1) / SiteBuilder.BLOCK;
    IntStream.range(0, blocks)
        .parallel()
        .forEach(
            b -> {
              Search search = new Search(sites, parts, nodes, tree.cursor());
              int to = Math.min(sites.count(), (b + 1) * SiteBuilder.BLOCK);
              for (int s = b * SiteBuilder.BLOCK; s < to; s++) {
                if (electrode[s] >= 0) {
                  boolean standing = plane != null && earthed(fieldCase, electrode[s]);
                  search.at(s, standing ? plane : null, others[sites.part[s]]);
                }
              }
            });
  }

  /** The search of one thread. */
  private record Search(Sites sites, List<Part> parts, SurfaceNodes nodes, TriangleCursor cursor) {
    void at(int s, EarthPlane plane, int[] others) {
      double[] p = Arrays.copyOfRange(sites.position, 3 * s, 3 * s + 3);
      // Neighbours are compared by how far the tube has widened at a body's size away.
      double size = parts.get(sites.part[s]).size_m();
      FluxTube tube = new FluxTube();
      sites.free(s, tube, Double.NaN);
      double least = Double.POSITIVE_INFINITY;
      if (plane != null) {
        sites.shelter[s] = SHARE * Math.abs(p[plane.axis()] - plane.offset_m());
        tube.neighbour().smooth(0, 0, 0, 0);
        tube.sheltered(sites.shelter[s]);
        least = tube.growth(size, size);
      }
      for (int other : others) {
        cursor.allowOnly(other);
        if (!cursor.nearest(p[0], p[1], p[2], size)) {
          continue;
        }
        int neighbour = Opposing.farSite(sites, nodes, cursor);
        sites.free(neighbour, tube.neighbour(), Double.NaN);
        tube.sheltered(SHARE * cursor.distance());
        double growth = tube.growth(size, size);
        if (growth < least) {
          least = growth;
          sites.shelter[s] = SHARE * cursor.distance();
          sites.neighbour[s] = neighbour;
        }
      }
    }
  }

  /** Other parts at the potential of one. */
  private static int[] others(int part, int[] electrodeOfPart, FieldCase fieldCase) {
    int e = electrodeOfPart[part];
    return IntStream.range(0, electrodeOfPart.length)
        .filter(p -> p != part && e >= 0 && together(fieldCase, e, electrodeOfPart[p]))
        .toArray();
  }

  /** Whether two electrodes have one potential in every duty. */
  private static boolean together(FieldCase fieldCase, int e, int f) {
    return f >= 0
        && (f == e
            || (set(fieldCase, e)
                && set(fieldCase, f)
                && fieldCase.duties().stream().allMatch(d -> d.difference_V(e, f) == 0)));
  }

  /** Whether an electrode is at the potential of the earth in every duty. */
  private static boolean earthed(FieldCase fieldCase, int e) {
    return set(fieldCase, e)
        && fieldCase.duties().stream().allMatch(d -> d.real_V()[e] == 0 && d.imaginary_V()[e] == 0);
  }

  private static boolean set(FieldCase fieldCase, int electrode) {
    return fieldCase.electrodes().get(electrode).kind() != Electrode.Kind.FLOATING;
  }
}
