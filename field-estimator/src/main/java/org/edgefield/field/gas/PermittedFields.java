package org.edgefield.field.gas;

import org.edgefield.field.job.Permitted;
import org.edgefield.field.job.Surroundings;

/** Makes the {@link PermittedField} that a case asks for. */
public final class PermittedFields {
  private PermittedFields() {}

  /**
   * The permitted field of a case.
   *
   * @throws GasException where the criterion does not hold for the gas or its state
   */
  public static PermittedField of(Permitted permitted, Surroundings surroundings) {
    double share = 1 / permitted.margin();
    return switch (permitted.criterion()) {
      case FIXED -> {
        double fixed = permitted.field_V_per_m() * share;
        yield (k1, k2) -> fixed;
      }
      case PEEK -> {
        if (!surroundings.gas().equalsIgnoreCase("air")) {
          throw new GasException(
              "Peek's law holds for air, not for "
                  + surroundings.gas()
                  + ": give a fixed permitted field");
        }
        double delta = AirDensity.peek(surroundings.pressure_Pa(), surroundings.temperature_K());
        double roughness = permitted.roughness();
        yield (k1, k2) -> PeekLaw.surface_V_per_m(k1, k2, delta, roughness) * share;
      }
      case STREAMER -> {
        double pressure =
            AirDensity.pressureAt20_Pa(surroundings.pressure_Pa(), surroundings.temperature_K());
        SurfaceInception inception =
            new SurfaceInception(
                new StreamerCriterion(Ionisations.of(surroundings.gas()), pressure));
        double factor = share * permitted.roughness();
        yield (k1, k2) -> inception.at_V_per_m(k1, k2) * factor;
      }
    };
  }
}
