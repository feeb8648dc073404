package coldseam.cli;

/** What stands under every study. */
final class Notice {
  /** The limits of what is calculated. */
  static final String SAFETY =
      "Calculated under the assumptions stated. Local codes and a licensed professional decide;\n"
          + "thermal changes to loadbearing or fire-separating parts need their approval.";

  private Notice() {}
}
