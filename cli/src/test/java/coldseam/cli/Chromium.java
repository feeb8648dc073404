package coldseam.cli;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpResponse;
import java.net.http.WebSocket;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.BlockingQueue;
import java.util.concurrent.CompletionStage;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.TimeUnit;

/**
 * A Chromium without a window, spoken to by its DevTools protocol on the loopback address. Nothing
 * is downloaded for it: it is the browser of the machine.
 */
final class Chromium implements AutoCloseable {
  private static final long PATIENCE_S = 90;
  private static final ObjectMapper JACKSON = new ObjectMapper();

  private final Process process;
  private final HttpClient client = HttpClient.newHttpClient();
  private final BlockingQueue<JsonNode> received = new LinkedBlockingQueue<>();
  private final List<JsonNode> events = new ArrayList<>();
  private WebSocket socket;
  private int calls;

  private Chromium(Process process) {
    this.process = process;
  }

  /** The browser on this machine, if there is one. */
  static Optional<Path> installed() {
    String path = System.getenv().getOrDefault("PATH", "");
    for (String name : List.of("chromium", "chromium-browser", "google-chrome")) {
      for (String folder : path.split(java.io.File.pathSeparator)) {
        Path file = Path.of(folder).resolve(name);
        if (Files.isExecutable(file)) {
          return Optional.of(file);
        }
      }
    }
    return Optional.empty();
  }

  /**
   * Starts it with one empty page.
   *
   * @param browser its program
   * @param profile an empty folder
   */
  static Chromium start(Path browser, Path profile) throws IOException, InterruptedException {
    Process process =
        new ProcessBuilder(
                browser.toString(),
                "--headless",
                // It opens nothing but our own file, and root has no other way.
                "--no-sandbox",
                "--disable-gpu",
                "--disable-dev-shm-usage",
                "--no-first-run",
                "--disable-background-networking",
                "--disable-component-update",
                "--user-data-dir=" + profile,
                "--remote-debugging-port=0",
                "--window-size=1000,900",
                "about:blank")
            .redirectErrorStream(true)
            .redirectOutput(profile.resolve("log").toFile())
            .start();
    Chromium chromium = new Chromium(process);
    try {
      chromium.connect(profile.resolve("DevToolsActivePort"));
    } catch (IOException | InterruptedException | RuntimeException e) {
      process.destroyForcibly();
      throw e;
    }
    return chromium;
  }

  private void connect(Path port) throws IOException, InterruptedException {
    long end = System.nanoTime() + TimeUnit.SECONDS.toNanos(PATIENCE_S);
    while (!Files.exists(port) || Files.readAllLines(port).size() < 2) {
      if (System.nanoTime() > end || !process.isAlive()) {
        throw new IOException("the browser did not start");
      }
      Thread.sleep(50);
    }
    String list = "http://127.0.0.1:" + Files.readAllLines(port).get(0) + "/json/list";
    HttpRequest request = HttpRequest.newBuilder(URI.create(list)).build();
    String address = "";
    while (address.isEmpty()) {
      String targets = client.send(request, HttpResponse.BodyHandlers.ofString()).body();
      for (JsonNode target : JACKSON.readTree(targets)) {
        if (target.get("type").textValue().equals("page")) {
          address = target.get("webSocketDebuggerUrl").textValue();
        }
      }
      if (address.isEmpty() && System.nanoTime() > end) {
        throw new IOException("the browser has no page");
      }
    }
    socket =
        client
            .newWebSocketBuilder()
            .connectTimeout(Duration.ofSeconds(PATIENCE_S))
            .buildAsync(URI.create(address), new Listener())
            .join();
  }

  private final class Listener implements WebSocket.Listener {
    private final StringBuilder text = new StringBuilder();

    @Override
    public CompletionStage<?> onText(WebSocket from, CharSequence data, boolean last) {
      text.append(data);
      if (last) {
        try {
          received.add(JACKSON.readTree(text.toString()));
        } catch (IOException e) {
          throw new IllegalStateException(e);
        }
        text.setLength(0);
      }
      from.request(1);
      return null;
    }
  }

  /** Calls a method with members of its parameters, a name and a value by turns. */
  JsonNode call(String method, Object... parameters) throws IOException, InterruptedException {
    ObjectNode message = JACKSON.createObjectNode();
    message.put("id", ++calls).put("method", method);
    ObjectNode given = message.putObject("params");
    for (int i = 0; i < parameters.length; i += 2) {
      given.set((String) parameters[i], JACKSON.valueToTree(parameters[i + 1]));
    }
    socket.sendText(message.toString(), true).join();
    while (true) {
      JsonNode next = next();
      if (next.path("id").asInt() == calls) {
        if (next.has("error")) {
          throw new IOException(method + ": " + next.get("error"));
        }
        return next.get("result");
      }
    }
  }

  private JsonNode next() throws IOException, InterruptedException {
    JsonNode next = received.poll(PATIENCE_S, TimeUnit.SECONDS);
    if (next == null) {
      throw new IOException("the browser does not answer");
    }
    if (next.has("method")) {
      events.add(next);
    }
    return next;
  }

  /** Opens an address and waits until all of it is there. */
  void open(URI address) throws IOException, InterruptedException {
    for (String domain : List.of("Page", "Runtime", "Log", "Network", "DOM", "Accessibility")) {
      call(domain + ".enable");
    }
    int before = events.size();
    call("Page.navigate", "url", address.toString());
    while (events.subList(before, events.size()).stream()
        .noneMatch(e -> e.get("method").textValue().equals("Page.loadEventFired"))) {
      next();
    }
  }

  /** What was told of a kind, such as {@code Log.entryAdded}, so far. */
  List<JsonNode> told(String kind) throws IOException, InterruptedException {
    call("Runtime.evaluate", "expression", "0");
    List<JsonNode> of = new ArrayList<>();
    for (JsonNode event : events) {
      if (event.get("method").textValue().equals(kind)) {
        of.add(event.get("params"));
      }
    }
    return of;
  }

  /** Forgets what was told. */
  void forget() {
    events.clear();
  }

  /** Waits until a promise of JavaScript is kept. */
  void wait(String promise) throws IOException, InterruptedException {
    call("Runtime.evaluate", "expression", promise, "awaitPromise", true);
  }

  /** The value of an expression of JavaScript. */
  JsonNode value(String expression) throws IOException, InterruptedException {
    JsonNode result = call("Runtime.evaluate", "expression", expression, "returnByValue", true);
    if (result.has("exceptionDetails")) {
      throw new IOException(expression + ": " + result.get("exceptionDetails"));
    }
    return result.get("result").path("value");
  }

  @Override
  public void close() {
    try {
      call("Browser.close");
    } catch (IOException e) {
      process.destroy();
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
    }
    try {
      if (!process.waitFor(20, TimeUnit.SECONDS)) {
        process.destroyForcibly().waitFor();
      }
    } catch (InterruptedException e) {
      process.destroyForcibly();
      Thread.currentThread().interrupt();
    }
  }
}
