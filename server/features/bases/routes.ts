import { abilities } from '#shared/access/index.ts';
import { createBasis, listBases, listStarters, readBasis, readEdition } from '#shared/contracts/index.ts';
import type { Finding } from '#shared/engine/types.ts';
import { starterNamed, starters } from '#server/basis/starters.ts';
import { unverifiedIn } from '#server/basis/unverified.ts';
import { invalid } from '#server/http/problem.ts';
import { route, type Route } from '#server/http/route.ts';
import { presentBases, presentEdition } from './present.ts';
import { setUpBasis } from './setUpBasis.ts';

const count = (findings: readonly Finding[], severity: Finding['severity']) =>
  findings.filter((finding) => finding.severity === severity).length;

export const basisRoutes: readonly Route[] = [
  route(listBases, async ({ door, person }) => ({
    items: await presentBases(door, person),
    abilities: abilities(person, ['bases.read', 'bases.create']),
  })),

  route(readBasis, {
    load: async ({ door, person, params }) => {
      const [basis] = await presentBases(door, person, params.id);
      return basis ? { access: {}, basis } : null;
    },
    act: ({ record }) => Promise.resolve(record.basis),
  }),

  route(createBasis, async ({ door, person, body }) => {
    const document = starterNamed(body.starter);
    if (!document) {
      const known = starters()
        .map(({ slug }) => slug)
        .join(', ');
      throw invalid([{ pointer: '/starter', message: `Has to be one of: ${known}.` }]);
    }
    const id = await setUpBasis(door, person, body, document);
    const [basis] = await presentBases(door, person, id);
    if (!basis) throw new Error('A basis that was just set up is gone.');
    return basis;
  }),

  route(listStarters, () =>
    Promise.resolve({
      items: starters().map(({ slug, document }) => ({
        slug,
        title: document.title,
        purpose: document.purpose,
        method: document.method,
        unitSystem: document.unitSystem,
        unverified: unverifiedIn(document),
      })),
    }),
  ),

  route(readEdition, {
    load: async ({ door, params }) => {
      const edition = await door.editions.one({ id: params.id });
      return edition && { access: { editionState: edition.state }, edition };
    },
    act: async ({ door, person, record: { access, edition }, services: { judge } }) => {
      const findings = judge.findings(edition);
      return {
        ...(await presentEdition(door, edition.id)),
        document: edition.document,
        findings: {
          errors: count(findings, 'error'),
          warnings: count(findings, 'warning'),
          notes: count(findings, 'note'),
        },
        abilities: abilities(person, ['editions.read'], access),
      };
    },
  }),
];
