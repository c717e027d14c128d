-- Tasks with their defect kinds; appraisers: people, and cameras with their configurations.

create sequence task_seq;
create table task (
    site_id int not null references site,
    task_id bigint not null,
    code text not null check (code <> '' and length(code) <= 100 and code !~ '[[:cntrl:]]'),
    name text not null check (length(name) between 1 and 200 and name !~ '[[:cntrl:]]'),
    created_at timestamptz not null,
    primary key (site_id, task_id),
    unique (site_id, code)
);

create table defect_kind (
    site_id int not null,
    task_id bigint not null,
    position int not null check (position >= 0),
    code text not null check (code <> '' and length(code) <= 100 and code !~ '[[:cntrl:]]'),
    name text not null check (length(name) between 1 and 200 and name !~ '[[:cntrl:]]'),
    severity text check (severity in ('critical', 'major', 'minor')),
    primary key (site_id, task_id, code),
    unique (site_id, task_id, position),
    foreign key (site_id, task_id) references task
);
comment on column defect_kind.severity is 'null: not rated yet, as when an import brought the kind';

create sequence appraiser_seq;
create table appraiser (
    site_id int not null references site,
    appraiser_id bigint not null,
    code text not null check (code <> '' and length(code) <= 100 and code !~ '[[:cntrl:]]'),
    name text not null check (length(name) between 1 and 200 and name !~ '[[:cntrl:]]'),
    kind text not null check (kind in ('person', 'camera')),
    created_at timestamptz not null,
    primary key (site_id, appraiser_id),
    unique (site_id, code),
    unique (site_id, appraiser_id, kind)
);

-- What a camera judges with; numbered, dated, never edited. The constant column keeps people out.
create table camera_configuration (
    site_id int not null,
    appraiser_id bigint not null,
    configuration_no int not null check (configuration_no >= 1),
    kind text not null default 'camera' check (kind = 'camera'),
    label text not null check (label <> '' and length(label) <= 200 and label !~ '[[:cntrl:]]'),
    changed_at timestamptz not null,
    note text not null default '' check (length(note) <= 2000),
    recorded_at timestamptz not null,
    primary key (site_id, appraiser_id, configuration_no),
    unique (site_id, appraiser_id, label),
    foreign key (site_id, appraiser_id, kind) references appraiser (site_id, appraiser_id, kind)
);

grant select, insert on task, defect_kind, appraiser, camera_configuration to ${appRole};
grant usage on task_seq, appraiser_seq to ${appRole};
