package org.levelgaze.shared;

import java.time.Clock;
import java.time.LocalDate;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import org.springframework.jdbc.core.RowMapper;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Service;

/** The sites of the installation. One, {@code MAIN}, exists from the start. */
@Service
public class Sites {

    private static final String SELECT = "select site_id, code, name, zone from site ";

    private final JdbcClient jdbc;
    private final Clock clock;

    Sites(JdbcClient jdbc, Clock clock) {
        this.jdbc = jdbc;
        this.clock = clock;
    }

    /** All sites in the order of their numbers. */
    public List<Site> all() {
        return jdbc.sql(SELECT + "order by site_id").query(sites()).list();
    }

    /** The site with this code, if there is one. */
    public Optional<Site> byCode(String code) {
        return jdbc.sql(SELECT + "where code = :code")
                .param("code", code)
                .query(sites())
                .optional();
    }

    /**
     * The site with this number.
     *
     * @throws IllegalArgumentException when there is none
     */
    public Site get(SiteId id) {
        return jdbc.sql(SELECT + "where site_id = :id")
                .param("id", id.value())
                .query(sites())
                .optional()
                .orElseThrow(() -> new IllegalArgumentException("No site has the number " + id.value()));
    }

    /** Today's date at the site. */
    public LocalDate today(SiteId id) {
        return LocalDate.now(clock.withZone(get(id).zone()));
    }

    /** A site without a zone of its own follows the program's, which the clock carries. */
    private RowMapper<Site> sites() {
        return (row, number) -> {
            String zone = row.getString("zone");
            return new Site(
                    new SiteId(row.getInt("site_id")),
                    row.getString("code"),
                    row.getString("name"),
                    zone == null ? clock.getZone() : ZoneId.of(zone));
        };
    }
}
