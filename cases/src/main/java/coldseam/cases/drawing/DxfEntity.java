package coldseam.cases.drawing;

import java.util.ArrayList;
import java.util.List;

/** One entity of a DXF file as a list of its groups. */
final class DxfEntity {
  private final String type;
  private final int line;
  private final List<Group> groups = new ArrayList<>();

  /** The corners of an old polyline, or the attributes of an insert: entities that follow it. */
  private final List<DxfEntity> parts = new ArrayList<>();

  /**
   * One group.
   *
   * @param code its code
   * @param text its value
   * @param line the line of the value
   */
  record Group(int code, String text, int line) {
    double number() throws DrawingException {
      return DxfGroups.number(text, line);
    }

    int whole() throws DrawingException {
      double number = number();
      if (number != Math.rint(number) || Math.abs(number) > 1e9) {
        throw new DrawingException(
            line,
            "a whole number is due here, not `" + DxfGroups.shortened(text) + "`",
            "the file is damaged; save it again");
      }
      return (int) number;
    }
  }

  DxfEntity(String type, int line) {
    this.type = type;
    this.line = line;
  }

  /** Reads the groups up to the next entity, which is held back. */
  static DxfEntity read(DxfGroups from) throws DrawingException {
    DxfEntity entity = new DxfEntity(from.text(), from.valueLine());
    int braces = 0;
    while (true) {
      from.next();
      if (from.code() == 0) {
        from.hold();
        return entity;
      }
      // Data of other programs stands in braces or after code 1000 and is none of ours.
      if (from.code() == 102) {
        braces += from.text().startsWith("{") ? 1 : from.text().startsWith("}") ? -1 : 0;
      } else if (braces <= 0 && from.code() < 1000) {
        entity.groups.add(new Group(from.code(), from.text(), from.valueLine()));
      }
    }
  }

  String type() {
    return type;
  }

  int line() {
    return line;
  }

  List<Group> groups() {
    return groups;
  }

  List<DxfEntity> parts() {
    return parts;
  }

  /** The first value of a code. */
  Group first(int code) {
    for (Group group : groups) {
      if (group.code() == code) {
        return group;
      }
    }
    return null;
  }

  String text(int code, String otherwise) {
    Group group = first(code);
    return group == null ? otherwise : group.text();
  }

  double number(int code, double otherwise) throws DrawingException {
    Group group = first(code);
    return group == null ? otherwise : group.number();
  }

  int whole(int code, int otherwise) throws DrawingException {
    Group group = first(code);
    return group == null ? otherwise : group.whole();
  }

  /** A number that the entity cannot do without. */
  double needed(int code) throws DrawingException {
    Group group = first(code);
    if (group == null) {
      throw new DrawingException(
          line,
          "this " + type + " has no group " + code,
          "the file is damaged or cut; save it again");
    }
    return group.number();
  }

  String layer() {
    return text(8, "0");
  }

  /** Whether it is drawn on a sheet of paper, not in the drawing itself. */
  boolean onPaper() throws DrawingException {
    return whole(67, 0) == 1;
  }

  boolean invisible() throws DrawingException {
    return whole(60, 0) == 1;
  }
}
