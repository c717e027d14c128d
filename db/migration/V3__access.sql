-- Accounts of people. A login name is unique in the whole installation, whatever its letters' case: a person types no site.
create table account (
    site_id int not null references site,
    account_id bigint not null generated always as identity (sequence name account_id),
    login_name text not null check (login_name <> ''),
    login_key text not null unique,
    display_name text not null check (display_name <> ''),
    password_hash text not null,
    credentials int not null default 1,
    roles text[] not null check (roles <@ array[
        'administrator', 'quality-engineer', 'holder-of-the-standard', 'proctor', 'appraiser', 'auditor']),
    language text not null check (language ~ '^[a-z]{2,3}(-[A-Za-z0-9]{2,8})*$'),
    active boolean not null default true,
    created_at timestamptz not null,
    primary key (site_id, account_id)
);
comment on column account.login_key is 'the login name in one case and one form of its letters (NFKC)';
comment on column account.credentials is 'counts the passwords; a session opened with an earlier one is over';
grant select, insert on account to ${appRole};
grant update (password_hash, credentials, roles, language, active) on account to ${appRole};

-- Tokens of programs. What is kept is a digest: the token itself is shown once.
create table token (
    site_id int not null references site,
    token_id bigint not null generated always as identity (sequence name token_id),
    label text not null check (label <> ''),
    digest bytea not null unique check (octet_length(digest) = 32),
    scopes text[] not null check (
        cardinality(scopes) > 0 and scopes <@ array['read', 'write', 'key:read', 'interlock', 'admin']),
    created_at timestamptz not null,
    last_used_on date,
    revoked_at timestamptz,
    primary key (site_id, token_id)
);
grant select, insert on token to ${appRole};
grant update (last_used_on, revoked_at) on token to ${appRole};

-- Failed sign-ins, by account and address and by address. The subject is a digest: what was typed may be a password.
create table sign_in_failure (
    site_id int not null references site,
    subject bytea not null check (octet_length(subject) = 32),
    failures int not null check (failures >= 1),
    failed_at timestamptz not null,
    wait_until timestamptz not null,
    primary key (site_id, subject)
);
create index sign_in_failure_age on sign_in_failure (failed_at);
grant select, insert, update, delete on sign_in_failure to ${appRole};

-- The first answer to a request with an Idempotency-Key, stored in the transaction of its effect.
create table first_answer (
    site_id int not null references site,
    token_id bigint not null,
    idempotency_key text not null,
    request_digest bytea,
    status int,
    headers text,
    body bytea,
    answered_at timestamptz not null,
    primary key (site_id, token_id, idempotency_key),
    foreign key (site_id, token_id) references token
);
create index first_answer_age on first_answer (answered_at);
comment on column first_answer.status is 'null only while the request is being worked on, in its transaction';
grant select, insert, update, delete on first_answer to ${appRole};

-- Browser sessions: the tables of Spring Session JDBC 4.1.0, as its schema-postgresql.sql has them.
create table spring_session (
    primary_id char(36) not null,
    session_id char(36) not null,
    creation_time bigint not null,
    last_access_time bigint not null,
    max_inactive_interval int not null,
    expiry_time bigint not null,
    principal_name varchar(100),
    constraint spring_session_pk primary key (primary_id)
);
create unique index spring_session_ix1 on spring_session (session_id);
create index spring_session_ix2 on spring_session (expiry_time);
create index spring_session_ix3 on spring_session (principal_name);

create table spring_session_attributes (
    session_primary_id char(36) not null,
    attribute_name varchar(200) not null,
    attribute_bytes bytea not null,
    constraint spring_session_attributes_pk primary key (session_primary_id, attribute_name),
    constraint spring_session_attributes_fk foreign key (session_primary_id)
        references spring_session (primary_id) on delete cascade
);
grant select, insert, update, delete on spring_session, spring_session_attributes to ${appRole};
