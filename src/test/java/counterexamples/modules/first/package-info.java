/** May use no other module, and does. */
@ApplicationModule(allowedDependencies = {})
@NullMarked
package counterexamples.modules.first;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
