-- The journal: one chain of entries per site. Whoever changes, removes or slips in an entry breaks every hash after it.
create table journal_entry (
    site_id int not null references site,
    seq bigint not null check (seq >= 1),
    at timestamptz not null,
    actor text not null check (actor <> ''),
    act text not null check (act <> ''),
    subject text not null check (subject <> ''),
    payload_digest bytea not null check (octet_length(payload_digest) = 32),
    previous_hash bytea not null check (octet_length(previous_hash) = 32),
    hash bytea not null check (octet_length(hash) = 32),
    primary key (site_id, seq)
);
comment on column journal_entry.hash is
    'sha256 over the previous hash and the texts of journal_part for site, number, time, actor, act, subject, payload digest';

-- One part of an entry as it is hashed: its length in bytes, a colon, the part, a comma. Lengths keep the parts apart.
create function journal_part(part text) returns text
    language sql immutable
    return octet_length(convert_to(part, 'UTF8'))::text || ':' || part || ',';

-- Puts an entry at the end of its site's chain. Number, time and hashes are set here, whatever was supplied. Writers of a
-- site pass one at a time until they commit, so an entry is best inserted last in its transaction.
create function journal_chain() returns trigger
    language plpgsql
    set search_path = ${flyway:defaultSchema}, pg_temp
as $$
declare
    last journal_entry;
begin
    perform pg_advisory_xact_lock(20270101, new.site_id);
    select * into last from journal_entry where site_id = new.site_id order by seq desc limit 1;
    new.seq := coalesce(last.seq, 0) + 1;
    new.at := clock_timestamp();
    new.previous_hash := coalesce(last.hash, decode(repeat('00', 32), 'hex'));
    new.hash := sha256(new.previous_hash || convert_to(
        journal_part(new.site_id::text)
        || journal_part(new.seq::text)
        || journal_part(to_char(new.at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"'))
        || journal_part(new.actor)
        || journal_part(new.act)
        || journal_part(new.subject)
        || journal_part(encode(new.payload_digest, 'hex')), 'UTF8'));
    return new;
end
$$;

create function journal_refuse() returns trigger
    language plpgsql
as $$
begin
    raise exception 'The journal is only added to: % is refused', lower(tg_op) using errcode = 'insufficient_privilege';
end
$$;

create trigger journal_chain before insert on journal_entry for each row execute function journal_chain();
create trigger journal_refuse_change before update or delete on journal_entry
    for each statement execute function journal_refuse();
create trigger journal_refuse_truncate before truncate on journal_entry
    for each statement execute function journal_refuse();
alter table journal_entry enable always trigger journal_chain;
alter table journal_entry enable always trigger journal_refuse_change;
alter table journal_entry enable always trigger journal_refuse_truncate;

revoke all on function journal_chain(), journal_refuse() from public;
grant select, insert (site_id, actor, act, subject, payload_digest) on journal_entry to ${appRole};
