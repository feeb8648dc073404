package coldseam.cli.exchange;

import java.io.ByteArrayInputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Base64;
import java.util.List;
import javax.xml.parsers.DocumentBuilderFactory;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;

/** Reads a VTK unstructured grid back: XML by the JDK, arrays as the VTK User's Guide says. */
final class ReadGrid {
  private final Document document;

  ReadGrid(String text) throws Exception {
    document =
        DocumentBuilderFactory.newInstance()
            .newDocumentBuilder()
            .parse(new ByteArrayInputStream(text.getBytes(StandardCharsets.UTF_8)));
  }

  Element root() {
    return document.getDocumentElement();
  }

  int count(String attribute) {
    Element piece = (Element) document.getElementsByTagName("Piece").item(0);
    return Integer.parseInt(piece.getAttribute(attribute));
  }

  /** The names of the arrays of a part of the grid. */
  List<String> names(String part) {
    List<String> names = new ArrayList<>();
    NodeList arrays =
        ((Element) document.getElementsByTagName(part).item(0)).getElementsByTagName("DataArray");
    for (int i = 0; i < arrays.getLength(); i++) {
      names.add(((Element) arrays.item(i)).getAttribute("Name"));
    }
    return names;
  }

  private Element array(String name) {
    NodeList arrays = document.getElementsByTagName("DataArray");
    for (int i = 0; i < arrays.getLength(); i++) {
      Element array = (Element) arrays.item(i);
      if (array.getAttribute("Name").equals(name)) {
        return array;
      }
    }
    throw new IllegalStateException("there is no array " + name);
  }

  int components(String name) {
    return Integer.parseInt(array(name).getAttribute("NumberOfComponents"));
  }

  private ByteBuffer bytes(String name, String type) {
    Element array = array(name);
    if (!array.getAttribute("type").equals(type)
        || !array.getAttribute("format").equals("binary")) {
      throw new IllegalStateException(name + " is not " + type);
    }
    ByteBuffer bytes =
        ByteBuffer.wrap(Base64.getDecoder().decode(array.getTextContent().strip()))
            .order(ByteOrder.LITTLE_ENDIAN);
    long told = bytes.getLong();
    if (told != bytes.remaining()) {
      throw new IllegalStateException(name + " tells a wrong length");
    }
    return bytes;
  }

  double[] doubles(String name) {
    ByteBuffer bytes = bytes(name, "Float64");
    double[] values = new double[bytes.remaining() / Double.BYTES];
    bytes.asDoubleBuffer().get(values);
    return values;
  }

  int[] integers(String name) {
    ByteBuffer bytes = bytes(name, "Int32");
    int[] values = new int[bytes.remaining() / Integer.BYTES];
    bytes.asIntBuffer().get(values);
    return values;
  }

  byte[] bytes(String name) {
    ByteBuffer bytes = bytes(name, "UInt8");
    byte[] values = new byte[bytes.remaining()];
    bytes.get(values);
    return values;
  }
}
