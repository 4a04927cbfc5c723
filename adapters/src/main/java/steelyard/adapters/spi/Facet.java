package steelyard.adapters.spi;

/** An ability that only some backends have. */
public interface Facet {}
