package coldseam.cases.drawing;

import coldseam.cases.words.Invisible;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;

/**
 * The groups of an ASCII DXF file, one after the other: a line with a code, a line with a value.
 *
 * <p>Source: the published DXF reference; codes from memory.
 */
final class DxfGroups {
  private static final byte[] BINARY = "AutoCAD Binary DXF".getBytes(StandardCharsets.US_ASCII);
  private static final Charset WESTERN = Charset.forName("windows-1252");

  private final byte[] bytes;
  private int at;
  private int line;
  private boolean held;
  private int code;
  private String value = "";
  private int valueLine;

  DxfGroups(byte[] bytes) throws DrawingException {
    this.bytes = bytes;
    if (startsWith(BINARY)) {
      throw new DrawingException(0, "this is a binary DXF file", "save it as an ASCII DXF file");
    }
    if (startsWith("AC10".getBytes(StandardCharsets.US_ASCII))) {
      throw new DrawingException(0, "this is a DWG file", "save it as an ASCII DXF file");
    }
    boolean marked = bytes.length > 2 && bytes[0] == (byte) 0xEF && bytes[1] == (byte) 0xBB;
    at = marked ? 3 : 0;
  }

  private boolean startsWith(byte[] begin) {
    if (bytes.length < begin.length) {
      return false;
    }
    for (int i = 0; i < begin.length; i++) {
      if (bytes[i] != begin[i]) {
        return false;
      }
    }
    return true;
  }

  /**
   * Goes on to the next group; comments are passed over.
   *
   * @throws DrawingException if the file ends here, or no group stands here
   */
  void next() throws DrawingException {
    if (held) {
      held = false;
      return;
    }
    do {
      String typed = line().strip();
      code = code(typed);
      value = line();
      valueLine = line;
    } while (code == 999);
  }

  /** Lets the next call of {@link #next} give the same group again. */
  void hold() {
    held = true;
  }

  private int code(String typed) throws DrawingException {
    int sign = typed.startsWith("-") ? 1 : 0;
    boolean digits = typed.length() > sign && typed.length() < 6;
    for (int i = sign; i < typed.length() && digits; i++) {
      digits = typed.charAt(i) >= '0' && typed.charAt(i) <= '9';
    }
    if (!digits) {
      throw new DrawingException(
          line,
          "a group code is due here, not `" + shortened(typed) + "`",
          "the file is damaged or is no ASCII DXF; save it again");
    }
    return Integer.parseInt(typed);
  }

  static String shortened(String text) {
    String plain = text.length() <= 40 ? text : text.substring(0, 37) + "...";
    return Invisible.shown(plain.replace('\t', ' ').replace('\n', ' '));
  }

  private String line() throws DrawingException {
    if (at >= bytes.length) {
      throw new DrawingException(
          Math.max(1, line),
          "the file ends here, in the middle of the drawing",
          "it was cut off; save or send it again");
    }
    line++;
    int from = at;
    while (at < bytes.length && bytes[at] != '\n' && bytes[at] != '\r') {
      byte b = bytes[at++];
      if (b >= 0 && b < 32 && b != '\t' && b != 26) {
        throw new DrawingException(
            line, "this is not text", "save the drawing as an ASCII DXF file");
      }
      if (at - from > Limits.LONGEST_LINE) {
        throw new DrawingException(
            line,
            "this line is longer than " + Limits.LONGEST_LINE + " characters",
            "the file is damaged or is no DXF; save it again");
      }
    }
    String text = decoded(from, at - from);
    if (at < bytes.length && bytes[at] == '\r') {
      at++;
      if (at < bytes.length && bytes[at] == '\n') {
        at++;
      }
    } else {
      at++;
    }
    return text;
  }

  /** UTF-8 if it is that, else the Western code page of older files. */
  private String decoded(int from, int length) {
    for (int i = from; i < from + length; i++) {
      if (bytes[i] < 0) {
        try {
          return StandardCharsets.UTF_8
              .newDecoder()
              .decode(ByteBuffer.wrap(bytes, from, length))
              .toString();
        } catch (CharacterCodingException e) {
          return new String(bytes, from, length, WESTERN);
        }
      }
    }
    return new String(bytes, from, length, StandardCharsets.US_ASCII);
  }

  int code() {
    return code;
  }

  /** The line that the value stands in. */
  int valueLine() {
    return valueLine;
  }

  /** The value as a text, unescaped. */
  String text() {
    return Invisible.shown(unescaped(value.strip()));
  }

  private static String unescaped(String text) {
    int escape = text.indexOf("\\U+");
    if (escape < 0) {
      return text;
    }
    StringBuilder out = new StringBuilder();
    int from = 0;
    while (escape >= 0 && escape + 7 <= text.length()) {
      int c = 0;
      for (int i = escape + 3; i < escape + 7; i++) {
        int digit = Character.digit(text.charAt(i), 16);
        c = digit < 0 || c < 0 ? -1 : 16 * c + digit;
      }
      out.append(text, from, escape);
      if (c < 32) {
        out.append("\\U+");
        from = escape + 3;
      } else {
        out.append((char) c);
        from = escape + 7;
      }
      escape = text.indexOf("\\U+", from);
    }
    return out.append(text.substring(from)).toString();
  }

  /** Whether this is the group with a code and a word. */
  boolean is(int wantedCode, String word) {
    return code == wantedCode && value.strip().equals(word);
  }

  /** The value as a number. */
  double number() throws DrawingException {
    return number(value.strip(), valueLine);
  }

  static double number(String typed, int at) throws DrawingException {
    boolean plain = !typed.isEmpty() && typed.length() < 64;
    for (int i = 0; i < typed.length() && plain; i++) {
      plain = "0123456789+-.eE".indexOf(typed.charAt(i)) >= 0;
    }
    if (plain) {
      try {
        double number = Double.parseDouble(typed);
        if (Math.abs(number) <= 1e300) {
          return number;
        }
        throw new DrawingException(
            at, "`" + shortened(typed) + "` is out of range", "check what is drawn there");
      } catch (NumberFormatException e) {
        plain = false;
      }
    }
    boolean comma = typed.indexOf(',') > 0;
    throw new DrawingException(
        at,
        (comma ? "a decimal comma: `" : "a number is due here, not `") + shortened(typed) + "`",
        comma
            ? "numbers in a DXF file have decimal points; export it with another setting"
            : "the file is damaged; save it again");
  }

  /** The value as a whole number. */
  int whole() throws DrawingException {
    double number = number();
    if (number != Math.rint(number) || Math.abs(number) > Integer.MAX_VALUE) {
      throw new DrawingException(
          valueLine,
          "a whole number is due here, not `" + shortened(value.strip()) + "`",
          "the file is damaged; save it again");
    }
    return (int) number;
  }
}
