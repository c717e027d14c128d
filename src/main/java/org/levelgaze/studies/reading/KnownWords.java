package org.levelgaze.studies.reading;

import java.util.Set;

/** Words of the trade, in plain form, whose meaning may be guessed. 1 and 0 are not among them: plants use them both ways. */
final class KnownWords {

    static final Set<String> ACCEPT = Set.of(
            "accept",
            "accepted",
            "pass",
            "passed",
            "ok",
            "good",
            "conforming",
            "gut",
            "io",
            "i.o.",
            "i.o",
            "i. o.",
            "in ordnung",
            "gutteil",
            "angenommen",
            "annehmen",
            "fehlerfrei");

    static final Set<String> REJECT = Set.of(
            "reject",
            "rejected",
            "fail",
            "failed",
            "nok",
            "n.ok",
            "not ok",
            "bad",
            "defective",
            "nonconforming",
            "non-conforming",
            "schlecht",
            "nio",
            "n.i.o.",
            "n.i.o",
            "n. i. o.",
            "nicht in ordnung",
            "nicht ok",
            "schlechtteil",
            "abgelehnt",
            "ablehnen",
            "zurückgewiesen",
            "fehlerhaft",
            "defekt",
            "ausschuss");

    static final Set<String> PIECE = Set.of(
            "piece",
            "part",
            "sample",
            "item",
            "specimen",
            "unit",
            "label",
            "piece id",
            "part id",
            "stück",
            "stueck",
            "teil",
            "teilenummer",
            "teil-nr.",
            "teil nr.",
            "muster",
            "prüfling",
            "pruefling");

    static final Set<String> REFERENCE = Set.of(
            "reference",
            "ref",
            "truth",
            "true state",
            "true_state",
            "truestate",
            "standard",
            "expected",
            "key",
            "referenz",
            "soll",
            "wahrer zustand",
            "zustand",
            "wahrheit");

    static final Set<String> APPRAISER = Set.of(
            "appraiser",
            "inspector",
            "operator",
            "judge",
            "person",
            "camera",
            "who",
            "prüfer",
            "pruefer",
            "prüferin",
            "bediener",
            "person/kamera",
            "kamera");

    static final Set<String> TRIAL = Set.of(
            "trial", "run", "round", "pass", "repeat", "repetition", "durchgang", "runde", "wiederholung", "lauf");

    static final Set<String> CALL = Set.of(
            "call",
            "result",
            "judgement",
            "judgment",
            "decision",
            "assessment",
            "urteil",
            "ergebnis",
            "entscheidung",
            "entscheid",
            "bewertung",
            "befund");

    static final Set<String> DEFECT = Set.of(
            "defect", "defect kind", "defect_kind", "true defect", "kind", "fehler", "fehlerart", "wahrer fehler");

    static final Set<String> SEEN =
            Set.of("seen", "seen kind", "kind seen", "defect seen", "named", "gesehen", "genannt", "erkannter fehler");

    private KnownWords() {}
}
