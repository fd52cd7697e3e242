package fourthwire.intake.reading.log;

import fourthwire.metering.series.Parts;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.StandardOpenOption;
import java.util.Arrays;
import org.jspecify.annotations.Nullable;

/** Coded columns in memory while they are small, then in a temporary file that goes with them. */
final class SpilledParts implements Parts {
  /** A share of the memory there is, for two logs may be read at once; of much memory no more. */
  private static final long MOST_HELD_BYTES =
      Math.min(48L << 20, Runtime.getRuntime().maxMemory() / 32);

  private byte[] @Nullable [] held = new byte[1024][];
  private long[] position = new long[1024];
  private int[] length = new int[1024];
  private int count;
  private long heldBytes;
  private long filed;
  private @Nullable FileChannel file;

  @Override
  public synchronized int add(byte[] bytes) {
    if (count == held.length) {
      held = Arrays.copyOf(held, 2 * count);
      position = Arrays.copyOf(position, 2 * count);
      length = Arrays.copyOf(length, 2 * count);
    }
    length[count] = bytes.length;
    if (heldBytes + bytes.length <= MOST_HELD_BYTES) {
      held[count] = bytes;
      heldBytes += bytes.length;
    } else {
      position[count] = write(bytes);
    }
    return count++;
  }

  private long write(byte[] bytes) {
    try {
      FileChannel to = file;
      if (to == null) {
        to =
            FileChannel.open(
                Files.createTempFile("fourthwire-series", ".tmp"),
                StandardOpenOption.READ,
                StandardOpenOption.WRITE,
                StandardOpenOption.DELETE_ON_CLOSE);
        file = to;
      }
      long at = filed;
      ByteBuffer buffer = ByteBuffer.wrap(bytes);
      while (buffer.hasRemaining()) {
        filed += to.write(buffer, filed);
      }
      return at;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  @Override
  public synchronized byte[] get(int number) {
    byte[] there = held[number];
    return there == null ? read(number) : there;
  }

  private byte[] read(int number) {
    ByteBuffer buffer = ByteBuffer.allocate(length[number]);
    try {
      FileChannel from = java.util.Objects.requireNonNull(file);
      long at = position[number];
      while (buffer.hasRemaining() && from.read(buffer, at + buffer.position()) >= 0) {
        // goes on until the part is whole
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return buffer.array();
  }

  @Override
  public synchronized void close() {
    Arrays.fill(held, null);
    try {
      if (file != null) {
        file.close();
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
