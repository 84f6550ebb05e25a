CREATE SEQUENCE "public"."record_numbers" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1;--> statement-breakpoint
CREATE TABLE "accounts" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"user_id" uuid NOT NULL,
	"account_id" text NOT NULL,
	"provider_id" text NOT NULL,
	"access_token" text,
	"refresh_token" text,
	"id_token" text,
	"access_token_expires_at" timestamp (3) with time zone,
	"refresh_token_expires_at" timestamp (3) with time zone,
	"scope" text,
	"password" text,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "one_time_links" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"token_hash" text NOT NULL,
	"purpose" text NOT NULL,
	"expires_at" timestamp (3) with time zone NOT NULL,
	"used_at" timestamp (3) with time zone,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "one_time_links_token_hash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "rate_limits" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"key" text NOT NULL,
	"count" integer NOT NULL,
	"last_request" bigint NOT NULL,
	CONSTRAINT "rate_limits_key_unique" UNIQUE("key")
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"user_id" uuid NOT NULL,
	"token" text NOT NULL,
	"expires_at" timestamp (3) with time zone NOT NULL,
	"ip_address" text,
	"user_agent" text,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sessions_token_unique" UNIQUE("token")
);
--> statement-breakpoint
CREATE TABLE "users" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"email_verified" boolean DEFAULT false NOT NULL,
	"image" text,
	"orcid" text,
	"kind" text DEFAULT 'person' NOT NULL,
	"demonstration" boolean DEFAULT false NOT NULL,
	"disabled_at" timestamp (3) with time zone,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "users_email_unique" UNIQUE("email"),
	CONSTRAINT "users_orcid_unique" UNIQUE("orcid"),
	CONSTRAINT "users_kind" CHECK ("users"."kind" in ('person', 'system'))
);
--> statement-breakpoint
CREATE TABLE "verifications" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"identifier" text NOT NULL,
	"value" text NOT NULL,
	"expires_at" timestamp (3) with time zone NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "fit_results" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"run_id" uuid NOT NULL,
	"standing_fit_id" uuid NOT NULL,
	"set" text NOT NULL,
	"version_id" uuid,
	"latest" boolean DEFAULT false NOT NULL,
	"inputs" jsonb NOT NULL,
	"exclusions" jsonb NOT NULL,
	"result" jsonb NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "fit_results_once" UNIQUE("run_id","standing_fit_id")
);
--> statement-breakpoint
CREATE TABLE "fit_runs" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"set" text NOT NULL,
	"version_id" uuid,
	"reason" text DEFAULT '' NOT NULL,
	"touches" uuid[] DEFAULT '{}' NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"finished_at" timestamp (3) with time zone,
	CONSTRAINT "fit_runs_set" CHECK (("fit_runs"."set" = 'working' and "fit_runs"."version_id" is null) or ("fit_runs"."set" = 'version' and "fit_runs"."version_id" is not null))
);
--> statement-breakpoint
CREATE TABLE "flags" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"fit_result_id" uuid NOT NULL,
	"record_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"studentised" double precision,
	"bonferroni_p" double precision,
	"reasons" text[] NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "flags_once" UNIQUE("fit_result_id","record_id","kind"),
	CONSTRAINT "flags_kind" CHECK ("flags"."kind" in ('watch', 'outlier', 'influential'))
);
--> statement-breakpoint
CREATE TABLE "standing_fits" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"slug" text NOT NULL,
	"y" text NOT NULL,
	"y_structure" text,
	"x" text NOT NULL,
	"x_structure" text,
	"clade_id" uuid NOT NULL,
	"method" text NOT NULL,
	"active" boolean DEFAULT true NOT NULL,
	"created_by" uuid,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "standing_fits_slug_unique" UNIQUE("slug"),
	CONSTRAINT "standing_fits_y" CHECK (y in ('bodyMassG', 'structureMassG', 'cells', 'neurons', 'otherCells', 'neuronsPerMg', 'cellsPerMg', 'otherToNeuronRatio')),
	CONSTRAINT "standing_fits_x" CHECK (x in ('bodyMassG', 'structureMassG', 'cells', 'neurons', 'otherCells', 'neuronsPerMg', 'cellsPerMg', 'otherToNeuronRatio')),
	CONSTRAINT "standing_fits_method" CHECK (method in ('ols', 'sma', 'ma', 'pgls-brownian', 'pgls-lambda'))
);
--> statement-breakpoint
CREATE TABLE "audit_entries" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"actor_id" uuid,
	"action" text NOT NULL,
	"target_type" text NOT NULL,
	"target_id" text NOT NULL,
	"detail" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"request_id" text,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "mails" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"user_id" uuid,
	"recipient" text NOT NULL,
	"kind" text NOT NULL,
	"subject" text NOT NULL,
	"body" text NOT NULL,
	"idempotency_key" text NOT NULL,
	"status" text DEFAULT 'queued' NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"provider_id" text,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"sent_at" timestamp (3) with time zone,
	CONSTRAINT "mails_idempotency_key_unique" UNIQUE("idempotency_key"),
	CONSTRAINT "mails_status" CHECK ("mails"."status" in ('queued', 'sent', 'failed'))
);
--> statement-breakpoint
CREATE TABLE "notices" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"user_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"subject" text NOT NULL,
	"body" text DEFAULT '' NOT NULL,
	"href" text NOT NULL,
	"dedupe_key" text NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"read_at" timestamp (3) with time zone,
	CONSTRAINT "notices_dedupe_key_unique" UNIQUE("dedupe_key")
);
--> statement-breakpoint
CREATE TABLE "register_settings" (
	"key" text PRIMARY KEY NOT NULL,
	"value" jsonb NOT NULL,
	"fixed" boolean DEFAULT false NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "lab_memberships" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"user_id" uuid NOT NULL,
	"lab_id" uuid NOT NULL,
	"from_day" date NOT NULL,
	"until_day" date,
	"granted_by" uuid,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "lab_memberships_once" UNIQUE("user_id","lab_id","from_day"),
	CONSTRAINT "lab_memberships_order" CHECK ("lab_memberships"."until_day" is null or "lab_memberships"."until_day" >= "lab_memberships"."from_day")
);
--> statement-breakpoint
CREATE TABLE "labs" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"place" text DEFAULT '' NOT NULL,
	"demonstration" boolean DEFAULT false NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "labs_name_unique" UNIQUE("name")
);
--> statement-breakpoint
CREATE TABLE "user_roles" (
	"user_id" uuid NOT NULL,
	"role" text NOT NULL,
	"granted_by" uuid,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "user_roles_user_id_role_pk" PRIMARY KEY("user_id","role"),
	CONSTRAINT "user_roles_role" CHECK (role in ('contributor', 'reviewer', 'curator', 'administrator'))
);
--> statement-breakpoint
CREATE TABLE "recheck_events" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"seq" bigint GENERATED ALWAYS AS IDENTITY (sequence name "recheck_events_seq_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"recheck_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"answer" text,
	"text" text DEFAULT '' NOT NULL,
	"attachment_id" uuid,
	"submission_revision_id" uuid,
	"actor_id" uuid NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "recheck_events_kind" CHECK ("recheck_events"."kind" in ('asked', 'answered', 'reopened', 'closed')),
	CONSTRAINT "recheck_events_answer" CHECK ("recheck_events"."answer" is null or answer in ('confirmed', 'corrected', 'withdrawn'))
);
--> statement-breakpoint
CREATE TABLE "rechecks" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"record_id" uuid NOT NULL,
	"flag_id" uuid,
	"field_path" text DEFAULT '' NOT NULL,
	"status" text DEFAULT 'open' NOT NULL,
	"question" text NOT NULL,
	"asked_by" uuid NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"closed_at" timestamp (3) with time zone,
	CONSTRAINT "rechecks_status" CHECK (status in ('open', 'answered', 'closed')),
	CONSTRAINT "rechecks_question" CHECK (length("rechecks"."question") between 1 and 4000)
);
--> statement-breakpoint
CREATE TABLE "record_revisions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"record_id" uuid NOT NULL,
	"revision" integer NOT NULL,
	"submission_revision_id" uuid NOT NULL,
	"row" jsonb NOT NULL,
	"embargo_until" date,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "record_revisions_number" UNIQUE("record_id","revision"),
	CONSTRAINT "record_revisions_positive" CHECK ("record_revisions"."revision" > 0)
);
--> statement-breakpoint
CREATE TABLE "records" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"number" integer DEFAULT nextval('record_numbers') NOT NULL,
	"submission_id" uuid NOT NULL,
	"entry_id" text NOT NULL,
	"taxon_id" uuid NOT NULL,
	"structure_id" uuid NOT NULL,
	"source_id" uuid NOT NULL,
	"lab_id" uuid,
	"demonstration" boolean DEFAULT false NOT NULL,
	"withdrawn_at" timestamp (3) with time zone,
	"withdrawn_reason" text DEFAULT '' NOT NULL,
	"current_revision" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "records_number_unique" UNIQUE("number"),
	CONSTRAINT "records_entry" UNIQUE("submission_id","entry_id")
);
--> statement-breakpoint
CREATE TABLE "set_asides" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"record_id" uuid NOT NULL,
	"scope" jsonb NOT NULL,
	"reason" text NOT NULL,
	"decided_by" uuid NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"lifted_at" timestamp (3) with time zone,
	"lifted_by" uuid,
	"lifted_reason" text DEFAULT '' NOT NULL,
	CONSTRAINT "set_asides_reason" CHECK (length("set_asides"."reason") > 0)
);
--> statement-breakpoint
CREATE TABLE "aliquots" (
	"sample_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"nuclei" double precision NOT NULL,
	"volume_ml" double precision NOT NULL,
	"excluded" text,
	"note" text DEFAULT '' NOT NULL,
	CONSTRAINT "aliquots_sample_id_position_pk" PRIMARY KEY("sample_id","position"),
	CONSTRAINT "aliquots_counts" CHECK ("aliquots"."nuclei" >= 0 and "aliquots"."nuclei" = floor("aliquots"."nuclei") and "aliquots"."volume_ml" > 0),
	CONSTRAINT "aliquots_excluded" CHECK ("aliquots"."excluded" is null or excluded in ('bubble', 'clump', 'overfilled', 'spill', 'other'))
);
--> statement-breakpoint
CREATE TABLE "literature_values" (
	"revision_id" uuid NOT NULL,
	"entry_id" text NOT NULL,
	"variable" text NOT NULL,
	"taxon_id" uuid NOT NULL,
	"structure_id" uuid NOT NULL,
	"definition_version" integer NOT NULL,
	"value" double precision NOT NULL,
	"value_text" text NOT NULL,
	"unit" text NOT NULL,
	"centre" text NOT NULL,
	"spread" double precision,
	"spread_kind" text NOT NULL,
	"n" integer,
	"printed_differently" text DEFAULT '' NOT NULL,
	CONSTRAINT "literature_values_revision_id_entry_id_variable_pk" PRIMARY KEY("revision_id","entry_id","variable"),
	CONSTRAINT "literature_values_positive" CHECK ("literature_values"."value" >= 0 and ("literature_values"."n" is null or "literature_values"."n" > 0)),
	CONSTRAINT "literature_values_centre" CHECK (centre in ('arithmetic', 'geometric', 'median', 'single', 'not-stated')),
	CONSTRAINT "literature_values_spread" CHECK (spread_kind in ('SD', 'SE', 'CI95', 'range', 'none', 'not-stated'))
);
--> statement-breakpoint
CREATE TABLE "neun_counts" (
	"sample_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"positive" double precision NOT NULL,
	"total" double precision NOT NULL,
	CONSTRAINT "neun_counts_sample_id_position_pk" PRIMARY KEY("sample_id","position"),
	CONSTRAINT "neun_counts_order" CHECK ("neun_counts"."positive" >= 0 and "neun_counts"."total" > 0 and "neun_counts"."positive" <= "neun_counts"."total")
);
--> statement-breakpoint
CREATE TABLE "sample_specimens" (
	"sample_id" uuid NOT NULL,
	"specimen_id" uuid NOT NULL,
	CONSTRAINT "sample_specimens_sample_id_specimen_id_pk" PRIMARY KEY("sample_id","specimen_id")
);
--> statement-breakpoint
CREATE TABLE "samples" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"structure_estimate_id" uuid NOT NULL,
	"entry_id" text NOT NULL,
	"label" text DEFAULT '' NOT NULL,
	"side" text NOT NULL,
	"tissue_mass_g" double precision,
	"tissue_mass_text" text DEFAULT '' NOT NULL,
	"tissue_mass_unit" text DEFAULT '' NOT NULL,
	"suspension" text DEFAULT '' NOT NULL,
	"suspension_volume_ml" double precision NOT NULL,
	"suspension_volume_text" text DEFAULT '' NOT NULL,
	"suspension_volume_unit" text DEFAULT '' NOT NULL,
	"suspension_volume_se_ml" double precision,
	"dilution" double precision NOT NULL,
	"dilution_se" double precision,
	"scale_up_kind" text NOT NULL,
	"scale_up_factor" double precision NOT NULL,
	"scale_up_factor_se" double precision DEFAULT 0 NOT NULL,
	"chamber" text NOT NULL,
	"counted_on" text DEFAULT '' NOT NULL,
	"observer" text DEFAULT '' NOT NULL,
	"estimate" jsonb NOT NULL,
	CONSTRAINT "samples_entry" UNIQUE("structure_estimate_id","entry_id"),
	CONSTRAINT "samples_side" CHECK (side in ('left', 'right', 'both', 'midline', 'not-stated')),
	CONSTRAINT "samples_scale_up" CHECK (scale_up_kind in ('none', 'other-side', 'mass-fraction', 'slab-series')),
	CONSTRAINT "samples_positive" CHECK ("samples"."suspension_volume_ml" > 0 and "samples"."dilution" >= 1 and "samples"."scale_up_factor" > 0 and ("samples"."tissue_mass_g" is null or "samples"."tissue_mass_g" > 0))
);
--> statement-breakpoint
CREATE TABLE "specimen_states" (
	"revision_id" uuid PRIMARY KEY NOT NULL,
	"specimen_id" uuid NOT NULL,
	"name_as_entered" text NOT NULL,
	"qualifier" text NOT NULL,
	"origin" text NOT NULL,
	"sex" text NOT NULL,
	"age_class" text NOT NULL,
	"body_mass_g" double precision,
	"body_mass_text" text DEFAULT '' NOT NULL,
	"body_mass_unit" text DEFAULT '' NOT NULL,
	"body_mass_kind" text NOT NULL,
	"mass_state" text NOT NULL,
	"fixation" text NOT NULL,
	"method" text NOT NULL,
	"approval_kind" text NOT NULL,
	"approval_text" text DEFAULT '' NOT NULL,
	CONSTRAINT "specimen_states_mass" CHECK ("specimen_states"."body_mass_g" is null or "specimen_states"."body_mass_g" > 0)
);
--> statement-breakpoint
CREATE TABLE "specimens" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"lab_id" uuid NOT NULL,
	"code" text NOT NULL,
	"taxon_id" uuid NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "specimens_code" UNIQUE("lab_id","code")
);
--> statement-breakpoint
CREATE TABLE "structure_estimates" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"revision_id" uuid NOT NULL,
	"entry_id" text NOT NULL,
	"structure_id" uuid NOT NULL,
	"definition_version" integer NOT NULL,
	"delineation" text[] DEFAULT '{}' NOT NULL,
	"mass_g" double precision,
	"mass_text" text DEFAULT '' NOT NULL,
	"mass_unit" text DEFAULT '' NOT NULL,
	"cells" double precision,
	"cells_se" double precision,
	"neurons" double precision,
	"neurons_se" double precision,
	"other_cells" double precision,
	"other_cells_se" double precision,
	"cells_per_mg" double precision,
	"neurons_per_mg" double precision,
	CONSTRAINT "structure_estimates_entry" UNIQUE("revision_id","entry_id"),
	CONSTRAINT "structure_estimates_mass" CHECK ("structure_estimates"."mass_g" is null or "structure_estimates"."mass_g" > 0),
	CONSTRAINT "structure_estimates_counts" CHECK (coalesce("structure_estimates"."cells", 0) >= 0 and coalesce("structure_estimates"."neurons", 0) >= 0 and coalesce("structure_estimates"."other_cells", 0) >= 0)
);
--> statement-breakpoint
CREATE TABLE "attachments" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"submission_id" uuid NOT NULL,
	"field_path" text DEFAULT '' NOT NULL,
	"name" text NOT NULL,
	"caption" text DEFAULT '' NOT NULL,
	"media_type" text NOT NULL,
	"bytes" bigint NOT NULL,
	"sha256" text NOT NULL,
	"storage_key" text NOT NULL,
	"uploaded_by" uuid NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "attachments_type" CHECK (media_type in ('application/pdf', 'image/png', 'image/jpeg', 'image/tiff', 'text/csv')),
	CONSTRAINT "attachments_size" CHECK ("attachments"."bytes" between 1 and 26214400),
	CONSTRAINT "attachments_sha" CHECK ("attachments"."sha256" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
CREATE TABLE "comments" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"submission_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"field_path" text NOT NULL,
	"author_id" uuid NOT NULL,
	"text" text NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "comments_text" CHECK (length("comments"."text") between 1 and 4000)
);
--> statement-breakpoint
CREATE TABLE "decisions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"revision_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"comment" text NOT NULL,
	"checklist" jsonb NOT NULL,
	"decided_by" uuid NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "decisions_revision_id_unique" UNIQUE("revision_id"),
	CONSTRAINT "decisions_kind" CHECK (kind in ('approve', 'request-changes', 'decline'))
);
--> statement-breakpoint
CREATE TABLE "revision_attachments" (
	"revision_id" uuid NOT NULL,
	"attachment_id" uuid NOT NULL,
	CONSTRAINT "revision_attachments_revision_id_attachment_id_pk" PRIMARY KEY("revision_id","attachment_id")
);
--> statement-breakpoint
CREATE TABLE "submission_events" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"seq" bigint GENERATED ALWAYS AS IDENTITY (sequence name "submission_events_seq_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"submission_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"actor_id" uuid NOT NULL,
	"reason" text DEFAULT '' NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "submission_revisions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"submission_id" uuid NOT NULL,
	"revision" integer NOT NULL,
	"status" text DEFAULT 'draft' NOT NULL,
	"content" jsonb NOT NULL,
	"checks" jsonb,
	"draft_version" integer DEFAULT 1 NOT NULL,
	"answers_recheck_id" uuid,
	"submitted_by" uuid,
	"submitted_at" timestamp (3) with time zone,
	"decided_at" timestamp (3) with time zone,
	"embargo_until" date,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "submission_revisions_number" UNIQUE("submission_id","revision"),
	CONSTRAINT "submission_revisions_status" CHECK (status in ('draft', 'submitted', 'changes-requested', 'approved', 'declined', 'withdrawn')),
	CONSTRAINT "submission_revisions_positive" CHECK ("submission_revisions"."revision" > 0),
	CONSTRAINT "submission_revisions_submitted" CHECK ("submission_revisions"."status" in ('draft', 'withdrawn') or ("submission_revisions"."submitted_at" is not null and "submission_revisions"."submitted_by" is not null))
);
--> statement-breakpoint
CREATE TABLE "submissions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"kind" text NOT NULL,
	"lab_id" uuid,
	"created_by" uuid NOT NULL,
	"demonstration" boolean DEFAULT false NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "submissions_kind" CHECK (kind in ('specimen', 'literature'))
);
--> statement-breakpoint
CREATE TABLE "version_dois" (
	"version_id" uuid PRIMARY KEY NOT NULL,
	"doi" text NOT NULL,
	"state" text NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "version_dois_doi_unique" UNIQUE("doi"),
	CONSTRAINT "version_dois_state" CHECK ("version_dois"."state" in ('reserved', 'draft', 'findable'))
);
--> statement-breakpoint
CREATE TABLE "version_events" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"seq" bigint GENERATED ALWAYS AS IDENTITY (sequence name "version_events_seq_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"version_id" uuid NOT NULL,
	"step" text NOT NULL,
	"detail" text DEFAULT '' NOT NULL,
	"actor_id" uuid,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "version_files" (
	"version_id" uuid NOT NULL,
	"name" text NOT NULL,
	"media_type" text NOT NULL,
	"bytes" bigint NOT NULL,
	"sha256" text NOT NULL,
	"storage_key" text NOT NULL,
	"rows" integer,
	"position" integer NOT NULL,
	CONSTRAINT "version_files_version_id_name_pk" PRIMARY KEY("version_id","name"),
	CONSTRAINT "version_files_sha" CHECK ("version_files"."sha256" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
CREATE TABLE "version_rows" (
	"version_id" uuid NOT NULL,
	"record_id" uuid NOT NULL,
	"record_revision_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"row" jsonb NOT NULL,
	CONSTRAINT "version_rows_version_id_record_id_pk" PRIMARY KEY("version_id","record_id")
);
--> statement-breakpoint
CREATE TABLE "versions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"number" integer NOT NULL,
	"status" text DEFAULT 'preparing' NOT NULL,
	"title" text NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"demonstration" boolean DEFAULT false NOT NULL,
	"licence" text DEFAULT 'CC BY 4.0' NOT NULL,
	"summary" jsonb,
	"manifest_sha256" text,
	"started_by" uuid NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"frozen_at" timestamp (3) with time zone,
	CONSTRAINT "versions_number_unique" UNIQUE("number"),
	CONSTRAINT "versions_status" CHECK ("versions"."status" in ('preparing', 'frozen')),
	CONSTRAINT "versions_frozen" CHECK ("versions"."status" <> 'frozen' or ("versions"."frozen_at" is not null and "versions"."manifest_sha256" is not null)),
	CONSTRAINT "versions_positive" CHECK ("versions"."number" > 0)
);
--> statement-breakpoint
CREATE TABLE "delineation_criteria" (
	"key" text PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"position" smallint DEFAULT 0 NOT NULL
);
--> statement-breakpoint
CREATE TABLE "source_overlaps" (
	"source_id" uuid NOT NULL,
	"other_source_id" uuid NOT NULL,
	"overlap" text NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	CONSTRAINT "source_overlaps_source_id_other_source_id_pk" PRIMARY KEY("source_id","other_source_id"),
	CONSTRAINT "source_overlaps_kind" CHECK (overlap in ('none', 'same', 'partly', 'unknown')),
	CONSTRAINT "source_overlaps_two" CHECK ("source_overlaps"."source_id" <> "source_overlaps"."other_source_id")
);
--> statement-breakpoint
CREATE TABLE "sources" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"key" text NOT NULL,
	"kind" text NOT NULL,
	"citation" text NOT NULL,
	"doi" text,
	"year" integer,
	"lab_id" uuid,
	"carrier" text DEFAULT '' NOT NULL,
	"licence" text DEFAULT '' NOT NULL,
	"demonstration" boolean DEFAULT false NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sources_key_unique" UNIQUE("key"),
	CONSTRAINT "sources_kind" CHECK ("sources"."kind" in ('publication', 'lab'))
);
--> statement-breakpoint
CREATE TABLE "structure_definitions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"structure_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"includes" text[] DEFAULT '{}' NOT NULL,
	"excludes" text[] DEFAULT '{}' NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"uberon_id" text,
	"uberon_match" text,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "structure_definitions_version" UNIQUE("structure_id","version"),
	CONSTRAINT "structure_definitions_match" CHECK ("structure_definitions"."uberon_match" is null or "structure_definitions"."uberon_match" in ('exact', 'close', 'broad')),
	CONSTRAINT "structure_definitions_positive" CHECK ("structure_definitions"."version" > 0)
);
--> statement-breakpoint
CREATE TABLE "structures" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"key" text NOT NULL,
	"name" text NOT NULL,
	"parent_id" uuid,
	"animal_class" text,
	"midline" boolean DEFAULT false NOT NULL,
	"by_complement" boolean DEFAULT false NOT NULL,
	"position" smallint DEFAULT 0 NOT NULL,
	"status" text DEFAULT 'accepted' NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "structures_key_unique" UNIQUE("key"),
	CONSTRAINT "structures_key" CHECK ("structures"."key" ~ '^[a-z][a-z0-9_]*$'),
	CONSTRAINT "structures_status" CHECK ("structures"."status" in ('accepted', 'retired'))
);
--> statement-breakpoint
CREATE TABLE "taxa" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"parent_id" uuid,
	"rank" text NOT NULL,
	"name" text NOT NULL,
	"slug" text NOT NULL,
	"path" text NOT NULL,
	"common_names" text[] DEFAULT '{}' NOT NULL,
	"authority" text DEFAULT '' NOT NULL,
	"named" boolean DEFAULT true NOT NULL,
	"demonstration" boolean DEFAULT false NOT NULL,
	"status" text DEFAULT 'accepted' NOT NULL,
	"proposed_by" uuid,
	"decided_by" uuid,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "taxa_slug_unique" UNIQUE("slug"),
	CONSTRAINT "taxa_path_unique" UNIQUE("path"),
	CONSTRAINT "taxa_status" CHECK ("taxa"."status" in ('proposed', 'accepted', 'refused')),
	CONSTRAINT "taxa_slug" CHECK ("taxa"."slug" ~ '^[a-z0-9]+(-[a-z0-9]+)*$')
);
--> statement-breakpoint
CREATE TABLE "taxon_identifiers" (
	"taxon_id" uuid NOT NULL,
	"authority" text NOT NULL,
	"identifier" text NOT NULL,
	CONSTRAINT "taxon_identifiers_taxon_id_authority_pk" PRIMARY KEY("taxon_id","authority")
);
--> statement-breakpoint
CREATE TABLE "taxon_synonyms" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"taxon_id" uuid NOT NULL,
	"name" text NOT NULL,
	"slug" text NOT NULL,
	"reason" text DEFAULT '' NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "taxon_synonyms_slug_unique" UNIQUE("slug")
);
--> statement-breakpoint
CREATE TABLE "trees" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"newick" text NOT NULL,
	"tips" integer NOT NULL,
	"dated" boolean DEFAULT false NOT NULL,
	"source_id" uuid,
	"match" jsonb,
	"uploaded_by" uuid,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "trees_name_unique" UNIQUE("name")
);
--> statement-breakpoint
ALTER TABLE "accounts" ADD CONSTRAINT "accounts_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "fit_results" ADD CONSTRAINT "fit_results_run_id_fit_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."fit_runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "fit_results" ADD CONSTRAINT "fit_results_standing_fit_id_standing_fits_id_fk" FOREIGN KEY ("standing_fit_id") REFERENCES "public"."standing_fits"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "fit_results" ADD CONSTRAINT "fit_results_version_id_versions_id_fk" FOREIGN KEY ("version_id") REFERENCES "public"."versions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "fit_runs" ADD CONSTRAINT "fit_runs_version_id_versions_id_fk" FOREIGN KEY ("version_id") REFERENCES "public"."versions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "flags" ADD CONSTRAINT "flags_fit_result_id_fit_results_id_fk" FOREIGN KEY ("fit_result_id") REFERENCES "public"."fit_results"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "flags" ADD CONSTRAINT "flags_record_id_records_id_fk" FOREIGN KEY ("record_id") REFERENCES "public"."records"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "standing_fits" ADD CONSTRAINT "standing_fits_clade_id_taxa_id_fk" FOREIGN KEY ("clade_id") REFERENCES "public"."taxa"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "standing_fits" ADD CONSTRAINT "standing_fits_created_by_users_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit_entries" ADD CONSTRAINT "audit_entries_actor_id_users_id_fk" FOREIGN KEY ("actor_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mails" ADD CONSTRAINT "mails_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notices" ADD CONSTRAINT "notices_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lab_memberships" ADD CONSTRAINT "lab_memberships_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lab_memberships" ADD CONSTRAINT "lab_memberships_lab_id_labs_id_fk" FOREIGN KEY ("lab_id") REFERENCES "public"."labs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lab_memberships" ADD CONSTRAINT "lab_memberships_granted_by_users_id_fk" FOREIGN KEY ("granted_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "user_roles" ADD CONSTRAINT "user_roles_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "user_roles" ADD CONSTRAINT "user_roles_granted_by_users_id_fk" FOREIGN KEY ("granted_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recheck_events" ADD CONSTRAINT "recheck_events_recheck_id_rechecks_id_fk" FOREIGN KEY ("recheck_id") REFERENCES "public"."rechecks"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recheck_events" ADD CONSTRAINT "recheck_events_attachment_id_attachments_id_fk" FOREIGN KEY ("attachment_id") REFERENCES "public"."attachments"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recheck_events" ADD CONSTRAINT "recheck_events_submission_revision_id_submission_revisions_id_fk" FOREIGN KEY ("submission_revision_id") REFERENCES "public"."submission_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recheck_events" ADD CONSTRAINT "recheck_events_actor_id_users_id_fk" FOREIGN KEY ("actor_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rechecks" ADD CONSTRAINT "rechecks_record_id_records_id_fk" FOREIGN KEY ("record_id") REFERENCES "public"."records"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rechecks" ADD CONSTRAINT "rechecks_flag_id_flags_id_fk" FOREIGN KEY ("flag_id") REFERENCES "public"."flags"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rechecks" ADD CONSTRAINT "rechecks_asked_by_users_id_fk" FOREIGN KEY ("asked_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "record_revisions" ADD CONSTRAINT "record_revisions_record_id_records_id_fk" FOREIGN KEY ("record_id") REFERENCES "public"."records"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "record_revisions" ADD CONSTRAINT "record_revisions_submission_revision_id_submission_revisions_id_fk" FOREIGN KEY ("submission_revision_id") REFERENCES "public"."submission_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "records" ADD CONSTRAINT "records_submission_id_submissions_id_fk" FOREIGN KEY ("submission_id") REFERENCES "public"."submissions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "records" ADD CONSTRAINT "records_taxon_id_taxa_id_fk" FOREIGN KEY ("taxon_id") REFERENCES "public"."taxa"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "records" ADD CONSTRAINT "records_structure_id_structures_id_fk" FOREIGN KEY ("structure_id") REFERENCES "public"."structures"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "records" ADD CONSTRAINT "records_source_id_sources_id_fk" FOREIGN KEY ("source_id") REFERENCES "public"."sources"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "records" ADD CONSTRAINT "records_lab_id_labs_id_fk" FOREIGN KEY ("lab_id") REFERENCES "public"."labs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "set_asides" ADD CONSTRAINT "set_asides_record_id_records_id_fk" FOREIGN KEY ("record_id") REFERENCES "public"."records"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "set_asides" ADD CONSTRAINT "set_asides_decided_by_users_id_fk" FOREIGN KEY ("decided_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "set_asides" ADD CONSTRAINT "set_asides_lifted_by_users_id_fk" FOREIGN KEY ("lifted_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "aliquots" ADD CONSTRAINT "aliquots_sample_id_samples_id_fk" FOREIGN KEY ("sample_id") REFERENCES "public"."samples"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "literature_values" ADD CONSTRAINT "literature_values_revision_id_submission_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."submission_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "literature_values" ADD CONSTRAINT "literature_values_taxon_id_taxa_id_fk" FOREIGN KEY ("taxon_id") REFERENCES "public"."taxa"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "literature_values" ADD CONSTRAINT "literature_values_structure_id_structures_id_fk" FOREIGN KEY ("structure_id") REFERENCES "public"."structures"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "neun_counts" ADD CONSTRAINT "neun_counts_sample_id_samples_id_fk" FOREIGN KEY ("sample_id") REFERENCES "public"."samples"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sample_specimens" ADD CONSTRAINT "sample_specimens_sample_id_samples_id_fk" FOREIGN KEY ("sample_id") REFERENCES "public"."samples"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sample_specimens" ADD CONSTRAINT "sample_specimens_specimen_id_specimens_id_fk" FOREIGN KEY ("specimen_id") REFERENCES "public"."specimens"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "samples" ADD CONSTRAINT "samples_structure_estimate_id_structure_estimates_id_fk" FOREIGN KEY ("structure_estimate_id") REFERENCES "public"."structure_estimates"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "specimen_states" ADD CONSTRAINT "specimen_states_revision_id_submission_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."submission_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "specimen_states" ADD CONSTRAINT "specimen_states_specimen_id_specimens_id_fk" FOREIGN KEY ("specimen_id") REFERENCES "public"."specimens"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "specimens" ADD CONSTRAINT "specimens_lab_id_labs_id_fk" FOREIGN KEY ("lab_id") REFERENCES "public"."labs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "specimens" ADD CONSTRAINT "specimens_taxon_id_taxa_id_fk" FOREIGN KEY ("taxon_id") REFERENCES "public"."taxa"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "structure_estimates" ADD CONSTRAINT "structure_estimates_revision_id_submission_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."submission_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "structure_estimates" ADD CONSTRAINT "structure_estimates_structure_id_structures_id_fk" FOREIGN KEY ("structure_id") REFERENCES "public"."structures"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "attachments" ADD CONSTRAINT "attachments_submission_id_submissions_id_fk" FOREIGN KEY ("submission_id") REFERENCES "public"."submissions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "attachments" ADD CONSTRAINT "attachments_uploaded_by_users_id_fk" FOREIGN KEY ("uploaded_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "comments" ADD CONSTRAINT "comments_submission_id_submissions_id_fk" FOREIGN KEY ("submission_id") REFERENCES "public"."submissions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "comments" ADD CONSTRAINT "comments_revision_id_submission_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."submission_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "comments" ADD CONSTRAINT "comments_author_id_users_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "decisions" ADD CONSTRAINT "decisions_revision_id_submission_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."submission_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "decisions" ADD CONSTRAINT "decisions_decided_by_users_id_fk" FOREIGN KEY ("decided_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_attachments" ADD CONSTRAINT "revision_attachments_revision_id_submission_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."submission_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_attachments" ADD CONSTRAINT "revision_attachments_attachment_id_attachments_id_fk" FOREIGN KEY ("attachment_id") REFERENCES "public"."attachments"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_events" ADD CONSTRAINT "submission_events_submission_id_submissions_id_fk" FOREIGN KEY ("submission_id") REFERENCES "public"."submissions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_events" ADD CONSTRAINT "submission_events_revision_id_submission_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."submission_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_events" ADD CONSTRAINT "submission_events_actor_id_users_id_fk" FOREIGN KEY ("actor_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_revisions" ADD CONSTRAINT "submission_revisions_submission_id_submissions_id_fk" FOREIGN KEY ("submission_id") REFERENCES "public"."submissions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_revisions" ADD CONSTRAINT "submission_revisions_submitted_by_users_id_fk" FOREIGN KEY ("submitted_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_lab_id_labs_id_fk" FOREIGN KEY ("lab_id") REFERENCES "public"."labs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_created_by_users_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "version_dois" ADD CONSTRAINT "version_dois_version_id_versions_id_fk" FOREIGN KEY ("version_id") REFERENCES "public"."versions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "version_events" ADD CONSTRAINT "version_events_version_id_versions_id_fk" FOREIGN KEY ("version_id") REFERENCES "public"."versions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "version_events" ADD CONSTRAINT "version_events_actor_id_users_id_fk" FOREIGN KEY ("actor_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "version_files" ADD CONSTRAINT "version_files_version_id_versions_id_fk" FOREIGN KEY ("version_id") REFERENCES "public"."versions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "version_rows" ADD CONSTRAINT "version_rows_version_id_versions_id_fk" FOREIGN KEY ("version_id") REFERENCES "public"."versions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "version_rows" ADD CONSTRAINT "version_rows_record_id_records_id_fk" FOREIGN KEY ("record_id") REFERENCES "public"."records"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "version_rows" ADD CONSTRAINT "version_rows_record_revision_id_record_revisions_id_fk" FOREIGN KEY ("record_revision_id") REFERENCES "public"."record_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "versions" ADD CONSTRAINT "versions_started_by_users_id_fk" FOREIGN KEY ("started_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "source_overlaps" ADD CONSTRAINT "source_overlaps_source_id_sources_id_fk" FOREIGN KEY ("source_id") REFERENCES "public"."sources"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "source_overlaps" ADD CONSTRAINT "source_overlaps_other_source_id_sources_id_fk" FOREIGN KEY ("other_source_id") REFERENCES "public"."sources"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sources" ADD CONSTRAINT "sources_lab_id_labs_id_fk" FOREIGN KEY ("lab_id") REFERENCES "public"."labs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "structure_definitions" ADD CONSTRAINT "structure_definitions_structure_id_structures_id_fk" FOREIGN KEY ("structure_id") REFERENCES "public"."structures"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "structures" ADD CONSTRAINT "structures_parent_id_structures_id_fk" FOREIGN KEY ("parent_id") REFERENCES "public"."structures"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "taxa" ADD CONSTRAINT "taxa_parent_id_taxa_id_fk" FOREIGN KEY ("parent_id") REFERENCES "public"."taxa"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "taxa" ADD CONSTRAINT "taxa_proposed_by_users_id_fk" FOREIGN KEY ("proposed_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "taxa" ADD CONSTRAINT "taxa_decided_by_users_id_fk" FOREIGN KEY ("decided_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "taxon_identifiers" ADD CONSTRAINT "taxon_identifiers_taxon_id_taxa_id_fk" FOREIGN KEY ("taxon_id") REFERENCES "public"."taxa"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "taxon_synonyms" ADD CONSTRAINT "taxon_synonyms_taxon_id_taxa_id_fk" FOREIGN KEY ("taxon_id") REFERENCES "public"."taxa"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trees" ADD CONSTRAINT "trees_source_id_sources_id_fk" FOREIGN KEY ("source_id") REFERENCES "public"."sources"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trees" ADD CONSTRAINT "trees_uploaded_by_users_id_fk" FOREIGN KEY ("uploaded_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "accounts_user" ON "accounts" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "sessions_user" ON "sessions" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "verifications_identifier" ON "verifications" USING btree ("identifier");--> statement-breakpoint
CREATE UNIQUE INDEX "fit_results_latest" ON "fit_results" USING btree ("standing_fit_id") WHERE latest;--> statement-breakpoint
CREATE INDEX "fit_results_version" ON "fit_results" USING btree ("version_id");--> statement-breakpoint
CREATE INDEX "flags_record" ON "flags" USING btree ("record_id");--> statement-breakpoint
CREATE INDEX "audit_entries_at" ON "audit_entries" USING btree ("created_at");--> statement-breakpoint
CREATE INDEX "audit_entries_target" ON "audit_entries" USING btree ("target_type","target_id");--> statement-breakpoint
CREATE INDEX "mails_status_at" ON "mails" USING btree ("status","created_at");--> statement-breakpoint
CREATE INDEX "notices_user" ON "notices" USING btree ("user_id","created_at");--> statement-breakpoint
CREATE INDEX "lab_memberships_lab" ON "lab_memberships" USING btree ("lab_id");--> statement-breakpoint
CREATE INDEX "recheck_events_recheck" ON "recheck_events" USING btree ("recheck_id","seq");--> statement-breakpoint
CREATE UNIQUE INDEX "rechecks_one_open" ON "rechecks" USING btree ("record_id") WHERE status <> 'closed';--> statement-breakpoint
CREATE INDEX "rechecks_status_at" ON "rechecks" USING btree ("status","created_at");--> statement-breakpoint
CREATE INDEX "record_revisions_submission" ON "record_revisions" USING btree ("submission_revision_id");--> statement-breakpoint
CREATE INDEX "records_taxon" ON "records" USING btree ("taxon_id");--> statement-breakpoint
CREATE INDEX "records_structure" ON "records" USING btree ("structure_id");--> statement-breakpoint
CREATE INDEX "records_lab" ON "records" USING btree ("lab_id");--> statement-breakpoint
CREATE INDEX "set_asides_record" ON "set_asides" USING btree ("record_id");--> statement-breakpoint
CREATE INDEX "sample_specimens_specimen" ON "sample_specimens" USING btree ("specimen_id");--> statement-breakpoint
CREATE INDEX "specimen_states_specimen" ON "specimen_states" USING btree ("specimen_id");--> statement-breakpoint
CREATE INDEX "specimens_taxon" ON "specimens" USING btree ("taxon_id");--> statement-breakpoint
CREATE INDEX "attachments_submission" ON "attachments" USING btree ("submission_id");--> statement-breakpoint
CREATE INDEX "comments_submission" ON "comments" USING btree ("submission_id","created_at");--> statement-breakpoint
CREATE INDEX "submission_events_submission" ON "submission_events" USING btree ("submission_id","seq");--> statement-breakpoint
CREATE INDEX "submission_revisions_status_at" ON "submission_revisions" USING btree ("status","submitted_at");--> statement-breakpoint
CREATE INDEX "submissions_lab" ON "submissions" USING btree ("lab_id");--> statement-breakpoint
CREATE INDEX "submissions_creator" ON "submissions" USING btree ("created_by");--> statement-breakpoint
CREATE INDEX "version_events_version" ON "version_events" USING btree ("version_id","seq");--> statement-breakpoint
CREATE INDEX "version_rows_number" ON "version_rows" USING btree ("version_id","number");--> statement-breakpoint
CREATE UNIQUE INDEX "versions_one_preparing" ON "versions" USING btree ("status") WHERE status = 'preparing';--> statement-breakpoint
CREATE INDEX "taxa_parent" ON "taxa" USING btree ("parent_id");--> statement-breakpoint
CREATE INDEX "taxa_path" ON "taxa" USING btree ("path" text_pattern_ops);--> statement-breakpoint
CREATE INDEX "taxon_synonyms_taxon" ON "taxon_synonyms" USING btree ("taxon_id");