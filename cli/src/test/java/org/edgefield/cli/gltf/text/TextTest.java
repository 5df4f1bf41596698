package org.edgefield.cli.gltf.text;

import static org.assertj.core.api.Assertions.assertThat;

import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.util.HashMap;
import java.util.Map;
import java.util.Random;
import javax.imageio.ImageIO;
import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;

final class TextTest {
  private static final int PAPER = 0xffffff;
  private static final int INK = 0x102030;

  @Test
  void pngIsReadBackPixelForPixelByTheRuntimesOwnReader() throws IOException {
    Random random = new Random(7);
    int[][] sizes = {{1, 1}, {3, 5}, {257, 63}, {64, 300}};
    for (int[] size : sizes) {
      int[] rgb = random.ints((long) size[0] * size[1], 0, 0x1000000).toArray();
      BufferedImage image =
          ImageIO.read(new ByteArrayInputStream(PngEncoder.encode(size[0], size[1], rgb)));
      assertThat(image.getWidth()).isEqualTo(size[0]);
      assertThat(image.getHeight()).isEqualTo(size[1]);
      for (int i = 0; i < rgb.length; i++) {
        assertThat(image.getRGB(i % size[0], i / size[0]) & 0xffffff).isEqualTo(rgb[i]);
      }
    }
  }

  @Test
  void everyPrintableAsciiCharacterHasItsOwnLook() throws IOException {
    Map<String, Integer> seen = new HashMap<>();
    for (int c = '!'; c <= '~'; c++) {
      String look = drawn(Character.toString(c));
      assertThat(look).as("ink of %c", c).contains("#");
      assertThat(look).as("%c is known", c).isNotEqualTo(drawn("\u65e5"));
      Integer twin = seen.putIfAbsent(look, c);
      assertThat(twin).as("%c looks like %c", c, twin).isNull();
    }
  }

  @Test
  void accentsAreDrawnAsMarks() throws IOException {
    for (int letter : "äöüÄÖÜéèêñåçčśłøØß°µ²±≥".codePoints().toArray()) {
      assertThat(drawn(Character.toString(letter))).isNotEqualTo(drawn("\u65e5"));
    }
    assertThat(drawn("ä")).isNotEqualTo(drawn("a")).isNotEqualTo(drawn("á"));
  }

  @Test
  void widthGrowsWithTheTextAndTheSize() {
    assertThat(Canvas.textWidth("", 20)).isZero();
    assertThat(Canvas.textWidth("AB", 20)).isGreaterThan(Canvas.textWidth("A", 20));
    assertThat(Canvas.textWidth("AB", 40)).isCloseTo(2 * Canvas.textWidth("AB", 20), offset());
  }

  @Test
  void drawingOutsideIsCutOff() throws IOException {
    Canvas canvas = new Canvas(10, 10, PAPER);
    canvas.fill(-5, -5, 8, 8, INK);
    canvas.text("WWWW", -20, 14, 30, INK);
    BufferedImage image = ImageIO.read(new ByteArrayInputStream(canvas.png()));
    assertThat(image.getRGB(0, 0) & 0xffffff).isEqualTo(INK);
  }

  private static Offset<Double> offset() {
    return Offset.offset(1e-4);
  }

  private static String drawn(String text) throws IOException {
    Canvas canvas = new Canvas(48, 48, PAPER);
    canvas.text(text, 6, 36, 24, INK);
    BufferedImage image = ImageIO.read(new ByteArrayInputStream(canvas.png()));
    StringBuilder out = new StringBuilder();
    for (int y = 0; y < 48; y++) {
      for (int x = 0; x < 48; x++) {
        out.append((image.getRGB(x, y) & 0xff) < 0x90 ? '#' : '.');
      }
    }
    return out.toString();
  }
}
