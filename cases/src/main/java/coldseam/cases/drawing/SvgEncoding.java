package coldseam.cases.drawing;

import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.Charset;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.IllegalCharsetNameException;
import java.nio.charset.StandardCharsets;
import java.nio.charset.UnsupportedCharsetException;

/**
 * The characters of an XML file: by its mark of byte order, else by the encoding it names, else
 * UTF-8 (XML 1.0, appendix F). Done here because the parser prints what it cannot decode.
 */
final class SvgEncoding {
  /** An encoding is named in so many bytes or not at all. */
  private static final int HEAD = 256;

  private SvgEncoding() {}

  /**
   * Decodes.
   *
   * @param bytes the file
   * @return its text without a mark of byte order
   * @throws DrawingException with the line, if a character is not of the encoding
   */
  static String decoded(byte[] bytes) throws DrawingException {
    int mark = 0;
    Charset charset;
    if (starts(bytes, 0xEF, 0xBB, 0xBF)) {
      charset = StandardCharsets.UTF_8;
      mark = 3;
    } else if (starts(bytes, 0xFE, 0xFF)) {
      charset = StandardCharsets.UTF_16BE;
      mark = 2;
    } else if (starts(bytes, 0xFF, 0xFE)) {
      charset = StandardCharsets.UTF_16LE;
      mark = 2;
    } else if (starts(bytes, 0, '<')) {
      charset = StandardCharsets.UTF_16BE;
    } else if (starts(bytes, '<', 0)) {
      charset = StandardCharsets.UTF_16LE;
    } else {
      charset = named(bytes);
    }
    return decoded(ByteBuffer.wrap(bytes, mark, bytes.length - mark), charset);
  }

  private static boolean starts(byte[] bytes, int... with) {
    for (int i = 0; i < with.length; i++) {
      if (bytes.length <= i || (bytes[i] & 0xFF) != with[i]) {
        return false;
      }
    }
    return true;
  }

  private static Charset named(byte[] bytes) throws DrawingException {
    String head = new String(bytes, 0, Math.min(HEAD, bytes.length), StandardCharsets.ISO_8859_1);
    int end = head.indexOf("?>");
    int key = head.startsWith("<?xml") && end > 0 ? head.substring(0, end).indexOf("encoding") : -1;
    if (key < 0) {
      return StandardCharsets.UTF_8;
    }
    int open = key + "encoding".length();
    while (open < end && head.charAt(open) != '"' && head.charAt(open) != '\'') {
      open++;
    }
    int close = head.indexOf(head.charAt(open), open + 1);
    String name = close < 0 || close > end ? "" : head.substring(open + 1, close).strip();
    try {
      return Charset.forName(name);
    } catch (IllegalCharsetNameException | UnsupportedCharsetException e) {
      throw new DrawingException(
          1,
          "`" + DxfGroups.shortened(name) + "` is no encoding known here",
          "save the drawing in the encoding UTF-8");
    }
  }

  private static String decoded(ByteBuffer in, Charset charset) throws DrawingException {
    CharsetDecoder decoder =
        charset
            .newDecoder()
            .onMalformedInput(CodingErrorAction.REPORT)
            .onUnmappableCharacter(CodingErrorAction.REPORT);
    CharBuffer out =
        CharBuffer.allocate((int) Math.ceil(in.remaining() * decoder.maxCharsPerByte()) + 1);
    CoderResult result = decoder.decode(in, out, true);
    if (!result.isError()) {
      result = decoder.flush(out);
    }
    out.flip();
    if (result.isError()) {
      int line = 1;
      for (int i = 0; i < out.length(); i++) {
        line += out.charAt(i) == '\n' ? 1 : 0;
      }
      throw new DrawingException(
          line,
          "a character here is not in the encoding " + charset.name(),
          "save the drawing in the encoding UTF-8");
    }
    return out.toString();
  }
}
