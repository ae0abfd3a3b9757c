import { describe, expect, it } from 'vitest';
import { readHealth, readProject } from '#shared/contracts/index.ts';
import { openRoute, route } from './route.ts';

describe('an endpoint', () => {
  it('without an action of the access table can’t be made', () => {
    const lawless = Object.assign({}, readProject, { action: 'projects.burn' });
    const none = Object.assign({}, readProject, { action: undefined });
    for (const contract of [lawless, none]) {
      expect(() => route(contract, () => Promise.reject(new Error('never runs')))).toThrow(/has no action/);
    }
  });

  it('can’t be open to everyone unless its action is', () => {
    const act = () => Promise.reject(new Error('never runs'));
    expect(() => openRoute(readProject, act)).toThrow(/not for everyone/);
    expect(openRoute(readHealth, act).contract).toBe(readHealth);
  });
});
