package coldseam.cases;

import coldseam.solver.detail.Wanted;
import coldseam.solver.detail.Wanted.Requirement.Kind;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;

/** Reads {@code require}: what the results have to meet, or the run ends with 1. */
final class RequireReader {
  static final List<String> KEYS = List.of("fRsi", "psi", "U", "moisture");

  private final Pass pass;
  private final Problems problems;

  RequireReader(Pass pass) {
    this.pass = pass;
    this.problems = pass.problems();
  }

  /**
   * What can be required of.
   *
   * @param spaces names of the spaces
   * @param psi names of the ψ
   * @param transmittances what each U is of
   * @param moisture whether a moisture check is asked for
   */
  record Names(
      Collection<String> spaces,
      Collection<String> psi,
      Collection<String> transmittances,
      boolean moisture) {}

  /**
   * Reads the requirements.
   *
   * @param key its key, for its place
   * @param node the mapping
   * @param names what is there
   * @return those without a mistake
   */
  List<Wanted> read(Node key, Node node, Names names) {
    pass.place("require", "", key);
    Fields fields = new Fields(problems, "`require`", node, KEYS);
    List<Wanted> all = new ArrayList<>();
    Node factor = fields.nodeOrNull("fRsi");
    if (factor instanceof Node.Mapping) {
      named(factor, "fRsi", Kind.F_RSI, Place.FACTOR, names.spaces(), all);
    } else if (factor != null) {
      double limit = pass.quantities().read(factor, "`fRsi` of `require`", Place.FACTOR);
      all.add(new Wanted.Requirement(Kind.F_RSI, "", limit));
    }
    Node psi = fields.nodeOrNull("psi");
    if (psi != null) {
      named(psi, "psi", Kind.PSI, Place.COUPLING, names.psi(), all);
    }
    Node u = fields.nodeOrNull("U");
    if (u != null) {
      named(u, "U", Kind.U, Place.TRANSMITTANCE, names.transmittances(), all);
    }
    if (fields.flag("moisture")) {
      if (names.moisture()) {
        all.add(new Wanted.Requirement(Kind.MOISTURE, "", Double.NaN));
      } else {
        problems.add(
            fields.keyNode("moisture"),
            "no moisture check is asked for",
            "add `moisture: {}`, or say more of it");
      }
    }
    return all;
  }

  private void named(
      Node node, String what, Kind kind, Place place, Collection<String> known, List<Wanted> into) {
    for (Node.Entry entry : Fields.named(problems, "`" + what + "` of `require`", node)) {
      String name = entry.key().text();
      pass.place("require", name, entry.key());
      if (!known.contains(name)) {
        problems.add(
            entry.key(),
            "there is no "
                + (kind == Kind.F_RSI ? "space" : kind == Kind.PSI ? "ψ" : "U of")
                + " `"
                + Node.shortened(name)
                + "`",
            Problems.suggestion(name, known));
      }
      double limit =
          pass.quantities().read(entry.value(), "`" + what + "` of `" + name + "`", place);
      into.add(new Wanted.Requirement(kind, name, limit));
    }
  }
}
