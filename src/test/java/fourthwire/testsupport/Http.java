package fourthwire.testsupport;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.net.Socket;
import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.net.http.HttpResponse.BodyHandlers;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** A script's view of the running service: no more than HTTP. */
public final class Http {
  private static final JsonMapper JSON = JsonMapper.builder().build();
  private static final String BOUNDARY = "----fourthwire-test";

  private final int port;
  private final HttpClient client = HttpClient.newHttpClient();

  /** Of the service on this port of the loopback address. */
  public Http(int port) {
    this.port = port;
  }

  /** An answer. */
  public record Answer(int status, String type, HttpResponse<byte[]> response) {
    /** Its body as JSON. */
    public JsonNode json() {
      return JSON.readTree(response.body());
    }

    /** One of its headers, empty text where it is not there. */
    public String header(String name) {
      return response.headers().firstValue(name).orElse("");
    }
  }

  /** One part of a form; without a file name it is a field. */
  public record Part(String name, String file, byte[] bytes) {
    /** A field. */
    public static Part field(String name, String value) {
      return new Part(name, "", value.getBytes(StandardCharsets.UTF_8));
    }
  }

  public Answer get(String path, String... headers) {
    return send(request(path, headers).GET());
  }

  public Answer delete(String path) {
    return send(request(path).DELETE());
  }

  public Answer post(String path, String... headers) {
    return send(request(path, headers).POST(BodyPublishers.noBody()));
  }

  public Answer postJson(String path, String body) {
    return send(
        request(path, "Content-Type", "application/json").POST(BodyPublishers.ofString(body)));
  }

  public Answer send(String method, String path, String type, String body) {
    return send(request(path, "Content-Type", type).method(method, BodyPublishers.ofString(body)));
  }

  public Answer form(String method, String path, Part... parts) {
    return send(
        request(path, "Content-Type", "multipart/form-data; boundary=" + BOUNDARY)
            .method(method, BodyPublishers.ofByteArray(body(parts))));
  }

  private static byte[] body(Part... parts) {
    ByteArrayOutputStream body = new ByteArrayOutputStream();
    for (Part part : parts) {
      String file = part.file().isEmpty() ? "" : "; filename=\"" + part.file() + "\"";
      body.writeBytes(
          ("--"
                  + BOUNDARY
                  + "\r\nContent-Disposition: form-data; name=\""
                  + part.name()
                  + "\""
                  + file
                  + "\r\n\r\n")
              .getBytes(StandardCharsets.UTF_8));
      body.writeBytes(part.bytes());
      body.writeBytes("\r\n".getBytes(StandardCharsets.UTF_8));
    }
    body.writeBytes(("--" + BOUNDARY + "--\r\n").getBytes(StandardCharsets.UTF_8));
    return body.toByteArray();
  }

  private HttpRequest.Builder request(String path, String... headers) {
    HttpRequest.Builder request =
        HttpRequest.newBuilder(URI.create("http://localhost:" + port + path));
    return headers.length == 0 ? request : request.headers(headers);
  }

  private Answer send(HttpRequest.Builder request) {
    try {
      HttpResponse<byte[]> response = client.send(request.build(), BodyHandlers.ofByteArray());
      String type = response.headers().firstValue("Content-Type").orElse("");
      return new Answer(response.statusCode(), type, response);
    } catch (IOException e) {
      throw new IllegalStateException(e);
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new IllegalStateException(e);
    }
  }

  /** Sends these lines as they stand and gives all that comes back. */
  public String raw(String... lines) throws IOException {
    try (Socket socket = new Socket("127.0.0.1", port)) {
      String request = String.join("\r\n", lines) + "\r\n\r\n";
      socket.getOutputStream().write(request.getBytes(StandardCharsets.ISO_8859_1));
      return new String(socket.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
    }
  }

  /** Asks again and again until the job at this path has ended; at most a minute. */
  public JsonNode ended(String path) {
    return ended(path, 60);
  }

  /** Asks ten times a second until the job at this path has ended. */
  public JsonNode ended(String path, int mostSeconds) {
    for (int i = 0; i < 10 * mostSeconds; i++) {
      JsonNode state = get(path).json();
      if (!Map.of("queued", 1, "running", 1).containsKey(state.path("state").asString())) {
        return state;
      }
      pause();
    }
    throw new IllegalStateException(path + " did not end within " + mostSeconds + " s");
  }

  private static void pause() {
    try {
      Thread.sleep(100);
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new IllegalStateException(e);
    }
  }
}
