package org.edgefield.cli.command;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.networknt.schema.JsonSchemaFactory;
import com.networknt.schema.SpecVersion.VersionFlag;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Map;
import org.edgefield.cli.Version;
import org.edgefield.cli.console.Console;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class EndToEndTest {
  private static final Path DEMO = Path.of("../test-models/demo");

  @TempDir Path folder;

  private record Run(int code, String out, String err) {}

  private static Run run(int width, Object... args) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    Console console =
        new Console(
            new PrintStream(out, true, StandardCharsets.UTF_8),
            new PrintStream(err, true, StandardCharsets.UTF_8),
            false,
            false,
            width,
            Map.of());
    int code =
        CommandLineRun.run(
            console, Arrays.stream(args).map(String::valueOf).toArray(String[]::new));
    return new Run(
        code, out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
  }

  private static JsonNode valid(String text, String schema) throws IOException {
    JsonNode tree = new ObjectMapper().readTree(text);
    assertThat(
            JsonSchemaFactory.getInstance(VersionFlag.V202012)
                .getSchema(Version.class.getResourceAsStream(schema))
                .validate(tree))
        .isEmpty();
    return tree;
  }

  @Test
  void screenWritesAValidResultThatIsTheSameEachTime() throws IOException {
    Path a = folder.resolve("a");
    Files.createDirectory(a);
    Files.writeString(a.resolve("notes.txt"), "mine");
    Run first = run(80, "screen", DEMO.resolve("compartment.yaml"), "--out", a);
    Run second =
        run(80, "screen", DEMO.resolve("compartment.yaml"), "--out", folder.resolve("b"), "--json");
    assertThat(first.code()).isEqualTo(1);
    assertThat(first.out().lines()).allMatch(line -> line.length() <= 80);
    assertThat(a.resolve("notes.txt")).hasContent("mine");
    assertThat(a.resolve("heatmap.glb")).isNotEmptyFile();
    assertThat(a.resolve("summary.md")).content().contains("type test");
    String json = Files.readString(a.resolve("result.json"));
    JsonNode tree = valid(json, "result.schema.json");
    assertThat(tree.get("verdict").textValue()).isEqualTo("red");
    assertThat(second.out()).isEqualTo(Files.readString(folder.resolve("b/result.json")));
    assertThat(withoutTiming(second.out())).isEqualTo(withoutTiming(json));
    try (var left = Files.list(folder)) {
      assertThat(left).allMatch(p -> !p.getFileName().toString().startsWith("."));
    }
  }

  private static String withoutTiming(String json) {
    return json.substring(0, json.indexOf("\"timing\""));
  }

  @Test
  void gatePassesTheSameAndFailsTheWorseModel() throws IOException {
    Path accepted = folder.resolve("accepted.json");
    Path demo = DEMO.resolve("compartment.yaml");
    assertThat(run(80, "gate", demo, "--accepted", accepted).code()).isEqualTo(2);
    assertThat(run(80, "gate", demo, "--accepted", accepted, "--accept").code()).isZero();
    valid(Files.readString(accepted), "accepted.schema.json");
    Run same = run(80, "gate", demo, "--accepted", accepted, "--json");
    assertThat(same.code()).isZero();
    assertThat(new ObjectMapper().readTree(same.out()).findValuesAsText("change"))
        .containsOnly("same");
    Run worse = run(80, "gate", DEMO.resolve("compartment-worse.yaml"), "--accepted", accepted);
    assertThat(worse.code()).isEqualTo(1);
    assertThat(worse.out()).contains("Busbar L3", "FAIL", "gate: fail");
    assertThat(worse.out().lines()).allMatch(line -> line.length() <= 80);
    Run mended = run(80, "gate", DEMO.resolve("compartment-mended.yaml"), "--accepted", accepted);
    assertThat(mended.code()).as(mended.out()).isZero();
  }

  @Test
  void theSharpEdgeOfTheDemoIsRedTheRestAmberOrCalm() throws IOException {
    JsonNode tree = screened("compartment.yaml", 1);
    assertThat(tree.at("/duties/0/verdict").textValue()).as("service").isEqualTo("pass");
    int red = 0;
    int amber = 0;
    for (JsonNode duty : tree.get("duties")) {
      for (JsonNode spot : duty.get("hot_spots")) {
        String feature = spot.get("feature").textValue();
        String law = spot.get("law").textValue();
        assertThat(feature.contains("sharp"))
            .as(feature + ": " + law)
            .isEqualTo(law.contains("sharp"));
        if (spot.get("state").textValue().equals("red")) {
          red++;
          assertThat(feature).contains("sharp edge 90");
          assertThat(spot.get("part").textValue()).isEqualTo("Busbar L2");
        } else {
          amber++;
          assertThat(feature).containsAnyOf("rounded corner R12", "torus, section R10");
        }
      }
    }
    assertThat(red).isPositive();
    assertThat(amber).isPositive();
    assertThat(screened("compartment-mended.yaml", 0).get("verdict").textValue())
        .isEqualTo("amber");
  }

  private JsonNode screened(String name, int code) throws IOException {
    Path out = folder.resolve(name + "-out");
    Run run = run(80, "screen", DEMO.resolve(name), "--out", out);
    assertThat(run.code()).as(run.out()).isEqualTo(code);
    return new ObjectMapper().readTree(Files.readString(out.resolve("result.json")));
  }

  @Test
  void draftedCaseCanBeScreenedAndIsNotOverwritten() {
    Path model = DEMO.resolve("../step/demo-compartment.step");
    Path draft = folder.resolve("draft.yaml");
    assertThat(run(80, "draft", model, "-o", draft).code()).isZero();
    assertThat(run(80, "screen", draft, "-q", "--out", folder.resolve("d")).code()).isIn(0, 1);
    Run again = run(80, "draft", model, "-o", draft);
    assertThat(again.code()).isEqualTo(2);
    assertThat(again.err()).contains("--force");
  }

  @Test
  void faultsAreOneLineWithTheirCode() throws IOException {
    Path empty = Files.createFile(folder.resolve("empty.step"));
    assertThat(run(80, "parts", empty).code()).isEqualTo(3);
    Run missing = run(80, "screen", folder.resolve("none.yaml"));
    assertThat(missing.code()).isEqualTo(2);
    assertThat(missing.err().lines()).hasSize(1);
    Run taken = run(80, "screen", DEMO.resolve("compartment.yaml"), "--out", empty);
    assertThat(taken.code()).isEqualTo(2);
    assertThat(taken.err()).contains("is a file");
    assertThat(run(80, "scren").code()).isEqualTo(2);
    assertThat(run(60, "gate", "--help").out()).contains("Examples:");
  }

  @Test
  void narrowTerminalsGetLinesThatFit() throws IOException {
    Path out = folder.resolve("narrow");
    Path accepted = folder.resolve("accepted.json");
    run(80, "gate", DEMO.resolve("compartment.yaml"), "--accepted", accepted, "--accept");
    for (int width : new int[] {40, 60}) {
      Run screen = run(width, "screen", DEMO.resolve("compartment.yaml"), "-q", "--out", out);
      Run parts = run(width, "parts", DEMO.resolve("../step/demo-compartment.step"), "-q");
      Run gate =
          run(width, "gate", DEMO.resolve("compartment-worse.yaml"), "--accepted", accepted, "-q");
      assertThat(screen.code()).isEqualTo(1);
      assertThat(gate.code()).isEqualTo(1);
      // A path is not broken, so that it can be copied.
      assertThat((screen.out() + gate.out()).lines().filter(l -> !l.startsWith("written:")))
          .allSatisfy(line -> assertThat(line).hasSizeLessThanOrEqualTo(width));
      assertThat(parts.out().lines().skip(1).filter(l -> !l.contains(".step")))
          .allSatisfy(line -> assertThat(line).hasSizeLessThanOrEqualTo(width));
      assertThat(screen.out()).contains("kV/mm", "red");
      assertThat(gate.out()).contains("FAIL");
    }
  }

  @Test
  void colourOnlyOnATerminalThatWantsIt() {
    assertThat(screenOut(true, Map.of())).contains("\u001b[31m" + "red");
    assertThat(screenOut(true, Map.of("NO_COLOR", "1"))).doesNotContain("\u001b");
    assertThat(screenOut(true, Map.of("TERM", "dumb"))).doesNotContain("\u001b");
    assertThat(screenOut(false, Map.of())).doesNotContain("\u001b");
  }

  private String screenOut(boolean terminal, Map<String, String> environment) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    PrintStream print = new PrintStream(out, true, StandardCharsets.UTF_8);
    Console console = new Console(print, print, terminal, false, 80, environment);
    CommandLineRun.run(
        console,
        "screen",
        DEMO.resolve("compartment.yaml").toString(),
        "-q",
        "--out",
        folder.resolve("colour").toString());
    return out.toString(StandardCharsets.UTF_8);
  }

  @Test
  void anEarlierRunOfAnotherKindLeavesNoFileBehind() throws IOException {
    Path out = folder.resolve("set");
    Path accepted = folder.resolve("accepted.json");
    Path demo = DEMO.resolve("compartment.yaml");
    run(80, "gate", demo, "--accepted", accepted, "--accept", "--out", out);
    assertThat(out.resolve("gate.json")).exists();
    run(80, "screen", demo, "--out", out);
    try (var left = Files.list(out)) {
      assertThat(left.map(p -> p.getFileName().toString()))
          .containsExactlyInAnyOrder("result.json", "heatmap.glb", "summary.md");
    }
  }

  @Test
  void missingInputAndWrongUnitNameWhatIsMeant() throws IOException {
    Path model = folder.resolve("none.step");
    Path caseFile = folder.resolve("case.yaml");
    String text =
        """
        model: none.step
        electrodes: [{name: a, parts: ['*']}]
        duties: [{name: d, voltages: {a: 10 kV}}]
        """;
    Files.writeString(caseFile, text);
    Run missing = run(80, "screen", caseFile);
    assertThat(missing.code()).isEqualTo(3);
    assertThat(missing.err().lines()).singleElement().asString().contains(model.toString());
    Files.writeString(caseFile, text.replace("10 kV", "10 kN"));
    Run wrong = run(80, "screen", caseFile);
    assertThat(wrong.code()).isEqualTo(2);
    assertThat(wrong.err()).contains("case.yaml", "3:", "10 kN");
  }
}
