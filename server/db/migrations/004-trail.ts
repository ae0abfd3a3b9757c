/**
 * The trail, and the rule that nothing audited is written without it. The rule is a constraint checked at
 * commit: a transaction that wrote an audited row has to have an entry of the same firm, made in the same
 * transaction. (`at` is compared too, since transaction ids may come again after a restore.)
 */
export const name = '004-trail';

const audited = [
  'firms',
  'memberships',
  'bases',
  'editions',
  'stock_lists',
  'sections',
  'projects',
  'members',
  'member_versions',
  'results',
];

export const up = `
CREATE TABLE trail (
  id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  firm_id uuid NOT NULL REFERENCES firms,
  at timestamptz NOT NULL DEFAULT clock_timestamp(),
  person_id uuid NOT NULL REFERENCES people,
  kind text NOT NULL CHECK (kind <> ''),
  subject_type text NOT NULL,
  subject_id uuid NOT NULL,
  subject_label text NOT NULL,
  event jsonb NOT NULL,
  tx xid8 NOT NULL DEFAULT pg_current_xact_id()
);
CREATE INDEX trail_firm ON trail (firm_id, id DESC);
CREATE INDEX trail_subject ON trail (firm_id, subject_id, id DESC);
CREATE INDEX trail_tx ON trail (tx);

CREATE FUNCTION require_trail() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE firm uuid;
BEGIN
  firm := to_jsonb(coalesce(NEW, OLD)) ->> CASE TG_TABLE_NAME WHEN 'firms' THEN 'id' ELSE 'firm_id' END;
  IF NOT EXISTS (
    SELECT 1 FROM trail WHERE tx = pg_current_xact_id() AND firm_id = firm AND at >= now()
  ) THEN
    RAISE EXCEPTION 'A write to % has no entry on the trail', TG_TABLE_NAME USING ERRCODE = 'LB001';
  END IF;
  RETURN NULL;
END $$;
${audited
  .map(
    (table) => `
CREATE CONSTRAINT TRIGGER require_trail AFTER INSERT OR UPDATE OR DELETE ON ${table}
  DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION require_trail();`,
  )
  .join('')}
`;
