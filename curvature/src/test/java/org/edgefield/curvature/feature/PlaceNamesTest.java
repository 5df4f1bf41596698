package org.edgefield.curvature.feature;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.edgefield.importer.brep.Part;
import org.junit.jupiter.api.Test;

class PlaceNamesTest {
  private static Part part(int index, String name, String path) {
    return new Part(index, name, path, null, 0, 0, 0, 0, new double[6], 1, 1);
  }

  @Test
  void partsGoByTheirNameOrWhereThatIsSharedByTheirPath() {
    PlaceNames names =
        new PlaceNames(
            List.of(
                part(0, "Busbar L1", "Cubicle/Busbar L1"),
                part(1, "Nut", "Cubicle/Bolt 1/Nut"),
                part(2, "Nut", "Cubicle/Bolt 2/Nut")));
    assertThat(names.of("rounded edge R2", 0)).isEqualTo("rounded edge R2 of Busbar L1");
    assertThat(names.of("flat face", 1)).isEqualTo("flat face of Cubicle/Bolt 1/Nut");
    assertThat(names.part(2)).isEqualTo("Cubicle/Bolt 2/Nut");
  }
}
