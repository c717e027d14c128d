package org.levelgaze.register;

import java.util.List;
import java.util.Optional;
import org.springframework.data.repository.Repository;

/** Stored tasks. */
interface TaskStore extends Repository<TaskEntity, Long> {

    TaskEntity save(TaskEntity task);

    Optional<TaskEntity> findBySiteIdAndCode(int siteId, String code);

    Optional<TaskEntity> findBySiteIdAndId(int siteId, long id);

    List<TaskEntity> findBySiteIdOrderByCode(int siteId);
}
