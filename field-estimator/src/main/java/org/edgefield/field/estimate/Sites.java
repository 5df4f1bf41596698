package org.edgefield.field.estimate;

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
      return tube.corner(wedge[site], r, t, w, end2[site]);
    }
    return tube.edge(wedge[site], r, t, w, k2[site], c2[site]);
  }

  /**
   * Quadratic term of a direction whose curvature is scaled: that of a whole round (k^2) goes with
   * the square, that of an ellipsoid's end (k / a) with the first power, others between.
   */
  private static double rescaled(double c, double k, double scale) {
    return k > 0 ? c * Math.pow(scale, 1 + Math.min(1, c / (k * k))) : c;
  }
}
