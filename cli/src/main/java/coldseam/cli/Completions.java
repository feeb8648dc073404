package coldseam.cli;

import java.util.ArrayList;
import java.util.List;

/** Scripts that complete command lines, made from the syntax that reads them. */
final class Completions {
  private static final List<String> OF_THE_PROGRAM =
      List.of("help", "--help", "--version", "--completion", "--man");

  /** What may stand in a place, by the word that stands for it in the help. */
  private enum Place {
    FOLDER,
    FILE,
    CASE,
    DRAWING,
    WORD;

    static Place of(String shown) {
      for (Place place : List.of(FOLDER, FILE, CASE, DRAWING)) {
        if (shown.contains(place.name())) {
          return place;
        }
      }
      return shown.contains("BUILDING") ? CASE : WORD;
    }
  }

  private final List<Syntax> commands;

  /**
   * Prepares.
   *
   * @param commands every command
   */
  Completions(List<Syntax> commands) {
    this.commands = List.copyOf(commands);
  }

  /**
   * The script for a shell.
   *
   * @param shell {@code bash} or {@code zsh}
   * @return the script
   * @throws UsageException if there is none for it
   */
  String script(String shell) throws UsageException {
    return switch (shell) {
      case "bash" -> bash();
      case "zsh" -> zsh();
      default ->
          throw new UsageException(
              "", "there is no completion for " + shell + "; name bash or zsh");
    };
  }

  private List<String> names() {
    List<String> names = new ArrayList<>();
    for (Syntax command : commands) {
      names.add(command.command());
    }
    return names;
  }

  private String bash() {
    StringBuilder cases = new StringBuilder();
    for (Syntax command : commands) {
      List<String> options = new ArrayList<>();
      StringBuilder values = new StringBuilder();
      for (Syntax.Option option : command.all()) {
        options.add(option.name());
        if (!option.value().isEmpty()) {
          values.append("        ").append(option.name()).append(") place=");
          values.append(Place.of(option.value())).append(" ;;\n");
        }
      }
      cases.append("    ").append(command.command()).append(")\n");
      cases.append("      options='").append(String.join(" ", options)).append("'\n");
      cases.append("      operands=").append(Place.of(command.operands())).append('\n');
      if (!values.isEmpty()) {
        cases.append("      case $before in\n").append(values).append("      esac\n");
      }
      cases.append("      ;;\n");
    }
    return BASH.replace("@version", Main.VERSION)
        .replace("@names", String.join(" ", names()))
        .replace("@program", String.join(" ", OF_THE_PROGRAM))
        .replace("@commands\n", cases);
  }

  /** Bash 3.2 or newer. An equals sign is a word of its own there. */
  private static final String BASH =
      """
      # Completion of coldseam @version for bash.
      _coldseam_files() {
        local start=$1 name ending
        shift
        while IFS= read -r name; do COMPREPLY+=("$name"); done < <(compgen -d -- "$start")
        for ending in "$@"; do
          while IFS= read -r name; do COMPREPLY+=("$name"); done \\
            < <(compgen -f -X "!*.$ending" -- "$start")
        done
      }

      _coldseam() {
        local word=${COMP_WORDS[COMP_CWORD]} before=${COMP_WORDS[COMP_CWORD-1]}
        local options= operands=WORD place= name
        COMPREPLY=()
        if [ "$word" = = ]; then
          word=
        elif [ "$before" = = ]; then
          before=${COMP_WORDS[COMP_CWORD-2]}
        fi
        if [ "$COMP_CWORD" -eq 1 ]; then
          COMPREPLY=($(compgen -W '@names @program' -- "$word"))
          return
        fi
        case ${COMP_WORDS[1]} in
          help) COMPREPLY=($(compgen -W '@names' -- "$word")); return ;;
          --completion) COMPREPLY=($(compgen -W 'bash zsh' -- "$word")); return ;;
      @commands
        esac
        if [ -z "$place" ] && [ "${word#-}" != "$word" ]; then
          COMPREPLY=($(compgen -W "$options" -- "$word"))
          return
        fi
        case ${place:-$operands} in
          FOLDER) _coldseam_files "$word" ;;
          FILE) while IFS= read -r name; do COMPREPLY+=("$name"); done < <(compgen -f -- "$word") ;;
          CASE) _coldseam_files "$word" yaml yml ;;
          DRAWING) _coldseam_files "$word" svg SVG dxf DXF ;;
        esac
      }
      complete -o filenames -F _coldseam coldseam
      """;

  private String zsh() {
    StringBuilder described = new StringBuilder();
    StringBuilder cases = new StringBuilder();
    for (Syntax command : commands) {
      described.append("    ").append(quoted(command.command() + ":" + command.summary()));
      described.append('\n');
      cases.append("    ").append(command.command()).append(")\n      _arguments -s");
      for (Syntax.Option option : command.all()) {
        String spec =
            (option.again() ? "*" : "") + option.name() + (option.value().isEmpty() ? "" : "=");
        spec += "[" + round(option.meaning()) + "]";
        if (!option.value().isEmpty()) {
          spec += ":" + option.value() + ":" + zsh(option.value());
        }
        cases.append(" \\\n        ").append(quoted(spec));
      }
      String operands = command.operands();
      if (!operands.isEmpty()) {
        cases.append(" \\\n        ");
        cases.append(quoted("*:" + round(operands) + ":" + zsh(operands)));
      }
      cases.append("\n      ;;\n");
    }
    return ZSH.replace("@version", Main.VERSION)
        .replace("@names", String.join(" ", names()))
        .replace("@program", String.join(" ", OF_THE_PROGRAM))
        .replace("@described\n", described)
        .replace("@commands\n", cases);
  }

  private static String zsh(String shown) {
    return switch (Place.of(shown)) {
      case FOLDER -> "_files -/";
      case FILE -> "_files";
      case CASE -> "_files -g \"*.(yaml|yml)\"";
      case DRAWING -> "_files -g \"*.(svg|SVG|dxf|DXF)\"";
      case WORD -> " ";
    };
  }

  /** Brackets have a meaning of their own where an option is described. */
  private static String round(String words) {
    return words.replace('[', '(').replace(']', ')');
  }

  private static String quoted(String words) {
    return "'" + words.replace("'", "'\\''") + "'";
  }

  private static final String ZSH =
      """
      #compdef coldseam
      # Completion of coldseam @version for zsh.
      _coldseam() {
        local -a commands
        commands=(
      @described
        )
        if (( CURRENT == 2 )); then
          _describe -t commands command commands
          compadd -- @program
          return
        fi
        local command=$words[2]
        shift words
        (( CURRENT-- ))
        case $command in
          help) compadd -- @names ;;
          --completion) compadd -- bash zsh ;;
      @commands
        esac
      }

      if [ "$funcstack[1]" = _coldseam ]; then
        _coldseam "$@"
      else
        compdef _coldseam coldseam
      fi
      """;
}
