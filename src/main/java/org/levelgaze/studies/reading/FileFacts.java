package org.levelgaze.studies.reading;

/** What is known of a file once it is read. */
record FileFacts(long rows, long emptyCalls, long bytes, String sha256) {}
