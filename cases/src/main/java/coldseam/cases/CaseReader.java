package coldseam.cases;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads one case file: the base case, then each variant. */
final class CaseReader {
  static final List<String> KEYS =
      List.of(
          "coldseam",
          "title",
          "note",
          "sheet",
          "unit",
          "view",
          "up",
          "geometry",
          "values",
          "drawings",
          "materials",
          "spaces",
          "cavities",
          "section",
          "uncovered",
          "ground",
          "stretches",
          "flanks",
          "psi",
          "chi",
          "U",
          "frame",
          "framing",
          "points",
          "profiles",
          "moisture",
          "require",
          "accuracy",
          "variants",
          "cost",
          "expect");

  /** More variants in one file are refused: a study is not a case. */
  private static final int MOST_VARIANTS = 200;

  private final Path file;
  private final List<Path> chain;
  private final Map<Path, Optional<Case>> others;
  private final OpenedDrawings drawings;
  private final Problems problems;

  /**
   * Prepares.
   *
   * @param file the file
   * @param chain the files being read, this one last, normalised
   * @param others the files read before
   * @param drawings the drawings opened before
   */
  CaseReader(
      Path file, List<Path> chain, Map<Path, Optional<Case>> others, OpenedDrawings drawings) {
    this.file = file;
    this.chain = chain;
    this.others = others;
    this.drawings = drawings;
    this.problems = new Problems(file.toString());
  }

  /** One name for one file, whatever way leads to it. */
  static Path normalised(Path file) {
    try {
      return file.toRealPath();
    } catch (IOException e) {
      return file.toAbsolutePath().normalize();
    }
  }

  Case read() throws CaseException {
    String text = FileText.read(file);
    Optional<Node> root = YamlTree.read(text, problems);
    if (root.isEmpty()) {
      throw new CaseException(problems.inOrder());
    }
    Marks.report(root.get(), problems);
    Fields top = new Fields(problems, "a case", root.get(), KEYS);
    Heading heading = new Heading(problems, top, "case");
    heading.checkVersion();
    String title = heading.title();
    heading.note();
    Node sheet = top.nodeOrNull("sheet");
    TitleBlock block =
        sheet == null ? TitleBlock.EMPTY : new TitleBlockReader(problems).read(sheet);
    LengthUnit unit = heading.unit();
    List<Node.Entry> values = heading.values();
    List<Variant> variants = variants(top, values);
    List<String> names = new ArrayList<>();
    for (Variant variant : variants) {
      names.add(variant.name());
    }
    ReadCase.Builder builder = new ReadCase.Builder(file, title, names, unit);
    Optional<String> cost = Optional.empty();
    if (top.has("cost")) {
      cost = Fields.text(problems, "`cost`", top.get("cost").get());
    }
    Pass base = pass(top, problems, unit, values, Optional.empty());
    DetailReader reader = reader(top, base, Optional.empty());
    builder.add(Optional.empty(), reader.read(title, names), base);
    for (Variant variant : variants) {
      Problems own = problems.another();
      Pass pass = pass(top, own, unit, values, Optional.of(variant));
      DetailReader ofVariant = reader(top.reportingTo(own), pass, Optional.of(variant));
      builder.add(Optional.of(variant.name()), ofVariant.read(title, names), pass);
      problems.addOfVariant(variant.name(), own);
    }
    if (!problems.none()) {
      throw new CaseException(problems.inOrder());
    }
    return builder.build(
        reader.accuracy(),
        reader.expectations(),
        cost,
        block,
        new Rereading(file, chain, others, top, unit, values, variants, drawings));
  }

  private DetailReader reader(Fields top, Pass pass, Optional<Variant> variant) {
    return new DetailReader(top, pass, new OtherCases(pass, chain, others), variant);
  }

  private List<Variant> variants(Fields top, List<Node.Entry> values) {
    if (!top.has("variants")) {
      return List.of();
    }
    List<String> names = new ArrayList<>();
    for (Node.Entry entry : values) {
      names.add(entry.key().text());
    }
    List<Variant> variants = new ArrayList<>();
    Node node = top.get("variants").get();
    for (Node.Entry entry : Fields.named(problems, "`variants`", node)) {
      variants.add(new Variant(problems, entry.key(), entry.value(), names));
    }
    if (variants.size() > MOST_VARIANTS) {
      problems.add(
          node,
          "a case of " + variants.size() + " variants is too large",
          "at most " + MOST_VARIANTS + " are read");
      return List.of();
    }
    return variants;
  }

  private Pass pass(
      Fields top,
      Problems into,
      LengthUnit unit,
      List<Node.Entry> values,
      Optional<Variant> variant) {
    NamedValues named = new NamedValues(into, unit);
    for (Node.Entry entry : values) {
      named.put(entry.key().text(), entry.value());
    }
    if (variant.isPresent()) {
      variant.get().replaceValues(named);
    }
    return pass(file, top, into, unit, named, drawings);
  }

  /**
   * Starts one way through a file.
   *
   * @param file the file
   * @param top the keys of the case
   * @param into told what is wrong
   * @param unit of bare lengths
   * @param named the values that hold this time
   * @param drawings the drawings opened before
   * @return what all parts share
   */
  static Pass pass(
      Path file,
      Fields top,
      Problems into,
      LengthUnit unit,
      NamedValues named,
      OpenedDrawings drawings) {
    named.workOutAll();
    Pass pass = new Pass(file, into, new Quantities(into, named, unit), drawings);
    if (!top.has("unit")) {
      pass.assume("unit of bare lengths", unit.name(), "by convention of this tool");
    }
    return pass;
  }
}
