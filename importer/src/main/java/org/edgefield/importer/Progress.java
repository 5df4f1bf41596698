package org.edgefield.importer;

/**
 * Receives the progress of long work. Implementations must return quickly; they may throw {@link
 * java.util.concurrent.CancellationException} to stop the work.
 */
@FunctionalInterface
public interface Progress {
  /** Ignores every report. */
  Progress NONE = (phase, fraction, detail) -> {};

  /**
   * Reports the state of one phase.
   *
   * @param phase short name of the phase, for example "read STEP"
   * @param fraction done so far, 0 to 1, or NaN where the end is not known
   * @param detail a few words more, may be empty
   */
  void report(String phase, double fraction, String detail);
}
