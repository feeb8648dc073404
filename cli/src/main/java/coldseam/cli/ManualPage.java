package coldseam.cli;

import java.util.List;
import java.util.Locale;

/** The manual page in the macros of man(7), made from the help of every command. */
final class ManualPage {
  /** Each exit code and its meaning, in turn. */
  private static final List<String> CODES =
      List.of(
          Integer.toString(ExitCode.DONE),
          "done",
          Integer.toString(ExitCode.NOT_MET),
          "done, but a stated requirement is not met",
          Integer.toString(ExitCode.BAD_INPUT),
          "bad input or usage; nothing was done",
          Integer.toString(ExitCode.ACCURACY),
          "done, but the accuracy asked for was not reached",
          Integer.toString(ExitCode.DEFECT),
          "a defect of the program");

  /** Environment variables that are heeded and what they do, in turn. */
  private static final List<String> ENVIRONMENT =
      List.of(
          "JAVA_HOME",
          "where Java is; without it, the java on the path",
          "COLDSEAM_JAVA_OPTIONS",
          "passed on to Java, e.g. -Xmx8g",
          Failure.TRACE,
          "if set, a defect of the program prints its trace",
          "NO_COLOR",
          "if set, no colours",
          "XDG_CACHE_HOME",
          "where loaded classes are kept if the folder of the program cannot be written");

  private final StringBuilder text = new StringBuilder();

  /**
   * Writes the page.
   *
   * @param commands every command
   * @return roff
   */
  static String of(List<Syntax> commands) {
    return new ManualPage().page(commands);
  }

  private String page(List<Syntax> commands) {
    text.append(".TH COLDSEAM 1 \"\" \"coldseam ").append(plain(Main.VERSION)).append("\"\n");
    section("NAME");
    line("coldseam - " + Main.PURPOSE);
    section("SYNOPSIS");
    for (Syntax command : commands) {
      text.append(".B coldseam ").append(plain(command.command())).append('\n');
      line("[" + "OPTION\u2026] " + command.operands());
      text.append(".br\n");
    }
    section("DESCRIPTION");
    line(
        "A case is a text file that draws one cross-section, with its materials, the spaces on"
            + " either side and the results wanted. Every number that can be proved comes with an"
            + " interval that contains the exact answer to the problem as stated.");
    for (Syntax command : commands) {
      describe(command);
    }
    section("EXIT STATUS");
    pairs(CODES);
    section("ENVIRONMENT");
    pairs(ENVIRONMENT);
    section("EXAMPLES");
    for (Syntax command : commands) {
      for (Syntax.Example example : command.examples()) {
        String typed = Surroundings.named(example.line(), "coldseam");
        text.append(".TP\n.B ").append(plain(typed)).append('\n');
        line(example.meaning());
      }
    }
    section("NOTES");
    line(
        "Results are calculated under the assumptions stated with them. Local codes and a licensed"
            + " professional decide. Thermal changes to loadbearing or fire-separating parts need"
            + " their approval.");
    section("COPYING");
    line("Apache License, Version 2.0. coldseam --version tells the libraries and their licences.");
    return text.toString();
  }

  private void describe(Syntax command) {
    text.append(".SH COLDSEAM ").append(plain(command.command().toUpperCase(Locale.ROOT)));
    text.append('\n');
    text.append(".B coldseam ").append(plain(command.command())).append('\n');
    line("[OPTION\u2026] " + command.operands());
    text.append(".PP\n");
    line(Surroundings.named(command.description(), "coldseam"));
    for (Syntax.Option option : command.all()) {
      text.append(".TP\n.B ").append(plain(option.name())).append('\n');
      if (!option.value().isEmpty()) {
        text.setLength(text.length() - 1);
        text.append(" \\fI").append(plain(option.value())).append("\\fR\n");
      }
      line(option.meaning());
    }
  }

  private void section(String name) {
    text.append(".SH ").append(name).append('\n');
  }

  private void pairs(List<String> pairs) {
    for (int i = 0; i < pairs.size(); i += 2) {
      text.append(".TP\n.B ").append(plain(pairs.get(i))).append('\n');
      line(pairs.get(i + 1));
    }
  }

  private void line(String words) {
    text.append(plain(words)).append('\n');
  }

  /** Words as roff sets them: nothing in them is a request or an escape. */
  private static String plain(String words) {
    StringBuilder out = new StringBuilder();
    for (int i = 0; i < words.length(); i += Character.charCount(words.codePointAt(i))) {
      int c = words.codePointAt(i);
      if (i == 0 && (c == '.' || c == '\'')) {
        out.append("\\&");
      }
      switch (c) {
        case '\\' -> out.append("\\e");
        case '-' -> out.append("\\-");
        case '"' -> out.append("\\(dq");
        case '\'' -> out.append("\\(aq");
        case '`' -> out.append("\\(ga");
        case '^' -> out.append("\\(ha");
        case '~' -> out.append("\\(ti");
        case '\n' -> out.append(' ');
        default -> {
          if (c < 0x7f) {
            out.append((char) c);
          } else {
            String hex = Integer.toHexString(c).toUpperCase(Locale.ROOT);
            out.append("\\[u").append("0".repeat(Math.max(0, 4 - hex.length()))).append(hex);
            out.append(']');
          }
        }
      }
    }
    return out.toString();
  }
}
