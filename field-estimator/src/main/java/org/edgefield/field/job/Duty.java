package org.edgefield.field.job;

/**
 * A named set of electrode voltages, as peak phasors: DC and single-phase peaks have no imaginary
 * part.
 *
 * @param name as the case file gives it
 * @param real_V in-phase peak voltage per electrode, in the order of the case
 * @param imaginary_V quadrature peak voltage per electrode
 */
public record Duty(String name, double[] real_V, double[] imaginary_V) {

  /** Largest voltage difference between two electrodes over the cycle, volts. */
  public double difference_V(int a, int b) {
    return Math.hypot(real_V[a] - real_V[b], imaginary_V[a] - imaginary_V[b]);
  }
}
