CREATE TABLE "published_references" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"group_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"edition" integer NOT NULL,
	"notebook_id" uuid NOT NULL,
	"version_number" integer NOT NULL,
	"title" text NOT NULL,
	"summary" text NOT NULL,
	"authors" json NOT NULL,
	"licence" text NOT NULL,
	"document" json NOT NULL,
	"result" json NOT NULL,
	"bodies" json NOT NULL,
	"rests_on" json NOT NULL,
	"engine" text NOT NULL,
	"content_hash" text NOT NULL,
	"checks" json NOT NULL,
	"published_at" timestamp with time zone NOT NULL,
	"published_by" uuid NOT NULL,
	"is_vetted_by_owner" boolean NOT NULL,
	"is_public" boolean NOT NULL,
	"doi" text,
	"withdrawn_at" timestamp with time zone,
	"withdrawn_reason" text,
	"recomputed_at" timestamp with time zone,
	"recomputed_engine" text,
	"drift" json
);
--> statement-breakpoint
CREATE TABLE "vettings" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"group_id" uuid NOT NULL,
	"notebook_id" uuid NOT NULL,
	"version_number" integer NOT NULL,
	"message" text NOT NULL,
	"requested_by" uuid NOT NULL,
	"requested_at" timestamp with time zone NOT NULL,
	"summary" text NOT NULL,
	"authors" json NOT NULL,
	"licence" text NOT NULL,
	"edition_of" integer,
	"recomputed" json NOT NULL,
	"accepted" json NOT NULL,
	"state" text DEFAULT 'requested' NOT NULL,
	"remarks" text,
	"decided_by" uuid,
	"decided_at" timestamp with time zone,
	"checks" json
);
--> statement-breakpoint
ALTER TABLE "published_references" ADD CONSTRAINT "published_references_group_id_groups_id_fk" FOREIGN KEY ("group_id") REFERENCES "public"."groups"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "published_references" ADD CONSTRAINT "published_references_notebook_id_notebooks_id_fk" FOREIGN KEY ("notebook_id") REFERENCES "public"."notebooks"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "published_references" ADD CONSTRAINT "published_references_published_by_users_id_fk" FOREIGN KEY ("published_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "vettings" ADD CONSTRAINT "vettings_group_id_groups_id_fk" FOREIGN KEY ("group_id") REFERENCES "public"."groups"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "vettings" ADD CONSTRAINT "vettings_notebook_id_notebooks_id_fk" FOREIGN KEY ("notebook_id") REFERENCES "public"."notebooks"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "vettings" ADD CONSTRAINT "vettings_requested_by_users_id_fk" FOREIGN KEY ("requested_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "vettings" ADD CONSTRAINT "vettings_decided_by_users_id_fk" FOREIGN KEY ("decided_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "vettings" ADD CONSTRAINT "vettings_notebook_id_version_number_versions_notebook_id_number_fk" FOREIGN KEY ("notebook_id","version_number") REFERENCES "public"."versions"("notebook_id","number") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "published_references_pin" ON "published_references" USING btree ("group_id","number","edition");--> statement-breakpoint
CREATE INDEX "published_references_notebook_id" ON "published_references" USING btree ("notebook_id");--> statement-breakpoint
CREATE UNIQUE INDEX "vettings_open" ON "vettings" USING btree ("notebook_id") WHERE state = 'requested';--> statement-breakpoint
CREATE INDEX "vettings_group_id" ON "vettings" USING btree ("group_id","state");--> statement-breakpoint
CREATE INDEX "vettings_notebook_id" ON "vettings" USING btree ("notebook_id");--> statement-breakpoint
-- What was published never changes. Who may read it, its DOI, its withdrawal and what recomputing it found may.
CREATE FUNCTION refuse_reference_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF (NEW.id, NEW.group_id, NEW.number, NEW.edition, NEW.notebook_id, NEW.version_number, NEW.title, NEW.summary,
      NEW.licence, NEW.engine, NEW.content_hash, NEW.published_at, NEW.published_by, NEW.is_vetted_by_owner,
      NEW.authors::text, NEW.document::text, NEW.result::text, NEW.bodies::text, NEW.rests_on::text, NEW.checks::text)
    IS DISTINCT FROM
     (OLD.id, OLD.group_id, OLD.number, OLD.edition, OLD.notebook_id, OLD.version_number, OLD.title, OLD.summary,
      OLD.licence, OLD.engine, OLD.content_hash, OLD.published_at, OLD.published_by, OLD.is_vetted_by_owner,
      OLD.authors::text, OLD.document::text, OLD.result::text, OLD.bodies::text, OLD.rests_on::text, OLD.checks::text)
  THEN
    RAISE EXCEPTION 'a published reference never changes';
  END IF;
  IF OLD.withdrawn_at IS NOT NULL AND NEW.withdrawn_at IS DISTINCT FROM OLD.withdrawn_at THEN
    RAISE EXCEPTION 'a withdrawal stands';
  END IF;
  RETURN NEW;
END;
$$;
--> statement-breakpoint
CREATE TRIGGER references_never_change BEFORE UPDATE ON "published_references"
  FOR EACH ROW EXECUTE FUNCTION refuse_reference_change();
--> statement-breakpoint
CREATE FUNCTION refuse_reference_removal() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'a published reference is never removed';
END;
$$;
--> statement-breakpoint
CREATE TRIGGER references_stay BEFORE DELETE ON "published_references"
  FOR EACH ROW EXECUTE FUNCTION refuse_reference_removal();
