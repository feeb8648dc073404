package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import coldseam.cli.plot.Plots.Caption;
import coldseam.cli.text.Digits;
import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Hollow;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Stretch;
import coldseam.solver.result.Result;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.IntPredicate;

/** The section: materials, spaces, films, cut-off planes, dimensions, reference lengths of ψ. */
final class SectionView extends View {
  private final List<MaterialLook> looks;

  SectionView(Result result, Caption caption, DrawnSection section) {
    super(result, caption, section);
    looks = MaterialLook.of(section.fills());
  }

  @Override
  String shown() {
    return "Section · lengths in " + figures().lengthUnit();
  }

  @Override
  String told() {
    StringBuilder out = new StringBuilder("The drawn section of the detail. Materials:");
    for (Fill fill : section().fills()) {
      if (fill instanceof Material material) {
        out.append(' ').append(material.name()).append(" (").append(conductivity(material));
        out.append(' ').append(figures().conductivityUnit()).append("),");
      }
    }
    out.setCharAt(out.length() - 1, '.');
    out.append(" Spaces:");
    for (int i = 0; i < section().detail().spaces().size(); i++) {
      out.append(i == 0 ? " " : ", ").append(nameOf(i));
      out.append(' ').append(climate(i));
    }
    return out.append('.').toString();
  }

  @Override
  Page.Gutters gutters() {
    return new Page.Gutters(92, 74, 66, 84);
  }

  @Override
  void paint(Canvas canvas, Panel panel, Optional<Panel> zoom) {
    Ground ground = SectionLines.ground(section(), panel);
    MaterialLabels materials = new MaterialLabels(section(), panel, looks);
    materials.fills(canvas);
    SectionLines lines = new SectionLines(section(), panel);
    lines.joints(canvas, Palette.INK, Pen.FINE);
    SurfaceMarks marks = new SurfaceMarks(section(), panel);
    marks.fringes(canvas);
    lines.outline(canvas);
    marks.keepClear(ground);
    frame(canvas, panel, ground, zoom);
    IntPredicate open = SectionLines.open(section());
    if (panel.name().equals(Panel.WHOLE)) {
      measures(canvas, panel, ground, open);
    }
    SpaceLabels spaces = new SpaceLabels(canvas, section(), panel, ground);
    spaces.write(namesAndClimates());
    Optional<Box> elsewhere = shownElsewhere(panel, zoom);
    points(canvas, panel, ground, elsewhere);
    materials.names(canvas, ground, elsewhere);
    marks.values(canvas, ground, spaces, figures());
    new StretchMarks(section(), panel).draw(canvas, ground, spaces, open, stretchNames());
  }

  private List<String> stretchNames() {
    List<String> names = new ArrayList<>();
    for (Stretch stretch : section().detail().stretches()) {
      names.add(stretch.name());
    }
    return names;
  }

  private void measures(Canvas canvas, Panel panel, Ground ground, IntPredicate open) {
    Measures measures = new Measures(canvas, ground, open);
    canvas.layer("reference-lengths");
    for (Reference r : references()) {
      Polyline line =
          Polyline.of(panel.x(r.x0()), panel.y(r.y0()), panel.x(r.x1()), panel.y(r.y1()));
      measures.single(line, 0, 20, r.text(), Lettering.REFERENCE);
    }
    canvas.layer("dimensions");
    Set<String> drawn = new TreeSet<>();
    for (DrawnSection.CutOff cutOff : section().cutOffs()) {
      layers(measures, cutOff, panel, drawn);
    }
    Box box = section().bounds();
    Polyline bottom =
        Polyline.of(panel.x(box.x1()), panel.y(box.y0()), panel.x(box.x0()), panel.y(box.y0()));
    Polyline left =
        Polyline.of(panel.x(box.x0()), panel.y(box.y0()), panel.x(box.x0()), panel.y(box.y1()));
    overall(measures, bottom, box.width(), drawn);
    overall(measures, left, box.height(), drawn);
  }

  private void overall(Measures measures, Polyline line, double metres, Set<String> drawn) {
    if (drawn.add(figures().length(metres))) {
      measures.single(line, -1, 30, figures().length(metres), Lettering.MEASURE);
    }
  }

  /** The thicknesses met at a cut-off plane, unless the same are drawn already. */
  private void layers(
      Measures measures, DrawnSection.CutOff cutOff, Panel panel, Set<String> drawn) {
    List<Double> marks = new ArrayList<>();
    List<String> texts = new ArrayList<>();
    marks.add(0.0);
    for (DrawnSection.Layer layer : cutOff.layers()) {
      marks.add(layer.toM() * panel.pointsPerM());
      texts.add(figures().length(layer.toM() - layer.fromM()));
    }
    if (drawn.add(sorted(cutOff))) {
      if (texts.size() == 1) {
        drawn.add(texts.get(0));
      }
      measures.chain(cutOff.line().on(panel), 1, 22, marks, texts, Lettering.MEASURE);
    }
  }

  /** A reference length: where it is drawn, m, and what is written beside it. */
  private record Reference(double x0, double y0, double x1, double y1, String text) {
    boolean samePlace(Reference other) {
      return x0 == other.x0 && y0 == other.y0 && x1 == other.x1 && y1 == other.y1;
    }
  }

  /** Reference lengths by place, each with the flanks and dimension systems it serves. */
  private List<Reference> references() {
    List<Reference> references = new ArrayList<>();
    for (Result.FlankResult flank : result().flanks()) {
      for (DimensionSystem system : systems(flank.name())) {
        Result.Length length = flank.lengthM().get(system);
        if (length != null && length.from().isPresent() && length.to().isPresent()) {
          String measured = words(system) + " " + figures().length(length.valueM());
          Point from = length.from().get();
          Point to = length.to().get();
          merge(references, reference(from, to, flank.name() + ", " + measured), measured);
        }
      }
    }
    if (result().frame().isPresent()) {
      Result.Frame frame = result().frame().get();
      add(references, "frame", frame.width());
      for (Result.Length visible : frame.visible()) {
        add(references, "visible", visible);
      }
    }
    return references;
  }

  private void add(List<Reference> references, String name, Result.Length length) {
    if (length.from().isPresent() && length.to().isPresent()) {
      String text = name + " " + figures().length(length.valueM());
      references.add(reference(length.from().get(), length.to().get(), text));
    }
  }

  private Reference reference(Point from, Point to, String text) {
    return new Reference(
        section().localX(from),
        section().localY(from),
        section().localX(to),
        section().localY(to),
        text);
  }

  /** Adds a reference length, or what it measures to the text of one that lies there already. */
  private static void merge(List<Reference> references, Reference added, String measured) {
    for (int i = 0; i < references.size(); i++) {
      Reference known = references.get(i);
      if (known.samePlace(added)) {
        String before = known.text().substring(0, known.text().lastIndexOf(' '));
        references.set(
            i,
            new Reference(
                known.x0(), known.y0(), known.x1(), known.y1(), before + " = " + measured));
        return;
      }
    }
    references.add(added);
  }

  /** The dimension systems of every ψ that takes a flank off. */
  private Set<DimensionSystem> systems(String flank) {
    Set<DimensionSystem> systems = new TreeSet<>();
    for (Result.LinearTransmittance psi : result().psi()) {
      for (Result.Subtracted term : psi.subtracted()) {
        if (term.name().equals(flank) && psi.dimensions().isPresent()) {
          systems.add(psi.dimensions().get());
        }
      }
    }
    return systems;
  }

  static String words(DimensionSystem system) {
    return switch (system) {
      case INTERNAL -> "internal";
      case OVERALL_INTERNAL -> "overall internal";
      case EXTERNAL -> "external";
    };
  }

  private void points(Canvas canvas, Panel panel, Ground ground, Optional<Box> elsewhere) {
    canvas.layer(panel.name() + "-points");
    PointMarks marks = new PointMarks(canvas, panel, ground, elsewhere);
    for (Result.PointResult point : result().points()) {
      marks.add(section().localX(point.at()), section().localY(point.at()), point.name());
    }
    marks.draw();
  }

  @Override
  Key key() {
    Key key = new Key();
    key.heading("Materials, λ in " + figures().conductivityUnit());
    for (int label = 0; label < section().fills().size(); label++) {
      if (section().solid(label)) {
        Fill fill = section().fills().get(label);
        MaterialLook look = looks.get(label);
        String value =
            fill instanceof Material material ? conductivity(material) : "no heat crosses";
        int number = MaterialLabels.number(section(), label);
        key.sample(new Swatch(look), number + "  " + fill.name(), value);
      }
    }
    key.heading("Spaces");
    for (int i = 0; i < section().detail().spaces().size(); i++) {
      key.row(nameOf(i), climate(i));
    }
    buildUps(key);
    flanks(key);
    symbols(key);
    return key;
  }

  record Swatch(MaterialLook look) implements Key.Sample {
    @Override
    public void draw(Canvas canvas, Box box) {
      swatch(canvas, box, look);
    }
  }

  private record Film(boolean inside) implements Key.Sample {
    @Override
    public void draw(Canvas canvas, Box box) {
      SurfaceMarks.sample(canvas, box, inside);
    }
  }

  private static final class ReferenceLength implements Key.Sample {
    @Override
    public void draw(Canvas canvas, Box box) {
      canvas.text("123", box.midX(), box.midY() + 4, Lettering.REFERENCE, Anchor.MIDDLE);
    }
  }

  private static final class NamedPoint implements Key.Sample {
    @Override
    public void draw(Canvas canvas, Box box) {
      PointMarks.cross(canvas, box.midX(), box.midY());
    }
  }

  static void swatch(Canvas canvas, Box box, MaterialLook look) {
    Box area = new Box(box.x0(), box.y0() + 1, box.x1(), box.y1() - 1);
    Polyline ring =
        new Polyline.Builder()
            .add(area.x0(), area.y0())
            .add(area.x1(), area.y0())
            .add(area.x1(), area.y1())
            .add(area.x0(), area.y1())
            .closed();
    Rectangle2D shape = new Rectangle2D.Double(area.x0(), area.y0(), area.width(), area.height());
    canvas.fill(shape, look.tone());
    Path2D hatch = new Path2D.Double();
    look.hatch().append(List.of(ring), ring, look, hatch);
    if (hatch.getCurrentPoint() != null) {
      canvas.stroke(hatch, look.line(), Pen.HAIR);
    }
    canvas.stroke(shape, Palette.INK, Pen.FINE);
  }

  private String conductivity(Material material) {
    return material.isotropic()
        ? figures().conductivity(material.conductivityWPerMK())
        : figures().conductivity(material.conductivityWPerMK())
            + " | "
            + figures().conductivity(material.crossConductivityWPerMK())
            + " at "
            + Digits.shortest(Math.toDegrees(material.angleRad()), 1)
            + "°";
  }

  /** Thicknesses at the cut-off planes, which are not all readable where they are drawn. */
  private void buildUps(Key key) {
    Set<String> told = new TreeSet<>();
    for (DrawnSection.CutOff cutOff : section().cutOffs()) {
      if (cutOff.layers().size() < 2 || !told.add(sorted(cutOff))) {
        continue;
      }
      key.heading("Layers at " + side(cutOff) + "cut-off, " + figures().lengthUnit());
      for (DrawnSection.Layer layer : cutOff.layers()) {
        key.row(
            MaterialLabels.number(section(), layer.label())
                + "  "
                + section().fills().get(layer.label()).name(),
            figures().length(layer.toM() - layer.fromM()));
      }
    }
  }

  /** Which side of the section a plane is, as "left ", or nothing. */
  private String side(DrawnSection.CutOff cutOff) {
    Box plane = cutOff.line().bounds();
    Box all = section().bounds();
    double near = 1e-6 * section().extentM();
    if (plane.width() < near) {
      return plane.x0() - all.x0() < near ? "left " : all.x1() - plane.x1() < near ? "right " : "";
    }
    if (plane.height() < near) {
      return plane.y0() - all.y0() < near ? "lower " : all.y1() - plane.y1() < near ? "upper " : "";
    }
    return "";
  }

  /** The layers of a plane as text, the same from either end. */
  private String sorted(DrawnSection.CutOff cutOff) {
    List<String> layers = new ArrayList<>();
    for (DrawnSection.Layer layer : cutOff.layers()) {
      layers.add(layer.label() + ":" + figures().length(layer.toM() - layer.fromM()));
    }
    layers.sort(null);
    return layers.toString();
  }

  private void flanks(Key key) {
    if (result().psi().isEmpty()) {
      return;
    }
    boolean headed = false;
    for (Result.FlankResult flank : result().flanks()) {
      Set<DimensionSystem> systems = systems(flank.name());
      if (systems.isEmpty()) {
        continue;
      }
      if (!headed) {
        key.heading("Flanks taken off for ψ");
        headed = true;
      }
      key.row(flank.name(), "U " + figures().transmittance(flank.uWPerM2K().mid()));
      for (DimensionSystem system : systems) {
        Result.Length length = flank.lengthM().get(system);
        if (length != null) {
          key.row("   " + words(system) + " length", figures().lengthWithUnit(length.valueM()));
        }
      }
    }
  }

  private void symbols(Key key) {
    key.heading("Signs");
    boolean inside = false;
    boolean outside = false;
    boolean fixed = false;
    for (DrawnSection.Surface surface : section().surfaces()) {
      if (surface.kind() == Conditions.Kind.FILM) {
        Space space = section().detail().spaces().get(surface.space());
        inside |= space.exposure() == Exposure.INSIDE;
        outside |= space.exposure() == Exposure.OUTSIDE;
      }
      fixed |= surface.kind() == Conditions.Kind.FIXED;
    }
    if (inside) {
      key.sample(new Film(true), "film inside", "");
    }
    if (outside) {
      key.sample(new Film(false), "film outside", "");
    }
    if (inside || outside) {
      key.note("Rs in " + figures().filmUnit() + ": of the heat-loss set | of the surface set");
    }
    if (fixed) {
      key.note("Double line: surface at a fixed temperature");
    }
    planes(key);
    if (!references().isEmpty()) {
      key.sample(
          new ReferenceLength(),
          result().frame().isPresent()
              ? "projected width of the frame, visible length"
              : "reference length of ψ, with flank and dimension system",
          "");
    }
    if (!result().points().isEmpty()) {
      key.sample(new NamedPoint(), "named point", "");
    }
    boolean hollow = false;
    for (Fill fill : section().fills()) {
      hollow |= fill instanceof Hollow;
    }
    if (hollow) {
      key.note("Crossed out: hollow, no heat crosses its rim");
    }
  }

  private void planes(Key key) {
    boolean symmetric = false;
    for (DrawnSection.CutOff cutOff : section().cutOffs()) {
      symmetric |= cutOff.symmetry();
    }
    if (!section().cutOffs().isEmpty()) {
      key.sample(
          new Key.Line(Pen.CUT_OFF),
          "cut-off plane, no heat crosses" + (symmetric ? "; double ticks: symmetry" : ""),
          "");
    }
    if (section().axis().isPresent()) {
      key.sample(new Key.Line(Pen.AXIS), "axis of revolution: x is the radius", "");
    }
  }
}
