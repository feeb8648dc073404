package coldseam.cases.study;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.CaseFile;
import coldseam.cases.Changes;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.result.Result;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;

/**
 * A plain wall whose numbers are known exactly: R = 0.13 + 0.04 + thickness/λ, U = 1/R, L2D of 1 m
 * of it is U, f_Rsi = 1 − 0.13/R (ISO 6946; ISO 13788).
 */
final class Wall {
  static final double INSIDE = 0.13;
  static final double FILMS = 0.17;
  static final double LAMBDA = 0.04;

  static final String TEXT =
      """
      coldseam: 1
      title: Plain wall
      view: plan
      values:
        thickness: 100
        lambda: 0.04
      materials:
        wool: {conductivity: lambda}
        brick: {conductivity: 0.5}
      spaces:
        indoors: {temperature: 20, film: 0.13}
        outdoors: {temperature: -5, film: 0.04}
      section:
        - {fill: indoors, box: [-100, 0, 0, 1000]}
        - {fill: wool, name: core, box: [0, 0, thickness, 1000]}
        - {fill: outdoors, box: [thickness, 0, thickness + 100, 1000]}
      U: {of: wall, between: [indoors, outdoors]}
      variants:
        massive:
          fills: {core: brick}
      """;

  private Wall() {}

  static Case in(Path folder) throws IOException, CaseException {
    return in(folder, TEXT);
  }

  static Case in(Path folder, String text) throws IOException, CaseException {
    return CaseFile.read(Files.writeString(folder.resolve("wall.yaml"), text));
  }

  static Seek.Solves solves(Case wall) {
    return (changes, accuracy) -> solved(wall, changes, accuracy);
  }

  static Result solved(Case wall, Changes changes, Accuracy accuracy) throws CaseException {
    return Solver.solve(wall.detail(Optional.empty(), changes), accuracy, Progress.SILENT);
  }
}
