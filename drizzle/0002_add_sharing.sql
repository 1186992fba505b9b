CREATE TABLE "acts" (
	"id" bigint PRIMARY KEY GENERATED ALWAYS AS IDENTITY (sequence name "acts_id_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"at" timestamp with time zone NOT NULL,
	"group_id" uuid,
	"actor_id" uuid,
	"act" text NOT NULL,
	"subject" text NOT NULL,
	"subject_id" uuid NOT NULL,
	"subject_name" text NOT NULL,
	"details" json NOT NULL
);
--> statement-breakpoint
CREATE TABLE "invitations" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"group_id" uuid,
	"notebook_id" uuid,
	"email" text NOT NULL,
	"role" text NOT NULL,
	"token_hash" text NOT NULL,
	"invited_by" uuid NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"accepted_at" timestamp with time zone,
	"revoked_at" timestamp with time zone,
	CONSTRAINT "invitations_token_hash_unique" UNIQUE("token_hash"),
	CONSTRAINT "invitations_to_one" CHECK (num_nonnulls("invitations"."group_id", "invitations"."notebook_id") = 1)
);
--> statement-breakpoint
CREATE TABLE "kept_mail" (
	"id" uuid PRIMARY KEY NOT NULL,
	"to_address" text NOT NULL,
	"subject" text NOT NULL,
	"plain" text NOT NULL,
	"html" text NOT NULL,
	"taken_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "letters" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"kind" text NOT NULL,
	"to_address" text NOT NULL,
	"to_user_id" uuid,
	"subject" text NOT NULL,
	"plain" text NOT NULL,
	"html" text NOT NULL,
	"state" text DEFAULT 'waiting' NOT NULL,
	"tries" integer DEFAULT 0 NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	"due_at" timestamp with time zone NOT NULL,
	"sent_at" timestamp with time zone,
	"failure" text
);
--> statement-breakpoint
CREATE TABLE "mail_choices" (
	"user_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"is_wanted" boolean NOT NULL,
	CONSTRAINT "mail_choices_user_id_kind_pk" PRIMARY KEY("user_id","kind")
);
--> statement-breakpoint
ALTER TABLE "notebooks" ADD COLUMN "archived_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "notebooks" ADD COLUMN "is_referenced" boolean DEFAULT false NOT NULL;--> statement-breakpoint
ALTER TABLE "acts" ADD CONSTRAINT "acts_group_id_groups_id_fk" FOREIGN KEY ("group_id") REFERENCES "public"."groups"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "acts" ADD CONSTRAINT "acts_actor_id_users_id_fk" FOREIGN KEY ("actor_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_group_id_groups_id_fk" FOREIGN KEY ("group_id") REFERENCES "public"."groups"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_notebook_id_notebooks_id_fk" FOREIGN KEY ("notebook_id") REFERENCES "public"."notebooks"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_invited_by_users_id_fk" FOREIGN KEY ("invited_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "letters" ADD CONSTRAINT "letters_to_user_id_users_id_fk" FOREIGN KEY ("to_user_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mail_choices" ADD CONSTRAINT "mail_choices_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "acts_group_id" ON "acts" USING btree ("group_id","at","id");--> statement-breakpoint
CREATE INDEX "acts_actor_id" ON "acts" USING btree ("actor_id");--> statement-breakpoint
CREATE UNIQUE INDEX "invitations_open_to_group" ON "invitations" USING btree ("group_id","email") WHERE accepted_at is null and revoked_at is null;--> statement-breakpoint
CREATE UNIQUE INDEX "invitations_open_to_notebook" ON "invitations" USING btree ("notebook_id","email") WHERE accepted_at is null and revoked_at is null;--> statement-breakpoint
CREATE INDEX "invitations_group_id" ON "invitations" USING btree ("group_id");--> statement-breakpoint
CREATE INDEX "invitations_notebook_id" ON "invitations" USING btree ("notebook_id");--> statement-breakpoint
CREATE INDEX "letters_state_due_at" ON "letters" USING btree ("state","due_at");