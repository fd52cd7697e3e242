package fourthwire.store;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.security.DigestInputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Deque;
import java.util.HexFormat;
import java.util.List;
import java.util.Objects;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.transaction.support.TransactionTemplate;

/**
 * Files in the database, in parts: H2 holds at most 1 MiB in one {@code bytea}, and no more than a
 * few parts are ever held in memory. Outside a transaction they are stored and deleted a few at a
 * time: a database keeps what it may have to undo. What a broken-off process left is deleted at the
 * next start.
 */
final class FileStore {
  private static final int PART_BYTES = 256 * 1024;
  private static final int PARTS_AT_ONCE = 16;
  private static final int READ_AT_ONCE = 4;

  private final JdbcClient jdbc;
  private final TransactionTemplate transaction;

  FileStore(JdbcClient jdbc, TransactionTemplate transaction) {
    this.jdbc = jdbc;
    this.transaction = transaction;
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

  /** Stores all that the stream gives, or nothing; the caller closes it. */
  Stored save(InputStream stream) throws IOException {
    long id =
        Rows.insert(
            jdbc.sql("insert into stored_files (byte_count, sha256, packed) values (0, '', true)"));
    try {
      return save(id, stream);
    } catch (IOException | RuntimeException | Error e) {
      takeBack(id, e);
      throw e;
    }
  }

  private Stored save(long id, InputStream stream) throws IOException {
    MessageDigest digest = sha256();
    DigestInputStream in = new DigestInputStream(stream, digest);
    long length = 0;
    int position = 0;
    List<byte[]> parts = new ArrayList<>();
    for (byte[] part = in.readNBytes(PART_BYTES);
        part.length > 0;
        part = in.readNBytes(PART_BYTES)) {
      length += part.length;
      parts.add(FilePart.pack(part));
      if (parts.size() == PARTS_AT_ONCE) {
        save(id, position, parts);
        position += parts.size();
        parts.clear();
      }
    }
    save(id, position, parts);
    String sha256 = HexFormat.of().formatHex(digest.digest());
    jdbc.sql("update stored_files set byte_count = ?, sha256 = ? where id = ?")
        .params(length, sha256, id)
        .update();
    return new Stored(id, length, sha256);
  }

  private void save(long id, int first, List<byte[]> parts) {
    transaction.executeWithoutResult(
        status -> {
          for (int k = 0; k < parts.size(); k++) {
            jdbc.sql("insert into stored_file_parts (file_id, position, bytes) values (?, ?, ?)")
                .params(id, first + k, parts.get(k))
                .update();
          }
        });
  }

  /** Deletes what was stored of a file that could not be stored whole. */
  private void takeBack(long id, Throwable why) {
    try {
      delete(id);
    } catch (RuntimeException again) {
      why.addSuppressed(again);
    }
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

  private void delete(long fileId) {
    String parts =
        "delete from stored_file_parts where file_id = ? and position >= ? and position < ?";
    int from = 0;
    while (jdbc.sql(parts).params(fileId, from, from + PARTS_AT_ONCE).update() > 0) {
      from += PARTS_AT_ONCE;
    }
    jdbc.sql("delete from stored_files where id = ?").param(fileId).update();
  }

  /** Deletes files that nothing refers to: only while nothing is being stored. */
  void deleteUnowned() {
    delete(
        jdbc.sql(
                """
                select id from stored_files f
                where not exists (select 1 from survey_revisions s where s.file_id = f.id)
                and not exists (select 1 from reading_files r where r.file_id = f.id)
                and not exists (select 1 from reading_upload_files u where u.file_id = f.id)
                """)
            .query(Long.class)
            .list());
  }

  private List<byte[]> parts(long fileId, int from) {
    return jdbc.sql(
            """
            select bytes from stored_file_parts where file_id = ? and position >= ? and position < ?
            order by position
            """)
        .params(fileId, from, from + READ_AT_ONCE)
        .query((row, n) -> Objects.requireNonNull(row.getBytes(1)))
        .list();
  }

  static MessageDigest sha256() {
    try {
      return MessageDigest.getInstance("SHA-256");
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
  }

  /** Reads a few parts at a time. */
  private final class PartStream extends InputStream {
    private final long fileId;
    private final boolean packed;
    private final Deque<byte[]> ahead = new ArrayDeque<>();
    private int next;
    private byte[] current = new byte[PART_BYTES];
    private int at;
    private int end;

    PartStream(long fileId) {
      this.fileId = fileId;
      this.packed =
          jdbc.sql("select packed from stored_files where id = ?")
              .param(fileId)
              .query(Boolean.class)
              .single();
    }

    @Override
    public int read() {
      return more() ? current[at++] & 0xff : -1;
    }

    @Override
    public int read(byte[] into, int offset, int length) {
      if (length == 0) {
        return 0;
      }
      if (!more()) {
        return -1;
      }
      int count = Math.min(length, end - at);
      System.arraycopy(current, at, into, offset, count);
      at += count;
      return count;
    }

    private boolean more() {
      if (at == end && ahead.isEmpty()) {
        ahead.addAll(parts(fileId, next));
        next += ahead.size();
      }
      if (at == end && !ahead.isEmpty()) {
        byte[] part = ahead.remove();
        at = 0;
        end = packed ? FilePart.unpack(part, current) : part.length;
        current = packed ? current : part;
      }
      return at < end;
    }
  }
}
