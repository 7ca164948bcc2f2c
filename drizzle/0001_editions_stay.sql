-- An edition, once written, stays as it is: for every role, the owner too.
CREATE FUNCTION "editions_stay"() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'editions never change' USING ERRCODE = 'restrict_violation';
END
$$;
--> statement-breakpoint
CREATE TRIGGER "editions_stay_rows" BEFORE UPDATE OR DELETE ON "editions" FOR EACH ROW EXECUTE FUNCTION "editions_stay"();
--> statement-breakpoint
CREATE TRIGGER "editions_stay_table" BEFORE TRUNCATE ON "editions" FOR EACH STATEMENT EXECUTE FUNCTION "editions_stay"();
