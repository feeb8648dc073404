package coldseam.cases.drawing;

import java.util.ArrayList;
import java.util.List;

/** Writes small DXF files for tests. */
public final class Dxf {
  private final StringBuilder classes = new StringBuilder();
  private final StringBuilder layers = new StringBuilder();
  private final StringBuilder blocks = new StringBuilder();
  private final StringBuilder entities = new StringBuilder();
  private final List<String> header = new ArrayList<>();
  private StringBuilder into = entities;

  public Dxf group(int code, Object value) {
    Object written = value instanceof Integer && isReal(code) ? value + ".0" : value;
    into.append(code).append('\n').append(written).append('\n');
    return this;
  }

  private static boolean isReal(int code) {
    return code >= 10 && code < 60;
  }

  public Dxf units(int code) {
    header.clear();
    header.add("9\n$INSUNITS\n70\n" + code + "\n");
    return this;
  }

  public Dxf oneClass(String name) {
    classes.append("0\nCLASS\n1\n").append(name).append("\n2\nx\n3\nx\n");
    return this;
  }

  public Dxf layer(String name, int flags, int colour) {
    layers.append("0\nLAYER\n2\n" + name + "\n70\n" + flags + "\n62\n" + colour + "\n");
    return this;
  }

  public Dxf block(String name, double x, double y) {
    into = blocks;
    return group(0, "BLOCK").group(8, "0").group(2, name).group(70, 0).group(10, x).group(20, y);
  }

  public Dxf endBlock() {
    group(0, "ENDBLK");
    into = entities;
    return this;
  }

  public Dxf entity(String type, String layer) {
    return group(0, type).group(8, layer);
  }

  public Dxf line(String layer, double x0, double y0, double x1, double y1) {
    return entity("LINE", layer).group(10, x0).group(20, y0).group(11, x1).group(21, y1);
  }

  public Dxf polyline(String layer, boolean closed, double... xy) {
    entity("LWPOLYLINE", layer).group(90, xy.length / 2).group(70, closed ? 1 : 0);
    for (int i = 0; i < xy.length; i += 2) {
      group(10, xy[i]).group(20, xy[i + 1]);
    }
    return this;
  }

  public Dxf insert(String block, String layer, double x, double y) {
    return entity("INSERT", layer).group(2, block).group(10, x).group(20, y);
  }

  public String text() {
    StringBuilder text = new StringBuilder();
    if (!header.isEmpty()) {
      text.append("0\nSECTION\n2\nHEADER\n").append(String.join("", header)).append("0\nENDSEC\n");
    }
    section(text, "CLASSES", classes);
    if (layers.length() > 0) {
      layers.insert(0, "0\nTABLE\n2\nLAYER\n").append("0\nENDTAB\n");
    }
    section(text, "TABLES", layers);
    section(text, "BLOCKS", blocks);
    section(text, "ENTITIES", entities);
    return text.append("0\nEOF\n").toString();
  }

  private static void section(StringBuilder text, String name, StringBuilder content) {
    if (content.length() > 0 || name.equals("ENTITIES")) {
      text.append("0\nSECTION\n2\n").append(name).append('\n').append(content);
      text.append("0\nENDSEC\n");
    }
  }
}
