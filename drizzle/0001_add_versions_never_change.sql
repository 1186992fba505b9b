-- A kept version never changes, whatever the code above it does. It goes only with its notebook.
CREATE FUNCTION refuse_version_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'a kept version never changes';
END;
$$;
--> statement-breakpoint
CREATE TRIGGER versions_never_change BEFORE UPDATE ON "versions"
  FOR EACH ROW EXECUTE FUNCTION refuse_version_change();
