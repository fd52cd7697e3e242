package fourthwire.store;

import fourthwire.metering.RawFile;
import java.io.InputStream;

/** A meter's file in the database. */
record StoredRawFile(String name, FileStore.Stored stored, FileStore files) implements RawFile {
  @Override
  public String sha256() {
    return stored.sha256();
  }

  @Override
  public long length() {
    return stored.length();
  }

  @Override
  public InputStream open() {
    return files.open(stored.id());
  }
}
