package counterexamples.unmarked;

/** In a package that says nothing about null. */
class Unmarked {}
