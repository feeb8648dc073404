package coldseam.cli.plot;

import coldseam.cli.text.Digits;
import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.conduction.TemperatureField;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Bands and isotherms of a temperature field at round steps of the written scale, every fifth
 * isotherm heavier, and critical ones heaviest. Lines are traced over the whole mesh and merged, so
 * that their size does not follow the mesh.
 */
final class Isotherms {
  static final Pen PLAIN = new Pen(0.6f);
  static final Pen INDEX = new Pen(1.2f);

  private static final int EVERY = 5;
  private static final Pen CASING = new Pen(4.4f);

  /** Isotherms nearer to each other than this carry no label, points. */
  private static final double CROWDED = 6.5;

  /** How far an isotherm may be drawn from its place, points. */
  private static final double DISPLACEMENT = 0.15;

  /**
   * An isotherm that matters.
   *
   * @param id of its layer
   * @param name as written beside it
   * @param temperatureC where it lies
   * @param meaning in a few words
   * @param pen it is drawn with
   */
  record Critical(String id, String name, double temperatureC, String meaning, Pen pen) {}

  private final TemperatureField field;
  private final Figures figures;
  private final List<Critical> critical;
  private final double step;
  private final List<Double> levels;
  private final double[] traced;

  Isotherms(TemperatureField field, Figures figures, List<Critical> critical) {
    this(field, figures, critical, range(field));
  }

  /**
   * Isotherms of one field on a scale that others share.
   *
   * @param field the temperatures
   * @param figures how they are written
   * @param critical isotherms that matter
   * @param rangeC least and greatest temperature of the scale, °C
   */
  Isotherms(TemperatureField field, Figures figures, List<Critical> critical, double[] rangeC) {
    this.field = field;
    this.figures = figures;
    this.critical = critical;
    double low = figures.scaled(rangeC[0]);
    double high = figures.scaled(rangeC[1]);
    step = Levels.step(high - low);
    levels = Levels.between(low, high, step);
    traced = new double[levels.size() + critical.size()];
    for (int k = 0; k < levels.size(); k++) {
      traced[k] = figures.celsius(levels.get(k));
    }
    for (int i = 0; i < critical.size(); i++) {
      traced[levels.size() + i] = critical.get(i).temperatureC();
    }
    Arrays.sort(traced);
  }

  /** Least and greatest temperature of a field, °C. */
  static double[] range(TemperatureField field) {
    double least = Double.POSITIVE_INFINITY;
    double most = Double.NEGATIVE_INFINITY;
    int nodes = field.mesh().vertexCount() + field.mesh().sideCount();
    for (int node = 0; node < nodes; node++) {
      least = Math.min(least, field.atNode(node));
      most = Math.max(most, field.atNode(node));
    }
    return new double[] {least, most};
  }

  /** Between two isotherms, on the written scale. */
  double step() {
    return step;
  }

  /** How many bands there are. */
  int bands() {
    return levels.size() + 1;
  }

  List<Critical> critical() {
    return critical;
  }

  /** The field in a frame. */
  Traced in(Panel panel) {
    LinearPatch patch =
        Sampling.of(
            new NodalTemperature(field),
            panel.window(),
            panel.pointsPerM(),
            figures.differenceK(step),
            DISPLACEMENT);
    return new Traced(panel, new Bands(Contours.of(patch, traced), panel));
  }

  private Colour colour(int band) {
    return Palette.temperature((band + 0.5) / bands());
  }

  private List<Colour> colours() {
    List<Colour> colours = new ArrayList<>();
    for (int band = 0; band < bands(); band++) {
      colours.add(colour(band));
    }
    return colours;
  }

  private boolean heavy(double level) {
    return Math.round(level / step) % EVERY == 0;
  }

  /** The scale for the key. */
  Key.Sample scale() {
    return new Scale();
  }

  private final class Scale implements Key.Sample {
    @Override
    public void draw(Canvas canvas, Box box) {
      List<String> texts = new ArrayList<>();
      List<Boolean> heavy = new ArrayList<>();
      for (double level : levels) {
        texts.add(Digits.shortest(level, 6));
        heavy.add(heavy(level));
      }
      Bands.scale(canvas, box, texts, heavy, colours());
    }
  }

  /** The bands and lines in one frame. */
  final class Traced {
    private final Panel panel;
    private final Bands bands;
    private final List<List<Polyline>> lines = new ArrayList<>();
    private final List<List<Polyline>> criticalLines = new ArrayList<>();

    private Traced(Panel panel, Bands bands) {
      this.panel = panel;
      this.bands = bands;
    }

    private int index(double celsius) {
      return Arrays.binarySearch(traced, celsius);
    }

    void fill(Canvas canvas) {
      canvas.layer(panel.name() + "-bands");
      bands.fillAll(canvas, colour(0));
      for (int k = 0; k < levels.size(); k++) {
        bands.fill(canvas, index(figures.celsius(levels.get(k))), colour(k + 1));
      }
    }

    void drawLines(Canvas canvas) {
      for (double level : levels) {
        canvas.layer(panel.name() + "-isotherm_" + Digits.shortest(level, 6).replace('−', '-'));
        List<Polyline> drawn = bands.lines(index(figures.celsius(level)));
        lines.add(drawn);
        canvas.stroke(Polyline.path(drawn), Palette.INK, heavy(level) ? INDEX : PLAIN);
      }
    }

    void drawCritical(Canvas canvas) {
      for (Critical c : critical) {
        canvas.layer(panel.name() + "-" + c.id());
        List<Polyline> drawn = bands.lines(index(c.temperatureC()));
        criticalLines.add(drawn);
        canvas.stroke(Polyline.path(drawn), Palette.PAPER, CASING);
        canvas.stroke(Polyline.path(drawn), Palette.INK, c.pen());
      }
    }

    /**
     * Writes their temperatures on the lines drawn.
     *
     * @param canvas what it is drawn on
     * @param ground what is taken
     * @param section for leaders into the open
     * @param leaders whether a critical line too short for its label gets a leader
     */
    void label(Canvas canvas, Ground ground, DrawnSection section, boolean leaders) {
      canvas.layer(panel.name() + "-isotherm-labels");
      LineLabels lone = new LineLabels(canvas, ground, LineLabels.ALONE);
      for (int i = 0; i < criticalLines.size(); i++) {
        Critical c = critical.get(i);
        String text = c.name() + " " + figures.temperature(c.temperatureC(), 1);
        List<Polyline> drawn = criticalLines.get(i);
        if (!lone.write(drawn, text, Lettering.SMALL_STRONG, 0) && leaders) {
          beside(canvas, ground, section, drawn, text);
        }
      }
      LineLabels labels = new LineLabels(canvas, ground, new Spacing(panel));
      for (boolean first : new boolean[] {true, false}) {
        for (int i = 0; i < lines.size(); i++) {
          if (heavy(levels.get(i)) == first) {
            labels.write(
                lines.get(i),
                Digits.shortest(levels.get(i), 6),
                first ? Lettering.SMALL_STRONG : Lettering.SMALL,
                first ? 0 : CROWDED);
          }
        }
      }
    }

    /** A label with a leader, for a line too short or too bent to carry it. */
    private void beside(
        Canvas canvas, Ground ground, DrawnSection section, List<Polyline> drawn, String text) {
      Polyline longest = null;
      for (Polyline line : drawn) {
        if (longest == null || line.length() > longest.length()) {
          longest = line;
        }
      }
      if (longest == null) {
        return;
      }
      double[] at = longest.at(longest.length() / 2);
      Box size = Plates.size(List.of(text), Lettering.SMALL_STRONG);
      Optional<Box> place =
          PointMarks.place(ground, size, at[0], at[1], 14, 120, SectionLines.open(section));
      if (place.isPresent()) {
        Box box = place.get();
        Plates.leader(canvas, box, at[0], at[1]);
        Plates.centred(canvas, List.of(text), box, Lettering.SMALL_STRONG, Lettering.SMALL);
      }
    }
  }

  /** Distance between two isotherms at a place on the sheet, points. */
  private final class Spacing implements LineLabels.Spacing {
    private final Panel panel;

    private Spacing(Panel panel) {
      this.panel = panel;
    }

    @Override
    public double at(double x, double y) {
      Mesh mesh = field.mesh();
      double lx = panel.localX(x);
      double ly = panel.localY(y);
      int t = mesh.locate(lx, ly);
      if (t < 0) {
        return 0;
      }
      double[] l = Barycentric.of(mesh, t, lx, ly);
      double[] gradient = field.gradient(t, l[0], l[1], l[2]);
      return figures.differenceK(step) / Math.hypot(gradient[0], gradient[1]) * panel.pointsPerM();
    }
  }
}
