package org.edgefield.cli.gltf.scene;

import java.util.List;
import java.util.Locale;
import java.util.StringJoiner;
import org.edgefield.cli.colour.ColourScale;
import org.edgefield.cli.gltf.HeatmapStamp;
import org.edgefield.cli.gltf.text.Canvas;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Permitted;
import org.edgefield.field.job.Surroundings;
import org.edgefield.field.result.DutyResult;
import org.edgefield.field.result.FieldResult;
import org.edgefield.field.result.HotSpot;
import org.edgefield.importer.brep.Assembly;

/** What the board beside the model says of one duty. */
final class LegendBoard {
  private static final int LISTED = 4;
  private static final double TITLE = 46;
  private static final double HEADING = 36;
  private static final double BODY = 29;
  private static final double SMALL = 23;
  private static final int WHITE = 0xffffff;
  private static final int SCALE_HEIGHT = 84;
  private static final String CAUTION =
      "Passing a limit means that discharge can start there. In strongly non-uniform gaps that is"
          + " not yet breakdown; polarity, dirt, rain and solid insulation are not covered. This"
          + " informs a design and replaces no type test.";

  private final Assembly assembly;
  private final FieldCase job;
  private final FieldResult result;
  private final HeatmapStamp stamp;
  private final ColourScale scale;
  private final String encloser;

  /**
   * Prepares the boards of a heatmap.
   *
   * @param encloser electrode whose outer skin is left out, or null
   */
  LegendBoard(
      Assembly assembly,
      FieldCase job,
      FieldResult result,
      HeatmapStamp stamp,
      ColourScale scale,
      String encloser) {
    this.assembly = assembly;
    this.job = job;
    this.result = result;
    this.stamp = stamp;
    this.scale = scale;
    this.encloser = encloser;
  }

  /** The board of duty {@code index} of the case. */
  Board of(int index) {
    Board board = new Board();
    board.line("Electric field heatmap", TITLE, Board.INK);
    board.line(
        Words.fileName(assembly.source().file()) + " (" + assembly.source().unit() + ")",
        SMALL,
        Board.FAINT);
    board.skip(18);
    Duty duty = job.duties().get(index);
    String count =
        job.duties().size() > 1 ? " (duty " + (index + 1) + " of " + job.duties().size() + ")" : "";
    board.paragraph("Duty: " + duty.name() + count, HEADING, Board.INK, 2);
    board.paragraph(voltages(duty), SMALL, Board.FAINT, 2);
    board.skip(10);
    verdict(board, result.duties().get(index));
    board.skip(26);
    scale(board);
    board.skip(22);
    hotSpots(board, result.duties().get(index));
    board.skip(12);
    board.paragraph(permitted(), SMALL, Board.INK, 3);
    board.paragraph(surroundings(), SMALL, Board.INK, 2);
    board.paragraph(method(), SMALL, Board.INK, 3);
    if (encloser != null) {
      board.paragraph(
          "The calm outer skin of " + encloser + " is left out of view.", SMALL, Board.INK, 2);
    }
    board.skip(14);
    board.paragraph(CAUTION, SMALL, Board.INK, 8);
    board.skip(14);
    board.line("edgefield " + stamp.toolVersion() + "   " + stamp.date(), SMALL, Board.FAINT);
    return board;
  }

  private void verdict(Board board, DutyResult duty) {
    double peak = duty.peak().utilisation();
    boolean red = peak >= 1;
    boolean amber = !red && peak >= scale.amberLimit();
    int ground = scale.rgb(red ? 1 : amber ? scale.amberLimit() : 0);
    int height = 82;
    board.canvas().fill(Board.MARGIN, board.y(), Board.WIDTH - 2 * Board.MARGIN, height, ground);
    String word = red ? "RED" : amber ? "AMBER" : "PASS";
    String text = word + "   peak " + Words.utilisation(peak) + " x permitted";
    board.canvas().text(text, Board.MARGIN + 24.0, board.y() + 58, 34, red ? WHITE : Board.INK);
    board.skip(height);
  }

  private void scale(Board board) {
    board.line("Utilisation: field / permitted field", BODY, Board.INK);
    board.skip(4);
    Canvas canvas = board.canvas();
    int wide = Board.WIDTH - 2 * Board.MARGIN;
    int[] steps = scale.steps(wide);
    int top = board.y();
    for (int x = 0; x < wide; x++) {
      canvas.fill(Board.MARGIN + x, top, 1, SCALE_HEIGHT, steps[x]);
    }
    zone(canvas, "calm", 0, scale.amberLimit(), top, Board.INK);
    zone(canvas, "red: above permitted", 1, ColourScale.END, top, WHITE);
    double[] ticks = {0, ColourScale.CALM, scale.amberLimit(), 1, 1.5, ColourScale.END};
    double lastEnd = Double.NEGATIVE_INFINITY;
    int base = top + SCALE_HEIGHT + 40;
    for (double tick : ticks) {
      double x = Board.MARGIN + wide * tick / ColourScale.END;
      canvas.fill(
          (int) Math.min(x, Board.MARGIN + wide - 3.0), top + SCALE_HEIGHT, 3, 12, Board.INK);
      String label = tick == ColourScale.END ? "2+" : tickLabel(tick);
      double half = Canvas.textWidth(label, 24) / 2;
      double left = Math.max(Board.MARGIN, Math.min(x - half, Board.MARGIN + wide - 2 * half));
      if (left > lastEnd + 6) {
        canvas.text(label, left, base, 24, Board.INK);
        lastEnd = left + 2 * half;
      }
    }
    board.skip(SCALE_HEIGHT + 52);
    if (!job.ignored().isEmpty()) {
      canvas.fill(Board.MARGIN, board.y(), 58, 30, Board.INK);
      canvas.fill(Board.MARGIN + 2, board.y() + 2, 54, 26, ColourScale.NOT_ASSESSED);
      canvas.text("part not assessed", Board.MARGIN + 74.0, board.y() + 25, SMALL, Board.INK);
      board.skip(38);
    }
  }

  private static String tickLabel(double tick) {
    String text = String.format(Locale.ROOT, "%.3f", tick).replaceAll("0+$", "");
    return text.endsWith(".") ? text.substring(0, text.length() - 1) : text;
  }

  private static void zone(
      Canvas canvas, String word, double from, double to, int top, int colour) {
    double capital = 25;
    int wide = Board.WIDTH - 2 * Board.MARGIN;
    double centre = Board.MARGIN + wide * (from + to) / 2 / ColourScale.END;
    double width = Canvas.textWidth(word, capital);
    if (width < wide * (to - from) / ColourScale.END) {
      double base = top + (SCALE_HEIGHT + capital) / 2;
      canvas.text(word, centre - width / 2, base, capital, colour);
    }
  }

  private void hotSpots(Board board, DutyResult duty) {
    List<HotSpot> spots = duty.hotSpots();
    if (spots.isEmpty()) {
      board.paragraph(
          "No hot spots. Highest: "
              + Words.field(duty.peak().field_V_per_m())
              + " at "
              + place(duty.peak()),
          BODY,
          Board.INK,
          3);
      return;
    }
    board.line(
        spots.size() == 1 ? "1 hot spot" : spots.size() + " hot spots, the first:",
        BODY,
        Board.INK);
    for (HotSpot spot : spots.subList(0, Math.min(LISTED, spots.size()))) {
      String text =
          Words.field(spot.field_V_per_m())
              + " ("
              + Words.utilisation(spot.utilisation())
              + ") "
              + place(spot);
      board.entry(Integer.toString(spot.id()), text, SMALL + 2, Board.INK);
      if (spot.utilisation() >= 1) {
        board.entry("", "mend: " + Words.cure(spot.cure()), SMALL, Board.FAINT);
      }
    }
    if (spots.size() > PinNodes.MOST) {
      board.line("Pins stand at the first " + PinNodes.MOST + ".", SMALL, Board.FAINT);
    }
  }

  private String place(HotSpot spot) {
    return Words.place(spot, assembly.parts().get(spot.part()));
  }

  private String voltages(Duty duty) {
    StringJoiner text = new StringJoiner(", ");
    for (int e = 0; e < job.electrodes().size(); e++) {
      Electrode electrode = job.electrodes().get(e);
      String level =
          switch (electrode.kind()) {
            case EARTH -> "earth";
            case FLOATING -> "floating";
            case LIVE ->
                Words.voltage(Math.hypot(duty.real_V()[e], duty.imaginary_V()[e])) + " peak";
          };
      text.add(electrode.name() + ": " + level);
    }
    return text.toString();
  }

  private String permitted() {
    Permitted p = job.permitted();
    String law =
        switch (p.criterion()) {
          case FIXED -> "fixed, " + Words.field(p.field_V_per_m());
          case PEEK -> "Peek's law, surface factor " + tickLabel(p.roughness());
          case STREAMER -> "streamer inception";
        };
    return "Permitted field: "
        + law
        + ", margin "
        + tickLabel(p.margin())
        + ". Sharp edges as made: R"
        + Words.millimetres(job.edges().radius_m())
        + " mm.";
  }

  private String surroundings() {
    Surroundings s = job.surroundings();
    String place =
        Double.isNaN(s.altitude_m()) ? "" : ", altitude " + Math.round(s.altitude_m()) + " m";
    return String.format(
        Locale.ROOT,
        "Gas: %s, %s bar, %d degC%s.",
        s.gas(),
        Words.digits(s.pressure_Pa() / 1e5, 3),
        Math.round(s.temperature_K() - 273.15),
        place);
  }

  private String method() {
    if (result.method() == FieldResult.Method.SCREEN) {
      return "Method: quick estimate from curvature and gap; confirm hot spots with a solve.";
    }
    String claim = Words.digits(100 * result.errorEstimate(), 2) + " %";
    return "Method: boundary-element solve, claimed error of the peaks "
        + claim
        + (result.converged() ? "." : "; the accuracy asked for was NOT reached.");
  }
}
