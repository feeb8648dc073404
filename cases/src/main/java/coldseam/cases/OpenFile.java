package coldseam.cases;

import coldseam.cases.library.Entry;
import coldseam.cases.library.Library;
import coldseam.cases.words.Spelling;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Material;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * A file of a kind of its own while it is read: head, named values and materials as in a case, then
 * one body under a key that tells its kind. Mistakes are collected with their places. Bare lengths
 * count in metres.
 */
public final class OpenFile {
  private static final String MATERIALS = "materials";

  private final Path file;
  private final Problems problems;
  private final Pass pass;
  private final String title;
  private final Optional<OpenValue> body;
  private final Map<String, Optional<Material>> materials = new LinkedHashMap<>();
  private final Set<String> assumed = new HashSet<>();
  private final OtherCases others;

  /**
   * A case that another file takes a figure from.
   *
   * @param words its file as typed, and its variant
   * @param from the case
   * @param variant the variant meant, empty for the base case
   * @param detail what it says
   */
  public record Source(String words, Case from, Optional<String> variant, Detail detail) {}

  private OpenFile(Path file, String kind) throws CaseException {
    this.file = file;
    problems = new Problems(file.toString());
    Optional<Node> root = YamlTree.read(FileText.read(file), problems);
    if (root.isEmpty()) {
      throw new CaseException(problems.inOrder());
    }
    List<String> keys = List.of("coldseam", "title", "note", "values", MATERIALS, kind);
    Fields top = new Fields(problems, "a " + kind + " file", root.get(), keys);
    Heading heading = new Heading(problems, top, kind);
    heading.checkVersion();
    title = heading.title();
    heading.note();
    LengthUnit metre = LengthUnit.named("m");
    NamedValues named = new NamedValues(problems, metre);
    for (Node.Entry entry : heading.values()) {
      named.put(entry.key().text(), entry.value());
    }
    named.workOutAll();
    pass =
        new Pass(
            file, problems, new Quantities(problems, named, metre), new OpenedDrawings(List.of()));
    if (top.has(MATERIALS)) {
      MaterialReader reader = new MaterialReader(pass);
      reader.read(top.get(MATERIALS).get());
      materials.putAll(reader.materials());
    }
    others = new OtherCases(pass, List.of(CaseReader.normalised(file)), new HashMap<>());
    Optional<Node> node = top.require(kind, "add `" + kind + ":` with what it is made of");
    body = node.map(value -> new OpenValue(pass, value));
  }

  /**
   * Opens a file and reads its head.
   *
   * @param file the file
   * @param kind the key of its body, which is also what messages call it
   * @return the file
   * @throws CaseException if it cannot be read at all
   */
  public static OpenFile open(Path file, String kind) throws CaseException {
    return new OpenFile(file, kind);
  }

  /**
   * Whether a file has a body of a kind: a line begins with its key.
   *
   * @param file the file
   * @param kind the key
   * @return false also if it cannot be read
   */
  public static boolean is(Path file, String kind) {
    return FileText.begins(file, kind + ":");
  }

  /** The file. */
  public Path file() {
    return file;
  }

  /** The title typed in it; empty if there is none, which was reported. */
  public String title() {
    return title;
  }

  /** What stands under the key of its kind; empty if nothing does, which was reported. */
  public Optional<OpenValue> body() {
    return body;
  }

  /** How many mistakes were reported so far. */
  public int mistakes() {
    return problems.count();
  }

  /**
   * Ends the reading.
   *
   * @throws CaseException with every mistake in line order, if there is one
   */
  public void conclude() throws CaseException {
    if (!problems.none()) {
      throw new CaseException(problems.inOrder());
    }
  }

  /**
   * Adds to what was chosen for the user.
   *
   * @param what the thing
   * @param value what was chosen, with its unit
   * @param source the clause it comes from
   */
  public void assume(String what, String value, String source) {
    pass.assume(what, value, source);
  }

  /** Everything chosen for the user so far. */
  public List<Assumption> assumptions() {
    return List.copyOf(pass.assumptions());
  }

  /**
   * Finds a material: one of the file, or one of the library, which is listed as an assumption.
   *
   * @param name where its name stands
   * @return the material, or empty if a mistake was reported
   */
  public Optional<Material> material(OpenValue name) {
    Optional<String> typed = name.text("the material of the layer");
    if (typed.isEmpty()) {
      return Optional.empty();
    }
    Optional<Material> own = materials.get(typed.get());
    if (own != null) {
      return own;
    }
    Optional<Entry> entry = Library.find(typed.get());
    if (entry.isEmpty()) {
      Optional<String> near = Spelling.nearest(typed.get(), materials.keySet());
      List<String> listed = near.map(List::of).orElseGet(() -> Library.nearest(typed.get()));
      name.wrong(
          "`" + Node.shortened(typed.get()) + "` is no material of this file or of the library",
          listed.isEmpty()
              ? "see `cli/coldseam materials`, or add it to `materials`"
              : "did you mean " + Fields.orList(listed) + "?");
      return Optional.empty();
    }
    Material material = MaterialReader.of(typed.get(), entry.get());
    if (assumed.add(material.name())) {
      pass.assume(
          "conductivity of " + material.name(),
          Figures.of(material.conductivityWPerMK()) + " W/(m·K)",
          material.source());
    }
    return Optional.of(material);
  }

  /**
   * Reads {@code case: FILE} and {@code variant: NAME}.
   *
   * @param keys the mapping they stand in; {@code case} is there
   * @return the case, or empty if a mistake was reported
   */
  public Optional<Source> source(OpenKeys keys) {
    Node node = keys.fields().get("case").get();
    Optional<OtherCases.Named> named = others.named(node, keys.fields().get("variant"));
    if (named.isEmpty()) {
      return Optional.empty();
    }
    try {
      OtherCases.Named found = named.get();
      return Optional.of(new Source(found.words(), found.read(), found.variant(), found.detail()));
    } catch (CaseException e) {
      problems.add(node, "its case cannot be read: " + e.getMessage(), "mend that case first");
      return Optional.empty();
    }
  }
}
