package coldseam.cases.study;

import coldseam.cases.Case;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Material;
import coldseam.solver.result.Result;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * One of several details that are compared.
 *
 * @param from its case
 * @param variant the variant, empty for the base case
 * @param name what it is called in the comparison
 * @param result what came out
 */
public record Alternative(Case from, Optional<String> variant, String name, Result result) {
  /** Conductivities that differ by less than this part of themselves are the same. */
  private static final double SAME = 1e-9;

  /** What it costs, as typed in the case. */
  public Optional<String> cost() {
    return from.cost(variant);
  }

  /**
   * What differs from another: the changes of a variant, or, between cases, named values and
   * materials.
   *
   * @param first the other
   * @return a few words for each difference; none where nothing was found
   */
  public List<String> differences(Alternative first) {
    if (from == first.from && first.variant.isEmpty()) {
      return variant.isPresent() ? from.changes(variant.get()) : List.of();
    }
    List<String> words = new ArrayList<>();
    Map<String, String> own = from.values(variant);
    Map<String, String> others = first.from.values(first.variant);
    for (Map.Entry<String, String> value : own.entrySet()) {
      String other = others.get(value.getKey());
      if (other != null && !other.equals(value.getValue())) {
        words.add(value.getKey() + " = " + value.getValue());
      }
    }
    Map<String, Material> known = first.materials();
    for (Material material : materials().values()) {
      Material other = known.get(material.name());
      double lambda = material.conductivityWPerMK();
      if (other == null) {
        words.add("with " + material.name() + ", λ " + plain(lambda));
      } else if (Math.abs(other.conductivityWPerMK() - lambda) > SAME * lambda) {
        words.add("λ of " + material.name() + " = " + plain(lambda));
      }
    }
    for (String name : known.keySet()) {
      if (!materials().containsKey(name)) {
        words.add("without " + name);
      }
    }
    return words;
  }

  private static String plain(double number) {
    return Range.plain(new BigDecimal(number).round(new MathContext(4)));
  }

  /** The materials that are seen in the section. */
  private Map<String, Material> materials() {
    Map<String, Material> seen = new LinkedHashMap<>();
    for (int face = 0; face < result.heatLoss().partition().faceCount(); face++) {
      int label = result.heatLoss().partition().faceLabel(face);
      Fill fill = label < 0 ? null : result.detail().fills().get(label);
      if (fill instanceof Material material) {
        seen.put(material.name(), material);
      }
    }
    return seen;
  }
}
