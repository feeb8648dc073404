package coldseam.solver.air;

import coldseam.mesh.plane.Point;
import coldseam.solver.cavity.AirLayer;
import coldseam.solver.cavity.CavityBox;
import coldseam.solver.cavity.Emissivities;
import coldseam.solver.cavity.EquivalentConductivity;
import coldseam.solver.cavity.LayerFlow;
import coldseam.solver.cavity.RadiationForm;
import coldseam.solver.cavity.Ventilation;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.AirCavity.Rule;
import coldseam.solver.detail.AirCavity.Temperatures;
import coldseam.solver.detail.View;
import java.util.List;
import java.util.Optional;

/**
 * One step of the fixed point: from what a temperature field says about each cavity to its next
 * conductivity. The direction of heat flow only turns when the other axis is clearly nearer, and
 * not for ever; where the conductivity follows from temperatures, the step is the secant's, with a
 * slope kept within bounds so that it damps oscillation.
 */
final class Settling {
  /** The other axis has to be nearer to the heat flow by this factor. */
  private static final double CLEARLY = 1.1;

  /** After so many turns the direction is kept. */
  private static final int MOST_TURNS = 2;

  private static final double CELSIUS = 273.15;

  /** Sine of the angle up to which downward heat flow counts as horizontal: 30°. */
  private static final double HORIZONTAL_SINE = 0.5 + 1e-6;

  /** Rounding in the direction of a layer that lies or stands. */
  private static final double SLIGHT_RISE = 1e-9;

  private static final double LEAST_SLOPE = -2;
  private static final double MOST_SLOPE = 0.5;

  /** Steps shorter than this part of a conductivity tell no slope. */
  private static final double CLEAR_STEP = 1e-9;

  private final List<LaidAir.Group> groups;
  private final List<Shape> shapes;
  private final View view;

  Settling(List<LaidAir.Group> groups, List<Shape> shapes, View view) {
    this.groups = groups;
    this.shapes = shapes;
    this.view = view;
  }

  /**
   * Makes a step.
   *
   * @param now the state that the field was solved with
   * @param readings what the field says
   * @param tolerance relative change of a conductivity that counts as none
   * @return the next state
   */
  Settled step(Settled now, Readings readings, double tolerance) {
    int n = groups.size();
    int[] axis = now.axis().clone();
    boolean[] forward = now.forward().clone();
    int[] turns = now.turns().clone();
    double[] next = new double[n];
    double[] difference = new double[n];
    double[] mean = new double[n];
    double[] answer = new double[n];
    double worst = 0;
    for (int c = 0; c < n; c++) {
      if (groups.get(c).well()) {
        continue;
      }
      direct(c, readings, axis, forward, turns);
      difference[c] = readings.differenceK(c);
      mean[c] = readings.meanC(c);
      answer[c] =
          conductivity(c, axis[c], forward[c], difference[c], mean[c], readings.radiatingWPerMK(c));
      double x = now.conductivityWPerMK()[c];
      worst = Math.max(worst, Math.abs(answer[c] - x) / x);
      next[c] = axis[c] == now.axis()[c] ? secant(now, c, answer[c]) : answer[c];
    }
    return new Settled(
        axis,
        forward,
        next,
        difference,
        mean,
        now.conductivityWPerMK(),
        answer,
        turns,
        now.passes() + 1,
        worst,
        worst <= tolerance);
  }

  /** Turns a cavity towards the heat flow. */
  private void direct(int c, Readings readings, int[] axis, boolean[] forward, int[] turns) {
    Axes axes = shapes.get(c).axes();
    double x = readings.flowX[c];
    double y = readings.flowY[c];
    Optional<Point> stated = settings(c).direction();
    if (stated.isPresent()) {
      x = stated.get().x();
      y = stated.get().y();
    }
    double first = x * axes.x(0) + y * axes.y(0);
    double second = x * axes.x(1) + y * axes.y(1);
    double own = Math.abs(axis[c] == 1 ? second : first);
    double other = Math.abs(axis[c] == 1 ? first : second);
    if (axis[c] < 0) {
      axis[c] = other > own ? 1 : 0;
    } else if (other > CLEARLY * own && turns[c] < MOST_TURNS) {
      axis[c] = 1 - axis[c];
      turns[c]++;
    }
    forward[c] = (axis[c] == 1 ? second : first) >= 0;
  }

  private AirCavity.Settings settings(int c) {
    return groups.get(c).pieces().get(0).settings();
  }

  /**
   * λ_eq of a cavity, W/(m·K).
   *
   * @param radiating what radiation face by face amounts to; NaN if it is not known, or not asked
   */
  double conductivity(
      int c, int axis, boolean forward, double difference, double mean, double radiating) {
    if (settings(c).conductivityWPerMK().isPresent()) {
      return settings(c).conductivityWPerMK().getAsDouble();
    }
    AirCavity fill = groups.get(c).pieces().get(0).fill();
    boolean found = fill.temperatures() == Temperatures.FOUND && !Double.isNaN(difference);
    CavityBox box = shapes.get(c).box(axis);
    Emissivities faces = emissivities(c, axis);
    Rule rule = groups.get(c).classed().rule();
    RadiationForm form = fill.form(rule);
    if (rule == Rule.FRAME) {
      EquivalentConductivity closed =
          found
              ? EquivalentConductivity.at(box, faces, form, difference, CELSIUS + mean)
              : EquivalentConductivity.fixed(box, faces, form);
      boolean slightly = groups.get(c).classed().ventilation() == Ventilation.SLIGHTLY_VENTILATED;
      if (!Double.isNaN(radiating)) {
        return (slightly ? 2 : 1) * (closed.gasConductivityWPerMK() + radiating);
      }
      return (slightly ? closed.slightlyVentilated() : closed).conductivityWPerMK();
    }
    // thicker than the standard knows: its resistance hardly grows any more
    double thickness = Math.min(box.depthM(), AirLayer.THICKEST_M);
    LayerFlow flow = flow(rise(c, axis, forward));
    AirLayer layer =
        found
            ? new AirLayer(thickness, flow, faces, difference, mean)
            : AirLayer.of(thickness, flow, faces);
    if (!Double.isNaN(radiating)) {
      return box.depthM() * layer.convectionWPerM2K() + radiating;
    }
    double resistance =
        layer.dividedAt(box.widthM())
            ? layer.dividedResistanceM2KPerW(box.widthM(), form)
            : layer.resistanceM2KPerW();
    return box.depthM() / resistance;
  }

  /** How radiation is written; empty where no shape enters, or the conductivity is stated. */
  Optional<String> form(int c, int axis) {
    if (settings(c).conductivityWPerMK().isPresent()) {
      return Optional.empty();
    }
    Rule rule = groups.get(c).classed().rule();
    RadiationForm form = groups.get(c).pieces().get(0).fill().form(rule);
    if (rule == Rule.FRAME) {
      return Optional.of(form.words());
    }
    CavityBox box = shapes.get(c).box(axis);
    double thickness = Math.min(box.depthM(), AirLayer.THICKEST_M);
    return form == RadiationForm.RADIOSITY || AirLayer.divided(thickness, box.widthM())
        ? Optional.of(form.wordsForLayers())
        : Optional.empty();
  }

  /**
   * ISO 6946: heat that flows upwards through an inclined layer is taken between horizontal and
   * vertical; downwards it counts as horizontal within 30°.
   */
  private static LayerFlow flow(double rise) {
    if (rise > SLIGHT_RISE) {
      return rise > 1 - SLIGHT_RISE
          ? LayerFlow.UP
          : LayerFlow.inclined(Math.toDegrees(Math.acos(rise)));
    }
    return rise < -HORIZONTAL_SINE ? LayerFlow.DOWN : LayerFlow.HORIZONTAL;
  }

  Emissivities emissivities(int c, int axis) {
    return settings(c).emissivities().orElse(shapes.get(c).emissivities(axis));
  }

  /** Sine of the angle of the heat flow over the horizontal. */
  private double rise(int c, int axis, boolean forward) {
    Axes axes = shapes.get(c).axes();
    double up = view.horizontalFlow() ? 0 : axes.x(axis) * view.upX() + axes.y(axis) * view.upY();
    return forward ? up : -up;
  }

  private static double secant(Settled now, int c, double answer) {
    double x = now.conductivityWPerMK()[c];
    if (now.before() == null) {
      return answer;
    }
    double step = x - now.before()[c];
    if (!(Math.abs(step) > CLEAR_STEP * x)) {
      return answer;
    }
    double slope = (answer - now.answered()[c]) / step;
    slope = Math.max(LEAST_SLOPE, Math.min(MOST_SLOPE, slope));
    return x + (answer - x) / (1 - slope);
  }
}
