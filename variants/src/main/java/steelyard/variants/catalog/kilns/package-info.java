/**
 * The kilns of the Marrowdale Tileworks. Glazed tiles come in lots, and lots go into the firings of
 * several kilns: each firing has one temperature class, glazes that spoil each other stay apart,
 * shelves are few, kilns must cool before they are opened and cost something whenever their
 * temperature changes, and what comes out after its day costs too. Which lot goes into which
 * firing, how hot is each and when does it start, so that a campaign costs least?
 *
 * <p>Temperature classes are called heats and count from 1, the coolest; heat 0 stands for a firing
 * that is not lit. Days count from 0, the first of the campaign.
 */
package steelyard.variants.catalog.kilns;
