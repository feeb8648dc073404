package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.net.Inet4Address;
import java.net.InetAddress;
import java.net.InetSocketAddress;
import java.net.NetworkInterface;
import java.net.ServerSocket;
import java.net.Socket;
import java.net.http.HttpResponse;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Collections;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The live picture: what the page is sent as files are saved. */
class WatchCommandTest {
  private static final String DRAWING =
      """
      <svg xmlns="http://www.w3.org/2000/svg" width="400mm" height="1000mm" viewBox="0 0 400 1000">
        <g id="wall"><rect x="100" y="0" width="WIDTH" height="1000"/></g>
      </svg>
      """;

  private static final String DRAWN =
      """
      coldseam: 1
      title: Drawn wall
      view: plan
      drawings:
        plan: {file: plan.svg}
      materials:
        brick: {conductivity: 0.5}
      spaces:
        indoors: {temperature: 20, film: 0.13}
        outdoors: {temperature: -5, film: 0.04}
      section:
        - {fill: outdoors, box: [50, 0, 400, 1000]}
        - {fill: indoors, box: [0, 0, 100, 1000]}
        - {fill: brick, drawing: plan, layer: wall}
      U: {of: wall, between: [indoors, outdoors]}
      """;

  /** Takes the wall's L2D off its own. */
  private static final String SUBTRACTING =
      Cases.WALL.replace("title: Plain wall", "title: Half of nothing")
          + """
          psi:
            rest:
              between: [indoors, outdoors]
              dimensions: internal
              subtract: [{case: other.yaml, between: [indoors, outdoors]}]
          """;

  @TempDir Path dir;

  /** As many editors save: beside it, then moved in place. */
  private void save(String name, String text) throws IOException {
    Path beside = Files.writeString(dir.resolve("." + name + ".new"), text);
    Files.move(beside, dir.resolve(name), StandardCopyOption.REPLACE_EXISTING);
  }

  private static void solved(JsonNode scene) {
    assertThat(scene.get("state").textValue()).as(scene.toString()).isEqualTo("solved");
    assertThat(scene.get("mistakes")).isEmpty();
  }

  @Test
  void it_follows_the_file_through_saves_mistakes_and_recovery() throws Exception {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    try (Watching watching = new Watching(dir, "wall.yaml")) {
      JsonNode first = watching.scene();
      solved(first);
      assertThat(first.get("title").textValue()).isEqualTo("Plain wall");
      assertThat(first.get("card").textValue()).contains("1.75", "licensed professional");
      assertThat(first.get("pictures"))
          .extracting(JsonNode::textValue)
          .containsExactly("section", "temperature");
      assertThat(watching.get("/section.svg?1").body()).contains("brick").endsWith("</svg>\n");
      String warm = watching.get("/temperature.svg").body();
      assertThat(warm).contains("Plain wall");

      Files.writeString(dir.resolve("wall.yaml"), Cases.WALL.replace("20, film", "28, film"));
      JsonNode second = watching.scene();
      solved(second);
      assertThat(second.get("number").intValue()).isGreaterThan(first.get("number").intValue());
      assertThat(second.get("card").textValue()).contains("28");
      assertThat(watching.get("/temperature.svg").body()).isNotEqualTo(warm);

      Files.writeString(dir.resolve("wall.yaml"), Cases.WALL.replace("fill: brick", "fill: brik"));
      JsonNode broken = watching.scene();
      assertThat(broken.get("state").textValue()).isEqualTo("faulty");
      assertThat(broken.get("pictures")).isEmpty();
      JsonNode mistake = broken.get("mistakes").get(0);
      // The brick is laid in line 11.
      assertThat(mistake.get("place").textValue()).startsWith("wall.yaml:11:");
      assertThat(mistake.get("wrong").textValue()).contains("brik");
      assertThat(mistake.get("line").textValue())
          .isEqualTo("  - {fill: brik, box: [0, 0, 200, 1000]}");
      assertThat(watching.get("/section.svg").statusCode()).isEqualTo(404);

      save("wall.yaml", "coldseam: [");
      assertThat(watching.scene().get("state").textValue()).isEqualTo("faulty");
      Files.delete(dir.resolve("wall.yaml"));
      assertThat(watching.scene().get("mistakes").get(0).get("wrong").textValue())
          .contains("no such file");

      save("wall.yaml", Cases.WALL);
      solved(watching.scene());
      assertThat(watching.get("/temperature.svg").body()).isEqualTo(warm);
      assertThat(watching.out()).contains("wall.yaml: http://127.0.0.1:", "solved in ");
      assertThat(watching.err()).contains("wall.yaml:11:").doesNotContain("\tat ");
      assertThat(watching.end()).isZero();
    }
  }

  /** What the solver finds is told by its line too. */
  @Test
  void a_section_that_cannot_be_solved_is_told_as_well() throws Exception {
    Cases.write(dir, "wall.yaml", Cases.WALL.replace("conductivity: 0.5", "conductivity: 0"));
    try (Watching watching = new Watching(dir, "wall.yaml")) {
      JsonNode scene = watching.scene();
      assertThat(scene.get("state").textValue()).isEqualTo("faulty");
      assertThat(scene.get("mistakes").get(0).get("place").textValue()).startsWith("wall.yaml");
    }
  }

  @Test
  void saves_of_drawings_and_of_other_cases_count() throws Exception {
    Cases.write(dir, "drawn.yaml", DRAWN);
    try (Watching watching = new Watching(dir, "drawn.yaml", "--json")) {
      assertThat(watching.scene().get("mistakes").get(0).toString()).contains("plan.svg");
      save("plan.svg", DRAWING.replace("WIDTH", "200"));
      solved(watching.scene());
      save("plan.svg", DRAWING.replace("WIDTH", "100"));
      solved(watching.scene());
      ObjectMapper jackson = new ObjectMapper();
      List<String> lines = watching.out().lines().toList();
      assertThat(lines).hasSize(2);
      // 0.13 + d/0.5 + 0.04 for d = 0.2 m, then 0.1 m.
      for (int i = 0; i < 2; i++) {
        double resistance = 0.17 + (i == 0 ? 0.4 : 0.2);
        assertThat(
                jackson
                    .readTree(lines.get(i))
                    .get("coupling")
                    .get(0)
                    .get("value_W_per_mK")
                    .doubleValue())
            .isCloseTo(1 / resistance, within(1e-9));
      }
    }
    Cases.write(dir, "rest.yaml", SUBTRACTING);
    Cases.write(dir, "other.yaml", Cases.WALL);
    try (Watching watching = new Watching(dir, "rest.yaml")) {
      solved(watching.scene());
      save("other.yaml", Cases.WALL.replace("conductivity: 0.5", "conductivity: 0.6"));
      JsonNode scene = watching.scene();
      solved(scene);
      // 1/0.57 − 1/(0.17 + 0.2/0.6) = 1.7544 − 1.9868 W/(m·K).
      assertThat(scene.get("card").textValue()).contains("0.2324");
    }
  }

  @Test
  void a_variant_is_followed_and_missed_when_it_goes() throws Exception {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    try (Watching watching = new Watching(dir, "wall.yaml", "--variant", "thick", "--quiet")) {
      JsonNode scene = watching.scene();
      solved(scene);
      assertThat(scene.get("title").textValue()).isEqualTo("Plain wall, thick");
      save("wall.yaml", Cases.WALL.replace("thick:", "thin:"));
      assertThat(watching.scene().get("mistakes").get(0).toString())
          .contains("no variant `thick`", "thin");
      assertThat(watching.out()).doesNotContain("solved in");
    }
  }

  @Test
  void only_this_machine_is_answered_and_only_by_its_own_name() throws Exception {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    try (Watching watching = new Watching(dir, "wall.yaml")) {
      watching.scene();
      int port = watching.link().getPort();
      String get = "GET /section.svg HTTP/1.1\r\nConnection: close\r\n";
      assertThat(watching.answer(get + "Host: 127.0.0.1:" + port + "\r\n\r\n")).contains(" 200 ");
      assertThat(watching.answer(get + "Host: LOCALHOST:" + port + "\r\n\r\n")).contains(" 200 ");
      for (String host :
          List.of("rebound.example:" + port, "127.0.0.1", "localhost.example:" + port, "")) {
        assertThat(watching.answer(get + "Host: " + host + "\r\n\r\n")).as(host).contains(" 403 ");
        assertThat(watching.answer("GET /events HTTP/1.1\r\nHost: " + host + "\r\n\r\n"))
            .contains(" 403 ");
      }
      assertThat(watching.answer("GET / HTTP/1.0\r\n\r\n")).contains(" 403 ");
      assertThat(
              watching.answer(
                  "POST / HTTP/1.1\r\nHost: 127.0.0.1:" + port + "\r\nContent-Length: 0\r\n\r\n"))
          .contains(" 405 ");
      assertThat(watching.get("/../wall.yaml").statusCode()).isEqualTo(404);
      assertThat(watching.get("/mesh.svg").statusCode()).isEqualTo(404);
      for (NetworkInterface network : Collections.list(NetworkInterface.getNetworkInterfaces())) {
        for (InetAddress address : Collections.list(network.getInetAddresses())) {
          if (address instanceof Inet4Address && !address.isLoopbackAddress()) {
            assertThatThrownBy(
                    () -> {
                      try (Socket socket = new Socket()) {
                        socket.connect(new InetSocketAddress(address, port), 1000);
                      }
                    })
                .as("%s", address)
                .isInstanceOf(IOException.class);
          }
        }
      }
    }
  }

  @Test
  void the_page_asks_nothing_of_anybody_else() throws Exception {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    try (Watching watching = new Watching(dir, "wall.yaml")) {
      watching.scene();
      for (String path : List.of("/", "/live.js", "/live.css")) {
        HttpResponse<String> response = watching.get(path);
        assertThat(response.statusCode()).isEqualTo(200);
        assertThat(response.body()).doesNotContain("http:", "https:", "//cdn", "@import");
        assertThat(response.headers().firstValue("Content-Security-Policy").orElse(""))
            .contains("default-src 'none'", "connect-src 'self'", "script-src 'self'")
            .doesNotContain("unsafe");
        assertThat(response.headers().firstValue("Cache-Control")).contains("no-store");
        assertThat(response.headers().firstValue("Access-Control-Allow-Origin")).isEmpty();
      }
      assertThat(watching.get("/").headers().firstValue("Content-Type").orElse(""))
          .startsWith("text/html");
    }
  }

  @Test
  void at_the_end_pages_are_told_and_the_port_is_free() throws Exception {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    int port;
    try (ServerSocket free = new ServerSocket(0)) {
      port = free.getLocalPort();
    }
    try (Watching watching = new Watching(dir, "wall.yaml", "--port", Integer.toString(port))) {
      assertThat(watching.link().getPort()).isEqualTo(port);
      watching.scene();
      Ran taken = Ran.in(dir, "watch", "wall.yaml", "--port", Integer.toString(port));
      assertThat(taken.code()).isEqualTo(2);
      assertThat(taken.err()).contains("port " + port + " cannot be had");
      assertThat(watching.end()).isZero();
      assertThat(watching.event()).isEqualTo("over");
      assertThatThrownBy(() -> new Socket("127.0.0.1", port).close())
          .isInstanceOf(IOException.class);
    }
    try (Stream<Path> files = Files.list(dir)) {
      assertThat(files).as("nothing is written").containsExactly(dir.resolve("wall.yaml"));
    }
  }

  @Test
  void what_cannot_be_watched_is_refused() throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    assertThat(Ran.in(dir, "watch", "wal.yaml").err()).contains("no such file", "wall.yaml");
    assertThat(Ran.in(dir, "watch", "wall.yaml", "--port", "70000").err())
        .contains("70000 is no port");
    assertThat(Ran.in(dir, "watch", "wall.yaml", "wall.yaml").err()).contains("one case");
    assertThat(Ran.in(dir, "watch", "wall.yaml", "--accuracy", "much").code()).isEqualTo(2);
    String window = Root.folder().resolve("cases/windows/two-sashes.yaml").toString();
    Ran whole = Ran.in(dir, "watch", window);
    assertThat(whole.code()).isEqualTo(2);
    assertThat(whole.err()).contains("has no section to show");
  }
}
