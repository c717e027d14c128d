package org.levelgaze.agreement;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;

/** Puts a {@link Study} together: first pieces and appraisers, then calls in any order. For one thread. */
public final class StudyBuilder {

    final List<Piece> pieces = new ArrayList<>();
    final Map<String, Integer> appraisers = new LinkedHashMap<>();
    final Map<String, Integer> kinds = new LinkedHashMap<>();
    private final Set<String> labels = new HashSet<>();

    int calls;
    int[] piece;
    int[] appraiser;
    int[] trial;
    int[] seen;
    byte[] reject;
    boolean anySeen;

    StudyBuilder(int expected) {
        int room = Math.max(expected, 8);
        piece = new int[room];
        appraiser = new int[room];
        trial = new int[room];
        seen = new int[room];
        reject = new byte[room];
    }

    /**
     * Adds a piece and answers its place.
     *
     * @throws IllegalArgumentException when there is a piece of this label already
     */
    public int piece(String label, TrueState truth, @Nullable String defectKind) {
        if (!labels.add(label)) {
            throw new IllegalArgumentException("There are two pieces '" + label + "'");
        }
        if (defectKind != null) {
            kind(defectKind);
        }
        pieces.add(new Piece(label, truth, defectKind));
        return pieces.size() - 1;
    }

    /**
     * Adds an appraiser and answers his place.
     *
     * @throws IllegalArgumentException when there is an appraiser of this code already
     */
    public int appraiser(String code) {
        int place = appraisers.size();
        if (appraisers.putIfAbsent(code, place) != null) {
            throw new IllegalArgumentException("There are two appraisers '" + code + "'");
        }
        return place;
    }

    /** The place of a defect kind, new or known. */
    public int kind(String name) {
        Integer known = kinds.putIfAbsent(name, kinds.size());
        return known == null ? kinds.size() - 1 : known;
    }

    /** Adds a call; {@code seenKind} is the defect kind that was named, if any. */
    public StudyBuilder call(int piece, int appraiser, int trial, Call call, @Nullable String seenKind) {
        return call(piece, appraiser, trial, call, seenKind == null ? Study.NO_KIND : kind(seenKind));
    }

    /**
     * Adds a call.
     *
     * @param piece place of the piece
     * @param appraiser place of the appraiser
     * @param trial number of the trial, from 1
     * @param call the call
     * @param seenKind place of the defect kind that was named, {@link Study#NO_KIND} when none was
     * @throws IllegalArgumentException when a place is not taken or the trial is below 1
     */
    public StudyBuilder call(int piece, int appraiser, int trial, Call call, int seenKind) {
        if (piece < 0 || piece >= pieces.size()) {
            throw new IllegalArgumentException("There is no piece at place " + piece);
        }
        if (appraiser < 0 || appraiser >= appraisers.size()) {
            throw new IllegalArgumentException("There is no appraiser at place " + appraiser);
        }
        if (seenKind < Study.NO_KIND || seenKind >= kinds.size()) {
            throw new IllegalArgumentException("There is no defect kind at place " + seenKind);
        }
        if (trial < 1) {
            throw new IllegalArgumentException("Trials are numbered from 1, not " + trial);
        }
        makeRoom();
        this.piece[calls] = piece;
        this.appraiser[calls] = appraiser;
        this.trial[calls] = trial;
        this.seen[calls] = seenKind;
        this.reject[calls] = (byte) (call == Call.REJECT ? 1 : 0);
        anySeen |= seenKind != Study.NO_KIND;
        calls++;
        return this;
    }

    /**
     * The study.
     *
     * @throws IllegalArgumentException when a piece was called twice by one appraiser in one trial
     */
    public Study build() {
        return new Study(this);
    }

    private void makeRoom() {
        if (calls == piece.length) {
            int room = calls + calls / 2;
            piece = Arrays.copyOf(piece, room);
            appraiser = Arrays.copyOf(appraiser, room);
            trial = Arrays.copyOf(trial, room);
            seen = Arrays.copyOf(seen, room);
            reject = Arrays.copyOf(reject, room);
        }
    }
}
