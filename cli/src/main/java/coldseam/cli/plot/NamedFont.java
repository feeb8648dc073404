package coldseam.cli.plot;

import java.awt.Font;
import java.text.AttributedCharacterIterator.Attribute;
import java.util.Map;

/**
 * A logical font that tells its family by its name. The one above it asks the machine for all its
 * fonts first, which takes as long as writing a whole plot, and in vain for an SVG.
 */
final class NamedFont extends Font {
  private static final long serialVersionUID = 1L;

  /**
   * A face.
   *
   * @param name of a logical font
   * @param style plain or bold
   * @param size points
   */
  NamedFont(String name, int style, float size) {
    this(new Font(name, style, 1).deriveFont(size));
  }

  private NamedFont(Font font) {
    super(font);
  }

  @Override
  public String getFamily() {
    return getName();
  }

  @Override
  public Font deriveFont(Map<? extends Attribute, ?> attributes) {
    return new NamedFont(super.deriveFont(attributes));
  }
}
