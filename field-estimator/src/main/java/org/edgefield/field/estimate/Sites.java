package org.edgefield.field.estimate;

import java.util.Arrays;
import org.edgefield.field.edge.RoundedCorner;
import org.edgefield.field.edge.RoundedWedge;
import org.edgefield.field.result.Law;

/**
 * Points at which the field is estimated, as a struct of arrays: one per smooth node, one per mesh
 * vertex on a sharp edge or corner (shared by the nodes of that vertex).
 */
final class Sites {
  /** How the flux tube of a site widens. */
  static final byte SMOOTH = 0;

  /** Recognised rounded edge, or a sharp edge with its radius as made. */
  static final byte EDGE = 1;

  /** Corner with its radius as made. */
  static final byte CORNER = 2;

  /** Site per node; nodes of ignored parts have one too. */
  final int[] siteOfNode;

  /** One node of each site. */
  final int[] node;

  /** Position, 3 per site. */
  final double[] position;

  /** Outward unit normal (on edges and corners the mean of the faces'), 3 per site. */
  final double[] normal;

  final int[] part;
  final byte[] form;

  /** Which law gives the value. */
  final Law[] law;

  final double[] k1;
  final double[] k2;

  /** Quadratic terms of the smooth form. */
  final double[] c1;

  final double[] c2;

  /** 1 / b^2 of the part's half-extent b in the two directions. */
  final double[] end1;

  final double[] end2;

  /** Exponent of the tube's spread along an edge that bends round a corner; 1 on whole rims. */
  final double[] arc;

  /** What the near end of a straight edge adds: 1/distance to it less 1/half-length of the part. */
  final double[] ahead;

  final boolean[] straight;

  /** Distance up to which a tube widens freely, infinite where nothing shelters it. */
  final double[] shelter;

  /** Site of the neighbour that shelters, -1 where the earth plane does or nothing. */
  final int[] neighbour;

  /** Exponent of the field at a corner. */
  final double[] exponent;

  /** Wedge of an edge site, else null. */
  final RoundedWedge[] wedge;

  /** Thickness and width of the body behind an edge site. */
  final double[] thickness;

  final double[] width;

  Sites(int[] siteOfNode, int count) {
    this.siteOfNode = siteOfNode;
    node = new int[count];
    position = new double[3 * count];
    normal = new double[3 * count];
    part = new int[count];
    form = new byte[count];
    law = new Law[count];
    k1 = new double[count];
    k2 = new double[count];
    c1 = new double[count];
    c2 = new double[count];
    end1 = new double[count];
    end2 = new double[count];
    arc = new double[count];
    ahead = new double[count];
    exponent = new double[count];
    Arrays.fill(exponent, RoundedCorner.EXPONENT);
    straight = new boolean[count];
    shelter = new double[count];
    neighbour = new int[count];
    Arrays.fill(shelter, Double.POSITIVE_INFINITY);
    Arrays.fill(neighbour, -1);
    wedge = new RoundedWedge[count];
    thickness = new double[count];
    width = new double[count];
  }

  int count() {
    return node.length;
  }

  /** Radius of the larger curvature, infinite where flat or concave. */
  double radius(int site) {
    return k1[site] > 0 ? 1 / k1[site] : Double.POSITIVE_INFINITY;
  }

  /** Notes how far along a straight edge the body reaches on the shorter side. */
  void ahead(int site, double distance_m) {
    double half = Math.sqrt(end2[site]);
    straight[site] = k2[site] < STRAIGHT * half;
    if (straight[site]) {
      ahead[site] = Math.max(0, 1 / Math.max(distance_m, radius(site)) - half);
    }
  }

  /**
   * Curvature along an edge, in units of 1 / half-length of the part, up to which it is straight.
   */
  private static final double STRAIGHT = 0.2;

  /**
   * Notes through which angle an edge turns along its length. An edge that bends round a corner
   * spreads the flux near by like the rim of its own radius, far away like the corner of a plate
   * between its two straight runs; one that turns by half a circle or more is a rim for good.
   */
  void arc(int site, double turn_rad) {
    double quarters = turn_rad / (Math.PI / 2);
    double bend =
        quarters <= 1
            ? FluxTube.BEND * quarters
            : FluxTube.BEND + (1 - FluxTube.BEND) * (quarters - 1);
    // A bend as wide as the body is its rim.
    double wide = k2[site] * k2[site] > end2[site] ? Math.sqrt(end2[site]) / k2[site] : 1;
    arc[site] = Math.min(1, Math.max(1e-3, bend + (1 - bend) * wide));
  }

  /** Sets the tube to a site. */
  FluxTube tube(int site, FluxTube tube) {
    return tube(site, tube, Double.NaN);
  }

  /**
   * Sets the tube to a site with another radius: edges change theirs, smooth places scale their
   * larger curvature and never become thinner than the radius asks for.
   *
   * @param radius_m the radius, NaN to keep the site's own
   */
  FluxTube tube(int site, FluxTube tube, double radius_m) {
    free(site, tube, radius_m);
    if (shelter[site] < Double.POSITIVE_INFINITY) {
      FluxTube other = tube.neighbour();
      if (neighbour[site] < 0) {
        other.smooth(0, 0, 0, 0);
      } else {
        free(neighbour[site], other, Double.NaN);
      }
      tube.sheltered(shelter[site]);
    }
    return tube;
  }

  /** Sets the tube to a site as if nothing sheltered it. */
  FluxTube free(int site, FluxTube tube, double radius_m) {
    double r = Double.isNaN(radius_m) ? radius(site) : radius_m;
    if (form[site] == SMOOTH) {
      if (Double.isNaN(radius_m)) {
        return tube.smooth(k1[site], c1[site], k2[site], c2[site]);
      }
      double scale = 1 / (r * k1[site]);
      double a = k1[site] * scale;
      // A round end or sphere grows in both directions, a rod in one.
      double b = Math.min(k2[site], a);
      return tube.smooth(
          a, rescaled(c1[site], k1[site], scale), b, rescaled(c2[site], k2[site], b / k2[site]));
    }
    double t = Math.max(thickness[site], 2 * r);
    double w = Math.max(width[site], 2 * r);
    if (form[site] == CORNER) {
      return tube.corner(wedge[site], r, t, w, end2[site], exponent[site]);
    }
    return tube.edge(
        wedge[site],
        r,
        t,
        w,
        k2[site],
        arc[site] < 1 ? end2[site] : c2[site],
        arc[site],
        straight[site],
        ahead[site]);
  }

  /**
   * Quadratic term of a direction whose curvature is scaled: that of a whole round (k^2) goes with
   * the square, that of an ellipsoid's end (k / a) with the first power, others between.
   */
  private static double rescaled(double c, double k, double scale) {
    return k > 0 ? c * Math.pow(scale, 1 + Math.min(1, c / (k * k))) : c;
  }
}
