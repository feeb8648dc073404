package coldseam.cli;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.domain.JavaCodeUnit;
import com.tngtech.archunit.core.domain.JavaModifier;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/** The rules of the house. */
class ArchitectureTest {
  private static JavaClasses house;

  @BeforeAll
  static void look() {
    house =
        new ClassFileImporter()
            .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
            .importPackages("coldseam");
  }

  /** Without this, every other rule would hold of nothing. */
  @Test
  void all_four_modules_were_seen() {
    for (String door :
        List.of(
            "coldseam.mesh.partition.Partition",
            "coldseam.solver.Solver",
            "coldseam.cases.CaseFile",
            "coldseam.cli.Main")) {
      assertThat(house.contain(door)).as(door).isTrue();
    }
    assertThat(house.size()).isGreaterThan(80);
  }

  @Test
  void arrows_point_one_way() {
    noClasses()
        .that()
        .resideInAPackage("coldseam.mesh..")
        .should()
        .dependOnClassesThat()
        .resideInAnyPackage("coldseam.solver..", "coldseam.cases..", "coldseam.cli..")
        .check(house);
    noClasses()
        .that()
        .resideInAPackage("coldseam.solver..")
        .should()
        .dependOnClassesThat()
        .resideInAnyPackage("coldseam.cases..", "coldseam.cli..")
        .check(house);
    noClasses()
        .that()
        .resideInAPackage("coldseam.cases..")
        .should()
        .dependOnClassesThat()
        .resideInAPackage("coldseam.cli..")
        .check(house);
  }

  @Test
  void packages_form_no_cycle() {
    slices().matching("coldseam.(**)").should().beFreeOfCycles().check(house);
  }

  @Test
  void only_the_program_prints_and_exits() {
    noClasses()
        .that()
        .doNotHaveFullyQualifiedName("coldseam.cli.Main")
        .should()
        .accessField(System.class, "out")
        .orShould()
        .accessField(System.class, "err")
        .orShould()
        .accessField(System.class, "in")
        .orShould()
        .callMethod(System.class, "exit", int.class)
        .check(house);
    List<String> exits = new ArrayList<>();
    for (JavaClass type : house) {
      type.getMethodCallsFromSelf().stream()
          .filter(call -> call.getTarget().getFullName().equals("java.lang.System.exit(int)"))
          .forEach(call -> exits.add(type.getName()));
    }
    assertThat(exits).containsExactly("coldseam.cli.Main");
  }

  @Test
  void only_the_program_catches_everything() throws IOException {
    Set<String> catching = new TreeSet<>();
    for (JavaClass type : house) {
      for (JavaCodeUnit unit : type.getCodeUnits()) {
        unit.getTryCatchBlocks().stream()
            .flatMap(block -> block.getCaughtThrowables().stream())
            .filter(
                caught ->
                    caught.isEquivalentTo(Exception.class)
                        || caught.isEquivalentTo(RuntimeException.class)
                        || caught.isEquivalentTo(Error.class))
            .forEach(caught -> catching.add(type.getName()));
      }
    }
    assertThat(catching).isEmpty();
    // The compiler itself catches Throwable to close resources, so the sources are asked for it.
    List<String> sources = new ArrayList<>();
    for (Path source : sources()) {
      if (Files.readString(source).contains("catch (Throwable")) {
        sources.add(source.getFileName().toString());
      }
    }
    assertThat(sources).containsExactly("Main.java");
  }

  @Test
  void libraries_stay_in_their_rooms() {
    room("org.ejml..", "coldseam.solver.algebra..");
    room("org.apache.batik..", "coldseam.cli.plot..");
    room("org.locationtech.jts..", "coldseam.mesh..");
    room("org.snakeyaml..", "coldseam.cases..");
    room("com.ezylang..", "coldseam.cases..");
    room("java.awt..", "coldseam.cli.plot..");
    room("com.openhtmltopdf..", "coldseam.cli.plot..");
    room("org.apache.pdfbox..", "coldseam.cli.plot..");
    room("org.apache.fontbox..", "coldseam.cli.plot..");
  }

  private static void room(String library, String room) {
    noClasses()
        .that()
        .resideOutsideOfPackage(room)
        .should()
        .dependOnClassesThat()
        .resideInAPackage(library)
        .check(house);
  }

  @Test
  void nothing_static_can_change() {
    List<String> changing = new ArrayList<>();
    for (JavaClass type : house) {
      type.getFields().stream()
          .filter(field -> field.getModifiers().contains(JavaModifier.STATIC))
          .filter(field -> !field.getModifiers().contains(JavaModifier.FINAL))
          .forEach(field -> changing.add(field.getFullName()));
    }
    assertThat(changing).isEmpty();
  }

  @Test
  void no_mark_of_unfinished_work_is_left() throws IOException {
    List<String> marked = new ArrayList<>();
    for (Path source : sources()) {
      String text = Files.readString(source);
      for (String mark :
          List.of("TODO", "FIXME", "XXX", "@SuppressWarnings", "printStackTrace()")) {
        // The one place where the program itself writes the mark, into a drafted case.
        boolean written = mark.equals("TODO") && source.endsWith("words/Undecided.java");
        if (text.contains(mark) && !written) {
          marked.add(source.getFileName() + ": " + mark);
        }
      }
    }
    assertThat(marked).isEmpty();
  }

  private static List<Path> sources() throws IOException {
    List<Path> sources = new ArrayList<>();
    for (String module : List.of("mesh", "solver", "cases", "cli")) {
      Path main = Root.folder().resolve(module).resolve("src/main/java");
      try (Stream<Path> files = Files.walk(main)) {
        sources.addAll(files.filter(file -> file.toString().endsWith(".java")).toList());
      }
    }
    assertThat(sources).hasSizeGreaterThan(60);
    return sources;
  }
}
