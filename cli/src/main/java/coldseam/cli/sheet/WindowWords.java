package coldseam.cli.sheet;

import coldseam.solver.window.WindowTransmittance.Kind;

/** What the terms of a window are called, the same on every sheet. */
final class WindowWords {
  private WindowWords() {}

  static String name(Kind kind) {
    return switch (kind) {
      case GLAZING -> "glazing";
      case PANEL -> "panel";
      case FRAME -> "frame";
      case EDGE -> "edge";
      case BARS -> "bars";
      case INSTALLATION -> "installation";
    };
  }
}
