package org.levelgaze.studies;

import java.sql.Array;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.Call;
import org.levelgaze.agreement.Study;
import org.levelgaze.agreement.StudyBuilder;
import org.levelgaze.shared.SiteId;
import org.springframework.jdbc.core.RowCallbackHandler;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;

/** Reads the calls of a study for the engine: one aggregating query, one row per appraiser and trial. */
@Repository
class StoredCalls {

    /** The piece numbers come along only where a pass left pieces out, the kinds only where any was named. */
    private static final String PASSES = """
            select appraiser_no, trial,
                   string_agg(case when accepted then 'A' else 'R' end, '' order by piece_no) as calls,
                   case when count(*) = :pieces then null else array_agg(piece_no order by piece_no) end as pieces,
                   case when count(kind_no) = 0 then null
                        else array_agg(coalesce(kind_no, -1) order by piece_no) end as kinds
              from study_call
             where site_id = :site and study_id = :study
             group by appraiser_no, trial
             order by appraiser_no, trial
            """;

    private static final int LEFT_OUT = -1;

    private final JdbcClient jdbc;

    StoredCalls(JdbcClient jdbc) {
        this.jdbc = jdbc;
    }

    /** Takes one stored call after the other: piece, appraiser and kind are the study's own numbers. */
    @FunctionalInterface
    interface Visitor {

        void call(int piece, int appraiser, int trial, boolean accepted, int kind);
    }

    /** Shows every stored call, grey pieces included. */
    void forEach(StudyHead study, Visitor visitor) {
        RowCallbackHandler eachPass = row -> visit(row, visitor);
        jdbc.sql(PASSES)
                .param("pieces", study.pieces())
                .param("site", study.site().value())
                .param("study", study.id())
                .query(eachPass);
    }

    /** How many calls are stored. */
    long count(StudyHead study) {
        return jdbc.sql("select count(*) from study_call where site_id = :site and study_id = :study")
                .param("site", study.site().value())
                .param("study", study.id())
                .query(Long.class)
                .single();
    }

    /** The words with which defects were named, in the order of their numbers. */
    List<String> seenKinds(SiteId site, long study) {
        return jdbc.sql("""
                select word from study_seen_kind where site_id = :site and study_id = :study order by kind_no""")
                .param("site", site.value())
                .param("study", study)
                .query(String.class)
                .list();
    }

    /** The study as the engine takes it: pieces with the true states given, grey ones left out. */
    Study read(StudyHead study, List<StudyPiece> pieces, List<String> appraisers) {
        StudyBuilder builder = Study.builder((int) study.calls());
        int[] places = addPieces(builder, pieces);
        appraisers.forEach(builder::appraiser);
        int[] kinds = seenKinds(study.site(), study.id()).stream()
                .mapToInt(builder::kind)
                .toArray();
        forEach(study, (piece, appraiser, trial, accepted, kind) -> {
            if (places[piece] != LEFT_OUT) {
                Call call = accepted ? Call.ACCEPT : Call.REJECT;
                builder.call(places[piece], appraiser, trial, call, kind < 0 ? Study.NO_KIND : kinds[kind]);
            }
        });
        return builder.build();
    }

    /** Adds the pieces that are scored; answers each one's place with the engine. */
    static int[] addPieces(StudyBuilder builder, List<StudyPiece> pieces) {
        int[] places = new int[pieces.size()];
        Arrays.fill(places, LEFT_OUT);
        for (int i = 0; i < places.length; i++) {
            StudyPiece piece = pieces.get(i);
            org.levelgaze.agreement.TrueState truth = piece.scoredAs();
            if (truth != null) {
                places[i] = builder.piece(piece.label(), truth, piece.defectKind());
            }
        }
        return places;
    }

    private static void visit(ResultSet row, Visitor visitor) throws SQLException {
        int appraiser = row.getInt("appraiser_no");
        int trial = row.getInt("trial");
        String calls = row.getString("calls");
        Integer[] pieces = integers(row.getArray("pieces"));
        Integer[] kinds = integers(row.getArray("kinds"));
        for (int i = 0; i < calls.length(); i++) {
            int piece = pieces == null ? i : pieces[i];
            visitor.call(piece, appraiser, trial, calls.charAt(i) == 'A', kinds == null ? -1 : kinds[i]);
        }
    }

    private static Integer @Nullable [] integers(@Nullable Array array) throws SQLException {
        return array == null ? null : (Integer[]) array.getArray();
    }
}
