package org.levelgaze.database;

import org.jspecify.annotations.Nullable;

/**
 * Who signs in to PostgreSQL.
 *
 * @param user the role's name
 * @param password its password; null when the server or the address asks for none
 */
record Login(@Nullable String user, @Nullable String password) {

    @Override
    public String toString() {
        return "Login[" + user + "]";
    }
}
