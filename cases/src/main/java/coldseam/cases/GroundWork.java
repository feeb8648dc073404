package coldseam.cases;

import coldseam.cases.GroundReader.Ground;
import coldseam.cases.GroundReader.Kind;
import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Flank;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Stretch;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
import coldseam.solver.detail.Wording;
import coldseam.solver.ground.GroundFloor;
import coldseam.solver.ground.GroundSection;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What a {@code ground} adds to a detail: flank, figures of ISO 13370, and ψ of the floor's edge.
 */
final class GroundWork {
  /** Names of ψ: lengths inside or outside, the floor taken off in one way or the other. */
  static final String INTERNAL_A = "floor edge internal A";

  static final String EXTERNAL_A = "floor edge external A";
  static final String INTERNAL_B = "floor edge internal B";

  private static final String WALL = "wall";
  private static final String WAY_A = "ISO 10211:2017, clause 12, with the floor by ISO 13370";

  private final Pass pass;
  private final Ground ground;
  private final GroundSection section;
  private final List<Area> areas;
  private final double top;
  private final GroundSection.Floor floor;

  /**
   * Reads the floor.
   *
   * @param pass told what is assumed and what is wrong
   * @param ground the ground
   * @param areas everything laid, the soil included
   */
  GroundWork(Pass pass, Ground ground, List<Area> areas) {
    this.pass = pass;
    this.ground = ground;
    this.section = ground.section();
    this.areas = areas;
    top = GroundReader.top(areas);
    floor = section.floor(areas, ground.soil());
  }

  /**
   * Names of the ψ that a ground gives; a second run without the wall needs two spaces, no more.
   */
  static List<String> names(Ground ground, int spaces) {
    if (!ground.psi()) {
      return List.of();
    }
    if (ground.kind() != Kind.SLAB) {
      return List.of(INTERNAL_A);
    }
    return spaces == 2
        ? List.of(INTERNAL_A, EXTERNAL_A, INTERNAL_B)
        : List.of(INTERNAL_A, EXTERNAL_A);
  }

  /** Whether the section can be what the ground says; reports it if not. */
  private boolean drawnRightly() {
    boolean overVoid = floor.below() instanceof Space;
    String wrong = "";
    if (floor.layers().isEmpty() && floor.below() != null && !overVoid) {
      return true;
    }
    if (floor.below() == null || floor.layers().isEmpty()) {
      wrong =
          "no floor is met at its plane of symmetry, "
              + Wording.place(new Point(section.symmetryX(), section.floorY()));
    } else if (overVoid != (ground.kind() == Kind.SUSPENDED)) {
      wrong =
          overVoid
              ? "`" + floor.below().name() + "` is met under the floor"
              : "soil is met under the floor, and no void";
    } else if (Double.isInfinite(floor.resistanceM2KPerW()) && ground.resistance().isEmpty()) {
      wrong = "the floor has a layer of which no resistance is known";
    }
    if (!wrong.isEmpty()) {
      pass.problems()
          .add(
              ground.node(),
              wrong,
              overVoid == (ground.kind() == Kind.SUSPENDED)
                  ? "draw the floor from the wall to there, half its width, or type `resistance`"
                  : "`floor` is `slab`, `suspended` or `cellar`");
    }
    return wrong.isEmpty();
  }

  /** The flank of the wall, unless the case names one. */
  private Optional<Flank> flank(List<String> named) {
    return named.contains(WALL) || !ground.psi()
        ? Optional.empty()
        : Optional.of(
            new Flank(
                WALL,
                Optional.of(new Point((section.innerX() + section.outerX()) / 2, top)),
                Optional.empty(),
                Map.of()));
  }

  /** The void with its ventilation in place of the void as typed. */
  private List<Space> ventilated(List<Space> spaces) {
    if (ground.crawl().isEmpty()) {
      return spaces;
    }
    List<Space> all = new ArrayList<>();
    for (Space space : spaces) {
      all.add(space.name().equals(ground.crawl().get().space().name()) ? crawl() : space);
    }
    return all;
  }

  private Space crawl() {
    Space typed = ground.crawl().get().space();
    double ventilation = ground.crawl().get().ventilationWPerMK();
    return new Space(
        typed.name(),
        typed.temperatureC(),
        typed.relativeHumidity(),
        typed.exposure(),
        typed.heatLoss(),
        typed.surface(),
        Optional.of(
            new Space.Floating(ventilation, ventilation > 0 ? ground.outdoors().name() : "")));
  }

  /** The areas with the void as it floats. */
  private static List<Area> refilled(List<Area> areas, List<Space> spaces) {
    List<Area> all = new ArrayList<>(areas.size());
    for (Area area : areas) {
      Area own = area;
      for (Space space : spaces) {
        if (area.fill() instanceof Space && area.fill().name().equals(space.name())) {
          own = new Area(area.name(), space, area.rings(), area.glazing(), area.role());
        }
      }
      all.add(own);
    }
    return all;
  }

  /**
   * Puts everything into a detail.
   *
   * @param drawn the detail, the soil laid
   * @return it with flank, stretches, void and results; empty if a mistake was reported
   */
  Optional<Detail> complete(Detail drawn) {
    if (!drawnRightly()) {
      return Optional.empty();
    }
    List<String> names = new ArrayList<>();
    for (Flank flank : drawn.flanks()) {
      names.add(flank.name());
    }
    List<Flank> flanks = new ArrayList<>(drawn.flanks());
    flank(names).ifPresent(flanks::add);
    List<Stretch> stretches = new ArrayList<>(drawn.stretches());
    stretches.addAll(section.stretches(floor));
    List<Space> spaces = ventilated(drawn.spaces());
    List<Wanted> wanted = new ArrayList<>(wanted(drawn));
    wanted.addAll(drawn.wanted());
    return Optional.of(
        new Detail(
            drawn.title(),
            drawn.geometry(),
            drawn.view(),
            refilled(drawn.areas(), spaces),
            spaces,
            stretches,
            flanks,
            wanted,
            pass.assumptions()));
  }

  /**
   * Everything that is wanted of the floor's edge.
   *
   * @param detail the detail as it is drawn, for the second run
   * @return the figures and the ψ
   */
  private List<Wanted> wanted(Detail detail) {
    double resistance = ground.resistance().orElse(floor.resistanceM2KPerW());
    double inside = ground.indoors().heatLoss().downM2KPerW();
    double outside = ground.outdoors().heatLoss().horizontalM2KPerW();
    double onGround = ground.kind() == Kind.SUSPENDED ? 0 : resistance;
    GroundFloor figures =
        new GroundFloor(
            section.widthM(),
            ground.soil().conductivityWPerMK(),
            section.wallM(),
            onGround,
            inside,
            outside);
    OptionalDouble wall = wallU(figures);
    double u = floorU(figures, resistance, inside);
    List<Wanted> wanted = new ArrayList<>();
    wanted.add(
        new Wanted.FloorEdge(
            ground.kind().words(),
            ground.indoors().name(),
            ground.outdoors().name(),
            GroundSection.FLOOR_SURFACE,
            section.widthM(),
            ground.soil().conductivityWPerMK(),
            section.wallM(),
            figures.equivalentM(),
            resistance,
            floor.layers(),
            u,
            wall,
            ground.kind() == Kind.SLAB));
    assume(resistance);
    if (ground.psi()) {
      psi(wanted, u, wall, detail);
    }
    return wanted;
  }

  private OptionalDouble wallU(GroundFloor figures) {
    if (ground.kind() != Kind.CELLAR) {
      return OptionalDouble.empty();
    }
    double resistance =
        ground.wallResistance().orElseGet(() -> section.basementWall(areas, ground.soil()));
    return OptionalDouble.of(figures.basementWall(section.depthM(), resistance));
  }

  private double floorU(GroundFloor figures, double resistance, double inside) {
    return switch (ground.kind()) {
      case SLAB -> {
        if (ground.edge().isEmpty()) {
          yield figures.slab();
        }
        GroundReader.Edge edge = ground.edge().get();
        yield figures.slabWith(
            figures.edgeInsulation(
                edge.lies(), edge.extentM(), edge.thicknessM(), edge.conductivityWPerMK()));
      }
      case SUSPENDED ->
          ground.crawl().isEmpty()
              ? Double.NaN
              : figures.suspended(
                  1 / (2 * inside + resistance),
                  ground.crawl().get().heightM(),
                  ground.crawl().get().wallUWPerM2K(),
                  ground.crawl().get().ventilationWPerMK());
      case CELLAR -> figures.basementFloor(section.depthM());
    };
  }

  private void assume(double resistance) {
    double reach = GroundSection.REACH * section.widthM();
    pass.assume(
        "block of soil",
        ground.soil().name()
            + ", "
            + Wording.length(section.halfM())
            + " to the plane of symmetry, "
            + Wording.length(reach)
            + " beyond the wall and below the ground",
        "ISO 10211, sizes of the ground by the width of the floor");
    pass.assume(
        "R of the floor",
        Wording.figure(resistance)
            + " m²·K/W"
            + (ground.resistance().isPresent()
                ? ", typed in the case"
                : ": " + String.join(", ", floor.layers())),
        "layers met at the plane of symmetry");
    if (ground.crawl().isPresent()) {
      pass.assume(
          "ventilation of " + ground.crawl().get().space().name(),
          Wording.figure(ground.crawl().get().ventilationWPerMK())
              + " W/(m·K) to outdoors for each metre of edge",
          "ISO 13370, suspended floors");
    }
    if (ground.kind() == Kind.SLAB && ground.psi()) {
      pass.assume(
          "ψ of the floor's edge, A",
          "L2D less the wall above the floor's surface (external: above the ground) and less half"
              + " the floor (external: and the wall's thickness) with U by the formula",
          WAY_A);
      pass.assume(
          "ψ of the floor's edge, B",
          "L2D less the wall above the floor's surface and less a second run without the wall",
          "ISO 10211:2017, clause 12, with the floor by a calculation of its own");
    } else if (ground.psi()) {
      pass.assume(
          "ψ of the floor's edge, A",
          ground.kind() == Kind.CELLAR
              ? "L2D less the wall above the ground, the wall below it and half the floor with U by"
                  + " the formulas of heated basements"
              : "L2D with the void floating, less the wall above the floor's surface and half the"
                  + " floor with U by the formula of suspended floors",
          WAY_A);
    }
  }

  private void psi(List<Wanted> wanted, double u, OptionalDouble wall, Detail detail) {
    double above = section.groundY();
    double half = section.halfM();
    boolean cellar = ground.kind() == Kind.CELLAR;
    Subtraction inner = part("floor by ISO 13370", u, half);
    List<Subtraction> first = new ArrayList<>();
    first.add(flank(top - (cellar ? above : section.floorY())));
    if (cellar) {
      first.add(part("wall below the ground by ISO 13370", wall.getAsDouble(), section.depthM()));
    }
    first.add(inner);
    wanted.add(psi(INTERNAL_A, DimensionSystem.INTERNAL, first));
    if (ground.kind() != Kind.SLAB) {
      return;
    }
    Subtraction outer = part("floor by ISO 13370", u, half + section.wallM());
    wanted.add(psi(EXTERNAL_A, DimensionSystem.EXTERNAL, List.of(flank(top - above), outer)));
    if (detail.spaces().size() != 2) {
      return;
    }
    Detail second =
        section.withoutWall(detail, ground.soil(), floor, ground.indoors(), ground.outdoors(), top);
    Subtraction run =
        new Subtraction.OfDetail(
            "floor without the wall",
            second,
            List.of(ground.indoors().name()),
            List.of(ground.outdoors().name()));
    wanted.add(
        psi(INTERNAL_B, DimensionSystem.INTERNAL, List.of(flank(top - section.floorY()), run)));
  }

  private static Subtraction flank(double height) {
    return new Subtraction.OfFlank(WALL, OptionalDouble.of(height));
  }

  private static Subtraction part(String name, double u, double length) {
    return new Subtraction.OfKnown(name, Bracket.of(u), length);
  }

  private Wanted psi(String name, DimensionSystem system, List<Subtraction> subtractions) {
    return new Wanted.Psi(
        name,
        "junction",
        List.of(ground.indoors().name()),
        List.of(ground.outdoors().name()),
        Map.of(),
        system,
        subtractions);
  }
}
