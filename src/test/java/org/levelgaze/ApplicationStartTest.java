package org.levelgaze;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.levelgaze.shared.SiteId;
import org.levelgaze.shared.Sites;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;

@SpringBootTest
@WithDatabase
class ApplicationStartTest {

    @Autowired
    Sites sites;

    @Test
    void oneSiteExistsFromTheStart() {
        assertThat(sites.get(SiteId.MAIN).code()).isEqualTo("MAIN");
    }
}
