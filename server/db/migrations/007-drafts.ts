/**
 * How a draft came to be what it is: for each version the patch that leads back to the one before, so that a
 * clash can be told from a change elsewhere; and a checker's remarks. Both are only ever added to.
 */
export const name = '007-drafts';

export const up = `
CREATE TABLE edition_versions (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  firm_id uuid NOT NULL REFERENCES firms,
  edition_id uuid NOT NULL,
  version integer NOT NULL CHECK (version >= 2),
  -- RFC 6902 operations from this version to the one before.
  undo jsonb NOT NULL,
  changed_by uuid NOT NULL REFERENCES people,
  changed_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (edition_id, version),
  FOREIGN KEY (firm_id, edition_id) REFERENCES editions (firm_id, id)
);

CREATE TABLE edition_remarks (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  firm_id uuid NOT NULL REFERENCES firms,
  edition_id uuid NOT NULL,
  pointer text NOT NULL,
  text text NOT NULL CHECK (text <> ''),
  remarked_by uuid NOT NULL REFERENCES people,
  remarked_at timestamptz NOT NULL DEFAULT now(),
  FOREIGN KEY (firm_id, edition_id) REFERENCES editions (firm_id, id)
);
CREATE INDEX edition_remarks_edition ON edition_remarks (edition_id);

${['edition_versions', 'edition_remarks']
  .map(
    (table) => `
ALTER TABLE ${table} ENABLE ROW LEVEL SECURITY;
ALTER TABLE ${table} FORCE ROW LEVEL SECURITY;
CREATE POLICY firm ON ${table} USING (firm_id = current_firm()) WITH CHECK (firm_id = current_firm());
CREATE TRIGGER permanent_rows BEFORE UPDATE OR DELETE ON ${table}
  FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER permanent_table BEFORE TRUNCATE ON ${table}
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
CREATE CONSTRAINT TRIGGER require_trail AFTER INSERT OR UPDATE OR DELETE ON ${table}
  DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION require_trail();`,
  )
  .join('')}
`;
