-- Whether the parts of a file begin with a byte that says how they are packed. Older files are kept
-- as they came.
alter table stored_files add column packed boolean default false not null;
