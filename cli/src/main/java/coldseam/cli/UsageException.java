package coldseam.cli;

/** What was typed is no command of ours, or cannot be carried out as typed. */
final class UsageException extends Exception {
  private static final long serialVersionUID = 1L;

  private final String command;

  /**
   * Says what is wrong.
   *
   * @param command the command whose help is worth reading, empty for the overview
   * @param message what is wrong; what would be right
   */
  UsageException(String command, String message) {
    super(message);
    this.command = command;
  }

  /** The command whose help is worth reading, empty for the overview. */
  String command() {
    return command;
  }
}
