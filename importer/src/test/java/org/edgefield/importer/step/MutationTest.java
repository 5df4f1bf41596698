package org.edgefield.importer.step;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Arrays;
import java.util.Locale;
import java.util.Random;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.edgefield.importer.ModelException;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.kernel.KernelAssembly;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Damaged copies of sound models: bytes, digits, references, deletions, by fixed seeds. Each is
 * read or refused with one line, never a crash or a hang of this process; every accepted one is
 * listed with its box and volume in target/mutants-*.csv, so that silent changes are visible.
 */
class MutationTest {
  private static final String[] MODELS = {
    "cube-100.step",
    "torus-3.step",
    "l-bracket.step",
    "concentric-spheres.step",
    "two-instances.step"
  };
  private static final Duration LIMIT = Duration.ofSeconds(10);
  private static final Duration SLACK = Duration.ofSeconds(5);
  private static final Pattern NUMBER = Pattern.compile("-?[0-9]+\\.[0-9E+-]*");
  private static final Pattern REFERENCE = Pattern.compile("#[0-9]+");

  @TempDir Path folder;

  @Test
  void fiveHundred() throws IOException {
    run(500);
  }

  @Tag("slow")
  @Test
  void fiveThousand() throws IOException {
    run(5000);
  }

  private void run(int count) throws IOException {
    TreeMap<String, Integer> outcomes = new TreeMap<>();
    Path list = Path.of("target/mutants-" + count + ".csv");
    Files.createDirectories(list.getParent());
    try (PrintWriter out = new PrintWriter(list.toFile(), StandardCharsets.UTF_8)) {
      out.println("seed,model,kind,part,box_mm,volume_mm3");
      for (int seed = 0; seed < count; seed++) {
        String model = MODELS[seed % MODELS.length];
        String kind =
            new String[] {"byte", "digit", "reference", "deletion"}[seed / MODELS.length % 4];
        Path file = folder.resolve("mutant.step");
        Files.writeString(file, mutant(model, kind, seed), StandardCharsets.ISO_8859_1);
        long begin = System.nanoTime();
        String outcome = read(file, seed + "," + model + "," + kind, out);
        assertThat(Duration.ofNanos(System.nanoTime() - begin))
            .as("seed " + seed)
            .isLessThan(LIMIT.plus(SLACK));
        outcomes.merge(kind + " " + outcome, 1, Integer::sum);
      }
    }
    System.out.println(count + " mutants, 0 crashes or hangs of the tool: " + outcomes);
    assertThat(outcomes.values().stream().mapToInt(Integer::intValue).sum()).isEqualTo(count);
  }

  private static String read(Path file, String label, PrintWriter out) {
    try (KernelAssembly assembly =
        StepReader.read(file, ReadLimits.defaults().withTime(LIMIT), Progress.NONE)) {
      assertThat(assembly.parts()).isNotEmpty();
      for (Part p : assembly.parts()) {
        double[] b = Arrays.stream(p.bounds_m()).map(x -> 1e3 * x).toArray();
        out.printf(
            Locale.ROOT,
            "%s,%s,%.3f %.3f %.3f %.3f %.3f %.3f,%.6g%n",
            label,
            p.name().replace(',', ' '),
            b[0],
            b[1],
            b[2],
            b[3],
            b[4],
            b[5],
            1e9 * p.volume_m3());
        assertThat(p.volume_m3()).isPositive().isFinite();
      }
      return "accepted";
    } catch (ModelException e) {
      assertThat(e.getMessage().lines().count()).isEqualTo(1);
      assertThat(e.getMessage()).startsWith(file + ": ");
      return "refused";
    }
  }

  private static String mutant(String model, String kind, int seed) throws IOException {
    String text = Files.readString(Folders.models().resolve(model), StandardCharsets.ISO_8859_1);
    Random random = new Random(seed);
    int data = text.indexOf("DATA;");
    int at = data + random.nextInt(text.length() - data);
    return switch (kind) {
      case "byte" -> replace(text, at, at + 1, String.valueOf((char) random.nextInt(256)));
      case "digit" -> {
        String[] values = {"0.", "-1.", "1.E+300", "1.E-300", "12345.678", "NaN", "3.9"};
        yield replace(NUMBER, text, at, values[random.nextInt(values.length)]);
      }
      case "reference" -> replace(REFERENCE, text, at, "#" + (1 + random.nextInt(300)));
      default -> replace(text, at, Math.min(text.length(), at + 1 + random.nextInt(60)), "");
    };
  }

  private static String replace(Pattern pattern, String text, int from, String by) {
    Matcher m = pattern.matcher(text);
    return m.find(from) ? replace(text, m.start(), m.end(), by) : text;
  }

  private static String replace(String text, int from, int to, String by) {
    return text.substring(0, from) + by + text.substring(to);
  }
}
