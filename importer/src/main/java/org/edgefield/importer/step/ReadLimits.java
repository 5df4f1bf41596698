package org.edgefield.importer.step;

import java.time.Duration;

/**
 * What a STEP file may cost, and how finely the kernel triangulates it.
 *
 * @param time wall time after which the reader process is stopped
 * @param memory_bytes address space of the reader process
 * @param largest_m coordinates beyond this are refused
 * @param meshAngle_rad largest angle between neighbouring triangles across a curved face
 */
public record ReadLimits(Duration time, long memory_bytes, double largest_m, double meshAngle_rad) {
  /** Two minutes, 4 GiB, 1 km, four segments per right angle. */
  public static ReadLimits defaults() {
    return new ReadLimits(Duration.ofMinutes(2), 4L << 30, 1000, Math.PI / 8);
  }

  /** The same limits with another time. */
  public ReadLimits withTime(Duration other) {
    return new ReadLimits(other, memory_bytes, largest_m, meshAngle_rad);
  }

  /** The same limits with another triangulation angle. */
  public ReadLimits withMeshAngle(double angle_rad) {
    return new ReadLimits(time, memory_bytes, largest_m, angle_rad);
  }
}
