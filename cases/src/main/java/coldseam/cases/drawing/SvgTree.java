package coldseam.cases.drawing;

import coldseam.cases.words.Invisible;
import java.io.ByteArrayInputStream;
import java.io.StringReader;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import javax.xml.stream.XMLInputFactory;
import javax.xml.stream.XMLStreamConstants;
import javax.xml.stream.XMLStreamException;
import javax.xml.stream.XMLStreamReader;
import javax.xml.stream.events.EntityDeclaration;

/**
 * Reads XML into elements. Entities declared in the file are expanded within a limit; nothing that
 * the file refers to is ever opened.
 */
final class SvgTree {
  static final String SVG = "http://www.w3.org/2000/svg";

  private static final String INKSCAPE = "http://www.inkscape.org/namespaces/inkscape";

  private final LeftOuts leftOut;
  private final Map<String, SvgElement> byId = new HashMap<>();
  private final Deque<SvgElement> open = new ArrayDeque<>();
  private SvgElement root;
  private int count;

  private SvgTree(LeftOuts leftOut) {
    this.leftOut = leftOut;
  }

  /**
   * Reads a document.
   *
   * @param bytes XML in an encoding that it names itself
   * @param leftOut told of what is not read
   */
  static SvgTree read(byte[] bytes, LeftOuts leftOut) throws DrawingException {
    SvgTree tree = new SvgTree(leftOut);
    String text = SvgEncoding.decoded(bytes);
    try {
      XMLStreamReader reader = factory(leftOut).createXMLStreamReader(new StringReader(text));
      while (reader.hasNext()) {
        tree.take(reader, reader.next());
      }
      reader.close();
    } catch (XMLStreamException e) {
      throw broken(e);
    }
    if (tree.root == null || !tree.root.name().equals("svg")) {
      int line = tree.root == null ? 0 : tree.root.line();
      throw new DrawingException(line, "this is no SVG document", "its first element is `svg`");
    }
    return tree;
  }

  private static XMLInputFactory factory(LeftOuts leftOut) {
    XMLInputFactory factory = XMLInputFactory.newDefaultFactory();
    factory.setProperty(XMLInputFactory.IS_COALESCING, false);
    factory.setProperty(XMLInputFactory.IS_REPLACING_ENTITY_REFERENCES, true);
    factory.setProperty(XMLInputFactory.IS_SUPPORTING_EXTERNAL_ENTITIES, false);
    factory.setProperty(XMLInputFactory.SUPPORT_DTD, true);
    factory.setProperty("http://java.sun.com/xml/stream/properties/ignore-external-dtd", true);
    factory.setProperty("jdk.xml.entityExpansionLimit", String.valueOf(Limits.MOST_ENTITIES));
    factory.setProperty("jdk.xml.totalEntitySizeLimit", String.valueOf(Limits.LONGEST_ENTITIES));
    factory.setProperty("jdk.xml.maxGeneralEntitySizeLimit", "" + Limits.LONGEST_ENTITIES);
    factory.setProperty("jdk.xml.elementAttributeLimit", "1000");
    factory.setXMLResolver(
        (publicId, systemId, base, namespace) -> {
          leftOut.add("a reference to another file", "", "nothing is fetched", 1);
          return new ByteArrayInputStream(new byte[0]);
        });
    return factory;
  }

  private static DrawingException broken(XMLStreamException e) {
    String message = e.getMessage() == null ? "" : e.getMessage();
    int line = e.getLocation() == null ? 0 : Math.max(0, e.getLocation().getLineNumber());
    boolean entities = message.contains("JAXP0001");
    int from = message.indexOf("Message: ");
    String why = from < 0 ? message : message.substring(from + "Message: ".length());
    StringBuilder plain = new StringBuilder();
    for (int i = 0; i < why.length() && plain.length() < 160; i++) {
      char c = why.charAt(i);
      plain.append(c < 32 ? ' ' : c);
    }
    return entities
        ? new DrawingException(
            line,
            "entities or attributes here expand beyond all measure",
            "at most "
                + Limits.MOST_ENTITIES
                + " entities of "
                + Limits.LONGEST_ENTITIES
                + " characters in all are expanded")
        : new DrawingException(
            line, "this is no well-formed XML: " + plain.toString().strip(), "export it again");
  }

  private void take(XMLStreamReader reader, int event) throws DrawingException {
    switch (event) {
      case XMLStreamConstants.START_ELEMENT -> start(reader);
      case XMLStreamConstants.END_ELEMENT -> open.pop();
      case XMLStreamConstants.CHARACTERS, XMLStreamConstants.CDATA -> {
        if (!open.isEmpty() && open.peek().name().equals("style")) {
          open.peek().text().append(reader.getText());
        }
      }
      case XMLStreamConstants.PROCESSING_INSTRUCTION -> {
        if ("xml-stylesheet".equals(reader.getPITarget())) {
          leftOut.add(
              "a style sheet in another file",
              "",
              "nothing is fetched",
              reader.getLocation().getLineNumber());
        }
      }
      case XMLStreamConstants.DTD -> declared(reader);
      case XMLStreamConstants.ENTITY_REFERENCE ->
          leftOut.add(
              "an entity `" + DxfGroups.shortened(String.valueOf(reader.getLocalName())) + "`",
              "",
              "it stands in another file, and nothing is fetched",
              reader.getLocation().getLineNumber());
      default -> {}
    }
  }

  /** Lists entities that stand in other files. */
  private void declared(XMLStreamReader reader) {
    if (reader.getProperty("javax.xml.stream.entities") instanceof List<?> entities) {
      for (Object entity : entities) {
        if (entity instanceof EntityDeclaration of && of.getSystemId() != null) {
          leftOut.add(
              "an entity `" + DxfGroups.shortened(of.getName()) + "`",
              "",
              "it stands in another file, and nothing is fetched",
              Math.max(1, reader.getLocation().getLineNumber()));
        }
      }
    }
  }

  private void start(XMLStreamReader reader) throws DrawingException {
    int line = Math.max(1, reader.getLocation().getLineNumber());
    if (++count > Limits.MOST_ITEMS) {
      throw new DrawingException(
          line,
          "the drawing has more than " + Limits.MOST_ITEMS + " elements up to here",
          "export the detail alone");
    }
    if (open.size() > 2 * Limits.DEEPEST) {
      throw new DrawingException(
          line, "elements in elements, more than " + 2 * Limits.DEEPEST + " deep", "ungroup some");
    }
    Map<String, String> attributes = new HashMap<>();
    for (int i = 0; i < reader.getAttributeCount(); i++) {
      String space = reader.getAttributeNamespace(i);
      String key = reader.getAttributeLocalName(i);
      boolean editor = INKSCAPE.equals(space);
      attributes.put(
          editor ? "inkscape:" + key : key, Invisible.shown(reader.getAttributeValue(i)));
    }
    String space = reader.getNamespaceURI();
    boolean svg = space == null || space.isEmpty() || space.equals(SVG);
    SvgElement element = new SvgElement(svg ? reader.getLocalName() : "", attributes, line);
    if (open.isEmpty()) {
      root = root == null ? element : root;
    } else {
      open.peek().children().add(element);
    }
    open.push(element);
    String id = element.attribute("id");
    if (!id.isEmpty()) {
      byId.putIfAbsent(id, element);
    }
  }

  SvgElement root() {
    return root;
  }

  Optional<SvgElement> byId(String id) {
    return Optional.ofNullable(byId.get(id));
  }
}
