package org.edgefield.field.hotspot;

import java.util.function.DoubleUnaryOperator;
import org.edgefield.field.gas.PermittedField;
import org.edgefield.field.result.HotSpot.Cure;

/**
 * What would bring a place to its permitted field, each alone: a larger radius with the gap kept, a
 * lower voltage, or a larger gap with the radius kept. Radius and gap follow the law of the
 * estimate, scaled to the field at hand, so that a solved field gets them as well.
 */
final class Cures {
  private static final double LEAST_RADIUS_M = 1e-6;

  /** Largest radius and gap that are still advice, in units of what is there. */
  private static final double LARGEST = 1e4;

  private final LocalLaw model;
  private final PermittedField permitted;

  Cures(LocalLaw model, PermittedField permitted) {
    this.model = model;
    this.permitted = permitted;
  }

  /**
   * The cure for a node.
   *
   * @param duty index of the duty
   * @param node mesh node of the peak
   * @param utilisation its field over its permitted field, above 0
   * @param radius_m its radius, infinite where flat
   */
  Cure of(int duty, int node, double utilisation, double radius_m) {
    double factor = 1 / utilisation;
    return new Cure(
        radius(duty, node, utilisation, radius_m),
        model.difference_V(duty, node) * factor,
        factor,
        gap(duty, node, utilisation));
  }

  private double radius(int duty, int node, double utilisation, double radius_m) {
    if (Double.isInfinite(radius_m)) {
      return Double.NaN;
    }
    double[] k = model.curvatures(node);
    double now = permitted.at_V_per_m(k[0], k[1]);
    DoubleUnaryOperator excess =
        r -> {
          double k2 = k[1] > 0.5 * k[0] ? k[1] / (k[0] * r) : Math.min(k[1], 1 / r);
          return utilisation
                  * model.change(duty, node, r, Double.NaN)
                  * now
                  / permitted.at_V_per_m(1 / r, k2)
              - 1;
        };
    double largest = Math.min(LARGEST * radius_m, model.largestRadius_m(node));
    return root(excess, radius_m, Math.min(LEAST_RADIUS_M, radius_m), largest);
  }

  private double gap(int duty, int node, double utilisation) {
    double gap = model.gap_m(duty, node);
    if (Double.isInfinite(gap)) {
      return Double.NaN;
    }
    return root(
        d -> utilisation * model.change(duty, node, Double.NaN, d) - 1,
        gap,
        gap / LARGEST,
        gap * LARGEST);
  }

  /** Where a falling function passes zero, by bisection in the logarithm; NaN where it does not. */
  private static double root(DoubleUnaryOperator f, double start, double least, double largest) {
    double low = start;
    double high = start;
    while (f.applyAsDouble(high) > 0) {
      if (high >= largest) {
        return Double.NaN;
      }
      low = high;
      high = Math.min(2 * high, largest);
    }
    while (low > least && f.applyAsDouble(low) <= 0) {
      high = low;
      low = Math.max(low / 2, least);
    }
    for (int i = 0; i < 60 && high > low * (1 + 1e-9); i++) {
      double middle = Math.sqrt(low * high);
      if (f.applyAsDouble(middle) > 0) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return high;
  }
}
