package coldseam.cases;

import coldseam.solver.detail.Detail;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
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
          "unit",
          "view",
          "up",
          "geometry",
          "values",
          "materials",
          "spaces",
          "section",
          "stretches",
          "flanks",
          "psi",
          "U",
          "points",
          "profiles",
          "accuracy",
          "variants",
          "expect");

  /** The version of the format that is read. */
  static final String VERSION = "1";

  /** More variants in one file are refused: a study is not a case. */
  private static final int MOST_VARIANTS = 200;

  private final Path file;
  private final List<Path> chain;
  private final Map<Path, Optional<Case>> others;
  private final Problems problems;

  /**
   * Prepares.
   *
   * @param file the file
   * @param chain the files being read, this one last, normalised
   * @param others the files read before
   */
  CaseReader(Path file, List<Path> chain, Map<Path, Optional<Case>> others) {
    this.file = file;
    this.chain = chain;
    this.others = others;
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
    Fields top = new Fields(problems, "a case", root.get(), KEYS);
    checkVersion(top);
    String title = title(top);
    if (top.has("note")) {
      Fields.text(problems, "`note`", top.get("note").get());
    }
    LengthUnit unit = unit(top);
    List<Node.Entry> values = values(top);
    List<Variant> variants = variants(top, values);
    List<String> variantNames = new ArrayList<>();
    for (Variant variant : variants) {
      variantNames.add(variant.name());
    }
    Problems fromTop = problems;
    Pass base = pass(problems, unit, values, Optional.empty());
    assumeUnit(top, base);
    DetailReader reader =
        new DetailReader(top, base, new OtherCases(base, chain, others), Optional.empty());
    Optional<Detail> detail = reader.read(title, variantNames);
    Map<String, Detail> details = new LinkedHashMap<>();
    Map<String, Map<String, Node>> places = new LinkedHashMap<>();
    detail.ifPresent(d -> details.put("", d));
    places.put("", base.places());
    for (Variant variant : variants) {
      Problems own = new Problems(file.toString());
      Pass pass = pass(own, unit, values, Optional.of(variant));
      assumeUnit(top, pass);
      DetailReader ofVariant =
          new DetailReader(
              top.reportingTo(own),
              pass,
              new OtherCases(pass, chain, others),
              Optional.of(variant));
      Optional<Detail> changed = ofVariant.read(title, variantNames);
      fromTop.addOfVariant(variant.name(), own);
      changed.ifPresent(d -> details.put("variant " + variant.name(), d));
      places.put("variant " + variant.name(), pass.places());
    }
    if (!problems.none()) {
      throw new CaseException(problems.inOrder());
    }
    return new ReadCase(
        file, title, variantNames, details, places, reader.accuracy(), reader.expectations(), unit);
  }

  private void checkVersion(Fields top) {
    Optional<Node> version = top.require("coldseam", "begin with `coldseam: 1`");
    if (version.isEmpty()) {
      return;
    }
    boolean known =
        version.get() instanceof Node.Scalar scalar
            && scalar.style() == Node.Style.PLAIN
            && scalar.text().equals(VERSION);
    if (!known) {
      problems.add(
          version.get(),
          "this is format " + Node.describe(version.get()) + " of a case, which is not known here",
          "write `coldseam: 1`");
    }
  }

  private String title(Fields top) {
    Optional<Node> node = top.require("title", "add `title: ` and what the detail is");
    return node.isEmpty() ? "" : Fields.text(problems, "`title`", node.get()).orElse("");
  }

  private LengthUnit unit(Fields top) {
    Optional<String> word = top.word("unit", LengthUnit.NAMES);
    return word.isPresent() ? LengthUnit.named(word.get()) : LengthUnit.MM;
  }

  private static void assumeUnit(Fields top, Pass pass) {
    if (!top.has("unit")) {
      pass.assume("unit of bare lengths", "mm", "by convention of this tool");
    }
  }

  private List<Node.Entry> values(Fields top) {
    if (!top.has("values")) {
      return List.of();
    }
    List<Node.Entry> values = new ArrayList<>();
    for (Node.Entry entry : Fields.named(problems, "`values`", top.get("values").get())) {
      if (NamedValues.canBeNamed(entry.key().text())) {
        values.add(entry);
      } else {
        problems.add(
            entry.key(),
            "`" + Node.shortened(entry.key().text()) + "` cannot be calculated with",
            Expression.FUNCTIONS.contains(entry.key().text())
                ? "choose a name that means nothing yet"
                : "name values by words of letters and digits, beginning with a letter");
      }
    }
    return values;
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
      Problems into, LengthUnit unit, List<Node.Entry> values, Optional<Variant> variant) {
    NamedValues named = new NamedValues(into, unit);
    for (Node.Entry entry : values) {
      named.put(entry.key().text(), entry.value());
    }
    variant.ifPresent(v -> v.replaceValues(named));
    named.workOutAll();
    return new Pass(file, into, new Quantities(into, named, unit));
  }
}
