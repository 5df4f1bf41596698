package org.edgefield.cli.gltf;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.Arrays;
import java.util.stream.StreamSupport;

/** Reads back what a test asks of a binary glTF file, by the specification alone. */
final class GlbReader {
  final JsonNode json;
  private final ByteBuffer bin;

  GlbReader(byte[] file) {
    ByteBuffer all = ByteBuffer.wrap(file).order(ByteOrder.LITTLE_ENDIAN);
    if (all.getInt(0) != 0x46546C67 || all.getInt(4) != 2 || all.getInt(8) != file.length) {
      throw new IllegalStateException("not a binary glTF 2 file of the length it claims");
    }
    int jsonLength = all.getInt(12);
    int binLength = all.getInt(20 + jsonLength);
    if (jsonLength % 4 != 0 || binLength % 4 != 0 || 28 + jsonLength + binLength != file.length) {
      throw new IllegalStateException("chunks do not fill the file");
    }
    try {
      json = new ObjectMapper().readTree(Arrays.copyOfRange(file, 20, 20 + jsonLength));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    bin = ByteBuffer.wrap(file, 28 + jsonLength, binLength).slice().order(ByteOrder.LITTLE_ENDIAN);
  }

  /** First node with a name that starts so. */
  JsonNode node(String start) {
    return StreamSupport.stream(json.get("nodes").spliterator(), false)
        .filter(n -> n.get("name").asText().startsWith(start))
        .findFirst()
        .orElseThrow(() -> new IllegalStateException("no node " + start));
  }

  /** A primitive of a node's mesh. */
  JsonNode primitive(JsonNode node, int index) {
    return json.get("meshes").get(node.get("mesh").asInt()).get("primitives").get(index);
  }

  /** Values of an accessor of floats, 16-bit words (as 0 to 65535) or 32-bit indices. */
  double[] values(int accessor) {
    JsonNode a = json.get("accessors").get(accessor);
    JsonNode view = json.get("bufferViews").get(a.get("bufferView").asInt());
    int type = a.get("componentType").asInt();
    int components =
        switch (a.get("type").asText()) {
          case "SCALAR" -> 1;
          case "VEC2" -> 2;
          case "VEC3" -> 3;
          default -> 4;
        };
    int size = type == 5123 ? 2 : 4;
    int stride = view.has("byteStride") ? view.get("byteStride").asInt() : size * components;
    int start = view.get("byteOffset").asInt() + a.get("byteOffset").asInt();
    double[] out = new double[components * a.get("count").asInt()];
    for (int i = 0; i < out.length; i++) {
      int at = start + i / components * stride + i % components * size;
      out[i] =
          type == 5126
              ? bin.getFloat(at)
              : type == 5125 ? bin.getInt(at) : bin.getShort(at) & 0xffff;
    }
    return out;
  }

  /** Values of an attribute of a primitive. */
  double[] attribute(JsonNode primitive, String name) {
    return values(primitive.get("attributes").get(name).asInt());
  }

  /** Bytes of an image. */
  byte[] image(int index) {
    JsonNode view =
        json.get("bufferViews").get(json.get("images").get(index).get("bufferView").asInt());
    byte[] out = new byte[view.get("byteLength").asInt()];
    bin.get(view.get("byteOffset").asInt(), out);
    return out;
  }
}
