/** Roles a person can hold in a firm; one person may hold several. */
export const roles = ['principal', 'keeper', 'engineer', 'checker', 'reader'] as const;
export type Role = (typeof roles)[number];

/** How a role is called on screens. */
export const roleTitles: Readonly<Record<Role, string>> = {
  principal: 'Principal',
  keeper: 'Basis keeper',
  engineer: 'Engineer',
  checker: 'Checker',
  reader: 'Reader',
};
