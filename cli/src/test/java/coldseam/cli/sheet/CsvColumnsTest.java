package coldseam.cli.sheet;

import static org.assertj.core.api.Assertions.assertThat;

import coldseam.cases.Case;
import coldseam.cases.CaseFile;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;

/** The table and what README.md says of it. */
class CsvColumnsTest {
  /** Promised: columns may be added at the end, these stay. */
  private static final String PROMISED =
      "file,variant,quantity,name,between,dimensions,filmSet,certified,value_W_per_mK,"
          + "lower_W_per_mK,upper_W_per_mK,estimatedHalfWidth_W_per_mK,value_W_per_m2K,"
          + "lower_W_per_m2K,upper_W_per_m2K,estimatedHalfWidth_W_per_m2K,value_m2K_per_W,"
          + "lower_m2K_per_W,upper_m2K_per_W,estimatedHalfWidth_m2K_per_W,U_W_per_m2K,length_m,"
          + "heatFlow_W_per_m,temperature_C,estimatedError_K,x_mm,y_mm,distance_mm,Rs_m2K_per_W,"
          + "fRsi,g,share,changePer10Percent_W_per_mK,toleranceHalfWidth_W_per_mK,"
          + "toleranceLower_W_per_mK,toleranceUpper_W_per_mK,toleranceHalfWidth_W_per_m2K,"
          + "toleranceLower_W_per_m2K,toleranceUpper_W_per_m2K,"
          + "requiredFRsi,margin_K,surfaceHumidity,outdoors_C,dewPoint_C,mouldLimit_C,"
          + "value_W_per_K,lower_W_per_K,upper_W_per_K,estimatedHalfWidth_W_per_K,area_m2,"
          + "psi_W_per_mK,heatFlow_W,changePer10Percent_W_per_K,toleranceHalfWidth_W_per_K,"
          + "toleranceLower_W_per_K,toleranceUpper_W_per_K";

  private static Path root() {
    Path folder = Path.of("").toAbsolutePath();
    while (!Files.isDirectory(folder.resolve("cases/demo"))) {
      folder = folder.getParent();
    }
    return folder;
  }

  private static List<String[]> rows(String name) throws Exception {
    Case read = CaseFile.read(root().resolve("cases/demo").resolve(name));
    Subject subject = Subject.of(read, name, Optional.empty(), read.accuracy(), "1");
    String csv =
        Sheet.csv(
            subject, Solver.solve(read.detail(Optional.empty()), read.accuracy(), Progress.SILENT));
    List<String[]> rows = new ArrayList<>();
    csv.lines().forEach(line -> rows.add(line.split(",", -1)));
    return rows;
  }

  @Test
  void columns_are_as_promised_and_all_are_told_in_the_readme() throws Exception {
    String heading = String.join(",", rows("balcony.yaml").get(0));
    assertThat(heading).startsWith(PROMISED);
    String readme = Files.readString(root().resolve("README.md"));
    String section =
        readme.substring(
            readme.indexOf("## Results as data"), readme.indexOf("## How far to trust it"));
    for (String column : heading.split(",")) {
      String stem = column.substring(0, column.indexOf('_') + 1);
      boolean told =
          section.contains("`" + column + "`")
              || section.contains("`" + stem + "`")
                  && section.contains(column.substring(stem.length()) + "`");
      assertThat(told).as(column).isTrue();
    }
  }

  @Test
  void every_quantity_is_told_in_the_readme() throws Exception {
    String readme = Files.readString(root().resolve("README.md"));
    Set<String> met = new TreeSet<>();
    for (String name :
        List.of("balcony.yaml", "timber-stud.yaml", "cellar.yaml", "rod-through-wall.yaml")) {
      List<String[]> rows = rows(name);
      for (String[] row : rows.subList(1, rows.size())) {
        met.add(row[2]);
      }
    }
    assertThat(met)
        .contains("coupling", "psi", "chi", "subtracted", "U", "R", "space", "coldest", "share");
    for (String quantity : met) {
      assertThat(readme).contains("`" + quantity + "`");
    }
  }
}
