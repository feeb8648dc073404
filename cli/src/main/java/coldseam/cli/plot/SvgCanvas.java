package coldseam.cli.plot;

import java.awt.Dimension;
import java.awt.Shape;
import java.awt.geom.PathIterator;
import java.text.DecimalFormat;
import java.text.DecimalFormatSymbols;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.apache.batik.svggen.DefaultErrorHandler;
import org.apache.batik.svggen.DefaultExtensionHandler;
import org.apache.batik.svggen.DefaultStyleHandler;
import org.apache.batik.svggen.ImageHandlerBase64Encoder;
import org.apache.batik.svggen.SVGGeneratorContext;
import org.apache.batik.svggen.SVGGraphics2D;
import org.apache.batik.svggen.SVGIDGenerator;
import org.apache.batik.svggen.SVGShape;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.Node;
import org.w3c.dom.NodeList;

/** Writes SVG: text stays text, anchored where it was put, so that any sans-serif face fits. */
final class SvgCanvas extends Canvas {
  static final String SVG = "http://www.w3.org/2000/svg";

  /** Batik's settings, with a number format of its own: the common one is for one thread only. */
  private static final class Context extends SVGGeneratorContext {
    Context(Document document) {
      super(document);
      setIDGenerator(new SVGIDGenerator());
      setExtensionHandler(new DefaultExtensionHandler());
      setImageHandler(new ImageHandlerBase64Encoder());
      setStyleHandler(new DefaultStyleHandler());
      setErrorHandler(new DefaultErrorHandler());
      setComment(null);
      GraphicContextDefaults defaults = new GraphicContextDefaults();
      defaults.setFont(Lettering.LABEL.font());
      setGraphicContextDefaults(defaults);
      decimalFormat = new DecimalFormat("0.##", DecimalFormatSymbols.getInstance(Locale.ROOT));
    }
  }

  /** Batik's graphics, writing shapes as {@link PathText} does. */
  private static final class Shapes extends SVGGraphics2D {
    Shapes(SVGGeneratorContext context) {
      super(context, false);
      shapeConverter =
          new SVGShape(context) {
            @Override
            public Element toSVG(Shape shape) {
              Element path = context.getDOMFactory().createElementNS(SVG, "path");
              PathIterator pieces = shape.getPathIterator(null);
              if (pieces.getWindingRule() == PathIterator.WIND_EVEN_ODD) {
                path.setAttribute("fill-rule", "evenodd");
              }
              path.setAttribute("d", PathText.of(pieces));
              return path;
            }
          };
    }
  }

  private final SVGGraphics2D graphics;
  private final Document document;
  private final List<Element> layers = new ArrayList<>();
  private final List<Anchor> anchors = new ArrayList<>();
  private String layer = "ground";

  private final String name;

  private SvgCanvas(SVGGraphics2D graphics, Document document, String name) {
    super(graphics);
    this.name = name;
    this.graphics = graphics;
    this.document = document;
  }

  /**
   * An empty drawing.
   *
   * @param name begins every id, so that several drawings can stand in one document
   */
  static SvgCanvas blank(String name) {
    Document document;
    try {
      document =
          DocumentBuilderFactory.newDefaultInstance()
              .newDocumentBuilder()
              .getDOMImplementation()
              .createDocument(SVG, "svg", null);
    } catch (ParserConfigurationException e) {
      throw new IllegalStateException("this Java has no XML document builder", e);
    }
    return new SvgCanvas(new Shapes(new Context(document)), document, name);
  }

  @Override
  void layer(String id) {
    closeLayer();
    layer = id;
  }

  @Override
  double beforeAnchor(String text, Lettering lettering, Anchor anchor) {
    return 0;
  }

  @Override
  void written(Anchor anchor) {
    anchors.add(anchor);
  }

  private void closeLayer() {
    Element group = graphics.getTopLevelGroup(false);
    if (group.hasChildNodes()) {
      group.setAttribute("id", name + "-" + layer);
      layers.add(group);
    }
  }

  /**
   * Ends the drawing.
   *
   * @param width of the sheet, points
   * @param height of the sheet, points
   * @param title what a reader who cannot see the plot is told first
   * @param description what it shows, in a few sentences
   * @return the whole document as text
   */
  String document(double width, double height, String title, String description) {
    closeLayer();
    graphics.setSVGCanvasSize(new Dimension((int) width, (int) height));
    Element root = graphics.getRoot();
    while (root.hasChildNodes()) {
      root.removeChild(root.getFirstChild());
    }
    root.setAttribute("viewBox", "0 0 " + (int) width + " " + (int) height);
    root.setAttribute("font-family", "sans-serif");
    root.setAttribute("role", "img");
    root.setAttribute("aria-labelledby", name + "-title " + name + "-desc");
    root.appendChild(told("title", title));
    root.appendChild(told("desc", description));
    for (Element layer : layers) {
      root.appendChild(layer);
    }
    anchor(root);
    return SvgText.of(root);
  }

  private Element told(String name, String text) {
    Element element = document.createElementNS(SVG, name);
    element.setAttribute("id", this.name + "-" + name);
    element.appendChild(document.createTextNode(text));
    return element;
  }

  private void anchor(Element root) {
    NodeList texts = root.getElementsByTagNameNS(SVG, "text");
    if (texts.getLength() != anchors.size()) {
      throw new IllegalStateException("a text of the plot was lost on its way into the SVG");
    }
    int i = 0;
    for (Element text : inOrder(texts)) {
      Anchor anchor = anchors.get(i++);
      text.removeAttribute("xml:space");
      if (anchor != Anchor.START) {
        text.setAttribute("text-anchor", anchor == Anchor.MIDDLE ? "middle" : "end");
      }
    }
  }

  private static List<Element> inOrder(NodeList nodes) {
    List<Element> elements = new ArrayList<>(nodes.getLength());
    for (int i = 0; i < nodes.getLength(); i++) {
      Node node = nodes.item(i);
      elements.add((Element) node);
    }
    return elements;
  }
}
