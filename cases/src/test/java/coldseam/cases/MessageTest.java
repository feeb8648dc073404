package coldseam.cases;

import static coldseam.cases.Written.HEAD;
import static coldseam.cases.Written.WALL;
import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The whole text of what is said to common mistakes. */
class MessageTest {
  @TempDir private Path folder;

  private void says(String text, String... problems) {
    assertThat(Written.problems(folder, text)).containsExactly(problems);
  }

  @Test
  void the_sample_itself_has_no_mistake() {
    says(WALL);
  }

  @Test
  void five_mistakes_are_listed_in_one_go_in_line_order() {
    says(
        """
        coldseam: 1
        titel: Balcony
        materials:
          masonry: {conductivity: -0.5}
          board: mineral wol
        spaces:
          indoors: {temperature: 20, exposure: insde}
          outdoors: {temperature: -5, exposure: outside}
        section:
          - {fill: masonri, box: [0, 0, 240, 1000]}
        """,
        "2:1: a case has no key `titel`; did you mean `title`?",
        "4:27: `conductivity` of material `masonry` is negative: -0.5; it is 0 to 100000 W/(m K), e.g."
            + " `0.035`",
        "5:10: `mineral wol` is no material of the library; did you mean `mineral wool`?",
        "7:40: `exposure` is `inside` or `outside`, not `insde`; did you mean `inside`?",
        "10:12: `masonri` is no material or space of this case, nor a material of the library; did"
            + " you mean `masonry`?");
  }

  @Test
  void numbers_that_are_none() {
    says(
        WALL
            + """
            points:
              a: [.nan, 0]
              b: [-.inf, NaN]
              c: [1e308, 1e309]
              d: [9^9^9, 1/0]
              e: [12 mn, 1 2]
              f: [3 * (4 + 1, sqrt(-1)]
              g: [wal, 2 +]
            """,
        "13:7: point `a`, first number: `.nan` is not a number to count with; write a finite"
            + " number",
        "14:8: point `b`, first number: `.inf` is not a number to count with; write a finite"
            + " number",
        "14:14: point `b`, second number: `NaN` is not a number to count with; write a finite"
            + " number",
        "15:7: point `c`, first number is out of range: 1e308; it is a length of at most 1000 km,"
            + " e.g. `160 mm`",
        "15:14: point `c`, second number is too large to be counted: `1e309`; write a number",
        "16:7: point `d`, first number is too large to be counted: `9^9^9`; write a number",
        "16:15: point `d`, second number: divides by zero; the divisor must not be 0",
        "17:10: point `e`, first number: `mn` is no unit known here; units are `mm`, `cm`, `m`,"
            + " `in`, `ft`, `mil`, `W/(m K)`, `m2 K/W`, `W/(m2 K)`, `Btu in/(h ft2 F)`, `h ft2"
            + " F/Btu`, `C`, `F`, `K`, `deg` and `%`; between two numbers stands one of + - * / ^",
        "17:16: point `e`, second number: `2` does not belong here; write a number, a value's name,"
            + " or arithmetic on them",
        "18:17: point `f`, first number: a bracket is not closed; add `)`",
        "18:19: point `f`, second number: takes the square root of a negative number; a square root"
            + " wants a square",
        "19:7: point `g`, first number: `wal` is no named value; define it under `values`, or write"
            + " a number",
        "19:15: point `g`, second number: something is missing at the end; end with a number");
  }

  @Test
  void quantities_out_of_place() {
    says(
        HEAD
            + """
            values:
              board: 0.04 W/(m K)
              depth: 160 mm + board
            materials:
              masonry: {conductivity: 240 mm, tolerance: 100 %}
              other: {resistance: 13, thickness: 0}
              third: {conductivity: 1, angle: 30}
            spaces:
              indoors: {temperature: 293 K, exposure: inside, humidity: 50}
              outdoors: {temperature: -300, exposure: outside}
            section:
              - {fill: masonry, box: [0, 0, board, 10 mm]}
            """,
        "5:17: value `depth`: adds a length and a thermal conductivity; only like quantities add up",
        "7:27: `conductivity` of material `masonry` cannot be a length; it is 0 to 100000 W/(m K),"
            + " e.g. `0.035`",
        "7:46: `tolerance` of material `masonry` is out of range: 100 %; it is 0 up to less than"
            + " 100 %, e.g. `10 %`",
        "8:38: `thickness` of material `other` is out of range: 0; it is a length of 0.001 mm or"
            + " more, e.g. `160 mm`",
        "9:28: material `third` has an `angle` but one conductivity for every direction; give"
            + " `conductivity: [along, across]`, or leave `angle` away",
        "11:26: `temperature` of space `indoors` cannot be a difference of temperatures; it is a"
            + " temperature in °C or F, e.g. `20` or `68 F`",
        "11:61: `humidity` of space `indoors` is out of range: 50; it is 0 to 100 %, e.g. `50 %`",
        "12:27: `temperature` of space `outdoors` is out of range: -300; it is a temperature in °C"
            + " or F, e.g. `20` or `68 F`",
        "14:33: `x2` of the box cannot be a thermal conductivity; it is a length of at most 1000"
            + " km, e.g. `160 mm`");
  }

  @Test
  void shapes_that_cannot_be_drawn() {
    says(
        HEAD
            + """
            materials: {a: {conductivity: 1}}
            spaces: {i: {temperature: 1, film: 0.1}, o: {temperature: 0, film: 0.1}}
            section:
              - {fill: a, polygon: [[0, 0], [100, 100], [100, 0], [0, 100]]}
              - {fill: a, polygon: [[0, 0], [100, 0], [100, 100], [50, -50], [0, 100]]}
              - {fill: a, polygon: [[0, 0], [100, 0], [100, 100], [50, 0], [0, -50]]}
              - {fill: a, polygon: [[0, 0], [100, 0], [200, 0]]}
              - {fill: a, polygon: [[0, 0], [100, 0]]}
              - {fill: a, box: [0, 0, 0, 10]}
              - {fill: a, box: [0, 0, 2,5, 1]}
              - {fill: a, disc: {centre: [0, 0], radius: 0}}
              - {fill: a, disc: {centre: [0, 0], radius: 1, from: 90, to: 0}}
              - {fill: a, strip: {along: [[0, 0], [100, 0], [0, 0]], thickness: 1}}
              - {fill: a, strip: {along: [[0, 0], [100, 0], [100, 2], [0, 2]], thickness: 5}}
              - {fill: a, strip: {along: [[0, 0], [100, 0], [50, 50], [50, -50]], thickness: 1}}
              - {stack: {face: [[0, 0], [0, 10]], towards: up}, layers: [[a, 1]]}
              - {fill: a, box: [0, 0, 1, 1], disc: {centre: [0, 0], radius: 1}}
              - {fill: a}
              - {fil: a, box: [0, 0, 1, 1]}
              - {fill: i, group: [{fill: a, box: [0, 0, 1, 1]}]}
            """,
        "6:24: this polygon crosses itself: the edge from [0, 0] to [100, 100] meets that from [100,"
            + " 0] to [0, 100]; list the corners in order around it",
        "7:24: this polygon crosses itself: the edge from [0, 0] to [100, 0] meets that from [100,"
            + " 100] to [50, -50]; list the corners in order around it",
        "8:24: this polygon crosses itself: the edge from [0, 0] to [100, 0] meets that from [50, 0] to"
            + " [0, -50]; list the corners in order around it",
        "9:24: this polygon has no area; list the corners in order around it",
        "10:24: a polygon has 2 different points; it needs 3 or more",
        "11:20: this box has no width; give two opposite corners, `[x1, y1, x2, y2]`",
        "12:20: a box is four numbers, not a list of 5; write `[x1, y1, x2, y2]`, two opposite"
            + " corners, with decimal points, not commas",
        "13:46: `radius` of the disc is out of range: 0; it is a length of 0.001 mm or more, e.g."
            + " `160 mm`",
        "14:59: this sector reaches over -90 degrees; `to` is more than `from`, by at most 360",
        "15:22: this strip turns back on itself at point 2; lay it in pieces, or give its outline as"
            + " a polygon",
        "16:22: this strip is too thick for the short piece between points 2 and 3; lay it in"
            + " pieces, or give its outline as a polygon",
        "17:22: this strip crosses itself: the edge from [0, -0.5] to [101.207, -0.5] meets that"
            + " from [49.5, 51.2071] to [49.5, -50]; lay it in pieces that do not overlap",
        "18:48: `towards` runs along the face; name a side that the face looks to",
        "19:5: this entry has `box` and `disc` at once; write an entry of its own for each",
        "20:5: this entry has no shape; add `box`, `polygon`, `disc`, `strip`, `drawing` or `around`,"
            + " or write a `stack` or a `group`",
        "21:6: this box has no key `fil`; did you mean `fill`?",
        "22:6: this group has no key `fill`; known are `group`, `part`, `mirror`, `rotate`, `move` and"
            + " `repeat`");
  }

  @Test
  void names_that_mean_nothing() {
    says(
        WALL
            + """
            stretches:
              inner: {side: lft, space: indors}
              indoors: {side: left}
            flanks: {low: {cut: bottom}}
            psi:
              a: {between: [indoors, outdors], dimensions: externl, subtract: [{flank: lwo}]}
            profiles: {p: {surface-of: outdoor}}
            variants:
              v: {values: {insulation: 3}, fills: {masony: masonry}}
            expect:
              - {psi: b, value: 1, within: 0.1, source: x, status: sen, variant: w}
            """,
        "13:17: `side` is `left`, `right`, `top` or `bottom`, not `lft`; did you mean `left`?",
        "13:29: `indors` is no space of this case; did you mean `indoors`?",
        "14:3: `indoors` names a space or a material as well as a stretch; choose another name for"
            + " the stretch",
        "17:26: `outdors` is no space of this case; did you mean `outdoors`?",
        "17:48: `dimensions` is `internal`, `overall-internal` or `external`, not `externl`; did you"
            + " mean `external`?",
        "17:76: `lwo` is no flank named in this case; did you mean `low`?",
        "18:28: `outdoor` is no space of this case; did you mean `outdoors`?",
        "20:16: the case has no value `insulation` to replace; give the case `values` that variants can replace",
        "20:40: in variant `v`: no shape has the name or the fill `masony`; name a fill that is laid,"
            + " or the `name` of a shape",
        "22:11: `b` is not a ψ of this case; known are `a`",
        "22:56: `status` is `seen`, `computed`, `memory` or `invented`, not `sen`; did you mean"
            + " `seen`?",
        "22:70: `w` is not a variant of this case; known are `v`");
  }

  @Test
  void what_is_missing() {
    says(
        HEAD
            + """
            materials: {a: {tolerance: 5 %}, b: {thickness: 1}}
            spaces: {i: {exposure: inside}, o: {temperature: 0}}
            section: [{fill: , box: [0, 0, 1, 1]}, {box: [0, 0, 1, 1]}]
            psi: {p: {between: [i, q]}}
            U: {of: wall}
            stretches: {s: {flow: 3}, t: {side: left, film: 0.1}}
            flanks: {f: {U: 0.2}}
            expect: [{value: 1}]
            """,
        "3:16: material `a` has no conductivity; add `conductivity: …`, or `from: NAME` with a name"
            + " of the library",
        "3:37: material `b` has no `resistance`; add `resistance: …`, e.g. `R-13`",
        "4:13: space `i` has no `temperature`; add `temperature: 20`, in °C",
        "4:36: space `o` has no `exposure`, which decides its films; add `exposure: inside` or"
            + " `exposure: outside`",
        "5:12: `fill` has no value; give it one, or leave the key away",
        "5:40: this box has no `fill`; add `fill: ` and a material or a space",
        "6:7: ψ `p` does not say in which dimensions it is, and without them it means nothing; add"
            + " `dimensions: internal`, `overall-internal` or `external`",
        "6:24: `q` is no space of this case; known are `i` and `o`",
        "7:4: `U` has no `between`; add `between: [indoors, outdoors]`",
        "8:16: stretch `s` lies nowhere; add `along: [[x, y], [x, y]]`, or `side: left`, `right`,"
            + " `top` or `bottom`",
        "8:37: no straight edge of the section lies on the left; give the points of the line"
            + " themselves",
        "8:43: stretch `t` has a film but no space; add `space: ` and the space it faces",
        "9:13: flank `f` has no cut-off plane; add `cut: left`, `right`, `top`, `bottom` or `[x,"
            + " y]`, or both `U` and `length`",
        "10:10: an expectation does not say of what; add one of `L2D`, `L3D`, `psi`, `chi`, `U`, `R`, `flow`,"
            + " `temperature`, `coldest`, `fRsi` and `weight`",
        "10:10: an expectation has no `within`; add `within: …`, e.g. `0.1 %`",
        "10:10: an expectation has no `source`; add `source: ` and where the value comes from",
        "10:10: an expectation has no `status`; add `status: ` and `seen`, `computed`, `memory` or"
            + " `invented`");
  }

  @Test
  void keys_and_values_written_twice() {
    says(
        WALL.replace("masonry: {", "masonry: {conductivity: 0.4, ")
            + """
            title: Again
            points: {a: [0, 0], a: [1, 1]}
            """,
        "4:32: `conductivity` is written twice; it already stands in line 4; keep one of them",
        "12:1: `title` is written twice; it already stands in line 2; keep one of them",
        "13:21: `a` is written twice; it already stands in line 13; keep one of them");
  }

  @Test
  void values_in_a_circle() {
    says(
        WALL + "values: {a: b + 1, b: c * 2, c: a, d: a}\n",
        "12:13: values refer to each other in a circle: `a` needs `b` needs `c` needs `a`; give one"
            + " of them a number");
  }

  @Test
  void values_that_cannot_be_calculated_with() {
    says(
        WALL + "values: {slab-edge: 1, min: 2, 3d: 3, slab edge: 4}\n",
        "12:10: `slab-edge` cannot be calculated with; name values by words of letters and digits,"
            + " beginning with a letter",
        "12:24: `min` cannot be calculated with; choose a name that means nothing yet",
        "12:32: `3d` cannot be calculated with; name values by words of letters and digits,"
            + " beginning with a letter");
  }

  @Test
  void spaces_of_unequal_temperature_are_not_joined() {
    says(
        WALL.replace("  outdoors: {", "  cellar: {temperature: 8, exposure: inside}\n  outdoors: {")
            + "psi: {p: {between: [[indoors, cellar], outdoors], dimensions: internal}}\n",
        "13:31: `between` of ψ `p` joins spaces of 20 and 8 °C; only spaces of equal temperature are"
            + " joined; weight the others by `b`");
  }

  @Test
  void a_mistake_only_in_a_variant_names_it() {
    says(
        WALL.replace("240,", "wall,")
            + """
            values: {wall: 240}
            variants:
              none: {values: {wall: 0}}
              unknown: {fills: {masonry: concret}}
            """,
        "9:26: in variant `none`: this box has no width; give two opposite corners, `[x1, y1, x2,"
            + " y2]`",
        "15:30: in variant `unknown`: `concret` is no material or space of this case, nor a"
            + " material of the library; did you mean `concrete`, `concrete 1800` or `concrete 2000` of the library?");
  }

  @Test
  void a_plan_has_no_up() {
    says(
        WALL + "view: plan\nup: [0, 1]\n",
        "13:1: a plan has no `up`; leave `up` away, or `view: plan`");
  }

  @Test
  void nothing_that_conducts() {
    says(
        WALL.replace("fill: masonry", "fill: hollow"),
        "8:1: nothing in the section conducts heat; lay one material at least");
  }

  @Test
  void a_long_list_of_mistakes_is_cut_short() {
    StringBuilder text = new StringBuilder(WALL);
    for (int i = 0; i < 500; i++) {
      text.append("  - {fill: masonry, box: [0, 0, x, 1]}\n");
    }
    List<String> problems = Written.problems(folder, text.toString());
    assertThat(problems).hasSize(Problems.MOST_LISTED + 1);
    assertThat(problems.get(Problems.MOST_LISTED))
        .isEqualTo("112:33: and 400 more mistakes from here on; mend those above first");
  }

  @Test
  void a_decimal_comma_is_called_one() {
    says(
        WALL.replace("conductivity: 0.5", "conductivity: 0,5, tolerance: 10 %")
            + "values: {depth: -0,16 m, other: 2}\n",
        "4:27: `conductivity` has a decimal comma: `0,5`; write 0.5 with a point",
        "12:17: `depth` has a decimal comma: `-0,16 m`; write -0.16 m with a point");
  }

  @Test
  void a_forgotten_name_is_asked_for() {
    says(
        WALL
            + """
            psi: {between: [indoors, outdoors], dimensions: external}
            flanks: {cut: top}
            stretches: {side: left, space: indoors}
            """,
        "12:7: a ψ needs a name before its `between`; write psi: {external: {between: …}}",
        "13:10: a flank needs a name before its `cut`; write flanks: {wall: {cut: …}}",
        "14:13: a stretch needs a name before its `side`; write stretches: {face: {side: …}}");
  }

  @Test
  void a_few_words_are_listed_once() {
    says(
        WALL + "unit: inch\n",
        "12:7: `unit` is `mm`, `cm`, `m` or `in`, not `inch`; did you mean `in`?");
    says(WALL + "unit: yard\n", "12:7: `unit` is `mm`, `cm`, `m` or `in`, not `yard`");
  }
}
