-- The variable of the guard bore the name of a column of submission_revisions, so that PostgreSQL refused every attachment.
CREATE OR REPLACE FUNCTION guard_revision_attachment() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE guarded uuid := CASE WHEN TG_OP = 'DELETE' THEN OLD.revision_id ELSE NEW.revision_id END;
BEGIN
  IF TG_OP = 'UPDATE' OR (SELECT r.status FROM submission_revisions r WHERE r.id = guarded) <> 'draft' THEN
    RAISE EXCEPTION 'the evidence of a submitted revision never changes' USING ERRCODE = 'KA001';
  END IF;
  RETURN CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
END $$;
