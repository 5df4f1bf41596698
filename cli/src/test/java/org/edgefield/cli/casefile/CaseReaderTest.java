package org.edgefield.cli.casefile;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.dataformat.yaml.YAMLMapper;
import com.networknt.schema.JsonSchemaFactory;
import com.networknt.schema.SpecVersion.VersionFlag;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.edgefield.cli.UserException;
import org.edgefield.cli.Version;
import org.edgefield.field.job.FieldCase;
import org.edgefield.importer.brep.Part;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class CaseReaderTest {
  private static final String SOUND =
      """
      model: box.step
      electrodes:
        - {name: phase 1, parts: ["Busbar*"]}
        - {name: housing, parts: ["Housing"], earth: true}
      ignore: ["Post*"]
      surroundings: {gas: air, altitude: 1200 m, temperature: 40 degC}
      edges: {radius as made: 0.2 mm to 0.5 mm, per part: {"Housing": 1 mm}}
      duties:
        - name: service
          voltages: {phase 1: 24 kV rms @ -120 deg}
      permitted: {criterion: fixed, field: 3 kV/mm, margin: 1.2, amber: 0.7}
      mesh: {elements per 90 degrees: 6, largest size: 20 mm}
      """;

  @TempDir Path folder;

  private Path file(String text) throws IOException {
    return Files.writeString(folder.resolve("case.yaml"), text);
  }

  private static Part part(int index, String name) {
    return new Part(index, name, "top/" + name, null, 0, 0, 0, 0, new double[6], 1, 1);
  }

  @Test
  void readsEveryKeyInSiUnits() throws IOException {
    CaseFile read = CaseReader.read(file(SOUND));
    assertThat(read.model()).isEqualTo(folder.resolve("box.step"));
    assertThat(read.surroundings().temperature_K()).isEqualTo(313.15);
    assertThat(read.surroundings().altitude_m()).isEqualTo(1200);
    assertThat(read.edges().radius_m()).isEqualTo(0.2e-3, within(1e-15));
    assertThat(read.permitted().field_V_per_m()).isEqualTo(3e6);
    assertThat(read.permitted().margin()).isEqualTo(1.2);
    assertThat(read.mesh().maxSize_m()).isEqualTo(0.02);
    assertThat(read.duties().get(0).voltages().get(0).voltage().real_V())
        .isEqualTo(-12e3 * Math.sqrt(2), within(1e-8));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          permitted:     | permited:      | :11:1: unknown key "permited" in the case file; did you mean "permitted"?
          3 kV/mm        | 3 mm           | "3 mm" is a length; expected a field strength like 3 kV/mm
          1200 m         | 1200           | :6:36: "altitude": "1200" has no unit; expected a length like 0.3 mm
          40 degC        | 40 degc        | unknown unit in "40 degc"; did you mean degC?
          0.2 mm to 0.5 mm | "0,2 mm"     | has a decimal comma; write 0.2 mm
          phase 1: 24 kV | phse 1: 24 kV  | there is no electrode "phse 1"; did you mean "phase 1"?
          phase 1: 24 kV rms @ -120 deg | housing: 0 V | gives no voltage for "phase 1"
          earth: true    | earth: yes     | "earth" must be true or false, not yes
          amber: 0.7     | amber: 7       | "amber" must be between 0.01 and 1, not 7
          criterion: fixed | criterion: fixd | did you mean fixed?
          name: housing, | name: phase 1, | electrode "phase 1" is already defined at 3:12
          model: box.step | title: box    | needs "model"
          """)
  void saysWhereAndWhatIsWrong(String from, String to, String message) throws IOException {
    assertThat(SOUND).contains(from);
    Path bad = file(SOUND.replace(from, to));
    assertThatThrownBy(() -> CaseReader.read(bad))
        .isInstanceOf(UserException.class)
        .hasMessageContaining(message)
        .message()
        .startsWith(bad.toString() + ":")
        .matches("(?s).*case.yaml:[0-9]+:[0-9]+: .*");
  }

  @ParameterizedTest
  @ValueSource(strings = {"", "[1, 2]", "a: [", "just words", "model: {a: &x [*x]}", "\t- a"})
  void refusesWhatIsNoCase(String text) throws IOException {
    Path bad = file(text);
    assertThatThrownBy(() -> CaseReader.read(bad)).isInstanceOf(UserException.class);
  }

  @Test
  void bindsPartsOncePerPart() throws IOException {
    FieldCase bound =
        CaseBinding.bind(
            CaseReader.read(file(SOUND)),
            List.of(
                part(0, "Busbar L1"), part(1, "Housing"), part(2, "Post 1"), part(3, "Busbar L2")));
    assertThat(bound.electrodes().get(0).parts()).containsExactly(0, 3);
    assertThat(bound.ignored()).containsExactly(2);
    assertThat(bound.edges().radius_m(1)).isEqualTo(1e-3);
    assertThat(bound.edges().radius_m(0)).isEqualTo(0.2e-3);
  }

  @Test
  void namesUnclaimedDoubleAndUnmatchedParts() throws IOException {
    CaseFile read =
        CaseReader.read(file(SOUND.replace("[\"Housing\"]", "[\"Busbar L1\", \"Huosing\"]")));
    assertThatThrownBy(
            () ->
                CaseBinding.bind(
                    read, List.of(part(0, "Busbar L1"), part(1, "Housing"), part(2, "Post 1"))))
        .hasMessageContaining("no part matches \"Huosing\"; nearest names: \"Housing\"")
        .hasMessageContaining("part \"top/Busbar L1\" is claimed by electrode \"housing\"")
        .hasMessageContaining("part \"top/Housing\" belongs to no electrode");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          3 kV/mm   | 3 kV/cm
          3 kV/mm   | 3 mm
          1200 m    | 1200
          40 degC   | 313 K
          earth: true | earth: maybe
          permitted: | permited:
          24 kV rms @ -120 deg | 24 kV
          24 kV rms @ -120 deg | 24
          0.2 mm to 0.5 mm | 0.3 mm
          0.2 mm to 0.5 mm | 0.3 kV
          ignore: ["Post*"] | ignore: "Post*"
          """)
  void schemaAndReaderAgree(String from, String to) throws IOException {
    String text = SOUND.replace(from, to);
    boolean read;
    try {
      CaseReader.read(file(text));
      read = true;
    } catch (UserException e) {
      read = false;
    }
    JsonNode tree = new YAMLMapper().readTree(text);
    boolean valid =
        JsonSchemaFactory.getInstance(VersionFlag.V202012)
            .getSchema(Version.class.getResourceAsStream("case.schema.json"))
            .validate(tree)
            .isEmpty();
    assertThat(read).as(to).isEqualTo(valid);
  }
}
