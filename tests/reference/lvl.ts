import type { Edition } from '#shared/basis/schema/index.ts';
import { forTest, variant } from './worked.ts';

/**
 * The edition with a declared laminated veneer lumber as a grade. Values in N/mm2 as printed for LVL 48 P on
 * edge in the LVL Handbook Europe (2025); E_05 is from memory, and G_05 is the one that the critical stress
 * of an example implies.
 */
export const lvlOf = (edition: Edition, f_m_k: number): Edition =>
  variant(edition, (e) => {
    e.grades.rows.push({
      id: 'LVL48P',
      title: 'LVL 48 P, on edge',
      choices: { family: 'lvl' },
      values: {
        f_m_k,
        f_v_k: 4.2,
        f_c90_k: 6,
        E_mean: 13_800,
        E_05: 11_600,
        G_mean: 600,
        G_05: 400,
        s_h: 0.15,
      },
      provenance: forTest,
    });
  });
