package coldseam.cases.study;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.Changes;
import coldseam.cases.Problem;
import coldseam.solver.detail.Accuracy;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** One or two axes over a case: every combination is a point. Immutable. */
public final class Sweep {
  /** A larger sweep is refused. */
  private static final int MOST_POINTS = 100_000;

  /** Characters of a key: enough that no two studies share one by chance. */
  private static final int KEY_LENGTH = 16;

  private final Case from;
  private final Optional<String> variant;
  private final List<Axis> axes;
  private final List<Point> points;

  private Sweep(Case from, Optional<String> variant, List<Axis> axes, List<Point> points) {
    this.from = from;
    this.variant = variant;
    this.axes = List.copyOf(axes);
    this.points = List.copyOf(points);
  }

  /**
   * Lays out a sweep.
   *
   * @param from the case
   * @param variant of it, empty for the base case
   * @param axes one or two; the last one changes fastest
   * @return the sweep
   * @throws StudyException if there are other than one or two axes, twice the same, or too many
   *     points
   */
  public static Sweep of(Case from, Optional<String> variant, List<Axis> axes)
      throws StudyException {
    if (axes.isEmpty() || axes.size() > 2) {
      throw new StudyException("one or two values can be set at a time, not " + axes.size());
    }
    if (axes.size() == 2 && axes.get(0).name().equals(axes.get(1).name())) {
      throw new StudyException(axes.get(0).name() + " is set twice; give it one range or list");
    }
    long count = 1;
    for (Axis axis : axes) {
      count *= axis.settings().size();
    }
    if (count > MOST_POINTS) {
      throw new StudyException(
          count + " combinations are too many; at most " + MOST_POINTS + " are solved at a time");
    }
    List<Point> points = new ArrayList<>();
    for (int i = 0; i < count; i++) {
      points.add(point(i, axes));
    }
    return new Sweep(from, variant, axes, points);
  }

  private static Point point(int index, List<Axis> axes) {
    Map<String, String> settings = new LinkedHashMap<>();
    Map<String, String> values = new LinkedHashMap<>();
    Map<String, String> fills = new LinkedHashMap<>();
    int block = 1;
    for (Axis axis : axes) {
      block *= axis.settings().size();
    }
    int rest = index;
    for (Axis axis : axes) {
      block /= axis.settings().size();
      String setting = axis.settings().get(rest / block);
      rest %= block;
      settings.put(axis.name(), setting);
      (axis.fill() ? fills : values).put(axis.name(), setting);
    }
    return new Point(index, settings, new Changes(values, fills));
  }

  /** The case. */
  public Case from() {
    return from;
  }

  /** The variant that everything else is as in; empty for the base case. */
  public Optional<String> variant() {
    return variant;
  }

  /** The axes, the last one changes fastest. */
  public List<Axis> axes() {
    return axes;
  }

  /** Every combination. */
  public List<Point> points() {
    return points;
  }

  /**
   * Reads the case at each of some points; nothing is solved.
   *
   * @param some the points
   * @param threads how many are read at a time
   * @throws CaseException with everything that is wrong at the first point that is at fault
   * @throws IOException never; as any study
   */
  public void check(List<Point> some, int threads) throws CaseException, IOException {
    CaseException[] first = new CaseException[1];
    int[] least = {Integer.MAX_VALUE};
    Study.run(
        some,
        threads,
        this::fault,
        (point, fault) -> {
          if (fault.isPresent() && point.index() < least[0]) {
            least[0] = point.index();
            first[0] = fault.get();
          }
        });
    if (first[0] != null) {
      throw first[0];
    }
  }

  private Optional<CaseException> fault(Point point) {
    try {
      from.detail(variant, point.changes());
      return Optional.empty();
    } catch (CaseException e) {
      return Optional.of(e);
    }
  }

  /**
   * What tells whether a line was made by this program from this case, variant and accuracy: any
   * change of them gives another key, a change of the axes does not.
   *
   * @param accuracy the half-widths asked for
   * @param version of the program
   * @return a word of hexadecimal digits
   * @throws CaseException if a file cannot be read again
   */
  public String key(Accuracy accuracy, String version) throws CaseException {
    try {
      MessageDigest digest = MessageDigest.getInstance("SHA-256");
      add(digest, version);
      add(digest, variant.isPresent() ? "variant " + variant.get() : "base case");
      add(digest, accuracy.toString());
      for (Path file : from.files()) {
        byte[] content = Files.readAllBytes(file);
        add(digest, Integer.toString(content.length));
        digest.update(content);
      }
      return HexFormat.of().formatHex(digest.digest()).substring(0, KEY_LENGTH);
    } catch (IOException e) {
      String file = from.file().toString();
      throw new CaseException(
          List.of(
              new Problem(
                  file, 0, 0, "it cannot be read any more: " + e.getMessage(), Optional.empty())));
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java has SHA-256", e);
    }
  }

  private static void add(MessageDigest digest, String text) {
    digest.update(text.getBytes(StandardCharsets.UTF_8));
    digest.update((byte) 0);
  }
}
