package coldseam.cases;

import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Subtraction;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads the other case files that a case refers to, each once, and refuses circles. */
final class OtherCases {
  /** Longer chains of cases that need each other are refused. */
  private static final int LONGEST_CHAIN = 8;

  private final Pass pass;
  private final Problems problems;
  private final List<Path> chain;
  private final Map<Path, Optional<Case>> read;

  /**
   * Prepares.
   *
   * @param pass what the parts of the case share
   * @param chain the files being read, this one last, normalised
   * @param read the files read before
   */
  OtherCases(Pass pass, List<Path> chain, Map<Path, Optional<Case>> read) {
    this.pass = pass;
    this.problems = pass.problems();
    this.chain = chain;
    this.read = read;
  }

  /**
   * Reads the coupling coefficient of another case as something to take off.
   *
   * @param fileNode its path relative to this case's folder
   * @param variantNode the name of a variant of it
   * @param between two of its spaces
   * @return the subtraction, or empty if a mistake was reported
   */
  Optional<Subtraction> read(Node fileNode, Optional<Node> variantNode, Node between) {
    Optional<Named> named = named(fileNode, variantNode);
    return named.isEmpty() ? Optional.empty() : subtraction(named.get(), between);
  }

  /**
   * Another case as it was named.
   *
   * @param typed its file as typed
   * @param read the case
   * @param variant the variant meant, empty for the base case
   */
  record Named(String typed, Case read, Optional<String> variant) {
    /** File and variant in words. */
    String words() {
      return variant.isPresent() ? typed + ", " + variant.get() : typed;
    }

    /** The detail of the variant meant. */
    Detail detail() throws CaseException {
      return read.detail(variant);
    }
  }

  /**
   * Reads another case.
   *
   * @param fileNode its path relative to this file's folder
   * @param variantNode the name of a variant of it
   * @return the case, or empty if a mistake was reported
   */
  Optional<Named> named(Node fileNode, Optional<Node> variantNode) {
    Optional<String> typed = Fields.text(problems, "`case`", fileNode);
    if (typed.isEmpty()) {
      return Optional.empty();
    }
    Optional<Case> other = other(fileNode, typed.get());
    if (other.isEmpty()) {
      return Optional.empty();
    }
    Optional<String> variant = Optional.empty();
    if (variantNode.isPresent()) {
      variant = Fields.text(problems, "`variant`", variantNode.get());
      if (variant.isEmpty()) {
        return Optional.empty();
      }
      List<String> known = other.get().variants();
      if (!known.contains(variant.get())) {
        problems.add(
            variantNode.get(),
            "`" + Node.shortened(typed.get()) + "` has no variant `" + variant.get() + "`",
            Problems.suggestion(variant.get(), known));
        return Optional.empty();
      }
    }
    return Optional.of(new Named(typed.get(), other.get(), variant));
  }

  private Optional<Subtraction> subtraction(Named named, Node between) {
    Detail detail;
    try {
      detail = named.detail();
    } catch (CaseException e) {
      problems.add(between, "its case cannot be read: " + e.getMessage(), "mend that case first");
      return Optional.empty();
    }
    Map<String, Optional<Space>> spaces = new LinkedHashMap<>();
    for (Space space : detail.spaces()) {
      spaces.put(space.name(), Optional.of(space));
    }
    Optional<PairReader.Sides> sides =
        new PairReader(problems, spaces).read(between, "`between` of `" + named.typed() + "`");
    if (sides.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Subtraction.OfDetail(named.words(), detail, sides.get().warm(), sides.get().cold()));
  }

  private Optional<Case> other(Node node, String typed) {
    Path folder = pass.file().toAbsolutePath().getParent();
    Path file;
    try {
      file = folder == null ? Path.of(typed) : folder.resolve(typed);
    } catch (InvalidPathException e) {
      problems.add(node, "`" + Node.shortened(typed) + "` is no file name", "name a case file");
      return Optional.empty();
    }
    Path normal = CaseReader.normalised(file);
    if (chain.contains(normal) || chain.size() > LONGEST_CHAIN) {
      problems.add(
          node,
          chain.contains(normal)
              ? "cases refer to each other in a circle: " + circle(normal)
              : "cases refer to each other over too many steps",
          "take off another case, or a part of known U");
      return Optional.empty();
    }
    Optional<Case> known = read.get(normal);
    if (known == null) {
      known = readFirst(node, typed, file, normal);
      read.put(normal, known);
    }
    return known;
  }

  private Optional<Case> readFirst(Node node, String typed, Path file, Path normal) {
    List<Path> longer = new ArrayList<>(chain);
    longer.add(normal);
    try {
      return Optional.of(new CaseReader(file, longer, read, pass.drawings()).read());
    } catch (CaseException e) {
      Problem first = e.problems().get(0);
      int more = e.problems().size() - 1;
      problems.add(
          node,
          "the case `"
              + Node.shortened(typed)
              + "` cannot be read: "
              + (first.line() > 0 ? "line " + first.line() + ", " : "")
              + first.wrong()
              + (more > 0 ? ", and " + more + " more" : ""),
          first.right().orElse(""));
      return Optional.empty();
    }
  }

  private String circle(Path back) {
    StringBuilder out = new StringBuilder();
    for (Path link : chain.subList(chain.indexOf(back), chain.size())) {
      out.append('`').append(link.getFileName()).append("` needs ");
    }
    return out.append('`').append(back.getFileName()).append('`').toString();
  }
}
