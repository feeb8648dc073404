package coldseam.cli.plot;

import org.w3c.dom.Element;
import org.w3c.dom.NamedNodeMap;
import org.w3c.dom.Node;

/** Writes an SVG tree as text: one element a line, no document type, nothing from elsewhere. */
final class SvgText {
  private SvgText() {}

  static String of(Element root) {
    StringBuilder out = new StringBuilder(1 << 16);
    out.append("<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n");
    write(root, out, true);
    return out.toString();
  }

  private static void write(Element element, StringBuilder out, boolean root) {
    out.append('<').append(element.getTagName());
    if (root) {
      out.append(" xmlns=\"").append(SvgCanvas.SVG).append('"');
    }
    NamedNodeMap attributes = element.getAttributes();
    for (int i = 0; i < attributes.getLength(); i++) {
      Node attribute = attributes.item(i);
      if (!attribute.getNodeName().startsWith("xmlns")) {
        out.append(' ').append(attribute.getNodeName()).append("=\"");
        if (attribute.getNodeName().equals("d")) {
          out.append(attribute.getNodeValue());
        } else {
          escape(attribute.getNodeValue(), out);
        }
        out.append('"');
      }
    }
    if (!element.hasChildNodes()) {
      out.append("/>\n");
      return;
    }
    out.append('>');
    boolean first = true;
    for (Node child = element.getFirstChild(); child != null; child = child.getNextSibling()) {
      if (child instanceof Element inner) {
        if (first) {
          out.append('\n');
          first = false;
        }
        write(inner, out, false);
      } else if (child.getNodeType() == Node.TEXT_NODE) {
        escape(child.getNodeValue(), out);
      }
    }
    out.append("</").append(element.getTagName()).append(">\n");
  }

  private static void escape(String text, StringBuilder out) {
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      switch (c) {
        case '<' -> out.append("&lt;");
        case '>' -> out.append("&gt;");
        case '&' -> out.append("&amp;");
        case '"' -> out.append("&quot;");
        default -> {
          if (c >= ' ' || c == '\n' || c == '\t') {
            out.append(c);
          }
        }
      }
    }
  }
}
