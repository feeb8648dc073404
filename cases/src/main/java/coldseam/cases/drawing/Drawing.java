package coldseam.cases.drawing;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.zip.GZIPInputStream;

/**
 * A drawing as read: its pieces, and what was left out. Lengths in units of the drawing.
 *
 * @param pieces lines and filled outlines in the order drawn
 * @param unit the unit that the file names; for an SVG page with a size on paper, millimetres
 * @param onPaper whether that unit is one of a sheet of paper, which may be drawn to a scale
 * @param leftOut what is no part of the section as read
 * @param remarks what else the file says of itself, sentences
 * @param extent its larger dimension
 * @param deviation how far chords may be from their curves
 */
public record Drawing(
    List<Piece> pieces,
    Optional<DrawingUnit> unit,
    boolean onPaper,
    List<LeftOut> leftOut,
    List<String> remarks,
    double extent,
    double deviation) {
  /** Copies the lists. */
  public Drawing {
    pieces = List.copyOf(pieces);
    leftOut = List.copyOf(leftOut);
    remarks = List.copyOf(remarks);
  }

  /**
   * Reads an SVG file, packed or not, or an ASCII DXF file; its content says which.
   *
   * @param file the file
   * @param deviation how far chords may be from their curves; a 20,000th of the drawing's larger
   *     dimension unless stated
   * @return the drawing
   * @throws DrawingException if it cannot be read, with the line
   */
  public static Drawing read(Path file, OptionalDouble deviation) throws DrawingException {
    byte[] bytes = unpacked(bytes(file));
    return markup(bytes) ? svg(bytes, deviation) : dxf(bytes, deviation);
  }

  /**
   * The drawing without some of its layers.
   *
   * @param layers their names
   */
  public Drawing without(List<String> layers) {
    if (layers.isEmpty()) {
      return this;
    }
    List<Piece> kept = new ArrayList<>();
    for (Piece piece : pieces) {
      if (!layers.contains(piece.layer())) {
        kept.add(piece);
      }
    }
    return new Drawing(kept, unit, onPaper, leftOut, remarks, extent, deviation);
  }

  private static Drawing dxf(byte[] bytes, OptionalDouble asked) throws DrawingException {
    DxfReader reader = new DxfReader(bytes);
    Tracing rough = Tracing.rough();
    new DxfUnfolding(reader, rough, new LeftOuts()).all();
    double deviation = deviation(rough, asked);
    Tracing fine = Tracing.fine(deviation);
    LeftOuts leftOut = new LeftOuts();
    new DxfUnfolding(reader, fine, leftOut).all();
    return new Drawing(
        fine.pieces(),
        reader.unit(),
        false,
        leftOut.all(),
        reader.remarks(),
        rough.extent(),
        deviation);
  }

  private static Drawing svg(byte[] bytes, OptionalDouble asked) throws DrawingException {
    LeftOuts leftOut = new LeftOuts();
    SvgTree tree = SvgTree.read(bytes, leftOut);
    SvgPage page = SvgPage.of(tree.root());
    Tracing rough = Tracing.rough();
    new SvgUnfolding(tree, page, rough, new LeftOuts()).all();
    double deviation = deviation(rough, asked);
    Tracing fine = Tracing.fine(deviation);
    new SvgUnfolding(tree, page, fine, leftOut).all();
    return new Drawing(
        fine.pieces(), page.unit(), true, leftOut.all(), List.of(), rough.extent(), deviation);
  }

  private static double deviation(Tracing rough, OptionalDouble asked) {
    double usual = Math.max(rough.extent() * Tracing.STANDARD_DEVIATION, Double.MIN_NORMAL);
    return asked.orElse(usual);
  }

  private static byte[] bytes(Path file) throws DrawingException {
    if (Files.isDirectory(file)) {
      throw new DrawingException(0, "this is a folder, not a drawing", "name an SVG or DXF file");
    }
    if (!Files.exists(file)) {
      throw new DrawingException(0, "there is no such file", "check the path");
    }
    if (!Files.isRegularFile(file)) {
      throw new DrawingException(0, "this is no ordinary file", "name an SVG or DXF file");
    }
    try (InputStream in = Files.newInputStream(file)) {
      return limited(in);
    } catch (IOException e) {
      throw new DrawingException(
          0, "this file cannot be read", "check that it is a file you may read");
    }
  }

  private static byte[] limited(InputStream in) throws IOException, DrawingException {
    byte[] bytes = in.readNBytes(Limits.MOST_BYTES + 1);
    if (bytes.length > Limits.MOST_BYTES) {
      throw new DrawingException(
          0,
          "this drawing is larger than " + Limits.MOST_BYTES / 1_000_000 + " MB",
          "export the detail alone");
    }
    if (bytes.length == 0) {
      throw new DrawingException(0, "this file is empty", "name an SVG or DXF file");
    }
    return bytes;
  }

  private static byte[] unpacked(byte[] bytes) throws DrawingException {
    if (bytes.length < 2 || bytes[0] != 0x1F || bytes[1] != (byte) 0x8B) {
      return bytes;
    }
    try (InputStream in = new GZIPInputStream(new ByteArrayInputStream(bytes))) {
      return limited(in);
    } catch (IOException e) {
      throw new DrawingException(0, "this packed file is damaged", "save it again");
    }
  }

  /** Whether the first thing in the file is a tag, in an encoding of one or of two bytes. */
  private static boolean markup(byte[] bytes) {
    for (int i = 0; i < Math.min(bytes.length, 4096); i++) {
      int b = bytes[i] & 0xFF;
      boolean skipped = b <= 32 || b == 0xEF || b == 0xBB || b == 0xBF || b == 0xFE || b == 0xFF;
      if (!skipped) {
        return b == '<';
      }
    }
    return false;
  }
}
