package coldseam.cli.plot;

import coldseam.cli.text.Digits;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;

/**
 * The coldest surface point of each space, marked with its temperature, f_Rsi and film. Left out
 * where it says nothing: of the coldest space, and of surfaces whose temperature is fixed.
 */
final class ColdestPoints {
  private static final double KELVIN_IN_FAHRENHEIT = 1.8;
  private static final int MOST_DECIMALS = 2;

  private final Result result;
  private final DrawnSection section;
  private final Figures figures;

  ColdestPoints(Result result, DrawnSection section, Figures figures) {
    this.result = result;
    this.section = section;
    this.figures = figures;
  }

  private Optional<Result.SurfacePoint> point(int space) {
    double coldest = Double.POSITIVE_INFINITY;
    for (Result.SpaceResult other : result.spaces()) {
      coldest = Math.min(coldest, other.temperatureC());
    }
    Result.SpaceResult found = result.spaces().get(space);
    boolean marked =
        found.temperatureC() > coldest
            && found.coldest().isPresent()
            && found.coldest().get().filmM2KPerW() > 0;
    return marked ? found.coldest() : Optional.empty();
  }

  /** With the decimals that its estimated error leaves, two at most. */
  String temperature(Result.SurfacePoint point) {
    double error = point.estimatedErrorK() * (figures.customary() ? KELVIN_IN_FAHRENHEIT : 1);
    String text = Digits.of(figures.scaled(point.temperatureC()), error, MOST_DECIMALS).value();
    return text + Figures.JOINED + figures.degrees();
  }

  private static String factor(Result.SurfacePoint point) {
    return point.fRsi().isPresent() ? "f_Rsi " + Digits.fixed(point.fRsi().getAsDouble(), 3) : "";
  }

  /**
   * Marks and labels them.
   *
   * @param canvas what it is drawn on
   * @param panel the frame
   * @param ground what is taken
   * @param elsewhere the part of the frame whose points are labelled in the zoom
   */
  void draw(Canvas canvas, Panel panel, Ground ground, Optional<Box> elsewhere) {
    canvas.layer(panel.name() + "-coldest-points");
    for (int i = 0; i < result.spaces().size(); i++) {
      Optional<Result.SurfacePoint> found = point(i);
      if (found.isEmpty()) {
        continue;
      }
      double x = panel.x(section.localX(found.get().at()));
      double y = panel.y(section.localY(found.get().at()));
      if (!panel.frame().grown(-6).contains(x, y)) {
        continue;
      }
      if (elsewhere.isEmpty() || !elsewhere.get().contains(x, y)) {
        ground.keepClear(Box.around(x, y, 12, 12));
        label(canvas, ground, found.get(), x, y);
      }
      PointMarks.diamond(canvas, x, y);
    }
  }

  private void label(Canvas canvas, Ground ground, Result.SurfacePoint point, double x, double y) {
    String film = "Rs " + figures.film(point.filmM2KPerW());
    String factor = factor(point);
    List<String> wide = List.of(temperature(point), factor.isEmpty() ? film : factor + ", " + film);
    List<String> narrow =
        factor.isEmpty()
            ? List.of(temperature(point), film)
            : List.of(temperature(point), factor, film);
    for (IntPredicate accepted :
        List.of(SectionLines.open(section), Ground.OFF_LINES, Ground.ANYWHERE)) {
      for (List<String> lines : List.of(wide, narrow)) {
        Box size = Plates.size(lines, Lettering.STRONG);
        Optional<Box> place = ground.near(x, y, size.width(), size.height(), 12, 110, accepted);
        if (place.isPresent()) {
          ground.take(place.get());
          Plates.leader(canvas, place.get(), x, y);
          Plates.centred(canvas, lines, place.get(), Lettering.STRONG, Lettering.SMALL);
          return;
        }
      }
    }
  }

  private static final class Diamond implements Key.Sample {
    @Override
    public void draw(Canvas canvas, Box box) {
      PointMarks.diamond(canvas, box.midX(), box.midY());
    }
  }

  /** Lists them in the key. */
  void list(Key key) {
    boolean headed = false;
    for (int i = 0; i < result.spaces().size(); i++) {
      Optional<Result.SurfacePoint> found = point(i);
      if (found.isEmpty()) {
        continue;
      }
      if (!headed) {
        key.heading("Coldest surface, an estimate");
        headed = true;
      }
      Result.SurfacePoint point = found.get();
      List<String> words = new ArrayList<>();
      if (point.fRsi().isPresent()) {
        words.add(factor(point));
      }
      words.add("Rs " + figures.film(point.filmM2KPerW()) + " " + figures.filmUnit());
      words.add(name(point.filmSet()));
      key.sample(
          new Diamond(),
          result.spaces().get(i).name() + ": " + String.join(", ", words),
          temperature(point));
    }
  }

  static String name(FilmSet set) {
    return set == FilmSet.SURFACE ? "surface set" : "heat-loss set";
  }
}
