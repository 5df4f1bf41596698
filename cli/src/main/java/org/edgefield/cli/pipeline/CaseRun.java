package org.edgefield.cli.pipeline;

import java.nio.file.Path;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneId;
import java.util.List;
import org.edgefield.cli.Version;
import org.edgefield.cli.casefile.CaseBinding;
import org.edgefield.cli.casefile.CaseFile;
import org.edgefield.cli.casefile.CaseReader;
import org.edgefield.cli.gltf.HeatmapStamp;
import org.edgefield.cli.gltf.HeatmapWriter;
import org.edgefield.cli.output.OutputFolder;
import org.edgefield.cli.report.Report;
import org.edgefield.cli.report.ReportBuilder;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.curvature.feature.FeatureRecogniser;
import org.edgefield.curvature.node.NodeBuilder;
import org.edgefield.field.bem.solve.FieldSolver;
import org.edgefield.field.bem.solve.SolveSettings;
import org.edgefield.field.estimate.QuickEstimate;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.result.FieldResult;
import org.edgefield.importer.Progress;
import org.edgefield.importer.kernel.KernelAssembly;
import org.edgefield.importer.mesh.MeshRequest;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.SurfaceMesher;
import org.edgefield.importer.step.ReadLimits;
import org.edgefield.importer.step.StepReader;

/**
 * One case from file to result: read, mesh, estimate or solve, write. Holds the model until closed.
 */
public final class CaseRun implements AutoCloseable {
  private final CaseFile file;
  private final Progress progress;
  private final Instant started = Instant.now();
  private final Phases phases = new Phases();
  private final KernelAssembly assembly;
  private final FieldCase fieldCase;
  private FieldResult result;

  private CaseRun(CaseFile file, Progress progress) {
    this.file = file;
    this.progress = progress;
    assembly = StepReader.read(file.model(), ReadLimits.defaults(), progress);
    try {
      fieldCase = CaseBinding.bind(file, assembly.parts());
    } catch (RuntimeException e) {
      assembly.close();
      throw e;
    }
    phases.end("read");
  }

  /** Reads the case file and its model. */
  public static CaseRun open(Path caseFile, Progress progress) {
    return new CaseRun(CaseReader.read(caseFile), progress);
  }

  /** The quick estimate. */
  public void screen() {
    MeshRequest request =
        MeshRequest.NONE.withPartGroup(fieldCase.electrodeOfPart(assembly.parts().size()));
    SurfaceMesh mesh =
        SurfaceMesher.refine(assembly, assembly.triangulation(), file.mesh(), request, progress);
    phases.end("mesh");
    Features features = FeatureRecogniser.of(assembly.geometry(), mesh);
    SurfaceNodes nodes = NodeBuilder.perFace(assembly.geometry(), mesh, features);
    phases.end("curvature");
    result = QuickEstimate.run(assembly, mesh, nodes, features, fieldCase, progress);
    phases.end("estimate");
  }

  /** The solve. */
  public void solve(SolveSettings settings) {
    SurfaceMesh start = assembly.triangulation();
    Features features = FeatureRecogniser.of(assembly.geometry(), start);
    phases.end("curvature");
    result =
        FieldSolver.solve(assembly, start, features, fieldCase, file.mesh(), settings, progress);
    phases.end("solve");
  }

  /** The report of the result. */
  public Report report() {
    return ReportBuilder.build(
        file, fieldCase, assembly, result, new Report.Timing(started, phases.seconds()));
  }

  /** Adds the heatmap to a folder of results. */
  public void addHeatmap(OutputFolder folder) {
    HeatmapStamp stamp =
        new HeatmapStamp(Version.number(), LocalDate.ofInstant(started, ZoneId.systemDefault()));
    folder.add(
        "heatmap.glb",
        out -> HeatmapWriter.write(out, assembly, fieldCase, result, stamp, List.of()));
  }

  @Override
  public void close() {
    assembly.close();
  }
}
