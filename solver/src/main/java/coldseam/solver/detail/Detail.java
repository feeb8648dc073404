package coldseam.solver.detail;

import coldseam.mesh.partition.LabelledArea;
import coldseam.mesh.partition.LabelledLine;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * One junction as it is to be solved. Immutable.
 *
 * @param title as typed in the case
 * @param geometry plane or axisymmetric
 * @param view how the section lies in the building
 * @param areas in the order laid, a later one over the earlier
 * @param spaces every space, laid as an area or not; their order is that of all results
 * @param stretches named pieces of outline
 * @param flanks flanks named in the case; others are found by the solver
 * @param wanted the results asked for
 * @param assumptions what reading the case had to assume
 * @param cornerZones where the film for heat loss is reduced at inner corners of a frame
 */
public record Detail(
    String title,
    Geometry geometry,
    View view,
    List<Area> areas,
    List<Space> spaces,
    List<Stretch> stretches,
    List<Flank> flanks,
    List<Wanted> wanted,
    List<Assumption> assumptions,
    List<CornerZone> cornerZones) {
  /** Copies the lists. */
  public Detail {
    areas = List.copyOf(areas);
    spaces = List.copyOf(spaces);
    stretches = List.copyOf(stretches);
    flanks = List.copyOf(flanks);
    wanted = List.copyOf(wanted);
    assumptions = List.copyOf(assumptions);
    cornerZones = List.copyOf(cornerZones);
  }

  /** A detail as a case states it: corner zones are placed later. */
  public Detail(
      String title,
      Geometry geometry,
      View view,
      List<Area> areas,
      List<Space> spaces,
      List<Stretch> stretches,
      List<Flank> flanks,
      List<Wanted> wanted,
      List<Assumption> assumptions) {
    this(title, geometry, view, areas, spaces, stretches, flanks, wanted, assumptions, List.of());
  }

  /**
   * The same detail with other areas and assumptions.
   *
   * @param otherAreas in the order laid
   * @param otherAssumptions in place of the present ones
   * @return the detail
   */
  public Detail with(List<Area> otherAreas, List<Assumption> otherAssumptions) {
    return new Detail(
        title,
        geometry,
        view,
        otherAreas,
        spaces,
        stretches,
        flanks,
        wanted,
        otherAssumptions,
        cornerZones);
  }

  /**
   * The distinct fills of the areas in the order first laid; a fill's index is its label.
   *
   * @throws IllegalArgumentException if two different fills have one name
   */
  public List<Fill> fills() {
    return List.copyOf(fillsByName().values());
  }

  /** By name, since comparing whole records costs a short run more than all else here. */
  private Map<String, Fill> fillsByName() {
    Map<String, Fill> distinct = new LinkedHashMap<>();
    for (Area area : areas) {
      Fill fill = area.fill();
      Fill known = distinct.putIfAbsent(fill.name(), fill);
      if (known != null && known != fill && !known.equals(fill)) {
        throw new IllegalArgumentException("two fills are called " + fill.name());
      }
    }
    return distinct;
  }

  /** The areas with the index of their fill as label, ready to be made into a partition. */
  public List<LabelledArea> labelledAreas() {
    List<String> names = List.copyOf(fillsByName().keySet());
    List<LabelledArea> labelled = new ArrayList<>(areas.size());
    for (Area area : areas) {
      labelled.add(new LabelledArea(names.indexOf(area.fill().name()), area.rings()));
    }
    return labelled;
  }

  /**
   * The lines of the stretches with their index as label, then those of the corner zones, ready to
   * be noded with the areas.
   */
  public List<LabelledLine> labelledLines() {
    List<LabelledLine> labelled = new ArrayList<>(stretches.size() + cornerZones.size());
    for (int i = 0; i < stretches.size(); i++) {
      labelled.add(new LabelledLine(i, stretches.get(i).along()));
    }
    for (CornerZone zone : cornerZones) {
      labelled.add(new LabelledLine(labelled.size(), zone.along()));
    }
    return labelled;
  }

  /**
   * Mean of the stated temperatures, those of floating spaces left out, °C; 0 if none is stated.
   */
  public double meanStatedTemperatureC() {
    double sum = 0;
    int stated = 0;
    for (Space space : spaces) {
      if (space.floating().isEmpty()) {
        sum += space.temperatureC();
        stated++;
      }
    }
    return stated == 0 ? 0 : sum / stated;
  }

  /**
   * Index of a space.
   *
   * @param name its name
   * @return the index in {@link #spaces()}, or −1
   */
  public int spaceIndex(String name) {
    for (int i = 0; i < spaces.size(); i++) {
      if (spaces.get(i).name().equals(name)) {
        return i;
      }
    }
    return -1;
  }
}
