package org.levelgaze.studies.reading;

import java.util.Collections;
import java.util.LinkedHashSet;
import java.util.Locale;
import java.util.Set;

/**
 * Which words of a file mean what, without regard to case and to blanks around them.
 *
 * @param accept words of a call that lets a piece through
 * @param reject words of a call that holds it back
 * @param good words of a true state that is good
 * @param defective words of a true state that is defective
 */
public record Words(Set<String> accept, Set<String> reject, Set<String> good, Set<String> defective) {

    private static final String GREY = "grey";

    private static final Words STANDARD =
            new Words(Set.of("accept"), Set.of("reject"), ordered("good", "accept"), ordered("defective", "reject"));

    /**
     * Keeps the words in their plain form.
     *
     * @throws IllegalArgumentException when a word would mean both
     */
    public Words {
        accept = plain(accept);
        reject = plain(reject);
        good = plain(good);
        defective = plain(defective);
        refuseCommon(accept, reject);
        refuseCommon(good, defective);
    }

    /** {@code accept} and {@code reject}; {@code good}, {@code defective}, {@code accept} and {@code reject} for the truth. */
    public static Words standard() {
        return STANDARD;
    }

    /** These words and, beside them, the known words of the trade that they leave open; 1 and 0 are not among those. */
    public Words withKnown() {
        return new Words(
                with(KnownWords.ACCEPT, accept, reject),
                with(KnownWords.REJECT, reject, accept),
                with(KnownWords.ACCEPT, good, defective),
                with(KnownWords.REJECT, defective, good));
    }

    private static Set<String> with(Set<String> known, Set<String> own, Set<String> others) {
        Set<String> all = new LinkedHashSet<>(own);
        known.stream().filter(word -> !others.contains(word)).sorted().forEach(all::add);
        return all;
    }

    /** Whether a word of the reference says that the piece is undecided. It is the same in every file and never asked. */
    public static boolean isGrey(String word) {
        return plain(word).equals(GREY);
    }

    /** The form in which words are compared. */
    public static String plain(String word) {
        return word.strip().toLowerCase(Locale.ROOT);
    }

    private static Set<String> plain(Set<String> words) {
        Set<String> plain = new LinkedHashSet<>();
        words.forEach(word -> plain.add(plain(word)));
        return Collections.unmodifiableSet(plain);
    }

    private static Set<String> ordered(String first, String second) {
        Set<String> words = new LinkedHashSet<>();
        words.add(first);
        words.add(second);
        return words;
    }

    private static void refuseCommon(Set<String> some, Set<String> others) {
        for (String word : some) {
            if (others.contains(word)) {
                throw new IllegalArgumentException("The word '" + word + "' cannot mean both");
            }
        }
    }
}
