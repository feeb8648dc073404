package coldseam.cli;

import java.nio.file.Files;
import java.nio.file.Path;

/** Where the repository is, told by the build or found from the folder that tests run in. */
final class Root {
  private Root() {}

  static Path folder() {
    String told = System.getProperty("coldseam.root", "");
    Path folder = told.isEmpty() ? Path.of("").toAbsolutePath() : Path.of(told);
    while (folder != null && !Files.isRegularFile(folder.resolve("cli/coldseam"))) {
      folder = folder.getParent();
    }
    if (folder == null) {
      throw new IllegalStateException("the repository is not found");
    }
    return folder;
  }
}
