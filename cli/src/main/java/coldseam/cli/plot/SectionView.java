package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import coldseam.cli.plot.Plots.Caption;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Hollow;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import coldseam.solver.result.Result;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
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
    return "Section · Rs: heat-loss set | surface set · lengths in " + caption().unit();
  }

  @Override
  String told() {
    StringBuilder out = new StringBuilder("The drawn section of the detail. Materials:");
    for (Fill fill : section().fills()) {
      if (fill instanceof Material material) {
        out.append(' ').append(material.name()).append(" (").append(conductivity(material));
        out.append(" W/(m·K)),");
      }
    }
    out.setCharAt(out.length() - 1, '.');
    out.append(" Spaces:");
    for (int i = 0; i < section().detail().spaces().size(); i++) {
      out.append(i == 0 ? " " : ", ").append(section().detail().spaces().get(i).name());
      out.append(' ').append(climate(i));
    }
    return out.append('.').toString();
  }

  @Override
  Page.Gutters gutters() {
    return new Page.Gutters(92, 74, 66, 84);
  }

  @Override
  void paint(Canvas canvas, Panel panel, boolean zoomed, Optional<Panel> zoom) {
    Ground ground = SectionLines.ground(section(), panel);
    MaterialLabels materials = new MaterialLabels(section(), panel, looks);
    materials.fills(canvas);
    SectionLines lines = new SectionLines(section(), panel);
    lines.joints(canvas, Palette.INK, Pen.FINE);
    SurfaceMarks marks = new SurfaceMarks(section(), panel);
    marks.fringes(canvas);
    lines.outline(canvas);
    IntPredicate open = owner -> owner == Ground.OPEN || owner >= 0 && !section().solid(owner);
    marks.keepClear(ground);
    ScaleBar.draw(canvas, panel, ground, caption());
    if (zoomed) {
      ground.take(Zoom.words(panel));
    } else {
      ScaleBar.direction(canvas, panel, ground, section().detail().view());
      measures(canvas, panel, ground, open);
    }
    SpaceLabels spaces = new SpaceLabels(canvas, section(), panel, ground);
    spaces.write(i -> List.of(section().detail().spaces().get(i).name(), climate(i)));
    materials.names(canvas, ground, open, zoom.map(z -> panel.on(z.window())));
    marks.values(canvas, ground, spaces, open);
    new StretchMarks(section(), panel)
        .draw(
            canvas,
            ground,
            spaces,
            open,
            i -> section().detail().stretches().get(i).name());
    points(canvas, panel, ground);
  }

  private void measures(Canvas canvas, Panel panel, Ground ground, IntPredicate open) {
    Measures measures = new Measures(canvas, ground, open);
    canvas.layer("reference-lengths");
    for (Map.Entry<Reference, String> reference : references().entrySet()) {
      Reference r = reference.getKey();
      Polyline line =
          Polyline.of(
              panel.x(r.x0()), panel.y(r.y0()), panel.x(r.x1()), panel.y(r.y1()));
      measures.single(line, 0, 20, reference.getValue(), Lettering.REFERENCE);
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
    if (drawn.add(Figures.length(metres, caption()))) {
      measures.single(line, -1, 30, Figures.length(metres, caption()), Lettering.MEASURE);
    }
  }

  /** The thicknesses met at a cut-off plane, unless the same are drawn already. */
  private void layers(
      Measures measures, DrawnSection.CutOff cutOff, Panel panel, Set<String> drawn) {
    List<Double> marks = new ArrayList<>();
    List<String> texts = new ArrayList<>();
    List<String> sorted = new ArrayList<>();
    marks.add(0.0);
    for (DrawnSection.Layer layer : cutOff.layers()) {
      marks.add(layer.toM() * panel.pointsPerM());
      texts.add(Figures.length(layer.toM() - layer.fromM(), caption()));
      sorted.add(layer.label() + ":" + texts.get(texts.size() - 1));
    }
    sorted.sort(null);
    if (drawn.add(sorted.toString())) {
      if (texts.size() == 1) {
        drawn.add(texts.get(0));
      }
      measures.chain(cutOff.line().on(panel), 1, 22, marks, texts, Lettering.MEASURE);
    }
  }

  /** Where a reference length is drawn, m. */
  private record Reference(double x0, double y0, double x1, double y1) {}

  /** Reference lengths by place, each with the flanks and dimension systems it serves. */
  private Map<Reference, String> references() {
    Map<Reference, String> texts = new LinkedHashMap<>();
    for (Result.FlankResult flank : result().flanks()) {
      for (DimensionSystem system : systems(flank.name())) {
        Result.Length length = flank.lengthM().get(system);
        if (length != null && length.from().isPresent() && length.to().isPresent()) {
          Reference place =
              new Reference(
                  section().localX(length.from().get()),
                  section().localY(length.from().get()),
                  section().localX(length.to().get()),
                  section().localY(length.to().get()));
          String value = Figures.length(length.valueM(), caption());
          String before = texts.get(place);
          texts.put(
              place,
              before == null
                  ? flank.name() + ", " + words(system) + " " + value
                  : before.substring(0, before.lastIndexOf(' '))
                      + " = " + words(system) + " " + value);
        }
      }
    }
    return texts;
  }

  /** The dimension systems of every ψ that takes a flank off. */
  private Set<DimensionSystem> systems(String flank) {
    Set<DimensionSystem> systems = new TreeSet<>();
    for (Result.LinearTransmittance psi : result().psi()) {
      if (psi.subtracted().stream().anyMatch(s -> s.name().equals(flank))) {
        systems.add(psi.dimensions());
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

  private void points(Canvas canvas, Panel panel, Ground ground) {
    canvas.layer(panel.name() + "-points");
    for (Result.PointResult point : result().points()) {
      double x = panel.x(section().localX(point.at()));
      double y = panel.y(section().localY(point.at()));
      if (panel.frame().contains(x, y)) {
        PointMarks.cross(canvas, x, y);
        PointMarks.name(canvas, ground, point.name(), x, y);
      }
    }
  }

  @Override
  Key key() {
    Key key = new Key();
    key.heading("Materials, λ in W/(m·K)");
    for (int label = 0; label < section().fills().size(); label++) {
      if (section().solid(label)) {
        Fill fill = section().fills().get(label);
        MaterialLook look = looks.get(label);
        String value =
            fill instanceof Material material ? conductivity(material) : "no heat crosses";
        int number = MaterialLabels.number(section(), label);
        key.sample(
            (canvas, box) -> swatch(canvas, box, look), number + "  " + fill.name(), value);
      }
    }
    key.heading("Spaces");
    for (int i = 0; i < section().detail().spaces().size(); i++) {
      key.row(section().detail().spaces().get(i).name(), climate(i));
    }
    flanks(key);
    symbols(key);
    return key;
  }

  private static void swatch(Canvas canvas, Box box, MaterialLook look) {
    Box area = new Box(box.x0(), box.y0() + 1, box.x1(), box.y1() - 1);
    Polyline ring =
        new Polyline.Builder()
            .add(area.x0(), area.y0())
            .add(area.x1(), area.y0())
            .add(area.x1(), area.y1())
            .add(area.x0(), area.y1())
            .closed();
    Rectangle2D shape =
        new Rectangle2D.Double(area.x0(), area.y0(), area.width(), area.height());
    canvas.fill(shape, look.tone());
    Path2D hatch = new Path2D.Double();
    look.hatch().append(List.of(ring), look, hatch);
    if (hatch.getCurrentPoint() != null) {
      canvas.stroke(hatch, look.line(), Pen.HAIR);
    }
    canvas.stroke(shape, Palette.INK, Pen.FINE);
  }

  private static String conductivity(Material material) {
    return material.isotropic()
        ? Figures.quantity(material.conductivityWPerMK())
        : Figures.quantity(material.conductivityWPerMK())
            + " × "
            + Figures.quantity(material.crossConductivityWPerMK());
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
      key.row(
          flank.name(), "U " + Figures.significant(flank.uWPerM2K().mid(), 3) + " W/(m²·K)");
      for (DimensionSystem system : systems) {
        Result.Length length = flank.lengthM().get(system);
        if (length != null) {
          key.row("   " + words(system) + " length", length(length.valueM()));
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
      key.sample((c, box) -> SurfaceMarks.sample(c, box, true), "film inside, Rs in m²·K/W", "");
    }
    if (outside) {
      key.sample((c, box) -> SurfaceMarks.sample(c, box, false), "film outside", "");
    }
    if (fixed) {
      key.note("Double line: surface at a fixed temperature");
    }
    boolean symmetric = section().cutOffs().stream().anyMatch(DrawnSection.CutOff::symmetry);
    if (!section().cutOffs().isEmpty()) {
      key.sample(
          (c, box) -> line(c, box, Pen.CUT_OFF),
          "cut-off plane, no heat crosses" + (symmetric ? "; double ticks: symmetry" : ""),
          "");
    }
    if (!references().isEmpty()) {
      key.sample(
          (c, box) ->
              c.text(
                  "123",
                  box.midX(),
                  box.midY() + 4,
                  Lettering.REFERENCE,
                  Anchor.MIDDLE),
          "reference length of ψ, with flank and dimension system",
          "");
    }
    if (!result().points().isEmpty()) {
      key.sample((c, box) -> PointMarks.cross(c, box.midX(), box.midY()), "named point", "");
    }
    boolean hollow = section().fills().stream().anyMatch(f -> f instanceof Hollow);
    if (hollow) {
      key.note("Crossed out: hollow, no heat crosses its rim");
    }
  }

  static void line(Canvas canvas, Box box, Pen pen) {
    canvas.stroke(
        Polyline.path(List.of(Polyline.of(box.x0(), box.midY(), box.x1(), box.midY()))),
        Palette.INK,
        pen);
  }
}
