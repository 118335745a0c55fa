CREATE TABLE "activity" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"at" timestamp with time zone NOT NULL,
	"actor_id" uuid,
	"actor_name" text NOT NULL,
	"action" text NOT NULL,
	"entity" text NOT NULL,
	"entity_id" uuid NOT NULL,
	"summary" text NOT NULL,
	"before" jsonb,
	"after" jsonb,
	CONSTRAINT "activity_company_id" UNIQUE("company_id","id")
);
--> statement-breakpoint
CREATE TABLE "outbox" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"kind" text NOT NULL,
	"to" text NOT NULL,
	"subject" text NOT NULL,
	"text" text NOT NULL,
	"sent_at" timestamp with time zone,
	"provider_id" text,
	"error" text,
	CONSTRAINT "outbox_company_id" UNIQUE("company_id","id")
);
--> statement-breakpoint
CREATE TABLE "work_items" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"kind" text NOT NULL,
	"subject_id" uuid NOT NULL,
	"state" text DEFAULT 'waiting' NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"run_after" timestamp with time zone NOT NULL,
	"lease_until" timestamp with time zone,
	"last_error" text,
	"finished_at" timestamp with time zone,
	CONSTRAINT "work_items_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "work_items_once" UNIQUE("kind","subject_id")
);
--> statement-breakpoint
CREATE TABLE "companies" (
	"id" uuid PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"time_zone" text NOT NULL,
	"clock" text DEFAULT '12' NOT NULL,
	"foremen_see_prices" boolean DEFAULT false NOT NULL,
	"foremen_see_all_jobs" boolean DEFAULT false NOT NULL,
	"tolerances" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"is_demo" boolean DEFAULT false NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "job_crew" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"job_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	CONSTRAINT "job_crew_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "job_crew_once" UNIQUE("company_id","job_id","person_id")
);
--> statement-breakpoint
CREATE TABLE "jobs" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"number" text NOT NULL,
	"name" text NOT NULL,
	"customer" text DEFAULT '' NOT NULL,
	"address" text DEFAULT '' NOT NULL,
	"status" text DEFAULT 'open' NOT NULL,
	"taxable" boolean DEFAULT true NOT NULL,
	CONSTRAINT "jobs_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "jobs_number" UNIQUE("company_id","number")
);
--> statement-breakpoint
CREATE TABLE "placements" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"job_id" uuid NOT NULL,
	"name" text NOT NULL,
	"element" text NOT NULL,
	"subgrade" text DEFAULT '' NOT NULL,
	"pour_date" date NOT NULL,
	"first_truck_at" integer,
	"figured_yd3" numeric(14, 2) NOT NULL,
	"area_ft2" numeric(14, 2),
	"thickness_in" numeric(14, 2),
	"waste_percent" numeric(14, 2) DEFAULT '5' NOT NULL,
	"status" text DEFAULT 'planned' NOT NULL,
	"notes" text DEFAULT '' NOT NULL,
	CONSTRAINT "placements_company_id" UNIQUE("company_id","id")
);
--> statement-breakpoint
CREATE TABLE "order_lines" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"order_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"code" text NOT NULL,
	"description" text DEFAULT '' NOT NULL,
	"quantity" numeric(14, 2) NOT NULL,
	"unit" text NOT NULL,
	CONSTRAINT "order_lines_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "order_lines_position" UNIQUE("company_id","order_id","position")
);
--> statement-breakpoint
CREATE TABLE "order_versions" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"order_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"snapshot" jsonb NOT NULL,
	CONSTRAINT "order_versions_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "order_versions_version" UNIQUE("company_id","order_id","version")
);
--> statement-breakpoint
CREATE TABLE "orders" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"number" text NOT NULL,
	"supplier_id" uuid NOT NULL,
	"job_id" uuid NOT NULL,
	"placement_id" uuid,
	"status" text DEFAULT 'draft' NOT NULL,
	"pour_date" date NOT NULL,
	"first_truck_at" integer,
	"spacing_minutes" integer,
	"notes" text DEFAULT '' NOT NULL,
	"supplier_reference" text DEFAULT '' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"sent_at" timestamp with time zone,
	"confirmed_at" timestamp with time zone,
	"cancelled_at" timestamp with time zone,
	CONSTRAINT "orders_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "orders_number" UNIQUE("company_id","number")
);
--> statement-breakpoint
CREATE TABLE "access_keys" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"name" text NOT NULL,
	"token_hash" text NOT NULL,
	"last_four" text NOT NULL,
	"created_by" uuid NOT NULL,
	"last_used_at" timestamp with time zone,
	"revoked_at" timestamp with time zone,
	CONSTRAINT "access_keys_token_hash_unique" UNIQUE("token_hash"),
	CONSTRAINT "access_keys_company_id" UNIQUE("company_id","id")
);
--> statement-breakpoint
CREATE TABLE "invitations" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"role" text NOT NULL,
	"token_hash" text NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"accepted_at" timestamp with time zone,
	"withdrawn_at" timestamp with time zone,
	"invited_by" uuid NOT NULL,
	CONSTRAINT "invitations_token_hash_unique" UNIQUE("token_hash"),
	CONSTRAINT "invitations_company_id" UNIQUE("company_id","id")
);
--> statement-breakpoint
CREATE TABLE "password_resets" (
	"token_hash" text PRIMARY KEY NOT NULL,
	"person_id" uuid NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "people" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"role" text NOT NULL,
	"locale" text DEFAULT 'en' NOT NULL,
	"password_hash" text NOT NULL,
	"removed_at" timestamp with time zone,
	CONSTRAINT "people_email_unique" UNIQUE("email"),
	CONSTRAINT "people_company_id" UNIQUE("company_id","id")
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"id" text PRIMARY KEY NOT NULL,
	"user_id" uuid NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "bill_lines" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"supplier_id" uuid NOT NULL,
	"statement_id" uuid NOT NULL,
	"invoice_id" uuid,
	"position" integer NOT NULL,
	"source_line" integer,
	"row_key" text NOT NULL,
	"line_kind" text DEFAULT 'charge' NOT NULL,
	"charge_kind" text NOT NULL,
	"date" date,
	"ticket_number" text,
	"job_name" text,
	"truck" text,
	"description" text NOT NULL,
	"mix_code" text,
	"quantity" numeric(14, 2),
	"unit" text,
	"unit_price" numeric(14, 4),
	"amount" numeric(14, 2) NOT NULL,
	CONSTRAINT "bill_lines_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "bill_lines_row" UNIQUE("company_id","supplier_id","row_key"),
	CONSTRAINT "bill_lines_position" UNIQUE("company_id","statement_id","position")
);
--> statement-breakpoint
CREATE TABLE "import_layouts" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"supplier_id" uuid NOT NULL,
	"header_signature" text NOT NULL,
	"layout" jsonb NOT NULL,
	CONSTRAINT "import_layouts_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "import_layouts_header" UNIQUE("company_id","supplier_id","header_signature")
);
--> statement-breakpoint
CREATE TABLE "imports" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"supplier_id" uuid NOT NULL,
	"file_name" text NOT NULL,
	"sha256" text NOT NULL,
	"size_bytes" integer NOT NULL,
	"status" text DEFAULT 'preview' NOT NULL,
	"layout" jsonb,
	"statement_id" uuid,
	"uploaded_by" uuid,
	"accepted_at" timestamp with time zone,
	CONSTRAINT "imports_company_id" UNIQUE("company_id","id")
);
--> statement-breakpoint
CREATE TABLE "invoices" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"supplier_id" uuid NOT NULL,
	"statement_id" uuid NOT NULL,
	"number" text NOT NULL,
	"date" date,
	CONSTRAINT "invoices_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "invoices_number" UNIQUE("company_id","statement_id","number")
);
--> statement-breakpoint
CREATE TABLE "matches" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"bill_line_id" uuid NOT NULL,
	"ticket_id" uuid,
	"pump_ticket_id" uuid,
	"method" text NOT NULL,
	"confidence" double precision NOT NULL,
	"reason" text NOT NULL,
	"made_by" uuid,
	CONSTRAINT "matches_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "matches_ticket_once" UNIQUE("company_id","bill_line_id","ticket_id"),
	CONSTRAINT "matches_pump_ticket_once" UNIQUE("company_id","bill_line_id","pump_ticket_id")
);
--> statement-breakpoint
CREATE TABLE "statements" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"supplier_id" uuid NOT NULL,
	"number" text NOT NULL,
	"kind" text DEFAULT 'statement' NOT NULL,
	"period_start" date NOT NULL,
	"period_end" date NOT NULL,
	"opening_balance" numeric(14, 2),
	"closing_balance" numeric(14, 2),
	"status" text DEFAULT 'open' NOT NULL,
	"closed_at" timestamp with time zone,
	"closed_by" uuid,
	CONSTRAINT "statements_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "statements_number" UNIQUE("company_id","supplier_id","number")
);
--> statement-breakpoint
CREATE TABLE "strikes" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"statement_id" uuid NOT NULL,
	"row_key" text NOT NULL,
	"state" text NOT NULL,
	"reason" text DEFAULT '' NOT NULL,
	"made_by" uuid NOT NULL,
	"made_at" timestamp with time zone NOT NULL,
	CONSTRAINT "strikes_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "strikes_row" UNIQUE("company_id","statement_id","row_key")
);
--> statement-breakpoint
CREATE TABLE "variances" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"supplier_id" uuid NOT NULL,
	"statement_id" uuid NOT NULL,
	"key" text NOT NULL,
	"kind" text NOT NULL,
	"bill_line_id" uuid,
	"ticket_id" uuid,
	"pump_ticket_id" uuid,
	"clause_id" uuid,
	"expected" numeric(14, 2) NOT NULL,
	"billed" numeric(14, 2) NOT NULL,
	"difference" numeric(14, 2) NOT NULL,
	"sentence" text NOT NULL,
	"steps" jsonb NOT NULL,
	"status" text DEFAULT 'open' NOT NULL,
	"reason" text DEFAULT '' NOT NULL,
	"decided_by" uuid,
	"decided_at" timestamp with time zone,
	CONSTRAINT "variances_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "variances_key" UNIQUE("company_id","statement_id","key")
);
--> statement-breakpoint
CREATE TABLE "rate_clauses" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"rate_sheet_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"clause" jsonb NOT NULL,
	CONSTRAINT "rate_clauses_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "rate_clauses_position" UNIQUE("company_id","rate_sheet_id","position")
);
--> statement-breakpoint
CREATE TABLE "rate_sheets" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"supplier_id" uuid NOT NULL,
	"job_id" uuid,
	"name" text NOT NULL,
	"version" integer NOT NULL,
	"status" text DEFAULT 'draft' NOT NULL,
	"effective_from" date NOT NULL,
	"effective_to" date,
	"approved_by" uuid,
	"approved_at" timestamp with time zone,
	CONSTRAINT "rate_sheets_company_id" UNIQUE("company_id","id")
);
--> statement-breakpoint
CREATE TABLE "suppliers" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"name" text NOT NULL,
	"kind" text NOT NULL,
	"dispatch_email" text DEFAULT '' NOT NULL,
	"credit_email" text DEFAULT '' NOT NULL,
	"phone" text DEFAULT '' NOT NULL,
	"account_number" text DEFAULT '' NOT NULL,
	"archived" boolean DEFAULT false NOT NULL,
	CONSTRAINT "suppliers_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "suppliers_name" UNIQUE("company_id","name")
);
--> statement-breakpoint
CREATE TABLE "photos" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"ticket_id" uuid,
	"client_id" uuid NOT NULL,
	"sha256" text NOT NULL,
	"media_type" text NOT NULL,
	"width_px" integer NOT NULL,
	"height_px" integer NOT NULL,
	"size_bytes" bigint NOT NULL,
	"taken_by" uuid NOT NULL,
	CONSTRAINT "photos_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "photos_client" UNIQUE("company_id","client_id")
);
--> statement-breakpoint
CREATE TABLE "pump_tickets" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"supplier_id" uuid NOT NULL,
	"job_id" uuid NOT NULL,
	"placement_id" uuid,
	"order_id" uuid,
	"number" text NOT NULL,
	"date" date NOT NULL,
	"left_yard_at" integer,
	"arrived_at" integer,
	"finished_at" integer,
	"left_at" integer,
	"back_in_yard_at" integer,
	"pumped_yd3" numeric(14, 2) NOT NULL,
	"set_ups" integer DEFAULT 1 NOT NULL,
	"notes" text DEFAULT '' NOT NULL,
	CONSTRAINT "pump_tickets_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "pump_tickets_number" UNIQUE("company_id","supplier_id","number")
);
--> statement-breakpoint
CREATE TABLE "readings" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"photo_id" uuid NOT NULL,
	"state" text DEFAULT 'waiting' NOT NULL,
	"fields" jsonb,
	"failure_code" text,
	"failure_sentence" text,
	"finished_at" timestamp with time zone,
	CONSTRAINT "readings_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "readings_photo" UNIQUE("company_id","photo_id")
);
--> statement-breakpoint
CREATE TABLE "tickets" (
	"company_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"supplier_id" uuid,
	"job_id" uuid NOT NULL,
	"placement_id" uuid,
	"order_id" uuid,
	"status" text NOT NULL,
	"number" text DEFAULT '' NOT NULL,
	"date" date NOT NULL,
	"plant" text,
	"truck" text,
	"load_number" integer,
	"mix_code" text DEFAULT '' NOT NULL,
	"quantity_yd3" numeric(14, 2),
	"ordered_yd3" numeric(14, 2),
	"to_date_yd3" numeric(14, 2),
	"returned_yd3" numeric(14, 2),
	"batched_at" integer,
	"arrived_at" integer,
	"started_at" integer,
	"finished_at" integer,
	"left_at" integer,
	"water_added_gal" numeric(14, 2),
	"notes" text DEFAULT '' NOT NULL,
	"client_id" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"confirmed_by" uuid,
	"confirmed_at" timestamp with time zone,
	CONSTRAINT "tickets_company_id" UNIQUE("company_id","id"),
	CONSTRAINT "tickets_client" UNIQUE("company_id","client_id")
);
--> statement-breakpoint
ALTER TABLE "activity" ADD CONSTRAINT "activity_company_id_companies_id_fk" FOREIGN KEY ("company_id") REFERENCES "public"."companies"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "outbox" ADD CONSTRAINT "outbox_company_id_companies_id_fk" FOREIGN KEY ("company_id") REFERENCES "public"."companies"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "work_items" ADD CONSTRAINT "work_items_company_id_companies_id_fk" FOREIGN KEY ("company_id") REFERENCES "public"."companies"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "job_crew" ADD CONSTRAINT "job_crew_company_id_job_id_jobs_company_id_id_fk" FOREIGN KEY ("company_id","job_id") REFERENCES "public"."jobs"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "job_crew" ADD CONSTRAINT "job_crew_company_id_person_id_people_company_id_id_fk" FOREIGN KEY ("company_id","person_id") REFERENCES "public"."people"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "jobs" ADD CONSTRAINT "jobs_company_id_companies_id_fk" FOREIGN KEY ("company_id") REFERENCES "public"."companies"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "placements" ADD CONSTRAINT "placements_company_id_job_id_jobs_company_id_id_fk" FOREIGN KEY ("company_id","job_id") REFERENCES "public"."jobs"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "order_lines" ADD CONSTRAINT "order_lines_company_id_order_id_orders_company_id_id_fk" FOREIGN KEY ("company_id","order_id") REFERENCES "public"."orders"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "order_versions" ADD CONSTRAINT "order_versions_company_id_order_id_orders_company_id_id_fk" FOREIGN KEY ("company_id","order_id") REFERENCES "public"."orders"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "orders" ADD CONSTRAINT "orders_company_id_supplier_id_suppliers_company_id_id_fk" FOREIGN KEY ("company_id","supplier_id") REFERENCES "public"."suppliers"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "orders" ADD CONSTRAINT "orders_company_id_job_id_jobs_company_id_id_fk" FOREIGN KEY ("company_id","job_id") REFERENCES "public"."jobs"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "orders" ADD CONSTRAINT "orders_company_id_placement_id_placements_company_id_id_fk" FOREIGN KEY ("company_id","placement_id") REFERENCES "public"."placements"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "access_keys" ADD CONSTRAINT "access_keys_company_id_created_by_people_company_id_id_fk" FOREIGN KEY ("company_id","created_by") REFERENCES "public"."people"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_company_id_invited_by_people_company_id_id_fk" FOREIGN KEY ("company_id","invited_by") REFERENCES "public"."people"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "password_resets" ADD CONSTRAINT "password_resets_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "people" ADD CONSTRAINT "people_company_id_companies_id_fk" FOREIGN KEY ("company_id") REFERENCES "public"."companies"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_user_id_people_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bill_lines" ADD CONSTRAINT "bill_lines_company_id_statement_id_statements_company_id_id_fk" FOREIGN KEY ("company_id","statement_id") REFERENCES "public"."statements"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bill_lines" ADD CONSTRAINT "bill_lines_company_id_invoice_id_invoices_company_id_id_fk" FOREIGN KEY ("company_id","invoice_id") REFERENCES "public"."invoices"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "import_layouts" ADD CONSTRAINT "import_layouts_company_id_supplier_id_suppliers_company_id_id_fk" FOREIGN KEY ("company_id","supplier_id") REFERENCES "public"."suppliers"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "imports" ADD CONSTRAINT "imports_company_id_supplier_id_suppliers_company_id_id_fk" FOREIGN KEY ("company_id","supplier_id") REFERENCES "public"."suppliers"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invoices" ADD CONSTRAINT "invoices_company_id_statement_id_statements_company_id_id_fk" FOREIGN KEY ("company_id","statement_id") REFERENCES "public"."statements"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "matches" ADD CONSTRAINT "matches_company_id_bill_line_id_bill_lines_company_id_id_fk" FOREIGN KEY ("company_id","bill_line_id") REFERENCES "public"."bill_lines"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "matches" ADD CONSTRAINT "matches_company_id_ticket_id_tickets_company_id_id_fk" FOREIGN KEY ("company_id","ticket_id") REFERENCES "public"."tickets"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "matches" ADD CONSTRAINT "matches_company_id_pump_ticket_id_pump_tickets_company_id_id_fk" FOREIGN KEY ("company_id","pump_ticket_id") REFERENCES "public"."pump_tickets"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "matches" ADD CONSTRAINT "matches_company_id_made_by_people_company_id_id_fk" FOREIGN KEY ("company_id","made_by") REFERENCES "public"."people"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "statements" ADD CONSTRAINT "statements_company_id_supplier_id_suppliers_company_id_id_fk" FOREIGN KEY ("company_id","supplier_id") REFERENCES "public"."suppliers"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "strikes" ADD CONSTRAINT "strikes_company_id_statement_id_statements_company_id_id_fk" FOREIGN KEY ("company_id","statement_id") REFERENCES "public"."statements"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "strikes" ADD CONSTRAINT "strikes_company_id_made_by_people_company_id_id_fk" FOREIGN KEY ("company_id","made_by") REFERENCES "public"."people"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "variances" ADD CONSTRAINT "variances_company_id_statement_id_statements_company_id_id_fk" FOREIGN KEY ("company_id","statement_id") REFERENCES "public"."statements"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "variances" ADD CONSTRAINT "variances_company_id_bill_line_id_bill_lines_company_id_id_fk" FOREIGN KEY ("company_id","bill_line_id") REFERENCES "public"."bill_lines"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "variances" ADD CONSTRAINT "variances_company_id_ticket_id_tickets_company_id_id_fk" FOREIGN KEY ("company_id","ticket_id") REFERENCES "public"."tickets"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "variances" ADD CONSTRAINT "variances_company_id_pump_ticket_id_pump_tickets_company_id_id_fk" FOREIGN KEY ("company_id","pump_ticket_id") REFERENCES "public"."pump_tickets"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rate_clauses" ADD CONSTRAINT "rate_clauses_company_id_rate_sheet_id_rate_sheets_company_id_id_fk" FOREIGN KEY ("company_id","rate_sheet_id") REFERENCES "public"."rate_sheets"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rate_sheets" ADD CONSTRAINT "rate_sheets_company_id_supplier_id_suppliers_company_id_id_fk" FOREIGN KEY ("company_id","supplier_id") REFERENCES "public"."suppliers"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rate_sheets" ADD CONSTRAINT "rate_sheets_company_id_job_id_jobs_company_id_id_fk" FOREIGN KEY ("company_id","job_id") REFERENCES "public"."jobs"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "suppliers" ADD CONSTRAINT "suppliers_company_id_companies_id_fk" FOREIGN KEY ("company_id") REFERENCES "public"."companies"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photos" ADD CONSTRAINT "photos_company_id_ticket_id_tickets_company_id_id_fk" FOREIGN KEY ("company_id","ticket_id") REFERENCES "public"."tickets"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photos" ADD CONSTRAINT "photos_company_id_taken_by_people_company_id_id_fk" FOREIGN KEY ("company_id","taken_by") REFERENCES "public"."people"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pump_tickets" ADD CONSTRAINT "pump_tickets_company_id_supplier_id_suppliers_company_id_id_fk" FOREIGN KEY ("company_id","supplier_id") REFERENCES "public"."suppliers"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pump_tickets" ADD CONSTRAINT "pump_tickets_company_id_job_id_jobs_company_id_id_fk" FOREIGN KEY ("company_id","job_id") REFERENCES "public"."jobs"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pump_tickets" ADD CONSTRAINT "pump_tickets_company_id_placement_id_placements_company_id_id_fk" FOREIGN KEY ("company_id","placement_id") REFERENCES "public"."placements"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pump_tickets" ADD CONSTRAINT "pump_tickets_company_id_order_id_orders_company_id_id_fk" FOREIGN KEY ("company_id","order_id") REFERENCES "public"."orders"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "readings" ADD CONSTRAINT "readings_company_id_photo_id_photos_company_id_id_fk" FOREIGN KEY ("company_id","photo_id") REFERENCES "public"."photos"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tickets" ADD CONSTRAINT "tickets_company_id_supplier_id_suppliers_company_id_id_fk" FOREIGN KEY ("company_id","supplier_id") REFERENCES "public"."suppliers"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tickets" ADD CONSTRAINT "tickets_company_id_job_id_jobs_company_id_id_fk" FOREIGN KEY ("company_id","job_id") REFERENCES "public"."jobs"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tickets" ADD CONSTRAINT "tickets_company_id_placement_id_placements_company_id_id_fk" FOREIGN KEY ("company_id","placement_id") REFERENCES "public"."placements"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tickets" ADD CONSTRAINT "tickets_company_id_order_id_orders_company_id_id_fk" FOREIGN KEY ("company_id","order_id") REFERENCES "public"."orders"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tickets" ADD CONSTRAINT "tickets_company_id_confirmed_by_people_company_id_id_fk" FOREIGN KEY ("company_id","confirmed_by") REFERENCES "public"."people"("company_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "activity_at" ON "activity" USING btree ("company_id","at");--> statement-breakpoint
CREATE INDEX "activity_entity" ON "activity" USING btree ("company_id","entity","entity_id");--> statement-breakpoint
CREATE INDEX "outbox_created" ON "outbox" USING btree ("company_id","created_at");--> statement-breakpoint
CREATE INDEX "work_items_next" ON "work_items" USING btree ("state","run_after");--> statement-breakpoint
CREATE INDEX "placements_day" ON "placements" USING btree ("company_id","pour_date");--> statement-breakpoint
CREATE INDEX "orders_day" ON "orders" USING btree ("company_id","pour_date");--> statement-breakpoint
CREATE INDEX "sessions_user" ON "sessions" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "imports_file" ON "imports" USING btree ("company_id","supplier_id","sha256");--> statement-breakpoint
CREATE INDEX "statements_period" ON "statements" USING btree ("company_id","period_end");--> statement-breakpoint
CREATE INDEX "variances_open" ON "variances" USING btree ("company_id","status","supplier_id");--> statement-breakpoint
CREATE INDEX "photos_ticket" ON "photos" USING btree ("company_id","ticket_id");--> statement-breakpoint
CREATE INDEX "pump_tickets_supplier_day" ON "pump_tickets" USING btree ("company_id","supplier_id","date");--> statement-breakpoint
CREATE INDEX "tickets_supplier_day" ON "tickets" USING btree ("company_id","supplier_id","date");--> statement-breakpoint
CREATE INDEX "tickets_placement" ON "tickets" USING btree ("company_id","placement_id");--> statement-breakpoint
CREATE INDEX "tickets_number" ON "tickets" USING btree ("company_id","supplier_id","number");