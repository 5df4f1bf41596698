package org.edgefield.field.gas;

import java.util.Locale;

/** The published fit that serves a gas by default, or why there is none. */
public final class Ionisations {
  private Ionisations() {}

  /**
   * Fit of a gas by name: air or SF6.
   *
   * @throws GasException where no published fit is valid near inception
   */
  public static Ionisation of(String gas) {
    return switch (gas.toLowerCase(Locale.ROOT)) {
      case "air" -> new ZaenglPetcharaks1994();
      case "sf6" -> new PedersenSf6();
      case "n2", "nitrogen" ->
          throw new GasException(
              "nitrogen attaches no electrons and has no critical field, so that the streamer"
                  + " criterion has no sound end: give a fixed permitted field or a gas table");
      case "co2", "carbon dioxide" ->
          throw new GasException(
              "the published ionisation of CO2 at hand begins far above inception: give a fixed"
                  + " permitted field or a gas table");
      case "vacuum" ->
          throw new GasException(
              "in vacuum no gas ionises; breakdown depends on surface and conditioning: give a"
                  + " fixed permitted field");
      default ->
          throw new GasException(
              "no ionisation data for gas "
                  + gas
                  + ": give a fixed permitted field or a gas table");
    };
  }
}
