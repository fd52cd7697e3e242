package fourthwire.testsupport;

import fourthwire.metering.RawFile;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.LocalDateTime;
import java.util.List;

/** A log of any length without a file: the rows of a short one again and again, a minute apart. */
public final class EndlessLog implements RawFile {
  private final byte[] header;
  private final List<byte[]> rows;
  private final long length;

  /** As many bytes as asked for, or a row more. */
  public EndlessLog(Path log, long length) throws IOException {
    List<String> lines = java.nio.file.Files.readAllLines(log).subList(0, 2000);
    this.header = (lines.get(0) + "\n").getBytes(StandardCharsets.US_ASCII);
    this.rows =
        lines.stream()
            .skip(1)
            .map(l -> (l.substring(l.indexOf(',')) + "\n").getBytes(StandardCharsets.US_ASCII))
            .toList();
    this.length = length;
  }

  @Override
  public String name() {
    return "endless.csv";
  }

  @Override
  public String sha256() {
    return "";
  }

  @Override
  public long length() {
    return length;
  }

  @Override
  public InputStream open() {
    return new InputStream() {
      private byte[] part = header;
      private int at;
      private long given;
      private int row;

      @Override
      public int read() {
        byte[] one = new byte[1];
        return read(one, 0, 1) < 0 ? -1 : one[0];
      }

      @Override
      public int read(byte[] into, int offset, int count) {
        if (at == part.length) {
          if (given >= length) {
            return -1;
          }
          byte[] time = time(row).getBytes(StandardCharsets.US_ASCII);
          byte[] rest = rows.get(row++ % rows.size());
          part = new byte[time.length + rest.length];
          System.arraycopy(time, 0, part, 0, time.length);
          System.arraycopy(rest, 0, part, time.length, rest.length);
          at = 0;
        }
        int n = Math.min(count, part.length - at);
        System.arraycopy(part, at, into, offset, n);
        at += n;
        given += n;
        return n;
      }
    };
  }

  private static String time(int row) {
    LocalDateTime at = LocalDateTime.of(2015, 1, 1, 0, 0).plusMinutes(row);
    return at.toString().replace('T', ' ') + ":00";
  }
}
