package coldseam.solver.detail;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What a detail has to be to stand for a body of revolution about x = 0: all of it on one side of
 * the axis, and asking for what such a body has.
 */
public final class Revolution {
  private static final double AXIS_M = Resolution.STANDARD.snapM();

  private final Detail detail;
  private final List<Fault> faults = new ArrayList<>();

  private Revolution(Detail detail) {
    this.detail = detail;
  }

  /**
   * Checks a detail; points off the axis by less than the resolution are put on it.
   *
   * @param detail an axisymmetric detail
   * @return the detail to be solved
   * @throws DetailException if it reaches across the axis or asks for what it cannot have; all such
   *     faults together
   */
  public static Detail checked(Detail detail) {
    return new Revolution(detail).checked();
  }

  private Detail checked() {
    List<Area> areas = new ArrayList<>();
    for (Area area : detail.areas()) {
      if (area.fill() instanceof AirCavity cavity) {
        fault(
            "cavity",
            cavity.name(),
            "stands in a body of revolution, for which no rule is given;"
                + " state a material with its conductivity");
      }
      areas.add(onAxis(area));
    }
    List<Stretch> stretches = new ArrayList<>();
    for (Stretch stretch : detail.stretches()) {
      List<Point> along = onAxis(stretch.along(), "stretch", stretch.name());
      stretches.add(new Stretch(stretch.name(), along, stretch.condition(), stretch.glazing()));
    }
    for (Flank flank : detail.flanks()) {
      fault(
          "flank",
          flank.name(),
          "a body of revolution names no flanks; state under subtract of"
              + " its χ what is taken off, or leave that to the cut-off planes");
    }
    checkWanted();
    checkView();
    if (!faults.isEmpty()) {
      throw new DetailException(faults);
    }
    List<Assumption> assumptions = new ArrayList<>(detail.assumptions());
    assumptions.add(
        new Assumption(
            "axis of revolution",
            "x = 0, x is the radius; "
                + (detail.view().plan()
                    ? "all heat flow counts as horizontal"
                    : "the axis is upright"),
            "stated in the case"));
    return new Detail(
        detail.title(),
        detail.geometry(),
        detail.view(),
        areas,
        detail.spaces(),
        stretches,
        detail.flanks(),
        detail.wanted(),
        assumptions,
        detail.cornerZones());
  }

  private void checkWanted() {
    for (Wanted wanted : detail.wanted()) {
      if (wanted instanceof Wanted.Psi psi) {
        fault(
            "psi",
            psi.name(),
            "is of a metre of a prism, not of a body of revolution; ask for" + " `chi`");
      } else if (wanted instanceof Wanted.Transmittance u) {
        fault("U", u.of(), "is of a module of a prism, not of a body of revolution; ask for `chi`");
      } else if (wanted instanceof Wanted.Frame) {
        fault("frame", "", "a frame is a prism, not a body of revolution; ask for `chi`");
      } else if (wanted instanceof Wanted.Temperature point) {
        onAxis(List.of(point.at()), "point", point.name());
      } else if (wanted instanceof Wanted.Profile profile) {
        onAxis(List.of(profile.from(), profile.to()), "profile", profile.name());
      }
    }
  }

  /** Up is along the axis, or nowhere on the sheet. */
  private void checkView() {
    if (!detail.view().plan() && Math.abs(detail.view().upX()) > 1e-6) {
      fault(
          "section",
          "",
          "a body of revolution is upright or its axis is level; write"
              + " `up: [0, 1]`, `up: [0, -1]` or, for a level axis, `view: plan`");
    }
  }

  private Area onAxis(Area area) {
    List<List<Point>> rings = new ArrayList<>();
    for (List<Point> ring : area.rings()) {
      rings.add(onAxis(ring, "section", area.name()));
    }
    return new Area(area.name(), area.fill(), rings, area.glazing(), area.role());
  }

  private List<Point> onAxis(List<Point> points, String part, String name) {
    List<Point> put = new ArrayList<>();
    boolean told = false;
    for (Point point : points) {
      put.add(Math.abs(point.x()) <= AXIS_M ? new Point(0, point.y()) : point);
      if (point.x() < -AXIS_M && !told) {
        told = true;
        String what = part.equals("section") ? name + " " : "";
        faults.add(
            new Fault(
                part,
                name,
                what
                    + "reaches across the axis at "
                    + Wording.place(point)
                    + "; x is the radius, 0 or more",
                Optional.of(point)));
      }
    }
    return put;
  }

  private void fault(String part, String name, String message) {
    faults.add(new Fault(part, name, message, Optional.empty()));
  }
}
