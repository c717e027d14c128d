package org.levelgaze.studies.reading;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * The columns of a layout, found in the header of a file.
 *
 * @param width columns in the header
 * @param piece column of the piece
 * @param reference column of the true state, {@code null} when the file has none
 * @param defect column of the defect kind, {@code null} when the file has none
 * @param appraiser column of the appraiser, {@code null} when the call columns name theirs
 * @param trial column of the trial, {@code null} when the call columns name theirs
 * @param calls the columns of calls
 */
record Columns(
        int width,
        Column piece,
        @Nullable Column reference,
        @Nullable Column defect,
        @Nullable Column appraiser,
        @Nullable Column trial,
        List<Calls> calls) {

    /** A column: its place from 0, and its name as the header writes it. */
    record Column(int at, String name) {}

    /** A column of calls, with whose and in which trial where no other column says so. */
    record Calls(
            Column call,
            @Nullable String appraiser,
            int trial,
            @Nullable Column seen) {}

    private static final Column NOWHERE = new Column(0, "");

    /** Finds the columns; what is missing or stands twice is added to the bad rows, and the answer is then of no use. */
    static Columns find(Layout layout, List<String> header, BadRows bad) {
        Search search = new Search(header, bad);
        List<Calls> calls = new ArrayList<>();
        Column piece = search.needed(layout.piece());
        Column appraiser = layout.appraiser() == null ? null : search.needed(layout.appraiser());
        Column trial = layout.trial() == null ? null : search.needed(layout.trial());
        for (Layout.CallColumn call : layout.calls()) {
            int constant = call.trial() == null ? 0 : call.trial();
            calls.add(
                    new Calls(search.needed(call.column()), call.appraiser(), constant, search.possible(call.seen())));
        }
        Column reference = search.possible(layout.reference());
        return new Columns(header.size(), piece, reference, search.possible(layout.defect()), appraiser, trial, calls);
    }

    private record Search(List<String> header, BadRows bad) {

        Column needed(String name) {
            Column found = possible(name);
            if (found == null) {
                bad.add(1, name, "", "column-missing", name, String.join(", ", header));
                return NOWHERE;
            }
            return found;
        }

        @Nullable
        Column possible(@Nullable String name) {
            if (name == null) {
                return null;
            }
            Column found = null;
            for (int at = 0; at < header.size(); at++) {
                if (Words.plain(header.get(at)).equals(Words.plain(name))) {
                    if (found != null) {
                        bad.add(1, header.get(at), "", "column-twice", header.get(at));
                        return found;
                    }
                    found = new Column(at, header.get(at));
                }
            }
            return found;
        }
    }
}
