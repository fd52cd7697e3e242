package fourthwire.metering.log;

import fourthwire.metering.series.Series;
import java.util.List;

/** Some columns of a series, those that it has. */
final class ChosenColumns implements Series {
  private final Series all;
  private final List<String> chosen;
  private final int[] at;

  ChosenColumns(Series all, List<String> chosen) {
    this.all = all;
    this.chosen = chosen.stream().filter(c -> all.indexOf(c) >= 0).toList();
    this.at = this.chosen.stream().mapToInt(all::indexOf).toArray();
  }

  @Override
  public List<String> quantities() {
    return chosen;
  }

  @Override
  public long rows() {
    return all.rows();
  }

  @Override
  public int chunks() {
    return all.chunks();
  }

  @Override
  public int rows(int chunk) {
    return all.rows(chunk);
  }

  @Override
  public long[] startMillis(int chunk) {
    return all.startMillis(chunk);
  }

  @Override
  public double[] values(int chunk, int quantity) {
    return all.values(chunk, at[quantity]);
  }
}
