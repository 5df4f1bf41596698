package org.edgefield.cli.gltf.file;

import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Collects the arrays and the JSON of one binary glTF 2.0 file (Khronos, ISO/IEC 12113) and streams
 * them out. Arrays of one layout share a buffer view; they are kept by reference and written in
 * blocks, so the file never exists in memory as a whole.
 */
public final class GlbBuilder {
  private static final int MAGIC = 0x46546C67;
  private static final int CHUNK_JSON = 0x4E4F534A;
  private static final int CHUNK_BIN = 0x004E4942;
  private static final int ARRAY_BUFFER = 34962;
  private static final int ELEMENT_ARRAY_BUFFER = 34963;
  private static final int UNSIGNED_SHORT = 5123;
  private static final int UNSIGNED_INT = 5125;
  private static final int FLOAT = 5126;
  private static final String[] TYPE = {"", "SCALAR", "VEC2", "VEC3", "VEC4"};

  private final ObjectNode root = JsonNodeFactory.instance.objectNode();
  private final ArrayNode accessors = JsonNodeFactory.instance.arrayNode();
  private final Map<String, View> views = new LinkedHashMap<>();

  /** A buffer view in the making. */
  private static final class View {
    final int index;
    final int target;
    final int stride;
    final List<Object> arrays = new ArrayList<>();
    long bytes;

    View(int index, int target, int stride) {
      this.index = index;
      this.target = target;
      this.stride = stride;
    }

    /** Adds an array and returns its offset. */
    long add(Object array, long length) {
      long offset = bytes;
      arrays.add(array);
      bytes += length;
      return offset;
    }
  }

  /** Root object of the JSON, for everything but accessors, buffer views and the buffer. */
  public ObjectNode root() {
    return root;
  }

  /** Adds positions, 3 floats each, with their bounds; returns the accessor. */
  public int positions(float[] xyz) {
    int index = floats(xyz, 3);
    float[] min = {Float.POSITIVE_INFINITY, Float.POSITIVE_INFINITY, Float.POSITIVE_INFINITY};
    float[] max = {Float.NEGATIVE_INFINITY, Float.NEGATIVE_INFINITY, Float.NEGATIVE_INFINITY};
    for (int i = 0; i < xyz.length; i++) {
      min[i % 3] = Math.min(min[i % 3], xyz[i]);
      max[i % 3] = Math.max(max[i % 3], xyz[i]);
    }
    ObjectNode accessor = (ObjectNode) accessors.get(index);
    ArrayNode low = accessor.putArray("min");
    ArrayNode high = accessor.putArray("max");
    for (int c = 0; c < 3; c++) {
      low.add((double) min[c]);
      high.add((double) max[c]);
    }
    return index;
  }

  /** Adds vertex data of {@code components} floats each (1 to 4); returns the accessor. */
  public int floats(float[] data, int components) {
    View view = view("f" + components, ARRAY_BUFFER, 4 * components);
    return accessor(
        view, view.add(data, 4L * data.length), FLOAT, data.length / components, components);
  }

  /** Adds vertex colours, linear RGBA as normalised 16-bit words; returns the accessor. */
  public int colours(short[] rgba) {
    View view = view("u16x4", ARRAY_BUFFER, 8);
    int index =
        accessor(view, view.add(rgba, 2L * rgba.length), UNSIGNED_SHORT, rgba.length / 4, 4);
    ((ObjectNode) accessors.get(index)).put("normalized", true);
    return index;
  }

  /** Adds vertex indices; returns the accessor. */
  public int indices(int[] index) {
    View view = view("index", ELEMENT_ARRAY_BUFFER, 0);
    return accessor(view, view.add(index, 4L * index.length), UNSIGNED_INT, index.length, 1);
  }

  /** Adds a PNG image; returns its index among the images. */
  public int png(byte[] png, String name) {
    ArrayNode images = root.withArray("images");
    View view = view("image" + images.size(), 0, 0);
    view.add(png, png.length);
    images.addObject().put("name", name).put("mimeType", "image/png").put("bufferView", view.index);
    return images.size() - 1;
  }

  private View view(String layout, int target, int stride) {
    return views.computeIfAbsent(layout, k -> new View(views.size(), target, stride));
  }

  private int accessor(View view, long offset, int componentType, int count, int components) {
    accessors
        .addObject()
        .put("bufferView", view.index)
        .put("byteOffset", offset)
        .put("componentType", componentType)
        .put("count", count)
        .put("type", TYPE[components]);
    return accessors.size() - 1;
  }

  /**
   * Writes the file.
   *
   * @throws IOException from the stream, or if the content passes the 4 GiB that the format can
   *     hold
   */
  public void write(OutputStream out) throws IOException {
    long length = 0;
    ArrayNode viewNodes = JsonNodeFactory.instance.arrayNode();
    for (View view : views.values()) {
      ObjectNode node = viewNodes.addObject();
      node.put("buffer", 0).put("byteOffset", length).put("byteLength", view.bytes);
      if (view.stride > 0) {
        node.put("byteStride", view.stride);
      }
      if (view.target > 0) {
        node.put("target", view.target);
      }
      length += padded(view.bytes);
    }
    root.set("accessors", accessors);
    root.set("bufferViews", viewNodes);
    root.putArray("buffers").addObject().put("byteLength", length);
    byte[] json = new ObjectMapper().writeValueAsBytes(root);
    int jsonPadding = (int) (padded(json.length) - json.length);
    long total = 12 + 8 + padded(json.length) + 8 + length;
    if (total > 0xffffffffL) {
      throw new IOException(
          "heatmap of "
              + total
              + " bytes passes the 4 GiB limit of binary glTF: use a coarser mesh");
    }
    ByteBuffer head = ByteBuffer.allocate(20).order(ByteOrder.LITTLE_ENDIAN);
    head.putInt(MAGIC).putInt(2).putInt((int) total);
    head.putInt((int) padded(json.length)).putInt(CHUNK_JSON);
    out.write(head.array());
    out.write(json);
    out.write("   ".substring(0, jsonPadding).getBytes(StandardCharsets.US_ASCII));
    head.clear();
    head.putInt((int) length).putInt(CHUNK_BIN);
    out.write(head.array(), 0, head.position());
    LittleEndian blocks = new LittleEndian(out);
    for (View view : views.values()) {
      for (Object array : view.arrays) {
        blocks.write(array);
      }
      blocks.zeros((int) (padded(view.bytes) - view.bytes));
    }
    out.flush();
  }

  private static long padded(long bytes) {
    return (bytes + 3) & ~3L;
  }

  /** Writes primitive arrays in little-endian blocks. */
  private static final class LittleEndian {
    private static final int BLOCK = 1 << 16;
    private final OutputStream out;
    private final ByteBuffer buffer = ByteBuffer.allocate(BLOCK).order(ByteOrder.LITTLE_ENDIAN);

    LittleEndian(OutputStream out) {
      this.out = out;
    }

    void write(Object array) throws IOException {
      if (array instanceof float[] f) {
        for (int at = 0; at < f.length; at += BLOCK / 4) {
          int n = Math.min(BLOCK / 4, f.length - at);
          buffer.asFloatBuffer().put(f, at, n);
          out.write(buffer.array(), 0, 4 * n);
        }
      } else if (array instanceof int[] v) {
        for (int at = 0; at < v.length; at += BLOCK / 4) {
          int n = Math.min(BLOCK / 4, v.length - at);
          buffer.asIntBuffer().put(v, at, n);
          out.write(buffer.array(), 0, 4 * n);
        }
      } else if (array instanceof short[] s) {
        for (int at = 0; at < s.length; at += BLOCK / 2) {
          int n = Math.min(BLOCK / 2, s.length - at);
          buffer.asShortBuffer().put(s, at, n);
          out.write(buffer.array(), 0, 2 * n);
        }
      } else {
        out.write((byte[]) array);
      }
    }

    void zeros(int count) throws IOException {
      out.write(new byte[count]);
    }
  }
}
