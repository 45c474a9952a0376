package dev.settlewell.command;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.nio.file.attribute.PosixFileAttributeView;
import java.util.Arrays;

/**
 * The one writer of files: a reader sees the old text or the new one, never a part; the rights of
 * the file stay, a link still leads to it.
 */
final class AtomicWriter {
  private AtomicWriter() {}

  /**
   * @param before what the file held when the new text was worked out
   * @throws InputException where it holds something else by now, or cannot be written
   */
  static void replace(Path path, String before, String after) throws InputException {
    Path temporary = null;
    try {
      Path file = path.toRealPath();
      temporary = Files.createTempFile(file.getParent(), ".settlewell", ".tmp");
      keepRights(file, temporary);
      write(temporary, after);
      if (!Arrays.equals(Files.readAllBytes(file), before.getBytes(StandardCharsets.UTF_8))) {
        throw new InputException(path + " was changed by somebody else meanwhile; nothing written");
      }
      move(temporary, file);
      temporary = null;
    } catch (IOException e) {
      throw new InputException(path + " cannot be written: " + e.getMessage());
    } finally {
      delete(temporary);
    }
  }

  private static void keepRights(Path from, Path to) throws IOException {
    PosixFileAttributeView rights = Files.getFileAttributeView(to, PosixFileAttributeView.class);
    if (rights != null) {
      rights.setPermissions(Files.getPosixFilePermissions(from));
    }
  }

  private static void write(Path path, String text) throws IOException {
    try (FileChannel channel = FileChannel.open(path, StandardOpenOption.WRITE)) {
      ByteBuffer bytes = ByteBuffer.wrap(text.getBytes(StandardCharsets.UTF_8));
      while (bytes.hasRemaining()) {
        channel.write(bytes);
      }
      channel.force(true);
    }
  }

  private static void move(Path from, Path to) throws IOException {
    try {
      Files.move(from, to, StandardCopyOption.ATOMIC_MOVE);
    } catch (AtomicMoveNotSupportedException e) {
      Files.move(from, to, StandardCopyOption.REPLACE_EXISTING);
    }
  }

  private static void delete(Path temporary) {
    if (temporary != null) {
      try {
        Files.deleteIfExists(temporary);
      } catch (IOException e) {
        // It is in the way of nobody.
      }
    }
  }
}
