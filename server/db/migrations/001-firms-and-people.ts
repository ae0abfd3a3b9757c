/**
 * Firms, people, and who holds which roles where.
 *
 * Row-level security reads two settings that the one door makes for its transaction. People are no firm's
 * rows: a person is seen by the firms they belong to, and by themselves. Before anyone is signed in no firm
 * is known, so the one question that sign-in has to ask is a function with its owner's rights, which
 * gives the id and the password hash for an email and nothing else; the application's role has no right to
 * read the column with the hashes. Which firms a person belongs to, they may then read for themselves.
 */
export const name = '001-firms-and-people';

export const up = `
CREATE FUNCTION current_firm() RETURNS uuid LANGUAGE sql STABLE
  AS $$ SELECT nullif(current_setting('app.firm_id', true), '')::uuid $$;
CREATE FUNCTION current_person() RETURNS uuid LANGUAGE sql STABLE
  AS $$ SELECT nullif(current_setting('app.person_id', true), '')::uuid $$;

CREATE TABLE firms (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  name text NOT NULL CHECK (name <> ''),
  invented boolean NOT NULL DEFAULT false,
  sole_practitioner boolean NOT NULL DEFAULT false,
  created_at timestamptz NOT NULL DEFAULT now()
);

CREATE TABLE people (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  email text NOT NULL,
  name text NOT NULL CHECK (name <> ''),
  password_hash text NOT NULL,
  created_at timestamptz NOT NULL DEFAULT now()
);
CREATE UNIQUE INDEX people_email ON people (lower(email));

CREATE TABLE memberships (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  firm_id uuid NOT NULL REFERENCES firms,
  person_id uuid NOT NULL REFERENCES people,
  roles text[] NOT NULL CHECK (roles <@ ARRAY['principal', 'keeper', 'engineer', 'checker', 'reader']),
  -- Someone who left stays as a name beside what they did.
  active boolean NOT NULL DEFAULT true,
  created_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (firm_id, person_id)
);
CREATE INDEX memberships_person ON memberships (person_id);

ALTER TABLE firms ENABLE ROW LEVEL SECURITY;
ALTER TABLE firms FORCE ROW LEVEL SECURITY;
CREATE POLICY firm ON firms USING (id = current_firm()) WITH CHECK (id = current_firm());

ALTER TABLE memberships ENABLE ROW LEVEL SECURITY;
ALTER TABLE memberships FORCE ROW LEVEL SECURITY;
CREATE POLICY firm ON memberships USING (firm_id = current_firm()) WITH CHECK (firm_id = current_firm());
CREATE POLICY own ON memberships FOR SELECT
  USING (current_firm() IS NULL AND person_id = current_person());

-- Not forced: the owner sets up people, and the function below reads them.
ALTER TABLE people ENABLE ROW LEVEL SECURITY;
CREATE POLICY colleagues ON people FOR SELECT USING (
  id = current_person()
  OR EXISTS (SELECT 1 FROM memberships m WHERE m.person_id = people.id AND m.firm_id = current_firm())
);

CREATE FUNCTION sign_in_lookup(asked text) RETURNS TABLE (person_id uuid, password_hash text)
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp
  AS $$ SELECT p.id, p.password_hash FROM public.people p WHERE lower(p.email) = lower(asked) $$;
REVOKE ALL ON FUNCTION sign_in_lookup(text) FROM PUBLIC;
`;
