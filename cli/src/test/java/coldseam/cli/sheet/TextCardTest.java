package coldseam.cli.sheet;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import coldseam.cli.text.Ink;
import coldseam.cli.text.TerminalText;
import coldseam.solver.air.Cavity;
import coldseam.solver.detail.Accuracy;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class TextCardTest {
  private static String card() {
    return Sheet.card(Samples.subject(), Samples.estimated(), Ink.NONE);
  }

  @Test
  void numbers_stand_first_and_say_that_they_are_not_certified() {
    assertThat(card())
        .startsWith(
            """
            Slab edge
            cases/slab.yaml

            Result  films for heat loss; after a ψ, how lengths are measured
              ψ external of floor edge  indoors – outdoors  0.6123  ± 0.0005  W/(m·K)   estimate  external
              U wall                    indoors – outdoors  0.2134  ± 0.0001  W/(m²·K)  estimate  over 600 mm
              R wall                    films included       4.686   ± 0.004  m²·K/W    estimate
              L2D                       indoors – outdoors  1.2346  ± 0.0005  W/(m·K)   estimate
              Not certified: ± is an estimate of the numerical error, not a bound (no bounds are computed)
            """);
  }

  @Test
  void a_psi_accounts_for_what_was_taken_off() {
    assertThat(card())
        .contains(
            """
            ψ external = L2D less what is counted elsewhere  W/(m·K), external dimensions
              L2D indoors – outdoors   1.2346
              less wall above         −0.3000  U 0.2000 × 1.5000 m
              less floor              −0.1600  b 0.5 × U 0.3199 to 0.3201 × 1.0000 m
              ψ                        0.6123  ± 0.0005
            """);
  }

  @Test
  void flows_are_signed_and_surfaces_say_their_films() {
    assertThat(card())
        .contains("  indoors            20.0 °C  +30.86  ± 0.02\n")
        .contains("  outdoors           −5.0 °C  −30.86  ± 0.02\n")
        .contains("  through slab edge            −3.25  ± 0.01  400 mm, facing outdoors\n")
        .contains(
            "Surface temperatures  estimates; Rs in m²·K/W, places in mm; f_Rsi relative to outdoors\n")
        .contains(
            "  indoors  coldest  13.12 ± 0.01 °C  f_Rsi 0.725  Rs 0.25,  surface films  at (0, −200)\n")
        .contains("  A  11.23 °C  heat-loss films  at (123.4, −500)\n");
  }

  /** Cavities that did not settle are not said to have. */
  @Test
  void what_did_not_settle_says_so() {
    Cavity drawn = Samples.estimated().cavities().get(0);
    Cavity.Counted as = drawn.counted().orElseThrow();
    Cavity unsettled =
        new Cavity(
            drawn.name(),
            drawn.fill(),
            drawn.at(),
            drawn.areaM2(),
            drawn.rule(),
            drawn.ventilation(),
            drawn.slitM(),
            drawn.space(),
            Optional.of(
                new Cavity.Counted(
                    as.box(),
                    as.direction(),
                    as.emissivities(),
                    as.conductivityWPerMK(),
                    as.form(),
                    as.temperatures(),
                    as.stated(),
                    as.differenceK(),
                    as.meanC(),
                    12,
                    false)));
    TerminalText text = new TerminalText(Ink.NONE, TextCard.PAGE);
    new CavitySection(List.of(unsettled)).write(text, Units.of(Samples.subject()), Ink.NONE);
    assertThat(text.text()).contains("Not settled in 12 passes: nothing is certified");
  }

  @Test
  void cavities_are_listed_with_what_they_count_as() {
    assertThat(card())
        .contains(
            """
            Air cavities  heat flows along d; d, b and places in mm, λ in W/(m·K)
                        at                                   d  b  flow  ε         λ
              cavity 1  (45, 42.1)  slightly ventilated     54  6  ↓     0.9 0.25  0.2050 at 7.5 K, 9.2 °C
              cavity 2  (500, 500)  layer, well ventilated                         part of outdoors
              Settled in 5 passes; every ± holds for these conductivities
            """);
  }

  @Test
  void what_it_rests_on_and_who_decides_stand_on_it() {
    assertThat(card())
        .contains("Assumed\n  ISO 6946, Rsi horizontal\n    film of indoors, walls: 0.13 m²·K/W\n")
        .contains("Warnings\n  ! the cut-off plane at the top is 0.8 m from the slab")
        .contains("1,234 triangles, 5,678 unknowns")
        .contains("a licensed professional decide")
        .doesNotContain("\u001b");
  }

  /** 1 W/(m·K) is 0.577789 Btu/(h·ft·°F), 1 m²·K/W is 5.678263 h·ft²·°F/Btu (NIST SP 811, B.9). */
  @Test
  void a_case_in_inches_has_us_figures_beside_si() {
    assertThat(Units.PSI).isCloseTo(0.577789, offset(5e-7));
    assertThat(Units.R).isCloseTo(5.678263, offset(5e-7));
    assertThat(Units.FLOW).isCloseTo(1.040022, offset(5e-6));
    assertThat(Sheet.card(Samples.inches(), Samples.estimated(), Ink.NONE))
        .contains("0.3538") // 0.61234 × 0.577789
        .contains("26.61") // 4.686036 × 5.678263
        .contains("20.0 °C = 68.0 °F")
        .contains("at (0, −7.87)")
        .contains("variant steel, \"light\"");
  }

  @Test
  void bounds_are_called_bounds_only_when_proved() {
    assertThat(Sheet.card(Samples.subject(), Samples.certified(), Ink.NONE))
        .contains("1.2346  ± 0.0004   ± 0.31  W/(m·K)   certified\n")
        .contains("Certified: the exact number of the section as resolved lies within its ±")
        .doesNotContain("Not certified");
    assertThat(Sheet.card(Samples.subject(), Samples.mixed(), Ink.NONE))
        .contains("1.2346  ± 0.0004   ± 0.31  W/(m·K)   certified\n")
        .contains("4.686   ± 0.004           m²·K/W    estimate\n")
        .contains("Not certified where it says estimate: ±");
    assertThat(Words.certified(Samples.certified())).isTrue();
    assertThat(Words.certified(Samples.mixed())).isFalse();
  }

  @Test
  void a_second_half_width_is_that_of_the_tolerances() {
    assertThat(Sheet.card(Samples.subject(), Samples.certified(), Ink.NONE))
        .contains("0.2134  ± 0.0001  ± 0.054  W/(m²·K)")
        .containsIgnoringWhitespaces(
            "Second ±: conductivities anywhere within their stated tolerances; certified for every"
                + " combination of them")
        .doesNotContain("first order, estimated");
    assertThat(Sheet.card(Samples.subject(), Samples.mixed(), Ink.NONE))
        .containsIgnoringWhitespaces(
            "tolerances: the worst combination to first order, estimated (more than two spaces"
                + " take part)");
    assertThat(card()).doesNotContain("Second ±");
  }

  @Test
  void shares_stand_beside_the_heat_flow_through_stretches() {
    assertThat(card())
        .contains(
            """
            Shares  of L2D indoors – outdoors; films for heat loss
                                   share  tolerance  ψ external
              insulation          80.0 %      ± 3 %     +0.0012
              film indoors 0.13   20.0 %                −0.0002
              foil               < 0.1 %
            """)
        .containsIgnoringWhitespaces(
            "A share says what the number hangs on, not where the heat passes: that is the heat"
                + " flow through each stretch: slab edge −3.2 W/m");
    assertThat(Sheet.card(Samples.subject(), Samples.infinite(), Ink.NONE))
        .doesNotContain("Shares");
  }

  @Test
  void an_infinite_coupling_is_no_number() {
    assertThat(Sheet.card(Samples.subject(), Samples.infinite(), Ink.NONE))
        .contains("∞       ± ?  W/(m·K)")
        .containsIgnoringWhitespaces("two fixed temperatures meet in a point");
  }

  @Test
  void accuracy_is_reached_or_not_by_what_was_asked() {
    assertThat(Sheet.accurateEnough(Samples.subject(), Samples.estimated())).isTrue();
    assertThat(Sheet.accurateEnough(Samples.subject(), Samples.infinite())).isTrue();
    Accuracy[] asked = {
      new Accuracy(0.0003, 1, 1, 1, 100), // L2D is known to 0.0004 / 1.23456 = 0.00032 of itself
      new Accuracy(1, 0.0003, 1, 1, 100),
      new Accuracy(1, 1, 0.0003, 1, 100), // ψ to 0.00042, of which 0.00005 is the range of a U
      new Accuracy(1, 1, 1, 0.0004, 100) // U to 0.0001 / 0.2134 = 0.00047
    };
    for (Accuracy accuracy : asked) {
      assertThat(new Reached(accuracy).by(Samples.estimated())).as(accuracy.toString()).isFalse();
    }
    assertThat(new Reached(new Accuracy(0.00033, 0.00041, 0.00043, 0.00048, 100)))
        .matches(reached -> reached.by(Samples.estimated()));
  }

  /** 0.0004 of 1.23456 was reached; 0.01 % of it, 0.000123, was asked for. */
  @Test
  void an_accuracy_not_reached_says_which_number_and_what_to_do() {
    Subject asked =
        new Subject(
            "Slab edge",
            "cases/slab.yaml",
            Optional.empty(),
            "mm",
            0.001,
            new Accuracy(0.0001, 1, 0.0003, 0.002, 6000),
            "0.1.0");
    assertThat(Sheet.card(asked, Samples.estimated(), Ink.NONE))
        .contains(
            """
              Accuracy not reached
                ! ψ external: asked ± 0.000350, reached ± 0.00042 W/(m·K)
                ! L2D indoors – outdoors: asked ± 0.000123, reached ± 0.00040 W/(m·K)
            """)
        .containsIgnoringWhitespaces(
            "refinement stopped at 5,678 unknowns, with 6,000 allowed: allow more with"
                + " --most-unknowns, or ask for a coarser accuracy of psi, L2D with --accuracy");
    assertThat(card()).doesNotContain("not reached");
    assertThat(Sheet.accuracyMissed(Samples.subject(), Samples.estimated())).isEmpty();
  }

  @Test
  void the_card_ends_with_the_version_and_says_what_flows_in_flows_out() {
    assertThat(card())
        .endsWith("\nColdseam 0.1.0\n")
        .containsPattern("balance +0\\.00 +what flows in flows out\n");
  }
}
