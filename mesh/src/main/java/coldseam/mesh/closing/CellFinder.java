package coldseam.mesh.closing;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import org.locationtech.jts.algorithm.Orientation;
import org.locationtech.jts.algorithm.locate.IndexedPointInAreaLocator;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.Envelope;
import org.locationtech.jts.geom.GeometryFactory;
import org.locationtech.jts.geom.LineString;
import org.locationtech.jts.geom.LinearRing;
import org.locationtech.jts.geom.Location;
import org.locationtech.jts.geom.Polygon;
import org.locationtech.jts.index.strtree.STRtree;
import org.locationtech.jts.operation.polygonize.Polygonizer;

/** Finds the faces of noded lines, and how deep each lies in others. */
final class CellFinder {
  private final List<DrawnLine> lines;
  private NodedLines noded;
  private int[] group;

  CellFinder(List<DrawnLine> lines) {
    this.lines = lines;
  }

  Cells find() throws TangledLinesException {
    if (lines.isEmpty()) {
      return new Cells(List.of(), List.of());
    }
    noded = NodedLines.of(lines);
    GeometryFactory geometry = new GeometryFactory();
    Polygonizer polygonizer = new Polygonizer();
    for (int e = 0; e < noded.edgeCount(); e++) {
      polygonizer.add(
          geometry.createLineString(
              new Coordinate[] {noded.local(noded.start(e)), noded.local(noded.end(e))}));
    }
    List<Polygon> polygons = new ArrayList<>();
    for (Object polygon : polygonizer.getPolygons()) {
      polygons.add((Polygon) polygon);
    }
    group = groups(polygons);
    int[] depth = depths(polygons);
    List<Cells.Cell> cells = new ArrayList<>();
    for (int i = 0; i < polygons.size(); i++) {
      cells.add(cell(polygons.get(i), depth[i]));
    }
    cells.sort((a, b) -> Integer.compare(a.lines().get(0), b.lines().get(0)));
    return new Cells(cells, dropped(polygons));
  }

  private Cells.Cell cell(Polygon polygon, int depth) {
    List<List<Point>> rings = new ArrayList<>();
    Set<Integer> between = new TreeSet<>();
    rings.add(ring(polygon.getExteriorRing(), true, between));
    for (int i = 0; i < polygon.getNumInteriorRing(); i++) {
      rings.add(ring(polygon.getInteriorRingN(i), false, between));
    }
    return new Cells.Cell(
        rings,
        polygon.getArea(),
        noded.drawn(polygon.getInteriorPoint().getCoordinate()),
        depth,
        groupOf(polygon),
        new ArrayList<>(between));
  }

  private List<Point> ring(LinearRing drawn, boolean counterClockwise, Set<Integer> between) {
    Coordinate[] corners = drawn.getCoordinates();
    boolean turned = Orientation.isCCW(corners) != counterClockwise;
    List<Point> ring = new ArrayList<>(corners.length - 1);
    for (int i = 0; i + 1 < corners.length; i++) {
      ring.add(noded.drawn(corners[turned ? corners.length - 1 - i : i]));
      between.add(noded.line(edge(corners[i], corners[i + 1])));
    }
    return ring;
  }

  private int edge(Coordinate a, Coordinate b) {
    return noded.edgeBetween(noded.vertexAt(a), noded.vertexAt(b));
  }

  private int groupOf(Polygon polygon) {
    return group[noded.vertexAt(polygon.getExteriorRing().getCoordinateN(0))];
  }

  /** For each vertex the number of the group of rings that it is connected to. */
  private int[] groups(List<Polygon> polygons) {
    int[] root = new int[noded.vertexCount()];
    for (int v = 0; v < root.length; v++) {
      root[v] = v;
    }
    for (Polygon polygon : polygons) {
      Coordinate[] corners = polygon.getExteriorRing().getCoordinates();
      int first = root(root, noded.vertexAt(corners[0]));
      for (Coordinate corner : corners) {
        root[root(root, noded.vertexAt(corner))] = first;
      }
    }
    for (int v = 0; v < root.length; v++) {
      root[v] = root(root, v);
    }
    return root;
  }

  private static int root(int[] root, int v) {
    int r = v;
    while (root[r] != r) {
      root[r] = root[root[r]];
      r = root[r];
    }
    return r;
  }

  /** For each polygon, how many other groups enclose its own. */
  private int[] depths(List<Polygon> polygons) {
    STRtree shells = new STRtree();
    List<IndexedPointInAreaLocator> locators = new ArrayList<>();
    for (int i = 0; i < polygons.size(); i++) {
      Polygon shell = polygons.get(i).getFactory().createPolygon(polygons.get(i).getExteriorRing());
      shells.insert(shell.getEnvelopeInternal(), i);
      locators.add(new IndexedPointInAreaLocator(shell));
    }
    int[] depth = new int[polygons.size()];
    for (int i = 0; i < depth.length; i++) {
      Coordinate at = polygons.get(i).getExteriorRing().getCoordinateN(0);
      Set<Integer> around = new HashSet<>();
      for (Object found : shells.query(new Envelope(at))) {
        int other = (Integer) found;
        boolean inside = locators.get(other).locate(at) == Location.INTERIOR;
        if (inside && groupOf(polygons.get(other)) != groupOf(polygons.get(i))) {
          around.add(groupOf(polygons.get(other)));
        }
      }
      depth[i] = around.size();
    }
    return depth;
  }

  /** Edges on no ring, joined along their line. */
  private List<Cells.Dropped> dropped(List<Polygon> polygons) {
    boolean[] used = new boolean[noded.edgeCount()];
    for (Polygon polygon : polygons) {
      mark(polygon.getExteriorRing(), used);
      for (int i = 0; i < polygon.getNumInteriorRing(); i++) {
        mark(polygon.getInteriorRingN(i), used);
      }
    }
    List<Cells.Dropped> dropped = new ArrayList<>();
    int e = 0;
    while (e < used.length) {
      if (used[e]) {
        e++;
        continue;
      }
      int last = e;
      double length = noded.length(e);
      while (last + 1 < used.length
          && !used[last + 1]
          && noded.line(last + 1) == noded.line(e)
          && noded.start(last + 1) == noded.end(last)) {
        last++;
        length += noded.length(last);
      }
      dropped.add(
          new Cells.Dropped(
              noded.line(e),
              noded.drawn(noded.local(noded.start(e))),
              noded.drawn(noded.local(noded.end(last))),
              length));
      e = last + 1;
    }
    return dropped;
  }

  private void mark(LineString ring, boolean[] used) {
    Coordinate[] corners = ring.getCoordinates();
    for (int i = 0; i + 1 < corners.length; i++) {
      used[edge(corners[i], corners[i + 1])] = true;
    }
  }
}
