package coldseam.cases.study;

import static org.assertj.core.api.Assertions.assertThat;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.CaseFile;
import coldseam.cases.Changes;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What ranks and what does not. */
class ComparisonTest {
  @TempDir Path dir;

  private static Alternative solved(Case from, Optional<String> variant) throws CaseException {
    return new Alternative(
        from,
        variant,
        variant.orElse("base"),
        Solver.solve(from.detail(variant), from.accuracy(), Progress.SILENT));
  }

  private static Comparison compared(Case from) throws CaseException {
    List<Alternative> all = new ArrayList<>(List.of(solved(from, Optional.empty())));
    for (String variant : from.variants()) {
      all.add(solved(from, Optional.of(variant)));
    }
    return Comparison.of(all);
  }

  private static String places(Comparison comparison, Measure.Kind kind) {
    for (Comparison.Row row : comparison.rows()) {
      if (row.kind() == kind) {
        List<String> places = new ArrayList<>();
        for (Optional<Comparison.Place> place : row.places()) {
          places.add(place.map(p -> p.rank() + (p.tied() ? "=" : "")).orElse("-"));
        }
        return String.join(" ", places);
      }
    }
    return "none";
  }

  private Case wall(String variants) throws IOException, CaseException {
    String text = Wall.TEXT.substring(0, Wall.TEXT.indexOf("variants:"));
    return CaseFile.read(
        Files.writeString(dir.resolve("wall.yaml"), text + "variants:\n" + variants));
  }

  /** Of plain walls U = 1/(0.17 + d/λ) and f_Rsi = 1 − 0.13 U (ISO 6946; ISO 13788). */
  @Test
  void walls_rank_by_transmittance_and_temperature_factor() throws Exception {
    Comparison comparison =
        compared(
            wall(
                "  thick: {values: {thickness: 200}}\n"
                    + "  poor: {values: {lambda: 0.08}}\n"
                    + "  equal: {values: {lambda: 0.04}}\n"));
    assertThat(places(comparison, Measure.Kind.U)).isEqualTo("2= 1 4 2=");
    assertThat(places(comparison, Measure.Kind.F_RSI)).isEqualTo("2= 1 4 2=");
    assertThat(places(comparison, Measure.Kind.COLDEST)).isEqualTo("- - - -");
    // The thick one has another outline.
    assertThat(places(comparison, Measure.Kind.L2D)).isEqualTo("1= - 3 1=");
    assertThat(comparison.notes())
        .anyMatch(note -> note.contains("is ranked among base, poor, equal only"));
    assertThat(comparison.alternatives().get(1).differences(comparison.alternatives().get(0)))
        .containsExactly("thickness = 200");
  }

  /** 0.01 K of 25 K on either side: f_Rsi that differ by less are no different. */
  @Test
  void temperature_factors_need_a_margin() throws Exception {
    // dU/dλ·δλ moves the surface by 0.13·25·δU: 0.004 K for one, 0.06 K for the other.
    Comparison comparison =
        compared(
            wall(
                "  hardly: {values: {lambda: 0.04015}}\n"
                    + "  surely: {values: {lambda: 0.043}}\n"));
    assertThat(places(comparison, Measure.Kind.F_RSI)).isEqualTo("1= 1= 3");
  }

  /** Intervals of a coarse solve overlap where those of a fine one do not. */
  @Test
  void what_cannot_be_told_apart_ties() throws Exception {
    Case balcony = CaseFile.read(Path.of("demo/balcony.yaml"));
    List<Alternative> coarse = new ArrayList<>();
    List<Alternative> fine = new ArrayList<>();
    Accuracy rough = new Accuracy(0.05, 0.05, 0.05, 0.05, 2_000_000);
    for (double insulation : new double[] {160, 161}) {
      Changes changes = new Changes(Map.of("insulation", Double.toString(insulation)), Map.of());
      for (boolean isFine : new boolean[] {false, true}) {
        Accuracy accuracy = isFine ? new Accuracy(2e-4, 1e-3, 1e-4, 1e-3, 2_000_000) : rough;
        (isFine ? fine : coarse)
            .add(
                new Alternative(
                    balcony,
                    Optional.empty(),
                    "insulation " + insulation,
                    Solver.solve(
                        balcony.detail(Optional.empty(), changes), accuracy, Progress.SILENT)));
      }
    }
    Measure a = Measure.all(coarse.get(0).result()).get(0);
    Measure b = Measure.all(coarse.get(1).result()).get(0);
    assertThat(a.surelyLess(b) || b.surelyLess(a)).isFalse();
    Measure c = Measure.all(fine.get(0).result()).get(0);
    Measure d = Measure.all(fine.get(1).result()).get(0);
    assertThat(d.surelyLess(c)).isTrue();
  }

  @Test
  void psi_ranks_among_equal_walls_and_the_worst_wall_is_told() throws Exception {
    Comparison comparison = compared(CaseFile.read(Path.of("demo/balcony-alternatives.yaml")));
    // Base, thermal break, slab wrapped, thicker insulation, weak wall.
    assertThat(places(comparison, Measure.Kind.PSI)).isEqualTo("3 1 2 - -");
    assertThat(places(comparison, Measure.Kind.L2D)).isEqualTo("2 1 - - 3");
    assertThat(places(comparison, Measure.Kind.F_RSI)).isEqualTo("4 1 2 3 5");
    assertThat(comparison.notes())
        .anyMatch(
            note ->
                note.contains("ψ external of weak wall is less than that of base, thicker")
                    && note.contains("A wall that loses more leaves less to the junction"));
    assertThat(comparison.alternatives().get(1).cost()).hasValueSatisfying(c -> c.contains("310"));
    assertThat(comparison.alternatives().get(0).cost()).contains("nothing");
  }

  /** The same section drawn elsewhere and cut up otherwise; then one corner moved by 1 mm. */
  @Test
  void an_outline_is_the_same_whatever_is_laid_inside() throws Exception {
    String text = Wall.TEXT.substring(0, Wall.TEXT.indexOf("variants:"));
    Case one = CaseFile.read(Files.writeString(dir.resolve("one.yaml"), text));
    Case layered =
        CaseFile.read(
            Files.writeString(
                dir.resolve("layered.yaml"),
                text.replace(
                    "  - {fill: outdoors",
                    "  - {fill: brick, box: [0, 300, 60, 700]}\n  - {fill: outdoors")));
    Case moved =
        CaseFile.read(
            Files.writeString(
                dir.resolve("moved.yaml"),
                text.replace(
                    "box: [thickness, 0,",
                    "box: [thickness - 1, 999, thickness, 1000]}\n"
                        + "  - {fill: outdoors, box: [thickness, 0,")));
    SectionOutline first = SectionOutline.of(solved(one, Optional.empty()).result());
    assertThat(SectionOutline.of(solved(layered, Optional.empty()).result()).same(first)).isTrue();
    assertThat(SectionOutline.of(solved(moved, Optional.empty()).result()).same(first)).isFalse();
  }

  @Test
  void between_cases_values_and_materials_tell_what_differs() throws Exception {
    Case one = Wall.in(dir);
    Case other =
        CaseFile.read(
            Files.writeString(
                dir.resolve("other.yaml"),
                Wall.TEXT
                    .replace("thickness: 100", "thickness: 120")
                    .replace("lambda: 0.04", "lambda: 0.05")
                    .replace("fill: wool,", "fill: brick,")));
    assertThat(solved(other, Optional.empty()).differences(solved(one, Optional.empty())))
        .containsExactly("thickness = 120", "lambda = 0.05", "with brick, λ 0.5", "without wool");
  }
}
