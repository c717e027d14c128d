package org.levelgaze.register;

import java.time.Instant;

/**
 * What a camera judges with from an instant on: recipe, firmware, optics, lighting. Never edited.
 *
 * @param number 1, 2, 3, … in the order of entry
 * @param label unique for the camera
 * @param changedAt when it took effect
 * @param note what changed, free text
 */
public record CameraConfiguration(int number, String label, Instant changedAt, String note) {}
