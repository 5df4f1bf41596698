package org.edgefield.cli.gltf;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.lang.management.ManagementFactory;
import java.time.LocalDate;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.stream.StreamSupport;
import javax.imageio.ImageIO;
import org.edgefield.cli.colour.ColourScale;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.result.FieldResult;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

final class HeatmapWriterTest {

  @Test
  void aLoneTriangleIsWrittenWhole() {
    GlbReader glb = new GlbReader(Samples.lone().glb());
    JsonNode primitive = glb.primitive(glb.node("only"), 0);
    // (x, y, z) becomes (x, z, -y)
    assertThat(glb.attribute(primitive, "POSITION")).containsExactly(0, 0, 0, 1, 0, 0, 0, 0, -1);
    assertThat(glb.values(primitive.get("indices").asInt())).containsExactly(0, 1, 2);
  }

  @Test
  void sameInputGivesTheSameBytes() {
    assertThat(Samples.threeDuties().glb(Samples.slice(3)))
        .isEqualTo(Samples.threeDuties().glb(Samples.slice(3)));
  }

  @Test
  void everyPartIsANodeWithItsNameAndValues() {
    SampleScene scene = Samples.oneDuty();
    GlbReader glb = new GlbReader(scene.glb());
    double[] field = scene.result().duties().get(0).field().field_V_per_m();
    double most = 0;
    double worst = 0;
    for (String name : List.of("Busbar L1", "Busbar L2", "Busbar L3", "Schirm", "Housing")) {
      JsonNode primitive = glb.primitive(glb.node(name), 0);
      double[] ratio = glb.attribute(primitive, "_UTILISATION");
      double[] strength = glb.attribute(primitive, "_FIELD_V_PER_M");
      for (int i = 0; i < ratio.length; i++) {
        worst = Math.max(worst, Math.abs(ratio[i] - strength[i] / 3e6));
        most = Math.max(most, strength[i]);
      }
    }
    assertThat(worst).isLessThan(1e-6);
    assertThat(most).isCloseTo(Arrays.stream(field).max().orElseThrow(), within(1.0));
    JsonNode insulator = glb.primitive(glb.node("Insulator"), 0);
    assertThat(insulator.get("attributes").has("_UTILISATION")).isFalse();
    assertThat(glb.node("Busbar L1").get("extras").get("electrode").asText()).isEqualTo("phase 1");
  }

  /** Follows a vertex as a viewer would: texture coordinate, texel, colour. */
  @Test
  void theTextureShowsTheColourOfTheScaleForEveryDuty() throws IOException {
    ColourScale scale = new ColourScale(0.8);
    GlbReader glb = new GlbReader(Samples.threeDuties().glb());
    JsonNode variants = glb.json.get("extensions").get("KHR_materials_variants").get("variants");
    assertThat(variants).hasSize(3);
    JsonNode ball = glb.primitive(glb.node("Schirm"), 0);
    JsonNode mappings = ball.get("extensions").get("KHR_materials_variants").get("mappings");
    int[] families = new int[3];
    int off = 0;
    for (int d = 0; d < 3; d++) {
      int duty = d;
      JsonNode mapping =
          StreamSupport.stream(mappings.spliterator(), false)
              .filter(m -> m.get("variants").get(0).asInt() == duty)
              .findFirst()
              .orElseThrow();
      JsonNode look =
          glb.json
              .get("materials")
              .get(mapping.get("material").asInt())
              .get("pbrMetallicRoughness")
              .get("baseColorTexture");
      int source = glb.json.get("textures").get(look.get("index").asInt()).get("source").asInt();
      BufferedImage image = ImageIO.read(new ByteArrayInputStream(glb.image(source)));
      double[] uv = glb.attribute(ball, "TEXCOORD_" + look.get("texCoord").asInt());
      double[] ratio = glb.attribute(ball, d == 0 ? "_UTILISATION" : "_UTILISATION_" + d);
      for (int i = 0; i < ratio.length; i++) {
        int x = (int) Math.min(image.getWidth() - 1.0, uv[2 * i] * image.getWidth());
        int y = (int) Math.min(image.getHeight() - 1.0, uv[2 * i + 1] * image.getHeight());
        int shown = image.getRGB(x, y) & 0xffffff;
        int wanted = scale.rgb(ratio[i]);
        for (int shift = 0; shift <= 16; shift += 8) {
          // A texel is 0.001 wide; only at a limit can that change a colour by more than 1.
          if (Math.abs(ratio[i] - 0.8) > 0.001 && Math.abs(ratio[i] - 1) > 0.001) {
            off = Math.max(off, Math.abs(((shown >> shift) & 0xff) - ((wanted >> shift) & 0xff)));
          }
        }
        families[d] |= ratio[i] >= 1 ? 4 : ratio[i] >= 0.8 ? 2 : 1;
      }
    }
    assertThat(off).isLessThanOrEqualTo(1);
    // The sample covers calm, amber and red between its duties.
    assertThat(families[0] | families[1] | families[2]).isEqualTo(7);
  }

  @Test
  void viewersWithoutVariantsShowTheGoverningDuty() {
    GlbReader glb = new GlbReader(Samples.threeDuties().glb());
    int material = glb.primitive(glb.node("Busbar L1"), 0).get("material").asInt();
    assertThat(glb.json.get("materials").get(material).get("name").asText())
        .isEqualTo("utilisation, lightning impulse");
    JsonNode duties = glb.json.get("asset").get("extras").get("duties");
    assertThat(duties.get(2).get("governing").asBoolean()).isTrue();
  }

  @Test
  void pinsNameRankFieldAndPlace() {
    GlbReader glb = new GlbReader(Samples.oneDuty().glb());
    JsonNode pin = glb.node("1 - ");
    assertThat(pin.get("name").asText())
        .matches("1 - \\d\\.\\d kV/mm - sharp edge 90 deg of Busbar L3");
    double[] at = glb.attribute(glb.primitive(pin, 0), "POSITION");
    JsonNode peak = pin.get("extras").get("at_m");
    // The spike's tip, first vertex, stands on the hot spot.
    assertThat(at[0]).isCloseTo(peak.get(0).asDouble(), within(1e-6));
    assertThat(at[1]).isCloseTo(peak.get(2).asDouble(), within(1e-6));
    assertThat(at[2]).isCloseTo(-peak.get(1).asDouble(), within(1e-6));
  }

  @Test
  void pinsOfOtherDutiesAreNotShown() {
    GlbReader glb = new GlbReader(Samples.threeDuties().glb());
    for (JsonNode node : glb.json.get("nodes")) {
      if (node.get("name").asText().endsWith("[power-frequency withstand]")) {
        int material = glb.primitive(node, 0).get("material").asInt();
        assertThat(glb.json.get("materials").get(material).get("name").asText())
            .isEqualTo("not shown");
        return;
      }
    }
    throw new AssertionError("no pin of the second duty");
  }

  @Test
  void theCalmOuterSkinOfAHousingIsLeftOutButKeptInTheFile() {
    GlbReader glb = new GlbReader(Samples.oneDuty().glb());
    JsonNode housing = glb.node("Housing");
    JsonNode skin = glb.primitive(housing, 1);
    assertThat(glb.json.get("materials").get(skin.get("material").asInt()).get("name").asText())
        .isEqualTo("not shown");
    int shown = glb.values(glb.primitive(housing, 0).get("indices").asInt()).length;
    int leftOut = glb.values(skin.get("indices").asInt()).length;
    assertThat(shown + leftOut).isEqualTo(3 * 2 * 6 * 2 * 16 * 16);
    assertThat(leftOut).isEqualTo(3 * 6 * 2 * 16 * 16);
  }

  @Test
  void aHotOuterSkinStaysInView() {
    GlbReader glb = new GlbReader(SampleScene.compartment().duty("too much", 12).glb());
    JsonNode housing = glb.node("Housing");
    int shown = glb.values(glb.primitive(housing, 0).get("indices").asInt()).length;
    assertThat(shown).isGreaterThan(3 * 6 * 2 * 16 * 16);
  }

  /** The made-up edges hold more than the faces beside them. */
  @Test
  void facesDoNotSmearTheValueOfSharpEdgesAndBandsShowIt() {
    GlbReader glb = new GlbReader(Samples.oneDuty().glb());
    JsonNode face = glb.primitive(glb.node("Busbar L3"), 0);
    double[] uv = glb.attribute(face, "TEXCOORD_0");
    double[] ratio = glb.attribute(face, "_UTILISATION");
    double onFaces = 0;
    for (int i = 0; i < uv.length; i += 2) {
      onFaces = Math.max(onFaces, uv[i] * ColourScale.END);
    }
    double onNodes = Arrays.stream(ratio).max().orElseThrow();
    double[] band =
        glb.attribute(glb.primitive(glb.node("sharp edges of Busbar L3"), 1), "_UTILISATION");
    assertThat(onFaces).isLessThan(0.9 * onNodes);
    assertThat(Arrays.stream(band).max().orElseThrow()).isCloseTo(onNodes, within(1e-6));
  }

  @Test
  void fieldsThatMustNotBeAreKeptFinite() {
    SampleScene scene =
        new SampleScene()
            .ball("Ball", 0, 0, 0, 0.1, 8)
            .electrode("ball", Electrode.Kind.LIVE, 0)
            .duty("d", 1);
    FieldResult result = scene.result();
    double[] permitted = result.duties().get(0).field().permitted_V_per_m();
    Arrays.fill(permitted, 0, 20, 0);
    permitted[21] = Double.NaN;
    result.duties().get(0).field().field_V_per_m()[22] = Double.NaN;
    GlbReader glb = new GlbReader(scene.glb(result));
    double[] ratio = glb.attribute(glb.primitive(glb.node("Ball"), 0), "_UTILISATION");
    assertThat(Arrays.stream(ratio).allMatch(Double::isFinite)).isTrue();
  }

  @Test
  void theFileTellsWhereItComesFrom() {
    JsonNode asset = new GlbReader(Samples.oneDuty().glb()).json.get("asset");
    assertThat(asset.get("generator").asText()).isEqualTo("edgefield 0.0-test");
    JsonNode extras = asset.get("extras");
    assertThat(extras.get("format").asText()).isEqualTo("edgefield-heatmap/1");
    assertThat(extras.get("input").get("sha256").asText()).hasSize(64);
    assertThat(extras.get("limits").get("amber").asDouble()).isEqualTo(0.8);
    assertThat(extras.get("limits").get("red").asDouble()).isEqualTo(1);
  }

  @Test
  void aQuarterMillionTrianglesTakeUnderASecond() throws IOException {
    assertThat(seconds(251)).isLessThan(1);
  }

  @Test
  @Tag("slow")
  void aMillionTrianglesTakeWellUnderTwoSeconds() throws IOException {
    assertThat(seconds(501)).isLessThan(1.5);
  }

  /** Processor time to write a ball of 4 rings^2 triangles with two pins. */
  private static double seconds(int rings) throws IOException {
    SampleScene scene =
        new SampleScene()
            .ball("Ball", 0, 0, 0, 0.1, rings)
            .electrode("ball", Electrode.Kind.LIVE, 0)
            .duty("d", 1.5, 300, 500);
    FieldResult result = scene.result();
    HeatmapStamp stamp = new HeatmapStamp("0.0-test", LocalDate.of(2026, 1, 2));
    long before = ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime();
    long[] bytes = new long[1];
    HeatmapWriter.write(
        new OutputStream() {
          @Override
          public void write(int b) {
            bytes[0]++;
          }

          @Override
          public void write(byte[] b, int from, int length) {
            bytes[0] += length;
          }
        },
        scene.assembly(),
        scene.job(),
        result,
        stamp,
        List.of());
    double seconds = (ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime() - before) / 1e9;
    System.out.printf(
        Locale.ROOT,
        "%d triangles, %.1f MB, %.2f s of processor time%n",
        result.mesh().triangleCount(),
        bytes[0] / 1e6,
        seconds);
    return seconds;
  }
}
