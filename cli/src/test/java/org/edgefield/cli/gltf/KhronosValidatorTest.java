package org.edgefield.cli.gltf;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** The Khronos glTF validator on files that use everything the writer can do. */
final class KhronosValidatorTest {

  @Test
  void noErrorsWarningsInfosOrHints() throws IOException, InterruptedException {
    NodeTools.need();
    List<String> command = new ArrayList<>();
    command.add("node");
    command.add(NodeTools.script("validate.mjs"));
    command.add(NodeTools.MODULES.toString());
    Path folder = Files.createDirectories(Path.of("target", "samples"));
    for (Map.Entry<String, byte[]> sample : Samples.all().entrySet()) {
      Path file = folder.resolve(sample.getKey() + ".glb");
      Files.write(file, sample.getValue());
      command.add(file.toString());
    }
    NodeTools.Output report = NodeTools.run(command);
    System.out.print(report.text());
    assertThat(report.text()).contains("0 errors 0 warnings 0 infos 0 hints");
    assertThat(report.code()).as(report.text()).isZero();
  }
}
