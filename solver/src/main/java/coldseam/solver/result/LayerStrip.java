package coldseam.solver.result;

import coldseam.mesh.partition.Partition;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.CutOffPlane;
import java.util.ArrayList;
import java.util.List;

/**
 * The layers of a cut-off plane thought on without end into the detail. Coordinates: lateral,
 * across the layers from the first end of the plane; depth, square to the plane.
 */
final class LayerStrip {
  private final Outline outline;
  private final Partition partition;
  private final CutOffPlane plane;
  private final FlankEnd first;
  private final FlankEnd last;
  private final FlankLayers layers;
  private final List<Double> borders = new ArrayList<>();
  private final double lateralSign;
  private final Direction inward;
  private final double sine;

  LayerStrip(
      Outline outline, CutOffPlane plane, FlankEnd first, FlankEnd last, FlankLayers layers) {
    this.outline = outline;
    partition = outline.partition();
    this.plane = plane;
    this.first = first;
    this.last = last;
    this.layers = layers;
    Direction run = outline.direction(plane.first(), plane.last());
    inward = new Direction(-run.y(), run.x());
    double lateral = layers.direction().cross(run);
    lateralSign = Math.signum(lateral);
    sine = Math.abs(lateral);
    borders.add(0.0);
    for (FlankLayers.Layer layer : layers.layers()) {
      borders.add(layer.endM() * sine);
    }
  }

  /** Depth at which an edge first disturbs the layers; infinite if it is part of them. */
  double disturbedFrom(int edge) {
    int a = partition.edgeStart(edge);
    int b = partition.edgeEnd(edge);
    double la = lateral(a);
    double lb = lateral(b);
    double da = depth(a);
    double db = depth(b);
    double total = borders.get(borders.size() - 1);
    double tolerance = Outline.offset(total) + FlankLayers.PARALLEL_SINE * Math.max(da, db);
    if (Math.max(da, db) <= tolerance
        || Math.max(la, lb) < -tolerance
        || Math.min(la, lb) > total + tolerance
        || continuesLayers(edge, la, lb, tolerance)) {
      return Double.POSITIVE_INFINITY;
    }
    double low = part(la, lb, -tolerance);
    double high = part(la, lb, total + tolerance);
    double from = Math.min(Math.max(0, Math.min(low, high)), 1);
    double to = Math.max(Math.min(1, Math.max(low, high)), 0);
    if (Double.isNaN(low) || Double.isNaN(high)) {
      from = 0;
      to = 1;
    }
    double nearest = Math.min(da + from * (db - da), da + to * (db - da));
    return nearest < -tolerance ? Double.POSITIVE_INFINITY : Math.max(0, nearest);
  }

  private static double part(double from, double to, double at) {
    return from == to ? Double.NaN : (at - from) / (to - from);
  }

  private boolean continuesLayers(int edge, double la, double lb, double tolerance) {
    for (int i = 0; i < borders.size(); i++) {
      if (Math.abs(la - borders.get(i)) <= tolerance
          && Math.abs(lb - borders.get(i)) <= tolerance) {
        if (i == 0) {
          return sameFace(edge, first.face());
        }
        if (i == borders.size() - 1) {
          return sameFace(edge, last.face());
        }
        int one = layers.layers().get(i - 1).label();
        int two = layers.layers().get(i).label();
        return (partition.leftLabel(edge) == one && partition.rightLabel(edge) == two)
            || (partition.leftLabel(edge) == two && partition.rightLabel(edge) == one);
      }
    }
    return false;
  }

  private boolean sameFace(int edge, int face) {
    Conditions conditions = outline.conditions();
    return conditions.kind(edge) == conditions.kind(face)
        && conditions.space(edge) == conditions.space(face)
        && conditions.filmM2KPerW(edge) == conditions.filmM2KPerW(face)
        && outline.label(edge) == outline.label(face);
  }

  private double lateral(int vertex) {
    return lateralSign * outline.across(layers.direction(), plane.first(), vertex);
  }

  private double depth(int vertex) {
    return outline.along(inward, plane.first(), vertex);
  }
}
