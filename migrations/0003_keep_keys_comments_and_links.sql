CREATE TABLE "api_keys" (
	"id" text PRIMARY KEY NOT NULL,
	"user_id" text NOT NULL,
	"team_id" text NOT NULL,
	"name" text NOT NULL,
	"hash" text NOT NULL,
	"start" text NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"last_used_at" timestamp (3) with time zone,
	"revoked_at" timestamp (3) with time zone,
	CONSTRAINT "api_keys_name_length" CHECK (char_length("api_keys"."name") between 1 and 80 and "api_keys"."name" = btrim("api_keys"."name")),
	CONSTRAINT "api_keys_hash_form" CHECK ("api_keys"."hash" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
CREATE TABLE "comments" (
	"id" text PRIMARY KEY NOT NULL,
	"voice_id" text NOT NULL,
	"revision_id" text NOT NULL,
	"thread_id" text,
	"place" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"text" text NOT NULL,
	"author_id" text,
	"author_name" text NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"edited_at" timestamp (3) with time zone,
	"deleted_at" timestamp (3) with time zone,
	"resolved_at" timestamp (3) with time zone,
	"resolved_by_id" text,
	CONSTRAINT "comments_text_length" CHECK (char_length("comments"."text") <= 4000 and ("comments"."deleted_at" is not null or char_length("comments"."text") >= 1)),
	CONSTRAINT "comments_deleted_empty" CHECK ("comments"."deleted_at" is null or "comments"."text" = ''),
	CONSTRAINT "comments_place_object" CHECK (jsonb_typeof("comments"."place") = 'object'),
	CONSTRAINT "comments_answers_not_resolved" CHECK ("comments"."thread_id" is null or "comments"."resolved_at" is null)
);
--> statement-breakpoint
CREATE TABLE "mail_choices" (
	"user_id" text PRIMARY KEY NOT NULL,
	"mentions" boolean DEFAULT true NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "share_links" (
	"id" text PRIMARY KEY NOT NULL,
	"voice_id" text NOT NULL,
	"revision_id" text NOT NULL,
	"token_hash" text NOT NULL,
	"created_by_id" text,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp (3) with time zone,
	"revoked_at" timestamp (3) with time zone,
	"openings" integer DEFAULT 0 NOT NULL,
	"last_opened_at" timestamp (3) with time zone,
	CONSTRAINT "share_links_hash_form" CHECK ("share_links"."token_hash" ~ '^[0-9a-f]{64}$'),
	CONSTRAINT "share_links_openings_counted" CHECK ("share_links"."openings" >= 0)
);
--> statement-breakpoint
ALTER TABLE "api_keys" ADD CONSTRAINT "api_keys_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "api_keys" ADD CONSTRAINT "api_keys_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "comments" ADD CONSTRAINT "comments_voice_id_voices_id_fk" FOREIGN KEY ("voice_id") REFERENCES "public"."voices"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "comments" ADD CONSTRAINT "comments_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "comments" ADD CONSTRAINT "comments_thread_id_comments_id_fk" FOREIGN KEY ("thread_id") REFERENCES "public"."comments"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "comments" ADD CONSTRAINT "comments_author_id_users_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "comments" ADD CONSTRAINT "comments_resolved_by_id_users_id_fk" FOREIGN KEY ("resolved_by_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mail_choices" ADD CONSTRAINT "mail_choices_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "share_links" ADD CONSTRAINT "share_links_voice_id_voices_id_fk" FOREIGN KEY ("voice_id") REFERENCES "public"."voices"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "share_links" ADD CONSTRAINT "share_links_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "share_links" ADD CONSTRAINT "share_links_created_by_id_users_id_fk" FOREIGN KEY ("created_by_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "api_keys_hash_key" ON "api_keys" USING btree ("hash");--> statement-breakpoint
CREATE INDEX "api_keys_user_index" ON "api_keys" USING btree ("user_id","created_at");--> statement-breakpoint
CREATE INDEX "api_keys_team_index" ON "api_keys" USING btree ("team_id");--> statement-breakpoint
CREATE INDEX "comments_voice_index" ON "comments" USING btree ("voice_id","created_at","id");--> statement-breakpoint
CREATE INDEX "comments_revision_index" ON "comments" USING btree ("revision_id","created_at","id");--> statement-breakpoint
CREATE INDEX "comments_thread_index" ON "comments" USING btree ("thread_id","created_at");--> statement-breakpoint
CREATE INDEX "comments_author_index" ON "comments" USING btree ("author_id");--> statement-breakpoint
CREATE INDEX "comments_resolved_by_index" ON "comments" USING btree ("resolved_by_id");--> statement-breakpoint
CREATE INDEX "comments_open_threads_index" ON "comments" USING btree ("revision_id") WHERE "comments"."thread_id" is null and "comments"."resolved_at" is null and "comments"."deleted_at" is null;--> statement-breakpoint
CREATE UNIQUE INDEX "share_links_token_key" ON "share_links" USING btree ("token_hash");--> statement-breakpoint
CREATE INDEX "share_links_voice_index" ON "share_links" USING btree ("voice_id","created_at","id");--> statement-breakpoint
CREATE INDEX "share_links_revision_index" ON "share_links" USING btree ("revision_id");--> statement-breakpoint
CREATE INDEX "share_links_created_by_index" ON "share_links" USING btree ("created_by_id");