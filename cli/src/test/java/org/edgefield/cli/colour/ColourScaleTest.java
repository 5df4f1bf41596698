package org.edgefield.cli.colour;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

final class ColourScaleTest {
  private static final double AMBER = 0.8;
  private static final double STEP = 0.005;

  /** Darkest that the baked shading makes a calm surface, and a hot one. */
  private static final double[] CALM_LIGHT = {0.45, 0.7, 1};

  private static final double[] HOT_LIGHT = {0.835, 1};

  private final ColourScale scale = new ColourScale(AMBER);

  @ParameterizedTest
  @ValueSource(doubles = {0, -0.1, 1.01, Double.NaN})
  void refusesAmberLimitsOutsideItsRange(double limit) {
    assertThatThrownBy(() -> new ColourScale(limit)).isInstanceOf(IllegalArgumentException.class);
  }

  @Test
  void holdsBeyondItsEnds() {
    assertThat(scale.rgb(-1)).isEqualTo(scale.rgb(0));
    assertThat(scale.rgb(50)).isEqualTo(scale.rgb(ColourScale.END));
    assertThat(new ColourScale(1).rgb(1)).isEqualTo(scale.rgb(1));
  }

  @Test
  void calmIsNeutral() {
    double most = 0;
    for (double u = 0; u < ColourScale.CALM; u += STEP) {
      double[] lab = ColourVision.TYPICAL.lab(scale.rgb(u), 1);
      most = Math.max(most, Math.hypot(lab[1], lab[2]));
    }
    // Full red has a chroma near 75, amber near 80.
    assertThat(most).isLessThan(12);
  }

  /**
   * Difference 1976 of 2.3 is just noticeable; 20 is told apart at a glance, side by side or not.
   */
  @ParameterizedTest
  @EnumSource(ColourVision.class)
  void calmAmberAndRedAreFarApartForEverybody(ColourVision vision) {
    double calmAmber = least(vision, 0, AMBER, CALM_LIGHT, AMBER, 1, HOT_LIGHT);
    double amberRed = least(vision, AMBER, 1, HOT_LIGHT, 1, 2.2, HOT_LIGHT);
    double calmRed = least(vision, 0, AMBER, CALM_LIGHT, 1, 2.2, HOT_LIGHT);
    System.out.printf(
        Locale.ROOT,
        "colour difference %-12s calm-amber %.0f  amber-red %.0f  calm-red %.0f%n",
        vision,
        calmAmber,
        amberRed,
        calmRed);
    if (vision != ColourVision.GREY) {
      assertThat(calmAmber).isGreaterThan(20);
      assertThat(calmRed).isGreaterThan(20);
    }
    assertThat(amberRed).isGreaterThan(20);
  }

  @ParameterizedTest
  @EnumSource(ColourVision.class)
  void eachLimitIsAStepInLightness(ColourVision vision) {
    double below = vision.lab(scale.rgb(Math.nextDown(AMBER)), 1)[0];
    double amber = vision.lab(scale.rgb(AMBER), 1)[0];
    double last = vision.lab(scale.rgb(Math.nextDown(1.0)), 1)[0];
    double red = vision.lab(scale.rgb(1), 1)[0];
    assertThat(amber - below).isGreaterThan(15);
    assertThat(last - red).isGreaterThan(20);
  }

  @Test
  void lightnessFallsWithinEachFamily() {
    double[][] families = {{0, AMBER}, {AMBER, 1}, {1, ColourScale.END}};
    for (double[] family : families) {
      double before = Double.POSITIVE_INFINITY;
      for (double u = family[0]; u < family[1]; u += 0.05) {
        double now = ColourVision.TYPICAL.lab(scale.rgb(u), 1)[0];
        assertThat(now).as("at %s", u).isLessThan(before);
        before = now;
      }
    }
  }

  @ParameterizedTest
  @ValueSource(doubles = {0.8, 0.75, 0.333, 0.9999, 1})
  void stepsNeverShowALimitLate(double amber) {
    ColourScale other = new ColourScale(amber);
    int count = 2048;
    int[] steps = other.steps(count);
    for (int i = 0; i < count; i++) {
      double to = ColourScale.END * (i + 1) / count;
      double from = ColourScale.END * i / count;
      if (from >= 1) {
        assertThat(family(steps[i])).isEqualTo("red");
      } else if (to > amber && amber < 1 && to <= 1) {
        assertThat(family(steps[i])).isEqualTo("amber");
      } else if (to <= amber) {
        assertThat(family(steps[i])).isEqualTo("calm");
      }
    }
  }

  @Test
  void visionMatricesKeepGrey() {
    for (ColourVision vision : ColourVision.values()) {
      for (int row = 0; row < 3; row++) {
        double sum = vision.entry(row, 0) + vision.entry(row, 1) + vision.entry(row, 2);
        assertThat(sum).isCloseTo(1, within(1e-5));
      }
    }
  }

  private static String family(int rgb) {
    int r = Srgb.channel(rgb, 16);
    int g = Srgb.channel(rgb, 8);
    int b = Srgb.channel(rgb, 0);
    return b >= g ? g < 60 ? "red" : "calm" : r > 200 ? "amber" : "calm";
  }

  private double least(
      ColourVision vision,
      double from1,
      double to1,
      double[] light1,
      double from2,
      double to2,
      double[] light2) {
    double least = Double.POSITIVE_INFINITY;
    for (double u = from1; u < to1; u += STEP) {
      for (double lu : light1) {
        double[] a = vision.lab(scale.rgb(u), lu);
        for (double w = from2; w < to2; w += STEP) {
          for (double lw : light2) {
            least = Math.min(least, ColourVision.difference(a, vision.lab(scale.rgb(w), lw)));
          }
        }
      }
    }
    return least;
  }
}
