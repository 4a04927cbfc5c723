package steelyard.variants.catalog.kilns;

/**
 * A temperature class.
 *
 * @param fire days with the burners on, at least 1
 * @param cool days until the kiln can be opened after that, at least 0
 * @param gas what the burners take of the gas main on each of their days, at least 0
 */
record Heat(int fire, int cool, int gas) {

  /** Days from lighting to opening the kiln. */
  int days() {
    return fire + cool;
  }
}
