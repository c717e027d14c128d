package org.levelgaze.access;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.Arrays;
import java.util.Locale;
import java.util.stream.Collectors;
import org.levelgaze.shared.SiteId;

/**
 * A stored account with what proves that it is this person; it leaves this package in no form.
 *
 * @param account the account
 * @param hash of its password
 */
record AccountRow(Account account, String hash) {

    static final String COLUMNS =
            " site_id, account_id, login_name, display_name, password_hash, roles, language, active, credentials ";
    static final String SELECT = "select" + COLUMNS + "from account ";

    static AccountRow read(ResultSet row, int number) throws SQLException {
        return new AccountRow(readAccount(row, number), row.getString("password_hash"));
    }

    static Account readAccount(ResultSet row, int number) throws SQLException {
        String[] roles = (String[]) row.getArray("roles").getArray();
        return new Account(
                new SiteId(row.getInt("site_id")),
                row.getLong("account_id"),
                row.getString("login_name"),
                row.getString("display_name"),
                Arrays.stream(roles).map(Role::of).collect(Collectors.toSet()),
                Locale.forLanguageTag(row.getString("language")),
                row.getBoolean("active"),
                row.getInt("credentials"));
    }

    /** Never shows the hash. */
    @Override
    public String toString() {
        return "AccountRow[" + account.subject() + "]";
    }
}
