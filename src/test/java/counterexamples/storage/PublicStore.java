package counterexamples.storage;

import org.springframework.data.repository.Repository;

/** A repository that every module could ask. */
public interface PublicStore extends Repository<PublicEntity, Long> {}
