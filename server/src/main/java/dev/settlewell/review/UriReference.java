package dev.settlewell.review;

import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.stream.Collectors;

/** Paths as URI references (RFC 3986): what no path segment may hold is percent-encoded. */
final class UriReference {
  private static final String PLAIN = "-._~!$&'()*+,=@";

  private UriReference() {}

  static boolean isAbsolute(String path) {
    return path.startsWith("/") || path.matches("[A-Za-z]:/.*");
  }

  static String of(String path) {
    String encoded =
        Arrays.stream(path.split("/", -1))
            .map(UriReference::segment)
            .collect(Collectors.joining("/"));
    boolean drive = path.matches("[A-Za-z]:/.*");
    return drive ? "file:///" + encoded : isAbsolute(path) ? "file://" + encoded : encoded;
  }

  private static String segment(String segment) {
    StringBuilder encoded = new StringBuilder();
    for (byte each : segment.getBytes(StandardCharsets.UTF_8)) {
      char c = (char) (each & 0xFF);
      boolean letter = 'a' <= c && c <= 'z' || 'A' <= c && c <= 'Z' || '0' <= c && c <= '9';
      if (letter || PLAIN.indexOf(c) >= 0) {
        encoded.append(c);
      } else {
        encoded.append('%').append(hex(c >> 4)).append(hex(c & 15));
      }
    }
    return encoded.toString();
  }

  private static char hex(int digit) {
    return "0123456789ABCDEF".charAt(digit);
  }
}
