CREATE TABLE "books" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"slug" text NOT NULL,
	"name" text NOT NULL,
	"layout_id" uuid NOT NULL,
	"car_id" uuid NOT NULL,
	"car_length" double precision NOT NULL,
	"rev" integer DEFAULT 0 NOT NULL,
	"state" text DEFAULT 'live' NOT NULL,
	"copied_from" uuid,
	"made_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "books_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "books_slug" UNIQUE("team_id","slug"),
	CONSTRAINT "books_state" CHECK ("books"."state" in ('live', 'archived'))
);
--> statement-breakpoint
CREATE TABLE "cards" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"book_id" uuid NOT NULL,
	"corner_id" uuid NOT NULL,
	"gear_in" integer,
	"gear_out" integer,
	"speed_in" double precision,
	"least_speed" double precision,
	"flat" boolean DEFAULT false NOT NULL,
	"no_reference" boolean DEFAULT false NOT NULL,
	"line" text DEFAULT '' NOT NULL,
	"kerbs" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"surface" text DEFAULT '' NOT NULL,
	"water" text DEFAULT '' NOT NULL,
	"car" text DEFAULT '' NOT NULL,
	"mistake" text DEFAULT '' NOT NULL,
	"traffic" text DEFAULT '' NOT NULL,
	"limits" text DEFAULT '' NOT NULL,
	"backup" text DEFAULT '' NOT NULL,
	"next" text DEFAULT '' NOT NULL,
	"sets_up" uuid,
	"compromised_for" uuid,
	"state" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "cards_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "cards_of_book" UNIQUE("team_id","book_id","id"),
	CONSTRAINT "cards_state" CHECK ("cards"."state" in ('live'))
);
--> statement-breakpoint
CREATE TABLE "cars" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"length" double precision NOT NULL,
	"width" double precision NOT NULL,
	"eye_height" double precision NOT NULL,
	"state" text DEFAULT 'live' NOT NULL,
	"made_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "cars_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "cars_state" CHECK ("cars"."state" in ('live', 'dropped'))
);
--> statement-breakpoint
CREATE TABLE "conditions" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"book_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"name" text NOT NULL,
	"rank" text NOT NULL,
	"state" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "conditions_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "conditions_of_book" UNIQUE("team_id","book_id","id"),
	CONSTRAINT "conditions_kind" CHECK ("conditions"."kind" in ('dry', 'wet', 'damp-off-line', 'cold-tyres', 'worn-tyres', 'full-fuel', 'night', 'other')),
	CONSTRAINT "conditions_state" CHECK ("conditions"."state" in ('live', 'dropped'))
);
--> statement-breakpoint
CREATE TABLE "centrelines" (
	"team_id" uuid NOT NULL,
	"hash" text NOT NULL,
	"positions" jsonb NOT NULL,
	"length" double precision NOT NULL,
	"outline" double precision[] NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "centrelines_team_id_hash_pk" PRIMARY KEY("team_id","hash"),
	CONSTRAINT "centrelines_hash" CHECK ("centrelines"."hash" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
CREATE TABLE "circuits" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"slug" text NOT NULL,
	"name" text NOT NULL,
	"time_zone" text NOT NULL,
	"made_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "circuits_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "circuits_slug" UNIQUE("team_id","slug")
);
--> statement-breakpoint
CREATE TABLE "corners" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"layout_id" uuid NOT NULL,
	"number" text NOT NULL,
	"name" text NOT NULL,
	"direction" text NOT NULL,
	"turn_degrees" double precision NOT NULL,
	"least_radius" double precision NOT NULL,
	"entry" double precision NOT NULL,
	"apex" double precision NOT NULL,
	"exit" double precision NOT NULL,
	"datum_along" double precision NOT NULL,
	"datum_words" text NOT NULL,
	"state" text NOT NULL,
	"merged_into" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "corners_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "corners_of_layout" UNIQUE("team_id","layout_id","id"),
	CONSTRAINT "corners_direction" CHECK ("corners"."direction" in ('left', 'right')),
	CONSTRAINT "corners_state" CHECK ("corners"."state" in ('live', 'dropped', 'merged')),
	CONSTRAINT "corners_merged" CHECK (("corners"."state" = 'merged') = ("corners"."merged_into" is not null))
);
--> statement-breakpoint
CREATE TABLE "grounds" (
	"team_id" uuid NOT NULL,
	"hash" text NOT NULL,
	"features" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "grounds_team_id_hash_pk" PRIMARY KEY("team_id","hash"),
	CONSTRAINT "grounds_hash" CHECK ("grounds"."hash" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
CREATE TABLE "layouts" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"circuit_id" uuid NOT NULL,
	"name" text NOT NULL,
	"centreline_hash" text NOT NULL,
	"ground_hash" text,
	"start_along" double precision NOT NULL,
	"reversed" boolean NOT NULL,
	"road_width" double precision NOT NULL,
	"length" double precision NOT NULL,
	"supersedes" uuid,
	"rev" integer DEFAULT 0 NOT NULL,
	"state" text DEFAULT 'live' NOT NULL,
	"made_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "layouts_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "layouts_state" CHECK ("layouts"."state" in ('live', 'archived'))
);
--> statement-breakpoint
CREATE TABLE "editions" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"book_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"format_version" integer NOT NULL,
	"bytes" "bytea" NOT NULL,
	"sha256" text NOT NULL,
	"pdf" "bytea",
	"published_by" uuid NOT NULL,
	"published_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "editions_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "editions_number" UNIQUE("team_id","book_id","number"),
	CONSTRAINT "editions_sha256" CHECK ("editions"."sha256" = encode(sha256("editions"."bytes"), 'hex'))
);
--> statement-breakpoint
CREATE TABLE "imports" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"file_name" text NOT NULL,
	"bytes" "bytea" NOT NULL,
	"options" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "imports_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "imports_size" CHECK (octet_length("imports"."bytes") <= 20971520)
);
--> statement-breakpoint
CREATE TABLE "landmark_placements" (
	"team_id" uuid NOT NULL,
	"landmark_id" uuid NOT NULL,
	"ground" text NOT NULL,
	"along" double precision NOT NULL,
	"until" double precision,
	"across" double precision,
	"across_to" double precision,
	"edge_length" double precision,
	"block_length" double precision,
	"width" double precision,
	"words" text,
	CONSTRAINT "landmark_placements_team_id_landmark_id_ground_pk" PRIMARY KEY("team_id","landmark_id","ground"),
	CONSTRAINT "landmark_placements_ground" CHECK ("landmark_placements"."ground" in ('sim', 'real'))
);
--> statement-breakpoint
CREATE TABLE "landmarks" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"layout_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"name" text NOT NULL,
	"text" text,
	"corner_id" uuid,
	"height" double precision,
	"state" text NOT NULL,
	"made_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "landmarks_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "landmarks_kind" CHECK ("landmarks"."kind" in ('kerb', 'distance-board', 'marshal-post', 'light-panel', 'sign', 'gantry', 'bridge', 'wall', 'wall-end', 'tyre-wall', 'tyre-bundle', 'bales', 'cone', 'marker-post', 'line', 'seam', 'patch', 'bump', 'drain', 'standing-water', 'building', 'mast', 'timing-line', 'safety-car-line', 'pit-entry-line', 'pit-exit-line', 'pit-speed-line')),
	CONSTRAINT "landmarks_state" CHECK ("landmarks"."state" in ('live', 'dropped'))
);
--> statement-breakpoint
CREATE TABLE "stretch_placements" (
	"team_id" uuid NOT NULL,
	"stretch_id" uuid NOT NULL,
	"ground" text NOT NULL,
	"along" double precision NOT NULL,
	"until" double precision,
	"across" double precision,
	"across_to" double precision,
	"edge_length" double precision,
	"block_length" double precision,
	"width" double precision,
	"words" text,
	CONSTRAINT "stretch_placements_team_id_stretch_id_ground_pk" PRIMARY KEY("team_id","stretch_id","ground"),
	CONSTRAINT "stretch_placements_ground" CHECK ("stretch_placements"."ground" in ('sim', 'real'))
);
--> statement-breakpoint
CREATE TABLE "stretches" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"layout_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"name" text NOT NULL,
	"state" text NOT NULL,
	"made_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "stretches_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "stretches_kind" CHECK ("stretches"."kind" in ('surface', 'grip', 'camber', 'height', 'drainage', 'layout-part')),
	CONSTRAINT "stretches_state" CHECK ("stretches"."state" in ('live', 'dropped'))
);
--> statement-breakpoint
CREATE TABLE "findings" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"book_id" uuid NOT NULL,
	"mark_id" uuid NOT NULL,
	"ground" text NOT NULL,
	"person_id" uuid NOT NULL,
	"by_id" uuid NOT NULL,
	"condition_id" uuid NOT NULL,
	"verdict" text NOT NULL,
	"proof" text NOT NULL,
	"method" text NOT NULL,
	"accuracy" double precision,
	"along" double precision NOT NULL,
	"across" double precision NOT NULL,
	"found_at" timestamp with time zone NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "findings_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "findings_ground" CHECK ("findings"."ground" in ('sim', 'real')),
	CONSTRAINT "findings_verdict" CHECK ("findings"."verdict" in ('kept', 'moved', 'gone')),
	CONSTRAINT "findings_proof" CHECK ("findings"."proof" in ('told', 'seen', 'driven')),
	CONSTRAINT "findings_method" CHECK ("findings"."method" in ('eye', 'gps', 'tie', 'lap'))
);
--> statement-breakpoint
CREATE TABLE "marks" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"book_id" uuid NOT NULL,
	"card_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"role" text,
	"manner" text,
	"condition_id" uuid NOT NULL,
	"for_person" uuid,
	"gear" integer,
	"downshifts" integer,
	"speed" double precision,
	"state" text NOT NULL,
	"made_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "marks_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "marks_of_book" UNIQUE("team_id","book_id","id"),
	CONSTRAINT "marks_kind" CHECK ("marks"."kind" in ('look', 'brake', 'lift', 'gear', 'turnin', 'release', 'apex', 'throttle', 'full', 'trackout')),
	CONSTRAINT "marks_role" CHECK ("marks"."role" in ('start', 'target')),
	CONSTRAINT "marks_manner" CHECK ("marks"."manner" in ('brush', 'full', 'trail', 'squeeze')),
	CONSTRAINT "marks_state" CHECK ("marks"."state" in ('live', 'dropped')),
	CONSTRAINT "marks_brake_role" CHECK ("marks"."role" is null or "marks"."kind" = 'brake')
);
--> statement-breakpoint
CREATE TABLE "places" (
	"team_id" uuid NOT NULL,
	"mark_id" uuid NOT NULL,
	"ground" text NOT NULL,
	"along" double precision NOT NULL,
	"across" double precision NOT NULL,
	CONSTRAINT "places_team_id_mark_id_ground_pk" PRIMARY KEY("team_id","mark_id","ground"),
	CONSTRAINT "places_ground" CHECK ("places"."ground" in ('sim', 'real'))
);
--> statement-breakpoint
CREATE TABLE "ties" (
	"team_id" uuid NOT NULL,
	"mark_id" uuid NOT NULL,
	"ground" text NOT NULL,
	"landmark_id" uuid,
	"along_from" text,
	"along_block" integer,
	"along_metres" double precision,
	"along_lengths" double precision,
	"across_part" text,
	"across_on" text,
	"across_metres" double precision,
	"words" text,
	"across_words" text,
	CONSTRAINT "ties_team_id_mark_id_ground_pk" PRIMARY KEY("team_id","mark_id","ground"),
	CONSTRAINT "ties_along_from" CHECK ("ties"."along_from" in ('start', 'middle', 'end', 'block')),
	CONSTRAINT "ties_across_part" CHECK ("ties"."across_part" in ('left-wheels', 'right-wheels', 'centre')),
	CONSTRAINT "ties_across_on" CHECK ("ties"."across_on" in ('left-line', 'right-line', 'left-edge', 'right-edge', 'kerb', 'middle')),
	CONSTRAINT "ties_along" CHECK (num_nonnulls("ties"."along_from", "ties"."along_metres", "ties"."along_lengths") in (0, 3)),
	CONSTRAINT "ties_across" CHECK (num_nonnulls("ties"."across_part", "ties"."across_on", "ties"."across_metres") in (0, 3))
);
--> statement-breakpoint
CREATE TABLE "changes" (
	"team_id" uuid NOT NULL,
	"id" bigint GENERATED ALWAYS AS IDENTITY (sequence name "changes_id_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"book_id" uuid,
	"layout_id" uuid,
	"rev" integer NOT NULL,
	"operation_id" uuid NOT NULL,
	"target_kind" text NOT NULL,
	"target_id" uuid NOT NULL,
	"set" jsonb NOT NULL,
	"reason" text,
	"undoes" uuid,
	"batch" uuid,
	"by_id" uuid,
	"accepted_by" uuid,
	"made_at" timestamp with time zone NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "changes_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "changes_book_rev" UNIQUE("team_id","book_id","rev"),
	CONSTRAINT "changes_layout_rev" UNIQUE("team_id","layout_id","rev"),
	CONSTRAINT "changes_operation" UNIQUE("team_id","operation_id"),
	CONSTRAINT "changes_target_kind" CHECK ("changes"."target_kind" in ('book', 'condition', 'card', 'mark', 'layout', 'corner', 'landmark', 'stretch')),
	CONSTRAINT "changes_scope" CHECK (num_nonnulls("changes"."book_id", "changes"."layout_id") = 1)
);
--> statement-breakpoint
CREATE TABLE "operations" (
	"team_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"arrival" bigint GENERATED ALWAYS AS IDENTITY (sequence name "operations_arrival_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"book_id" uuid,
	"layout_id" uuid,
	"person_id" uuid,
	"body_hash" text NOT NULL,
	"body" jsonb NOT NULL,
	"status" text NOT NULL,
	"rev" integer NOT NULL,
	"batch" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"decided_by" uuid,
	"decided_at" timestamp with time zone,
	CONSTRAINT "operations_team_id_id_pk" PRIMARY KEY("team_id","id"),
	CONSTRAINT "operations_person" UNIQUE("person_id","id"),
	CONSTRAINT "operations_status" CHECK ("operations"."status" in ('applied', 'nothing', 'proposed', 'accepted', 'declined')),
	CONSTRAINT "operations_scope" CHECK (num_nonnulls("operations"."book_id", "operations"."layout_id") = 1)
);
--> statement-breakpoint
CREATE TABLE "memberships" (
	"team_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"role" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"ended_at" timestamp with time zone,
	CONSTRAINT "memberships_team_id_person_id_pk" PRIMARY KEY("team_id","person_id"),
	CONSTRAINT "memberships_role" CHECK ("memberships"."role" in ('manager', 'coach', 'driver'))
);
--> statement-breakpoint
CREATE TABLE "passwords" (
	"person_id" uuid PRIMARY KEY NOT NULL,
	"hash" text NOT NULL,
	"changed_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "people" (
	"id" uuid PRIMARY KEY NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"email_verified_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"id" text PRIMARY KEY NOT NULL,
	"person_id" uuid NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"absolute_expires_at" timestamp with time zone NOT NULL,
	"last_used_at" timestamp with time zone DEFAULT now() NOT NULL,
	"device" text DEFAULT '' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "teams" (
	"id" uuid PRIMARY KEY NOT NULL,
	"slug" text NOT NULL,
	"name" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "teams_slug_unique" UNIQUE("slug")
);
--> statement-breakpoint
CREATE TABLE "rate_limits" (
	"key" text PRIMARY KEY NOT NULL,
	"points" integer DEFAULT 0 NOT NULL,
	"expire" bigint
);
--> statement-breakpoint
ALTER TABLE "books" ADD CONSTRAINT "books_team_id_layout_id_layouts_team_id_id_fk" FOREIGN KEY ("team_id","layout_id") REFERENCES "public"."layouts"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "books" ADD CONSTRAINT "books_team_id_car_id_cars_team_id_id_fk" FOREIGN KEY ("team_id","car_id") REFERENCES "public"."cars"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "books" ADD CONSTRAINT "books_team_id_copied_from_books_team_id_id_fk" FOREIGN KEY ("team_id","copied_from") REFERENCES "public"."books"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "books" ADD CONSTRAINT "books_team_id_made_by_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","made_by") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cards" ADD CONSTRAINT "cards_team_id_book_id_books_team_id_id_fk" FOREIGN KEY ("team_id","book_id") REFERENCES "public"."books"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cards" ADD CONSTRAINT "cards_team_id_corner_id_corners_team_id_id_fk" FOREIGN KEY ("team_id","corner_id") REFERENCES "public"."corners"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cards" ADD CONSTRAINT "cards_team_id_sets_up_corners_team_id_id_fk" FOREIGN KEY ("team_id","sets_up") REFERENCES "public"."corners"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cards" ADD CONSTRAINT "cards_team_id_compromised_for_corners_team_id_id_fk" FOREIGN KEY ("team_id","compromised_for") REFERENCES "public"."corners"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cars" ADD CONSTRAINT "cars_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cars" ADD CONSTRAINT "cars_team_id_made_by_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","made_by") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "conditions" ADD CONSTRAINT "conditions_team_id_book_id_books_team_id_id_fk" FOREIGN KEY ("team_id","book_id") REFERENCES "public"."books"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "centrelines" ADD CONSTRAINT "centrelines_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "circuits" ADD CONSTRAINT "circuits_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "circuits" ADD CONSTRAINT "circuits_team_id_made_by_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","made_by") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "corners" ADD CONSTRAINT "corners_team_id_layout_id_layouts_team_id_id_fk" FOREIGN KEY ("team_id","layout_id") REFERENCES "public"."layouts"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "corners" ADD CONSTRAINT "corners_team_id_layout_id_merged_into_corners_team_id_layout_id_id_fk" FOREIGN KEY ("team_id","layout_id","merged_into") REFERENCES "public"."corners"("team_id","layout_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "grounds" ADD CONSTRAINT "grounds_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "layouts" ADD CONSTRAINT "layouts_team_id_circuit_id_circuits_team_id_id_fk" FOREIGN KEY ("team_id","circuit_id") REFERENCES "public"."circuits"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "layouts" ADD CONSTRAINT "layouts_team_id_centreline_hash_centrelines_team_id_hash_fk" FOREIGN KEY ("team_id","centreline_hash") REFERENCES "public"."centrelines"("team_id","hash") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "layouts" ADD CONSTRAINT "layouts_team_id_ground_hash_grounds_team_id_hash_fk" FOREIGN KEY ("team_id","ground_hash") REFERENCES "public"."grounds"("team_id","hash") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "layouts" ADD CONSTRAINT "layouts_team_id_supersedes_layouts_team_id_id_fk" FOREIGN KEY ("team_id","supersedes") REFERENCES "public"."layouts"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "layouts" ADD CONSTRAINT "layouts_team_id_made_by_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","made_by") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "editions" ADD CONSTRAINT "editions_team_id_book_id_books_team_id_id_fk" FOREIGN KEY ("team_id","book_id") REFERENCES "public"."books"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "editions" ADD CONSTRAINT "editions_team_id_published_by_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","published_by") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "imports" ADD CONSTRAINT "imports_team_id_person_id_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","person_id") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "landmark_placements" ADD CONSTRAINT "landmark_placements_team_id_landmark_id_landmarks_team_id_id_fk" FOREIGN KEY ("team_id","landmark_id") REFERENCES "public"."landmarks"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "landmarks" ADD CONSTRAINT "landmarks_team_id_layout_id_layouts_team_id_id_fk" FOREIGN KEY ("team_id","layout_id") REFERENCES "public"."layouts"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "landmarks" ADD CONSTRAINT "landmarks_team_id_layout_id_corner_id_corners_team_id_layout_id_id_fk" FOREIGN KEY ("team_id","layout_id","corner_id") REFERENCES "public"."corners"("team_id","layout_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "landmarks" ADD CONSTRAINT "landmarks_team_id_made_by_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","made_by") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stretch_placements" ADD CONSTRAINT "stretch_placements_team_id_stretch_id_stretches_team_id_id_fk" FOREIGN KEY ("team_id","stretch_id") REFERENCES "public"."stretches"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stretches" ADD CONSTRAINT "stretches_team_id_layout_id_layouts_team_id_id_fk" FOREIGN KEY ("team_id","layout_id") REFERENCES "public"."layouts"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stretches" ADD CONSTRAINT "stretches_team_id_made_by_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","made_by") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "findings" ADD CONSTRAINT "findings_team_id_book_id_mark_id_marks_team_id_book_id_id_fk" FOREIGN KEY ("team_id","book_id","mark_id") REFERENCES "public"."marks"("team_id","book_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "findings" ADD CONSTRAINT "findings_team_id_book_id_condition_id_conditions_team_id_book_id_id_fk" FOREIGN KEY ("team_id","book_id","condition_id") REFERENCES "public"."conditions"("team_id","book_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "findings" ADD CONSTRAINT "findings_team_id_person_id_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","person_id") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "findings" ADD CONSTRAINT "findings_team_id_by_id_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","by_id") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "marks" ADD CONSTRAINT "marks_team_id_book_id_card_id_cards_team_id_book_id_id_fk" FOREIGN KEY ("team_id","book_id","card_id") REFERENCES "public"."cards"("team_id","book_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "marks" ADD CONSTRAINT "marks_team_id_book_id_condition_id_conditions_team_id_book_id_id_fk" FOREIGN KEY ("team_id","book_id","condition_id") REFERENCES "public"."conditions"("team_id","book_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "marks" ADD CONSTRAINT "marks_team_id_for_person_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","for_person") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "marks" ADD CONSTRAINT "marks_team_id_made_by_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","made_by") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "places" ADD CONSTRAINT "places_team_id_mark_id_marks_team_id_id_fk" FOREIGN KEY ("team_id","mark_id") REFERENCES "public"."marks"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ties" ADD CONSTRAINT "ties_team_id_mark_id_ground_places_team_id_mark_id_ground_fk" FOREIGN KEY ("team_id","mark_id","ground") REFERENCES "public"."places"("team_id","mark_id","ground") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ties" ADD CONSTRAINT "ties_team_id_landmark_id_landmarks_team_id_id_fk" FOREIGN KEY ("team_id","landmark_id") REFERENCES "public"."landmarks"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "changes" ADD CONSTRAINT "changes_team_id_book_id_books_team_id_id_fk" FOREIGN KEY ("team_id","book_id") REFERENCES "public"."books"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "changes" ADD CONSTRAINT "changes_team_id_layout_id_layouts_team_id_id_fk" FOREIGN KEY ("team_id","layout_id") REFERENCES "public"."layouts"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "changes" ADD CONSTRAINT "changes_team_id_operation_id_operations_team_id_id_fk" FOREIGN KEY ("team_id","operation_id") REFERENCES "public"."operations"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "changes" ADD CONSTRAINT "changes_team_id_by_id_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","by_id") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "changes" ADD CONSTRAINT "changes_team_id_accepted_by_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","accepted_by") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "operations" ADD CONSTRAINT "operations_team_id_book_id_books_team_id_id_fk" FOREIGN KEY ("team_id","book_id") REFERENCES "public"."books"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "operations" ADD CONSTRAINT "operations_team_id_layout_id_layouts_team_id_id_fk" FOREIGN KEY ("team_id","layout_id") REFERENCES "public"."layouts"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "operations" ADD CONSTRAINT "operations_team_id_person_id_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","person_id") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "operations" ADD CONSTRAINT "operations_team_id_decided_by_memberships_team_id_person_id_fk" FOREIGN KEY ("team_id","decided_by") REFERENCES "public"."memberships"("team_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "passwords" ADD CONSTRAINT "passwords_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "books_layout" ON "books" USING btree ("team_id","layout_id");--> statement-breakpoint
CREATE UNIQUE INDEX "cards_corner" ON "cards" USING btree ("team_id","book_id","corner_id");--> statement-breakpoint
CREATE INDEX "layouts_circuit" ON "layouts" USING btree ("team_id","circuit_id");--> statement-breakpoint
CREATE INDEX "imports_age" ON "imports" USING btree ("created_at");--> statement-breakpoint
CREATE INDEX "landmarks_layout" ON "landmarks" USING btree ("team_id","layout_id");--> statement-breakpoint
CREATE INDEX "stretches_layout" ON "stretches" USING btree ("team_id","layout_id");--> statement-breakpoint
CREATE INDEX "findings_book" ON "findings" USING btree ("team_id","book_id","mark_id");--> statement-breakpoint
CREATE INDEX "ties_landmark" ON "ties" USING btree ("team_id","landmark_id");--> statement-breakpoint
CREATE INDEX "changes_batch" ON "changes" USING btree ("team_id","batch");--> statement-breakpoint
CREATE INDEX "operations_proposed" ON "operations" USING btree ("team_id","arrival") WHERE status = 'proposed';--> statement-breakpoint
CREATE INDEX "operations_batch" ON "operations" USING btree ("team_id","batch");--> statement-breakpoint
CREATE INDEX "memberships_person" ON "memberships" USING btree ("person_id");--> statement-breakpoint
CREATE UNIQUE INDEX "people_email" ON "people" USING btree (lower("email"));--> statement-breakpoint
CREATE INDEX "sessions_person" ON "sessions" USING btree ("person_id");--> statement-breakpoint
CREATE INDEX "sessions_expiry" ON "sessions" USING btree ("expires_at");--> statement-breakpoint
CREATE INDEX "rate_limits_expire" ON "rate_limits" USING btree ("expire");