package coldseam.cases;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** Cases written on the spot, and the shipped ones. */
final class Written {
  /** What every case of these tests begins with. */
  static final String HEAD =
      """
      coldseam: 1
      title: Test
      """;

  /** A wall between two spaces. */
  static final String WALL =
      HEAD
          + """
          materials:
            masonry: {conductivity: 0.5}
          spaces:
            indoors: {temperature: 20, exposure: inside}
            outdoors: {temperature: -5, exposure: outside}
          section:
            - {fill: masonry, box: [0, 0, 240, 1000]}
            - {fill: indoors, box: [-100, 0, 0, 1000]}
            - {fill: outdoors, box: [240, 0, 340, 1000]}
          """;

  private Written() {}

  /** Reads a text as a case in a folder. */
  static Case read(Path folder, String text) throws CaseException {
    Path file = folder.resolve("case.yaml");
    try {
      Files.writeString(file, text);
      Path drawing = folder.resolve("drawn.dxf");
      if (text.contains("drawn.dxf") && Files.notExists(drawing)) {
        Files.copy(SpoiledCasesTest.DRAWN.resolveSibling("drawn.dxf"), drawing);
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return CaseFile.read(file);
  }

  /** The problems of a text as {@code line:column: wrong; right}; empty if it is a case. */
  static List<String> problems(Path folder, String text) {
    try {
      read(folder, text);
      return List.of();
    } catch (CaseException e) {
      String file = folder.resolve("case.yaml") + ":";
      return e.problems().stream().map(p -> p.text().replace(file, "").strip()).toList();
    }
  }

  /** Every shipped case; buildings are files of a kind of their own. */
  static List<Path> shipped() {
    try (Stream<Path> all = Files.walk(Path.of(""))) {
      return all.filter(p -> p.startsWith("demo") || p.startsWith("published"))
          .filter(p -> p.toString().endsWith(".yaml") && !OpenFile.is(p, "building"))
          .sorted()
          .collect(Collectors.toList());
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
