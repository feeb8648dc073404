package coldseam.cli.plot;

import coldseam.cli.text.Digits;
import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.conduction.Solution;
import coldseam.solver.conduction.StreamFunction;
import java.awt.geom.Path2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Tubes that each carry the same heat: the space between neighbouring lines of equal stream
 * function, which no heat crosses.
 *
 * <p>The heat of a tube is round. Where the stream function jumps, by what flows through a hole, it
 * is a whole part of the greatest jump, so that the lines go on across it; where they do not for a
 * lesser jump they end at a dotted line.
 */
final class FlowTubes {
  static final Pen LINE = new Pen(0.6f);
  static final Pen SEAM = new Pen(0.6f, 0.7f, 2.2f);

  /** Tubes at least; at most two and a half times as many. */
  private static final double FEWEST = 12;

  /** A jump of fewer tubes than this does not decide what a tube carries. */
  private static final double LEAST_JUMP = 0.5;

  /** How far lines may miss each other across a jump, as a share of a tube. */
  private static final double MISS = 0.02;

  /** How far a line may be drawn from its place, points. */
  private static final double DISPLACEMENT = 0.15;

  /** Heads of arrows on one line lie so far apart at most, points. */
  private static final double HEAD_SPACING = 150;

  /** Lines shorter than this have no head, points. */
  private static final double HEADLESS = 30;

  /** Where on its part of a line a head is tried. */
  private static final double[] HEAD_PLACES = {0.5, 0.35, 0.65, 0.2, 0.8};

  /** A head needs so much room from line to line, points. */
  private static final double ROOM = 6;

  /** Heads nearer to each other than this blacken a plot, points. */
  private static final double CROWDED = 13;

  private final StreamFunction function;
  private final Figures figures;
  private final double step;
  private final int parts;
  private final double[] levels;

  private FlowTubes(StreamFunction function, Figures figures, double entering) {
    this.function = function;
    this.figures = figures;
    double round = figures.flowWPerM(Levels.roundDown(figures.scaledFlow(entering / FEWEST)));
    double[] jumps = function.jumps();
    double greatest = jumps.length == 0 ? 0 : jumps[jumps.length - 1];
    parts = greatest < LEAST_JUMP * round ? 0 : Math.max(1, (int) Math.round(greatest / round));
    step = parts == 0 ? round : greatest / parts;
    // The rim that lines begin to be counted from may lie a jump higher elsewhere.
    double shift = jumps.length == 0 ? 0 : step / 2;
    List<Double> shifted = Levels.between(-shift, function.greatest() - shift, step);
    levels = new double[shifted.size()];
    for (int k = 0; k < levels.length; k++) {
      levels[k] = shifted.get(k) + shift;
    }
  }

  /**
   * The tubes of a heat flow.
   *
   * @param solution what was solved
   * @param temperaturesC temperature of every space, °C
   * @param figures how figures are written
   * @return empty where the solution has no stream function, or no heat flows
   */
  static Optional<FlowTubes> of(Solution solution, double[] temperaturesC, Figures figures) {
    Optional<StreamFunction> function = solution.streamFunction(temperaturesC);
    return function.isPresent() && function.get().entering() > 0
        ? Optional.of(new FlowTubes(function.get(), figures, function.get().entering()))
        : Optional.empty();
  }

  /** What each tube carries, with its unit. */
  String each() {
    double scaled = figures.scaledFlow(step);
    String value = parts == 0 ? Figures.round(scaled) : Digits.significant(scaled, 3);
    return value + Figures.JOINED + figures.flowUnit();
  }

  /** Why the heat of a tube is not round; empty where it is. */
  Optional<String> reason() {
    if (parts == 0) {
      return Optional.empty();
    }
    return Optional.of(
        function.jumps().length > 1
            ? "Not round, so that lines go on around holes."
            : "The hole has " + (parts == 1 ? "one tube." : parts + " tubes."));
  }

  /** Whether lines end at a dotted line. */
  boolean seamed() {
    for (double jump : function.jumps()) {
      if (missing(jump)) {
        return true;
      }
    }
    return false;
  }

  private boolean missing(double jump) {
    double tubes = jump / step;
    return Math.abs(tubes - Math.rint(tubes)) > MISS;
  }

  /**
   * Draws the lines between tubes, and arrow heads on them.
   *
   * @param canvas what it is drawn on
   * @param panel where
   * @param density of the same flow, which says how near to each other the lines are
   */
  void draw(Canvas canvas, Panel panel, FlowDensity density) {
    LinearPatch patch =
        Sampling.of(
            new NodalStream(function), panel.window(), panel.pointsPerM(), step, DISPLACEMENT);
    Bands bands = new Bands(Contours.of(patch, levels), panel);
    List<Polyline> lines = new ArrayList<>();
    for (int k = 0; k < levels.length; k++) {
      lines.addAll(bands.lines(k));
    }
    canvas.layer(panel.name() + "-tubes");
    canvas.stroke(Polyline.path(lines), Palette.INK, LINE);
    canvas.layer(panel.name() + "-heads");
    canvas.fill(heads(lines, density, panel), Palette.INK);
    if (seamed()) {
      canvas.layer(panel.name() + "-seams");
      canvas.stroke(seams(panel), Palette.INK, SEAM);
    }
  }

  /** Heads on the lines, a few on each, where there is room between the lines. */
  private Path2D heads(List<Polyline> lines, FlowDensity density, Panel panel) {
    Path2D path = new Path2D.Double();
    List<double[]> taken = new ArrayList<>();
    for (Polyline line : lines) {
      int count = line.length() < HEADLESS ? 0 : (int) Math.ceil(line.length() / HEAD_SPACING);
      for (int i = 0; i < count; i++) {
        for (double place : HEAD_PLACES) {
          double[] at = line.at((i + place) * line.length() / count);
          if (roomAt(at, density, panel) && !crowded(at, taken)) {
            taken.add(at);
            // (at[2], at[3]) is the unit vector to the right of the line, y downwards
            head(path, at[0], at[1], at[3], -at[2]);
            break;
          }
        }
      }
    }
    return path;
  }

  private static boolean crowded(double[] at, List<double[]> taken) {
    for (double[] head : taken) {
      if (Math.hypot(head[0] - at[0], head[1] - at[1]) < CROWDED) {
        return true;
      }
    }
    return false;
  }

  private boolean roomAt(double[] at, FlowDensity density, Panel panel) {
    double[] q = density.at(panel.localX(at[0]), panel.localY(at[1]));
    return q.length > 0 && step / Math.hypot(q[0], q[1]) * panel.pointsPerM() > ROOM;
  }

  /** A slender head with its middle at a place, pointing along a unit vector. */
  static void head(Path2D path, double x, double y, double ux, double uy) {
    double[][] corners = {{4, 0}, {-3.5, -2.1}, {-2.2, 0}, {-3.5, 2.1}};
    for (int i = 0; i < corners.length; i++) {
      double px = x + corners[i][0] * ux - corners[i][1] * uy;
      double py = y + corners[i][0] * uy + corners[i][1] * ux;
      if (i == 0) {
        path.moveTo(px, py);
      } else {
        path.lineTo(px, py);
      }
    }
    path.closePath();
  }

  private Path2D seams(Panel panel) {
    Mesh mesh = function.mesh();
    Path2D path = new Path2D.Double();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        if (mesh.neighbour(t, k) > t && missing(function.jump(t, k))) {
          int a = mesh.vertex(t, (k + 1) % 3);
          int b = mesh.vertex(t, (k + 2) % 3);
          Polyline side = Polyline.of(mesh.x(a), mesh.y(a), mesh.x(b), mesh.y(b));
          for (Polyline part : Clip.line(side.on(panel), panel.frame())) {
            part.appendTo(path);
          }
        }
      }
    }
    return path;
  }
}
