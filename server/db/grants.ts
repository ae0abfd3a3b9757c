/** What the application's role may do, table by table. It owns nothing, and deletes nothing of a firm's. */
const rights: Readonly<Record<string, string>> = {
  firms: 'SELECT',
  people: 'SELECT (id, email, name, created_at)',
  memberships: 'SELECT',
  bases: 'SELECT, INSERT, UPDATE',
  editions: 'SELECT, INSERT, UPDATE',
  edition_versions: 'SELECT, INSERT',
  edition_remarks: 'SELECT, INSERT',
  stock_lists: 'SELECT, INSERT, UPDATE',
  sections: 'SELECT, INSERT, UPDATE',
  projects: 'SELECT, INSERT, UPDATE',
  members: 'SELECT, INSERT, UPDATE',
  member_versions: 'SELECT, INSERT',
  results: 'SELECT, INSERT',
  trail: 'SELECT, INSERT',
  sessions: 'SELECT, INSERT, UPDATE, DELETE',
  rate_limits: 'SELECT, INSERT, UPDATE, DELETE',
};

/** SQL that gives the role exactly these rights, whatever it had before. `role` is a quoted identifier. */
export function grantsFor(role: string): string {
  const tables = Object.entries(rights).map(
    ([table, list]) => `REVOKE ALL ON ${table} FROM ${role}; GRANT ${list} ON ${table} TO ${role};`,
  );
  return `
REVOKE CREATE ON SCHEMA public FROM PUBLIC;
GRANT USAGE ON SCHEMA public TO ${role};
GRANT EXECUTE ON FUNCTION sign_in_lookup(text) TO ${role};
${tables.join('\n')}
`;
}
