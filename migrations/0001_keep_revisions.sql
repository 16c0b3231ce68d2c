CREATE TABLE "revisions" (
	"id" text PRIMARY KEY NOT NULL,
	"voice_id" text NOT NULL,
	"number" integer NOT NULL,
	"reason" text NOT NULL,
	"inputs" jsonb NOT NULL,
	"analysis" jsonb NOT NULL,
	"accepted_warnings" jsonb NOT NULL,
	"library_version" text NOT NULL,
	"author_id" text,
	"author_name" text NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"status" text DEFAULT 'in preparation' NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"asked_at" timestamp (3) with time zone,
	"asked_by_id" text,
	"reviewer_id" text,
	"decided_at" timestamp (3) with time zone,
	"decided_by_id" text,
	"decided_by_name" text,
	"decision" text,
	"decision_note" text,
	CONSTRAINT "revisions_number_positive" CHECK ("revisions"."number" >= 1),
	CONSTRAINT "revisions_reason_length" CHECK (char_length("revisions"."reason") between 1 and 200 and "revisions"."reason" = btrim("revisions"."reason")),
	CONSTRAINT "revisions_status_word" CHECK ("revisions"."status" in ('in preparation', 'under review', 'returned', 'released', 'superseded')),
	CONSTRAINT "revisions_inputs_object" CHECK (jsonb_typeof("revisions"."inputs") = 'object'),
	CONSTRAINT "revisions_analysis_members" CHECK (coalesce(jsonb_typeof("revisions"."analysis" -> 'results'), '') = 'object' and coalesce(jsonb_typeof("revisions"."analysis" -> 'warnings'), '') = 'array'),
	CONSTRAINT "revisions_accepted_list" CHECK (jsonb_typeof("revisions"."accepted_warnings") = 'array'),
	CONSTRAINT "revisions_decision_word" CHECK ("revisions"."decision" in ('release', 'return')),
	CONSTRAINT "revisions_decision_whole" CHECK (("revisions"."decided_at" is null) = ("revisions"."decision" is null) and ("revisions"."decision" is null) = ("revisions"."decided_by_name" is null)),
	CONSTRAINT "revisions_released_decided" CHECK (("revisions"."status" <> 'released' or "revisions"."decision" = 'release') and ("revisions"."status" <> 'returned' or "revisions"."decision" = 'return')),
	CONSTRAINT "revisions_review_asked" CHECK ("revisions"."status" <> 'under review' or "revisions"."asked_at" is not null),
	CONSTRAINT "revisions_never_own" CHECK ("revisions"."decided_by_id" is null or "revisions"."decided_by_id" <> "revisions"."author_id"),
	CONSTRAINT "revisions_note_length" CHECK (char_length("revisions"."decision_note") <= 2000)
);
--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_voice_id_voices_id_fk" FOREIGN KEY ("voice_id") REFERENCES "public"."voices"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_author_id_users_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_asked_by_id_users_id_fk" FOREIGN KEY ("asked_by_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_reviewer_id_users_id_fk" FOREIGN KEY ("reviewer_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_decided_by_id_users_id_fk" FOREIGN KEY ("decided_by_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "revisions_voice_number_key" ON "revisions" USING btree ("voice_id","number");--> statement-breakpoint
CREATE INDEX "revisions_voice_status_index" ON "revisions" USING btree ("voice_id","status","number");--> statement-breakpoint
CREATE INDEX "revisions_reviewer_index" ON "revisions" USING btree ("reviewer_id","status");--> statement-breakpoint
CREATE INDEX "revisions_author_index" ON "revisions" USING btree ("author_id");--> statement-breakpoint
CREATE INDEX "revisions_asked_by_index" ON "revisions" USING btree ("asked_by_id");--> statement-breakpoint
CREATE INDEX "revisions_decided_by_index" ON "revisions" USING btree ("decided_by_id");--> statement-breakpoint
CREATE INDEX "revisions_under_review_index" ON "revisions" USING btree ("voice_id") WHERE "revisions"."status" = 'under review';--> statement-breakpoint
CREATE UNIQUE INDEX "revisions_one_released_key" ON "revisions" USING btree ("voice_id") WHERE "revisions"."status" = 'released';