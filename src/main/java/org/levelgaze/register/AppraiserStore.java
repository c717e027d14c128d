package org.levelgaze.register;

import java.util.List;
import java.util.Optional;
import org.springframework.data.repository.Repository;

/** Stored appraisers. */
interface AppraiserStore extends Repository<AppraiserEntity, Long> {

    AppraiserEntity save(AppraiserEntity appraiser);

    Optional<AppraiserEntity> findBySiteIdAndCode(int siteId, String code);

    Optional<AppraiserEntity> findBySiteIdAndId(int siteId, long id);

    List<AppraiserEntity> findBySiteIdAndName(int siteId, String name);

    List<AppraiserEntity> findBySiteIdOrderByCode(int siteId);
}
