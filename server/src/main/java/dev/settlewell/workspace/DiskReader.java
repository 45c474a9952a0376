package dev.settlewell.workspace;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;

/** Reads files of the disk as UTF-8. */
public final class DiskReader implements SheetReader {
  /** Far above any sheet and any file of constants; keeps a wrong path from filling the memory. */
  private static final long LARGEST = 8L << 20;

  private final Path base;

  /**
   * @param base what relative paths are relative to
   */
  public DiskReader(Path base) {
    this.base = base;
  }

  @Override
  public Content read(String path) {
    try {
      Path file = base.resolve(path);
      if (!Files.exists(file)) {
        return Content.none("there is no such file");
      }
      if (!Files.isRegularFile(file)) {
        return Content.none("it is no file");
      }
      if (Files.size(file) > LARGEST) {
        return Content.none("it is larger than 8 MiB");
      }
      return Content.of(decoded(Files.readAllBytes(file), isSheet(path)));
    } catch (CharacterCodingException e) {
      return Content.none("it is not UTF-8");
    } catch (IOException | InvalidPathException | SecurityException e) {
      return Content.none("it cannot be read");
    }
  }

  private static boolean isSheet(String path) {
    return path.endsWith(".yaml") || path.endsWith(".yml");
  }

  /** A sheet must be UTF-8; of a source of older firmware only the comments are not ASCII. */
  private static String decoded(byte[] bytes, boolean strict) throws CharacterCodingException {
    try {
      return decoded(bytes);
    } catch (CharacterCodingException e) {
      if (strict) {
        throw e;
      }
      return new String(bytes, StandardCharsets.ISO_8859_1);
    }
  }

  private static String decoded(byte[] bytes) throws CharacterCodingException {
    return StandardCharsets.UTF_8
        .newDecoder()
        .onMalformedInput(CodingErrorAction.REPORT)
        .onUnmappableCharacter(CodingErrorAction.REPORT)
        .decode(ByteBuffer.wrap(bytes))
        .toString();
  }

  @Override
  public boolean exists(String path) {
    try {
      return Files.exists(base.resolve(path));
    } catch (InvalidPathException | SecurityException e) {
      return false;
    }
  }

  @Override
  public String real(String path) {
    try {
      Path file = base.resolve(path).toAbsolutePath().normalize();
      Path known = file;
      while (known.getParent() != null && !Files.exists(known)) {
        known = known.getParent();
      }
      Path rest = known.relativize(file);
      return Paths.withSlashes(known.toRealPath().resolve(rest).normalize());
    } catch (IOException | InvalidPathException | SecurityException e) {
      return path;
    }
  }
}
