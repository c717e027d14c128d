package org.levelgaze.sets;

import org.levelgaze.shared.SiteId;

/**
 * The pieces that appraisers are tried on.
 *
 * @param site where
 * @param id its number
 * @param code the site's own code
 * @param taskId the task it belongs to
 */
public record ReferenceSet(SiteId site, long id, String code, long taskId) {}
