package org.edgefield.cli.gltf.scene;

import java.util.Arrays;
import java.util.List;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;

/** Which triangles belong to which part. */
final class PartLayout {
  private final int[] partOfTriangle;
  private final int[] order;
  private final int[] start;

  PartLayout(List<Part> parts, SurfaceMesh mesh) {
    int faces = 0;
    for (Part p : parts) {
      faces = Math.max(faces, p.firstFace() + p.faceCount());
    }
    int[] partOfFace = new int[faces];
    for (Part p : parts) {
      Arrays.fill(partOfFace, p.firstFace(), p.firstFace() + p.faceCount(), p.index());
    }
    int triangles = mesh.triangleCount();
    partOfTriangle = new int[triangles];
    start = new int[parts.size() + 1];
    for (int t = 0; t < triangles; t++) {
      partOfTriangle[t] = partOfFace[mesh.triangleFace()[t]];
      start[partOfTriangle[t] + 1]++;
    }
    for (int p = 0; p < parts.size(); p++) {
      start[p + 1] += start[p];
    }
    order = new int[triangles];
    int[] next = start.clone();
    for (int t = 0; t < triangles; t++) {
      order[next[partOfTriangle[t]]++] = t;
    }
  }

  int partOf(int triangle) {
    return partOfTriangle[triangle];
  }

  /** Triangles of a part, rising. */
  int[] triangles(int part) {
    return Arrays.copyOfRange(order, start[part], start[part + 1]);
  }
}
