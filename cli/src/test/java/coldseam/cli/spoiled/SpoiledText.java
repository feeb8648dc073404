package coldseam.cli.spoiled;

import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;

/** Texts spoiled without regard to what they say: letters, lines, bytes. */
final class SpoiledText {
  private static final String LETTERS = "{}[]:,-'\"#&*!|>%@`<>/=?\\;\n\r \t0159.eEaxyzψ";

  /** Bytes that are no UTF-8, controls, marks of byte order, ends of lines of all kinds. */
  private static final byte[][] ODD = {
    {(byte) 0xFF, (byte) 0xFE},
    {(byte) 0xC3},
    {(byte) 0xED, (byte) 0xA0, (byte) 0x80},
    {0},
    {0x1B, '[', '3', '1', 'm'},
    {(byte) 0xEF, (byte) 0xBB, (byte) 0xBF},
    {'\r'},
    {(byte) 0xE2, (byte) 0x80, (byte) 0xA8},
    {(byte) 0xC2, (byte) 0x85},
    {0x1A}
  };

  private SpoiledText() {}

  static byte[] of(byte[] bytes, Random random) {
    return switch (random.nextInt(8)) {
      case 0 -> Arrays.copyOf(bytes, random.nextInt(bytes.length));
      case 1 -> odd(bytes, random);
      case 2, 3 -> lines(bytes, random);
      case 4 -> turned(bytes, random);
      default -> letters(bytes, random);
    };
  }

  private static byte[] odd(byte[] bytes, Random random) {
    byte[] in = ODD[random.nextInt(ODD.length)];
    int at = random.nextInt(bytes.length + 1);
    byte[] spoiled = Arrays.copyOf(bytes, bytes.length + in.length);
    System.arraycopy(in, 0, spoiled, at, in.length);
    System.arraycopy(bytes, at, spoiled, at + in.length, bytes.length - at);
    return spoiled;
  }

  /** Single bits turned round, as on a bad disk. */
  private static byte[] turned(byte[] bytes, Random random) {
    byte[] spoiled = bytes.clone();
    for (int i = 0; i < 1 + random.nextInt(3); i++) {
      spoiled[random.nextInt(spoiled.length)] ^= (byte) (1 << random.nextInt(8));
    }
    return spoiled;
  }

  private static byte[] letters(byte[] bytes, Random random) {
    StringBuilder text = new StringBuilder(new String(bytes, StandardCharsets.UTF_8));
    for (int i = 0; i < 1 + random.nextInt(3); i++) {
      int at = random.nextInt(text.length());
      char c = LETTERS.charAt(random.nextInt(LETTERS.length()));
      switch (random.nextInt(3)) {
        case 0 -> text.setCharAt(at, c);
        case 1 -> text.insert(at, c);
        default -> text.deleteCharAt(at);
      }
    }
    return text.toString().getBytes(StandardCharsets.UTF_8);
  }

  private static byte[] lines(byte[] bytes, Random random) {
    String text = new String(bytes, StandardCharsets.UTF_8);
    List<String> lines = new ArrayList<>(List.of(text.split("\n", -1)));
    int at = random.nextInt(lines.size());
    switch (random.nextInt(6)) {
      case 0 -> lines.remove(at);
      case 1 -> lines.add(at, lines.get(random.nextInt(lines.size())));
      case 2 -> lines.set(at, " ".repeat(1 + random.nextInt(4)) + lines.get(at));
      case 3 -> lines.set(at, "\t" + lines.get(at));
      case 4 -> lines.set(at, lines.get(at).repeat(1 + random.nextInt(2000)));
      default -> {
        return text.replace("\n", random.nextBoolean() ? "\r\n" : "\r")
            .getBytes(StandardCharsets.UTF_8);
      }
    }
    return String.join("\n", lines).getBytes(StandardCharsets.UTF_8);
  }
}
