package org.edgefield.cli.gltf.text;

import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.zip.CRC32;
import java.util.zip.Deflater;

/**
 * Writes 8-bit truecolour PNG (ISO/IEC 15948) without any desktop library, so that it works on a
 * headless Java runtime.
 */
public final class PngEncoder {
  private static final byte[] SIGNATURE = {(byte) 0x89, 'P', 'N', 'G', '\r', '\n', 0x1a, '\n'};
  private static final byte FILTER_NONE = 0;

  private PngEncoder() {}

  /**
   * Encodes an image.
   *
   * @param width pixels per row
   * @param height rows
   * @param rgb packed 0xRRGGBB, row by row from the top, length width x height
   */
  public static byte[] encode(int width, int height, int[] rgb) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    out.writeBytes(SIGNATURE);
    ByteBuffer header = ByteBuffer.allocate(13).putInt(width).putInt(height);
    // 8 bits per channel, truecolour, deflate, standard filters, not interlaced
    header.put((byte) 8).put((byte) 2).put((byte) 0).put((byte) 0).put((byte) 0);
    chunk(out, "IHDR", header.array());
    chunk(out, "IDAT", deflate(scanlines(width, height, rgb)));
    chunk(out, "IEND", new byte[0]);
    return out.toByteArray();
  }

  /** Rows as they are: drawings of few colours pack better without a filter. */
  private static byte[] scanlines(int width, int height, int[] rgb) {
    byte[] rows = new byte[height * (1 + 3 * width)];
    int at = 0;
    for (int y = 0; y < height; y++) {
      rows[at++] = FILTER_NONE;
      for (int x = 0; x < width; x++) {
        int here = rgb[y * width + x];
        for (int shift = 16; shift >= 0; shift -= 8) {
          rows[at++] = (byte) (here >> shift);
        }
      }
    }
    return rows;
  }

  private static byte[] deflate(byte[] data) {
    Deflater deflater = new Deflater(Deflater.DEFAULT_COMPRESSION);
    try {
      deflater.setInput(data);
      deflater.finish();
      ByteArrayOutputStream out = new ByteArrayOutputStream();
      byte[] block = new byte[1 << 14];
      while (!deflater.finished()) {
        out.write(block, 0, deflater.deflate(block));
      }
      return out.toByteArray();
    } finally {
      deflater.end();
    }
  }

  private static void chunk(ByteArrayOutputStream out, String type, byte[] body) {
    byte[] name = type.getBytes(StandardCharsets.US_ASCII);
    CRC32 crc = new CRC32();
    crc.update(name);
    crc.update(body);
    out.writeBytes(ByteBuffer.allocate(4).putInt(body.length).array());
    out.writeBytes(name);
    out.writeBytes(body);
    out.writeBytes(ByteBuffer.allocate(4).putInt((int) crc.getValue()).array());
  }
}
