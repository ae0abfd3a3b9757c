import { describe, expect, it } from 'vitest';
import { isAction } from '#shared/access/index.ts';
import { contracts } from './registry.ts';

const all = contracts.map(({ contract }) => contract);

describe('the registry of endpoints', () => {
  it('has each name and each address once', () => {
    const names = all.map(({ name }) => name);
    const addresses = all.map(({ method, path }) => `${method} ${path.replaceAll(/:\w+/g, ':')}`);
    expect(new Set(names).size).toBe(names.length);
    expect(new Set(addresses).size).toBe(addresses.length);
  });

  it('has an action, a summary and matching parameters for each', () => {
    for (const { action, summary, path, params } of all) {
      expect(isAction(action)).toBe(true);
      expect(summary).not.toBe('');
      expect([...path.matchAll(/:(\w+)/g)].map(([, name]) => name)).toEqual(Object.keys(params.properties));
    }
  });

  it('lets only requests that change something have a body, and gives an example of each', () => {
    for (const { method, body, example } of all) {
      if (method === 'GET') expect(body).toBeNull();
      expect(example === null).toBe(body === null);
    }
  });

  it('names each address after the resource it belongs to', () => {
    const elsewhere = contracts.filter(({ resource, contract }) => !contract.path.startsWith(`/${resource}`));
    expect(elsewhere.map(({ contract }) => contract.name).sort()).toEqual([
      'createMember',
      'listStarters',
      'patchDraft',
      'readDraft',
      'readEdition',
      'releaseEdition',
      'returnEdition',
      'startDraft',
      'submitEdition',
      'withdrawEdition',
    ]);
  });
});
