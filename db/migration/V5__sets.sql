-- Reference sets. An edition freezes membership and true states; a later edition stands beside it, never over it.

create sequence reference_set_seq;
create table reference_set (
    site_id int not null references site,
    set_id bigint not null,
    task_id bigint not null,
    code text not null check (code <> '' and length(code) <= 100 and code !~ '[[:cntrl:]]'),
    origin text not null check (origin in ('registered', 'import')),
    created_at timestamptz not null,
    primary key (site_id, set_id),
    unique (site_id, code),
    unique (site_id, set_id, task_id),
    foreign key (site_id, task_id) references task
);

create sequence piece_seq;
create table piece (
    site_id int not null,
    set_id bigint not null,
    piece_id bigint not null,
    label text not null check (label <> '' and length(label) <= 200 and label !~ '[[:cntrl:]]'),
    primary key (site_id, piece_id),
    unique (site_id, set_id, label),
    unique (site_id, set_id, piece_id),
    foreign key (site_id, set_id) references reference_set
);

create table edition (
    site_id int not null,
    set_id bigint not null,
    edition_no int not null check (edition_no >= 1),
    decided_on date not null,
    decided_by text not null check (length(decided_by) <= 200),
    valid_until date not null,
    basis text not null check (basis in ('decision', 'import')),
    recorded_at timestamptz not null,
    recorded_by text not null,
    primary key (site_id, set_id, edition_no),
    check (valid_until >= decided_on),
    foreign key (site_id, set_id) references reference_set
);
comment on column edition.basis is 'import: true states taken from a file of calls, not adjudicated';

create table edition_piece (
    site_id int not null,
    set_id bigint not null,
    edition_no int not null,
    position int not null check (position >= 0),
    piece_id bigint not null,
    task_id bigint not null,
    true_state text not null check (true_state in ('good', 'defective', 'grey')),
    defect_kind text,
    zone text check (zone in ('clear good', 'borderline', 'clear defective')),
    primary key (site_id, set_id, edition_no, piece_id),
    unique (site_id, set_id, edition_no, position),
    check (defect_kind is null or true_state <> 'good'),
    foreign key (site_id, set_id, edition_no) references edition,
    foreign key (site_id, set_id, piece_id) references piece (site_id, set_id, piece_id),
    foreign key (site_id, set_id, task_id) references reference_set (site_id, set_id, task_id),
    foreign key (site_id, task_id, defect_kind) references defect_kind
);

-- Whoever saw true states piece by piece has seen the answer key: once per person and edition.
create table answer_key_reading (
    site_id int not null,
    set_id bigint not null,
    edition_no int not null,
    who text not null,
    first_read_at timestamptz not null,
    on_page text not null,
    primary key (site_id, set_id, edition_no, who),
    foreign key (site_id, set_id, edition_no) references edition
);

grant select, insert on reference_set, piece, edition, edition_piece, answer_key_reading to ${appRole};
grant usage on reference_set_seq, piece_seq to ${appRole};
