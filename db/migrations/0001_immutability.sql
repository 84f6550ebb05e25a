-- What is submitted, decided or frozen never changes: the triggers below hold it for every role,
-- the application's own included. TRUNCATE is refused as well.

CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'rows of % never change', TG_TABLE_NAME USING ERRCODE = 'KA001';
END $$;
--> statement-breakpoint

DO $$
DECLARE name text;
BEGIN
  FOREACH name IN ARRAY ARRAY[
    'submission_events', 'decisions', 'comments', 'attachments',
    'specimens', 'specimen_states', 'structure_estimates', 'samples', 'sample_specimens', 'aliquots', 'neun_counts',
    'literature_values', 'record_revisions', 'recheck_events', 'version_rows', 'version_files', 'version_events',
    'audit_entries', 'flags'
  ] LOOP
    EXECUTE format('CREATE TRIGGER %I BEFORE UPDATE OR DELETE ON %I FOR EACH ROW EXECUTE FUNCTION refuse_change()', name || '_immutable', name);
    EXECUTE format('CREATE TRIGGER %I BEFORE TRUNCATE ON %I FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()', name || '_no_truncate', name);
  END LOOP;
  FOREACH name IN ARRAY ARRAY['submissions', 'submission_revisions', 'records', 'set_asides', 'rechecks', 'versions', 'fit_results', 'fit_runs', 'standing_fits'] LOOP
    EXECUTE format('CREATE TRIGGER %I BEFORE DELETE ON %I FOR EACH ROW EXECUTE FUNCTION refuse_change()', name || '_no_delete', name);
    EXECUTE format('CREATE TRIGGER %I BEFORE TRUNCATE ON %I FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()', name || '_no_truncate', name);
  END LOOP;
END $$;
--> statement-breakpoint

-- A revision is free while it is a draft. Once submitted its content, checks and dates stand; only its status moves on.
CREATE FUNCTION guard_submission_revision() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF NEW.id <> OLD.id OR NEW.submission_id <> OLD.submission_id OR NEW.revision <> OLD.revision THEN
    RAISE EXCEPTION 'a revision keeps its number' USING ERRCODE = 'KA001';
  END IF;
  IF OLD.status <> 'draft' THEN
    IF NEW.content IS DISTINCT FROM OLD.content OR NEW.checks IS DISTINCT FROM OLD.checks
       OR NEW.submitted_at IS DISTINCT FROM OLD.submitted_at OR NEW.submitted_by IS DISTINCT FROM OLD.submitted_by
       OR NEW.embargo_until IS DISTINCT FROM OLD.embargo_until OR NEW.answers_recheck_id IS DISTINCT FROM OLD.answers_recheck_id THEN
      RAISE EXCEPTION 'a submitted revision never changes' USING ERRCODE = 'KA001';
    END IF;
    IF NEW.status IS DISTINCT FROM OLD.status AND NOT (
      (OLD.status = 'submitted' AND NEW.status IN ('changes-requested', 'approved', 'declined', 'withdrawn'))
      OR (OLD.status = 'changes-requested' AND NEW.status = 'withdrawn')
      OR (OLD.status = 'approved' AND NEW.status = 'withdrawn')
    ) THEN
      RAISE EXCEPTION 'a revision does not go from % to %', OLD.status, NEW.status USING ERRCODE = 'KA002';
    END IF;
  ELSIF NEW.status NOT IN ('draft', 'submitted', 'withdrawn') THEN
    RAISE EXCEPTION 'a draft is submitted before it is decided' USING ERRCODE = 'KA002';
  END IF;
  RETURN NEW;
END $$;
--> statement-breakpoint
CREATE TRIGGER submission_revisions_guard BEFORE UPDATE ON submission_revisions FOR EACH ROW EXECUTE FUNCTION guard_submission_revision();
--> statement-breakpoint

-- Evidence is attached to and detached from a draft only.
CREATE FUNCTION guard_revision_attachment() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE revision uuid := CASE WHEN TG_OP = 'DELETE' THEN OLD.revision_id ELSE NEW.revision_id END;
BEGIN
  IF TG_OP = 'UPDATE' OR (SELECT status FROM submission_revisions WHERE id = revision) <> 'draft' THEN
    RAISE EXCEPTION 'the evidence of a submitted revision never changes' USING ERRCODE = 'KA001';
  END IF;
  RETURN CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
END $$;
--> statement-breakpoint
CREATE TRIGGER revision_attachments_guard BEFORE INSERT OR UPDATE OR DELETE ON revision_attachments FOR EACH ROW EXECUTE FUNCTION guard_revision_attachment();
--> statement-breakpoint

-- A frozen version stands for ever; rows, files and fits join a version only while it is being prepared.
CREATE FUNCTION guard_version() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF OLD.status = 'frozen' THEN
    RAISE EXCEPTION 'a frozen version never changes' USING ERRCODE = 'KA001';
  END IF;
  IF NEW.number <> OLD.number OR NEW.id <> OLD.id THEN
    RAISE EXCEPTION 'a version keeps its number' USING ERRCODE = 'KA001';
  END IF;
  RETURN NEW;
END $$;
--> statement-breakpoint
CREATE TRIGGER versions_guard BEFORE UPDATE ON versions FOR EACH ROW EXECUTE FUNCTION guard_version();
--> statement-breakpoint
CREATE FUNCTION guard_version_part() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF (SELECT status FROM versions WHERE id = NEW.version_id) = 'frozen' THEN
    RAISE EXCEPTION 'nothing is added to a frozen version' USING ERRCODE = 'KA001';
  END IF;
  RETURN NEW;
END $$;
--> statement-breakpoint
CREATE TRIGGER version_rows_guard BEFORE INSERT ON version_rows FOR EACH ROW EXECUTE FUNCTION guard_version_part();
--> statement-breakpoint
CREATE TRIGGER version_files_guard BEFORE INSERT ON version_files FOR EACH ROW EXECUTE FUNCTION guard_version_part();
--> statement-breakpoint
CREATE FUNCTION guard_fit_result() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'INSERT' THEN
    IF NEW.set = 'version' AND (SELECT status FROM versions WHERE id = NEW.version_id) = 'frozen' THEN
      RAISE EXCEPTION 'nothing is added to a frozen version' USING ERRCODE = 'KA001';
    END IF;
    RETURN NEW;
  END IF;
  IF OLD.set = 'version' OR NEW.result IS DISTINCT FROM OLD.result OR NEW.inputs IS DISTINCT FROM OLD.inputs
     OR NEW.exclusions IS DISTINCT FROM OLD.exclusions OR NEW.standing_fit_id <> OLD.standing_fit_id OR NEW.run_id <> OLD.run_id THEN
    RAISE EXCEPTION 'a stored fit never changes' USING ERRCODE = 'KA001';
  END IF;
  RETURN NEW;
END $$;
--> statement-breakpoint
CREATE TRIGGER fit_results_guard BEFORE INSERT OR UPDATE ON fit_results FOR EACH ROW EXECUTE FUNCTION guard_fit_result();
--> statement-breakpoint

-- A standing fit keeps its slug and its question.
CREATE FUNCTION guard_standing_fit() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF (NEW.slug, NEW.y, NEW.y_structure, NEW.x, NEW.x_structure, NEW.clade_id, NEW.method)
     IS DISTINCT FROM (OLD.slug, OLD.y, OLD.y_structure, OLD.x, OLD.x_structure, OLD.clade_id, OLD.method) THEN
    RAISE EXCEPTION 'a standing fit keeps its question' USING ERRCODE = 'KA001';
  END IF;
  RETURN NEW;
END $$;
--> statement-breakpoint
CREATE TRIGGER standing_fits_guard BEFORE UPDATE ON standing_fits FOR EACH ROW EXECUTE FUNCTION guard_standing_fit();
