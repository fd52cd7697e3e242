-- How many draws of the loads' spread an audit was asked for.
alter table audits add column draws integer default 0 not null;
