package fourthwire.store;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.security.DigestInputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.Collection;
import java.util.HexFormat;
import java.util.Optional;
import org.springframework.jdbc.core.simple.JdbcClient;

/**
 * Files in the database, in parts: H2 holds at most 1 MiB in one {@code bytea}, and no more than a
 * part is ever held in memory.
 */
final class FileStore {
  private static final int PART_BYTES = 256 * 1024;

  private final JdbcClient jdbc;

  FileStore(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  /**
   * A stored file.
   *
   * @param sha256 lower-case hexadecimal
   */
  record Stored(long id, long length, String sha256) {}

  Stored save(byte[] bytes) {
    try {
      return save(new ByteArrayInputStream(bytes));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Stores all that the stream gives; the caller closes it and keeps the transaction. */
  Stored save(InputStream stream) throws IOException {
    long id = Rows.insert(jdbc.sql("insert into stored_files (byte_count, sha256) values (0, '')"));
    MessageDigest digest = sha256();
    DigestInputStream in = new DigestInputStream(stream, digest);
    long length = 0;
    int position = 0;
    for (byte[] part = in.readNBytes(PART_BYTES);
        part.length > 0;
        part = in.readNBytes(PART_BYTES)) {
      jdbc.sql("insert into stored_file_parts (file_id, position, bytes) values (?, ?, ?)")
          .params(id, position++, part)
          .update();
      length += part.length;
    }
    String sha256 = HexFormat.of().formatHex(digest.digest());
    jdbc.sql("update stored_files set byte_count = ?, sha256 = ? where id = ?")
        .params(length, sha256, id)
        .update();
    return new Stored(id, length, sha256);
  }

  byte[] bytes(long fileId) {
    try (InputStream in = open(fileId)) {
      return in.readAllBytes();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** The file's bytes, fetched part by part. */
  InputStream open(long fileId) {
    return new PartStream(fileId);
  }

  void delete(Collection<Long> fileIds) {
    fileIds.forEach(this::delete);
  }

  /**
   * Part by part: outside a transaction no more than a part is then kept for an undo, however large
   * the file.
   */
  private void delete(long fileId) {
    String part = "delete from stored_file_parts where file_id = ? and position = ?";
    for (int position = 0; jdbc.sql(part).params(fileId, position).update() > 0; position++) {
      // goes on to the last part
    }
    jdbc.sql("delete from stored_files where id = ?").param(fileId).update();
  }

  private Optional<byte[]> part(long fileId, int position) {
    return jdbc.sql("select bytes from stored_file_parts where file_id = ? and position = ?")
        .params(fileId, position)
        .query((row, n) -> row.getBytes(1))
        .optional();
  }

  static MessageDigest sha256() {
    try {
      return MessageDigest.getInstance("SHA-256");
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
  }

  /** Reads one part after the other. */
  private final class PartStream extends InputStream {
    private final long fileId;
    private int next;
    private ByteArrayInputStream current = new ByteArrayInputStream(new byte[0]);

    PartStream(long fileId) {
      this.fileId = fileId;
    }

    @Override
    public int read() {
      return more() ? current.read() : -1;
    }

    @Override
    public int read(byte[] into, int offset, int length) {
      if (length == 0) {
        return 0;
      }
      return more() ? current.read(into, offset, length) : -1;
    }

    private boolean more() {
      if (current.available() == 0) {
        part(fileId, next)
            .ifPresent(
                bytes -> {
                  current = new ByteArrayInputStream(bytes);
                  next++;
                });
      }
      return current.available() > 0;
    }
  }
}
