package coldseam.cli.plot;

/**
 * A colour without transparency. Java's own one asks the whole window toolkit to start first, which
 * takes as long as a plot.
 *
 * @param rgb red, green and blue from the third byte down
 */
record Colour(int rgb) {
  int red() {
    return rgb >> 16 & 0xFF;
  }

  int green() {
    return rgb >> 8 & 0xFF;
  }

  int blue() {
    return rgb & 0xFF;
  }
}
