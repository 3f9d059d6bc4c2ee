-- The database as the last guard: history never changes, every entry balances, no hold goes below zero.
CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION '% is append-only', TG_TABLE_NAME USING ERRCODE = 'restrict_violation';
END $$;
--> statement-breakpoint
CREATE TRIGGER ledger_entries_append_only BEFORE UPDATE OR DELETE ON ledger_entries FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER ledger_entries_no_truncate BEFORE TRUNCATE ON ledger_entries FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER ledger_postings_append_only BEFORE UPDATE OR DELETE ON ledger_postings FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER ledger_postings_no_truncate BEFORE TRUNCATE ON ledger_postings FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER order_timeline_append_only BEFORE UPDATE OR DELETE ON order_timeline FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER order_timeline_no_truncate BEFORE TRUNCATE ON order_timeline FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER audit_append_only BEFORE UPDATE OR DELETE ON audit FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER audit_no_truncate BEFORE TRUNCATE ON audit FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE FUNCTION check_entry_balances() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE
  entry text := CASE TG_TABLE_NAME WHEN 'ledger_entries' THEN to_jsonb(NEW) ->> 'id' ELSE to_jsonb(NEW) ->> 'entry_id' END;
  total bigint;
  lines bigint;
BEGIN
  SELECT coalesce(sum(cents), 0), count(*) INTO total, lines FROM ledger_postings WHERE entry_id = entry;
  IF total <> 0 OR lines < 2 THEN
    RAISE EXCEPTION 'entry % is out of balance: % cents over % postings', entry, total, lines
      USING ERRCODE = 'check_violation', CONSTRAINT = 'ledger_entry_balances';
  END IF;
  RETURN NULL;
END $$;
--> statement-breakpoint
CREATE CONSTRAINT TRIGGER ledger_entries_balance AFTER INSERT ON ledger_entries
  DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION check_entry_balances();
--> statement-breakpoint
CREATE CONSTRAINT TRIGGER ledger_postings_balance AFTER INSERT ON ledger_postings
  DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION check_entry_balances();
--> statement-breakpoint
-- Update before insert: a check constraint sees the proposed row of an upsert, and a debit alone would be negative.
CREATE FUNCTION keep_balance() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  UPDATE ledger_balances SET cents = cents - NEW.cents
    WHERE order_id = NEW.order_id AND account = NEW.account AND leg = coalesce(NEW.leg, '');
  IF NOT FOUND THEN
    INSERT INTO ledger_balances (order_id, account, leg, cents)
      VALUES (NEW.order_id, NEW.account, coalesce(NEW.leg, ''), -NEW.cents);
  END IF;
  RETURN NULL;
END $$;
--> statement-breakpoint
CREATE TRIGGER ledger_postings_keep_balance AFTER INSERT ON ledger_postings FOR EACH ROW EXECUTE FUNCTION keep_balance();
