package org.edgefield.field.gas;

import java.util.ArrayList;
import java.util.List;

/**
 * Streamer criterion: a discharge starts where the effective ionisation, integrated along the field
 * line from the electrode to where it vanishes (or to the end of the gap), reaches K:
 *
 * <pre>Int_0^z alpha(E(s)) ds = K,  alpha(E(z)) = 0</pre>
 *
 * <p>Inception is not breakdown in strongly non-uniform gaps, and polarity is not in the criterion.
 */
public final class StreamerCriterion {
  /** Radius below which published models part ways. */
  public static final double LEAST_RADIUS_M = 1e-4;

  /** Gap below which the criterion is not to be used. */
  public static final double LEAST_GAP_M = 1e-4;

  private static final double LEAST_PRESSURE_PA = 1e4;
  private static final double LARGEST_PRESSURE_PA = 1e6;

  private static final double FIRST_STEP_M = 1e-6;
  private static final double STEP_GROWTH = 1.3;
  private static final double LEAST_STEPS = 100;

  private static final int PANELS = 48;

  /** Three-point Gauss rule on 0..1. */
  private static final double[] GAUSS = {0.1127016653792583, 0.5, 0.8872983346207417};

  private static final double[] WEIGHT = {5.0 / 18, 8.0 / 18, 5.0 / 18};

  private final Ionisation gas;
  private final double pressure_Pa;

  /**
   * The criterion in a state of the gas.
   *
   * @param gas ionisation and K
   * @param pressureAt20_Pa pressure of the same density at 20 degC
   * @throws GasException below 0.1 bar (towards vacuum) and above 10 bar
   */
  public StreamerCriterion(Ionisation gas, double pressureAt20_Pa) {
    if (!(pressureAt20_Pa >= LEAST_PRESSURE_PA && pressureAt20_Pa <= LARGEST_PRESSURE_PA)) {
      throw new GasException(
          "the streamer criterion holds from 0.1 to 10 bar, not at "
              + pressureAt20_Pa / 1e5
              + " bar: give a fixed permitted field");
    }
    this.gas = gas;
    this.pressure_Pa = pressureAt20_Pa;
  }

  /**
   * The ionisation integral.
   *
   * @param field_V_per_m field at the electrode
   * @param profile its fall along the line
   * @param gap_m length of the line
   */
  public double integral(double field_V_per_m, FieldProfile profile, double gap_m) {
    double critical = gas.critical_V_per_mPa() * pressure_Pa;
    if (field_V_per_m <= critical) {
      return 0;
    }
    double end = zoneEnd(field_V_per_m, profile, gap_m, critical);
    double sum = 0;
    for (int i = 0; i < PANELS; i++) {
      for (int g = 0; g < GAUSS.length; g++) {
        // Panels crowd towards the electrode.
        double t = (i + GAUSS[g]) / PANELS;
        double s = end * t * t;
        double e = field_V_per_m * profile.share(s);
        sum +=
            WEIGHT[g]
                / PANELS
                * 2
                * end
                * t
                * Math.max(0, gas.perPressure(e / pressure_Pa))
                * pressure_Pa;
      }
    }
    return sum;
  }

  /** First place where the field falls to critical, or the end of the gap. */
  private static double zoneEnd(
      double field_V_per_m, FieldProfile profile, double gap_m, double critical) {
    double low = 0;
    double high = Math.min(gap_m, FIRST_STEP_M);
    while (field_V_per_m * profile.share(high) >= critical) {
      if (high == gap_m) {
        return gap_m;
      }
      low = high;
      high = Math.min(gap_m, Math.min(STEP_GROWTH * high, high + gap_m / LEAST_STEPS));
    }
    for (int i = 0; i < 60; i++) {
      double middle = 0.5 * (low + high);
      if (field_V_per_m * profile.share(middle) >= critical) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return high;
  }

  /**
   * Field at the electrode at which a discharge starts.
   *
   * @param profile fall of the field along the line
   * @param gap_m length of the line
   * @return V/m
   */
  public double inceptionField_V_per_m(FieldProfile profile, double gap_m) {
    double low = gas.critical_V_per_mPa() * pressure_Pa;
    double high = 2 * low;
    while (integral(high, profile, gap_m) < gas.streamerConstant()) {
      low = high;
      high *= 2;
    }
    while (high > low * (1 + 1e-8)) {
      double middle = 0.5 * (low + high);
      if (integral(middle, profile, gap_m) < gas.streamerConstant()) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return high;
  }

  /**
   * Remarks on validity that must go with a result.
   *
   * @param field_V_per_m inception field found
   * @param radius_m radius at the electrode, infinite where flat
   * @param gap_m length of the line
   */
  public List<String> remarks(double field_V_per_m, double radius_m, double gap_m) {
    List<String> remarks = new ArrayList<>();
    if (radius_m < LEAST_RADIUS_M) {
      remarks.add("radius below 0.1 mm: published inception models part ways there");
    }
    if (gap_m < LEAST_GAP_M) {
      remarks.add("gap below 0.1 mm: the streamer criterion does not hold there");
    }
    if (field_V_per_m / pressure_Pa > gas.largest_V_per_mPa()) {
      remarks.add("field beyond the range of the fit (" + gas.name() + ")");
    }
    return remarks;
  }

  /** Name of the fit and its K. */
  public String name() {
    return gas.name();
  }
}
