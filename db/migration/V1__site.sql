-- The site is the leading column of every key that grows.
create table site (
    site_id int primary key check (site_id >= 1),
    code text not null unique check (code <> ''),
    name text not null,
    zone text,
    created_at timestamptz not null default clock_timestamp()
);
comment on column site.zone is 'IANA time zone; null: the program''s default zone';
insert into site (site_id, code, name) values (1, 'MAIN', 'Main site');
grant select, update (name, zone) on site to ${appRole};
