/**
 * Building models: drafts for whoever writes a family or an amendment, and the normaliser that
 * turns formulas into the relations that adapters see.
 */
package steelyard.variants.model.build;
