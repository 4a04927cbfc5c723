package steelyard.variants.family;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;

/**
 * One instance file.
 *
 * @param name the instance's name within its family
 * @param path where it lies
 */
public record InstanceSource(String name, Path path) {
  public InstanceSource {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(path, "path");
  }

  public byte[] bytes() throws IOException {
    return Files.readAllBytes(path);
  }

  /**
   * The file as UTF-8 text.
   *
   * @throws InstanceException if it is not UTF-8
   */
  public String text() throws IOException {
    try {
      return StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes())).toString();
    } catch (CharacterCodingException e) {
      throw new InstanceException(name + ": is not UTF-8 text", e);
    }
  }

  /** The file's lines as UTF-8 text. */
  public List<String> lines() throws IOException {
    return text().lines().toList();
  }
}
