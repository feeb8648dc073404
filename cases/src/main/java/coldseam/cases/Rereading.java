package coldseam.cases;

import coldseam.solver.detail.Detail;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Goes through a case once more with something changed in it; the file itself is not read again.
 */
final class Rereading {
  private final Path file;
  private final List<Path> chain;
  private final Map<Path, Optional<Case>> others;
  private final Fields top;
  private final LengthUnit unit;
  private final List<Node.Entry> values;
  private final List<Variant> variants;
  private final OpenedDrawings drawings;

  /**
   * Keeps what was read.
   *
   * @param file the file
   * @param chain the files that led to it, itself last
   * @param others every other file that was read
   * @param top the keys of the case
   * @param unit of bare lengths
   * @param values the named values of the base case
   * @param variants all variants
   * @param drawings the drawings opened before
   */
  Rereading(
      Path file,
      List<Path> chain,
      Map<Path, Optional<Case>> others,
      Fields top,
      LengthUnit unit,
      List<Node.Entry> values,
      List<Variant> variants,
      OpenedDrawings drawings) {
    this.file = file;
    this.chain = chain;
    this.others = others;
    this.top = top;
    this.unit = unit;
    this.values = values;
    this.variants = variants;
    this.drawings = drawings;
  }

  /** A text that was typed elsewhere than in the file. */
  static Node.Scalar typed(String text) {
    return new Node.Scalar(text, Node.Style.PLAIN, 0, 0);
  }

  /** The variant of that name; empty for the base case. */
  Optional<Variant> variant(Optional<String> name) {
    for (Variant variant : variants) {
      if (name.isPresent() && variant.name().equals(name.get())) {
        return Optional.of(variant);
      }
    }
    return Optional.empty();
  }

  List<Path> files() {
    List<Path> files = new ArrayList<>(others.keySet());
    files.addAll(drawings.files());
    Collections.sort(files);
    files.remove(CaseReader.normalised(file));
    files.add(0, file);
    return files;
  }

  Map<String, String> values(Optional<String> variant) {
    NamedValues named = named(new Problems(file.toString()), variant(variant), Changes.NONE);
    Map<String, String> written = new LinkedHashMap<>();
    for (String name : named.names()) {
      written.put(name, named.written(name));
    }
    return written;
  }

  private NamedValues named(Problems into, Optional<Variant> variant, Changes changes) {
    NamedValues named = new NamedValues(into, unit);
    for (Node.Entry entry : values) {
      named.put(entry.key().text(), entry.value());
    }
    if (variant.isPresent()) {
      variant.get().replaceValues(named);
    }
    for (Map.Entry<String, String> change : changes.values().entrySet()) {
      if (named.has(change.getKey())) {
        named.put(change.getKey(), typed(change.getValue()));
      } else {
        into.add(
            typed(change.getKey()),
            "the case has no value `" + Node.shortened(change.getKey()) + "` to replace",
            Problems.suggestion(change.getKey(), named.names()));
      }
    }
    return named;
  }

  /**
   * The detail with changes.
   *
   * @param title of the case
   * @param name the variant, empty for the base case
   * @param changes what to change
   * @return the detail
   * @throws CaseException with what is wrong with it, each told with the changes
   */
  Detail detail(String title, Optional<String> name, Changes changes) throws CaseException {
    Problems problems = new Problems(file.toString());
    Optional<Variant> variant = variant(name);
    NamedValues named = named(problems, variant, changes);
    Fields fields = top.reportingTo(problems);
    Pass pass = CaseReader.pass(file, fields, problems, unit, named, drawings);
    OtherCases otherCases = new OtherCases(pass, chain, new HashMap<>(others));
    List<String> names = new ArrayList<>();
    for (Variant one : variants) {
      names.add(one.name());
    }
    Optional<Detail> detail =
        new DetailReader(fields, pass, otherCases, variant, changes).read(title, names);
    if (detail.isEmpty() || !problems.none()) {
      List<Problem> told = new ArrayList<>();
      for (Problem problem : problems.inOrder()) {
        told.add(
            new Problem(
                problem.file(),
                problem.line(),
                problem.column(),
                "with " + changes.inWords() + ": " + problem.wrong(),
                problem.right()));
      }
      throw new CaseException(told);
    }
    return detail.get();
  }
}
