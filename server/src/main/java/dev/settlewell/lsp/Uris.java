package dev.settlewell.lsp;

import java.io.ByteArrayOutputStream;
import java.nio.charset.StandardCharsets;
import java.util.Locale;

/**
 * The names of sheets: what a client calls a document, and what everything below calls it.
 *
 * <p>Below the server a file is known by its absolute path with {@code /}; a document without a
 * file keeps its URI. Clients spell one file in several ways ({@code file:///c%3A/a}, {@code
 * file:///C:/a}); all of them give one name.
 */
final class Uris {
  private static final String FILE = "file://";
  private static final String UNRESERVED =
      "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789-._~/";

  private Uris() {}

  static boolean isFile(String uri) {
    return uri.regionMatches(true, 0, FILE, 0, FILE.length());
  }

  static String name(String uri) {
    if (!isFile(uri)) {
      return uri;
    }
    String rest = decode(uri.substring(FILE.length()));
    if (!rest.startsWith("/")) {
      boolean local = rest.toLowerCase(Locale.ROOT).startsWith("localhost/");
      return local ? driveUpper(rest.substring("localhost".length())) : "//" + rest;
    }
    return driveUpper(rest);
  }

  static String uri(String name) {
    if (name.startsWith("//")) {
      return FILE + encode(name.substring(2));
    }
    if (name.startsWith("/")) {
      return FILE + encode(name);
    }
    if (hasDrive(name, 0)) {
      return FILE + "/" + encode(name);
    }
    return name;
  }

  /** {@code /c:/a} is {@code C:/a}. */
  private static String driveUpper(String path) {
    if (!path.startsWith("/") || !hasDrive(path, 1)) {
      return path;
    }
    return Character.toUpperCase(path.charAt(1)) + path.substring(2);
  }

  private static boolean hasDrive(String path, int at) {
    return path.length() > at + 1
        && path.charAt(at + 1) == ':'
        && (path.charAt(at) | 0x20) >= 'a'
        && (path.charAt(at) | 0x20) <= 'z'
        && (path.length() == at + 2 || path.charAt(at + 2) == '/');
  }

  /** A percent that begins no escape stands for itself, as some clients forget to escape it. */
  private static String decode(String text) {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream(text.length());
    int i = 0;
    while (i < text.length()) {
      int high = i + 2 < text.length() ? Character.digit(text.charAt(i + 1), 16) : -1;
      int low = i + 2 < text.length() ? Character.digit(text.charAt(i + 2), 16) : -1;
      if (text.charAt(i) == '%' && high >= 0 && low >= 0) {
        bytes.write(high * 16 + low);
        i += 3;
      } else {
        int codePoint = text.codePointAt(i);
        bytes.writeBytes(Character.toString(codePoint).getBytes(StandardCharsets.UTF_8));
        i += Character.charCount(codePoint);
      }
    }
    return bytes.toString(StandardCharsets.UTF_8);
  }

  private static String encode(String path) {
    StringBuilder uri = new StringBuilder(path.length() + 16);
    for (byte b : path.getBytes(StandardCharsets.UTF_8)) {
      if (UNRESERVED.indexOf(b) >= 0) {
        uri.append((char) b);
      } else {
        uri.append('%').append(hex(b >> 4)).append(hex(b));
      }
    }
    return uri.toString();
  }

  private static char hex(int nibble) {
    return "0123456789ABCDEF".charAt(nibble & 15);
  }
}
