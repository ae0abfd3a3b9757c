/**
 * Row-level security on each table of firm data, forced for the owner too, and triggers for what must never
 * change: the trail, versions of members, results, and editions once they left the draft.
 */
export const name = '005-isolation-and-permanence';

const ofFirms = [
  'bases',
  'editions',
  'stock_lists',
  'sections',
  'projects',
  'members',
  'member_versions',
  'results',
  'trail',
];
const permanent = ['trail', 'member_versions', 'results'];

export const up = `
${ofFirms
  .map(
    (table) => `
ALTER TABLE ${table} ENABLE ROW LEVEL SECURITY;
ALTER TABLE ${table} FORCE ROW LEVEL SECURITY;
CREATE POLICY firm ON ${table} USING (firm_id = current_firm()) WITH CHECK (firm_id = current_firm());`,
  )
  .join('')}

CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION '% is append-only: what was recorded never changes', TG_TABLE_NAME USING ERRCODE = 'LB002';
END $$;
${permanent
  .map(
    (table) => `
CREATE TRIGGER permanent_rows BEFORE UPDATE OR DELETE ON ${table}
  FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER permanent_table BEFORE TRUNCATE ON ${table}
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();`,
  )
  .join('')}

CREATE FUNCTION guard_edition() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'TRUNCATE' THEN
    RAISE EXCEPTION 'Editions are never emptied' USING ERRCODE = 'LB003';
  END IF;
  IF TG_OP = 'INSERT' THEN
    IF NEW.state <> 'draft' THEN
      RAISE EXCEPTION 'An edition begins as a draft' USING ERRCODE = 'LB003';
    END IF;
    RETURN NEW;
  END IF;
  IF TG_OP = 'DELETE' THEN
    IF OLD.state <> 'draft' THEN
      RAISE EXCEPTION 'An edition in state % is kept for good', OLD.state USING ERRCODE = 'LB003';
    END IF;
    RETURN OLD;
  END IF;
  IF (NEW.id, NEW.firm_id, NEW.basis_id, NEW.number, NEW.drafted_by, NEW.drafted_at)
     IS DISTINCT FROM (OLD.id, OLD.firm_id, OLD.basis_id, OLD.number, OLD.drafted_by, OLD.drafted_at) THEN
    RAISE EXCEPTION 'The identity of an edition never changes' USING ERRCODE = 'LB003';
  END IF;
  IF OLD.state <> 'draft' AND (
    (NEW.document, NEW.hash, NEW.unverified) IS DISTINCT FROM (OLD.document, OLD.hash, OLD.unverified)
    OR (NEW.state = OLD.state AND NEW IS DISTINCT FROM OLD)
  ) THEN
    RAISE EXCEPTION 'An edition in state % never changes but for its state', OLD.state USING ERRCODE = 'LB003';
  END IF;
  IF NEW.state <> OLD.state AND (OLD.state, NEW.state) NOT IN (
    ('draft', 'in_check'), ('in_check', 'draft'), ('in_check', 'released'),
    ('released', 'superseded'), ('released', 'withdrawn'), ('superseded', 'withdrawn')
  ) THEN
    RAISE EXCEPTION 'An edition can not go from % to %', OLD.state, NEW.state USING ERRCODE = 'LB003';
  END IF;
  IF OLD.state IN ('released', 'superseded', 'withdrawn')
     AND (NEW.released_by, NEW.released_at) IS DISTINCT FROM (OLD.released_by, OLD.released_at) THEN
    RAISE EXCEPTION 'Who released an edition, and when, never changes' USING ERRCODE = 'LB003';
  END IF;
  IF NEW.state = 'released' AND OLD.state = 'in_check'
     AND (NEW.released_by = NEW.drafted_by OR NEW.released_by IS NOT DISTINCT FROM NEW.submitted_by)
     AND NOT (SELECT sole_practitioner FROM firms WHERE id = NEW.firm_id) THEN
    RAISE EXCEPTION 'A second person has to release an edition' USING ERRCODE = 'LB003';
  END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER guard_edition BEFORE INSERT OR UPDATE OR DELETE ON editions
  FOR EACH ROW EXECUTE FUNCTION guard_edition();
CREATE TRIGGER guard_edition_table BEFORE TRUNCATE ON editions
  FOR EACH STATEMENT EXECUTE FUNCTION guard_edition();
`;
