package coldseam.solver.result;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Wanted;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/** Temperatures at named points, along lines, and along the developed surface of a space. */
final class Profiles {
  private final Detail detail;
  private final FieldSets sets;

  Profiles(Detail detail, FieldSets sets) {
    this.detail = detail;
    this.sets = sets;
  }

  List<Result.PointResult> points() {
    List<Result.PointResult> points = new ArrayList<>();
    for (Wanted wanted : detail.wanted()) {
      if (wanted instanceof Wanted.Temperature point) {
        FieldSet set = sets.of(point.filmSet());
        points.add(
            new Result.PointResult(
                point.name(), point.filmSet(), point.at(), set.at(set.field(), point.at())));
      }
    }
    return points;
  }

  List<Result.ProfileResult> profiles() {
    List<Result.ProfileResult> profiles = new ArrayList<>();
    for (Wanted wanted : detail.wanted()) {
      if (wanted instanceof Wanted.Profile line) {
        profiles.add(alongLine(line));
      } else if (wanted instanceof Wanted.SurfaceProfile surface) {
        FieldSet set = sets.of(surface.filmSet());
        profiles.add(
            new Result.ProfileResult(
                surface.name(),
                surface.filmSet(),
                alongSurface(set, detail.spaceIndex(surface.space()))));
      }
    }
    return profiles;
  }

  private Result.ProfileResult alongLine(Wanted.Profile line) {
    FieldSet set = sets.of(line.filmSet());
    double length = line.from().distance(line.to());
    List<Result.Sample> samples = new ArrayList<>();
    for (int i = 0; i < line.points(); i++) {
      double part = (double) i / (line.points() - 1);
      Point at =
          new Point(
              line.from().x() + part * (line.to().x() - line.from().x()),
              line.from().y() + part * (line.to().y() - line.from().y()));
      samples.add(new Result.Sample(part * length, at, set.at(set.field(), at)));
    }
    return new Result.ProfileResult(line.name(), line.filmSet(), samples);
  }

  /**
   * Runs of surface in the order of their lowest starting point from the left, each walked with the
   * section on the left. Distance goes on from run to run; where one does not continue the other, a
   * sample without temperature stands between.
   */
  static List<Result.Sample> alongSurface(FieldSet set, int space) {
    List<Result.Sample> samples = new ArrayList<>();
    double distance = 0;
    for (List<SurfaceTrace.Side> run : runs(set, space)) {
      Point start = set.trace().point(new SurfaceTrace.Place(run.get(0), 0));
      if (!samples.isEmpty()) {
        samples.add(new Result.Sample(distance, start, Double.NaN));
      }
      samples.add(new Result.Sample(distance, start, run.get(0).at(set.field(), 0)));
      for (SurfaceTrace.Side side : run) {
        double length = set.trace().lengthM(side);
        for (double s : new double[] {0.5, 1}) {
          samples.add(
              new Result.Sample(
                  distance + s * length,
                  set.trace().point(new SurfaceTrace.Place(side, s)),
                  side.at(set.field(), s)));
        }
        distance += length;
      }
    }
    return samples;
  }

  static List<List<SurfaceTrace.Side>> runs(FieldSet set, int space) {
    Map<Integer, SurfaceTrace.Side> starting = new HashMap<>();
    Set<Integer> ending = new HashSet<>();
    List<SurfaceTrace.Side> sides = new ArrayList<>();
    for (SurfaceTrace.Side side : set.trace().sides()) {
      if (set.solution().conditions().space(side.edge()) == space) {
        sides.add(side);
        starting.put(side.start(), side);
        ending.add(side.end());
      }
    }
    sides.sort(new BeginningsFirst(set, ending));
    List<List<SurfaceTrace.Side>> runs = new ArrayList<>();
    for (SurfaceTrace.Side first : sides) {
      List<SurfaceTrace.Side> run = new ArrayList<>();
      SurfaceTrace.Side side = starting.remove(first.start());
      while (side != null) {
        run.add(side);
        side = starting.remove(side.end());
      }
      if (!run.isEmpty()) {
        runs.add(run);
      }
    }
    return runs;
  }

  /** Sides at which a surface begins come first; then from the left, then upwards. */
  private record BeginningsFirst(FieldSet set, Set<Integer> continued)
      implements Comparator<SurfaceTrace.Side> {
    @Override
    public int compare(SurfaceTrace.Side a, SurfaceTrace.Side b) {
      int beginning = Boolean.compare(continued.contains(a.start()), continued.contains(b.start()));
      return beginning != 0
          ? beginning
          : Outline.LEFT_TO_RIGHT.compare(start(set, a), start(set, b));
    }
  }

  private static Point start(FieldSet set, SurfaceTrace.Side side) {
    return set.trace().point(new SurfaceTrace.Place(side, 0));
  }
}
