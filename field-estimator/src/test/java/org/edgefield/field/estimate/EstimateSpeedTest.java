package org.edgefield.field.estimate;

import static org.assertj.core.api.Assertions.assertThat;

import java.lang.management.ManagementFactory;
import java.util.Locale;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.result.DutyField;
import org.edgefield.importer.Progress;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/** Time of an estimate of 250,000 triangles, and that threads do not change a bit of it. */
class EstimateSpeedTest {
  private static DutyField estimate(RevolvedBodies b) {
    FieldCase c =
        RevolvedBodies.fieldCase(
            new double[] {1, 0, -1}, new boolean[] {false, true, false}, null, null);
    return EstimateModel.build(b.assembly(), b.mesh(), b.nodes(), b.features(), c, Progress.NONE)
        .field(0, (k1, k2) -> 3e6);
  }

  @Test
  void sameBitsOnEveryRun() {
    RevolvedBodies b = new RevolvedBodies().sphere(0, 1).ellipsoid(4, 2, 1, false).rod(7, 0.5, 4);
    DutyField first = estimate(b);
    DutyField second = estimate(b);
    assertThat(second.field_V_per_m()).containsExactly(first.field_V_per_m());
    assertThat(first.field_V_per_m()).doesNotContain(Double.NaN, Double.POSITIVE_INFINITY);
  }

  @Test
  @Tag("slow")
  void quarterOfAMillionTriangles() {
    RevolvedBodies b =
        new RevolvedBodies(200, 4).sphere(0, 1).ellipsoid(4, 2, 1, false).rod(7, 0.5, 4);
    estimate(b);
    long wall = System.nanoTime();
    estimate(b);
    double seconds = 1e-9 * (System.nanoTime() - wall);
    System.out.printf(
        Locale.ROOT,
        "estimate of %d triangles, 3 electrodes: %.2f s wall, load %.1f%n",
        b.mesh().triangleCount(),
        seconds,
        ManagementFactory.getOperatingSystemMXBean().getSystemLoadAverage());
    assertThat(b.mesh().triangleCount()).isGreaterThan(240_000);
    assertThat(seconds).isLessThan(20);
  }
}
