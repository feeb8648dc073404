package coldseam.cases;

import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fault;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** A case file that was read without a problem. Immutable. */
public interface Case {
  /** The file. */
  Path file();

  /** The title typed in it. */
  String title();

  /** What is typed in it for its sheet. */
  TitleBlock titleBlock();

  /** Names of its variants in the order written. */
  List<String> variants();

  /**
   * The detail of the base case or of a variant.
   *
   * @param variant a name of {@link #variants()}, empty for the base case
   * @return the detail
   * @throws CaseException if the variant's changes do not make a valid case
   */
  Detail detail(Optional<String> variant) throws CaseException;

  /**
   * Places in the drawings used that the reader should look at.
   *
   * @param variant a name of {@link #variants()}, empty for the base case
   * @return in the order found; none of a case without drawings
   */
  List<Doubt> doubts(Optional<String> variant);

  /**
   * The detail of the base case or of a variant with something changed in it. May be called from
   * several threads at once.
   *
   * @param variant a name of {@link #variants()}, empty for the base case
   * @param changes named values and fills to replace
   * @return the detail
   * @throws CaseException if there is no such value or fill, or the changes do not make a valid
   *     case
   */
  Detail detail(Optional<String> variant, Changes changes) throws CaseException;

  /**
   * The named values of the base case or of a variant.
   *
   * @param variant a name of {@link #variants()}, empty for the base case
   * @return name and what is written there, in the order written
   */
  Map<String, String> values(Optional<String> variant);

  /**
   * What a variant changes.
   *
   * @param variant a name of {@link #variants()}
   * @return a few words for each change: {@code insulation = 200}
   */
  List<String> changes(String variant);

  /**
   * What it costs, as typed: no number of ours.
   *
   * @param variant a name of {@link #variants()}, empty for the base case
   * @return the text, or empty if none is typed for this one
   */
  Optional<String> cost(Optional<String> variant);

  /** Every file that was read for it: its own first, then cases it subtracts and drawings. */
  List<Path> files();

  /** The accuracy asked for in the case, the standard one where it says nothing. */
  Accuracy accuracy();

  /** What it expects of itself. */
  List<Expectation> expectations();

  /** Name of the length unit that the case draws in: "mm", "cm", "m" or "in". */
  String unit();

  /** Metres per length unit. */
  double metresPerUnit();

  /**
   * Puts a fault that the solver found in its place in the file.
   *
   * @param fault the fault
   * @return the problem with line and column where the thing at fault is written
   */
  Problem locate(Fault fault);
}
