package org.edgefield.field.gas;

import java.util.Arrays;

/**
 * A user's gas: effective ionisation as a table against the reduced field, linear between its rows
 * and held at its ends. The table must cross zero once, rising.
 */
public final class TabulatedGas implements Ionisation {
  private final String name;
  private final double[] field;
  private final double[] alpha;
  private final double constant;
  private final double critical;

  /**
   * Takes a table.
   *
   * @param name of the gas
   * @param reducedField_V_per_mPa rising, at least two rows
   * @param perPressure effective ionisation over pressure per row, 1/(m Pa)
   * @param streamerConstant K
   * @throws GasException where the table cannot serve
   */
  public TabulatedGas(
      String name, double[] reducedField_V_per_mPa, double[] perPressure, double streamerConstant) {
    this.name = name;
    field = reducedField_V_per_mPa.clone();
    alpha = perPressure.clone();
    constant = streamerConstant;
    if (field.length < 2 || field.length != alpha.length) {
      throw new GasException("gas " + name + ": the table needs two columns of two rows or more");
    }
    if (!(streamerConstant > 0)) {
      throw new GasException("gas " + name + ": the streamer constant must be positive");
    }
    int crossings = 0;
    double zero = Double.NaN;
    for (int i = 1; i < field.length; i++) {
      if (!(field[i] > field[i - 1])) {
        throw new GasException("gas " + name + ": the reduced field must rise from row to row");
      }
      if (alpha[i - 1] <= 0 && alpha[i] > 0) {
        crossings++;
        zero = field[i - 1] + (field[i] - field[i - 1]) * -alpha[i - 1] / (alpha[i] - alpha[i - 1]);
      } else if (alpha[i - 1] > 0 && alpha[i] <= 0) {
        crossings += 2;
      }
    }
    if (crossings != 1) {
      throw new GasException(
          "gas " + name + ": the effective ionisation must rise through zero once in the table");
    }
    critical = zero;
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public double perPressure(double reducedField_V_per_mPa) {
    if (reducedField_V_per_mPa <= field[0]) {
      return alpha[0];
    }
    int last = field.length - 1;
    if (reducedField_V_per_mPa >= field[last]) {
      return alpha[last];
    }
    int i = Arrays.binarySearch(field, reducedField_V_per_mPa);
    if (i >= 0) {
      return alpha[i];
    }
    int right = -i - 1;
    double t = (reducedField_V_per_mPa - field[right - 1]) / (field[right] - field[right - 1]);
    return alpha[right - 1] + t * (alpha[right] - alpha[right - 1]);
  }

  @Override
  public double critical_V_per_mPa() {
    return critical;
  }

  @Override
  public double largest_V_per_mPa() {
    return field[field.length - 1];
  }

  @Override
  public double streamerConstant() {
    return constant;
  }
}
