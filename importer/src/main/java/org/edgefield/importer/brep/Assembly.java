package org.edgefield.importer.brep;

import java.util.List;

/**
 * A STEP model in memory: its parts and the exact geometry behind them. Holds native memory until
 * closed.
 */
public interface Assembly extends AutoCloseable {
  /** The solids in file order. */
  List<Part> parts();

  /** Exact evaluation on faces and edges. */
  ExactGeometry geometry();

  /** Where the model came from. */
  Source source();

  /** Remarks on the model that a user should see, such as an implausible size. */
  List<String> warnings();

  @Override
  void close();

  /**
   * Origin of a model.
   *
   * @param file file name as given
   * @param sha256 hex digest of the file's bytes
   * @param unit length unit written in the file, for example "mm" or "inch"
   * @param schema application protocol named in the file, for example "AP214"
   */
  record Source(String file, String sha256, String unit, String schema) {}
}
