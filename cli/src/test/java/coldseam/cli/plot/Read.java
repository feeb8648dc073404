package coldseam.cli.plot;

import java.io.StringReader;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import javax.xml.XMLConstants;
import javax.xml.parsers.DocumentBuilder;
import javax.xml.parsers.DocumentBuilderFactory;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;
import org.xml.sax.InputSource;

/** An SVG plot read back with a parser of its own, as any viewer would. */
final class Read {
  private static final Pattern TURN =
      Pattern.compile("matrix\\(([^)]*)\\)|rotate\\(([^)]*)\\)|translate\\(([^)]*)\\)");
  private static final Pattern STEP = Pattern.compile("([MlhvqczZL])|(-?(?:\\d+\\.?\\d*|\\.\\d+))");

  private final Document document;

  /**
   * A text with the four corners of the room it takes.
   *
   * @param words the text
   * @param xs of the corners
   * @param ys of the corners
   */
  record Text(String words, double[] xs, double[] ys) {}

  private Read(Document document) {
    this.document = document;
  }

  static Read of(String svg) {
    try {
      DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
      factory.setNamespaceAware(true);
      factory.setFeature(XMLConstants.FEATURE_SECURE_PROCESSING, true);
      factory.setFeature("http://apache.org/xml/features/disallow-doctype-decl", true);
      DocumentBuilder builder = factory.newDocumentBuilder();
      return new Read(builder.parse(new InputSource(new StringReader(svg))));
    } catch (Exception e) {
      throw new AssertionError("not well-formed: " + e.getMessage(), e);
    }
  }

  Element root() {
    return document.getDocumentElement();
  }

  List<Element> all(String name) {
    NodeList found = document.getElementsByTagNameNS(SvgCanvas.SVG, name);
    List<Element> elements = new ArrayList<>();
    for (int i = 0; i < found.getLength(); i++) {
      elements.add((Element) found.item(i));
    }
    return elements;
  }

  /** The layers, by the end of their id. */
  List<Element> layers(String pattern) {
    return all("g").stream().filter(g -> g.getAttribute("id").matches(pattern)).toList();
  }

  /** The lines of all paths below an element. */
  static List<Polyline> lines(Element element) {
    List<Polyline> lines = new ArrayList<>();
    NodeList paths = element.getElementsByTagNameNS(SvgCanvas.SVG, "path");
    for (int i = 0; i < paths.getLength(); i++) {
      lines.addAll(path(((Element) paths.item(i)).getAttribute("d")));
    }
    return lines;
  }

  /** Path data of lines only. */
  static List<Polyline> path(String data) {
    List<Polyline> lines = new ArrayList<>();
    Polyline.Builder line = null;
    Matcher matcher = STEP.matcher(data);
    List<String> tokens = new ArrayList<>();
    while (matcher.find()) {
      tokens.add(matcher.group());
    }
    double x = 0;
    double y = 0;
    char command = 0;
    for (int i = 0; i < tokens.size(); ) {
      if (Character.isLetter(tokens.get(i).charAt(0))) {
        command = tokens.get(i++).charAt(0);
        if (command == 'z') {
          lines.add(line.closed());
          line = null;
        }
        continue;
      }
      if (command == 'M') {
        if (line != null) {
          lines.add(line.open());
        }
        line = new Polyline.Builder();
        x = Double.parseDouble(tokens.get(i++));
        y = Double.parseDouble(tokens.get(i++));
      } else if (command == 'l') {
        x += Double.parseDouble(tokens.get(i++));
        y += Double.parseDouble(tokens.get(i++));
      } else if (command == 'h') {
        x += Double.parseDouble(tokens.get(i++));
      } else if (command == 'v') {
        y += Double.parseDouble(tokens.get(i++));
      } else {
        throw new AssertionError("command " + command + " in a path of lines");
      }
      line.add(x, y);
    }
    if (line != null) {
      lines.add(line.open());
    }
    return lines;
  }

  List<Text> texts() {
    List<Text> texts = new ArrayList<>();
    for (Element text : all("text")) {
      texts.add(text(text));
    }
    return texts;
  }

  private static Text text(Element element) {
    String words = element.getTextContent();
    float size = Float.parseFloat(inherited(element, "font-size").replace("px", ""));
    boolean bold = inherited(element, "font-weight").equals("bold");
    double width = TextWidths.of(words, new Lettering(size, bold, Palette.INK));
    String anchor = element.getAttribute("text-anchor");
    double before = anchor.equals("middle") ? width / 2 : anchor.equals("end") ? width : 0;
    double x = Double.parseDouble(element.getAttribute("x"));
    double y = Double.parseDouble(element.getAttribute("y"));
    double[] xs = {x - before, x - before + width, x - before + width, x - before};
    double up = y - size * TextWidths.CAPITAL;
    double down = y + size * TextWidths.DESCENT;
    double[] ys = {up, up, down, down};
    double[] m = transform(inherited(element, "transform"));
    double[] px = new double[4];
    double[] py = new double[4];
    for (int i = 0; i < 4; i++) {
      px[i] = m[0] * xs[i] + m[2] * ys[i] + m[4];
      py[i] = m[1] * xs[i] + m[3] * ys[i] + m[5];
    }
    return new Text(words, px, py);
  }

  private static String inherited(Element element, String attribute) {
    Element at = element;
    while (at != null) {
      if (at.hasAttribute(attribute)) {
        return at.getAttribute(attribute);
      }
      at = at.getParentNode() instanceof Element parent ? parent : null;
    }
    return "";
  }

  private static double[] transform(String text) {
    double[] m = {1, 0, 0, 1, 0, 0};
    Matcher matcher = TURN.matcher(text);
    while (matcher.find()) {
      double[] n = {1, 0, 0, 1, 0, 0};
      if (matcher.group(1) != null) {
        n = numbers(matcher.group(1));
      } else if (matcher.group(2) != null) {
        double[] r = numbers(matcher.group(2));
        double c = Math.cos(Math.toRadians(r[0]));
        double s = Math.sin(Math.toRadians(r[0]));
        double cx = r.length > 1 ? r[1] : 0;
        double cy = r.length > 1 ? r[2] : 0;
        n = new double[] {c, s, -s, c, cx - c * cx + s * cy, cy - s * cx - c * cy};
      } else {
        double[] t = numbers(matcher.group(3));
        n[4] = t[0];
        n[5] = t.length > 1 ? t[1] : 0;
      }
      m =
          new double[] {
            m[0] * n[0] + m[2] * n[1],
            m[1] * n[0] + m[3] * n[1],
            m[0] * n[2] + m[2] * n[3],
            m[1] * n[2] + m[3] * n[3],
            m[0] * n[4] + m[2] * n[5] + m[4],
            m[1] * n[4] + m[3] * n[5] + m[5]
          };
    }
    return m;
  }

  private static double[] numbers(String text) {
    String[] parts = text.trim().split("[ ,]+");
    double[] numbers = new double[parts.length];
    for (int i = 0; i < parts.length; i++) {
      numbers[i] = Double.parseDouble(parts[i]);
    }
    return numbers;
  }
}
