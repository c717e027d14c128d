package org.levelgaze.plot;

import java.util.Locale;

/**
 * The colours of a picture. The value is that of paper and stands in the attributes; the classes let the page's style
 * sheet put its own in their place, since attributes lose against it.
 */
enum Tone {
    PAPER("#fbfaf7"),
    WASH("#f1eee6"),
    RULE("#d9d6cd"),
    EDGE("#837e70"),
    INK("#1d2330"),
    INK_SOFT("#545b69"),
    ACCENT("#3a4fb0"),
    STRICT("#1f6f8b"),
    LENIENT("#a94b24"),
    EVEN("#5b6170"),
    FAULT("#8c2f4f");

    private final String paper;

    Tone(String paper) {
        this.paper = paper;
    }

    /** The colour on paper. */
    String paper() {
        return paper;
    }

    /** The token of the page's style sheet, without its two dashes. */
    String token() {
        return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }

    /** The class of what is filled with it. */
    String fill() {
        return "plot-fill-" + token();
    }

    /** The class of what is drawn with it. */
    String line() {
        return "plot-line-" + token();
    }
}
