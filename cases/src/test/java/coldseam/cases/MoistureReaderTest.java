package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;

import coldseam.solver.detail.Wanted;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Moisture checks and requirements as they are written. */
class MoistureReaderTest {
  @TempDir private Path folder;

  @Test
  void what_is_stated_of_a_check() throws CaseException {
    assertThat(
            Written.read(
                    folder,
                    Written.WALL
                        + """
                        moisture:
                          spaces: indoors
                          outside: [outdoors]
                          climate: {January: [-1, 85 %], July: {temperature: 68 F, humidity: 0.7}}
                          class: 3
                          criterion: condensation
                        require: {fRsi: 0.7, moisture: true}
                        """)
                .detail(Optional.empty())
                .wanted())
        .containsExactly(
            new Wanted.Moisture(
                List.of("indoors"),
                List.of("outdoors"),
                List.of(
                    new Wanted.Moisture.Month("January", -1, 0.85),
                    new Wanted.Moisture.Month("July", 20, 0.7)),
                OptionalDouble.empty(),
                OptionalDouble.of(810),
                "humidity class 3, upper limit",
                1.0),
            new Wanted.Requirement(Wanted.Requirement.Kind.F_RSI, "", 0.7),
            new Wanted.Requirement(Wanted.Requirement.Kind.MOISTURE, "", Double.NaN));
  }

  @Test
  void what_is_wrong_with_a_check() {
    assertThat(
            Written.problems(
                folder,
                Written.WALL
                    + """
                    moisture:
                      spaces: [outdoors, indors]
                      climate: {January: -1, May: [12]}
                      class: 5
                      humidity: 50 %
                      criterion: mold
                    """))
        .containsExactly(
            "13:11: `outdoors` is outside; surfaces of inside spaces are judged",
            "13:22: `indors` is no space of this case; did you mean `indoors`?",
            "14:22: `January` has no humidity, on which the air indoors depends; write `[-1, 85 %]`",
            "14:31: `May` is a temperature and a humidity, not a list of 1; write `[-1, 85 %]`",
            "15:10: humidity class 5 has no upper limit; give 1 to 4, or the `excess` of the use, in"
                + " Pa",
            "16:3: `moisture` has both `class` and `humidity`; indoor air follows from one of them",
            "17:14: `criterion` is `mould` or `condensation`, not `mold`; did you mean `mould`?");
    assertThat(Written.problems(folder, Written.WALL + "moisture: {class: 2}\n"))
        .containsExactly(
            "12:12: `class` counts on top of the air outdoors, month by month; add a `climate`, or"
                + " type the `humidity` indoors");
  }

  @Test
  void what_is_wrong_with_requirements() {
    assertThat(
            Written.problems(
                folder,
                Written.WALL
                    + """
                    U: {of: wall, between: [indoors, outdoors]}
                    require: {fRsi: {attic: 0.7}, psi: {external: 0.1}, U: {wal: 0.2}, moisture: true}
                    """))
        .containsExactly(
            "13:18: there is no space `attic`; known are `indoors` and `outdoors`",
            "13:37: there is no ψ `external`",
            "13:57: there is no U of `wal`; did you mean `wall`?",
            "13:68: no moisture check is asked for; add `moisture: {}`, or say more of it");
    assertThat(Written.problems(folder, Written.WALL + "require: {fRsi: 1.2}\n"))
        .containsExactly(
            "12:17: `fRsi` of `require` is out of range: 1.2; it is 0 to 1, e.g. `0.7`");
  }
}
