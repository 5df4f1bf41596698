package org.edgefield.cli.gltf;

import static org.assertj.core.api.Assertions.assertThat;

import java.awt.image.BufferedImage;
import java.io.File;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.IntStream;
import javax.imageio.ImageIO;
import org.edgefield.cli.colour.ColourScale;
import org.edgefield.cli.colour.Srgb;
import org.junit.jupiter.api.Test;

/**
 * Shows a heatmap in three.js and in model-viewer, in headless Chromium, and looks for the colours
 * of the scale in the pictures, which stay in {@code target/samples}.
 */
final class ViewersTest {
  private static final Path CHROMIUM = Path.of("/usr/bin/chromium");

  /** Pixels of one small pin face. */
  private static final long A_FEW = 100;

  @Test
  void bothViewersShowTheColoursOfTheScale() throws IOException, InterruptedException {
    NodeTools.need();
    NodeTools.need(Files.isExecutable(CHROMIUM), "there is no " + CHROMIUM);
    Path folder = Files.createDirectories(Path.of("target", "samples"));
    Path file = folder.resolve("viewers.glb");
    Files.write(file, Samples.threeDuties().glb());
    Path prefix = folder.resolve("viewers");
    NodeTools.Output output =
        NodeTools.run(
            List.of(
                "node",
                NodeTools.script("shoot.mjs"),
                NodeTools.MODULES.toString(),
                file.toString(),
                prefix.toString(),
                "--variant",
                "service"));
    System.out.print(output.text());
    assertThat(output.code()).as(output.text()).isZero();
    assertThat(output.text())
        .contains("[\"service\",\"power-frequency withstand\",\"lightning impulse\"]");
    ColourScale scale = new ColourScale(0.8);
    for (String viewer : List.of("three", "model-viewer")) {
      BufferedImage picture = ImageIO.read(new File(prefix + "-" + viewer + ".png"));
      // Pins and the board's verdict are filled with exactly these.
      assertThat(pixels(picture, scale.rgb(1))).as(viewer + ", red").isGreaterThan(A_FEW);
      assertThat(pixels(picture, scale.rgb(0.8))).as(viewer + ", amber").isGreaterThan(A_FEW);
    }
    BufferedImage service = ImageIO.read(new File(prefix + "-model-viewer-service.png"));
    BufferedImage governing = ImageIO.read(new File(prefix + "-model-viewer.png"));
    assertThat(reddish(service))
        .as("the calm duty shows red on its board's scale alone")
        .isLessThan(reddish(governing) / 2);
  }

  /** Pixels within two code values of a colour. */
  private static long pixels(BufferedImage image, int rgb) {
    return IntStream.range(0, image.getWidth() * image.getHeight())
        .map(i -> image.getRGB(i % image.getWidth(), i / image.getWidth()))
        .filter(
            p ->
                Math.abs(Srgb.channel(p, 16) - Srgb.channel(rgb, 16)) <= 2
                    && Math.abs(Srgb.channel(p, 8) - Srgb.channel(rgb, 8)) <= 2
                    && Math.abs(Srgb.channel(p, 0) - Srgb.channel(rgb, 0)) <= 2)
        .count();
  }

  private static long reddish(BufferedImage image) {
    return IntStream.range(0, image.getWidth() * image.getHeight())
        .map(i -> image.getRGB(i % image.getWidth(), i / image.getWidth()))
        .filter(p -> Srgb.channel(p, 16) > 90 && Srgb.channel(p, 8) < 50)
        .count();
  }
}
