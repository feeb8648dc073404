package coldseam.cli.sheet;

import coldseam.cases.Case;
import coldseam.solver.detail.Accuracy;
import java.util.Optional;

/**
 * What a sheet is about.
 *
 * @param title as typed in the case
 * @param file the case file as the reader would name it
 * @param variant the variant, empty for the base case
 * @param unit the unit the case draws in
 * @param metresPerUnit metres in one of it
 * @param accuracy the half-widths asked for
 * @param version of the program
 */
public record Subject(
    String title,
    String file,
    Optional<String> variant,
    String unit,
    double metresPerUnit,
    Accuracy accuracy,
    String version) {
  /**
   * The subject of a case.
   *
   * @param from the case
   * @param file its file as the reader would name it
   * @param variant the variant, empty for the base case
   * @param accuracy the half-widths asked for
   * @param version of the program
   * @return the subject
   */
  public static Subject of(
      Case from, String file, Optional<String> variant, Accuracy accuracy, String version) {
    return new Subject(
        from.title(), file, variant, from.unit(), from.metresPerUnit(), accuracy, version);
  }
}
