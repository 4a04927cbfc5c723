package steelyard.variants.model;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.List;

/** Feeds numbers and texts into SHA-256, each so that no two different sequences look alike. */
public final class Digester {
  private final MessageDigest sha;
  private final ByteBuffer buffer = ByteBuffer.allocate(8192);

  public Digester() {
    try {
      sha = MessageDigest.getInstance("SHA-256");
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
  }

  public Digester add(int value) {
    room(Integer.BYTES).putInt(value);
    return this;
  }

  public Digester add(long value) {
    room(Long.BYTES).putLong(value);
    return this;
  }

  public Digester add(String text) {
    return add(text.getBytes(StandardCharsets.UTF_8));
  }

  /** The bytes, after their count. */
  public Digester add(byte[] bytes) {
    add(bytes.length);
    flush();
    sha.update(bytes);
    return this;
  }

  /** The digests in ascending order, after their count: a multiset. */
  Digester addSorted(List<byte[]> digests) {
    List<byte[]> sorted = digests.stream().sorted(Arrays::compareUnsigned).toList();
    add(sorted.size());
    sorted.forEach(this::add);
    return this;
  }

  byte[] bytes() {
    flush();
    return sha.digest();
  }

  /** The digest of all that was added; starts anew. */
  public Digest digest() {
    return new Digest(HexFormat.of().formatHex(bytes()));
  }

  private ByteBuffer room(int bytes) {
    if (buffer.remaining() < bytes) {
      flush();
    }
    return buffer;
  }

  private void flush() {
    sha.update(buffer.array(), 0, buffer.position());
    buffer.clear();
  }
}
