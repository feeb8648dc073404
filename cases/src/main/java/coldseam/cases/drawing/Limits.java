package coldseam.cases.drawing;

/** What a drawing may have at most; more is refused with the line where it becomes too much. */
final class Limits {
  /** Bytes, unpacked. A detail of ten thousand lines has about one million. */
  static final int MOST_BYTES = 64_000_000;

  /** Characters of one line of a DXF file; the format's own limit for texts is 2,049. */
  static final int LONGEST_LINE = 16_384;

  /** Entities or elements, blocks and references unfolded. */
  static final int MOST_ITEMS = 200_000;

  /** Corners of all pieces together. */
  static final int MOST_CORNERS = 1_000_000;

  /** Blocks in blocks, groups in groups, references to references. */
  static final int DEEPEST = 64;

  /** Entities of XML that are expanded, and how long the result may be. */
  static final int MOST_ENTITIES = 10_000;

  static final int LONGEST_ENTITIES = 1_000_000;

  /** Coordinates beyond this, in units of the drawing, are nonsense. */
  static final double FARTHEST = 1e12;

  /** Chords of one curve. */
  static final int MOST_CHORDS = 20_000;

  /** Control points of one spline. */
  static final int MOST_CONTROL_POINTS = 10_000;

  private Limits() {}
}
