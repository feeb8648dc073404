package coldseam.cli.text;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

class TableTest {
  @Test
  void columns_are_as_wide_as_their_widest_cell_and_empty_ones_take_no_room() {
    String text =
        new Table("lrll", 2, 80)
            .row("ψ", "0.6123", "", "W/(m·K)")
            .row("L2D", "12.3", "", "")
            .text();
    assertThat(text).isEqualTo("  ψ    0.6123  W/(m·K)\n  L2D    12.3\n");
  }

  @Test
  void the_last_column_breaks_at_words_and_hangs() {
    String text = new Table("ll", 0, 30).row("a", "one two three four five six seven").text();
    assertThat(text).isEqualTo("a  one two three four five six\n   seven\n");
  }

  @Test
  void colour_takes_no_room() {
    String text = new Table("ll", 0, 80).row(Ink.TERMINAL.bad("no"), "x").row("yes", "y").text();
    assertThat(text).isEqualTo("\u001b[31mno\u001b[0m   x\nyes  y\n");
    assertThat(Ink.NONE.bad("no")).isEqualTo("no");
  }
}
