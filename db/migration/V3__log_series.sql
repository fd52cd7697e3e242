-- The rows of a log, column by column: of each quantity its statistics by week and hour of the week,
-- and its values in chunks of up to 4,096 rows, coded in few bytes. The times are quantity -1.
create table series_quantities (
  reading_id bigint not null references readings (id) on delete cascade,
  quantity integer not null,
  name varchar not null,
  first_week bigint not null,
  weeks integer not null,
  statistics bytea not null,
  primary key (reading_id, quantity)
);

create table series_chunks (
  reading_id bigint not null references readings (id) on delete cascade,
  quantity integer not null,
  chunk integer not null,
  row_count integer not null,
  bytes bytea not null,
  primary key (reading_id, quantity, chunk)
);
