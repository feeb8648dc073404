package coldseam.cli;

import coldseam.cli.text.Table;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * What may follow a command's name: its options and operands. The same description reads a command
 * line and writes the help, so that they cannot differ.
 *
 * <p>Written here because a library for it takes nearly as long to start as Java itself.
 *
 * @param command its name
 * @param summary what it does, one line
 * @param operands how the operands are shown, e.g. {@code CASE…}
 * @param least operands at least
 * @param description what it does, in a few sentences
 * @param options its options
 * @param examples command lines, each with what it does
 */
record Syntax(
    String command,
    String summary,
    String operands,
    int least,
    String description,
    List<Option> options,
    List<Example> examples) {
  private static final int PAGE = 84;

  /** Options of every command. */
  private static final Option HELP = new Option("--help", "", "show this help");

  /**
   * An option.
   *
   * @param name with its two dashes
   * @param value how its value is shown, empty if it has none
   * @param meaning what it does
   * @param again whether it may be given more than once
   */
  record Option(String name, String value, String meaning, boolean again) {
    Option(String name, String value, String meaning) {
      this(name, value, meaning, false);
    }
  }

  /**
   * A command line worth showing.
   *
   * @param line what to type
   * @param meaning what it does
   */
  record Example(String line, String meaning) {}

  /** What was typed after the command's name. */
  static final class Typed {
    private final Map<String, List<String>> options;
    private final List<String> operands;

    Typed(Map<String, List<String>> options, List<String> operands) {
      this.options = Map.copyOf(options);
      this.operands = List.copyOf(operands);
    }

    /** Whether an option was given. */
    boolean has(String option) {
      return options.containsKey(option);
    }

    /** The value of an option that was given. */
    String value(String option) {
      return options.get(option).get(0);
    }

    /** Every value of an option, in the order given; none if it was not given. */
    List<String> values(String option) {
      return options.getOrDefault(option, List.of());
    }

    /** Everything that is no option. */
    List<String> operands() {
      return operands;
    }
  }

  /**
   * Reads a command line. {@code --name value} and {@code --name=value} are the same; after {@code
   * --} nothing is an option.
   *
   * @param words what follows the command's name
   * @return options and operands
   * @throws UsageException at the first word that does not fit
   */
  Typed read(List<String> words) throws UsageException {
    Map<String, List<String>> given = new HashMap<>();
    List<String> rest = new ArrayList<>();
    boolean open = true;
    for (int i = 0; i < words.size(); i++) {
      String word = words.get(i);
      if (open && word.equals("--")) {
        open = false;
      } else if (open && word.length() > 1 && word.startsWith("-")) {
        int equals = word.indexOf('=');
        Option option = option(equals < 0 ? word : word.substring(0, equals));
        String value = equals < 0 ? "" : word.substring(equals + 1);
        if (option.value.isEmpty() && equals >= 0) {
          throw wrong(option.name + " takes no value");
        }
        if (!option.value.isEmpty() && equals < 0) {
          if (++i == words.size()) {
            throw wrong(option.name + " needs a value: " + option.name + " " + option.value);
          }
          value = words.get(i);
        }
        List<String> before = given.get(option.name);
        if (before == null) {
          before = new ArrayList<>();
          given.put(option.name, before);
        } else if (!option.again) {
          throw wrong(option.name + " is given twice");
        }
        before.add(value);
      } else {
        rest.add(word);
      }
    }
    if (!given.containsKey(HELP.name) && rest.size() < least) {
      throw wrong("needs " + operands + ": " + examples.get(0).line);
    }
    return new Typed(given, rest);
  }

  private Option option(String typed) throws UsageException {
    if (typed.equals("-h")) {
      return HELP;
    }
    List<String> names = new ArrayList<>();
    for (Option option : options) {
      if (option.name.equals(typed)) {
        return option;
      }
      names.add(option.name);
    }
    if (typed.equals(HELP.name)) {
      return HELP;
    }
    names.add(HELP.name);
    throw wrong(
        Nearest.of(typed, names)
            .map(near -> "there is no option " + typed + "; did you mean " + near + "?")
            .orElse("there is no option " + typed + "; there are " + String.join(", ", names)));
  }

  /** Every option, {@code --help} last. */
  List<Option> all() {
    List<Option> all = new ArrayList<>(options);
    all.add(HELP);
    return all;
  }

  private UsageException wrong(String message) {
    return new UsageException(command, message);
  }

  /** The help text. */
  String help() {
    StringBuilder text = new StringBuilder();
    text.append("coldseam ").append(command).append(": ").append(summary).append("\n\n");
    text.append("  cli/coldseam ").append(command).append(" [OPTION…] ").append(operands);
    text.append("\n\n").append(Table.wrapped(description, PAGE, "")).append("\n\nOptions\n");
    Table table = new Table("ll", 2, PAGE);
    for (Option option : all()) {
      table.row((option.name + " " + option.value).strip(), option.meaning);
    }
    text.append(table.text()).append('\n');
    text.append(examples.size() == 1 ? "Example\n" : "Examples\n");
    for (Example example : examples) {
      text.append("  ").append(example.line).append('\n');
      text.append("      ").append(Table.wrapped(example.meaning, PAGE - 6, "      "));
      text.append('\n');
    }
    return text.toString();
  }
}
