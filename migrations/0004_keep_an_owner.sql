-- A team always has an owner. Checked when a transaction ends, so that ownership can be handed over inside one; the lock on
-- the team puts two owners who step down at once in a row, and the second is refused.
CREATE FUNCTION "refuse_ownerless_team"() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  PERFORM 1 FROM "teams" WHERE "id" = OLD."team_id" FOR UPDATE;
  IF FOUND AND NOT EXISTS (SELECT 1 FROM "members" WHERE "team_id" = OLD."team_id" AND "role" = 'owner') THEN
    RAISE EXCEPTION 'team % would have no owner', OLD."team_id"
      USING ERRCODE = 'integrity_constraint_violation', CONSTRAINT = 'members_keep_an_owner';
  END IF;
  RETURN NULL;
END $$;
--> statement-breakpoint
CREATE CONSTRAINT TRIGGER "members_keep_an_owner" AFTER UPDATE OR DELETE ON "members"
  DEFERRABLE INITIALLY DEFERRED FOR EACH ROW
  WHEN (OLD."role" = 'owner') EXECUTE FUNCTION "refuse_ownerless_team"();
