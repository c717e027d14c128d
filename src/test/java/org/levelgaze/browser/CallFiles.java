package org.levelgaze.browser;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Objects;

/** Files of calls that people bring. */
final class CallFiles {

    private CallFiles() {}

    /** A file of the published values. */
    static String published(String name) {
        try (InputStream content =
                Objects.requireNonNull(CallFiles.class.getResourceAsStream("/reference/" + name), name)) {
            return new String(content.readAllBytes(), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** Ten pieces, half of them defective, two trials; who judges makes no mistake but on piece D1 in trial 2. */
    static String tenPieces(String appraiser) {
        StringBuilder file = new StringBuilder("piece,reference,appraiser,trial,call\n");
        for (int trial = 1; trial <= 2; trial++) {
            for (int piece = 1; piece <= 5; piece++) {
                String slip = piece == 1 && trial == 2 ? "accept" : "reject";
                file.append("D%d,defective,%s,%d,%s\n".formatted(piece, appraiser, trial, slip));
                file.append("G%d,good,%s,%d,accept\n".formatted(piece, appraiser, trial));
            }
        }
        return file.toString();
    }
}
