package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Json;
import coldseam.cli.text.Manuscript;
import coldseam.cli.text.Table;
import coldseam.solver.detail.Wanted.Requirement.Kind;
import coldseam.solver.result.Result;
import coldseam.solver.result.Verdict;
import java.util.ArrayList;
import java.util.List;

/** What a case requires of its results, as rows of the card, as sentences and as data. */
record RequiredSection(Result result, Ink ink) {
  void write(Manuscript text) {
    if (result.requirements().isEmpty()) {
      return;
    }
    text.heading("Required", "as the case states; no statement on local codes");
    Table table = new Table("llll", 2, TextCard.PAGE).named("what", "required", "found", "verdict");
    for (Result.Required one : result.requirements()) {
      table.row(name(one), limit(one), found(one), verdict(one));
    }
    text.table(table);
  }

  private String verdict(Result.Required one) {
    return switch (one.verdict()) {
      case MET -> ink.good("met");
      case UNDECIDED -> ink.alert("not shown: too near its limit to tell");
      case NOT_MET -> ink.alert("not met");
    };
  }

  private static String name(Result.Required one) {
    return switch (one.kind()) {
      case F_RSI -> "f_Rsi " + one.name();
      case PSI -> "ψ " + one.name();
      case U -> "U " + one.name();
      case MOISTURE -> "moisture, " + one.name();
    };
  }

  private static String unit(Result.Required one) {
    return switch (one.kind()) {
      case PSI -> " W/(m·K)";
      case U -> " W/(m²·K)";
      default -> "";
    };
  }

  private static String limit(Result.Required one) {
    return switch (one.kind()) {
      case F_RSI -> "at least " + Digits.shortest(one.limit(), 4);
      case MOISTURE -> "within its limit";
      default -> "at most " + Digits.shortest(one.limit(), 6) + unit(one);
    };
  }

  private static String found(Result.Required one) {
    return one.kind() == Kind.MOISTURE
        ? ""
        : "found " + Digits.of(one.value(), one.error(), 4).text() + unit(one);
  }

  /** What is not met or not shown, a sentence each. */
  List<String> unmet() {
    List<String> lines = new ArrayList<>();
    for (Result.Required one : result.requirements()) {
      if (one.verdict() != Verdict.MET) {
        String found = found(one);
        lines.add(
            name(one)
                + ": required "
                + limit(one)
                + (found.isEmpty() ? "" : ", " + found)
                + (one.verdict() == Verdict.UNDECIDED ? "; too near to tell" : ""));
      }
    }
    return lines;
  }

  void write(Json json) {
    json.array("required");
    for (Result.Required one : result.requirements()) {
      json.object()
          .member(
              "what",
              switch (one.kind()) {
                case F_RSI -> "fRsi";
                case PSI -> "psi";
                case U -> "U";
                case MOISTURE -> "moisture";
              })
          .member("name", one.name());
      if (one.kind() != Kind.MOISTURE) {
        json.member("value", one.value()).member("limit", one.limit());
      }
      json.member("met", one.verdict() == Verdict.MET)
          .member("decided", one.verdict() != Verdict.UNDECIDED)
          .endObject();
    }
    json.endArray();
  }
}
