package coldseam.cli.sheet;

import coldseam.cli.text.Ink;
import coldseam.cli.text.Table;
import coldseam.cli.text.TerminalText;
import coldseam.solver.Solver;
import coldseam.solver.detail.Assumption;
import coldseam.solver.result.Result;
import java.util.List;

/** Writes a result for people and for machines, and what is understood of a case before solving. */
public final class Sheet {
  private static final int PAGE = 92;

  private Sheet() {}

  /** The limits of what is calculated, for the foot of whatever is printed; several lines. */
  public static String safety() {
    return Table.wrapped(Words.SAFETY, PAGE, "");
  }

  /**
   * The card for the terminal, at most 92 columns wide unless a name is very long.
   *
   * @param subject what it is about
   * @param result the result
   * @param ink colours, or none
   * @return lines, each ended by a line feed
   */
  public static String card(Subject subject, Result result, Ink ink) {
    TerminalText text = new TerminalText(ink, TextCard.PAGE);
    new TextCard(subject, result, ink, text).write();
    return text.text();
  }

  /**
   * The result as one JSON object; {@code result.schema.json} beside this program says what stands
   * in it.
   *
   * @param subject what it is about
   * @param result the result
   * @param indented many lines instead of one
   * @return the object, without a line feed at the end
   */
  public static String json(Subject subject, Result result, boolean indented) {
    return new JsonResults(subject, result).text(indented);
  }

  /**
   * The result as comma-separated values (RFC 4180, UTF-8): a heading, then one row a quantity, its
   * value in the column of its unit.
   *
   * @param subject what it is about
   * @param result the result
   * @return lines, each ended by a line feed
   */
  public static String csv(Subject subject, Result result) {
    return new CsvResults(subject, result).text();
  }

  /**
   * The sheet for the file as one page of HTML, nothing fetched from elsewhere.
   *
   * @param subject what it is about
   * @param result the result
   * @param inspection what was understood of the case
   * @param provenance title block and sources
   * @param pictures the plots as SVG elements, in order
   * @param soundings what stands under each place of them, as a JSON object
   * @return the page
   */
  public static String page(
      Subject subject,
      Result result,
      Solver.Inspection inspection,
      Provenance provenance,
      List<Picture> pictures,
      String soundings) {
    return new HtmlSheet(subject, result, inspection, provenance).forScreen(pictures, soundings);
  }

  /**
   * The sheet for the file as HTML to be set on paper, without a script.
   *
   * @param subject what it is about
   * @param result the result
   * @param inspection what was understood of the case
   * @param provenance title block and sources
   * @param pictures elements that stand for the plots, in order
   * @return the page, well-formed
   */
  public static String paper(
      Subject subject,
      Result result,
      Solver.Inspection inspection,
      Provenance provenance,
      List<Picture> pictures) {
    return new HtmlSheet(subject, result, inspection, provenance).forPaper(pictures);
  }

  /**
   * The card of a window.
   *
   * @param of the window and its U_w
   * @param ink colours, or none
   * @return lines, each ended by a line feed
   */
  public static String card(WindowSubject of, Ink ink) {
    TerminalText text = new TerminalText(ink, TextCard.PAGE);
    new WindowCard(of, ink).write(text);
    return text.text();
  }

  /**
   * A window as one JSON object; {@code window-result.schema.json} beside this program says what
   * stands in it.
   *
   * @param of the window and its U_w
   * @param indented many lines instead of one
   * @return the object, without a line feed at the end
   */
  public static String json(WindowSubject of, boolean indented) {
    return new WindowData(of).json(indented);
  }

  /**
   * A window as comma-separated values (RFC 4180, UTF-8): a heading, then one row a term.
   *
   * @param of the window and its U_w
   * @return lines, each ended by a line feed
   */
  public static String csv(WindowSubject of) {
    return new WindowData(of).csv();
  }

  /**
   * The card of a building's ledger.
   *
   * @param of the building and its ledger
   * @param ink colours, or none
   * @return lines, each ended by a line feed
   */
  public static String card(LedgerSubject of, Ink ink) {
    TerminalText text = new TerminalText(ink, TextCard.PAGE);
    new LedgerCard(of, ink).write(text);
    return text.text();
  }

  /**
   * A ledger as one JSON object; {@code ledger.schema.json} beside this program says what stands in
   * it.
   *
   * @param of the building and its ledger
   * @param indented many lines instead of one
   * @return the object, without a line feed at the end
   */
  public static String json(LedgerSubject of, boolean indented) {
    return new LedgerData(of).json(indented);
  }

  /**
   * The account of a ledger as comma-separated values (RFC 4180, UTF-8): a heading, one row an
   * item, the sum.
   *
   * @param of the building and its ledger
   * @return lines, each ended by a line feed
   */
  public static String accountCsv(LedgerSubject of) {
    return new LedgerData(of).account();
  }

  /**
   * The schedule of a building as comma-separated values (RFC 4180, UTF-8): a heading, one row a
   * part of the envelope, the sums.
   *
   * @param of the building and its ledger
   * @return lines, each ended by a line feed
   */
  public static String scheduleCsv(LedgerSubject of) {
    return new LedgerData(of).schedule();
  }

  /**
   * What is understood of a case, for the terminal.
   *
   * @param subject what it is about
   * @param inspection what was understood
   * @param ink colours, or none
   * @return lines, each ended by a line feed
   */
  public static String understood(Subject subject, Solver.Inspection inspection, Ink ink) {
    TerminalText text = new TerminalText(ink, TextCard.PAGE);
    new InspectionCard(subject, inspection, ink, text).write();
    return text.text();
  }

  /**
   * What is understood of a case, as one JSON object.
   *
   * @param subject what it is about
   * @param inspection what was understood
   * @return the object on one line, without a line feed at the end
   */
  public static String understoodJson(Subject subject, Solver.Inspection inspection) {
    return new JsonInspection(subject, inspection).text();
  }

  /**
   * What is understood of a window file, for the terminal.
   *
   * @param subject title, file and units of the window file
   * @param cases file and variant of each case that is solved for it
   * @param assumptions everything chosen for the user
   * @param ink colours, or none
   * @return lines, each ended by a line feed
   */
  public static String understood(
      Subject subject, List<String> cases, List<Assumption> assumptions, Ink ink) {
    TerminalText text = new TerminalText(ink, TextCard.PAGE);
    new WindowInspection(subject, cases, assumptions).write(text);
    return text.text();
  }

  /**
   * What is understood of a window file, as one JSON object.
   *
   * @param subject title, file and units of the window file
   * @param cases file and variant of each case that is solved for it
   * @param assumptions everything chosen for the user
   * @return the object on one line, without a line feed at the end
   */
  public static String understoodJson(
      Subject subject, List<String> cases, List<Assumption> assumptions) {
    return new WindowInspection(subject, cases, assumptions).json();
  }

  /**
   * Whether every number is as near to the exact one as was asked for, by its proved bounds or, for
   * want of them, by the estimate of its error. What has no finite answer is not asked for.
   *
   * @param subject what was asked
   * @param result the result
   * @return whether
   */
  public static boolean accurateEnough(Subject subject, Result result) {
    return new Reached(subject.accuracy()).by(result);
  }

  /**
   * Which numbers are not as near to the exact ones as was asked for, with the half-widths asked
   * and reached, and what can be done about it.
   *
   * @param subject what was asked
   * @param result the result
   * @return lines without line feeds; none if everything was reached
   */
  public static List<String> accuracyMissed(Subject subject, Result result) {
    return new Reached(subject.accuracy()).inWords(result);
  }

  /**
   * Which requirements of the case are not met, or too near their limit to tell.
   *
   * @param result the result
   * @return lines without line feeds; none if all are met
   */
  public static List<String> requirementsMissed(Result result) {
    return new RequiredSection(result, Ink.NONE).unmet();
  }
}
