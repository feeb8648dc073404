package coldseam.cli.text;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** What is written is read back by an independent reader (Jackson). */
class JsonTest {
  private static final ObjectMapper JACKSON = new ObjectMapper();

  @Test
  void texts_come_back_as_they_were() throws Exception {
    String awkward = "quote \" back \\ line\n tab\t bell\u0007 ψ 𝛌 \ud800 end";
    String text = Json.onOneLine().object().member(awkward, awkward).endObject().text();
    assertThat(text).doesNotContain("\n");
    JsonNode read = JACKSON.readTree(text);
    assertThat(read.fieldNames().next()).isEqualTo(awkward);
    assertThat(read.get(awkward).textValue()).isEqualTo(awkward);
  }

  @Test
  void numbers_come_back_to_the_last_bit() throws Exception {
    Random random = new Random(7);
    for (int i = 0; i < 2000; i++) {
      double value = Double.longBitsToDouble(random.nextLong());
      if (Double.isFinite(value)) {
        String text = Json.onOneLine().array().endArray().text();
        assertThat(text).isEqualTo("[]");
        text = Json.onOneLine().object().member("v", value).endObject().text();
        assertThat(JACKSON.readTree(text).get("v").doubleValue()).isEqualTo(value);
      }
    }
  }

  @Test
  void what_is_not_finite_is_null() throws Exception {
    String text =
        Json.indented()
            .object()
            .numbers("n", Double.NaN, Double.POSITIVE_INFINITY, -0.0, 1e20)
            .member("words", List.of("a", "b"))
            .object("empty")
            .endObject()
            .endObject()
            .text();
    assertThat(JACKSON.readTree(text))
        .isEqualTo(
            JACKSON.readTree("{\"n\":[null,null,0,1.0E20],\"words\":[\"a\",\"b\"],\"empty\":{}}"));
    assertThat(text).contains("\n  \"words\": [\"a\", \"b\"],\n");
  }

  @Test
  void an_unfinished_text_is_refused() {
    assertThatThrownBy(() -> Json.onOneLine().object().text())
        .isInstanceOf(IllegalStateException.class);
  }
}
