package coldseam.cli.spoiled;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/** A DXF text spoiled by groups and entities. */
final class SpoiledDxf {
  private static final List<String> HOSTILE =
      List.of(
          "INSERT|2|SELF|10|0|20|0",
          "INSERT|2|*Model_Space|10|0|20|0",
          "INSERT|2|nowhere|10|0|20|0|70|30000|71|30000|44|1|45|1",
          "LINE|8|0|10|0|20|0|11|1e300|21|1e300",
          "LINE|8|0|10|1e11|20|0|11|1e11|21|1",
          "LINE|8|0|10|5|20|5|11|5|21|5",
          "LWPOLYLINE|8|0|90|2000000000|70|1|10|0|20|0|10|100|20|100|10|100|20|0|10|0|20|100",
          "LWPOLYLINE|8|0|90|2|70|1|10|0|20|0|42|1e9|10|100|20|0|42|-1e-12",
          "CIRCLE|8|0|10|0|20|0|40|1e-30",
          "CIRCLE|8|0|10|0|20|0|40|1e12",
          "ARC|8|0|10|0|20|0|40|50|50|1e18|51|-1e18",
          "ELLIPSE|8|0|10|0|20|0|11|0|21|0|40|0|41|0|42|0",
          "SPLINE|8|0|70|0|71|1000|72|3|73|2|40|0|40|0|40|1|10|0|20|0|10|1|20|1",
          "SPLINE|8|0|70|0|71|1|72|4|73|2|40|1|40|0|40|1|40|1|10|0|20|0|10|100|20|100",
          "SPLINE|8|0|71|3|11|0|21|0|11|500|21|500|11|0|21|500",
          "HATCH|8|0|2|SOLID|91|2000000000|92|1",
          "HATCH|8|0|2|SOLID|91|1|92|2|72|0|73|1|93|-5",
          "HATCH|8|0|2|SOLID|91|1|92|1|93|1|72|9|94|3",
          "SOLID|8|0|10|0|20|0|11|100|21|0|12|0|22|100|13|100|23|100",
          "IMAGE|8|0|1|http://example.org/x.png",
          "ACAD_PROXY_ENTITY|8|0|91|500",
          "POLYLINE|8|0|66|1|70|1",
          "VERTEX|8|0|10|0|20|0",
          "SEQEND|8|0",
          "ENDSEC",
          "EOF",
          "SECTION|2|ENTITIES",
          "BLOCK|2|SELF|10|0|20|0",
          "ENDBLK");

  private final Random random;
  private final List<String[]> groups = new ArrayList<>();

  private SpoiledDxf(String text, Random random) {
    this.random = random;
    String[] lines = text.split("\n", -1);
    for (int i = 0; i + 1 < lines.length; i += 2) {
      groups.add(new String[] {lines[i], lines[i + 1]});
    }
  }

  static String of(String text, Random random) {
    SpoiledDxf spoiled = new SpoiledDxf(text, random);
    for (int i = random.nextInt(3) == 0 ? random.nextInt(5) : 0; i >= 0; i--) {
      spoiled.one();
    }
    StringBuilder out = new StringBuilder();
    for (String[] group : spoiled.groups) {
      out.append(group[0]).append('\n').append(group[1]).append('\n');
    }
    return out.toString();
  }

  private void one() {
    if (groups.size() < 3) {
      return;
    }
    int at = random.nextInt(groups.size());
    String[] group = groups.get(at);
    switch (random.nextInt(14)) {
      case 0 -> groups.remove(at);
      case 1 -> groups.add(at, group.clone());
      case 2 -> groups.set(at, new String[] {Nonsense.instead(random, group[0]), group[1]});
      case 3 -> groups.set(at, groups.set(random.nextInt(groups.size()), group));
      case 4 -> group(at, groups.get(random.nextInt(groups.size()))[1]);
      case 5 -> hostile();
      case 6 -> entities();
      case 7 -> block();
      default -> number();
    }
  }

  private void group(int at, String value) {
    groups.set(at, new String[] {groups.get(at)[0], value});
  }

  /** Another value of a number or a word in the entities. */
  private void number() {
    int from = Math.max(0, find("ENTITIES"));
    int at = from + random.nextInt(groups.size() - from);
    group(at, Nonsense.instead(random, groups.get(at)[1]));
  }

  private int find(String word) {
    for (int i = 0; i < groups.size(); i++) {
      if (groups.get(i)[1].strip().equals(word)) {
        return i;
      }
    }
    return -1;
  }

  private List<String[]> entity(String text) {
    String[] parts = text.split("\\|");
    List<String[]> entity = new ArrayList<>();
    entity.add(new String[] {"0", parts[0]});
    for (int i = 1; i + 1 < parts.length; i += 2) {
      entity.add(new String[] {parts[i], parts[i + 1]});
    }
    return entity;
  }

  private int start(int from) {
    for (int i = from; i < groups.size(); i++) {
      if (groups.get(i)[0].strip().equals("0")) {
        return i;
      }
    }
    return groups.size();
  }

  private void hostile() {
    int at = start(random.nextInt(groups.size()));
    groups.addAll(at, entity(HOSTILE.get(random.nextInt(HOSTILE.size()))));
  }

  /** Takes an entity out, moves it, or repeats it up to hundreds of times. */
  private void entities() {
    int from = start(random.nextInt(groups.size()));
    int to = start(Math.min(groups.size(), from + 1));
    List<String[]> entity = new ArrayList<>(groups.subList(from, to));
    if (random.nextInt(3) > 0) {
      groups.subList(from, to).clear();
    }
    int at = start(random.nextInt(groups.size() + 1));
    for (int i = random.nextInt(random.nextInt(6) == 0 ? 400 : 3); i > 0; i--) {
      groups.addAll(at, entity);
    }
  }

  /** A block put into itself. */
  private void block() {
    int at = find("ENDBLK");
    int named = find("BLOCK");
    if (at < 0 || named < 0) {
      return;
    }
    for (int i = named; i < at; i++) {
      if (groups.get(i)[0].strip().equals("2")) {
        groups.addAll(at, entity("INSERT|2|" + groups.get(i)[1].strip() + "|10|0|20|0"));
        return;
      }
    }
  }
}
