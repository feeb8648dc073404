package coldseam.solver.air;

import coldseam.mesh.plane.Point;
import coldseam.solver.cavity.Ventilation;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.AirCavity.Rule;
import coldseam.solver.detail.AirCavity.Settings;
import coldseam.solver.detail.AirCavity.Single;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Slightly ventilated air layers (ISO 6946:2017): total resistance lies between that with the
 * layers unventilated and that with them well ventilated.
 *
 * @param names the layers
 * @param wellShare how much counts as well ventilated, 0 to 1
 * @param openingsStated whether the share follows from openings that are stated or drawn
 * @param unventilated the detail with the layers unventilated
 * @param wellVentilated the detail with the layers well ventilated
 */
public record SlightLayers(
    List<String> names,
    double wellShare,
    boolean openingsStated,
    Detail unventilated,
    Detail wellVentilated) {
  /** Openings of a layer of which only the class is stated: the middle of the class, m² per m. */
  private static final double MIDDLE_OPENINGS =
      (Ventilation.UNVENTILATED_OPENINGS + Ventilation.WELL_VENTILATED_OPENINGS) / 2;

  /** Copies the list. */
  public SlightLayers {
    names = List.copyOf(names);
  }

  static Optional<SlightLayers> of(Detail drawn, List<LaidAir.Group> groups, List<Shape> shapes) {
    List<String> names = new ArrayList<>();
    Map<String, List<Single>> unventilated = new HashMap<>();
    Map<String, List<Single>> well = new HashMap<>();
    double openings = Double.NaN;
    boolean stated = true;
    for (int c = 0; c < groups.size(); c++) {
      Piece.Classed classed = groups.get(c).classed();
      if (classed.rule() != Rule.LAYER
          || classed.ventilation() != Ventilation.SLIGHTLY_VENTILATED) {
        continue;
      }
      String fill = groups.get(c).pieces().get(0).fill().name();
      double own = classed.openings().orElse(MIDDLE_OPENINGS);
      if (!names.isEmpty() && Math.abs(own - openings) > Limits.TIE * openings) {
        throw different(fill, shapes.get(c).inside(), openings, own);
      }
      openings = own;
      stated &= classed.openings().isPresent();
      names.add(groups.get(c).name());
      Point inside = shapes.get(c).inside();
      unventilated
          .computeIfAbsent(fill, f -> new ArrayList<>())
          .add(forced(inside, Ventilation.UNVENTILATED, classed.space()));
      well.computeIfAbsent(fill, f -> new ArrayList<>())
          .add(forced(inside, Ventilation.WELL_VENTILATED, classed.space()));
    }
    return names.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new SlightLayers(
                names,
                Ventilation.wellVentilatedShare(openings),
                stated,
                with(drawn, unventilated),
                with(drawn, well)));
  }

  private static Single forced(Point inside, Ventilation ventilation, Optional<String> space) {
    return new Single(
        inside,
        new Settings(
            Optional.empty(),
            Optional.of(new AirCavity.Exchange(ventilation, OptionalDouble.empty(), space)),
            Optional.empty(),
            Optional.empty(),
            OptionalDouble.empty()));
  }

  private static Detail with(Detail drawn, Map<String, List<Single>> more) {
    List<Area> areas = new ArrayList<>(drawn.areas().size());
    for (Area area : drawn.areas()) {
      List<Single> singles = more.get(area.fill().name());
      if (singles != null && area.fill() instanceof AirCavity air) {
        List<Single> all = new ArrayList<>(air.singles());
        all.addAll(singles);
        AirCavity forced =
            new AirCavity(
                air.name(),
                air.settings(),
                air.form(),
                air.temperatures(),
                air.throatM(),
                air.enclosedOnly(),
                all);
        areas.add(new Area(area.name(), forced, area.rings(), area.glazing(), area.role()));
      } else {
        areas.add(area);
      }
    }
    return drawn.with(areas, drawn.assumptions());
  }

  private static DetailException different(String fill, Point at, double one, double other) {
    double mm2 = 1e6;
    return new DetailException(
        List.of(
            new Fault(
                "cavity",
                fill,
                "the layer around "
                    + Wording.place(at)
                    + " is slightly ventilated by "
                    + Wording.figure(other * mm2)
                    + " mm² per metre, another one by "
                    + Wording.figure(one * mm2)
                    + ": there is one total resistance to interpolate; state the same openings for"
                    + " both, or `unventilated` or `well` for one",
                Optional.of(at))));
  }
}
