package org.edgefield.field.estimate;

import org.edgefield.field.edge.RoundedCorner;
import org.edgefield.field.edge.RoundedWedge;

/**
 * How a thin flux tube widens on its way from a point of a conductor into the gas.
 *
 * <p>With A(s) the tube's cross-section at the distance s along the normal over that at the
 * conductor, the field there is E = U / Int_0^d ds / A(s). A is a product over the two principal
 * directions. In each direction one of two forms holds:
 *
 * <ul>
 *   <li>smooth: A = sqrt(1 + 2 k s + c s^2), the law of an ellipsoid's axis: with c = k^2 it is the
 *       cylinder's or sphere's 1 + k s, with c = 1/b^2 the axis of an ellipsoid of half-width b,
 *       exact for isolated spheroids, discs and their neighbours; concave directions keep 1 + k s;
 *   <li>rounded edge of a thick body: the spread of {@link RoundedWedge} up to the body's thickness
 *       t, then that of a plate of width w, then that of a wire:
 *       <pre>A = spread(s / r) (1 + s / t)^(1/2 - sigma) (1 + s / w)^(1/2)</pre>
 *       <p>An edge that bends round a corner with the curvature k2 spreads along itself as
 *       <pre>A = (1 + g k2 s / a)^a (1 + s^2 / b^2)^((1 - a)/2),  g = (1 + 1.77 k2 s) / (1 + k2 s)
 *       </pre>
 *       <p>with the slope of its bend at the surface and, for a bend by a right angle, a the
 *       difference a0 between the exponents of a right-angled corner and edge. At the distance e
 *       from its end a straight edge takes on the factor (1 + s (1/e - 1/b))^a0, and stays below
 *       the growth at the corner there.
 * </ul>
 *
 * <p>Mutable so that one object serves millions of points; one thread at a time.
 */
final class FluxTube {
  /**
   * Share of the body's sizes at which a corner stops to act alone; puts the estimate 3 to 10 %
   * above solved corners of bars in a housing.
   */
  private static final double CORNER_SHARE = 1.05;

  /** Exponent of the field at a right-angled corner of a thin plate (memory). */
  private static final double PLATE_CORNER = 0.7034;

  /** What a bend by a right angle adds to the exponent of a right-angled edge: the corner's. */
  static final double BEND = RoundedCorner.EXPONENT - 1.0 / 3;

  /** How much further a bend's corner lies outside than its slope says; as at rounded wedges. */
  private static final double BEND_FAR = 1.77;

  private static final double RIGHT_ANGLE_EXPONENT = 1.0 / 3 + 1e-3;

  /** Nodes and weights of the 5-point Gauss-Legendre rule on 0..1. */
  private static final double[] NODE = {
    0.046910077030668, 0.230765344947158, 0.5, 0.769234655052842, 0.953089922969332
  };

  private static final double[] WEIGHT = {
    0.118463442528095, 0.239314335249683, 0.284444444444444, 0.239314335249683, 0.118463442528095
  };

  /** Widest panel of the quadrature in the logarithm of the distance. */
  private static final double PANEL = 1.2;

  /** Distance, in the tube's own scale, beyond which A is taken as a power. */
  private static final double FAR = 1e7;

  private double k1;
  private double k2;
  private double c1;
  private double c2;
  private RoundedWedge wedge;
  private boolean corner;
  private double cornerExponent;
  private double radius;
  private double thickness;
  private double width;
  private double arc;
  private boolean straight;
  private double ahead;
  private double shelter = Double.POSITIVE_INFINITY;
  private FluxTube neighbour;

  /** A smooth surface. */
  FluxTube smooth(double k1, double c1, double k2, double c2) {
    this.k1 = k1;
    this.c1 = c1;
    this.k2 = k2;
    this.c2 = c2;
    wedge = null;
    corner = false;
    shelter = Double.POSITIVE_INFINITY;
    return this;
  }

  /** A rounded edge with its curvature k2, the term c2 and the exponent along the edge. */
  FluxTube edge(
      RoundedWedge wedge,
      double radius,
      double thickness,
      double width,
      double k2,
      double c2,
      double arc,
      boolean straight,
      double ahead) {
    this.k1 = 1 / radius;
    this.c1 = 0;
    this.k2 = k2;
    this.c2 = c2;
    this.wedge = wedge;
    corner = false;
    this.radius = radius;
    this.thickness = thickness;
    this.width = width;
    this.arc = arc;
    this.straight = straight;
    this.ahead = ahead;
    shelter = Double.POSITIVE_INFINITY;
    return this;
  }

  /**
   * A corner, made with one radius: the right-angled corner's spread (or that of another exponent)
   * near by, then a plate's corner, a strip's and a whole body's. Corners whose edges are sharper
   * than a right angle take the product of the edge law in two directions, which lies on the high
   * side (1.4 to 2.2 on a cube's corner).
   */
  FluxTube corner(
      RoundedWedge wedge,
      double radius,
      double thickness,
      double width,
      double endTerm,
      double exponent) {
    cornerExponent = exponent;
    edge(wedge, radius, thickness, width, 1 / radius, endTerm, 1, false, 0);
    corner = true;
    return this;
  }

  /** The tube of a neighbour, to be set before {@link #sheltered}. */
  FluxTube neighbour() {
    if (neighbour == null) {
      neighbour = new FluxTube();
    }
    return neighbour;
  }

  /** From a distance on the tube widens no faster than its neighbour's. */
  void sheltered(double distance) {
    shelter = distance;
  }

  /** Cross-section at a distance over that at the conductor; {@code reach} is the gap. */
  double growth(double s, double reach) {
    if (s <= shelter) {
      return free(s, reach);
    }
    double own = free(s, reach) / free(shelter, reach);
    double other = neighbour.free(s, reach) / neighbour.free(shelter, reach);
    return free(shelter, reach) * Math.min(own, Math.max(1, other));
  }

  private double free(double s, double reach) {
    if (wedge == null) {
      return direction(k1, c1, s, reach) * direction(k2, c2, s, reach);
    }
    if (corner && wedge.exponent() <= RIGHT_ANGLE_EXPONENT) {
      return corner(s, thickness, width, 1 / Math.sqrt(c2), cornerExponent);
    }
    double across =
        wedge.spread(s / radius)
            * Math.pow(1 + s / thickness, 0.5 - wedge.exponent())
            * Math.sqrt(1 + s / width);
    if (corner) {
      return across * across;
    }
    if (!straight) {
      return across * (arc < 1 && k2 > 0 ? bend(s) : direction(k2, c2, s, reach));
    }
    double along = direction(k2, c2, s, reach) * Math.pow(1 + ahead * s, BEND);
    if (wedge.exponent() > RIGHT_ANGLE_EXPONENT) {
      return across * along;
    }
    // No place on a straight edge is more exposed than the corner at its end.
    double length = 2 / Math.sqrt(c2);
    double thin = Math.min(length, thickness);
    double wide = Math.min(Math.max(length, thickness), width);
    double end = corner(s, thin, wide, Math.max(length, width) / 2, RoundedCorner.EXPONENT);
    return Math.min(across * along, end);
  }

  /** Spread at a right-angled corner: its own, then a plate's corner, a strip's, a whole body's. */
  private double corner(double s, double thin, double wide, double halfLength, double exponent) {
    double plate = Math.max(PLATE_CORNER, exponent);
    return RoundedCorner.spread(s / radius, exponent)
        * Math.pow(1 + s / (CORNER_SHARE * thin), plate - exponent)
        * Math.pow(
            (1 + s / (CORNER_SHARE * wide)) * (1 + s / (2 * CORNER_SHARE * halfLength)),
            1 - plate / 2);
  }

  /** Along an edge that bends round a corner: its own radius first, then the corner's exponent. */
  private double bend(double s) {
    double y = k2 * s;
    double g = (1 + BEND_FAR * y) / (1 + y);
    return Math.pow(1 + y / arc * g, arc) * Math.pow(1 + c2 * s * s, 0.5 * (1 - arc));
  }

  private static double direction(double k, double c, double s, double reach) {
    return k < 0 ? 1 + ParallelSurfacesLaw.held(k, reach) * s : Math.sqrt(1 + s * (2 * k + c * s));
  }

  private boolean parallel() {
    return wedge == null
        && shelter == Double.POSITIVE_INFINITY
        && parallel(k1, c1)
        && parallel(k2, c2);
  }

  private static boolean parallel(double k, double c) {
    return k < 0 || c == k * k;
  }

  /**
   * Int_0^x ds / A(s).
   *
   * @param x upper limit, may be infinite
   * @param reach the gap, x or more
   */
  double resistance(double x, double reach) {
    if (parallel() && x == reach) {
      return ParallelSurfacesLaw.resistance_m(k1, k2, x);
    }
    double slope = Math.max(k1, 0) + Math.max(k2, 0) + Math.sqrt(c1) + Math.sqrt(c2);
    if (slope == 0 && x == Double.POSITIVE_INFINITY) {
      return Double.POSITIVE_INFINITY;
    }
    double scale = slope == 0 ? x : 1 / slope;
    double far = Math.min(x, FAR * scale);
    double end = Math.log1p(far / scale);
    int panels = (int) Math.ceil(end / PANEL);
    double sum = 0;
    double h = end / panels;
    for (int i = 0; i < panels; i++) {
      for (int g = 0; g < NODE.length; g++) {
        double e = Math.exp((i + NODE[g]) * h);
        sum += WEIGHT[g] * h * scale * e / growth(scale * (e - 1), reach);
      }
    }
    if (x > far) {
      // A ~ s^power beyond: two-dimensional bodies (power 1) have no field at infinite distance.
      double a = growth(far, reach);
      double power = Math.log(growth(2 * far, reach) / a) / Math.log(2);
      if (power <= 1.001) {
        return Double.POSITIVE_INFINITY;
      }
      double tail = far / (a * (power - 1));
      sum += x == Double.POSITIVE_INFINITY ? tail : tail * (1 - Math.pow(far / x, power - 1));
    }
    return sum;
  }
}
