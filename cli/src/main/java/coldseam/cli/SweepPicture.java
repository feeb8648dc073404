package coldseam.cli;

import coldseam.cases.study.Axis;
import coldseam.cases.study.Measure;
import coldseam.cases.study.Measure.Kind;
import coldseam.cases.study.Measure.Knowledge;
import coldseam.cases.study.Sweep;
import coldseam.cli.plot.SweepChart;
import coldseam.cli.plot.SweepChart.Frame;
import coldseam.cli.plot.SweepChart.Reading;
import coldseam.cli.plot.SweepChart.Series;
import coldseam.cli.sheet.StudyTable;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Lays a sweep out for its chart: what runs across, what is a line, what is a frame. */
final class SweepPicture {
  /** More lines in one frame than this could not be told apart. */
  private static final int MOST_SERIES = 12;

  private static final int MOST_FRAMES = 8;

  private final Sweep sweep;
  private final List<StudyTable.Row> rows;
  private final Axis across;

  private SweepPicture(Sweep sweep, List<StudyTable.Row> rows) {
    this.sweep = sweep;
    this.rows = rows;
    Axis first = sweep.axes().get(0);
    Axis last = sweep.axes().get(sweep.axes().size() - 1);
    boolean second =
        !first.numeric() && last.numeric()
            || first.numeric() == last.numeric()
                && last.settings().size() > first.settings().size();
    across = second ? last : first;
  }

  /**
   * Draws the chart.
   *
   * @param sweep the sweep
   * @param rows every point that was solved
   * @return an SVG document
   */
  static String svg(Sweep sweep, List<StudyTable.Row> rows) {
    return new SweepPicture(sweep, rows).drawn();
  }

  private String drawn() {
    List<Double> positions = new ArrayList<>();
    if (across.numeric()) {
      for (String setting : across.settings()) {
        positions.add(across.number(setting).get().doubleValue());
      }
    }
    boolean one = sweep.axes().size() == 1;
    List<Frame> frames = one ? byKind() : byMeasure();
    StringBuilder subtitle = new StringBuilder();
    for (Axis axis : sweep.axes()) {
      subtitle.append(subtitle.isEmpty() ? "" : "; ");
      subtitle.append(axis.name()).append(": ").append(axis.settings().size()).append(" settings");
    }
    sweep.variant().ifPresent(name -> subtitle.append(" · variant “").append(name).append("”"));
    if (!one && lines().size() < other().settings().size()) {
      subtitle.append(" · ").append(lines().size()).append(" of ");
      subtitle.append(other().settings().size()).append(" lines are drawn");
    }
    subtitle.append(" · bars: proved intervals, margins of estimates");
    String unit = across.unit().isEmpty() ? "" : ", " + across.unit();
    return SweepChart.svg(
        new SweepChart.Content(
            sweep.from().title(),
            subtitle.toString(),
            certified() ? "L2D CERTIFIED" : "NOT ALL CERTIFIED",
            across.name() + unit,
            across.settings(),
            positions,
            frames));
  }

  private boolean certified() {
    for (StudyTable.Row row : rows) {
      for (Measure measure : row.measures()) {
        if (measure.knowledge() == Knowledge.OPEN) {
          return false;
        }
      }
    }
    return !rows.isEmpty();
  }

  private Map<String, Measure> measures() {
    Map<String, Measure> all = new LinkedHashMap<>();
    for (StudyTable.Row row : rows) {
      for (Measure measure : row.measures()) {
        if (measure.kind() != Kind.COLDEST) {
          all.putIfAbsent(measure.typedName(), measure);
        }
      }
    }
    return all;
  }

  private static String name(Kind kind, String of) {
    String name = of.isEmpty() ? kind.symbol() : kind.symbol() + " " + of;
    return kind == Kind.F_RSI ? name + " (estimate, margin 0.01 K)" : name;
  }

  /** One axis: a frame for each kind of number, a line for each number. */
  private List<Frame> byKind() {
    List<Frame> frames = new ArrayList<>();
    for (Kind kind : Kind.values()) {
      List<Series> series = new ArrayList<>();
      for (Map.Entry<String, Measure> measure : measures().entrySet()) {
        if (measure.getValue().kind() == kind && series.size() < MOST_SERIES) {
          series.add(series(measure.getValue().of(), measure.getKey(), Map.of()));
        }
      }
      if (!series.isEmpty()) {
        frames.add(new Frame(name(kind, ""), kind.unit(), series));
      }
    }
    return frames;
  }

  /** Two axes: a frame for each number, a line for each setting of the other axis. */
  private List<Frame> byMeasure() {
    List<Frame> frames = new ArrayList<>();
    for (Map.Entry<String, Measure> measure : measures().entrySet()) {
      List<Series> series = new ArrayList<>();
      for (String setting : lines()) {
        String called = other().numeric() ? other().name() + " " + setting : setting;
        series.add(series(called, measure.getKey(), Map.of(other().name(), setting)));
      }
      if (frames.size() < MOST_FRAMES) {
        Kind kind = measure.getValue().kind();
        String of = measure.getValue().of();
        frames.add(new Frame(name(kind, of), kind.unit(), series));
      }
    }
    return frames;
  }

  private Axis other() {
    return sweep.axes().get(0) == across ? sweep.axes().get(1) : sweep.axes().get(0);
  }

  /** Settings of the other axis that are drawn, evenly chosen, both ends among them. */
  private List<String> lines() {
    List<String> all = other().settings();
    if (all.size() <= MOST_SERIES) {
      return all;
    }
    List<String> some = new ArrayList<>();
    for (int i = 0; i < MOST_SERIES; i++) {
      some.add(all.get((int) Math.round(i * (all.size() - 1.0) / (MOST_SERIES - 1))));
    }
    return some;
  }

  private Series series(String called, String measureName, Map<String, String> fixed) {
    List<Reading> points = new ArrayList<>();
    for (String setting : across.settings()) {
      points.add(reading(measureName, setting, fixed));
    }
    return new Series(called, points);
  }

  private Reading reading(String measureName, String setting, Map<String, String> fixed) {
    for (StudyTable.Row row : rows) {
      if (setting.equals(row.settings().get(across.name()))
          && row.settings().entrySet().containsAll(fixed.entrySet())) {
        for (Measure measure : row.measures()) {
          if (measure.typedName().equals(measureName)) {
            return new Reading(measure.value(), measure.lower(), measure.upper());
          }
        }
      }
    }
    return new Reading(Double.NaN, Double.NaN, Double.NaN);
  }
}
