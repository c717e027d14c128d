-- Studies: who was tried on what, every call once, and the findings that follow from them.

create sequence study_seq;
create table study (
    site_id int not null references site,
    study_id bigint not null,
    task_id bigint not null,
    set_id bigint not null,
    edition_no int not null,
    performed_on date not null,
    file_name text not null check (length(file_name) <= 300),
    file_digest bytea not null check (length(file_digest) = 32),
    repeat_no int not null default 0 check (repeat_no >= 0),
    pieces int not null check (pieces >= 1),
    calls bigint not null check (calls >= 1),
    calls_missing bigint not null check (calls_missing >= 0),
    recorded_at timestamptz not null,
    recorded_by text not null,
    primary key (site_id, study_id),
    unique (site_id, task_id, set_id, performed_on, file_digest, repeat_no),
    foreign key (site_id, set_id, task_id) references reference_set (site_id, set_id, task_id),
    foreign key (site_id, set_id, edition_no) references edition
);
create index study_by_day on study (site_id, performed_on desc, study_id desc);
comment on column study.repeat_no is 'above 0: the same file was taken again on purpose';
comment on column study.calls_missing is 'calls that a complete study would hold and the file does not';

create table study_appraiser (
    site_id int not null,
    study_id bigint not null,
    appraiser_no smallint not null check (appraiser_no >= 0),
    appraiser_id bigint not null,
    configuration_no int,
    trials int not null check (trials >= 0),
    primary key (site_id, study_id, appraiser_no),
    unique (site_id, study_id, appraiser_id),
    foreign key (site_id, study_id) references study,
    foreign key (site_id, appraiser_id) references appraiser,
    foreign key (site_id, appraiser_id, configuration_no) references camera_configuration
);
create index study_appraiser_by_appraiser on study_appraiser (site_id, appraiser_id, study_id);
comment on column study_appraiser.configuration_no is 'the camera configuration that the study names; null: none named';

create table study_piece (
    site_id int not null,
    study_id bigint not null,
    piece_no int not null check (piece_no >= 0),
    piece_id bigint not null,
    primary key (site_id, study_id, piece_no),
    unique (site_id, piece_id, study_id),
    foreign key (site_id, study_id) references study,
    foreign key (site_id, piece_id) references piece
);
comment on table study_piece is 'of its two keys only the first begins with the study, so that a call''s piece is never sought by the other';

-- The words with which appraisers named what they saw; free, since a wrong name is a finding.
create table study_seen_kind (
    site_id int not null,
    study_id bigint not null,
    kind_no smallint not null check (kind_no >= 0),
    word text not null,
    primary key (site_id, study_id, kind_no),
    unique (site_id, study_id, word),
    foreign key (site_id, study_id) references study
);

create table study_call (
    study_id bigint not null,
    site_id int not null,
    piece_no int not null,
    trial int not null check (trial >= 1),
    appraiser_no smallint not null,
    kind_no smallint,
    accepted boolean not null,
    primary key (site_id, study_id, appraiser_no, piece_no, trial)
);

-- What three foreign keys would say, said once per statement instead of once per row: a million calls in one COPY are
-- checked in under a second instead of half a minute. Nothing may delete or change what is referred to.
create function study_call_belongs() returns trigger
    language plpgsql
    set search_path = ${flyway:defaultSchema}, pg_temp
as $$
declare
    stray boolean;
begin
    -- planned anew for each statement: a plan that was good for twenty pieces is kept otherwise, and takes minutes for many
    execute 'select exists (
        select from (select distinct site_id, study_id, appraiser_no from added) a
         where not exists (
               select from study_appraiser p
                where p.site_id = a.site_id and p.study_id = a.study_id and p.appraiser_no = a.appraiser_no))' into stray;
    if stray then
        raise foreign_key_violation using message = 'a call names an appraiser that its study does not have';
    end if;
    execute 'select exists (
        select from (select distinct site_id, study_id, piece_no from added) a
         where not exists (
               select from study_piece p
                where p.site_id = a.site_id and p.study_id = a.study_id and p.piece_no = a.piece_no))' into stray;
    if stray then
        raise foreign_key_violation using message = 'a call names a piece that its study does not have';
    end if;
    execute 'select exists (
        select from (select distinct site_id, study_id, kind_no from added where kind_no is not null) a
         where not exists (
               select from study_seen_kind p
                where p.site_id = a.site_id and p.study_id = a.study_id and p.kind_no = a.kind_no))' into stray;
    if stray then
        raise foreign_key_violation using message = 'a call names a defect kind that its study does not have';
    end if;
    return null;
end
$$;
create trigger belongs after insert on study_call
    referencing new table as added for each statement execute function study_call_belongs();
create trigger belongs_still after update on study_call
    referencing new table as added for each statement execute function study_call_belongs();

create table study_conclusion (
    site_id int not null,
    study_id bigint not null,
    concluded_at timestamptz not null,
    concluded_by text not null,
    primary key (site_id, study_id),
    foreign key (site_id, study_id) references study
);

-- Conclusions are derived, and stored for speed with what they were derived by; verify recomputes them.
create table finding (
    site_id int not null,
    study_id bigint not null,
    edition_no int not null,
    engine_version text not null,
    confidence double precision not null check (confidence > 0 and confidence < 1),
    findings text not null,
    computed_at timestamptz not null,
    primary key (site_id, study_id, edition_no, engine_version),
    foreign key (site_id, study_id) references study_conclusion
);

create table appraiser_figure (
    site_id int not null,
    study_id bigint not null,
    edition_no int not null,
    engine_version text not null,
    appraiser_id bigint not null,
    right_pieces int not null,
    complete_pieces int not null,
    false_accepts int not null,
    calls_on_defective int not null,
    false_rejects int not null,
    calls_on_good int not null,
    bias_ratio double precision,
    bias_status text not null,
    criterion_c double precision,
    criterion_c_low double precision,
    criterion_c_high double precision,
    primary key (site_id, appraiser_id, study_id, edition_no, engine_version),
    foreign key (site_id, study_id, edition_no, engine_version) references finding,
    foreign key (site_id, appraiser_id) references appraiser
);
create index appraiser_figure_by_study on appraiser_figure (site_id, study_id);

-- How a task's files are laid out; remembered so that the question is asked once.
create table import_mapping (
    site_id int not null,
    task_id bigint not null,
    mapping text not null,
    saved_at timestamptz not null,
    primary key (site_id, task_id),
    foreign key (site_id, task_id) references task
);

-- A file on its way to a study: kept in pieces until the user has said what it means, or for a day.
create table upload (
    site_id int not null references site,
    upload_id uuid not null,
    owner text not null,
    file_name text not null check (length(file_name) <= 300),
    bytes bigint not null default 0,
    uploaded_at timestamptz not null,
    state text not null check (state in ('waiting', 'running', 'done', 'refused', 'cancelled', 'broken')),
    request text,
    rows_done bigint not null default 0,
    bytes_done bigint not null default 0,
    calls_in_all bigint,
    run_no int not null default 0,
    cancel_wanted boolean not null default false,
    study_id bigint,
    problem text,
    changed_at timestamptz not null,
    primary key (site_id, upload_id),
    foreign key (site_id, study_id) references study
);
comment on column upload.calls_in_all is 'known once the file is read: rows_done then counts calls stored';
comment on column upload.run_no is 'counts the runs; only the latest may end the upload';
create index upload_by_owner on upload (site_id, owner, uploaded_at desc);

create table upload_part (
    site_id int not null,
    upload_id uuid not null,
    part_no int not null check (part_no >= 0),
    content bytea not null,
    primary key (site_id, upload_id, part_no),
    foreign key (site_id, upload_id) references upload on delete cascade
);

grant select, insert on study, study_appraiser, study_piece, study_seen_kind, study_call, study_conclusion, finding,
    appraiser_figure to ${appRole};
grant select, insert, update on import_mapping to ${appRole};
grant select, insert, update, delete on upload, upload_part to ${appRole};
grant usage on study_seq to ${appRole};
