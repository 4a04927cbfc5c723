package steelyard.adapters.spi;

/** What lowering a model gives. */
public sealed interface Lowered permits Lowering, Refusal {}
