package dev.settlewell.workspace;

import java.util.Optional;

/**
 * Where texts come from: the disk, an editor's buffers over it, a revision of a repository. Paths
 * are absolute or relative to one place of the face's choice, always with {@code /}.
 */
public interface SheetReader {

  /** The text of a file, or why there is none. */
  Content read(String path);

  /** Whether a file or folder of that name is there. */
  boolean exists(String path);

  /**
   * The one name of a file: absolute, without {@code ..}, links followed as far as the path exists.
   */
  String real(String path);

  /**
   * @param text empty where the file could not be read
   * @param why one clause: {@code there is no such file}; "" where there is a text
   */
  record Content(Optional<String> text, String why) {
    public static Content of(String text) {
      return new Content(Optional.of(text), "");
    }

    public static Content none(String why) {
      return new Content(Optional.empty(), why);
    }
  }
}
