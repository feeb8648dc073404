package coldseam.cases;

import coldseam.solver.detail.Assumption;
import coldseam.solver.result.Result;
import coldseam.solver.window.Window;
import coldseam.solver.window.WindowTransmittance;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/** A window file that was read without a problem. Immutable. */
public final class WindowCase {
  private final Path file;
  private final String title;
  private final LengthUnit unit;
  private final Node place;
  private final WindowDraft draft;
  private final List<Part> parts;
  private final List<Assumption> assumptions;

  /**
   * A case that the window takes figures from.
   *
   * @param name its file as typed, and its variant
   * @param from the case
   * @param variant the variant meant, empty for the base case
   */
  public record Part(String name, Case from, Optional<String> variant) {}

  WindowCase(
      Path file,
      String title,
      LengthUnit unit,
      Node place,
      WindowDraft draft,
      List<Part> parts,
      List<Assumption> assumptions) {
    this.file = file;
    this.title = title;
    this.unit = unit;
    this.place = place;
    this.draft = draft;
    this.parts = List.copyOf(parts);
    this.assumptions = List.copyOf(assumptions);
  }

  /** The file. */
  public Path file() {
    return file;
  }

  /** The title typed in it. */
  public String title() {
    return title;
  }

  /** Name of the length unit of its bare lengths: "mm", "cm", "m" or "in". */
  public String unit() {
    return unit.name();
  }

  /** Metres per length unit. */
  public double metresPerUnit() {
    return unit.metres();
  }

  /** The cases that have to be solved, each once. */
  public List<Part> parts() {
    return parts;
  }

  /** Everything chosen for the user, and which figures come from which case. */
  public List<Assumption> assumptions() {
    return assumptions;
  }

  /**
   * The window with the figures of its cases.
   *
   * @param results of {@link #parts()}, in their order
   * @return what it is made of
   * @throws CaseException if a figure does not come out of its case
   */
  public Window window(List<Result> results) throws CaseException {
    try {
      return draft.window(results);
    } catch (WindowDraft.MissingFigure | IllegalArgumentException e) {
      throw problem(e.getMessage());
    }
  }

  /**
   * U_w.
   *
   * @param window the window
   * @return U_w with its terms
   * @throws CaseException if its sizes leave no glass
   */
  public WindowTransmittance transmittance(Window window) throws CaseException {
    try {
      return window.transmittance();
    } catch (IllegalArgumentException e) {
      throw problem(e.getMessage());
    }
  }

  /**
   * What may not fit together.
   *
   * @param results of {@link #parts()}, in their order
   * @return sentences, each with its figures
   */
  public List<String> warnings(List<Result> results) {
    return draft.warnings(results);
  }

  private CaseException problem(String message) {
    return new CaseException(
        List.of(
            new Problem(file.toString(), place.line(), place.column(), message, Optional.empty())));
  }
}
