package org.edgefield.cli.gltf.scene;

import static org.assertj.core.api.Assertions.assertThat;

import org.edgefield.field.result.HotSpot;
import org.junit.jupiter.api.Test;

final class WordsTest {
  @Test
  void utilisationBelowOneNeverReadsAsOne() {
    assertThat(Words.utilisation(0.99999)).isEqualTo("0.99");
    assertThat(Words.utilisation(1)).isEqualTo("1.00");
    assertThat(Words.utilisation(0)).isEqualTo("0.00");
    assertThat(Words.utilisation(25.749)).isEqualTo("25.7");
    assertThat(Words.utilisation(1e4)).isEqualTo("10000");
  }

  @Test
  void numbersKeepTheirDigits() {
    assertThat(Words.field(4.24e6)).isEqualTo("4.2 kV/mm");
    assertThat(Words.field(20e3)).isEqualTo("0.020 kV/mm");
    assertThat(Words.field(0)).isEqualTo("0 kV/mm");
    assertThat(Words.millimetres(3e-4)).isEqualTo("0.3");
    assertThat(Words.millimetres(0.1)).isEqualTo("100");
    assertThat(Words.voltage(70710)).isEqualTo("70.7 kV");
    assertThat(Words.voltage(0)).isEqualTo("0 kV");
    assertThat(Words.voltage(100e3)).isEqualTo("100 kV");
  }

  @Test
  void curesNameTheWaysThereAre() {
    assertThat(Words.cure(new HotSpot.Cure(0.012, 5e4, 0.62, 0.08)))
        .isEqualTo("radius 12 mm or 62 % of the voltage or gap 80 mm");
    assertThat(Words.cure(new HotSpot.Cure(Double.NaN, 5e4, 0.062, Double.NaN)))
        .isEqualTo("6.2 % of the voltage");
  }

  @Test
  void foldersAreLeftOut() {
    assertThat(Words.fileName("a/b/c.step")).isEqualTo("c.step");
    assertThat(Words.fileName("a\\c.step")).isEqualTo("c.step");
    assertThat(Words.fileName("c.step")).isEqualTo("c.step");
  }
}
