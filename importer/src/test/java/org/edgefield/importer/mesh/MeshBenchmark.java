package org.edgefield.importer.mesh;

import java.lang.management.ManagementFactory;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Locale;
import org.edgefield.importer.ModelException;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.mesh.bodies.AnalyticBody;
import org.edgefield.importer.mesh.check.MeshQuality;
import org.edgefield.importer.step.ReadLimits;
import org.edgefield.importer.step.StepReader;

/**
 * Prints time, quality and angle histogram of meshes: of STEP files named on the command line with
 * the default settings, or without any of a thin torus in about 250,000 triangles, as one part
 * (which one thread works on) and as two. Run with
 *
 * <pre>
 * mvn -q -pl importer test-compile exec:java -Dexec.classpathScope=test \
 *     -Dexec.mainClass=org.edgefield.importer.mesh.MeshBenchmark -Dexec.args="FILE.step ..."
 * </pre>
 */
public final class MeshBenchmark {
  private static final int RUNS = 3;

  private MeshBenchmark() {}

  /** Runs the benchmark. */
  public static void main(String[] files) {
    for (String file : files) {
      try (var model = StepReader.read(Path.of(file), ReadLimits.defaults(), Progress.NONE)) {
        run(
            Path.of(file).getFileName().toString(),
            model,
            model.triangulation(),
            MeshSettings.defaults());
      } catch (ModelException refused) {
        System.out.println(refused.getMessage());
      }
    }
    if (files.length == 0) {
      MeshSettings fine = new MeshSettings(32, 8, Double.POSITIVE_INFINITY, 0.01, 1, 0.4);
      AnalyticBody torus = AnalyticBody.torus(1, 0.02, 24, 12);
      MeshSettings half = new MeshSettings(39, 8, Double.POSITIVE_INFINITY, 0.01, 1, 0.4);
      AnalyticBody spheres = AnalyticBody.sphere(1, 9).addSphere(1, 4, 0, 0, 9);
      for (int i = 0; i < RUNS; i++) {
        run("torus, one part", torus, torus.mesh(), fine);
        run("two spheres", spheres, spheres.mesh(), half);
      }
    }
  }

  private static void run(String name, Assembly model, SurfaceMesh start, MeshSettings settings) {
    var threads = ManagementFactory.getOperatingSystemMXBean();
    long cpu = cpu(threads);
    long wall = System.nanoTime();
    SurfaceMesh mesh =
        SurfaceMesher.refine(model, start, settings, MeshRequest.NONE, Progress.NONE);
    double seconds = 1e-9 * (System.nanoTime() - wall);
    double cpuSeconds = 1e-9 * (cpu(threads) - cpu);
    MeshQuality q = MeshQuality.measure(model, mesh, settings, MeshRequest.NONE);
    System.out.printf(
        Locale.ROOT, "%-36s %6.2f s, %6.2f s CPU %s%n", name, seconds, cpuSeconds, q.line());
    System.out.println("    angles per 10 degrees: " + Arrays.toString(q.angleHistogram()));
  }

  private static long cpu(Object bean) {
    return ((com.sun.management.OperatingSystemMXBean) bean).getProcessCpuTime();
  }
}
