package coldseam.cli.live;

import com.sun.net.httpserver.HttpExchange;
import com.sun.net.httpserver.HttpServer;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.net.InetAddress;
import java.net.InetSocketAddress;
import java.net.URI;
import java.nio.charset.StandardCharsets;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.ThreadFactory;

/**
 * Serves the page. Only this machine can reach it: it listens on the loopback address, and answers
 * only requests that call it by a loopback name, so that no page from elsewhere can read it under a
 * name of its own that it lets point here (DNS rebinding). The page asks nothing of anybody else.
 *
 * <p>News reach the page as server-sent events (HTML Living Standard, section 9.2).
 */
public final class LivePage implements AutoCloseable {
  private static final byte[] LOOPBACK = {127, 0, 0, 1};
  private static final int HTTP_PORT = 80;

  /** More pages at once are refused. */
  private static final int MOST_READERS = 32;

  /** After so long without news a page is sent a sign of life, which finds out those gone, ms. */
  private static final long SIGN_OF_LIFE_MS = 5_000;

  private static final String POLICY =
      "default-src 'none'; script-src 'self'; style-src 'self'; img-src 'self' data:;"
          + " connect-src 'self'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'";

  /** A picture may style itself, and nothing else. */
  private static final String POLICY_OF_PICTURES =
      "default-src 'none'; style-src 'unsafe-inline'; frame-ancestors 'none'";

  /** What is served from the program, by its path. */
  private static final Map<String, Asset> ASSETS =
      Map.of(
          "/", new Asset("live.html", "text/html; charset=utf-8"),
          "/live.js", new Asset("live.js", "text/javascript; charset=utf-8"),
          "/live.css", new Asset("live.css", "text/css; charset=utf-8"));

  private record Asset(String name, String type) {}

  private final HttpServer server;
  private final ExecutorService readers;
  private final Object news = new Object();
  private int number;
  private int reading;
  private boolean closed;
  private Optional<Scene> shown = Optional.empty();
  private Map<String, String> pictures = Map.of();

  private LivePage(HttpServer server, ExecutorService readers) {
    this.server = server;
    this.readers = readers;
  }

  /**
   * Opens the page.
   *
   * @param port the port to listen on, 0 for any that is free
   * @return the page, ready
   * @throws IOException if the port cannot be had
   */
  public static LivePage open(int port) throws IOException {
    InetAddress loopback = InetAddress.getByAddress("127.0.0.1", LOOPBACK);
    HttpServer server = HttpServer.create(new InetSocketAddress(loopback, port), 0);
    ExecutorService readers = Executors.newCachedThreadPool(new Daemons());
    LivePage page = new LivePage(server, readers);
    server.setExecutor(readers);
    server.createContext("/", page::answer);
    server.start();
    return page;
  }

  /** Threads that do not keep the program from ending. */
  private static final class Daemons implements ThreadFactory {
    @Override
    public Thread newThread(Runnable work) {
      Thread thread = new Thread(work, "live page");
      thread.setDaemon(true);
      return thread;
    }
  }

  /** Where the page is. */
  public URI address() {
    return URI.create("http://127.0.0.1:" + server.getAddress().getPort() + "/");
  }

  /**
   * Shows something else on every page that is open.
   *
   * @param scene what
   */
  public void show(Scene scene) {
    synchronized (news) {
      number++;
      shown = Optional.of(scene);
      if (scene.state() != Scene.State.SOLVING) {
        pictures = new LinkedHashMap<>(scene.pictures());
      }
      news.notifyAll();
    }
  }

  /** Tells open pages that it is over, and frees the port. */
  @Override
  public void close() {
    synchronized (news) {
      if (closed) {
        return;
      }
      closed = true;
      news.notifyAll();
      // So that they hear of it; whoever does not listen is not waited for.
      long end = System.nanoTime() + 300_000_000;
      try {
        for (long left = 300; reading > 0 && left > 0; ) {
          news.wait(left);
          left = (end - System.nanoTime()) / 1_000_000;
        }
      } catch (InterruptedException e) {
        Thread.currentThread().interrupt();
      }
    }
    server.stop(0);
    readers.shutdownNow();
  }

  private void answer(HttpExchange exchange) throws IOException {
    try (exchange) {
      String path = exchange.getRequestURI().getPath();
      String method = exchange.getRequestMethod();
      if (!calledByLoopbackName(exchange.getRequestHeaders().get("Host"))) {
        refuse(exchange, 403, "This page answers to 127.0.0.1 and localhost only.");
      } else if (!method.equals("GET") && !method.equals("HEAD")) {
        exchange.getResponseHeaders().set("Allow", "GET, HEAD");
        refuse(exchange, 405, "This page can only be read.");
      } else if (path.equals("/events")) {
        tell(exchange);
      } else if (ASSETS.containsKey(path)) {
        Asset asset = ASSETS.get(path);
        send(exchange, 200, asset.type, POLICY, asset(asset.name));
      } else {
        picture(exchange, path);
      }
    }
  }

  /** Whether a request was meant for this page by whoever made it. */
  private boolean calledByLoopbackName(List<String> hosts) {
    if (hosts == null || hosts.size() != 1) {
      return false;
    }
    int port = server.getAddress().getPort();
    for (String name : List.of("127.0.0.1", "localhost")) {
      String host = hosts.get(0);
      if (host.equalsIgnoreCase(name + ":" + port)
          || port == HTTP_PORT && host.equalsIgnoreCase(name)) {
        return true;
      }
    }
    return false;
  }

  private void picture(HttpExchange exchange, String path) throws IOException {
    String svg = null;
    if (path.startsWith("/") && path.endsWith(".svg")) {
      synchronized (news) {
        svg = pictures.get(path.substring(1, path.length() - ".svg".length()));
      }
    }
    if (svg == null) {
      refuse(exchange, 404, "There is nothing here.");
    } else {
      byte[] body = svg.getBytes(StandardCharsets.UTF_8);
      send(exchange, 200, "image/svg+xml", POLICY_OF_PICTURES, body);
    }
  }

  private static byte[] asset(String name) throws IOException {
    try (InputStream in = LivePage.class.getResourceAsStream("/live/" + name)) {
      return in.readAllBytes();
    }
  }

  private static void refuse(HttpExchange exchange, int code, String why) throws IOException {
    byte[] body = (why + "\n").getBytes(StandardCharsets.UTF_8);
    send(exchange, code, "text/plain; charset=utf-8", POLICY, body);
  }

  private static void send(HttpExchange exchange, int code, String type, String policy, byte[] body)
      throws IOException {
    head(exchange, type, policy);
    if (exchange.getRequestMethod().equals("HEAD")) {
      exchange.getResponseHeaders().set("Content-Length", Integer.toString(body.length));
      exchange.sendResponseHeaders(code, -1);
      return;
    }
    exchange.sendResponseHeaders(code, body.length);
    exchange.getResponseBody().write(body);
  }

  private static void head(HttpExchange exchange, String type, String policy) {
    var headers = exchange.getResponseHeaders();
    headers.set("Content-Type", type);
    headers.set("Content-Security-Policy", policy);
    headers.set("Cache-Control", "no-store");
    headers.set("X-Content-Type-Options", "nosniff");
    headers.set("Referrer-Policy", "no-referrer");
    headers.set("Cross-Origin-Resource-Policy", "same-origin");
    headers.set("Cross-Origin-Opener-Policy", "same-origin");
  }

  /** Sends what is shown and then whatever is new, as long as the page is open. */
  private void tell(HttpExchange exchange) throws IOException {
    synchronized (news) {
      if (reading >= MOST_READERS || closed) {
        refuse(exchange, 503, "Too many pages are open.");
        return;
      }
      reading++;
    }
    try {
      head(exchange, "text/event-stream; charset=utf-8", POLICY);
      if (exchange.getRequestMethod().equals("HEAD")) {
        exchange.sendResponseHeaders(200, -1);
        return;
      }
      exchange.sendResponseHeaders(200, 0);
      OutputStream out = exchange.getResponseBody();
      int told = 0;
      boolean over = false;
      while (!over) {
        News next = await(told);
        told = next.number;
        over = next.over;
        out.write(next.text.getBytes(StandardCharsets.UTF_8));
        out.flush();
      }
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
    } finally {
      synchronized (news) {
        reading--;
        news.notifyAll();
      }
    }
  }

  /** An event as it is sent. */
  private record News(int number, String text, boolean over) {}

  private News await(int told) throws InterruptedException {
    synchronized (news) {
      if (number == told && !closed) {
        news.wait(SIGN_OF_LIFE_MS);
      }
      if (closed) {
        return new News(told, "event: over\ndata: over\n\n", true);
      }
      if (number == told || shown.isEmpty()) {
        return new News(told, ":\n\n", false);
      }
      return new News(number, "event: scene\ndata: " + shown.get().json(number) + "\n\n", false);
    }
  }
}
