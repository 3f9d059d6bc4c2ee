CREATE SEQUENCE "public"."order_numbers" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 4001 CACHE 1;--> statement-breakpoint
CREATE TABLE "account_tokens" (
	"token_hash" text PRIMARY KEY NOT NULL,
	"user_id" text NOT NULL,
	"purpose" text NOT NULL,
	"expires_at" timestamp (3) with time zone NOT NULL,
	"used_at" timestamp (3) with time zone,
	"created_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "account_tokens_purpose" CHECK ("account_tokens"."purpose" in ('check_mail', 'reset'))
);
--> statement-breakpoint
CREATE TABLE "audit" (
	"id" bigserial PRIMARY KEY NOT NULL,
	"at" timestamp (3) with time zone NOT NULL,
	"actor_user_id" text,
	"actor_kind" text NOT NULL,
	"action" text NOT NULL,
	"object_kind" text NOT NULL,
	"object_id" text NOT NULL,
	"detail" jsonb DEFAULT '{}'::jsonb NOT NULL
);
--> statement-breakpoint
CREATE TABLE "seller_invites" (
	"id" text PRIMARY KEY NOT NULL,
	"seller_id" text NOT NULL,
	"email" text NOT NULL,
	"duties" text[] NOT NULL,
	"token_hash" text NOT NULL,
	"invited_by" text NOT NULL,
	"expires_at" timestamp (3) with time zone NOT NULL,
	"accepted_at" timestamp (3) with time zone,
	"created_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "seller_invites_token_hash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "seller_members" (
	"seller_id" text NOT NULL,
	"user_id" text NOT NULL,
	"duties" text[] NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "seller_members_seller_id_user_id_pk" PRIMARY KEY("seller_id","user_id"),
	CONSTRAINT "seller_members_duties" CHECK (cardinality("seller_members"."duties") > 0 and "seller_members"."duties" <@ array['owner', 'lister', 'dock']::text[])
);
--> statement-breakpoint
CREATE TABLE "sellers" (
	"id" text PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"kind" text NOT NULL,
	"zip" text NOT NULL,
	"city" text NOT NULL,
	"region" text NOT NULL,
	"lat" double precision NOT NULL,
	"lon" double precision NOT NULL,
	"time_zone" text NOT NULL,
	"verified_at" timestamp (3) with time zone,
	"payout_account_id" text,
	"payouts_enabled" boolean DEFAULT false NOT NULL,
	"terms" jsonb NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"closed_at" timestamp (3) with time zone,
	CONSTRAINT "sellers_payout_account_id_unique" UNIQUE("payout_account_id"),
	CONSTRAINT "sellers_kind" CHECK ("sellers"."kind" in ('yard', 'rebuilder', 'private')),
	CONSTRAINT "sellers_place" CHECK ("sellers"."lat" between -90 and 90 and "sellers"."lon" between -180 and 180)
);
--> statement-breakpoint
CREATE TABLE "users" (
	"id" text PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"password_hash" text NOT NULL,
	"mail_checked_at" timestamp (3) with time zone,
	"is_admin" boolean DEFAULT false NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"closed_at" timestamp (3) with time zone
);
--> statement-breakpoint
CREATE TABLE "cases" (
	"id" text PRIMARY KEY NOT NULL,
	"order_id" text NOT NULL,
	"kind" text NOT NULL,
	"state" text DEFAULT 'open' NOT NULL,
	"reason" text NOT NULL,
	"opened_by" text,
	"opened_at" timestamp with time zone NOT NULL,
	"to_buyer_cents" bigint,
	"to_seller_cents" bigint,
	"finding" text,
	"settled_by" text,
	"settled_by_user_id" text,
	"settled_at" timestamp with time zone,
	"dispute_id" text,
	CONSTRAINT "cases_dispute_id_unique" UNIQUE("dispute_id"),
	CONSTRAINT "cases_kind" CHECK (kind in ('refusal','contest','chargeback')),
	CONSTRAINT "cases_amounts" CHECK (coalesce(to_buyer_cents,0) >= 0 and coalesce(to_seller_cents,0) >= 0),
	CONSTRAINT "cases_settled" CHECK ((state = 'settled') = (settled_at is not null))
);
--> statement-breakpoint
CREATE TABLE "case_proposals" (
	"id" text PRIMARY KEY NOT NULL,
	"case_id" text NOT NULL,
	"by" text NOT NULL,
	"by_user_id" text NOT NULL,
	"to_buyer_cents" bigint NOT NULL,
	"to_seller_cents" bigint NOT NULL,
	"note" text,
	"state" text DEFAULT 'open' NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	"ended_at" timestamp with time zone,
	CONSTRAINT "case_proposals_amounts" CHECK (to_buyer_cents >= 0 and to_seller_cents >= 0)
);
--> statement-breakpoint
CREATE TABLE "adapters" (
	"id" text PRIMARY KEY NOT NULL,
	"label" text NOT NULL,
	"interface" text NOT NULL,
	"from_value" jsonb NOT NULL,
	"to_value" jsonb NOT NULL,
	"adds_mm" integer NOT NULL,
	"cost_cents" integer NOT NULL,
	"source" text NOT NULL,
	CONSTRAINT "adapters_amounts" CHECK ("adapters"."adds_mm" >= 0 and "adapters"."cost_cents" >= 0),
	CONSTRAINT "adapters_source" CHECK ("adapters"."source" <> '')
);
--> statement-breakpoint
CREATE TABLE "families" (
	"id" text PRIMARY KEY NOT NULL,
	"kind" text NOT NULL,
	"maker_id" text NOT NULL,
	"maker" text NOT NULL,
	"designation" text NOT NULL,
	"gears" jsonb NOT NULL,
	"forward_ratios" jsonb NOT NULL,
	"reverse_ratio" double precision,
	"low_range" double precision,
	"control" text NOT NULL,
	"dry_weight_lb" integer NOT NULL,
	"length_mm" integer NOT NULL,
	"width_mm" integer NOT NULL,
	"height_mm" integer NOT NULL,
	"fluid" text NOT NULL,
	"fluid_litres" double precision NOT NULL,
	"bench_hours" jsonb NOT NULL,
	"failure_points" jsonb NOT NULL,
	"hard_parts" jsonb NOT NULL,
	"source" text NOT NULL,
	CONSTRAINT "families_kind" CHECK ("families"."kind" in ('automatic', 'manual', 'transfer_case', 'axle')),
	CONSTRAINT "families_control" CHECK ("families"."control" in ('hydraulic', 'electronic', 'none')),
	CONSTRAINT "families_reverse" CHECK ("families"."reverse_ratio" < 0),
	CONSTRAINT "families_low_range" CHECK ("families"."low_range" > 1),
	CONSTRAINT "families_sizes" CHECK ("families"."dry_weight_lb" > 0 and "families"."length_mm" > 0 and "families"."width_mm" > 0 and "families"."height_mm" > 0 and "families"."fluid_litres" > 0),
	CONSTRAINT "families_source" CHECK ("families"."source" <> '')
);
--> statement-breakpoint
CREATE TABLE "variants" (
	"id" text PRIMARY KEY NOT NULL,
	"family_id" text NOT NULL,
	"label" text NOT NULL,
	"year_from" integer NOT NULL,
	"year_to" integer NOT NULL,
	"built_from" date NOT NULL,
	"built_to" date NOT NULL,
	"interfaces" jsonb NOT NULL,
	"code_patterns" jsonb NOT NULL,
	"source" text NOT NULL,
	CONSTRAINT "variants_years" CHECK ("variants"."year_from" <= "variants"."year_to"),
	CONSTRAINT "variants_built" CHECK ("variants"."built_from" <= "variants"."built_to"),
	CONSTRAINT "variants_source" CHECK ("variants"."source" <> '')
);
--> statement-breakpoint
CREATE TABLE "vehicle_models" (
	"id" text PRIMARY KEY NOT NULL,
	"make" text NOT NULL,
	"model" text NOT NULL,
	"year_from" integer NOT NULL,
	"year_to" integer NOT NULL,
	"engine" text NOT NULL,
	"drive" text NOT NULL,
	"joints" jsonb NOT NULL,
	"axle_ratio" double precision NOT NULL,
	"tyre" text NOT NULL,
	"source" text NOT NULL,
	CONSTRAINT "vehicle_models_years" CHECK ("vehicle_models"."year_from" <= "vehicle_models"."year_to"),
	CONSTRAINT "vehicle_models_drive" CHECK ("vehicle_models"."drive" in ('4x2', '4x4')),
	CONSTRAINT "vehicle_models_source" CHECK ("vehicle_models"."source" <> '')
);
--> statement-breakpoint
CREATE TABLE "idempotency_keys" (
	"owner" text NOT NULL,
	"key" text NOT NULL,
	"fingerprint" text NOT NULL,
	"answer" jsonb,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "idempotency_keys_owner_key_pk" PRIMARY KEY("owner","key")
);
--> statement-breakpoint
CREATE TABLE "rate_limits" (
	"key" varchar(255) PRIMARY KEY NOT NULL,
	"points" integer DEFAULT 0 NOT NULL,
	"expire" bigint
);
--> statement-breakpoint
CREATE TABLE "session" (
	"sid" varchar PRIMARY KEY NOT NULL,
	"sess" json NOT NULL,
	"expire" timestamp (6) NOT NULL
);
--> statement-breakpoint
CREATE TABLE "outbox" (
	"seq" bigserial PRIMARY KEY NOT NULL,
	"key" text NOT NULL,
	"kind" text NOT NULL,
	"order_id" text,
	"payload" jsonb NOT NULL,
	"state" text DEFAULT 'waiting' NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"not_before" timestamp with time zone NOT NULL,
	"claimed_until" timestamp with time zone,
	"last_error" text,
	"result" jsonb,
	"created_at" timestamp with time zone NOT NULL,
	"done_at" timestamp with time zone,
	CONSTRAINT "outbox_key_unique" UNIQUE("key"),
	CONSTRAINT "outbox_state" CHECK (state in ('waiting','done','dead','blocked')),
	CONSTRAINT "outbox_kind" CHECK (kind in ('refund','transfer','expire_checkout','mail'))
);
--> statement-breakpoint
CREATE TABLE "donor_vehicles" (
	"id" text PRIMARY KEY NOT NULL,
	"seller_id" text NOT NULL,
	"vin" text,
	"description" text NOT NULL,
	"year" integer,
	"created_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "donor_vehicles_year" CHECK ("donor_vehicles"."year" between 1900 and 2100)
);
--> statement-breakpoint
CREATE TABLE "listing_photos" (
	"listing_id" text NOT NULL,
	"photo_id" text NOT NULL,
	"shot" text NOT NULL,
	"position" integer NOT NULL,
	CONSTRAINT "listing_photos_listing_id_photo_id_pk" PRIMARY KEY("listing_id","photo_id"),
	CONSTRAINT "listing_photos_position" CHECK ("listing_photos"."position" >= 0)
);
--> statement-breakpoint
CREATE TABLE "listings" (
	"id" text PRIMARY KEY NOT NULL,
	"seller_id" text NOT NULL,
	"donor_vehicle_id" text,
	"variant_id" text,
	"family_id" text,
	"kind" text,
	"title" text DEFAULT '' NOT NULL,
	"words" text DEFAULT '' NOT NULL,
	"case_code" text DEFAULT '' NOT NULL,
	"code_key" text collate "C" DEFAULT '' NOT NULL,
	"tag_code" text NOT NULL,
	"grade" text,
	"state" text NOT NULL,
	"status" text DEFAULT 'draft' NOT NULL,
	"mileage" integer,
	"rebuilt" boolean DEFAULT false NOT NULL,
	"condition" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"price_cents" bigint,
	"exchange" boolean DEFAULT false NOT NULL,
	"deposit_cents" bigint,
	"outright" boolean DEFAULT false NOT NULL,
	"outright_cents" bigint,
	"total_cents" bigint,
	"window_days" integer,
	"schedule" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"return_freight" text,
	"freight" jsonb,
	"ship_days" integer DEFAULT 3 NOT NULL,
	"notes" text DEFAULT '' NOT NULL,
	"zip" text NOT NULL,
	"lat" double precision,
	"lon" double precision,
	"photo_count" integer DEFAULT 0 NOT NULL,
	"cover_photo_id" text,
	"search" "tsvector" GENERATED ALWAYS AS (setweight(to_tsvector('simple', title), 'A') ||
        setweight(to_tsvector('simple', case_code || ' ' || code_key || ' ' || words), 'B') ||
        setweight(to_tsvector('simple', notes), 'C')) STORED,
	"created_at" timestamp (3) with time zone NOT NULL,
	"updated_at" timestamp (3) with time zone NOT NULL,
	"published_at" timestamp (3) with time zone,
	"listed_at" timestamp (3) with time zone,
	"sold_at" timestamp (3) with time zone,
	"version" integer DEFAULT 0 NOT NULL,
	CONSTRAINT "listings_kind" CHECK ("listings"."kind" in ('automatic', 'manual', 'transfer_case', 'axle')),
	CONSTRAINT "listings_grade" CHECK ("listings"."grade" in ('A', 'B', 'C', 'D')),
	CONSTRAINT "listings_state" CHECK ("listings"."state" in ('in_vehicle', 'pulled')),
	CONSTRAINT "listings_status" CHECK ("listings"."status" in ('draft', 'live', 'reserved', 'sold', 'withdrawn')),
	CONSTRAINT "listings_return_freight" CHECK ("listings"."return_freight" in ('seller', 'builder')),
	CONSTRAINT "listings_amounts" CHECK ("listings"."price_cents" >= 0 and "listings"."deposit_cents" >= 0 and "listings"."outright_cents" >= 0 and "listings"."total_cents" >= 0),
	CONSTRAINT "listings_counts" CHECK ("listings"."mileage" >= 0 and "listings"."photo_count" >= 0 and "listings"."ship_days" between 0 and 60 and "listings"."version" >= 0),
	CONSTRAINT "listings_window" CHECK ("listings"."window_days" between 7 and 180),
	CONSTRAINT "listings_exchange_whole" CHECK (not "listings"."exchange" or "listings"."status" = 'draft' or
          ("listings"."deposit_cents" is not null and "listings"."window_days" is not null and "listings"."return_freight" is not null)),
	CONSTRAINT "listings_offered_whole" CHECK ("listings"."status" not in ('live', 'reserved', 'sold') or (
          "listings"."variant_id" is not null and "listings"."family_id" is not null and "listings"."kind" is not null and "listings"."grade" is not null
          and "listings"."title" <> '' and "listings"."code_key" <> '' and "listings"."price_cents" is not null and "listings"."total_cents" is not null
          and ("listings"."exchange" or "listings"."outright") and (not "listings"."outright" or "listings"."outright_cents" is not null)
          and "listings"."freight" is not null and "listings"."listed_at" is not null and "listings"."published_at" is not null
          and "listings"."cover_photo_id" is not null and "listings"."photo_count" > 0))
);
--> statement-breakpoint
CREATE TABLE "ledger_balances" (
	"order_id" text NOT NULL,
	"account" text NOT NULL,
	"leg" text NOT NULL,
	"cents" bigint NOT NULL,
	CONSTRAINT "ledger_balances_order_id_account_leg_pk" PRIMARY KEY("order_id","account","leg"),
	CONSTRAINT "ledger_balances_not_negative" CHECK (account not in ('hold','tax','payable','refund') or cents >= 0)
);
--> statement-breakpoint
CREATE TABLE "ledger_entries" (
	"id" text PRIMARY KEY NOT NULL,
	"key" text NOT NULL,
	"event" text NOT NULL,
	"order_id" text NOT NULL,
	"at" timestamp with time zone NOT NULL,
	CONSTRAINT "ledger_entries_key_unique" UNIQUE("key")
);
--> statement-breakpoint
CREATE TABLE "ledger_postings" (
	"id" bigserial PRIMARY KEY NOT NULL,
	"entry_id" text NOT NULL,
	"account" text NOT NULL,
	"order_id" text NOT NULL,
	"leg" text,
	"seller_id" text,
	"cents" bigint NOT NULL,
	CONSTRAINT "ledger_postings_not_zero" CHECK (cents <> 0),
	CONSTRAINT "ledger_postings_account" CHECK (account in ('provider','hold','tax','fee','payable','refund','dispute','loss')),
	CONSTRAINT "ledger_postings_leg" CHECK ((account = 'hold') = (leg is not null)),
	CONSTRAINT "ledger_postings_seller_known" CHECK (account <> 'payable' or seller_id is not null)
);
--> statement-breakpoint
CREATE TABLE "provider_events" (
	"id" text PRIMARY KEY NOT NULL,
	"type" text NOT NULL,
	"object_id" text NOT NULL,
	"raw" jsonb NOT NULL,
	"received_at" timestamp with time zone NOT NULL,
	"applied_at" timestamp with time zone,
	"attempts" integer DEFAULT 0 NOT NULL,
	"last_error" text
);
--> statement-breakpoint
CREATE TABLE "provider_objects" (
	"id" text PRIMARY KEY NOT NULL,
	"kind" text NOT NULL,
	"order_id" text NOT NULL,
	"cents" bigint NOT NULL,
	"state" text NOT NULL,
	"outbox_key" text,
	"provider_charge_id" text,
	"created_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "messages" (
	"id" text PRIMARY KEY NOT NULL,
	"order_id" text NOT NULL,
	"author_id" text NOT NULL,
	"side" text NOT NULL,
	"text" text NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	CONSTRAINT "messages_side" CHECK (side in ('builder','seller','admin')),
	CONSTRAINT "messages_text" CHECK (length(text) between 1 and 4000)
);
--> statement-breakpoint
CREATE TABLE "deadlines" (
	"id" text PRIMARY KEY NOT NULL,
	"order_id" text NOT NULL,
	"clock" text NOT NULL,
	"due_at" timestamp with time zone NOT NULL,
	"state" text DEFAULT 'open' NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	"ended_at" timestamp with time zone,
	CONSTRAINT "deadlines_state" CHECK (state in ('open','fired','stopped'))
);
--> statement-breakpoint
CREATE TABLE "orders" (
	"id" text PRIMARY KEY NOT NULL,
	"number" text DEFAULT nextval('order_numbers')::text NOT NULL,
	"listing_id" text NOT NULL,
	"builder_id" text NOT NULL,
	"seller_id" text NOT NULL,
	"version" integer DEFAULT 0 NOT NULL,
	"outbound" text NOT NULL,
	"core" text,
	"terms" text NOT NULL,
	"title" text NOT NULL,
	"case_code" text NOT NULL,
	"family_id" text NOT NULL,
	"delivery" jsonb NOT NULL,
	"delivery_method" text NOT NULL,
	"price_cents" bigint NOT NULL,
	"deposit_cents" bigint NOT NULL,
	"freight_cents" bigint NOT NULL,
	"tax_cents" bigint NOT NULL,
	"fee_cents" bigint NOT NULL,
	"schedule" jsonb NOT NULL,
	"window_days" integer NOT NULL,
	"return_freight" text NOT NULL,
	"ship_days" integer NOT NULL,
	"grace_days" integer NOT NULL,
	"zone" text NOT NULL,
	"tag_code" text NOT NULL,
	"pickup_code" text NOT NULL,
	"checkout_session_id" text,
	"checkout_url" text,
	"checkout_expires_at" timestamp with time zone NOT NULL,
	"payment_intent_id" text,
	"carrier" text,
	"tracking" text,
	"due_at" timestamp with time zone,
	"other_core_allowed" boolean DEFAULT false NOT NULL,
	"core_tag_code" text NOT NULL,
	"core_case_code" text,
	"core_method" text,
	"core_carrier" text,
	"core_tracking" text,
	"core_sent_at" timestamp with time zone,
	"core_received_at" timestamp with time zone,
	"core_graded_at" timestamp with time zone,
	"grade" text,
	"deductions" jsonb,
	"frozen" boolean DEFAULT false NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	"updated_at" timestamp with time zone NOT NULL,
	"paid_at" timestamp with time zone,
	"shipped_at" timestamp with time zone,
	"delivered_at" timestamp with time zone,
	"closed_at" timestamp with time zone,
	CONSTRAINT "orders_number_unique" UNIQUE("number"),
	CONSTRAINT "orders_checkout_session_id_unique" UNIQUE("checkout_session_id"),
	CONSTRAINT "orders_payment_intent_id_unique" UNIQUE("payment_intent_id"),
	CONSTRAINT "orders_core_tag_code_unique" UNIQUE("core_tag_code"),
	CONSTRAINT "orders_amounts" CHECK (price_cents >= 0 and deposit_cents >= 0 and freight_cents >= 0 and tax_cents >= 0),
	CONSTRAINT "orders_fee" CHECK (fee_cents >= 0 and fee_cents <= price_cents),
	CONSTRAINT "orders_outbound_state" CHECK (outbound in ('awaiting_payment','paid','packed','in_transit','collected','delivered','accepted','refused','settled','cancelled')),
	CONSTRAINT "orders_core_state" CHECK (core is null or core in ('held','due','booked','coming_back','at_dock','graded','contested','kept','lapsed','settled','released')),
	CONSTRAINT "orders_core_with_exchange" CHECK ((core is not null) = (terms = 'exchange')),
	CONSTRAINT "orders_due_once_delivered" CHECK (core not in ('due','booked') or due_at is not null),
	CONSTRAINT "orders_graded" CHECK (core <> 'graded' or (grade is not null and deductions is not null)),
	CONSTRAINT "orders_window" CHECK (window_days between 0 and 400 and ship_days between 0 and 60)
);
--> statement-breakpoint
CREATE TABLE "order_timeline" (
	"seq" bigserial PRIMARY KEY NOT NULL,
	"order_id" text NOT NULL,
	"at" timestamp with time zone NOT NULL,
	"action" text NOT NULL,
	"by" text NOT NULL,
	"actor_user_id" text,
	"note" text,
	"log" text NOT NULL,
	"version" integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE "photo_links" (
	"photo_id" text NOT NULL,
	"object_kind" text NOT NULL,
	"object_id" text NOT NULL,
	CONSTRAINT "photo_links_photo_id_object_kind_object_id_pk" PRIMARY KEY("photo_id","object_kind","object_id"),
	CONSTRAINT "photo_links_kind" CHECK ("photo_links"."object_kind" in ('listing', 'order', 'case', 'message'))
);
--> statement-breakpoint
CREATE TABLE "photo_puts" (
	"id" text PRIMARY KEY NOT NULL,
	"sha256" text NOT NULL,
	"started_at" timestamp (3) with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "photos" (
	"id" text PRIMARY KEY NOT NULL,
	"owner_user_id" text NOT NULL,
	"seller_id" text,
	"purpose" text NOT NULL,
	"shot" text,
	"position" integer DEFAULT 0 NOT NULL,
	"sha256" text NOT NULL,
	"stored_sha256" text NOT NULL,
	"width_px" integer NOT NULL,
	"height_px" integer NOT NULL,
	"taken_at" timestamp (3) with time zone,
	"bytes" integer NOT NULL,
	"drawn" boolean DEFAULT false NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"removed_at" timestamp (3) with time zone,
	CONSTRAINT "photos_purpose" CHECK ("photos"."purpose" in ('listing', 'pack', 'refuse', 'core', 'grade', 'contest', 'case')),
	CONSTRAINT "photos_sizes" CHECK ("photos"."width_px" > 0 and "photos"."height_px" > 0 and "photos"."bytes" > 0),
	CONSTRAINT "photos_hash" CHECK ("photos"."sha256" ~ '^[0-9a-f]{64}$' and "photos"."stored_sha256" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
CREATE TABLE "demo_clock" (
	"id" integer PRIMARY KEY NOT NULL,
	"offset_ms" bigint DEFAULT 0 NOT NULL,
	CONSTRAINT "demo_clock_one_row" CHECK ("demo_clock"."id" = 1),
	CONSTRAINT "demo_clock_forward" CHECK ("demo_clock"."offset_ms" >= 0)
);
--> statement-breakpoint
ALTER TABLE "account_tokens" ADD CONSTRAINT "account_tokens_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit" ADD CONSTRAINT "audit_actor_user_id_users_id_fk" FOREIGN KEY ("actor_user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "seller_invites" ADD CONSTRAINT "seller_invites_seller_id_sellers_id_fk" FOREIGN KEY ("seller_id") REFERENCES "public"."sellers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "seller_invites" ADD CONSTRAINT "seller_invites_invited_by_users_id_fk" FOREIGN KEY ("invited_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "seller_members" ADD CONSTRAINT "seller_members_seller_id_sellers_id_fk" FOREIGN KEY ("seller_id") REFERENCES "public"."sellers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "seller_members" ADD CONSTRAINT "seller_members_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cases" ADD CONSTRAINT "cases_order_id_orders_id_fk" FOREIGN KEY ("order_id") REFERENCES "public"."orders"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cases" ADD CONSTRAINT "cases_opened_by_users_id_fk" FOREIGN KEY ("opened_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cases" ADD CONSTRAINT "cases_settled_by_user_id_users_id_fk" FOREIGN KEY ("settled_by_user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "case_proposals" ADD CONSTRAINT "case_proposals_case_id_cases_id_fk" FOREIGN KEY ("case_id") REFERENCES "public"."cases"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "case_proposals" ADD CONSTRAINT "case_proposals_by_user_id_users_id_fk" FOREIGN KEY ("by_user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "variants" ADD CONSTRAINT "variants_family_id_families_id_fk" FOREIGN KEY ("family_id") REFERENCES "public"."families"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "donor_vehicles" ADD CONSTRAINT "donor_vehicles_seller_id_sellers_id_fk" FOREIGN KEY ("seller_id") REFERENCES "public"."sellers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "listing_photos" ADD CONSTRAINT "listing_photos_listing_id_listings_id_fk" FOREIGN KEY ("listing_id") REFERENCES "public"."listings"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "listing_photos" ADD CONSTRAINT "listing_photos_photo_id_photos_id_fk" FOREIGN KEY ("photo_id") REFERENCES "public"."photos"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "listings" ADD CONSTRAINT "listings_seller_id_sellers_id_fk" FOREIGN KEY ("seller_id") REFERENCES "public"."sellers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "listings" ADD CONSTRAINT "listings_donor_vehicle_id_donor_vehicles_id_fk" FOREIGN KEY ("donor_vehicle_id") REFERENCES "public"."donor_vehicles"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "listings" ADD CONSTRAINT "listings_variant_id_variants_id_fk" FOREIGN KEY ("variant_id") REFERENCES "public"."variants"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "listings" ADD CONSTRAINT "listings_family_id_families_id_fk" FOREIGN KEY ("family_id") REFERENCES "public"."families"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "listings" ADD CONSTRAINT "listings_cover_photo_id_photos_id_fk" FOREIGN KEY ("cover_photo_id") REFERENCES "public"."photos"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ledger_postings" ADD CONSTRAINT "ledger_postings_entry_id_ledger_entries_id_fk" FOREIGN KEY ("entry_id") REFERENCES "public"."ledger_entries"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "messages" ADD CONSTRAINT "messages_order_id_orders_id_fk" FOREIGN KEY ("order_id") REFERENCES "public"."orders"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "messages" ADD CONSTRAINT "messages_author_id_users_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "deadlines" ADD CONSTRAINT "deadlines_order_id_orders_id_fk" FOREIGN KEY ("order_id") REFERENCES "public"."orders"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "orders" ADD CONSTRAINT "orders_listing_id_listings_id_fk" FOREIGN KEY ("listing_id") REFERENCES "public"."listings"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "orders" ADD CONSTRAINT "orders_builder_id_users_id_fk" FOREIGN KEY ("builder_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "orders" ADD CONSTRAINT "orders_seller_id_sellers_id_fk" FOREIGN KEY ("seller_id") REFERENCES "public"."sellers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "order_timeline" ADD CONSTRAINT "order_timeline_order_id_orders_id_fk" FOREIGN KEY ("order_id") REFERENCES "public"."orders"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "order_timeline" ADD CONSTRAINT "order_timeline_actor_user_id_users_id_fk" FOREIGN KEY ("actor_user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photo_links" ADD CONSTRAINT "photo_links_photo_id_photos_id_fk" FOREIGN KEY ("photo_id") REFERENCES "public"."photos"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photos" ADD CONSTRAINT "photos_owner_user_id_users_id_fk" FOREIGN KEY ("owner_user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photos" ADD CONSTRAINT "photos_seller_id_sellers_id_fk" FOREIGN KEY ("seller_id") REFERENCES "public"."sellers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "account_tokens_user" ON "account_tokens" USING btree ("user_id","purpose");--> statement-breakpoint
CREATE INDEX "audit_object" ON "audit" USING btree ("object_kind","object_id","id");--> statement-breakpoint
CREATE INDEX "audit_actor" ON "audit" USING btree ("actor_user_id","id");--> statement-breakpoint
CREATE INDEX "seller_invites_seller" ON "seller_invites" USING btree ("seller_id");--> statement-breakpoint
CREATE INDEX "seller_members_user" ON "seller_members" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "sellers_place_box" ON "sellers" USING btree ("lat","lon");--> statement-breakpoint
CREATE UNIQUE INDEX "users_email" ON "users" USING btree (lower("email"));--> statement-breakpoint
CREATE UNIQUE INDEX "cases_one_open" ON "cases" USING btree ("order_id","kind") WHERE state = 'open';--> statement-breakpoint
CREATE INDEX "cases_open" ON "cases" USING btree ("opened_at") WHERE state = 'open';--> statement-breakpoint
CREATE UNIQUE INDEX "case_proposals_one_open" ON "case_proposals" USING btree ("case_id","by") WHERE state = 'open';--> statement-breakpoint
CREATE INDEX "adapters_interface" ON "adapters" USING btree ("interface");--> statement-breakpoint
CREATE UNIQUE INDEX "families_name" ON "families" USING btree ("maker_id","designation");--> statement-breakpoint
CREATE INDEX "families_kind_name" ON "families" USING btree ("kind","maker","designation");--> statement-breakpoint
CREATE UNIQUE INDEX "variants_label" ON "variants" USING btree ("family_id","label");--> statement-breakpoint
CREATE UNIQUE INDEX "vehicle_models_name" ON "vehicle_models" USING btree ("make","model","engine","drive","year_from");--> statement-breakpoint
CREATE INDEX "idempotency_keys_age" ON "idempotency_keys" USING btree ("created_at");--> statement-breakpoint
CREATE INDEX "session_expire" ON "session" USING btree ("expire");--> statement-breakpoint
CREATE INDEX "outbox_waiting" ON "outbox" USING btree ("not_before","seq") WHERE state = 'waiting';--> statement-breakpoint
CREATE INDEX "outbox_order" ON "outbox" USING btree ("order_id");--> statement-breakpoint
CREATE INDEX "outbox_not_done" ON "outbox" USING btree ("state") WHERE state in ('dead','blocked');--> statement-breakpoint
CREATE INDEX "donor_vehicles_seller" ON "donor_vehicles" USING btree ("seller_id","id");--> statement-breakpoint
CREATE INDEX "listing_photos_photo" ON "listing_photos" USING btree ("photo_id");--> statement-breakpoint
CREATE UNIQUE INDEX "listings_tag_code" ON "listings" USING btree ("tag_code");--> statement-breakpoint
CREATE INDEX "listings_live_total" ON "listings" USING btree ("total_cents","id") WHERE status = 'live';--> statement-breakpoint
CREATE INDEX "listings_live_listed" ON "listings" USING btree ("listed_at","id") WHERE status = 'live';--> statement-breakpoint
CREATE INDEX "listings_live_family_total" ON "listings" USING btree ("family_id","total_cents","id") WHERE status = 'live';--> statement-breakpoint
CREATE INDEX "listings_live_family_listed" ON "listings" USING btree ("family_id","listed_at","id") WHERE status = 'live';--> statement-breakpoint
CREATE INDEX "listings_live_kind_total" ON "listings" USING btree ("kind","total_cents","id") WHERE status = 'live';--> statement-breakpoint
CREATE INDEX "listings_live_kind_listed" ON "listings" USING btree ("kind","listed_at","id") WHERE status = 'live';--> statement-breakpoint
CREATE INDEX "listings_live_variant_total" ON "listings" USING btree ("variant_id","total_cents","id") WHERE status = 'live';--> statement-breakpoint
CREATE INDEX "listings_live_code" ON "listings" USING btree ("code_key","total_cents","id") WHERE status = 'live';--> statement-breakpoint
CREATE INDEX "listings_live_seller_total" ON "listings" USING btree ("seller_id","total_cents","id") WHERE status = 'live';--> statement-breakpoint
CREATE INDEX "listings_live_seller_listed" ON "listings" USING btree ("seller_id","listed_at","id") WHERE status = 'live';--> statement-breakpoint
CREATE INDEX "listings_live_family_seller" ON "listings" USING btree ("family_id","seller_id","total_cents","id") WHERE status = 'live';--> statement-breakpoint
CREATE INDEX "listings_live_words" ON "listings" USING gin ("family_id","search") WITH (fastupdate=false) WHERE status = 'live';--> statement-breakpoint
CREATE INDEX "listings_live_title" ON "listings" USING gin ("title" gin_trgm_ops) WHERE status = 'live';--> statement-breakpoint
CREATE INDEX "listings_seller_status" ON "listings" USING btree ("seller_id","status","created_at","id");--> statement-breakpoint
CREATE INDEX "ledger_entries_order" ON "ledger_entries" USING btree ("order_id","at","id");--> statement-breakpoint
CREATE INDEX "ledger_entries_at" ON "ledger_entries" USING btree ("at","id");--> statement-breakpoint
CREATE INDEX "ledger_postings_entry" ON "ledger_postings" USING btree ("entry_id");--> statement-breakpoint
CREATE INDEX "ledger_postings_order" ON "ledger_postings" USING btree ("order_id","account");--> statement-breakpoint
CREATE INDEX "ledger_postings_account" ON "ledger_postings" USING btree ("account");--> statement-breakpoint
CREATE INDEX "ledger_postings_seller" ON "ledger_postings" USING btree ("seller_id","account");--> statement-breakpoint
CREATE INDEX "provider_events_waiting" ON "provider_events" USING btree ("received_at") WHERE applied_at is null;--> statement-breakpoint
CREATE INDEX "provider_objects_order" ON "provider_objects" USING btree ("order_id");--> statement-breakpoint
CREATE UNIQUE INDEX "provider_objects_key" ON "provider_objects" USING btree ("outbox_key");--> statement-breakpoint
CREATE INDEX "messages_order" ON "messages" USING btree ("order_id","created_at","id");--> statement-breakpoint
CREATE UNIQUE INDEX "deadlines_one_open" ON "deadlines" USING btree ("order_id","clock") WHERE state = 'open';--> statement-breakpoint
CREATE INDEX "deadlines_due" ON "deadlines" USING btree ("due_at") WHERE state = 'open';--> statement-breakpoint
CREATE UNIQUE INDEX "orders_one_live_per_listing" ON "orders" USING btree ("listing_id") WHERE outbound in ('awaiting_payment','paid','packed','in_transit','collected','delivered','refused');--> statement-breakpoint
CREATE INDEX "orders_builder" ON "orders" USING btree ("builder_id","created_at" DESC NULLS LAST,"id" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "orders_seller" ON "orders" USING btree ("seller_id","created_at" DESC NULLS LAST,"id" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "orders_newest" ON "orders" USING btree ("created_at" DESC NULLS LAST,"id" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "orders_tag" ON "orders" USING btree ("tag_code");--> statement-breakpoint
CREATE UNIQUE INDEX "order_timeline_version" ON "order_timeline" USING btree ("order_id","version");--> statement-breakpoint
CREATE INDEX "photo_links_object" ON "photo_links" USING btree ("object_kind","object_id");--> statement-breakpoint
CREATE INDEX "photo_puts_age" ON "photo_puts" USING btree ("started_at");--> statement-breakpoint
CREATE INDEX "photos_owner_age" ON "photos" USING btree ("owner_user_id","created_at");--> statement-breakpoint
CREATE INDEX "photos_hash_live" ON "photos" USING btree ("sha256");--> statement-breakpoint
CREATE INDEX "photos_removed" ON "photos" USING btree ("removed_at") WHERE "photos"."removed_at" is not null;