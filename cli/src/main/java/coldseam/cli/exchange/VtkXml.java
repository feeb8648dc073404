package coldseam.cli.exchange;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.ArrayDeque;
import java.util.Base64;
import java.util.Deque;

/**
 * Writes a VTK file in XML. Numbers are inline base64: eight bytes with the count of bytes, then
 * the numbers, both with the low byte first.
 */
final class VtkXml {
  private static final int REPLACEMENT = 0xFFFD;

  private final StringBuilder text = new StringBuilder("<?xml version=\"1.0\"?>\n");
  private final Deque<String> open = new ArrayDeque<>();

  /** Opens an element with attributes, name and value in turn. */
  VtkXml open(String element, String... attributes) {
    indent().append('<').append(element).append(">\n");
    open.push(element);
    return attributes(attributes);
  }

  /** More attributes of the element just opened. */
  VtkXml attributes(String... attributes) {
    text.setLength(text.length() - 2);
    for (int i = 0; i < attributes.length; i += 2) {
      text.append(' ')
          .append(attributes[i])
          .append("=\"")
          .append(escaped(attributes[i + 1]))
          .append('"');
    }
    text.append(">\n");
    return this;
  }

  VtkXml close() {
    String element = open.pop();
    indent().append("</").append(element).append(">\n");
    return this;
  }

  /** A remark for whoever looks into the file. */
  VtkXml comment(String words) {
    String plain = words;
    while (plain.contains("--")) {
      plain = plain.replace("--", "- -");
    }
    indent().append("<!-- ").append(escaped(plain)).append(" -->\n");
    return this;
  }

  VtkXml doubles(String name, int components, double[] values) {
    ByteBuffer bytes = buffer(Double.BYTES, values.length);
    for (double value : values) {
      bytes.putDouble(value);
    }
    return array("Float64", name, components, values.length, bytes);
  }

  VtkXml integers(String name, int[] values) {
    ByteBuffer bytes = buffer(Integer.BYTES, values.length);
    for (int value : values) {
      bytes.putInt(value);
    }
    return array("Int32", name, 1, values.length, bytes);
  }

  VtkXml bytes(String name, byte[] values) {
    ByteBuffer bytes = buffer(Byte.BYTES, values.length).put(values);
    return array("UInt8", name, 1, values.length, bytes);
  }

  private static ByteBuffer buffer(int size, int count) {
    long bytes = (long) size * count;
    return ByteBuffer.allocate(Math.toIntExact(Long.BYTES + bytes))
        .order(ByteOrder.LITTLE_ENDIAN)
        .putLong(bytes);
  }

  private VtkXml array(String type, String name, int components, int count, ByteBuffer bytes) {
    indent().append("<DataArray type=\"").append(type).append("\" Name=\"").append(escaped(name));
    text.append("\" NumberOfComponents=\"").append(components);
    if ("FieldData".equals(open.peek())) {
      // Elsewhere the piece tells how many there are.
      text.append("\" NumberOfTuples=\"").append(count / components);
    }
    text.append("\" format=\"binary\">");
    text.append(Base64.getEncoder().encodeToString(bytes.array())).append("</DataArray>\n");
    return this;
  }

  /** Text as it may stand in XML 1.0; what may not, becomes a replacement character. */
  private static String escaped(String words) {
    StringBuilder out = new StringBuilder();
    for (int i = 0; i < words.length(); i += Character.charCount(words.codePointAt(i))) {
      int c = words.codePointAt(i);
      switch (c) {
        case '&' -> out.append("&amp;");
        case '<' -> out.append("&lt;");
        case '>' -> out.append("&gt;");
        case '"' -> out.append("&quot;");
        default -> {
          boolean surrogate = c >= Character.MIN_SURROGATE && c <= Character.MAX_SURROGATE;
          boolean allowed = c >= ' ' && !surrogate && c != 0xFFFE && c != 0xFFFF;
          out.appendCodePoint(allowed ? c : REPLACEMENT);
        }
      }
    }
    return out.toString();
  }

  private StringBuilder indent() {
    return text.append("  ".repeat(open.size()));
  }

  /** Closes what is open. */
  String document() {
    while (!open.isEmpty()) {
      close();
    }
    return text.toString();
  }
}
