package org.edgefield.cli.gltf.scene;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.IntSupplier;
import org.edgefield.cli.colour.ColourScale;
import org.edgefield.cli.colour.Srgb;
import org.edgefield.cli.gltf.file.GlbBuilder;
import org.edgefield.cli.gltf.text.PngEncoder;

/**
 * Materials of a heatmap, all unlit so that every viewer shows the scale's own colours. With
 * several duties each is a variant (KHR_materials_variants); the governing duty is what viewers
 * without variants show.
 *
 * <p>The colour of utilisation comes from a texture, looked up per pixel, so that limits are crisp
 * lines inside a triangle. Two duties share one set of texture coordinates: the first along u, the
 * second along v of a transposed texture.
 */
final class Materials {
  /** Steps of the scale's texture: 1 falls between two of them. */
  private static final int STEPS = 2048;

  private static final int STRIP = 4;

  /** Keeps values that lie on a limit on its upper side whatever the rounding on the way. */
  private static final double NUDGE = 0.01 / STEPS;

  private static final int NEAREST = 9728;
  private static final int LINEAR = 9729;
  private static final int LINEAR_MIPMAP_LINEAR = 9987;
  private static final int CLAMP_TO_EDGE = 33071;
  private static final String UNLIT = "KHR_materials_unlit";
  private static final String VARIANTS = "KHR_materials_variants";

  private final GlbBuilder glb;
  private final List<String> duties;
  private final int governing;
  private final ColourScale scale;
  private final Map<String, Integer> made = new HashMap<>();

  /**
   * Starts the book of materials.
   *
   * @param duties names of the duties shown, at least one
   * @param governing index of the one to show first
   */
  Materials(GlbBuilder glb, List<String> duties, int governing, ColourScale scale) {
    this.glb = glb;
    this.duties = duties;
    this.governing = governing;
    this.scale = scale;
    ArrayNode used = glb.root().putArray("extensionsUsed");
    used.add(UNLIT);
    if (duties.size() > 1) {
      used.add(VARIANTS);
      ArrayNode variants =
          glb.root().withObject("/extensions").putObject(VARIANTS).putArray("variants");
      duties.forEach(d -> variants.addObject().put("name", d));
    }
  }

  /** Texture coordinate of a utilisation. */
  static double coordinate(double utilisation) {
    return utilisation / ColourScale.END + NUDGE;
  }

  /** Dresses a primitive in the scale, one material per duty. */
  void scaled(ObjectNode primitive, boolean bothSides) {
    int[] perDuty = new int[duties.size()];
    for (int d = 0; d < perDuty.length; d++) {
      perDuty[d] = scale(d, bothSides);
    }
    dress(primitive, perDuty);
  }

  /** Dresses a primitive in one image per duty; a duty with image -1 does not show it. */
  void pictured(ObjectNode primitive, String name, int[] imagePerDuty) {
    int[] perDuty = new int[duties.size()];
    for (int d = 0; d < perDuty.length; d++) {
      perDuty[d] = imagePerDuty[d] < 0 ? unseen() : picture(name, imagePerDuty[d]);
    }
    dress(primitive, perDuty);
  }

  /** Dresses a primitive in one plain colour, 0xRRGGBB. */
  void plain(ObjectNode primitive, String name, int rgb) {
    primitive.put(
        "material",
        once(
            name,
            () -> {
              ArrayNode factor = unlit(name).putArray("baseColorFactor");
              for (int shift = 16; shift >= 0; shift -= 8) {
                factor.add(Srgb.linear(Srgb.channel(rgb, shift)));
              }
              factor.add(1.0);
              return last();
            }));
  }

  /** Dresses a primitive so that no viewer draws it. */
  void leftOut(ObjectNode primitive) {
    primitive.put("material", unseen());
  }

  private void dress(ObjectNode primitive, int[] perDuty) {
    primitive.put("material", perDuty[governing]);
    if (perDuty.length > 1) {
      ArrayNode mappings =
          primitive.withObject("/extensions").putObject(VARIANTS).putArray("mappings");
      for (int material : Arrays.stream(perDuty).distinct().toArray()) {
        ObjectNode mapping = mappings.addObject().put("material", material);
        ArrayNode variants = mapping.putArray("variants");
        for (int d = 0; d < perDuty.length; d++) {
          if (perDuty[d] == material) {
            variants.add(d);
          }
        }
      }
    }
  }

  private int scale(int duty, boolean bothSides) {
    String name = "utilisation, " + duties.get(duty) + (bothSides ? ", slice" : "");
    return once(
        "scale " + duty + bothSides,
        () -> {
          ObjectNode pbr = unlit(name);
          pbr.putObject("baseColorTexture")
              .put("index", scaleTexture(duty % 2 == 1))
              .put("texCoord", duty / 2);
          if (bothSides) {
            ((ObjectNode) glb.root().withArray("materials").get(last())).put("doubleSided", true);
          }
          return last();
        });
  }

  private int scaleTexture(boolean alongV) {
    return once(
        "texture" + alongV,
        () -> {
          int[] steps = scale.steps(STEPS);
          int[] rgb = new int[STEPS * STRIP];
          for (int i = 0; i < rgb.length; i++) {
            rgb[i] = steps[alongV ? i / STRIP : i % STEPS];
          }
          byte[] png =
              alongV ? PngEncoder.encode(STRIP, STEPS, rgb) : PngEncoder.encode(STEPS, STRIP, rgb);
          int image = glb.png(png, "utilisation scale 0 to " + (int) ColourScale.END);
          return texture(image, NEAREST, NEAREST);
        });
  }

  private int picture(String name, int image) {
    return once(
        "picture" + image,
        () -> {
          unlit(name)
              .putObject("baseColorTexture")
              .put("index", texture(image, LINEAR, LINEAR_MIPMAP_LINEAR));
          return last();
        });
  }

  private int unseen() {
    return once(
        "unseen",
        () -> {
          unlit("not shown").putArray("baseColorFactor").add(1.0).add(1.0).add(1.0).add(0.0);
          ((ObjectNode) glb.root().withArray("materials").get(last()))
              .put("alphaMode", "MASK")
              .put("alphaCutoff", 0.5);
          return last();
        });
  }

  private int texture(int image, int magFilter, int minFilter) {
    int sampler =
        once(
            "sampler" + minFilter,
            () -> {
              ArrayNode samplers = glb.root().withArray("samplers");
              samplers
                  .addObject()
                  .put("magFilter", magFilter)
                  .put("minFilter", minFilter)
                  .put("wrapS", CLAMP_TO_EDGE)
                  .put("wrapT", CLAMP_TO_EDGE);
              return samplers.size() - 1;
            });
    ArrayNode textures = glb.root().withArray("textures");
    textures.addObject().put("source", image).put("sampler", sampler);
    return textures.size() - 1;
  }

  /** Appends an unlit material and returns its base colour object. */
  private ObjectNode unlit(String name) {
    ObjectNode material = glb.root().withArray("materials").addObject();
    material.put("name", name);
    material.putObject("extensions").putObject(UNLIT);
    ObjectNode pbr = material.putObject("pbrMetallicRoughness");
    // What viewers without the unlit extension fall back to: dull, not metal.
    return pbr.put("metallicFactor", 0.0).put("roughnessFactor", 0.9);
  }

  /** Index remembered under a key, made on first use. */
  private int once(String key, IntSupplier make) {
    Integer known = made.get(key);
    if (known == null) {
      known = make.getAsInt();
      made.put(key, known);
    }
    return known;
  }

  private int last() {
    return glb.root().withArray("materials").size() - 1;
  }
}
