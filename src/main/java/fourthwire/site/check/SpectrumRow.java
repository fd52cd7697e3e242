package fourthwire.site.check;

import fourthwire.site.SpectrumTable;

/** A row of {@code spectra} before the rows of one name are put together. */
public record SpectrumRow(String spectrum, SpectrumTable.Row order) {}
