package dev.settlewell;

import com.networknt.schema.InputFormat;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Objects;

/** What a JSON schema says of a document. */
public final class HeldAgainst {
  private HeldAgainst() {}

  /**
   * @param schema a resource of the class path
   * @return what is wrong with the document; empty where nothing is
   */
  public static List<String> schema(String schema, String document) {
    String text = read(schema);
    return SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
        .getSchema(text, InputFormat.JSON)
        .validate(document, InputFormat.JSON)
        .stream()
        .map(error -> error.getInstanceLocation() + ": " + error.getMessage())
        .toList();
  }

  private static String read(String resource) {
    try (InputStream in = HeldAgainst.class.getResourceAsStream(resource)) {
      return new String(
          Objects.requireNonNull(in, resource).readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
