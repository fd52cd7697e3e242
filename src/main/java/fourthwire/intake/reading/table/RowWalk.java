package fourthwire.intake.reading.table;

/** Goes through blocks of rows and shows each row. */
final class RowWalk implements TextTable.Row {
  private final RowCutter cutter;
  private long number;

  /**
   * @param before rows of the file before the first block
   */
  RowWalk(RowCutter cutter, long before) {
    this.cutter = cutter;
    this.number = before;
  }

  /** Whether to go on after this block; empty rows and those before the first are only counted. */
  boolean through(Blocks.Block block, long first, TextTable.Visitor visitor) {
    int at = 0;
    while (at < block.length()) {
      at = cutter.next(block.bytes(), at, block.length());
      number++;
      if (number >= first && !cutter.isEmpty() && !visitor.row(this)) {
        return false;
      }
    }
    return true;
  }

  /** The cells of this row. */
  RowCutter cutter() {
    return cutter;
  }

  @Override
  public long number() {
    return number;
  }

  @Override
  public int cells() {
    return cutter.cells();
  }

  @Override
  public String text(int column) {
    return cutter.text(column);
  }

  @Override
  public double value(int column, int shift) {
    return cutter.number(column, shift);
  }
}
