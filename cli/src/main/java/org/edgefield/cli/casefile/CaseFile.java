package org.edgefield.cli.casefile;

import java.nio.file.Path;
import java.util.List;
import org.edgefield.cli.casefile.units.Phasor;
import org.edgefield.cli.casefile.yaml.Place;
import org.edgefield.cli.casefile.yaml.Text;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.Permitted;
import org.edgefield.field.job.Surroundings;
import org.edgefield.importer.mesh.MeshSettings;

/**
 * A case file as read, before its part patterns met a model.
 *
 * @param file the case file
 * @param model the STEP file, resolved against the case file's folder
 * @param electrodes in file order
 * @param ignore patterns of parts that take no part
 * @param surroundings gas, earth plane, ambient field
 * @param edges edge radius as made
 * @param duties in file order
 * @param permitted rule for the permitted field
 * @param mesh mesh settings
 */
public record CaseFile(
    Path file,
    Path model,
    List<ElectrodeEntry> electrodes,
    List<Text> ignore,
    Surroundings surroundings,
    EdgesEntry edges,
    List<DutyEntry> duties,
    Permitted permitted,
    MeshSettings mesh) {

  /** Electrode with its part patterns. */
  public record ElectrodeEntry(Text name, List<Text> parts, Electrode.Kind kind) {}

  /**
   * Edge radius as made.
   *
   * @param radius_m worst of the band
   * @param given whether the case file gives it
   * @param perPart radius for parts that match a pattern; the last match counts
   */
  public record EdgesEntry(double radius_m, boolean given, List<PartRadius> perPart) {}

  /** Radius for parts that match a pattern. */
  public record PartRadius(Text pattern, double radius_m) {}

  /** Duty with its voltages by electrode name. */
  public record DutyEntry(String name, Place place, List<VoltageEntry> voltages) {}

  /** Voltage of one electrode. */
  public record VoltageEntry(Text electrode, Phasor voltage) {}
}
