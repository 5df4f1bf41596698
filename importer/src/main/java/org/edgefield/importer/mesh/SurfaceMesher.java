package org.edgefield.importer.mesh;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.kernel.KernelAssembly;
import org.edgefield.importer.mesh.halfedge.HalfEdgeBuilder;
import org.edgefield.importer.mesh.halfedge.HalfEdgeMesh;
import org.edgefield.importer.mesh.halfedge.MeshAssembler;
import org.edgefield.importer.mesh.remesh.PartRemesher;
import org.edgefield.importer.mesh.size.Gaps;
import org.edgefield.importer.mesh.size.SizeSource;
import org.edgefield.importer.mesh.size.VertexField;

/**
 * Makes meshes for computing: triangles on the exact surface whose sizes follow curvature, the
 * distance to other parts, a largest size and what the caller asks for on top, longer than wide
 * along fillets and cylinders, graded, with all CAD edges kept.
 *
 * <p>Two parts at a time are worked on; the result is the same bit for bit whatever the machine.
 */
public final class SurfaceMesher {
  private static final int THREADS = 2;

  private SurfaceMesher() {}

  /**
   * Meshes an assembly, starting from the kernel's own triangulation.
   *
   * @param assembly the model
   * @param settings sizes asked for
   * @param progress receives the share of parts done
   * @return the mesh
   * @throws org.edgefield.importer.ModelException where a part's surface is not closed
   */
  public static SurfaceMesh mesh(
      KernelAssembly assembly, MeshSettings settings, Progress progress) {
    return refine(assembly, assembly.triangulation(), settings, MeshRequest.NONE, progress);
  }

  /**
   * Remeshes a mesh of the assembly, be it the kernel's triangulation or an earlier result.
   *
   * @param assembly the model
   * @param start closed mesh per part with all CAD edges in it
   * @param settings sizes asked for
   * @param request sizes asked for on top; {@code targetSize_m} belongs to the vertices of {@code
   *     start}
   * @param progress receives the share of parts done
   * @return the mesh
   * @throws org.edgefield.importer.ModelException where the mesh of a part is not closed
   */
  public static SurfaceMesh refine(
      Assembly assembly,
      SurfaceMesh start,
      MeshSettings settings,
      MeshRequest request,
      Progress progress) {
    ExactGeometry geometry = assembly.geometry();
    List<Part> parts = assembly.parts();
    Gaps gaps =
        parts.size() > 1 && settings.elementsPerGap() > 0
            ? new Gaps(parts, geometry, start, request.partGroup())
            : null;
    ExecutorService threads = Executors.newFixedThreadPool(THREADS);
    try {
      List<Future<HalfEdgeMesh>> work = new ArrayList<>();
      for (Part part : parts) {
        work.add(threads.submit(() -> remesh(geometry, start, settings, request, gaps, part)));
      }
      List<HalfEdgeMesh> done = new ArrayList<>();
      for (Future<HalfEdgeMesh> f : work) {
        progress.report("mesh", (double) done.size() / work.size(), parts.get(done.size()).name());
        done.add(take(f));
      }
      progress.report("mesh", 1, "");
      return MeshAssembler.join(done);
    } finally {
      threads.shutdownNow();
    }
  }

  private static HalfEdgeMesh take(Future<HalfEdgeMesh> future) {
    try {
      return future.get();
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new IllegalStateException("meshing was interrupted", e);
    } catch (ExecutionException e) {
      if (e.getCause() instanceof RuntimeException fault) {
        throw fault;
      }
      throw new IllegalStateException(e.getCause());
    }
  }

  private static HalfEdgeMesh remesh(
      ExactGeometry geometry,
      SurfaceMesh start,
      MeshSettings settings,
      MeshRequest request,
      Gaps gaps,
      Part part) {
    HalfEdgeBuilder.Built built = HalfEdgeBuilder.build(geometry, start, part);
    SizeSource sizes = new SizeSource(geometry, part, settings, request, gaps);
    VertexField field = new VertexField(built.mesh().vertices);
    if (request.targetSize_m() != null) {
      for (int v = 0; v < built.mesh().vertices; v++) {
        field.target[v] = request.targetSize_m()[built.originalVertex()[v]];
      }
    }
    PartRemesher.run(geometry, built.mesh(), field, sizes);
    return built.mesh();
  }
}
