package org.edgefield.cli.gltf.text;

import java.text.Normalizer;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * A stroke font of our own: basic Latin, accents as separate marks, and the signs that field
 * results need. It needs no font files, which a headless runtime may lack. Characters it does not
 * know are drawn as an empty box.
 *
 * <p>Glyphs are written on a grid, two digits x y per point; y = 2 is the base line, 6 the top of
 * small letters, 8 that of capitals. Strokes are separated by "|"; those that start with "~" have
 * their corners rounded.
 */
public final class StrokeFont {
  /** Height of a capital on the grid. */
  private static final float CAPITAL = 6;

  private static final int BASE_LINE = 2;
  private static final float SPACING = 1.9f;
  private static final float BLANK = 2.2f;
  private static final String ROUND = "~26 46 42 02 06 26";
  private static final String[][] GLYPHS = {
    {"A", "02 28 42|14 34"},
    {"B", "02 08|~08 38 48 45 35 05|~05 45 55 52 42 02"},
    {"C", "~47 48 08 02 42 43"},
    {"D", "02 08|~08 28 48 42 22 02"},
    {"E", "48 08 02 42|05 35"},
    {"F", "48 08 02|05 35"},
    {"G", "~47 48 08 02 42 45|45 25"},
    {"H", "08 02|48 42|05 45"},
    {"I", "08 02"},
    {"J", "~38 34 32 02 04"},
    {"K", "08 02|48 04|15 42"},
    {"L", "08 02 42"},
    {"M", "02 08 34 68 62"},
    {"N", "02 08 42 48"},
    {"O", "~28 58 52 02 08 28"},
    {"P", "02 08|~08 38 48 44 34 04"},
    {"Q", "~28 58 52 02 08 28|34 51"},
    {"R", "02 08|~08 38 48 44 34 04|24 42"},
    {"S", "~47 48 08 05 45 42 02 03"},
    {"T", "08 48|28 22"},
    {"U", "~08 04 02 42 44 48"},
    {"V", "08 22 48"},
    {"W", "08 22 36 42 68"},
    {"X", "08 42|48 02"},
    {"Y", "08 25 48|25 22"},
    {"Z", "08 48 02 42"},
    {"0", "~28 48 42 02 08 28"},
    {"1", "06 28 22|02 42"},
    {"2", "~07 08 48 45 02|02 42"},
    {"3", "~07 08 48 45 25|~25 45 42 02 03"},
    {"4", "32 38 04 44"},
    {"5", "48 08 05|~05 25 45 42 02 03"},
    {"6", "~38 08 03|~03 02 42 46 06 03"},
    {"7", "08 48 12"},
    {"8", "~28 48 45 05 08 28|~25 45 42 02 05 25"},
    {"9", "~12 42 47|~47 48 08 04 44 47"},
    {"a", ROUND + "|46 42"},
    {"b", "08 02|" + ROUND},
    {"c", "~45 46 06 02 42 43"},
    {"d", "48 42|" + ROUND},
    {"e", "04 44|~44 46 06 02 42 43"},
    {"f", "~38 18 16|16 12|06 36"},
    {"g", ROUND + "|~46 41 40 00 01"},
    {"h", "08 02|~04 06 46 44 42"},
    {"i", "06 02|08 08"},
    {"ı", "06 02"},
    {"j", "~16 11 10 00|18 18"},
    {"k", "08 02|46 03|14 42"},
    {"l", "~08 03 02 12"},
    {"m", "06 02|~04 06 36 34 32|~34 36 66 64 62"},
    {"n", "06 02|~04 06 46 44 42"},
    {"o", ROUND},
    {"p", "06 00|" + ROUND},
    {"q", "46 40|" + ROUND},
    {"r", "06 02|~04 06 36"},
    {"s", "~45 46 06 04 44 42 02 03"},
    {"t", "~18 13 12 32|06 36"},
    {"u", "~06 04 02 42 44|46 42"},
    {"v", "06 22 46"},
    {"w", "06 12 35 52 66"},
    {"x", "06 42|46 02"},
    {"y", "06 22|46 10"},
    {"z", "06 46 02 42"},
    {".", "02 02"},
    {",", "12 01"},
    {":", "02 02|05 05"},
    {";", "15 15|12 01"},
    {"!", "08 04|02 02"},
    {"?", "~07 08 48 45 25 24|22 22"},
    {"-", "05 25"},
    {"_", "01 41"},
    {"+", "05 45|27 23"},
    {"=", "04 44|06 46"},
    {"/", "01 48"},
    {"\\", "08 41"},
    {"(", "~18 06 04 11"},
    {")", "~08 16 14 01"},
    {"[", "18 08 01 11"},
    {"]", "08 18 11 01"},
    {"{", "~28 18 16 05|~05 14 11 21"},
    {"}", "~08 18 16 25|~25 14 11 01"},
    {"<", "47 05 43"},
    {">", "07 45 03"},
    {"*", "28 24|17 35|15 37"},
    {"#", "13 17|33 37|04 44|06 46"},
    {"%", "02 48|~07 08 18 17 07|~33 43 42 32 33"},
    {"&", "~42 07 08 28 27 04 02 32 44"},
    {"@", "~34 36 16 14 34 33 54 58 08 02 42"},
    {"'", "08 06"},
    {"\"", "08 06|18 16"},
    {"`", "08 17"},
    {"~", "~04 06 26 24 44 46"},
    {"^", "06 18 26"},
    {"|", "08 01"},
    {"$", "~47 48 08 05 45 42 02 03|29 21"},
    {"°", "~07 08 28 26 06 07"},
    {"±", "06 46|28 24|02 42"},
    {"≥", "08 46 04|02 42"},
    {"≤", "48 06 44|02 42"},
    {"×", "03 47|07 43"},
    {"·", "05 05"},
    {"–", "05 45"},
    {"—", "05 65"},
    {"µ", "~06 04 02 42 44|46 42|06 00"},
    {"²", "~07 08 28 27 05|05 25"},
    {"³", "08 28 17|~17 27 25 05"},
    {"ß", "02 07|~07 08 38 35 15|~15 45 42 12"},
    {"ø", ROUND + "|01 47"},
    {"Ø", "~28 58 52 02 08 28|01 59"},
    {"ł", "~18 13 12 22|04 26"},
    {"Ł", "18 12 52|04 36"},
    {"æ", "~26 36 32 02 06 26|34 64|~64 66 36 32 62 63"},
    {"Æ", "02 38 32 62|38 68|14 34|35 55"},
    {"Ω", "02 12|~12 05 08 48 45 32|32 42"},
  };

  /** Combining marks: drawn for a small letter of width 4; raised by 2 over capitals. */
  private static final String[][] MARKS = {
    {"\u0300", "18 27"},
    {"\u0301", "17 28"},
    {"\u0302", "17 28 37"},
    {"\u0303", "~07 18 37 48"},
    {"\u0304", "18 38"},
    {"\u0306", "~18 17 37 38"},
    {"\u0307", "28 28"},
    {"\u0308", "18 18|38 38"},
    {"\u030a", "~28 38 37 17 18 28"},
    {"\u030b", "17 28|37 48"},
    {"\u030c", "18 27 38"},
    {"\u0327", "~22 31 20"},
    {"\u0328", "~32 21 30"},
  };

  private static final String UNKNOWN = "02 08 48 42 02";
  private static final Map<Integer, float[][]> STROKES = parse(GLYPHS);
  private static final Map<Integer, float[][]> MARK_STROKES = parse(MARKS);
  private static final float[][] BOX = strokes(UNKNOWN);

  private StrokeFont() {}

  /**
   * Strokes of a text, one glyph after the other.
   *
   * @param strokes per glyph, polylines of x, y pairs; capital height 1, y upwards from the base
   *     line
   * @param width advance of the whole text
   */
  public record Line(List<float[][]> strokes, float width) {}

  /** Lays out one line of text. */
  public static Line line(String text) {
    List<float[][]> glyphs = new ArrayList<>();
    float pen = 0;
    float letterLeft = 0;
    float letterWidth = 0;
    boolean capital = false;
    for (int cp : Normalizer.normalize(text, Normalizer.Form.NFD).codePoints().toArray()) {
      float[][] mark = MARK_STROKES.get(cp);
      if (mark != null) {
        boolean below = cp >= 0x0323 && cp <= 0x0331;
        glyphs.add(placed(mark, letterLeft + (letterWidth - 4) / 2, capital && !below ? 2 : 0));
      } else if (Character.isWhitespace(cp) || Character.isISOControl(cp)) {
        pen += BLANK + SPACING;
      } else {
        float[][] glyph = STROKES.getOrDefault(cp, BOX);
        letterLeft = pen;
        letterWidth = width(glyph);
        capital = Character.isUpperCase(cp);
        glyphs.add(placed(glyph, pen, 0));
        pen += letterWidth + SPACING;
      }
    }
    return new Line(glyphs, Math.max(0, pen - SPACING) / CAPITAL);
  }

  private static float[][] placed(float[][] glyph, float dx, float dy) {
    float[][] out = new float[glyph.length][];
    for (int s = 0; s < glyph.length; s++) {
      out[s] = new float[glyph[s].length];
      for (int i = 0; i < glyph[s].length; i += 2) {
        out[s][i] = (glyph[s][i] + dx) / CAPITAL;
        out[s][i + 1] = (glyph[s][i + 1] + dy) / CAPITAL;
      }
    }
    return out;
  }

  private static float width(float[][] glyph) {
    float most = 0;
    for (float[] stroke : glyph) {
      for (int i = 0; i < stroke.length; i += 2) {
        most = Math.max(most, stroke[i]);
      }
    }
    return most;
  }

  private static Map<Integer, float[][]> parse(String[][] table) {
    Map<Integer, float[][]> out = new HashMap<>();
    for (String[] row : table) {
      out.put(row[0].codePointAt(0), strokes(row[1]));
    }
    return out;
  }

  private static float[][] strokes(String written) {
    String[] parts = written.split("\\|", -1);
    float[][] out = new float[parts.length][];
    for (int s = 0; s < parts.length; s++) {
      boolean smooth = parts[s].startsWith("~");
      String[] points = (smooth ? parts[s].substring(1) : parts[s]).split(" ", -1);
      float[] stroke = new float[2 * points.length];
      for (int i = 0; i < points.length; i++) {
        stroke[2 * i] = points[i].charAt(0) - '0';
        stroke[2 * i + 1] = points[i].charAt(1) - '0' - BASE_LINE;
      }
      out[s] = smooth ? cutCorners(cutCorners(stroke)) : stroke;
    }
    return out;
  }

  /** One round of Chaikin's corner cutting; the ends stay. */
  private static float[] cutCorners(float[] p) {
    int n = p.length / 2;
    float[] out = new float[4 * (n - 1)];
    out[0] = p[0];
    out[1] = p[1];
    int at = 2;
    for (int i = 0; i < n - 1; i++) {
      for (int step = i == 0 ? 1 : 0; step < (i == n - 2 ? 1 : 2); step++) {
        float t = step == 0 ? 0.25f : 0.75f;
        out[at++] = p[2 * i] * (1 - t) + p[2 * i + 2] * t;
        out[at++] = p[2 * i + 1] * (1 - t) + p[2 * i + 3] * t;
      }
    }
    out[at++] = p[2 * n - 2];
    out[at++] = p[2 * n - 1];
    return at == out.length ? out : java.util.Arrays.copyOf(out, at);
  }
}
