-- A revision is what people reviewed and built from: what it holds never changes, whoever asks.
CREATE FUNCTION "refuse_revision_change"() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF (NEW."id", NEW."voice_id", NEW."number", NEW."reason", NEW."inputs", NEW."analysis", NEW."accepted_warnings",
      NEW."library_version", NEW."author_name", NEW."created_at")
     IS DISTINCT FROM
     (OLD."id", OLD."voice_id", OLD."number", OLD."reason", OLD."inputs", OLD."analysis", OLD."accepted_warnings",
      OLD."library_version", OLD."author_name", OLD."created_at") THEN
    RAISE EXCEPTION 'revision % is frozen', OLD."id" USING ERRCODE = 'integrity_constraint_violation';
  END IF;
  -- An account that goes leaves an empty place; nobody else may be put there.
  IF NEW."author_id" IS DISTINCT FROM OLD."author_id" AND NEW."author_id" IS NOT NULL THEN
    RAISE EXCEPTION 'the author of revision % is frozen', OLD."id" USING ERRCODE = 'integrity_constraint_violation';
  END IF;
  IF OLD."decision" IS NOT NULL AND
     ((NEW."decision", NEW."decision_note", NEW."decided_at", NEW."decided_by_name")
      IS DISTINCT FROM (OLD."decision", OLD."decision_note", OLD."decided_at", OLD."decided_by_name")
      OR (NEW."decided_by_id" IS DISTINCT FROM OLD."decided_by_id" AND NEW."decided_by_id" IS NOT NULL)) THEN
    RAISE EXCEPTION 'revision % is decided', OLD."id" USING ERRCODE = 'integrity_constraint_violation';
  END IF;
  IF NEW."status" <> OLD."status" AND (OLD."status", NEW."status") NOT IN (
    ('in preparation', 'under review'), ('in preparation', 'superseded'),
    ('under review', 'released'), ('under review', 'returned'), ('under review', 'superseded'),
    ('released', 'superseded')
  ) THEN
    RAISE EXCEPTION 'revision % goes from % to %', OLD."id", OLD."status", NEW."status"
      USING ERRCODE = 'integrity_constraint_violation';
  END IF;
  RETURN NEW;
END $$;
--> statement-breakpoint
CREATE TRIGGER "revisions_frozen" BEFORE UPDATE ON "revisions" FOR EACH ROW EXECUTE FUNCTION "refuse_revision_change"();
--> statement-breakpoint
CREATE FUNCTION "refuse_revision_removal"() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  -- The voice has gone already when its revisions follow it; as long as it stands, so do they.
  IF EXISTS (SELECT 1 FROM "voices" WHERE "id" = OLD."voice_id") THEN
    RAISE EXCEPTION 'revision % stays as long as its voice', OLD."id" USING ERRCODE = 'integrity_constraint_violation';
  END IF;
  RETURN OLD;
END $$;
--> statement-breakpoint
CREATE TRIGGER "revisions_kept" BEFORE DELETE ON "revisions" FOR EACH ROW EXECUTE FUNCTION "refuse_revision_removal"();
--> statement-breakpoint
-- The log of deeds only grows. An account or a team that goes is the one thing that touches what was written.
CREATE FUNCTION "refuse_audit_change"() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'UPDATE' THEN
    IF NEW."actor_id" IS NULL AND
       (NEW."id", NEW."team_id", NEW."action", NEW."subject_id", NEW."detail", NEW."at")
       IS NOT DISTINCT FROM (OLD."id", OLD."team_id", OLD."action", OLD."subject_id", OLD."detail", OLD."at") THEN
      RETURN NEW;
    END IF;
  ELSIF NOT EXISTS (SELECT 1 FROM "teams" WHERE "id" = OLD."team_id") THEN
    RETURN OLD;
  END IF;
  RAISE EXCEPTION 'the log of deeds is only added to' USING ERRCODE = 'integrity_constraint_violation';
END $$;
--> statement-breakpoint
CREATE TRIGGER "audit_events_append_only" BEFORE UPDATE OR DELETE ON "audit_events" FOR EACH ROW EXECUTE FUNCTION "refuse_audit_change"();
--> statement-breakpoint
CREATE FUNCTION "refuse_truncation"() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION '% is never emptied', TG_TABLE_NAME USING ERRCODE = 'integrity_constraint_violation';
END $$;
--> statement-breakpoint
CREATE TRIGGER "revisions_not_emptied" BEFORE TRUNCATE ON "revisions" FOR EACH STATEMENT EXECUTE FUNCTION "refuse_truncation"();
--> statement-breakpoint
CREATE TRIGGER "audit_events_not_emptied" BEFORE TRUNCATE ON "audit_events" FOR EACH STATEMENT EXECUTE FUNCTION "refuse_truncation"();
