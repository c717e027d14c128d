package org.levelgaze.demo;

import static org.assertj.core.api.Assertions.assertThat;

import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.List;
import javax.sql.DataSource;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.levelgaze.register.Appraisers;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.Figure;
import org.levelgaze.studies.Studies;
import org.levelgaze.studies.StudyFilter;
import org.levelgaze.studies.StudyHead;
import org.levelgaze.studies.StudyVerification;
import org.levelgaze.testing.SharedPostgres;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.transaction.annotation.Transactional;

@SpringBootTest
@WithDatabase
@Transactional
class DemoPlantTest {

    private static final SiteId SITE = new SiteId(2);

    @Autowired
    DemoPlant plant;

    @Autowired
    Studies studies;

    @Autowired
    Appraisers appraisers;

    @Autowired
    StudyVerification verification;

    @Autowired
    DataSource database;

    /** A site of its own, so that what other tests entered is not in the way. */
    @BeforeEach
    void aSecondSite() throws SQLException {
        try (Connection pooled = database.getConnection();
                Connection owner = SharedPostgres.owner(pooled.getMetaData().getURL());
                Statement statement = owner.createStatement()) {
            statement.execute(
                    "insert into site (site_id, code, name) values (2, 'KILN', 'Kiln hall') on conflict do nothing");
        }
    }

    @Test
    void isMadeOnlyWhereThereIsNoPlantYet() {
        assertThat(plant.make(SITE)).isTrue();
        assertThat(plant.make(SITE)).as("a second time").isFalse();
    }

    @Test
    void showsADozenConcludedStudiesThatFollowFromTheirCalls() {
        plant.make(SITE);
        List<StudyHead> made = studies.page(SITE, StudyFilter.ALL, 0, 100);

        assertThat(made).hasSize(12).allMatch(StudyHead::concluded);
        assertThat(verification.verify(SITE).differences()).isEmpty();
        long bram = appraisers.byCode(SITE, "BRAM").orElseThrow().id();
        List<Figure> figures = studies.figures(SITE, bram, null);
        assertThat(figures.get(figures.size() - 1).falseAccept().k())
                .as("Bram lets more through at the end than at the beginning")
                .isGreaterThan(figures.get(0).falseAccept().k());
    }
}
