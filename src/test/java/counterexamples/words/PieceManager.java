package counterexamples.words;

/** Says nothing about what it does. */
class PieceManager {}
