package counterexamples.studies.reading;

import org.springframework.stereotype.Component;

/** Is a bean. */
@Component
class KnowsAFramework {}
