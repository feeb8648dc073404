package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.net.URI;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/**
 * The live page in a real browser. Skipped, with a word on what to install, where there is none.
 */
@Timeout(value = 5, unit = TimeUnit.MINUTES)
class WatchInBrowserTest {
  private static final String MISSING =
      "SKIPPED: the live page was not opened in a browser, since none of chromium, chromium-browser"
          + " and google-chrome is on the PATH; install the package chromium to run"
          + " WatchInBrowserTest";

  @TempDir Path dir;

  /** Resolves once the page shows something newer than a scene. */
  private static int shownAfter(Chromium browser, int number) throws Exception {
    browser.wait(
        "new Promise(function (done) { (function look() {"
            + "if (Number(document.body.dataset.shown || 0) > "
            + number
            + ") done(); else setTimeout(look, 5); })(); })");
    return browser.value("Number(document.body.dataset.shown)").intValue();
  }

  private static String text(Chromium browser, String id) throws Exception {
    return browser.value("document.getElementById('" + id + "').innerText").textValue();
  }

  private static int pictures(Chromium browser) throws Exception {
    return browser
        .value(
            "Array.from(document.querySelectorAll('#pictures img'))"
                + ".filter(function (i) { return i.naturalWidth > 100 && i.width > 100; }).length")
        .intValue();
  }

  @Test
  void the_page_shows_pictures_then_mistakes_then_pictures() throws Exception {
    Optional<Path> installed = Chromium.installed();
    if (installed.isEmpty()) {
      System.err.println(MISSING);
    }
    assumeTrue(installed.isPresent(), MISSING);
    Path file = Cases.write(dir, "wall.yaml", Cases.WALL);
    Path profile = Files.createDirectory(dir.resolve("profile"));
    try (Watching watching = new Watching(dir, "wall.yaml");
        Chromium browser = Chromium.start(installed.get(), profile)) {
      URI link = watching.link();
      browser.open(link);
      int shown = shownAfter(browser, 0);
      assertThat(pictures(browser)).isEqualTo(2);
      assertThat(text(browser, "title")).isEqualTo("Plain wall");
      assertThat(text(browser, "card")).contains("U wall", "licensed professional");
      assertThat(browser.value("document.querySelector('#pictures img').alt").textValue())
          .isEqualTo("Section of Plain wall");

      Files.writeString(file, Cases.WALL.replace("fill: brick", "fill: brik"));
      shown = shownAfter(browser, shown);
      assertThat(pictures(browser)).isZero();
      assertThat(text(browser, "mistakes")).contains("One mistake", "wall.yaml:11:", "brik");
      assertThat(browser.value("document.getElementById('card').innerText").textValue()).isEmpty();

      Files.writeString(file, Cases.WALL.replace("title: Plain wall", "title: <b>Wall</b> & ψ"));
      shown = shownAfter(browser, shown);
      assertThat(pictures(browser)).isEqualTo(2);
      assertThat(text(browser, "title")).isEqualTo("<b>Wall</b> & ψ");
      assertThat(browser.value("document.getElementById('mistakes').hidden").booleanValue())
          .isTrue();

      assertThat(browser.told("Log.entryAdded")).isEmpty();
      assertThat(browser.told("Runtime.exceptionThrown")).isEmpty();
      assertThat(browser.told("Runtime.consoleAPICalled")).isEmpty();
      for (JsonNode request : browser.told("Network.requestWillBeSent")) {
        assertThat(request.get("request").get("url").textValue())
            .matches(url -> url.startsWith(link.toString()) || url.equals("data:,"));
      }
      assertThat(watching.end()).isZero();
      browser.wait(
          "new Promise(function (done) { (function look() {"
              + "if (document.getElementById('told').innerText.includes('has ended')) done();"
              + "else setTimeout(look, 5); })(); })");
      assertThat(pictures(browser)).as("it goes on showing what it had").isEqualTo(2);
    }
  }
}
