package org.edgefield.importer.kernel;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.edgefield.importer.ModelException;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;

/** A model held by the CAD kernel, with the kernel's own triangulation of it. */
public final class KernelAssembly implements Assembly {
  private static final int INTS_PER_PART = 4;

  private final KernelGeometry geometry;
  private final long model;
  private final List<Part> parts;
  private final Source source;
  private final List<String> warnings;

  private KernelAssembly(
      long model, List<PartRecord> records, Source source, List<String> warnings) {
    this.model = model;
    this.geometry = new KernelGeometry(model);
    this.parts = parts(model, records);
    this.source = source;
    this.warnings = List.copyOf(warnings);
  }

  /**
   * What the reader process knows of one body.
   *
   * @param name name of the solid or product
   * @param path unique instance path
   * @param colour_rgb linear colour or null
   * @param bounds_m bounding box
   * @param volume_m3 signed volume: negative where the body is stored inside out
   * @param area_m2 surface area
   */
  public record PartRecord(
      String name,
      String path,
      float[] colour_rgb,
      double[] bounds_m,
      double volume_m3,
      double area_m2) {}

  /**
   * Loads checked bodies.
   *
   * @param bodies binary boundary representation of the kernel, one child per body
   * @param records one per body, same order
   * @param source origin
   * @param warnings remarks so far
   * @throws ModelException when the file cannot be loaded
   */
  public static KernelAssembly load(
      Path bodies, List<PartRecord> records, Source source, List<String> warnings) {
    loadLibrary();
    int[] signs = new int[records.size()];
    for (int i = 0; i < signs.length; i++) {
      signs[i] = records.get(i).volume_m3() < 0 ? -1 : 1;
    }
    byte[] path = (bodies + "\0").getBytes(StandardCharsets.UTF_8);
    long model = Kernel.openModel(path, signs, signs.length);
    if (model < 0) {
      throw new ModelException(source.file() + ": the checked bodies cannot be loaded; run again");
    }
    return new KernelAssembly(model, records, source, warnings);
  }

  /** Loads the native library; cheap when it is loaded already. */
  public static void loadLibrary() {
    Library.ensure();
  }

  private static final class Library {
    static {
      System.load(NativeFiles.library().toAbsolutePath().toString());
    }

    /** Runs the initialiser of this class. */
    static void ensure() {}
  }

  private static List<Part> parts(long model, List<PartRecord> records) {
    int[] ranges = new int[INTS_PER_PART * records.size()];
    Kernel.partRanges(model, ranges);
    List<Part> parts = new ArrayList<>();
    for (int i = 0; i < records.size(); i++) {
      PartRecord r = records.get(i);
      int k = INTS_PER_PART * i;
      parts.add(
          new Part(
              i,
              r.name(),
              r.path(),
              r.colour_rgb(),
              ranges[k],
              ranges[k + 1],
              ranges[k + 2],
              ranges[k + 3],
              r.bounds_m(),
              Math.abs(r.volume_m3()),
              r.area_m2()));
    }
    return List.copyOf(parts);
  }

  @Override
  public List<Part> parts() {
    return parts;
  }

  @Override
  public ExactGeometry geometry() {
    return geometry;
  }

  @Override
  public Source source() {
    return source;
  }

  @Override
  public List<String> warnings() {
    return warnings;
  }

  /**
   * The kernel's triangulation, made watertight: vertices are shared across CAD edges. Fine enough
   * to follow the surface at the angle that the model was read with, but its triangles are long and
   * thin: a start for remeshing. Vertices inside faces lie on the surface, vertices inside edges on
   * the edge's curve.
   */
  public SurfaceMesh triangulation() {
    if (!geometry.isOpen()) {
      throw new IllegalStateException("the assembly is closed");
    }
    int[] sizes = new int[3];
    if (Kernel.triangulate(model, sizes) < 0) {
      throw new ModelException(source.file() + ": a face carries no triangulation; run again");
    }
    int vertices = sizes[0];
    int triangles = sizes[1];
    int segments = sizes[2];
    SurfaceMesh mesh =
        new SurfaceMesh(
            new double[3 * vertices],
            new int[3 * triangles],
            new int[triangles],
            new double[6 * triangles],
            new byte[vertices],
            new int[vertices],
            new int[2 * segments],
            new int[segments],
            new double[2 * segments]);
    Kernel.takeTriangulation(
        model,
        mesh.xyz(),
        mesh.vertexKind(),
        mesh.vertexEntity(),
        mesh.triangles(),
        mesh.triangleFace(),
        mesh.cornerUv(),
        mesh.segmentVertices(),
        mesh.segmentEdge(),
        mesh.segmentT());
    return mesh;
  }

  @Override
  public void close() {
    if (geometry.close()) {
      Kernel.closeModel(model);
    }
  }
}
