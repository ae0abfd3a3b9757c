/**
 * Design bases, their editions, and stock lists. References between rows of a firm carry the firm, so that
 * a row can't point into another firm whatever a query says.
 */
export const name = '002-bases-and-stock';

export const up = `
CREATE TABLE bases (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  firm_id uuid NOT NULL REFERENCES firms,
  title text NOT NULL CHECK (title <> ''),
  purpose text NOT NULL DEFAULT '',
  created_by uuid NOT NULL REFERENCES people,
  created_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (firm_id, id)
);

CREATE TABLE editions (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  firm_id uuid NOT NULL REFERENCES firms,
  basis_id uuid NOT NULL,
  number integer NOT NULL CHECK (number >= 1),
  state text NOT NULL DEFAULT 'draft'
    CHECK (state IN ('draft', 'in_check', 'released', 'superseded', 'withdrawn')),
  document jsonb NOT NULL,
  -- SHA-256 over the RFC 8785 form of the document.
  hash text NOT NULL CHECK (hash ~ '^[0-9a-f]{64}$'),
  -- Stored values in the document that no second person verified.
  unverified integer NOT NULL CHECK (unverified >= 0),
  reason text NOT NULL DEFAULT '',
  version integer NOT NULL DEFAULT 1,
  drafted_by uuid NOT NULL REFERENCES people,
  drafted_at timestamptz NOT NULL DEFAULT now(),
  submitted_by uuid REFERENCES people,
  released_by uuid REFERENCES people,
  released_at timestamptz,
  UNIQUE (firm_id, id),
  UNIQUE (basis_id, number),
  FOREIGN KEY (firm_id, basis_id) REFERENCES bases (firm_id, id),
  CHECK ((released_by IS NULL) = (released_at IS NULL)),
  CHECK (state IN ('draft', 'in_check') = (released_at IS NULL))
);

CREATE TABLE stock_lists (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  firm_id uuid NOT NULL REFERENCES firms,
  title text NOT NULL CHECK (title <> ''),
  note text NOT NULL DEFAULT '',
  invented boolean NOT NULL DEFAULT false,
  units text NOT NULL CHECK (units IN ('metric', 'inch-pound')),
  currency text,
  changed_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (firm_id, id)
);

CREATE TABLE sections (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  firm_id uuid NOT NULL REFERENCES firms,
  stock_list_id uuid NOT NULL,
  -- What members name as their stock section.
  key text NOT NULL CHECK (key <> ''),
  nominal_b double precision NOT NULL CHECK (nominal_b > 0),
  nominal_h double precision NOT NULL CHECK (nominal_h > 0),
  actual_b double precision NOT NULL CHECK (actual_b > 0),
  actual_h double precision NOT NULL CHECK (actual_h > 0),
  lengths double precision[] NOT NULL DEFAULT '{}',
  grades text[] NOT NULL DEFAULT '{}',
  price_per_metre double precision CHECK (price_per_metre >= 0),
  UNIQUE (stock_list_id, key),
  FOREIGN KEY (firm_id, stock_list_id) REFERENCES stock_lists (firm_id, id)
);
`;
