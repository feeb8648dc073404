package coldseam.cli.sheet;

import static org.assertj.core.api.Assertions.assertThat;

import coldseam.cases.Case;
import coldseam.cases.CaseFile;
import coldseam.cases.Changes;
import coldseam.cases.study.Lines;
import coldseam.cases.study.Measure;
import coldseam.cases.study.Point;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.result.Result;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.assertj.core.data.Offset;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A line of a sweep read back has the numbers that were written. */
class StudyLineTest {
  @ParameterizedTest
  @ValueSource(
      strings = {
        "demo/balcony.yaml",
        "demo/timber-stud.yaml",
        "demo/cellar.yaml",
        "demo/rod-through-wall.yaml",
        "published/iso-10211-case-1.yaml"
      })
  void every_number_comes_back(String name) throws Exception {
    Case from = CaseFile.read(Path.of("../cases").resolve(name));
    Result result = Solver.solve(from.detail(Optional.empty()), from.accuracy(), Progress.SILENT);
    Subject subject = Subject.of(from, name, Optional.empty(), from.accuracy(), "1");
    Map<String, String> settings = Map.of("a, \"b\"", "5 in");
    String text =
        StudyLine.write(
            "0f", new Point(3, settings, new Changes(settings, Map.of())), subject, result);
    assertThat(text).startsWith("{\"coldseam\":\"1\"").doesNotContain("\n");
    Lines.Line line = Lines.read(text).get();
    assertThat(line.study()).isEqualTo("0f");
    assertThat(line.settings()).isEqualTo(settings);
    assertThat(StudyLine.accurateEnough(line)).isTrue();
    List<Measure> written = Measure.all(result);
    List<Measure> read = StudyLine.measures(line);
    assertThat(read).hasSameSizeAs(written);
    for (int i = 0; i < read.size(); i++) {
      Measure a = written.get(i);
      Measure b = read.get(i);
      assertThat(b.typedName()).isEqualTo(a.typedName());
      assertThat(b.kind()).isEqualTo(a.kind());
      assertThat(b.knowledge()).isEqualTo(a.knowledge());
      assertThat(b.value()).isEqualTo(a.value());
      if (a.knowledge() == Measure.Knowledge.ESTIMATE) {
        assertThat(b.lower()).isCloseTo(a.lower(), Offset.offset(1e-9));
      } else {
        assertThat(b.lower()).isEqualTo(a.lower());
        assertThat(b.upper()).isEqualTo(a.upper());
      }
    }
  }
}
