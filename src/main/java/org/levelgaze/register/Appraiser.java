package org.levelgaze.register;

import java.util.List;
import java.util.Optional;
import org.levelgaze.shared.SiteId;

/**
 * Who judges: a person or a camera.
 *
 * @param site where
 * @param id its number
 * @param code the site's own code
 * @param name its name on screen
 * @param kind person or camera
 * @param configurations a camera's configurations in the order in which they took effect; none for a person
 */
public record Appraiser(
        SiteId site, long id, String code, String name, AppraiserKind kind, List<CameraConfiguration> configurations) {

    /** Keeps its own copy of the configurations. */
    public Appraiser {
        configurations = List.copyOf(configurations);
    }

    /** The configuration with this label, if the camera has it. */
    public Optional<CameraConfiguration> configuration(String label) {
        return configurations.stream()
                .filter(configuration -> configuration.label().equals(label))
                .findFirst();
    }
}
