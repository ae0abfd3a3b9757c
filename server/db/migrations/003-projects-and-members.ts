/** Projects, members with every version of them, and stored results. */
export const name = '003-projects-and-members';

export const up = `
CREATE TABLE projects (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  firm_id uuid NOT NULL REFERENCES firms,
  title text NOT NULL CHECK (title <> ''),
  site text NOT NULL DEFAULT '',
  client text NOT NULL DEFAULT '',
  state text NOT NULL DEFAULT 'live' CHECK (state IN ('live', 'closed')),
  edition_id uuid,
  stock_list_id uuid,
  choices jsonb NOT NULL DEFAULT '{}',
  version integer NOT NULL DEFAULT 1,
  created_by uuid NOT NULL REFERENCES people,
  created_at timestamptz NOT NULL DEFAULT now(),
  changed_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (firm_id, id),
  FOREIGN KEY (firm_id, edition_id) REFERENCES editions (firm_id, id),
  FOREIGN KEY (firm_id, stock_list_id) REFERENCES stock_lists (firm_id, id)
);
CREATE INDEX projects_changed ON projects (firm_id, changed_at DESC);
CREATE INDEX projects_edition ON projects (edition_id);

CREATE TABLE members (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  firm_id uuid NOT NULL REFERENCES firms,
  project_id uuid NOT NULL,
  mark text NOT NULL CHECK (mark <> ''),
  state text NOT NULL DEFAULT 'live' CHECK (state IN ('live', 'removed')),
  document jsonb NOT NULL,
  hash text NOT NULL CHECK (hash ~ '^[0-9a-f]{64}$'),
  version integer NOT NULL DEFAULT 1,
  saved_by uuid NOT NULL REFERENCES people,
  saved_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (firm_id, id),
  FOREIGN KEY (firm_id, project_id) REFERENCES projects (firm_id, id)
);
CREATE UNIQUE INDEX members_mark ON members (project_id, mark) WHERE state = 'live';
CREATE INDEX members_saved ON members (firm_id, saved_at DESC);

CREATE TABLE member_versions (
  firm_id uuid NOT NULL REFERENCES firms,
  member_id uuid NOT NULL,
  version integer NOT NULL,
  document jsonb NOT NULL,
  hash text NOT NULL CHECK (hash ~ '^[0-9a-f]{64}$'),
  saved_by uuid NOT NULL REFERENCES people,
  saved_at timestamptz NOT NULL DEFAULT now(),
  PRIMARY KEY (member_id, version),
  FOREIGN KEY (firm_id, member_id) REFERENCES members (firm_id, id)
);

CREATE TABLE results (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  seq bigint GENERATED ALWAYS AS IDENTITY,
  firm_id uuid NOT NULL REFERENCES firms,
  member_id uuid NOT NULL,
  member_version integer NOT NULL,
  edition_id uuid NOT NULL,
  edition_hash text NOT NULL,
  -- The member as it was checked: its document with the project's choices, and the hash of that.
  inputs jsonb NOT NULL,
  member_hash text NOT NULL,
  engine text NOT NULL,
  document jsonb NOT NULL,
  result_hash text NOT NULL,
  verdict text NOT NULL CHECK (verdict IN ('passes', 'close', 'fails', 'none')),
  governing_check text,
  check_title text,
  utilisation double precision,
  -- Why there is no verdict.
  because text,
  -- Values nobody verified, and departures, behind this result: lists never read the document.
  unverified integer NOT NULL,
  departures integer NOT NULL,
  at timestamptz NOT NULL DEFAULT now(),
  FOREIGN KEY (firm_id, member_id) REFERENCES members (firm_id, id),
  FOREIGN KEY (member_id, member_version) REFERENCES member_versions (member_id, version),
  FOREIGN KEY (firm_id, edition_id) REFERENCES editions (firm_id, id)
);
CREATE INDEX results_newest ON results (member_id, member_version, edition_id, seq DESC);
CREATE INDEX results_edition ON results (edition_id);
`;
