package coldseam.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;

/** Small case files for the tests of commands. */
final class Cases {
  /**
   * A plain wall, 0.2 m of 0.5 W/(m·K) with films 0.13 and 0.04: R = 0.57 m²·K/W exactly, and 1 m
   * of it couples with 1/0.57 W/(m·K).
   */
  static final String WALL =
      """
      coldseam: 1
      title: Plain wall
      view: plan
      materials:
        brick: {conductivity: 0.5}
      spaces:
        indoors: {temperature: 20, film: 0.13}
        outdoors: {temperature: -5, film: 0.04}
      section:
        - {fill: indoors, box: [-100, 0, 0, 1000]}
        - {fill: brick, box: [0, 0, 200, 1000]}
        - {fill: outdoors, box: [200, 0, 300, 1000]}
      U: {of: wall, between: [indoors, outdoors]}
      variants:
        thick:
          materials: {brick: {conductivity: 0.25}}
      """;

  /** An outer corner, which needs refinement. */
  static final String CORNER =
      """
      coldseam: 1
      title: Corner
      view: plan
      materials:
        brick: {conductivity: 0.5}
      spaces:
        indoors: {temperature: 20, exposure: inside}
        outdoors: {temperature: 0, exposure: outside}
      section:
        - {fill: outdoors, box: [0, 0, 1500, 1500]}
        - {fill: brick, box: [0, 0, 1300, 1300]}
        - {fill: indoors, box: [0, 0, 1000, 1000]}
      psi:
        internal: {between: [indoors, outdoors], dimensions: internal}
      """;

  private Cases() {}

  static Path write(Path folder, String name, String text) throws IOException {
    return Files.writeString(folder.resolve(name), text);
  }
}
