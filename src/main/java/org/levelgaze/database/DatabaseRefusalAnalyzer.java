package org.levelgaze.database;

import org.springframework.boot.diagnostics.AbstractFailureAnalyzer;
import org.springframework.boot.diagnostics.FailureAnalysis;

/** Lets the console say why the program does not start, instead of a stack trace. */
final class DatabaseRefusalAnalyzer extends AbstractFailureAnalyzer<DatabaseRefusal> {

    @Override
    protected FailureAnalysis analyze(Throwable failure, DatabaseRefusal refusal) {
        return new FailureAnalysis(refusal.getMessage(), refusal.wayOut(), refusal);
    }
}
