-- The row of an audit's list in small; audits older than this keep theirs as text in summary.
alter table audit_nodes add column brief bytea;
alter table audit_nodes alter column summary drop not null;
