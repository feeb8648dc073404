package coldseam.solver.detail;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * A detail that asks for a frame, made ready by the rules of ISO 10077-2: heat flow horizontal,
 * every surface that of glazing or frame, and beside it the same detail with an insulating panel in
 * place of the glazing.
 */
public final class FrameDetail {
  private static final String PANEL = "insulating panel";

  private FrameDetail() {}

  /**
   * Makes a detail ready; one that asks for no frame stays as it is.
   *
   * @param detail the detail
   * @return the detail made ready
   */
  public static Detail prepared(Detail detail) {
    List<Wanted> wanted = new ArrayList<>(detail.wanted());
    boolean any = false;
    for (int i = 0; i < wanted.size(); i++) {
      if (wanted.get(i) instanceof Wanted.Frame frame) {
        any = true;
        wanted.set(i, withPanelRun(detail, frame));
      }
    }
    if (!any) {
      return detail;
    }
    List<Area> areas = new ArrayList<>(detail.areas().size());
    for (Area area : detail.areas()) {
      areas.add(new Area(area.name(), area.fill(), area.rings(), true, area.role()));
    }
    List<Assumption> assumptions = new ArrayList<>(detail.assumptions());
    assumptions.add(
        new Assumption(
            "films of a frame",
            "as for horizontal heat flow; every surface counts as glazing or frame",
            "ISO 10077-2, boundary conditions"));
    return new Detail(
        detail.title(),
        detail.geometry(),
        detail.view().withHorizontalFlow(),
        areas,
        detail.spaces(),
        detail.stretches(),
        detail.flanks(),
        wanted,
        assumptions,
        detail.cornerZones());
  }

  private static Wanted.Frame withPanelRun(Detail detail, Wanted.Frame frame) {
    return new Wanted.Frame(
        frame.warm(),
        frame.cold(),
        frame.panelWPerMK(),
        frame.widthM(),
        frame.visibleM(),
        frame.corners(),
        drawnWith(detail, Area.Role.GLAZING)
            ? Optional.of(
                new Subtraction.OfDetail(
                    "frame with the insulating panel",
                    withPanel(detail, frame),
                    frame.warm(),
                    frame.cold()))
            : Optional.empty());
  }

  private static boolean drawnWith(Detail detail, Area.Role role) {
    for (Area area : detail.areas()) {
      if (area.role() == role) {
        return true;
      }
    }
    return false;
  }

  /** Every area of the glazing filled by the panel: same place, thickness and rebate depth. */
  private static Detail withPanel(Detail detail, Wanted.Frame frame) {
    Material panel = panel(detail, frame.panelWPerMK());
    List<Area> areas = new ArrayList<>(detail.areas().size());
    for (Area area : detail.areas()) {
      areas.add(
          area.role() == Area.Role.GLAZING
              ? new Area(area.name(), panel, area.rings(), area.glazing(), Area.Role.PANEL)
              : area);
    }
    List<Stretch> stretches = new ArrayList<>();
    for (Stretch stretch : detail.stretches()) {
      if (stretch.condition().isPresent()) {
        stretches.add(stretch);
      }
    }
    return new Detail(
        detail.title(),
        detail.geometry(),
        detail.view(),
        areas,
        detail.spaces(),
        stretches,
        List.of(),
        List.of(frame),
        List.of());
  }

  private static Material panel(Detail detail, double conductivityWPerMK) {
    Set<String> taken = new HashSet<>();
    for (Area area : detail.areas()) {
      taken.add(area.fill().name());
    }
    String name = PANEL;
    for (int number = 2; taken.contains(name); number++) {
      name = PANEL + " " + number;
    }
    return Material.of(name, conductivityWPerMK);
  }
}
