package fourthwire.metering.series;

import java.util.ArrayList;
import java.util.List;

/** Where coded columns are put while a log is read. */
public interface Parts extends AutoCloseable {
  /** Keeps these bytes; returns their number, counted from 0. */
  int add(byte[] bytes);

  /** The bytes of a number. */
  byte[] get(int number);

  /** Lets go of all. */
  @Override
  void close();

  /** In memory. */
  static Parts held() {
    return new Parts() {
      private final List<byte[]> all = new ArrayList<>();

      @Override
      public synchronized int add(byte[] bytes) {
        all.add(bytes);
        return all.size() - 1;
      }

      @Override
      public synchronized byte[] get(int number) {
        return all.get(number);
      }

      @Override
      public synchronized void close() {
        all.clear();
      }
    };
  }
}
