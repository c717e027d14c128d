package org.levelgaze.sets;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.time.LocalDate;
import java.util.HashSet;
import java.util.HexFormat;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.Refusal;

/**
 * A set about to be entered, with its first edition.
 *
 * @param code the site's own code, not used yet
 * @param decidedOn the day on which the true states were decided
 * @param decidedBy who decided them; empty when not said
 * @param validUntil the last day in date; null: {@value #DEFAULT_MONTHS} months after the decision
 * @param basis what the true states rest on
 * @param pieces at least one, each label once
 */
public record NewSet(
        String code,
        LocalDate decidedOn,
        String decidedBy,
        @Nullable LocalDate validUntil,
        Basis basis,
        List<NewPiece> pieces) {

    /** How long a set is in date when nobody said (common practice, no source). */
    public static final int DEFAULT_MONTHS = 12;

    /** Refuses a set without pieces, a label used twice, and an end before the beginning. */
    public NewSet {
        pieces = List.copyOf(pieces);
        if (pieces.isEmpty()) {
            throw new Refusal(Refusal.Kind.INVALID, "set-without-pieces", code);
        }
        Set<String> labels = new HashSet<>();
        for (NewPiece piece : pieces) {
            if (!labels.add(piece.label())) {
                throw new Refusal(Refusal.Kind.INVALID, "piece-twice", piece.label(), code);
            }
        }
        if (validUntil != null && validUntil.isBefore(decidedOn)) {
            throw new Refusal(
                    Refusal.Kind.INVALID,
                    "set-ends-before-it-begins",
                    code,
                    decidedOn.toString(),
                    validUntil.toString());
        }
    }

    /** What the journal's digest is taken over: everything, the pieces by a digest of theirs, since there may be a million. */
    String summary() {
        MessageDigest digest = sha256();
        for (NewPiece piece : pieces) {
            digest.update(piece.toString().getBytes(StandardCharsets.UTF_8));
        }
        return "NewSet[code=" + code + ", decidedOn=" + decidedOn + ", decidedBy=" + decidedBy + ", validUntil="
                + validUntil + ", basis=" + basis + ", pieces=" + pieces.size() + ":"
                + HexFormat.of().formatHex(digest.digest()) + "]";
    }

    private static MessageDigest sha256() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("Every Java platform has SHA-256", e);
        }
    }

    LocalDate lastDay() {
        return validUntil == null ? decidedOn.plusMonths(DEFAULT_MONTHS) : validUntil;
    }
}
