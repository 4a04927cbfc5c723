/**
 * What a model means: judges assignments by the definitions of the relations and by the formulas as
 * written. Shares no code with normalising or with any adapter.
 */
package steelyard.variants.model.judge;
