package coldseam.cli.text;

import java.util.Collection;

/**
 * What a card or a sheet says, piece by piece. The pieces are the same for a terminal and for a
 * page; how they are set is the business of whoever takes them. Words may carry {@link Ink}.
 */
public interface Manuscript {
  /**
   * Begins.
   *
   * @param title what it is about
   * @param below where it comes from
   */
  void title(String title, String below);

  /**
   * Begins a part.
   *
   * @param name of the part
   * @param note what holds for all of it, such as units; may be empty
   */
  void heading(String name, String note);

  /** Begins a part that needs attention. */
  void alertHeading(String name);

  /** Sets a table; an empty one leaves nothing. */
  void table(Table table);

  /** Sets a paragraph. */
  void paragraph(String words);

  /** Sets a paragraph that stands back. */
  void note(String words);

  /** Sets lines under a heading of their own that need attention. */
  void alerts(String heading, Collection<String> lines);

  /** Sets lines that need attention, each a point of its own. */
  void alerts(Collection<String> lines);

  /** Sets lines under the source that they come from. */
  void sourced(String source, Collection<String> lines);

  /** Sets the lines at the end. */
  void foot(String... lines);
}
