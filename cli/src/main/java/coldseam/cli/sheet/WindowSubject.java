package coldseam.cli.sheet;

import coldseam.solver.detail.Assumption;
import coldseam.solver.window.Window;
import coldseam.solver.window.WindowTransmittance;
import java.util.List;

/**
 * A window and its U_w.
 *
 * @param subject title, file and units of the window file
 * @param window what it is made of
 * @param transmittance U_w and its terms
 * @param parts the cases that were solved for it
 * @param assumptions everything chosen for the user
 * @param warnings sentences, each with its figures
 */
public record WindowSubject(
    Subject subject,
    Window window,
    WindowTransmittance transmittance,
    List<Part> parts,
    List<Assumption> assumptions,
    List<String> warnings) {
  /**
   * A case that was solved for the window.
   *
   * @param name file and variant as typed in the window file
   * @param reached whether the accuracy asked for was reached
   * @param unknowns of its temperature problem
   */
  public record Part(String name, boolean reached, int unknowns) {}

  /** Copies the lists. */
  public WindowSubject {
    parts = List.copyOf(parts);
    assumptions = List.copyOf(assumptions);
    warnings = List.copyOf(warnings);
  }
}
