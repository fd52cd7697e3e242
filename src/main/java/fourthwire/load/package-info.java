/**
 * Load models: what one piece of equipment draws at the voltage it stands at, from physics.
 *
 * <p>Door: {@link fourthwire.load.LoadModels}, which makes a {@link
 * fourthwire.load.model.LoadModel} from a {@link fourthwire.load.LoadRequest}; {@link
 * fourthwire.load.Presets} in plain words. The physics of rectifiers lies in {@code rectifier},
 * that of controlled supplies and dimmers in {@code control}, what every model is in {@code model};
 * {@code trial} runs one by itself behind a source. May use {@code quantity} and {@code site}
 * (kinds and model columns).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.load;
