package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.FilmRule;
import coldseam.solver.detail.Space;
import java.nio.file.Path;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class SpacesAndFilmsTest {
  @TempDir private Path folder;

  private Detail detail(String spaces) throws CaseException {
    return Written.read(
            folder,
            Written.HEAD
                + "materials: {a: {conductivity: 1}}\n"
                + "section: [{fill: a, box: [0, 0, 1, 1]}]\n"
                + "spaces:\n"
                + "  cold: {temperature: -5, exposure: outside}\n"
                + spaces)
        .detail(Optional.empty());
  }

  private Space space(String keys) throws CaseException {
    return detail("  room: {" + keys + "}\n").spaces().get(1);
  }

  private static void is(FilmRule rule, double up, double horizontal, double down) {
    assertThat(rule.upM2KPerW()).isCloseTo(up, within(5e-5));
    assertThat(rule.horizontalM2KPerW()).isCloseTo(horizontal, within(5e-5));
    assertThat(rule.downM2KPerW()).isCloseTo(down, within(5e-5));
  }

  /** ISO 6946:2017, table 7; ISO 13788:2012, table 2 (from memory). */
  @Test
  void iso_is_the_default() throws CaseException {
    Space room = space("temperature: 20, exposure: inside");
    is(room.heatLoss(), 0.10, 0.13, 0.17);
    is(room.surface(), 0.25, 0.25, 0.25);
    assertThat(room.surface().glazingM2KPerW()).isEqualTo(0.13);
    Space cold = detail("").spaces().get(0);
    is(cold.heatLoss(), 0.04, 0.04, 0.04);
    is(cold.surface(), 0.04, 0.04, 0.04);
    assertThat(space("temperature: 20, exposure: inside, film: iso")).isEqualTo(room);
  }

  /**
   * ASHRAE Handbook Fundamentals 2021, chapter 26, table 10: 0.61, 0.68, 0.92 h·ft²·°F/Btu inside,
   * 0.17 at 15 mph outside; 1 h·ft²·°F/Btu = 0.1761102 m²·K/W.
   */
  @Test
  void ashrae_by_name() throws CaseException {
    Space room = space("temperature: 20, exposure: inside, film: ashrae");
    is(room.heatLoss(), 0.10743, 0.11975, 0.16202);
    assertThat(room.surface()).isEqualTo(room.heatLoss());
    is(
        space("temperature: 0, exposure: outside, film: ashrae").heatLoss(),
        0.02994,
        0.02994,
        0.02994);
    assertThat(detail("  room: {temperature: 20, exposure: inside, film: ashrae}\n").assumptions())
        .anyMatch(
            a ->
                a.what().equals("films of room for surface temperatures")
                    && a.value().equals("the same as for heat loss"));
  }

  @Test
  void typed_films_hold_in_both_sets_unless_a_set_is_named() throws CaseException {
    Space number = space("temperature: 20, film: 0.11");
    is(number.heatLoss(), 0.11, 0.11, 0.11);
    assertThat(number.surface()).isEqualTo(number.heatLoss());
    Space directions = space("temperature: 20, film: {up: 0.11, horizontal: 0.12, down: 0.16}");
    is(directions.heatLoss(), 0.11, 0.12, 0.16);
    assertThat(directions.surface()).isEqualTo(directions.heatLoss());
    Space one = space("temperature: 20, exposure: inside, film: {heat-loss: 0.2}");
    is(one.heatLoss(), 0.2, 0.2, 0.2);
    is(one.surface(), 0.25, 0.25, 0.25);
    Space both = space("temperature: 20, film: {heat-loss: fixed, surface: 0.68 h ft2 F/Btu}");
    assertThat(both.heatLoss().fixedTemperature()).isTrue();
    is(both.surface(), 0.11975, 0.11975, 0.11975);
  }

  @Test
  void fixed_surfaces() throws CaseException {
    Space room = space("temperature: 20, film: fixed");
    assertThat(room.heatLoss().fixedTemperature()).isTrue();
    assertThat(room.surface().fixedTemperature()).isTrue();
    assertThat(space("temperature: 20, film: 0").heatLoss().fixedTemperature()).isTrue();
  }

  @Test
  void without_exposure_the_coldest_space_is_taken_as_outside_and_that_is_said()
      throws CaseException {
    Detail detail =
        detail("  room: {temperature: 20, film: 0.1}\n  sky: {temperature: -9, film: 0.1}\n");
    assertThat(detail.spaces().get(1).exposure()).isEqualTo(Exposure.INSIDE);
    assertThat(detail.spaces().get(2).exposure()).isEqualTo(Exposure.OUTSIDE);
    assertThat(detail.assumptions())
        .anyMatch(a -> a.what().equals("exposure of room") && a.value().startsWith("inside"))
        .anyMatch(a -> a.what().equals("exposure of sky") && a.value().startsWith("outside"));
  }

  @Test
  void floating_spaces() throws CaseException {
    Space free = space("floats: true, film: 0.1");
    assertThat(free.floating()).contains(new Space.Floating(0, ""));
    Space bound = space("floats: {conductance: 1.5, to: cold}, exposure: inside");
    assertThat(bound.floating()).contains(new Space.Floating(1.5, "cold"));
  }

  @Test
  void what_spaces_cannot_be() {
    String wall = Written.WALL;
    String[][] mistakes = {
      {"temperature: 20, exposure: inside, film: isoo", "`isoo` is no film; did you mean `iso`?"},
      {"temperature: 20, film: iso", "depend on its exposure"},
      {"temperature: 20, film: {up: 0.1}", "has no `horizontal`"},
      {"temperature: 20, film: {up: 0, horizontal: 0.1, down: 0.1}", "0 in some directions only"},
      {"temperature: 20, film: -0.1", "is negative: -0.1"},
      {"temperature: 20, film: 1e-9", "write `fixed`"},
      {"temperature: 20, film: {heat-loss: 0.1, surfaces: 0.2}", "did you mean `surface`?"},
      {"temperature: 20, floats: true, film: 0.1", "has both"},
      {"floats: maybe, film: 0.1", "`floats` is `true` or a conductance"},
      {"floats: {conductance: 1, to: outdors}, film: 0.1", "did you mean `outdoors`?"},
      {"floats: {conductance: 1, to: indoors}, film: 0.1", "loses heat to itself"},
      {"floats: {conductance: -1, to: outdoors}, film: 0.1", "is negative: -1"},
    };
    for (String[] mistake : mistakes) {
      String text = wall.replace("temperature: 20, exposure: inside", mistake[0]);
      assertThat(Written.problems(folder, text))
          .as(mistake[0])
          .anyMatch(p -> p.contains(mistake[1]));
    }
  }
}
