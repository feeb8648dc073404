package coldseam.cases.study;

import coldseam.cases.study.Measure.Kind;
import coldseam.cases.study.Measure.Knowledge;
import coldseam.solver.detail.Bracket;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * Alternatives side by side. They rank by L2D where the outlines are the same, by U, and by f_Rsi;
 * by ψ only where the flanks have the same U, since the best ψ can belong to the worst wall. One is
 * before another only where the two intervals do not overlap.
 */
public final class Comparison {
  /** Transmittances of flanks that differ by less than this part of themselves are the same. */
  private static final double SAME = 1e-9;

  /**
   * One number of all alternatives.
   *
   * @param kind what it is
   * @param of whose
   * @param measures one for each alternative; empty where it has no such number
   * @param places one for each alternative; empty where it is not ranked
   */
  public record Row(
      Kind kind, String of, List<Optional<Measure>> measures, List<Optional<Place>> places) {}

  /**
   * A place.
   *
   * @param rank 1 plus how many are surely better
   * @param tied whether another cannot be told apart from it
   */
  public record Place(int rank, boolean tied) {}

  private final List<Alternative> alternatives;
  private final List<SectionOutline> outlines = new ArrayList<>();
  private final List<Row> rows = new ArrayList<>();
  private final List<String> notes = new ArrayList<>();

  private Comparison(List<Alternative> alternatives) {
    this.alternatives = List.copyOf(alternatives);
    for (Alternative alternative : alternatives) {
      outlines.add(SectionOutline.of(alternative.result()));
    }
  }

  /**
   * Compares.
   *
   * @param alternatives two or more
   * @return the comparison
   */
  public static Comparison of(List<Alternative> alternatives) {
    Comparison comparison = new Comparison(alternatives);
    Map<String, Measure> names = new LinkedHashMap<>();
    for (Alternative alternative : alternatives) {
      for (Measure measure : Measure.all(alternative.result())) {
        names.putIfAbsent(measure.typedName(), measure);
      }
    }
    for (Measure first : names.values()) {
      comparison.row(first);
    }
    comparison.noteEstimates();
    return comparison;
  }

  /** The alternatives, in the order given. */
  public List<Alternative> alternatives() {
    return alternatives;
  }

  /** A row for each number. */
  public List<Row> rows() {
    return List.copyOf(rows);
  }

  /** What has to be said of the ranking, sentences. */
  public List<String> notes() {
    return List.copyOf(notes);
  }

  private void row(Measure first) {
    List<Optional<Measure>> measures = new ArrayList<>();
    for (Alternative alternative : alternatives) {
      measures.add(find(alternative, first.typedName()));
    }
    boolean[] ranked =
        switch (first.kind()) {
          case L2D, L3D -> likeWithLike(first, measures, this::sameOutline, "outlines");
          case PSI -> likeWithLike(first, measures, this::sameFlanks, "U of the flanks");
          case CHI -> likeWithLike(first, measures, this::sameTerms, "U of the wall");
          case COLDEST -> new boolean[alternatives.size()];
          case U, F_RSI -> all(measures);
        };
    if (first.kind() == Kind.PSI) {
      bestOfWorst(first.of(), measures);
    }
    List<Optional<Measure>> compared = new ArrayList<>();
    for (int i = 0; i < ranked.length; i++) {
      compared.add(ranked[i] ? measures.get(i) : Optional.empty());
    }
    List<Optional<Place>> places = new ArrayList<>();
    for (Optional<Measure> measure : compared) {
      places.add(measure.isEmpty() ? Optional.empty() : place(measure.get(), compared));
    }
    rows.add(new Row(first.kind(), first.of(), measures, places));
  }

  private static boolean[] all(List<Optional<Measure>> measures) {
    boolean[] all = new boolean[measures.size()];
    for (int i = 0; i < all.length; i++) {
      all[i] = measures.get(i).isPresent();
    }
    return all;
  }

  /** Whether two alternatives may be ranked by a number. */
  @FunctionalInterface
  private interface Alike {
    boolean test(int one, int other, String of);
  }

  /**
   * The largest group of alternatives that may be ranked by a number; the earliest if several are
   * as large. Others are noted.
   */
  private boolean[] likeWithLike(
      Measure first, List<Optional<Measure>> measures, Alike alike, String what) {
    boolean[] best = new boolean[alternatives.size()];
    int most = 0;
    int present = 0;
    for (int i = 0; i < alternatives.size(); i++) {
      if (measures.get(i).isEmpty()) {
        continue;
      }
      present++;
      boolean[] group = new boolean[alternatives.size()];
      int count = 0;
      for (int k = 0; k < group.length; k++) {
        group[k] = measures.get(k).isPresent() && (k == i || alike.test(i, k, first.of()));
        count += group[k] ? 1 : 0;
      }
      if (count > most) {
        best = group;
        most = count;
      }
    }
    if (most < present) {
      notes.add(
          most < 2
              ? first.name() + " is not ranked: no two have the same " + what + "."
              : first.name()
                  + " is ranked among "
                  + names(best)
                  + " only: the others do not have the same "
                  + what
                  + ".");
    }
    return most < 2 ? new boolean[alternatives.size()] : best;
  }

  private String names(boolean[] chosen) {
    List<String> names = new ArrayList<>();
    for (int i = 0; i < chosen.length; i++) {
      if (chosen[i]) {
        names.add(alternatives.get(i).name());
      }
    }
    return String.join(", ", names);
  }

  private static Optional<Measure> find(Alternative alternative, String name) {
    for (Measure measure : Measure.all(alternative.result())) {
      if (measure.typedName().equals(name)) {
        return Optional.of(measure);
      }
    }
    return Optional.empty();
  }

  private static Optional<Place> place(Measure own, List<Optional<Measure>> all) {
    if (own.knowledge() == Knowledge.OPEN) {
      return Optional.empty();
    }
    int better = 0;
    int same = 0;
    for (Optional<Measure> other : all) {
      if (other.isPresent() && other.get() != own) {
        boolean before = before(other.get(), own);
        better += before ? 1 : 0;
        same += before || before(own, other.get()) ? 0 : 1;
      }
    }
    return Optional.of(new Place(1 + better, same > 0));
  }

  private static boolean before(Measure one, Measure other) {
    return one.kind().greaterIsBetter() ? other.surelyLess(one) : one.surelyLess(other);
  }

  private boolean sameOutline(int one, int other, String of) {
    return outlines.get(one).same(outlines.get(other));
  }

  /** The ψ of a name in a result. */
  private static Optional<Result.LinearTransmittance> psi(Alternative alternative, String name) {
    for (Result.LinearTransmittance psi : alternative.result().psi()) {
      if (psi.name().equals(name)) {
        return Optional.of(psi);
      }
    }
    return Optional.empty();
  }

  private boolean sameFlanks(int one, int other, String name) {
    Result.LinearTransmittance a = psi(alternatives.get(one), name).get();
    Result.LinearTransmittance b = psi(alternatives.get(other), name).get();
    return a.dimensions().equals(b.dimensions()) && sameFlanks(a, b);
  }

  /** The χ of a name in a result. */
  private static Optional<Result.PointTransmittance> chi(Alternative alternative, String name) {
    for (Result.PointTransmittance chi : alternative.result().chi()) {
      if (chi.name().equals(name)) {
        return Optional.of(chi);
      }
    }
    return Optional.empty();
  }

  private boolean sameTerms(int one, int other, String name) {
    return same(
        terms(chi(alternatives.get(one), name).get()),
        terms(chi(alternatives.get(other), name).get()));
  }

  /** U or ψ of everything that is taken off a χ, in order of size. */
  private static List<Bracket> terms(Result.PointTransmittance chi) {
    List<Bracket> terms = new ArrayList<>();
    for (Result.PointTerm term : chi.subtracted()) {
      terms.add(term.uWPerM2K().or(term::psiWPerMK).orElse(term.valueWPerK()));
    }
    terms.sort(Comparator.comparingDouble(Bracket::lower));
    return terms;
  }

  private static boolean sameFlanks(
      Result.LinearTransmittance one, Result.LinearTransmittance other) {
    return same(references(one), references(other));
  }

  private static boolean same(List<Bracket> a, List<Bracket> b) {
    if (a.size() != b.size()) {
      return false;
    }
    for (int i = 0; i < a.size(); i++) {
      double size = SAME * Math.max(Math.abs(a.get(i).upper()), Math.abs(b.get(i).upper()));
      if (Math.abs(a.get(i).lower() - b.get(i).lower()) > size
          || Math.abs(a.get(i).upper() - b.get(i).upper()) > size) {
        return false;
      }
    }
    return true;
  }

  /** U of everything that is taken off, or L2D of another case, in order of size. */
  private static List<Bracket> references(Result.LinearTransmittance psi) {
    List<Bracket> references = new ArrayList<>();
    for (Result.Subtracted term : psi.subtracted()) {
      references.add(term.uWPerM2K().orElse(term.valueWPerMK()));
    }
    references.sort(Comparator.comparingDouble(Bracket::lower));
    return references;
  }

  /** Notes where the worst wall has a ψ that is surely less than that of a better one. */
  private void bestOfWorst(String name, List<Optional<Measure>> measures) {
    double[] u = new double[alternatives.size()];
    int worst = -1;
    for (int i = 0; i < u.length; i++) {
      u[i] =
          measures.get(i).isEmpty() ? Double.NaN : meanFlankU(psi(alternatives.get(i), name).get());
      worst = u[i] > (worst < 0 ? Double.NEGATIVE_INFINITY : u[worst]) ? i : worst;
    }
    boolean[] beaten = new boolean[u.length];
    int count = 0;
    double least = Double.POSITIVE_INFINITY;
    for (int i = 0; i < u.length && worst >= 0; i++) {
      beaten[i] =
          u[i] < u[worst] * (1 - SAME)
              && measures.get(worst).get().surelyLess(measures.get(i).get());
      count += beaten[i] ? 1 : 0;
      least = beaten[i] ? Math.min(least, u[i]) : least;
    }
    if (count > 0) {
      notes.add(
          "The worst wall is not the one with the greatest ψ: ψ "
              + name
              + " of "
              + alternatives.get(worst).name()
              + " is less than that of "
              + names(beaten)
              + ", although the mean U of its flanks is "
              + figure(u[worst])
              + " against "
              + figure(least)
              + " W/(m²·K). A wall that loses more leaves less to the junction.");
    }
  }

  private static String figure(double u) {
    return String.format(Locale.ROOT, "%.3f", u);
  }

  private static double meanFlankU(Result.LinearTransmittance psi) {
    double loss = 0;
    double length = 0;
    for (Result.Subtracted term : psi.subtracted()) {
      if (term.uWPerM2K().isPresent() && term.lengthM().isPresent()) {
        loss += term.uWPerM2K().get().mid() * term.lengthM().getAsDouble();
        length += term.lengthM().getAsDouble();
      }
    }
    return length > 0 ? loss / length : Double.NaN;
  }

  private void noteEstimates() {
    boolean tied = false;
    boolean estimate = false;
    boolean open = false;
    for (Row row : rows) {
      for (int i = 0; i < alternatives.size(); i++) {
        tied |= row.places().get(i).isPresent() && row.places().get(i).get().tied();
        Optional<Measure> measure = row.measures().get(i);
        estimate |= measure.isPresent() && measure.get().knowledge() == Knowledge.ESTIMATE;
        open |= measure.isPresent() && measure.get().knowledge() == Knowledge.OPEN;
      }
    }
    if (tied) {
      notes.add("= marks numbers whose intervals overlap: they cannot be told apart.");
    }
    if (estimate) {
      notes.add(
          "f_Rsi and coldest surfaces are estimates without bounds; they count as different from"
              + " 0.01 K on either side.");
    }
    if (open) {
      notes.add("What is not certified is not ranked.");
    }
  }
}
