package org.edgefield.cli.gltf;

import java.io.IOException;
import java.io.OutputStream;
import java.util.List;
import org.edgefield.cli.gltf.scene.HeatmapScene;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.result.FieldResult;
import org.edgefield.importer.brep.Assembly;

/**
 * Writes a result as one binary glTF file that explains itself in any viewer: parts coloured by
 * utilisation, numbered pins at the hot spots, a board with the scale, and with several duties one
 * variant each.
 */
public final class HeatmapWriter {
  private HeatmapWriter() {}

  /**
   * Writes the heatmap.
   *
   * @param out where to; neither buffered nor closed here
   * @param assembly names, places and source of the parts
   * @param job the case that was computed
   * @param result its outcome
   * @param slices cuts through the gas, may be empty
   * @throws IOException from the stream, or if the file would pass 4 GiB
   */
  public static void write(
      OutputStream out,
      Assembly assembly,
      FieldCase job,
      FieldResult result,
      HeatmapStamp stamp,
      List<SliceLayer> slices)
      throws IOException {
    HeatmapScene.build(assembly, job, result, stamp, slices).write(out);
  }
}
