package org.levelgaze.studies.pages;

import java.io.IOException;
import java.io.OutputStream;
import java.io.UncheckedIOException;
import java.util.List;
import org.dhatim.fastexcel.Workbook;
import org.dhatim.fastexcel.Worksheet;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.AppraiserFindings;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.Interval;
import org.levelgaze.agreement.Share;
import org.levelgaze.studies.SafeCell;
import org.levelgaze.studies.Studies;
import org.levelgaze.studies.StudyHead;
import org.springframework.stereotype.Component;

/** Writes a study as a spreadsheet of values: one sheet of findings per appraiser, one of calls. It holds no formula. */
@Component
class StudyWorkbook {

    private static final List<String> FINDINGS_HEAD =
            List.of("appraiser", "figure", "k", "n", "value", "lower", "upper");

    /** A sheet takes 1,048,576 rows (ECMA-376); the calls go on in a further sheet. */
    private static final int MOST_ROWS = 1_000_000;

    private static final int ROWS_AT_ONCE = 1_000;

    private final CallLines lines;
    private final Studies studies;

    StudyWorkbook(CallLines lines, Studies studies) {
        this.lines = lines;
        this.studies = studies;
    }

    void write(StudyHead study, OutputStream out) throws IOException {
        try (Workbook book = new Workbook(out, "Levelgaze", "1.0")) {
            findings(book.newWorksheet("findings"), studies.findings(study).orElse(null));
            CallSheets calls = new CallSheets(book);
            lines.forEach(study, calls::add);
        } catch (UncheckedIOException e) {
            throw e.getCause();
        }
    }

    private static void findings(Worksheet sheet, @Nullable Findings findings) throws IOException {
        Rows rows = new Rows(sheet);
        rows.texts(FINDINGS_HEAD);
        if (findings != null) {
            findings.appraisers().forEach(found -> appraiser(rows, found));
        }
        sheet.close();
    }

    private static void appraiser(Rows rows, AppraiserFindings found) {
        String who = SafeCell.of(found.appraiser());
        rows.share(who, "effectiveness.byPiece", found.effectiveness().byPiece());
        rows.share(who, "effectiveness.byCall", found.effectiveness().byCall());
        rows.share(who, "falseAccept", found.falseAccept());
        rows.share(who, "falseReject", found.falseReject());
        var self = found.selfConsistency();
        if (self != null) {
            rows.share(who, "selfConsistency.samePiece", self.samePiece());
        }
        rows.number(
                who,
                "biasRatio.ofRates",
                found.biasRatio().ofRates(),
                found.biasRatio().interval());
        var kappa = found.kappaToReference();
        rows.number(who, "kappaToReference", kappa.kappa(), kappa.interval());
        var signal = found.signalDetection();
        rows.number(who, "dPrime", signal.dPrime(), signal.dPrimeInterval());
        rows.number(who, "criterionC", signal.criterionC(), signal.criterionCInterval());
    }

    /** The rows of one sheet, from the top. */
    private static final class Rows {

        private final Worksheet sheet;
        private int next;

        Rows(Worksheet sheet) {
            this.sheet = sheet;
        }

        void texts(List<String> cells) {
            for (int column = 0; column < cells.size(); column++) {
                sheet.value(next, column, cells.get(column));
            }
            next++;
        }

        void share(String who, String figure, Share share) {
            sheet.value(next, 2, share.k());
            sheet.value(next, 3, share.n());
            number(who, figure, share.value(), share.clopperPearson());
        }

        /** What is undefined stays empty. */
        void number(String who, String figure, @Nullable Double value, @Nullable Interval interval) {
            sheet.value(next, 0, who);
            sheet.value(next, 1, figure);
            if (value != null) {
                sheet.value(next, 4, value);
            }
            if (interval != null) {
                sheet.value(next, 5, interval.lower());
                if (!Double.isInfinite(interval.upper())) {
                    sheet.value(next, 6, interval.upper());
                }
            }
            next++;
        }
    }

    /** Calls, a head on every sheet, written out as they come. */
    private static final class CallSheets {

        private final Workbook book;
        private List<String> head = List.of();
        private @Nullable Worksheet sheet;
        private int row;
        private int sheets;

        CallSheets(Workbook book) {
            this.book = book;
        }

        void add(List<String> line) {
            if (head.isEmpty()) {
                head = line;
                return;
            }
            Worksheet open = sheet == null || row > MOST_ROWS ? start() : sheet;
            put(open, line);
            if (row % ROWS_AT_ONCE == 0) {
                flush(open);
            }
        }

        private Worksheet start() {
            if (sheet != null) {
                close(sheet);
            }
            sheets++;
            Worksheet fresh = book.newWorksheet(sheets == 1 ? "calls" : "calls " + sheets);
            row = 0;
            put(fresh, head);
            sheet = fresh;
            return fresh;
        }

        private void put(Worksheet open, List<String> cells) {
            for (int column = 0; column < cells.size(); column++) {
                open.value(row, column, cells.get(column));
            }
            row++;
        }

        private static void flush(Worksheet open) {
            try {
                open.flush();
            } catch (IOException e) {
                throw new UncheckedIOException(e);
            }
        }

        private static void close(Worksheet open) {
            try {
                open.close();
            } catch (IOException e) {
                throw new UncheckedIOException(e);
            }
        }
    }
}
