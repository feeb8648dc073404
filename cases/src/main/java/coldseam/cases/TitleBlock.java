package coldseam.cases;

import java.util.Optional;

/**
 * What is typed in a case for the sheet that goes into the project's file. Nothing of it bears on a
 * result.
 *
 * @param project the building or commission
 * @param number of the detail in the project
 * @param revision of the detail
 * @param date of the sheet, as {@code 2026-11-30}
 * @param author who made the case
 * @param checkedBy who checked it
 * @param question what the sheet is to answer
 */
public record TitleBlock(
    Optional<String> project,
    Optional<String> number,
    Optional<String> revision,
    Optional<String> date,
    Optional<String> author,
    Optional<String> checkedBy,
    Optional<String> question) {
  /** Nothing typed. */
  public static final TitleBlock EMPTY =
      new TitleBlock(
          Optional.empty(),
          Optional.empty(),
          Optional.empty(),
          Optional.empty(),
          Optional.empty(),
          Optional.empty(),
          Optional.empty());
}
