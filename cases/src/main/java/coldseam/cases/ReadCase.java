package coldseam.cases;

import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fault;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** A case as read; everything of it was checked. */
final class ReadCase implements Case {
  private final Path file;
  private final String title;
  private final List<String> variants;
  private final LengthUnit unit;
  private final Map<Optional<String>, Detail> details;
  private final Map<Optional<String>, List<Doubt>> doubts;
  private final List<Map<String, Node>> places;
  private final Accuracy accuracy;
  private final List<Expectation> expectations;
  private final Optional<String> cost;
  private final TitleBlock titleBlock;
  private final Rereading again;

  private ReadCase(
      Builder from,
      Accuracy accuracy,
      List<Expectation> expectations,
      Optional<String> cost,
      TitleBlock titleBlock,
      Rereading again) {
    this.file = from.file;
    this.title = from.title;
    this.variants = List.copyOf(from.variants);
    this.unit = from.unit;
    this.details = Map.copyOf(from.details);
    this.doubts = Map.copyOf(from.doubts);
    this.places = List.copyOf(from.places);
    this.accuracy = accuracy;
    this.expectations = List.copyOf(expectations);
    this.cost = cost;
    this.titleBlock = titleBlock;
    this.again = again;
  }

  /** Takes the base case and each variant as they are read. */
  static final class Builder {
    private final Path file;
    private final String title;
    private final List<String> variants;
    private final LengthUnit unit;
    private final Map<Optional<String>, Detail> details = new HashMap<>();
    private final Map<Optional<String>, List<Doubt>> doubts = new HashMap<>();
    private final List<Map<String, Node>> places = new ArrayList<>();

    Builder(Path file, String title, List<String> variants, LengthUnit unit) {
      this.file = file;
      this.title = title;
      this.variants = variants;
      this.unit = unit;
    }

    /**
     * Adds what one pass through the file has found.
     *
     * @param variant its variant, empty for the base case
     * @param detail the detail, empty if a mistake was reported
     * @param pass where things are written, and what is doubtful
     */
    void add(Optional<String> variant, Optional<Detail> detail, Pass pass) {
      if (detail.isPresent()) {
        details.put(variant, detail.get());
      }
      places.add(pass.places());
      doubts.put(variant, List.copyOf(pass.doubts()));
    }

    ReadCase build(
        Accuracy accuracy,
        List<Expectation> expectations,
        Optional<String> cost,
        TitleBlock titleBlock,
        Rereading again) {
      return new ReadCase(this, accuracy, expectations, cost, titleBlock, again);
    }
  }

  @Override
  public Path file() {
    return file;
  }

  @Override
  public String title() {
    return title;
  }

  @Override
  public TitleBlock titleBlock() {
    return titleBlock;
  }

  @Override
  public List<String> variants() {
    return variants;
  }

  @Override
  public Detail detail(Optional<String> variant) throws CaseException {
    Detail detail = details.get(variant);
    if (detail == null) {
      String right = Problems.suggestion(variant.orElse(""), variants);
      throw new CaseException(
          List.of(
              new Problem(
                  file.toString(),
                  0,
                  0,
                  "there is no variant `" + Node.shortened(variant.orElse("")) + "`",
                  right.isEmpty() ? Optional.of("the case has none") : Optional.of(right))));
    }
    return detail;
  }

  @Override
  public List<Doubt> doubts(Optional<String> variant) {
    return doubts.getOrDefault(variant, List.of());
  }

  @Override
  public Detail detail(Optional<String> variant, Changes changes) throws CaseException {
    Detail unchanged = detail(variant);
    return changes.equals(Changes.NONE) ? unchanged : again.detail(title, variant, changes);
  }

  @Override
  public Map<String, String> values(Optional<String> variant) {
    return again.values(variant);
  }

  @Override
  public List<String> changes(String variant) {
    return again.variant(Optional.of(variant)).get().inWords();
  }

  @Override
  public Optional<String> cost(Optional<String> variant) {
    return variant.isEmpty() ? cost : again.variant(variant).get().cost();
  }

  @Override
  public List<Path> files() {
    return again.files();
  }

  @Override
  public Accuracy accuracy() {
    return accuracy;
  }

  @Override
  public List<Expectation> expectations() {
    return expectations;
  }

  @Override
  public String unit() {
    return unit.name();
  }

  @Override
  public double metresPerUnit() {
    return unit.metres();
  }

  @Override
  public Problem locate(Fault fault) {
    Node node = find(fault.part(), fault.name());
    if (node == null) {
      // the stretches and flanks that the ground brings along stand nowhere else
      node = find("ground", "");
    }
    String message = fault.message();
    if (!fault.name().isEmpty() && !fault.part().equals("section")) {
      String part = symbol(fault.part());
      message = part + " `" + fault.name() + "`: " + message;
    }
    int cut = message.indexOf("; ");
    Optional<String> right = cut < 0 ? Optional.empty() : Optional.of(message.substring(cut + 2));
    return new Problem(
        file.toString(),
        node == null ? 0 : node.line(),
        node == null ? 0 : node.column(),
        cut < 0 ? message : message.substring(0, cut),
        right);
  }

  private static String symbol(String part) {
    return switch (part) {
      case "psi" -> "ψ";
      case "chi" -> "χ";
      default -> part;
    };
  }

  /** Where a thing is written, in the base case or else in the first variant that has it. */
  private Node find(String part, String name) {
    List<String> names = new ArrayList<>(List.of(name));
    int several = name.indexOf(", ");
    if (several > 0) {
      names.add(name.substring(0, several));
    }
    names.add("");
    for (String wanted : names) {
      for (Map<String, Node> ofPass : places) {
        Node node = ofPass.get(Pass.key(part, wanted));
        if (node != null) {
          return node;
        }
      }
    }
    return null;
  }
}
