package coldseam.cases;

import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fault;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** A case as read; everything of it was checked. */
final class ReadCase implements Case {
  private final Path file;
  private final String title;
  private final List<String> variants;
  private final Map<String, Detail> details;
  private final Map<String, Map<String, Node>> places;
  private final Accuracy accuracy;
  private final List<Expectation> expectations;
  private final LengthUnit unit;

  ReadCase(
      Path file,
      String title,
      List<String> variants,
      Map<String, Detail> details,
      Map<String, Map<String, Node>> places,
      Accuracy accuracy,
      List<Expectation> expectations,
      LengthUnit unit) {
    this.file = file;
    this.title = title;
    this.variants = List.copyOf(variants);
    this.details = Map.copyOf(details);
    this.places = places;
    this.accuracy = accuracy;
    this.expectations = List.copyOf(expectations);
    this.unit = unit;
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
  public List<String> variants() {
    return variants;
  }

  @Override
  public Detail detail(Optional<String> variant) throws CaseException {
    Detail detail = details.get(variant.isPresent() ? "variant " + variant.get() : "");
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
    String message = fault.message();
    if (!fault.name().isEmpty() && !fault.part().equals("section")) {
      String part = fault.part().equals("psi") ? "ψ" : fault.part();
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

  /** Where a thing is written, in the base case or else in the first variant that has it. */
  private Node find(String part, String name) {
    List<String> names = new ArrayList<>(List.of(name));
    int several = name.indexOf(", ");
    if (several > 0) {
      names.add(name.substring(0, several));
    }
    names.add("");
    for (String wanted : names) {
      for (Map<String, Node> ofPass : places.values()) {
        Node node = ofPass.get(Pass.key(part, wanted));
        if (node != null) {
          return node;
        }
      }
    }
    return null;
  }
}
