package counterexamples.storage;

import jakarta.persistence.Entity;
import jakarta.persistence.Id;

/** An entity that every module could load. */
@Entity
public class PublicEntity {

    @Id
    long id;
}
