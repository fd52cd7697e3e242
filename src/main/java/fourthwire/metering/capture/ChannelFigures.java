package fourthwire.metering.capture;

import fourthwire.quantity.Spectrum;

/**
 * One current or voltage over the analysed cycles, volts or amps.
 *
 * @param direct mean of the samples
 * @param peak largest sample without the direct component
 * @param rms without the direct component: all orders, interharmonics, noise
 * @param spectrum orders 1 to 50, t = 0 where the reference's fundamental crosses zero upwards
 */
record ChannelFigures(double direct, double peak, double rms, Spectrum spectrum) {}
