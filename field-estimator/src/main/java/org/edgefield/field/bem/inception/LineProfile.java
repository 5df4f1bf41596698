package org.edgefield.field.bem.inception;

import org.edgefield.field.gas.FieldProfile;

/**
 * Field along a traced line as a share of that at its start, linear in the logarithm between the
 * points, constant beyond the last.
 *
 * <p>At an edge or corner as made the law of its rounding holds near by, and the traced field,
 * which is that of the edge drawn sharp, gives what departs from the law farther out.
 */
final class LineProfile implements FieldProfile {
  private final double[] s;
  private final double[] logShare;
  private final FieldProfile law;

  private LineProfile(double[] s, double[] logShare, FieldProfile law) {
    this.s = s;
    this.logShare = logShare;
    this.law = law;
  }

  /** Profile of a line that starts on a resolved surface. */
  static LineProfile of(double[] s, double[] field) {
    double[] log = new double[s.length];
    for (int i = 0; i < s.length; i++) {
      log[i] = Math.log(field[i] / field[0]);
    }
    return new LineProfile(s, log, null);
  }

  /**
   * Profile of a line from an edge or corner as made.
   *
   * @param s distances, from 0
   * @param field traced field; that at 0 is not used
   * @param law share of the peak near the rounding
   */
  static LineProfile of(double[] s, double[] field, FieldProfile law) {
    double[] log = new double[s.length];
    for (int i = 1; i < s.length; i++) {
      log[i] = Math.log(field[i] / law.share(s[i]) / (field[1] / law.share(s[1])));
    }
    return new LineProfile(s, log, law);
  }

  @Override
  public double share(double distance) {
    double near = law == null ? 1 : law.share(distance);
    int n = s.length;
    if (distance >= s[n - 1]) {
      return near * Math.exp(logShare[n - 1]);
    }
    int low = 0;
    int high = n - 1;
    while (high - low > 1) {
      int middle = (low + high) >>> 1;
      if (s[middle] <= distance) {
        low = middle;
      } else {
        high = middle;
      }
    }
    double t = (distance - s[low]) / (s[high] - s[low]);
    return near * Math.exp(logShare[low] + t * (logShare[high] - logShare[low]));
  }
}
