package coldseam.cli.plot;

/** The machine has no font, so that text cannot be drawn into a PNG; SVG needs none. */
public final class NoFontException extends Exception {
  private static final long serialVersionUID = 1L;

  NoFontException(Throwable cause) {
    super(
        "a PNG needs a font, and Java finds none on this machine: install fontconfig and a font"
            + " (for one fonts-dejavu-core), or use the SVG plots",
        cause);
  }
}
