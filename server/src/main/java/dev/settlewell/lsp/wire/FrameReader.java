package dev.settlewell.lsp.wire;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.util.HashMap;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * Reads the frames of the LSP base protocol, with bounds on everything a peer chooses: the length
 * of a header, of a body, and the depth of its nesting.
 *
 * <p>A frame that is whole but too much is skipped; a header that makes no sense is {@link
 * BrokenFraming}, for then nobody knows where the next message begins.
 */
public final class FrameReader {
  private static final int MOST_HEADER_LINES = 32;
  private static final int LONGEST_HEADER_LINE = 4096;

  private final InputStream in;
  private final long largestBody;
  private final int deepestNesting;

  public FrameReader(InputStream in, long largestBody, int deepestNesting) {
    this.in = in;
    this.largestBody = largestBody;
    this.deepestNesting = deepestNesting;
  }

  /** The next frame; empty where the stream ends, even in the middle of one. */
  public Optional<Frame> next() throws IOException {
    Optional<Map<String, String>> header = header();
    if (header.isEmpty()) {
      return Optional.empty();
    }
    long length = length(header.get());
    if (length > largestBody) {
      return skip(length)
          ? Optional.of(new Frame.Refused("a message of " + length + " bytes is too long"))
          : Optional.empty();
    }
    byte[] body = in.readNBytes((int) length);
    if (body.length < length) {
      return Optional.empty();
    }
    return Optional.of(decode(body, header.get().getOrDefault("content-type", "")));
  }

  private Frame decode(byte[] body, String contentType) {
    Optional<Charset> charset = charset(contentType);
    if (charset.isEmpty()) {
      return new Frame.Refused("unknown charset in Content-Type: " + contentType);
    }
    String json = new String(body, charset.get());
    if (depth(json) > deepestNesting) {
      return new Frame.Refused("a message nested deeper than " + deepestNesting);
    }
    return new Frame.Body(json);
  }

  private Optional<Map<String, String>> header() throws IOException {
    Map<String, String> fields = new HashMap<>();
    for (int lines = 0; lines < MOST_HEADER_LINES; lines++) {
      Optional<String> line = headerLine();
      if (line.isEmpty()) {
        return Optional.empty();
      }
      if (line.get().isEmpty()) {
        return Optional.of(fields);
      }
      int colon = line.get().indexOf(':');
      if (colon < 1) {
        throw new BrokenFraming("no header line: " + quoted(line.get()));
      }
      String name = line.get().substring(0, colon).trim().toLowerCase(Locale.ROOT);
      String value = line.get().substring(colon + 1).trim();
      String before = fields.put(name, value);
      if (before != null && !before.equals(value)) {
        throw new BrokenFraming("header says two things: " + name);
      }
    }
    throw new BrokenFraming("a header of more than " + MOST_HEADER_LINES + " lines");
  }

  private Optional<String> headerLine() throws IOException {
    ByteArrayOutputStream line = new ByteArrayOutputStream(64);
    while (true) {
      int b = in.read();
      if (b < 0) {
        return Optional.empty();
      }
      if (b == '\n') {
        String text = line.toString(StandardCharsets.ISO_8859_1);
        return Optional.of(text.endsWith("\r") ? text.substring(0, text.length() - 1) : text);
      }
      if (line.size() == LONGEST_HEADER_LINE) {
        throw new BrokenFraming("a header line of more than " + LONGEST_HEADER_LINE + " bytes");
      }
      line.write(b);
    }
  }

  private static long length(Map<String, String> header) throws BrokenFraming {
    String length = header.get("content-length");
    if (length == null) {
      throw new BrokenFraming("a header without Content-Length");
    }
    if (!length.matches("[0-9]{1,15}")) {
      throw new BrokenFraming("no length: " + quoted(length));
    }
    return Long.parseLong(length);
  }

  private boolean skip(long length) throws IOException {
    byte[] scratch = new byte[8192];
    long left = length;
    while (left > 0) {
      int read = in.read(scratch, 0, (int) Math.min(scratch.length, left));
      if (read < 0) {
        return false;
      }
      left -= read;
    }
    return true;
  }

  /** UTF-8 unless the content type says otherwise; {@code utf8} is what older clients write. */
  private static Optional<Charset> charset(String contentType) {
    for (String parameter : contentType.split(";")) {
      String[] pair = parameter.split("=", 2);
      if (pair.length == 2 && pair[0].trim().equalsIgnoreCase("charset")) {
        String name = pair[1].trim().replace("\"", "");
        try {
          return Optional.of(Charset.forName(name));
        } catch (IllegalArgumentException unknown) {
          return Optional.empty();
        }
      }
    }
    return Optional.of(StandardCharsets.UTF_8);
  }

  private static int depth(String json) {
    int depth = 0;
    int deepest = 0;
    boolean inString = false;
    for (int i = 0; i < json.length(); i++) {
      char c = json.charAt(i);
      if (inString) {
        if (c == '\\') {
          i++;
        } else if (c == '"') {
          inString = false;
        }
      } else if (c == '"') {
        inString = true;
      } else if (c == '{' || c == '[') {
        deepest = Math.max(deepest, ++depth);
      } else if (c == '}' || c == ']') {
        depth--;
      }
    }
    return deepest;
  }

  private static String quoted(String text) {
    return '"' + (text.length() > 40 ? text.substring(0, 40) + "…" : text) + '"';
  }
}
