package coldseam.cli.spoiled;

import java.util.List;
import java.util.Locale;
import java.util.Random;

/** What is put in place of a value: numbers a little off or far off, words that mean something. */
final class Nonsense {
  private static final List<String> WORDS =
      List.of(
          "",
          "~",
          "true",
          "nonsense",
          ".nan",
          "-.inf",
          "NaN",
          "Infinity",
          "9^9^9",
          "1/0",
          "sqrt(-1)",
          "12 mm",
          "0.04 W/(m K)",
          "68 F",
          "R-13",
          "5 %",
          "((((",
          "1'-4 5/8\"",
          "tan(90)",
          "2,5",
          "0x10",
          "a b c",
          "ψ",
          "5/0 in",
          "hollow",
          "indoors",
          "outdoors",
          "../../../etc/passwd",
          "/etc/passwd",
          "C:\\con",
          "file:///etc/passwd",
          "http://example.org/x.svg",
          "%s%n%d",
          "${jndi:ldap://x}",
          "\u0000",
          "\uD800",
          "\u202E",
          "\uFEFF",
          "𝛙",
          "TODO it",
          "left",
          "top");

  private static final List<String> NUMBERS =
      List.of(
          "0",
          "-0",
          "1",
          "-1",
          "2",
          "1e308",
          "-1e308",
          "1e-308",
          "4.9e-324",
          "1e-300",
          "1e15",
          "1e9",
          "2147483647",
          "2147483648",
          "-2147483649",
          "9223372036854775808",
          "1e-5",
          "1e-9",
          "0.1",
          "360",
          "90",
          "1e5",
          "1e400",
          "00012",
          "1_000",
          "+5",
          ".5",
          "5.",
          "1e",
          "--1");

  /** Shifts that decide whether two corners are one, in mm and in m. */
  private static final double[] HAIRS = {
    1e-13, 1e-9, 1e-6, 1e-5, 1.1e-5, 1e-4, 1e-3, 1.1e-3, 0.01, 0.1, 1, 10
  };

  private Nonsense() {}

  static String word(Random random) {
    return random.nextInt(3) == 0
        ? NUMBERS.get(random.nextInt(NUMBERS.size()))
        : WORDS.get(random.nextInt(WORDS.size()));
  }

  /** Another number in place of one; something else in place of what is none. */
  static String instead(Random random, String text) {
    double number;
    try {
      number = Double.parseDouble(text.strip());
    } catch (NumberFormatException e) {
      return word(random);
    }
    return switch (random.nextInt(9)) {
      case 0 -> NUMBERS.get(random.nextInt(NUMBERS.size()));
      case 1 -> word(random);
      case 2 -> plain(-number);
      case 3 -> plain(number * Math.pow(10, random.nextInt(13) - 6));
      case 4 -> plain(number * (1 + 1e-9 * random.nextGaussian()));
      case 5 -> plain(number * random.nextDouble() * 2);
      case 6 -> plain(number + random.nextInt(2001) - 1000);
      default ->
          plain(number + (random.nextBoolean() ? 1 : -1) * HAIRS[random.nextInt(HAIRS.length)]);
    };
  }

  private static String plain(double number) {
    return number == Math.rint(number) && Math.abs(number) < 1e15
        ? String.format(Locale.ROOT, "%.0f", number)
        : Double.toString(number);
  }
}
