package org.edgefield.cli.pipeline;

import java.nio.file.Path;
import java.util.List;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.PartSummary;
import org.edgefield.curvature.feature.FeatureRecogniser;
import org.edgefield.curvature.feature.PartSummaries;
import org.edgefield.curvature.node.NodeBuilder;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.kernel.KernelAssembly;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.step.ReadLimits;
import org.edgefield.importer.step.StepReader;

/**
 * What is in a model, without a case.
 *
 * @param source where it came from
 * @param parts its parts
 * @param summaries sharp edges and radii per part
 * @param warnings remarks for the user
 */
public record ModelLook(
    Assembly.Source source, List<Part> parts, List<PartSummary> summaries, List<String> warnings) {

  /** Reads a model and looks at its parts. */
  public static ModelLook at(Path model, Progress progress) {
    try (KernelAssembly assembly = StepReader.read(model, ReadLimits.defaults(), progress)) {
      SurfaceMesh mesh = assembly.triangulation();
      Features features = FeatureRecogniser.of(assembly.geometry(), mesh);
      return new ModelLook(
          assembly.source(),
          List.copyOf(assembly.parts()),
          PartSummaries.of(
              assembly.parts(),
              assembly.geometry(),
              mesh,
              NodeBuilder.perFace(assembly.geometry(), mesh, features),
              features),
          List.copyOf(assembly.warnings()));
    }
  }
}
