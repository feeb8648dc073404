package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Manuscript;
import coldseam.cli.text.Table;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.List;

/** What the numbers hang on: shares of materials and films, and what ψ does if they change. */
record ShareSection(Result result, Units units, Ink ink) {
  /** Rise of a conductivity that the change of a ψ is given for. */
  static final double RISE = 0.1;

  private static final int MOST_ROWS = 14;
  private static final int MOST_PSI = 3;
  private static final int DECIMALS = 4;

  void write(Manuscript text) {
    List<Result.Share> shares = result.shares().parts();
    if (shares.isEmpty()) {
      return;
    }
    text.heading("Shares", "of " + result.shares().referTo() + "; films for heat loss");
    List<Result.LinearTransmittance> psi = result.psiWithSensitivities();
    psi = psi.subList(0, Math.min(MOST_PSI, psi.size()));
    Table table = new Table("lrr" + "r".repeat(psi.size()), 2, TextCard.PAGE);
    head(table, psi);
    int shown = shares.size() > MOST_ROWS ? MOST_ROWS - 1 : shares.size();
    double rest = 0;
    for (int i = 0; i < shares.size(); i++) {
      if (i < shown) {
        row(table, shares.get(i), psi);
      } else {
        rest += shares.get(i).share();
      }
    }
    if (shown < shares.size()) {
      table.row((shares.size() - shown) + " others", percent(rest));
    }
    text.table(table);
    notes(text, !psi.isEmpty());
  }

  private void head(Table table, List<Result.LinearTransmittance> psi) {
    List<String> cells = new ArrayList<>(List.of("", ink.faint("share")));
    boolean stated = false;
    for (Result.Share share : result.shares().parts()) {
      stated |= share.relativeTolerance() > 0;
    }
    cells.add(stated ? ink.faint("tolerance") : "");
    for (Result.LinearTransmittance one : psi) {
      cells.add(ink.faint("ψ " + one.name()));
    }
    table.head(cells.toArray(new String[0]));
  }

  private static void row(Table table, Result.Share share, List<Result.LinearTransmittance> psi) {
    List<String> cells = new ArrayList<>();
    cells.add(share.of());
    cells.add(percent(share.share()));
    cells.add(
        share.relativeTolerance() > 0
            ? "± " + Digits.shortest(100 * share.relativeTolerance(), 2) + " %"
            : "");
    for (Result.LinearTransmittance one : psi) {
      cells.add(change(one, share.of()));
    }
    table.row(cells.toArray(new String[0]));
  }

  private static String change(Result.LinearTransmittance psi, String of) {
    for (Result.Sensitivity sensitivity : psi.sensitivities()) {
      if (sensitivity.of().equals(of)) {
        return Digits.signed(Digits.fixed(RISE * sensitivity.slope(), DECIMALS));
      }
    }
    return "";
  }

  private static String percent(double share) {
    return share > 0 && share < 0.0005 ? "< 0.1 %" : Digits.fixed(100 * share, 1) + " %";
  }

  private void notes(Manuscript text, boolean psi) {
    if (psi) {
      text.note(
          "Under ψ: its change in W/(m·K) if a material, or a film by 1/Rs, conducts 10 % more; to"
              + " first order, with what the flanks take off");
    }
    text.note(
        "A share says what the number hangs on, not where the heat passes: that is the heat flow"
            + " through each stretch"
            + stretches());
  }

  private String stretches() {
    if (result.stretches().isEmpty()) {
      return "; name stretches in the case to see it";
    }
    StringBuilder words = new StringBuilder();
    for (Result.StretchResult stretch : result.stretches()) {
      words
          .append(words.length() == 0 ? ": " : ", ")
          .append(stretch.name())
          .append(' ')
          .append(Digits.signed(Digits.fixed(stretch.heatFlowWPerM(), 1)))
          .append(' ')
          .append(Counted.of(result).flowUnit());
    }
    return words.toString();
  }
}
