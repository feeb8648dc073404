package coldseam.cases.drawing;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/** Reads an ASCII DXF file of any release from 12 on: header, layers, blocks, entities. */
final class DxfReader {
  private final DxfGroups groups;
  private final DxfLayers layers = new DxfLayers();
  private final Map<String, DxfBlock> blocks = new HashMap<>();
  private final List<DxfEntity> entities = new ArrayList<>();
  private final List<String> classes = new ArrayList<>();
  private int units = -1;
  private int unitsLine;
  private int measurement = -1;
  private int read;

  /**
   * A block: outlines under a name, put in place by inserts.
   *
   * @param x of the point that comes to lie at the insert's
   * @param y of it
   * @param reference whether it stands for another file
   * @param entities what it draws
   */
  record DxfBlock(double x, double y, boolean reference, List<DxfEntity> entities) {}

  DxfReader(byte[] bytes) throws DrawingException {
    groups = new DxfGroups(bytes);
    sections();
  }

  private void sections() throws DrawingException {
    groups.next();
    if (!groups.is(0, "SECTION") && !groups.is(0, "EOF")) {
      throw new DrawingException(
          groups.valueLine(),
          "a DXF file begins with a section, not with `" + DxfGroups.shortened(groups.text()) + "`",
          "name an SVG or ASCII DXF file");
    }
    while (!groups.is(0, "EOF")) {
      if (!groups.is(0, "SECTION")) {
        throw new DrawingException(
            groups.valueLine(),
            "a section is due here, not `" + DxfGroups.shortened(groups.text()) + "`",
            "the file is damaged; save it again");
      }
      groups.next();
      switch (groups.text()) {
        case "HEADER" -> header();
        case "CLASSES" -> each(this::oneClass);
        case "TABLES" -> each(this::oneTableEntry);
        case "BLOCKS" -> each(this::oneBlock);
        case "ENTITIES" -> each(this::oneEntity);
        default -> skipSection();
      }
      groups.next();
    }
  }

  /** Reads one entity of a section. */
  @FunctionalInterface
  private interface Taking {
    void take() throws DrawingException;
  }

  private void each(Taking taking) throws DrawingException {
    groups.next();
    while (!groups.is(0, "ENDSEC")) {
      if (groups.code() == 0) {
        if (groups.is(0, "EOF") || groups.is(0, "SECTION")) {
          throw new DrawingException(
              groups.valueLine(), "a section does not end before here", "the file is damaged");
        }
        taking.take();
      }
      groups.next();
    }
  }

  private void skipSection() throws DrawingException {
    do {
      groups.next();
    } while (!groups.is(0, "ENDSEC"));
  }

  private void header() throws DrawingException {
    groups.next();
    while (!groups.is(0, "ENDSEC")) {
      boolean insertUnits = groups.is(9, "$INSUNITS");
      boolean metric = groups.is(9, "$MEASUREMENT");
      groups.next();
      if (insertUnits && groups.code() == 70) {
        units = groups.whole();
        unitsLine = groups.valueLine();
      } else if (metric && groups.code() == 70) {
        measurement = groups.whole();
      }
    }
  }

  private DxfEntity entity() throws DrawingException {
    if (++read > Limits.MOST_ITEMS) {
      throw new DrawingException(
          groups.valueLine(),
          "the drawing has more than " + Limits.MOST_ITEMS + " entities up to here",
          "export the detail alone");
    }
    return DxfEntity.read(groups);
  }

  private void oneClass() throws DrawingException {
    DxfEntity of = entity();
    classes.add(of.text(1, "?"));
  }

  private void oneTableEntry() throws DrawingException {
    DxfEntity entry = entity();
    if (entry.type().equals("LAYER")) {
      layers.add(entry);
    }
  }

  private void oneBlock() throws DrawingException {
    DxfEntity head = entity();
    if (!head.type().equals("BLOCK")) {
      return;
    }
    List<DxfEntity> inside = new ArrayList<>();
    groups.next();
    while (!groups.is(0, "ENDBLK")) {
      if (groups.is(0, "ENDSEC") || groups.is(0, "BLOCK") || groups.is(0, "EOF")) {
        throw new DrawingException(
            head.line(), "this block has no end", "the file is damaged; save it again");
      }
      inside.add(whole());
      groups.next();
    }
    entity();
    boolean reference = (head.whole(70, 0) & (4 | 32)) != 0;
    blocks.put(
        key(head.text(2, "")),
        new DxfBlock(head.number(10, 0), head.number(20, 0), reference, inside));
  }

  private void oneEntity() throws DrawingException {
    entities.add(whole());
  }

  /** An entity with the vertices or attributes that follow it. */
  private DxfEntity whole() throws DrawingException {
    DxfEntity entity = entity();
    boolean vertices = entity.type().equals("POLYLINE");
    boolean attributes = entity.type().equals("INSERT") && entity.whole(66, 0) == 1;
    if (!vertices && !attributes) {
      return entity;
    }
    groups.next();
    while (groups.is(0, "VERTEX") || groups.is(0, "ATTRIB")) {
      entity.parts().add(entity());
      groups.next();
    }
    if (groups.is(0, "SEQEND")) {
      entity();
    } else {
      groups.hold();
    }
    return entity;
  }

  private static String key(String name) {
    return name.toLowerCase(Locale.ROOT);
  }

  List<DxfEntity> entities() {
    return entities;
  }

  DxfLayers layers() {
    return layers;
  }

  Optional<DxfBlock> block(String name) {
    return Optional.ofNullable(blocks.get(key(name)));
  }

  /** What an object of a program that is not at hand is called. */
  String className(int id) {
    int index = id - 500;
    return index >= 0 && index < classes.size() ? classes.get(index) : "unknown";
  }

  /** The unit of the drawing by its header. */
  Optional<DrawingUnit> unit() {
    return DrawingUnit.byDxfCode(units);
  }

  /** What the header says of units beside a unit that is known here. */
  List<String> remarks() {
    List<String> remarks = new ArrayList<>();
    if (units > 0 && unit().isEmpty()) {
      remarks.add(
          "the header names a unit by number "
              + units
              + " (line "
              + unitsLine
              + ")"
              + ", which is none of "
              + DrawingUnit.names());
    } else if (units <= 0 && measurement >= 0) {
      remarks.add(
          "the header names no unit, but says that the drawing is "
              + (measurement == 0 ? "in inches or feet" : "metric"));
    }
    return remarks;
  }
}
