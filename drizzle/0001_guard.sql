-- What the schema generator can't say: forced row security, the app's grants, keys between files of the schema,
-- and the laws of the ledger and of agreements, which the database itself enforces.

-- The owner of the tables is bound by row security as well.
do $$
declare t record;
begin
  for t in select c.table_name from information_schema.columns c join information_schema.tables b using (table_schema, table_name)
           where c.table_schema = 'public' and c.column_name = 'workspace_id' and b.table_type = 'BASE TABLE'
  loop
    execute format('alter table %I force row level security', t.table_name);
  end loop;
  execute 'alter table workspaces force row level security';
end $$;
--> statement-breakpoint
grant usage on schema public to moiety_app;
--> statement-breakpoint
grant select, insert, update, delete on all tables in schema public to moiety_app;
--> statement-breakpoint
grant usage on all sequences in schema public to moiety_app;
--> statement-breakpoint
-- Books, agreements and the audit log only grow.
revoke update, delete, truncate on entries, postings, sale_splits, audit_log, terms_decisions, pairing_decisions,
  ownership_parts, payment_service_events from moiety_app;
--> statement-breakpoint
revoke delete, truncate on ownerships, terms_versions, pairing_versions, payments, refunds, invoices, closed_periods from moiety_app;
--> statement-breakpoint
alter table animals add constraint animals_clutch_fk foreign key (workspace_id, clutch_id) references clutches (workspace_id, id);
--> statement-breakpoint
alter table expenses add constraint expenses_animal_fk foreign key (workspace_id, animal_id) references animals (workspace_id, id);
--> statement-breakpoint
alter table expenses add constraint expenses_clutch_fk foreign key (workspace_id, clutch_id) references clutches (workspace_id, id);
--> statement-breakpoint
alter table postings add constraint postings_animal_fk foreign key (workspace_id, animal_id) references animals (workspace_id, id);
--> statement-breakpoint
alter table sale_splits add constraint sale_splits_animal_fk foreign key (workspace_id, animal_id) references animals (workspace_id, id);
--> statement-breakpoint
alter table mails add constraint mails_contact_fk foreign key (workspace_id, contact_id) references contacts (workspace_id, id);
--> statement-breakpoint
-- At any day exactly one set of parts holds for an animal; two transfers at the same time can't both succeed.
create extension if not exists btree_gist;
--> statement-breakpoint
alter table ownerships add constraint ownerships_one_set_per_day
  exclude using gist (workspace_id with =, animal_id with =, daterange(from_day, until_day, '[)') with &&);
--> statement-breakpoint
create function refuse_change() returns trigger language plpgsql as $$
begin
  raise exception '% only grows: % is refused', tg_table_name, lower(tg_op) using errcode = 'MO001';
end $$;
--> statement-breakpoint
create trigger entries_only_grow before update or delete on entries for each row execute function refuse_change();
--> statement-breakpoint
create trigger postings_only_grow before update or delete on postings for each row execute function refuse_change();
--> statement-breakpoint
create trigger audit_log_only_grows before update or delete on audit_log for each row execute function refuse_change();
--> statement-breakpoint
create trigger sale_splits_only_grow before update or delete on sale_splits for each row execute function refuse_change();
--> statement-breakpoint
-- A locked version can't be changed by anybody.
create function refuse_change_of_locked() returns trigger language plpgsql as $$
begin
  if old.locked_at is not null then
    raise exception '% of % is locked', tg_table_name, old.id using errcode = 'MO002';
  end if;
  return case when tg_op = 'DELETE' then old else new end;
end $$;
--> statement-breakpoint
create trigger terms_versions_locked_stay before update or delete on terms_versions for each row execute function refuse_change_of_locked();
--> statement-breakpoint
create trigger pairing_versions_locked_stay before update or delete on pairing_versions for each row execute function refuse_change_of_locked();
--> statement-breakpoint
-- Every entry balances in the workspace's currency when the transaction commits.
create function check_entry_balances() returns trigger language plpgsql as $$
declare
  entry uuid := case when tg_table_name = 'entries' then new.id else new.entry_id end;
  debits numeric; credits numeric; lines int; foreign_lines int;
begin
  select coalesce(sum(p.amount) filter (where p.side = 'debit'), 0), coalesce(sum(p.amount) filter (where p.side = 'credit'), 0), count(*),
         count(*) filter (where p.currency <> w.currency)
    into debits, credits, lines, foreign_lines
    from postings p join workspaces w on w.id = p.workspace_id
   where p.workspace_id = new.workspace_id and p.entry_id = entry;
  if lines < 2 then
    raise exception 'entry % has % postings; at least two are needed', entry, lines using errcode = 'MO003';
  end if;
  if foreign_lines > 0 then
    raise exception 'entry % has a posting in another currency than the workspace''s', entry using errcode = 'MO003';
  end if;
  if debits <> credits then
    raise exception 'entry % does not balance: debits %, credits %', entry, debits, credits using errcode = 'MO003';
  end if;
  return null;
end $$;
--> statement-breakpoint
create constraint trigger entries_balance after insert on entries deferrable initially deferred
  for each row execute function check_entry_balances();
--> statement-breakpoint
create constraint trigger postings_balance after insert on postings deferrable initially deferred
  for each row execute function check_entry_balances();
--> statement-breakpoint
-- No entry is posted into a closed period.
create function check_period_is_open() returns trigger language plpgsql as $$
begin
  if exists (select 1 from closed_periods c where c.workspace_id = new.workspace_id and c.reopened_at is null
             and new.posted_on between c.from_day and c.through_day) then
    raise exception 'the period of % is closed', new.posted_on using errcode = 'MO004';
  end if;
  return new;
end $$;
--> statement-breakpoint
create trigger entries_period_is_open before insert on entries for each row execute function check_period_is_open();
--> statement-breakpoint
-- The currency of a workspace is fixed with its first entry.
create function check_currency_is_fixed() returns trigger language plpgsql as $$
begin
  if new.currency <> old.currency and exists (select 1 from entries e where e.workspace_id = new.id) then
    raise exception 'the currency can''t change once the ledger has entries' using errcode = 'MO005';
  end if;
  return new;
end $$;
--> statement-breakpoint
create trigger workspaces_currency_is_fixed before update of currency on workspaces for each row execute function check_currency_is_fixed();
