package org.levelgaze.studies;

import java.util.List;
import java.util.stream.Stream;
import org.levelgaze.shared.SiteId;
import org.levelgaze.shared.TodayLine;
import org.levelgaze.shared.TodaySource;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;

/** What of the studies needs a hand: one's own imports that wait for a decision, and studies without a conclusion; in an empty installation, the first file. */
@Component
class StudiesToday implements TodaySource {

    /** More lines of one kind than this nobody reads. */
    private static final int MOST = 20;

    /** Where somebody begins who has nothing yet. */
    private static final TodayLine FIRST =
            new TodayLine("studies.today.first", List.of(), "studies.today.first.button", "/studies/import");

    private final JdbcClient jdbc;

    StudiesToday(JdbcClient jdbc) {
        this.jdbc = jdbc;
    }

    @Override
    public List<TodayLine> lines(SiteId site, String who) {
        List<TodayLine> lines =
                Stream.concat(imports(site, who).stream(), open(site).stream()).toList();
        return lines.isEmpty() && !anyStudy(site) ? List.of(FIRST) : lines;
    }

    private boolean anyStudy(SiteId site) {
        return jdbc.sql("select exists (select from study where site_id = ?)")
                .param(site.value())
                .query(Boolean.class)
                .single();
    }

    private List<TodayLine> imports(SiteId site, String who) {
        return jdbc.sql("""
                        select upload_id, file_name
                          from upload
                         where site_id = :site and owner = :who and state in ('waiting', 'refused', 'broken')
                         order by uploaded_at
                         limit :most""")
                .param("site", site.value())
                .param("who", who)
                .param("most", MOST)
                .query((row, number) -> new TodayLine(
                        "studies.today.import",
                        List.of(row.getString("file_name")),
                        "studies.today.import.button",
                        "/studies/import/" + row.getString("upload_id")))
                .list();
    }

    private List<TodayLine> open(SiteId site) {
        return jdbc.sql("""
                        select s.study_id, s.file_name
                          from study s
                          left join study_conclusion c using (site_id, study_id)
                         where s.site_id = :site and c.study_id is null
                         order by s.performed_on, s.study_id
                         limit :most""")
                .param("site", site.value())
                .param("most", MOST)
                .query((row, number) -> new TodayLine(
                        "studies.today.open",
                        List.of(row.getString("study_id"), row.getString("file_name")),
                        "studies.today.open.button",
                        "/studies/" + row.getString("study_id")))
                .list();
    }
}
