package org.levelgaze.shared;

import java.util.List;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;

/**
 * A page of a collection as the API answers it.
 *
 * @param items what stands on this page
 * @param next hand it back as {@code after} to read on; null: this was the last page
 * @param <T> what is listed
 */
public record Listing<T>(List<T> items, @Nullable String next) {

    /** The most items that one page holds. */
    public static final int LARGEST_PAGE = 500;

    /**
     * Cuts a page out of a whole list.
     *
     * @param all the whole list in its order
     * @param cursor gives the mark after which to read on
     * @param after the mark of the page before; null: from the start
     * @param limit at most this many items; held to 1 … {@value #LARGEST_PAGE}
     */
    public static <T> Listing<T> page(List<T> all, Function<T, String> cursor, @Nullable String after, int limit) {
        int from = 0;
        if (after != null) {
            while (from < all.size() && !cursor.apply(all.get(from)).equals(after)) {
                from++;
            }
            from = Math.min(from + 1, all.size());
        }
        int to = Math.min(all.size(), from + Math.max(1, Math.min(limit, LARGEST_PAGE)));
        String next = to < all.size() ? cursor.apply(all.get(to - 1)) : null;
        return new Listing<>(all.subList(from, to), next);
    }
}
