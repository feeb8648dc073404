package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.BufferedReader;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.PrintStream;
import java.net.Socket;
import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpResponse;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.BlockingQueue;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.TimeUnit;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** The command {@code watch} running in the test, and a page that listens to it. */
final class Watching implements AutoCloseable {
  private static final ObjectMapper JACKSON = new ObjectMapper();
  private static final Pattern LINK = Pattern.compile("http://127\\.0\\.0\\.1:(\\d+)/");
  private static final long PATIENCE_S = 60;

  private final ByteArrayOutputStream out = new ByteArrayOutputStream();
  private final ByteArrayOutputStream err = new ByteArrayOutputStream();
  private final BlockingQueue<String> events = new LinkedBlockingQueue<>();
  private final HttpClient client =
      HttpClient.newBuilder().connectTimeout(Duration.ofSeconds(10)).build();
  private final Thread program;
  private volatile int code = -1;

  Watching(Path dir, String... args) throws Exception {
    List<String> words = new ArrayList<>(List.of("watch"));
    words.addAll(List.of(args));
    program =
        new Thread(
            () ->
                code =
                    Main.run(
                        words.toArray(new String[0]),
                        new Surroundings(
                            new PrintStream(out, true, StandardCharsets.UTF_8),
                            new PrintStream(err, true, StandardCharsets.UTF_8),
                            dir,
                            Map.of(),
                            false,
                            false,
                            Optional.of(Root.folder()))));
    program.start();
    link();
    listen();
  }

  String out() {
    return out.toString(StandardCharsets.UTF_8);
  }

  String err() {
    return err.toString(StandardCharsets.UTF_8);
  }

  URI link() throws InterruptedException {
    long end = System.nanoTime() + TimeUnit.SECONDS.toNanos(PATIENCE_S);
    while (true) {
      Matcher found = LINK.matcher(out() + err());
      if (found.find()) {
        return URI.create(found.group());
      }
      assertThat(program.isAlive() && System.nanoTime() < end).as("a link: %s", err()).isTrue();
      Thread.sleep(5);
    }
  }

  private void listen() throws Exception {
    HttpResponse<InputStream> response =
        client.send(
            HttpRequest.newBuilder(link().resolve("/events")).build(),
            HttpResponse.BodyHandlers.ofInputStream());
    assertThat(response.headers().firstValue("Content-Type").orElse(""))
        .startsWith("text/event-stream");
    Thread reader =
        new Thread(
            () -> {
              try (BufferedReader lines =
                  new BufferedReader(
                      new InputStreamReader(response.body(), StandardCharsets.UTF_8))) {
                for (String line = lines.readLine(); line != null; line = lines.readLine()) {
                  if (line.startsWith("data: ")) {
                    events.add(line.substring(6));
                  }
                }
              } catch (IOException e) {
                events.add("broken off");
              }
            });
    reader.setDaemon(true);
    reader.start();
  }

  /** The next scene but those that say that something is being solved. */
  JsonNode scene() throws Exception {
    while (true) {
      String event = events.poll(PATIENCE_S, TimeUnit.SECONDS);
      assertThat(event).as("an event in time").isNotNull();
      JsonNode scene = JACKSON.readTree(event);
      if (!scene.get("state").textValue().equals("solving")) {
        return scene;
      }
    }
  }

  /** Whatever is told next, as it is. */
  String event() throws Exception {
    return events.poll(PATIENCE_S, TimeUnit.SECONDS);
  }

  HttpResponse<String> get(String path) throws Exception {
    return client.send(
        HttpRequest.newBuilder(link().resolve(path)).build(),
        HttpResponse.BodyHandlers.ofString(StandardCharsets.UTF_8));
  }

  /** The first line of the answer to a request written by hand. */
  String answer(String request) throws Exception {
    try (Socket socket = new Socket("127.0.0.1", link().getPort())) {
      socket.setSoTimeout(10_000);
      socket.getOutputStream().write(request.getBytes(StandardCharsets.ISO_8859_1));
      socket.getOutputStream().flush();
      return new BufferedReader(
              new InputStreamReader(socket.getInputStream(), StandardCharsets.ISO_8859_1))
          .readLine();
    }
  }

  /** Ends it, and gives its exit code. */
  int end() throws InterruptedException {
    program.interrupt();
    program.join(TimeUnit.SECONDS.toMillis(PATIENCE_S));
    assertThat(program.isAlive()).as("it ended").isFalse();
    return code;
  }

  @Override
  public void close() {
    program.interrupt();
    try {
      program.join(TimeUnit.SECONDS.toMillis(PATIENCE_S));
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
    }
  }
}
